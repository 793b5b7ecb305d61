import { type Joints, type Point, towards } from '../body';
import { fromTheSide } from '../motion';
import type { Prop } from '../props';
import type { SidePose } from '../sidePose';
import { bothHands, held, standing, swung } from './stances';

const hinged: SidePose = { ...standing, hip: [-23, 81], lean: 66, look: 38 };

/** Degrees that something in the hand hangs away from straight down, along the arm. */
const alongArm = (joints: Joints) => {
  const { joint, end } = joints.arms[0];
  return (Math.atan2(end[0] - joint[0], joint[1] - end[1]) * 180) / Math.PI;
};

const swingBell = (joints: Joints): Prop[] => [
  { layer: 'near', thing: 'kettlebell', at: joints.arms[0].end, hangs: alongArm(joints) },
];

export const kettlebellSwing = fromTheSide(
  [
    [0.7, { ...standing, hip: [-24, 70], lean: 58, look: 28, hands: bothHands(swung(-44, 0.92)) }],
    [0.1, { ...standing, hip: [-24, 70], lean: 58, look: 28, hands: bothHands(swung(-46, 0.92)) }],
    [0.6, { ...standing, lean: -2, look: 0, hands: bothHands(swung(84)) }],
    [0.2, { ...standing, lean: -2, look: 0, hands: bothHands(swung(86)) }],
  ],
  { props: swingBell },
);

const handsOnHips = bothHands(held(9, -44));

export const hipHinge = fromTheSide([
  [1.4, { ...standing, hands: handsOnHips }],
  [0.4, { ...standing, hands: handsOnHips }],
  [1.8, { ...hinged, hands: handsOnHips }],
  [0.4, { ...hinged, hands: handsOnHips }],
]);

const bandFromFeet = (joints: Joints): Prop[] => {
  const foot: Point = [0, 2];
  const back = towards(joints.neck, -70, 9);
  return [{ layer: 'near', thing: 'band', points: [foot, joints.arms[0].end, back] }];
};

export const bandGoodMorning = fromTheSide(
  [
    [1.4, { ...standing, hands: bothHands(held(11, -3)) }],
    [0.4, { ...standing, hands: bothHands(held(11, -3)) }],
    [1.8, { ...hinged, hands: bothHands(held(11, -3)) }],
    [0.4, { ...hinged, hands: bothHands(held(11, -3)) }],
  ],
  { props: bandFromFeet },
);

const row = (hand: SidePose['hands']): SidePose => ({ ...hinged, hip: [-24, 77], lean: 62, look: 40, hands: hand });

export const bentOverRow = fromTheSide(
  [
    [1.1, row(bothHands(swung(0, 0.98)))],
    [0.3, row(bothHands(swung(0, 0.98)))],
    [0.8, row(bothHands(held(13, -36)))],
    [0.4, row(bothHands(held(13, -36)))],
  ],
  {
    props: (joints) => [
      { layer: 'far', thing: 'dumbbell', at: joints.arms[1].end, seen: 'end' },
      { layer: 'near', thing: 'dumbbell', at: joints.arms[0].end, seen: 'end' },
    ],
  },
);

const toLeg: SidePose = {
  ...standing,
  hip: [-14, 88],
  lean: 14,
  hands: bothHands(held(18, -38)),
  feet: [
    [51, 32],
    [-14, 6],
  ],
  toes: [-62, 0],
};

export const hamstringStretch = fromTheSide(
  [
    [1.6, toLeg],
    [0.3, toLeg],
    [2.0, { ...toLeg, hip: [-14, 86.5], lean: 54, look: 40, hands: bothHands({ at: [26, 62] }) }],
    [1.6, { ...toLeg, hip: [-14, 86.5], lean: 55, look: 40, hands: bothHands({ at: [26, 61] }) }],
  ],
  { props: () => [{ layer: 'behind', thing: 'box', left: 41, width: 42, height: 25 }] },
);

export const calfStretch = fromTheSide(
  [
    [
      1.8,
      {
        ...standing,
        hip: [-6, 83],
        lean: 15,
        look: 0,
        hands: bothHands({ at: [56, 126] }),
        feet: [
          [22, 6],
          [-40, 6],
        ],
      },
    ],
    [
      2.2,
      {
        ...standing,
        hip: [2, 81],
        lean: 13,
        look: 0,
        hands: bothHands({ at: [56, 126] }),
        feet: [
          [22, 6],
          [-40, 6],
        ],
      },
    ],
  ],
  { props: () => [{ layer: 'behind', thing: 'wall', x: 60 }] },
);
