import { chapterAt, nextChapter, previousChapter } from '../../../shared/domain/chapters/chapterAt';
import type { Playhead } from '../../lib/playhead';
import { againAfterMs, skipAt } from './playRules';

type Span = { startMs: number; endMs: number };

/** What keys, buttons and a phone's lock screen do with the playhead. */
export type Moves = ReturnType<typeof movesOf>;

export const stepMs = 5000;

export function movesOf(playhead: Playhead, chapters: readonly Span[], skips: readonly Span[]) {
  /** Nobody lands in what is passed over: forwards behind it, backwards before it. */
  const to = (ms: number) => {
    const skip = skipAt(skips, ms);
    if (!skip) return playhead.seekTo(ms);
    playhead.seekTo(ms < playhead.atMs() && skip.startMs > 0 ? skip.startMs - 1 : skip.endMs);
  };
  return {
    to,
    by: (ms: number) => to(playhead.atMs() + ms),
    start: () => to(0),
    end: () => playhead.seekTo(playhead.current().durationMs),
    next() {
      const next = nextChapter(chapters, playhead.atMs());
      if (next) to(next.startMs);
    },
    previous() {
      const atMs = playhead.atMs();
      const playing = chapterAt(chapters, atMs);
      const again = playing && atMs - playing.startMs > againAfterMs ? playing : undefined;
      to((again ?? previousChapter(chapters, atMs))?.startMs ?? 0);
    },
    /** One press away from watching it. */
    show(startMs: number) {
      to(startMs);
      playhead.play();
    },
  };
}
