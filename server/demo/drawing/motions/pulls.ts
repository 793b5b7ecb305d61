import type { Joints } from '../body';
import type { FrontPose } from '../frontPose';
import { bySlope, fromTheFront } from '../motion';
import type { Prop } from '../props';
import { at, bothHands, straightFrom } from './stances';

const ring = ([x, y]: readonly [number, number]): Prop[] => [{ layer: 'behind', thing: 'ring', at: [x, y], top: 260 }];

/** Leaning back from planted heels; degrees of the body above the floor, feet to the right. */
function leaningBack(ankle: readonly [number, number], degrees: number, hand: readonly [number, number], toes: number) {
  const mirrored = straightFrom(ankle, 180 - degrees);
  return {
    hip: mirrored.hip,
    lean: mirrored.lean,
    look: mirrored.lean + 6,
    hands: bothHands(at(...hand)),
    feet: [ankle, ankle] as const,
    toes: [toes, toes] as const,
  };
}

export const ringRow = bySlope(
  [
    [1.2, 43.9],
    [0.3, 43.9],
    [0.9, 61],
    [0.5, 61],
  ],
  (degrees) => leaningBack([48, 7], degrees, [0, 122], -26),
  { props: (joints) => ring(joints.arms[0].end), zoom: 1.1 },
);

export const towelRow = bySlope(
  [
    [1.2, 55.5],
    [0.3, 55.5],
    [0.9, 73],
    [0.6, 73],
  ],
  (degrees) => leaningBack([40, 7], degrees, [17, 113], -12),
  {
    props: (joints) => [
      { layer: 'behind', thing: 'door', x: 62, handle: 104 },
      { layer: 'far', thing: 'towel', points: [joints.arms[0].end, [64, 104]] },
    ],
  },
);

const bar: Prop = { layer: 'behind', thing: 'bar', y: 212 };
const grip = [
  [-27, 212],
  [27, 212],
] as const;
const hang: FrontPose = {
  hip: [0, 108],
  lean: 0,
  hands: grip,
  feet: [
    [-8, 26],
    [8, 26],
  ],
  toes: 85,
};
const chinOver: FrontPose = {
  ...hang,
  hip: [0, 148],
  feet: [
    [-8, 66],
    [8, 66],
  ],
};

export const deadHang = fromTheFront(
  [
    [1.4, hang],
    [
      1.4,
      {
        ...hang,
        hip: [0, 111],
        feet: [
          [-8, 28.5],
          [8, 28.5],
        ],
      },
    ],
  ],
  { props: () => [bar], zoom: 1.04 },
);

export const pullUp = fromTheFront(
  [
    [1.6, hang],
    [0.4, hang],
    [1.1, chinOver],
    [0.4, chinOver],
  ],
  { props: () => [bar], zoom: 1.04 },
);

const bandedLeg = (joints: Joints): Prop[] => [
  bar,
  {
    layer: 'behind',
    thing: 'band',
    points: [
      [-9, 212],
      [joints.legs[1].end[0] - 3, joints.legs[1].end[1] - 6],
    ],
  },
  {
    layer: 'behind',
    thing: 'band',
    points: [
      [9, 212],
      [joints.legs[1].end[0] + 3, joints.legs[1].end[1] - 6],
    ],
  },
];

export const bandPullUp = fromTheFront(
  [
    [
      1.6,
      {
        ...hang,
        feet: [
          [-8, 26],
          [3, 28],
        ],
      },
    ],
    [
      0.4,
      {
        ...hang,
        feet: [
          [-8, 26],
          [3, 28],
        ],
      },
    ],
    [
      1.1,
      {
        ...chinOver,
        feet: [
          [-8, 66],
          [3, 68],
        ],
      },
    ],
    [
      0.4,
      {
        ...chinOver,
        feet: [
          [-8, 66],
          [3, 68],
        ],
      },
    ],
  ],
  { props: bandedLeg, zoom: 1.04 },
);

const stand: FrontPose = {
  hip: [0, 90],
  lean: 0,
  hands: [
    [-26, 96],
    [26, 96],
  ],
  feet: [
    [-13, 6],
    [13, 6],
  ],
};

export const bandPullApart = fromTheFront(
  [
    [
      1.1,
      {
        ...stand,
        hands: [
          [-16, 128],
          [16, 128],
        ],
      },
    ],
    [
      0.3,
      {
        ...stand,
        hands: [
          [-16, 128],
          [16, 128],
        ],
      },
    ],
    [
      0.8,
      {
        ...stand,
        hands: [
          [-70, 134],
          [70, 134],
        ],
      },
    ],
    [
      0.5,
      {
        ...stand,
        hands: [
          [-70, 134],
          [70, 134],
        ],
      },
    ],
  ],
  {
    props: (joints) => [{ layer: 'near', thing: 'band', points: [joints.arms[0].end, joints.arms[1].end] }],
    zoom: 1.08,
  },
);
