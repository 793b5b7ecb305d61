import { crates } from './sessions/crates';
import { hangAndWalk } from './sessions/hangAndWalk';
import { oneLegOnePress } from './sessions/oneLegOnePress';
import { sitPullSkip } from './sessions/sitPullSkip';
import { swingAndPush } from './sessions/swingAndPush';
import { carryHome, floorAndDoor, quietJumps, slowStrength } from './sessions/withoutFootage';
import type { DemoSession } from './shapes';

/** Two weeks of the Apple Loft, oldest first. */
export const sessions: readonly DemoSession[] = [
  crates,
  oneLegOnePress,
  carryHome,
  hangAndWalk,
  swingAndPush,
  sitPullSkip,
  floorAndDoor,
  quietJumps,
  slowStrength,
];
