import { picturesPerSecond } from './drawing/frames';
import { type MotionName, motions } from './drawing/motions';
import type { Layout } from './layOutScript';

/** A stretch of film that shows one motion: it is filmed once for `drawn` pictures and repeated until `shown` are. */
export type Shot = { motion: MotionName; drawn: number; shown: number };

/** Each repetition starts with a key frame: one every two seconds costs little, one every half second would not. */
const shortestDrawn = 2 * picturesPerSecond;

/** The shots of a layout in order, counted in drawn pictures. */
export function shotsOf(layout: Pick<Layout, 'shots' | 'durationMs'>): Shot[] {
  const picturesUntil = (ms: number) => Math.round((ms * picturesPerSecond) / 1000);
  return layout.shots.flatMap(({ startMs, motion }, i) => {
    const shown = picturesUntil(layout.shots[i + 1]?.startMs ?? layout.durationMs) - picturesUntil(startMs);
    const period = picturesUntil(motions[motion].periodMs);
    const drawn = Math.min(shown, period * Math.ceil(shortestDrawn / period));
    return shown > 0 ? [{ motion, drawn, shown }] : [];
  });
}
