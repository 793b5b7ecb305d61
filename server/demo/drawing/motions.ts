import type { Motion } from './motion';
import * as arms from './motions/arms';
import * as floorwork from './motions/floorwork';
import * as hinges from './motions/hinges';
import * as hops from './motions/hops';
import * as pulls from './motions/pulls';
import * as squats from './motions/squats';
import * as talking from './motions/talking';
import * as walks from './motions/walks';

/** Everything that a figure can be shown doing, by name. */
export const motions = {
  ...floorwork,
  ...arms,
  ...hops,
  ...talking,
  ...hinges,
  ...pulls,
  ...squats,
  ...walks,
} as const satisfies Record<string, Motion>;

export type MotionName = keyof typeof motions;
export const motionNames = Object.keys(motions) as MotionName[];
