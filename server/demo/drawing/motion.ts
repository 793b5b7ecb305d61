import type { Joints } from './body';
import { type FrontPose, frontJoints, mixFront } from './frontPose';
import type { Prop } from './props';
import { mixSide, type SidePose, sideJoints } from './sidePose';

/** A movement as a loop: the same joints come back after every period, so that its frames are drawn once. */
export type Motion = {
  periodMs: number;
  jointsAt: (ms: number) => Joints;
  /** facing left instead of right at this moment */
  facesLeftAt?: (ms: number) => boolean;
  /** what lies or hangs around, and what is held */
  props?: (joints: Joints, ms: number) => readonly Prop[];
  /** how near the camera is (1 shows 270 cm of height) and where the floor lies in the picture, in its pixels */
  zoom?: number;
  floorAt?: number;
};

type Look = Pick<Motion, 'props' | 'zoom' | 'floorAt'>;

/** Seconds until a pose is reached, and the pose. The loop goes from the last back to the first. */
export type Key<P> = readonly [seconds: number, pose: P];

const soft = (part: number) => part * part * (3 - 2 * part);

function alongKeys<P>(keys: readonly Key<P>[], mixed: (a: P, b: P, part: number) => P) {
  const periodMs = Math.round(keys.reduce((sum, [seconds]) => sum + seconds, 0) * 1000);
  const poseAt = (ms: number): P => {
    let left = ms % periodMs;
    let from = keys[keys.length - 1] as Key<P>;
    for (const key of keys) {
      const takes = key[0] * 1000;
      if (left < takes) return mixed(from[1], key[1], soft(left / takes));
      left -= takes;
      from = key;
    }
    return from[1];
  };
  return { periodMs, poseAt };
}

export function fromTheSide(keys: readonly Key<SidePose>[], look: Look = {}): Motion {
  const { periodMs, poseAt } = alongKeys(keys, mixSide);
  return { periodMs, jointsAt: (ms) => sideJoints(poseAt(ms)), ...look };
}

export function fromTheFront(keys: readonly Key<FrontPose>[], look: Look = {}): Motion {
  const { periodMs, poseAt } = alongKeys(keys, mixFront);
  return { periodMs, jointsAt: (ms) => frontJoints(poseAt(ms)), ...look };
}

const between = (a: number, b: number, part: number) => a + (b - a) * part;

/** A movement that one number describes, such as the angle of a straight body. */
export function bySlope(keys: readonly Key<number>[], pose: (value: number) => SidePose, look: Look = {}): Motion {
  const { periodMs, poseAt } = alongKeys(keys, between);
  return { periodMs, jointsAt: (ms) => sideJoints(pose(poseAt(ms))), ...look };
}
