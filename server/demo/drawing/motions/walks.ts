import { type Joints, type Point, towards } from '../body';
import { fromTheSide, type Motion } from '../motion';
import type { Prop } from '../props';
import { type Hand, type SidePose, sideJoints } from '../sidePose';
import { bothHands, held, standing, swung } from './stances';

const stepMs = 600;
const stepCm = 36;
const steps = 6;
const passMs = steps * stepMs;

/** A foot stands still for one step while the other passes it. */
function footAt(step: number, offset: 0 | 1): { place: Point; toes: number } {
  const cycle = Math.floor((step + offset) / 2);
  const part = step + offset - cycle * 2;
  const standsAt = (cycle * 2 - offset) * stepCm;
  if (part < 1) return { place: [standsAt, 6], toes: part > 0.8 ? (part - 0.8) * 120 : 0 };
  const moved = part - 1;
  const soft = moved * moved * (3 - 2 * moved);
  return { place: [standsAt + soft * 2 * stepCm, 6 + Math.sin(moved * Math.PI) * 11], toes: 24 * (1 - moved * 1.6) };
}

/** To and fro across the picture, every foot planted while it carries. */
function walk(hands: (step: number) => readonly [Hand, Hand], props: (joints: Joints) => readonly Prop[]): Motion {
  const poseAt = (ms: number): SidePose => {
    const step = (ms % passMs) / stepMs;
    const near = footAt(step, 0);
    const far = footAt(step, 1);
    const middle = (steps * stepCm) / 2;
    return {
      hip: [step * stepCm - stepCm * 0.5 - middle + 18, 85 + Math.cos((step % 1) * 2 * Math.PI + Math.PI) * 1.5],
      lean: 4,
      look: 0,
      hands: hands(step),
      feet: [
        [near.place[0] - middle + 18, near.place[1]],
        [far.place[0] - middle + 18, far.place[1]],
      ],
      toes: [near.toes, far.toes],
    };
  };
  return {
    periodMs: passMs * 2,
    jointsAt: (ms) => sideJoints(poseAt(ms)),
    facesLeftAt: (ms) => ms % (passMs * 2) >= passMs,
    props: (joints) => props(joints),
  };
}

const swinging = (step: number) => Math.sin(step * Math.PI) * 22;

export const suitcaseCarry = walk(
  (step) => [swung(2, 0.98), swung(swinging(step))],
  (joints) => [{ layer: 'near', thing: 'kettlebell', at: joints.arms[0].end, hangs: 0 }],
);

export const backpackCarry = walk(
  () => bothHands(held(13, -16)),
  (joints) => [{ layer: 'near', thing: 'backpack', at: towards(towards(joints.neck, 94, 17), 180, 20), lean: 4 }],
);

/** Putting things away after training. */
export const tidyUp = walk(
  () => bothHands(held(27, -34)),
  (joints) => {
    const [x, y] = joints.arms[0].end;
    return [{ layer: 'far', thing: 'kettlebell', at: [x + 2, y + 2], hangs: 0 }];
  },
);

const knee = (near: boolean): SidePose => ({
  ...standing,
  hip: [0, 91],
  lean: 0,
  hands: near ? [swung(-30, 0.9), swung(52, 0.8)] : [swung(52, 0.8), swung(-30, 0.9)],
  feet: near
    ? [
        [24, 52],
        [-3, 6],
      ]
    : [
        [3, 6],
        [22, 52],
      ],
  toes: near ? [20, 0] : [0, 20],
});

export const march = fromTheSide([
  [0.3, { ...standing, hip: [0, 91] }],
  [0.3, knee(true)],
  [0.1, knee(true)],
  [0.3, { ...standing, hip: [0, 91] }],
  [0.3, knee(false)],
  [0.1, knee(false)],
]);
