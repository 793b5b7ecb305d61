import type { Joints } from '../body';
import type { FrontPose } from '../frontPose';
import { fromTheFront } from '../motion';
import type { Prop } from '../props';
import { facing } from './stances';

const skip = (height: number): FrontPose => ({
  ...facing,
  hip: [0, 86 + height * 1.3],
  hands: [
    [-40, 96 + height],
    [40, 96 + height],
  ],
  feet: [
    [-6, 6 + height],
    [6, 6 + height],
  ],
  toes: 25 + height * 5,
});

/** The rope passes under the feet at the top of each hop. */
const turningRope = (joints: Joints, ms: number): Prop[] => {
  const turn = (ms % 600) / 600;
  const dip = -Math.cos(turn * 2 * Math.PI);
  return [
    {
      layer: turn < 0.5 ? 'near' : 'behind',
      thing: 'rope',
      left: joints.arms[0].end,
      right: joints.arms[1].end,
      dip: dip > 0 ? dip * 104 : dip * 98,
    },
  ];
};

export const ropeSkip = fromTheFront(
  [
    [0.2, skip(0)],
    [0.2, skip(0)],
    [0.2, skip(11)],
  ],
  { props: (joints, ms) => turningRope(joints, ms + 100) },
);

const hop = (x: number, height: number): FrontPose => ({
  ...facing,
  hip: [x, 82 + height * 1.5],
  lean: x * 0.12,
  hands: [
    [x - 34, 104 + height],
    [x + 34, 104 + height],
  ],
  feet: [
    [x - 6, 6 + height],
    [x + 6, 6 + height],
  ],
  toes: 25 + height * 2,
});

export const lineHop = fromTheFront(
  [
    [0.2, hop(-8, 13)],
    [0.2, hop(-26, 0)],
    [0.2, { ...hop(-26, 0), hip: [-25, 78] }],
    [0.2, hop(8, 13)],
    [0.2, hop(26, 0)],
    [0.2, { ...hop(26, 0), hip: [25, 78] }],
  ],
  { props: () => [{ layer: 'behind', thing: 'floorTape', x: 0 }] },
);

export const jumpingJack = fromTheFront([
  [
    0.3,
    {
      ...facing,
      hip: [0, 92],
      hands: [
        [-60, 140],
        [60, 140],
      ],
      feet: [
        [-20, 12],
        [20, 12],
      ],
      toes: 60,
    },
  ],
  [
    0.2,
    {
      ...facing,
      hip: [0, 85],
      hands: [
        [-22, 190],
        [22, 190],
      ],
      feet: [
        [-36, 6],
        [36, 6],
      ],
    },
  ],
  [
    0.2,
    {
      ...facing,
      hip: [0, 85],
      hands: [
        [-22, 190],
        [22, 190],
      ],
      feet: [
        [-36, 6],
        [36, 6],
      ],
    },
  ],
  [
    0.3,
    {
      ...facing,
      hip: [0, 92],
      hands: [
        [-60, 140],
        [60, 140],
      ],
      feet: [
        [-20, 12],
        [20, 12],
      ],
      toes: 60,
    },
  ],
  [
    0.2,
    {
      ...facing,
      hip: [0, 89],
      feet: [
        [-8, 6],
        [8, 6],
      ],
    },
  ],
  [
    0.2,
    {
      ...facing,
      hip: [0, 89],
      feet: [
        [-8, 6],
        [8, 6],
      ],
    },
  ],
]);
