import type { FrontPose } from '../frontPose';
import { fromTheFront } from '../motion';
import type { Prop } from '../props';
import { facing } from './stances';

const overhead = (hands: FrontPose['hands']): FrontPose => ({
  ...facing,
  hands,
  feet: [
    [-17, 6],
    [17, 6],
  ],
});

export const dumbbellPress = fromTheFront(
  [
    [
      1.3,
      overhead([
        [-28, 143],
        [28, 143],
      ]),
    ],
    [
      0.4,
      overhead([
        [-28, 143],
        [28, 143],
      ]),
    ],
    [
      0.9,
      overhead([
        [-23, 193],
        [23, 193],
      ]),
    ],
    [
      0.5,
      overhead([
        [-23, 193],
        [23, 193],
      ]),
    ],
  ],
  {
    props: (joints) =>
      joints.arms.map((arm): Prop => ({ layer: 'near', thing: 'dumbbell', at: arm.end, seen: 'along' })),
  },
);

const arms = (degrees: number): FrontPose => {
  const x = Math.sin((degrees * Math.PI) / 180) * 54;
  const y = 138 - Math.cos((degrees * Math.PI) / 180) * 54;
  return {
    ...facing,
    hands: [
      [-17 - x, y],
      [17 + x, y],
    ],
  };
};

/** Large circles, up through the sides and down before the body. */
export const armCircles = fromTheFront([
  [0.4, arms(10)],
  [0.4, arms(60)],
  [0.4, arms(115)],
  [0.4, arms(172)],
  [
    0.5,
    {
      ...facing,
      hands: [
        [-12, 158],
        [12, 158],
      ],
    },
  ],
  [
    0.4,
    {
      ...facing,
      hands: [
        [-14, 118],
        [14, 118],
      ],
    },
  ],
]);

const turned = (side: 1 | -1): FrontPose => ({
  ...facing,
  turn: 52,
  hands:
    side > 0
      ? [
          [34, 128],
          [52, 134],
        ]
      : [
          [-52, 134],
          [-34, 128],
        ],
});

export const standingTurn = fromTheFront(
  [
    [
      0.7,
      {
        ...facing,
        hands: [
          [-8, 126],
          [8, 126],
        ],
      },
    ],
    [0.9, turned(1)],
    [0.3, turned(1)],
    [
      0.7,
      {
        ...facing,
        hands: [
          [-8, 126],
          [8, 126],
        ],
      },
    ],
    [0.9, turned(-1)],
    [0.3, turned(-1)],
  ],
  { zoom: 1.08 },
);

const sideBend = (lean: number): FrontPose => ({
  ...facing,
  lean,
  hands:
    lean > 0
      ? [
          [lean * 1.8, 209 - lean],
          [26 + lean * 0.2, 84],
        ]
      : [
          [-26 + lean * 0.2, 84],
          [lean * 1.8, 209 + lean],
        ],
});

export const standingSideBend = fromTheFront([
  [0.9, { ...facing }],
  [1.4, sideBend(24)],
  [1.0, sideBend(25)],
  [0.9, { ...facing }],
  [1.4, sideBend(-24)],
  [1.0, sideBend(-25)],
]);
