import { useEffect, useRef } from 'react';
import { chapterAt } from '../../../shared/domain/chapters/chapterAt';
import type { Playhead } from '../../lib/playhead';
import { loopStep, skipAt } from './playRules';

type Span = { startMs: number; endMs: number };

type Stretches = {
  chapters: readonly Span[];
  /** what the person does not see */
  skips: readonly Span[];
  /** `on` plays one chapter over and over; whoever goes to another chapter loops that one */
  loop: 'on' | 'off';
};

/** A recording's last frame is this far from its end at most. */
const endMs = 60;

/**
 * Plays a chapter again, and passes over what the person does not see. In this order: a looped chapter that ends where
 * an aside begins starts again.
 */
export function useStretches(playhead: Playhead, { chapters, skips, loop }: Stretches): void {
  const looped = useRef<Span | undefined>(undefined);
  useEffect(() => {
    const here = () => chapterAt(chapters, playhead.atMs());
    looped.current = loop === 'on' ? here() : undefined;
    let seeks = playhead.seekCount();
    const again = (chapter: Span) => {
      playhead.seekTo(chapter.startMs);
      playhead.play();
    };
    const watchLoop = () => {
      const { state, durationMs } = playhead.current();
      // somebody went there: even a step over the chapter's end is no end that was played to
      if (seeks !== playhead.seekCount()) looped.current = here();
      seeks = playhead.seekCount();
      const chapter = looped.current;
      const step = chapter ? loopStep(chapter, playhead.atMs(), durationMs || Number.POSITIVE_INFINITY) : 'left';
      if (step === 'left') looped.current = here();
      if (step === 'again' && chapter && state === 'playing') again(chapter);
    };
    const watchSkips = () => {
      const { state, durationMs } = playhead.current();
      if (state !== 'playing') return;
      const skip = skipAt(skips, playhead.atMs());
      if (!skip) return;
      if (durationMs > 0 && skip.endMs >= durationMs - endMs) playhead.pause();
      playhead.seekTo(skip.endMs);
    };
    // a chapter that reaches the recording's end is over when the recording is
    const watchEnd = () => {
      const { state, durationMs } = playhead.current();
      if (state === 'ended' && looped.current && looped.current.endMs >= durationMs - endMs) again(looped.current);
    };
    const leave = [
      playhead.subscribeTime(() => {
        if (loop === 'on') watchLoop();
        watchSkips();
      }),
      playhead.subscribe(watchEnd),
    ];
    return () => {
      for (const stop of leave) stop();
    };
  }, [playhead, chapters, skips, loop]);
}
