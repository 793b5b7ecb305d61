import { useEffect, useRef } from 'react';
import { chapterAt } from '../../../shared/domain/chapters/chapterAt';
import type { Playhead } from '../../lib/playhead';
import { loopStep, skipAt } from './playRules';

type Span = { startMs: number; endMs: number };

/** A recording's last frame is this far from its end at most. */
const endMs = 60;

/** Passes over what the person does not see, while it plays. */
export function useSkips(playhead: Playhead, skips: readonly Span[]): void {
  useEffect(() => {
    if (skips.length === 0) return;
    return playhead.subscribeTime(() => {
      const { state, durationMs } = playhead.current();
      if (state !== 'playing') return;
      const skip = skipAt(skips, playhead.atMs());
      if (!skip) return;
      if (durationMs > 0 && skip.endMs >= durationMs - endMs) playhead.pause();
      playhead.seekTo(skip.endMs);
    });
  }, [playhead, skips]);
}

/** Plays one chapter over and over; whoever goes to another chapter loops that one. */
export function useLoop(playhead: Playhead, chapters: readonly Span[], loop: 'on' | 'off'): void {
  const looped = useRef<Span | undefined>(undefined);
  useEffect(() => {
    looped.current = loop === 'on' ? chapterAt(chapters, playhead.atMs()) : undefined;
    if (loop === 'off') return;
    const again = (chapter: Span) => {
      playhead.seekTo(chapter.startMs);
      playhead.play();
    };
    const watchTime = () => {
      const { state, durationMs } = playhead.current();
      const chapter = looped.current;
      const step = chapter ? loopStep(chapter, playhead.atMs(), durationMs || Number.POSITIVE_INFINITY) : 'left';
      if (step === 'left') looped.current = chapterAt(chapters, playhead.atMs());
      if (step === 'again' && chapter && state === 'playing') again(chapter);
    };
    // a chapter that reaches the recording's end is over when the recording is
    const watchEnd = () => {
      const { state, durationMs } = playhead.current();
      if (state === 'ended' && looped.current && looped.current.endMs >= durationMs - endMs) again(looped.current);
    };
    const leave = [playhead.subscribeTime(watchTime), playhead.subscribe(watchEnd)];
    return () => {
      for (const stop of leave) stop();
    };
  }, [playhead, chapters, loop]);
}
