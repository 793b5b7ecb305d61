import type { Joints } from '../body';
import { bySlope, fromTheSide } from '../motion';
import type { Prop } from '../props';
import type { SidePose } from '../sidePose';
import { at, bothHands, held, standing, swung } from './stances';

const low: SidePose = { ...standing, hip: [-25, 39], lean: 42, look: 8, hands: bothHands(swung(92, 0.95)) };

const weight = (joints: Joints): Prop[] => [
  { layer: 'near', thing: 'kettlebell', at: [joints.arms[0].end[0], joints.arms[0].end[1] + 8], hangs: 0 },
];

const goblet = { hands: bothHands(held(17, -9)) };

export const airSquat = fromTheSide([
  [1.0, { ...standing, hands: bothHands(swung(20)) }],
  [0.4, { ...standing, hands: bothHands(swung(20)) }],
  [1.5, low],
  [0.3, low],
]);

export const gobletSquat = fromTheSide(
  [
    [1.1, { ...standing, ...goblet }],
    [0.4, { ...standing, ...goblet }],
    [1.7, { ...low, lean: 34, look: 2, ...goblet }],
    [0.4, { ...low, lean: 34, look: 2, ...goblet }],
  ],
  { props: weight },
);

export const squatJump = fromTheSide([
  [0.8, { ...standing, hip: [-16, 60], lean: 34, look: 6, hands: bothHands(swung(-30)) }],
  [
    0.3,
    {
      ...standing,
      hip: [2, 112],
      hands: bothHands(swung(140)),
      feet: [
        [3, 27],
        [-3, 27],
      ],
      toes: [55, 55],
    },
  ],
  [0.3, { ...standing, hip: [-14, 62], lean: 30, look: 6, hands: bothHands(swung(40)) }],
  [0.4, { ...standing, hands: bothHands(swung(10)) }],
  [0.4, { ...standing, hands: bothHands(swung(10)) }],
]);

const lunge = {
  feet: [
    [30, 6],
    [-46, 15],
  ],
  toes: [0, 58],
} as const;

export const splitSquat = fromTheSide([
  [1.2, { ...standing, ...lunge, hip: [-5, 77], lean: 4, hands: bothHands(held(9, -45)) }],
  [0.3, { ...standing, ...lunge, hip: [-5, 77], lean: 4, hands: bothHands(held(9, -45)) }],
  [1.6, { ...standing, ...lunge, hip: [-4, 49], lean: 8, hands: bothHands(held(9, -45)) }],
  [0.3, { ...standing, ...lunge, hip: [-4, 49], lean: 8, hands: bothHands(held(9, -45)) }],
]);

const onHips = bothHands(held(9, -45));
const stepBack = (near: boolean): SidePose => ({
  ...standing,
  hip: [-20, 48],
  lean: 10,
  hands: onHips,
  feet: near
    ? [
        [-61, 15],
        [14, 6],
      ]
    : [
        [14, 6],
        [-61, 15],
      ],
  toes: near ? [58, 0] : [0, 58],
});
const lift = (near: boolean): SidePose => ({
  ...standing,
  hip: [-4, 84],
  hands: onHips,
  feet: near
    ? [
        [-18, 24],
        [14, 6],
      ]
    : [
        [14, 6],
        [-18, 24],
      ],
  toes: near ? [30, 0] : [0, 30],
});
const upright: SidePose = {
  ...standing,
  hip: [11, 90],
  hands: onHips,
  feet: [
    [14, 6],
    [14, 6],
  ],
};

export const reverseLunge = fromTheSide([
  [0.4, upright],
  [0.3, upright],
  [0.5, lift(true)],
  [1.0, stepBack(true)],
  [0.8, lift(true)],
  [0.4, upright],
  [0.3, upright],
  [0.5, lift(false)],
  [1.0, stepBack(false)],
  [0.8, lift(false)],
]);

const box: Prop = { layer: 'behind', thing: 'box', left: 20, width: 58, height: 40 };

const step = (
  hip: readonly [number, number],
  near: readonly [number, number],
  far: readonly [number, number],
  lean: number,
) => ({ ...standing, hip, lean, feet: [near, far], hands: [swung(12 - lean), swung(lean * 2)] }) satisfies SidePose;

export const boxStepUp = fromTheSide(
  [
    [0.4, step([-11, 90], [-8, 6], [-12, 6], 2)],
    [0.3, step([-11, 90], [-8, 6], [-12, 6], 2)],
    [0.5, step([-8, 89], [6, 62], [-12, 6], 4)],
    [0.5, step([-2, 86], [42, 46], [-12, 6], 17)],
    [0.3, step([4, 88], [42, 46], [-12, 6], 22)],
    [0.8, step([36, 126], [42, 46], [16, 68], 8)],
    [0.5, step([42, 131], [44, 46], [38, 46], 2)],
    [0.5, step([42, 131], [44, 46], [38, 46], 2)],
    [0.5, step([34, 118], [44, 46], [8, 58], 10)],
    [0.6, step([4, 87], [42, 46], [-14, 6], 16)],
    [0.5, step([-6, 89], [6, 62], [-12, 6], 4)],
  ],
  { props: () => [box], zoom: 1.1 },
);

const jumpBox: Prop = { layer: 'behind', thing: 'box', left: 16, width: 62, height: 38 };

export const boxJump = fromTheSide(
  [
    [
      0.4,
      {
        ...standing,
        hip: [-27, 90],
        feet: [
          [-24, 6],
          [-30, 6],
        ],
      },
    ],
    [
      0.3,
      {
        ...standing,
        hip: [-27, 90],
        feet: [
          [-24, 6],
          [-30, 6],
        ],
      },
    ],
    [
      0.6,
      {
        ...standing,
        hip: [-44, 60],
        lean: 40,
        look: 4,
        feet: [
          [-24, 6],
          [-30, 6],
        ],
        hands: bothHands(swung(-45)),
      },
    ],
    [
      0.3,
      {
        ...standing,
        hip: [2, 122],
        lean: 24,
        look: 6,
        feet: [
          [2, 58],
          [-4, 58],
        ],
        toes: [30, 30],
        hands: bothHands(swung(120)),
      },
    ],
    [
      0.3,
      {
        ...standing,
        hip: [20, 96],
        lean: 34,
        look: 6,
        feet: [
          [44, 44],
          [38, 44],
        ],
        hands: bothHands(swung(80)),
      },
    ],
    [
      0.6,
      {
        ...standing,
        hip: [42, 128],
        feet: [
          [44, 44],
          [38, 44],
        ],
      },
    ],
    [
      0.5,
      {
        ...standing,
        hip: [42, 128],
        feet: [
          [44, 44],
          [38, 44],
        ],
      },
    ],
    [
      0.5,
      {
        ...standing,
        hip: [28, 112],
        lean: 12,
        feet: [
          [44, 44],
          [2, 52],
        ],
      },
    ],
    [
      0.6,
      {
        ...standing,
        hip: [-8, 86],
        lean: 12,
        feet: [
          [40, 44],
          [-30, 6],
        ],
      },
    ],
    [
      0.5,
      {
        ...standing,
        hip: [-20, 88],
        lean: 4,
        feet: [
          [-10, 46],
          [-30, 6],
        ],
      },
    ],
  ],
  { props: () => [jumpBox], zoom: 1.1 },
);

/** Half kneeling, the hip moved forwards without arching the back. */
export const hipFlexorStretch = bySlope(
  [
    [1.8, 0],
    [0.4, 0],
    [1.8, 1],
    [1.0, 1],
  ],
  (part) => ({
    hip: [-3 + part * 11, 49 - part],
    lean: 2 - part * 3,
    look: 0,
    hands: [at(30, 56), held(8, -45)],
    feet: [
      [36, 6],
      [-44, 7],
    ],
    toes: [0, 168],
  }),
  { props: () => [{ layer: 'behind', thing: 'mat', left: -70, width: 130 }], zoom: 1.25, floorAt: 236 },
);
