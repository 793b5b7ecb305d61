import { braces } from './movements/brace';
import { carries } from './movements/carry';
import { hinges } from './movements/hinge';
import { jumps } from './movements/jump';
import { locomotions } from './movements/locomotion';
import { lunges } from './movements/lunge';
import { pulls } from './movements/pull';
import { pushes } from './movements/push';
import { squats } from './movements/squat';
import { stretches } from './movements/stretch';
import type { DemoMovement } from './shapes';

/** The Apple Loft's dictionary, by pattern. */
export const movements: readonly DemoMovement[] = [
  ...squats,
  ...hinges,
  ...lunges,
  ...pushes,
  ...pulls,
  ...carries,
  ...braces,
  ...jumps,
  ...locomotions,
  ...stretches,
];
