import type { Point } from '../body';
import type { FrontPose } from '../frontPose';
import type { Hand, SidePose } from '../sidePose';

/** Poses that many movements start from. */

export const hanging: Hand = { swing: 8, reach: 0.97 };
export const bothHands = (hand: Hand): readonly [Hand, Hand] => [hand, hand];
export const at = (x: number, y: number): Hand => ({ at: [x, y] });
export const held = (forward: number, up: number): Hand => ({ held: [forward, up] });
export const swung = (swing: number, reach = 0.97): Hand => ({ swing, reach });

export const flatFeet: readonly [Point, Point] = [
  [3, 6],
  [-3, 6],
];

export const standing: SidePose = {
  hip: [0, 90],
  lean: 2,
  hands: bothHands(hanging),
  feet: flatFeet,
  toes: [0, 0],
};

/** Standing towards the camera. */
export const facing: FrontPose = {
  hip: [0, 90],
  lean: 0,
  hands: [
    [-27, 90],
    [27, 90],
  ],
  feet: [
    [-13, 6],
    [13, 6],
  ],
};

/** A straight body that turns about the ankles; degrees above the floor, head to the right. */
export function straightFrom(ankle: Point, degrees: number): { hip: Point; lean: number } {
  const angle = (degrees * Math.PI) / 180;
  return { hip: [ankle[0] + Math.cos(angle) * 85.8, ankle[1] + Math.sin(angle) * 85.8], lean: 90 - degrees };
}
