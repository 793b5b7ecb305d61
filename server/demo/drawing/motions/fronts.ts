import type { Joints } from '../body';
import type { FrontPose } from '../frontPose';
import { fromTheFront } from '../motion';
import type { Prop } from '../props';

const stand: FrontPose = {
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
const board: Prop = { layer: 'behind', thing: 'board' };

const talk = (hands: FrontPose['hands'], lean: number, talking: boolean): FrontPose => ({
  ...stand,
  hands,
  lean,
  talking,
});

/** Speaking to the camera beside the board. */
export const briefing = fromTheFront(
  [
    [
      0.4,
      talk(
        [
          [-22, 112],
          [26, 108],
        ],
        -1,
        true,
      ),
    ],
    [
      0.3,
      talk(
        [
          [-22, 112],
          [30, 120],
        ],
        0,
        false,
      ),
    ],
    [
      0.4,
      talk(
        [
          [-30, 122],
          [38, 126],
        ],
        1,
        true,
      ),
    ],
    [
      0.4,
      talk(
        [
          [-26, 116],
          [34, 118],
        ],
        1,
        true,
      ),
    ],
    [
      0.3,
      talk(
        [
          [-20, 108],
          [22, 110],
        ],
        0,
        false,
      ),
    ],
    [
      0.5,
      talk(
        [
          [-20, 108],
          [54, 132],
        ],
        2,
        true,
      ),
    ],
    [
      0.5,
      talk(
        [
          [-20, 108],
          [58, 136],
        ],
        2,
        true,
      ),
    ],
    [
      0.4,
      talk(
        [
          [-20, 108],
          [48, 128],
        ],
        1,
        false,
      ),
    ],
    [
      0.4,
      talk(
        [
          [-18, 106],
          [18, 106],
        ],
        0,
        true,
      ),
    ],
    [
      0.4,
      talk(
        [
          [-30, 118],
          [28, 120],
        ],
        -1,
        true,
      ),
    ],
  ],
  { props: () => [board], zoom: 1.25, floorAt: 259 },
);

export const wave = fromTheFront(
  [
    [
      0.4,
      {
        ...stand,
        hands: [
          [-24, 92],
          [52, 176],
        ],
        talking: true,
      },
    ],
    [
      0.4,
      {
        ...stand,
        hands: [
          [-24, 92],
          [34, 184],
        ],
        talking: true,
      },
    ],
    [
      0.4,
      {
        ...stand,
        hands: [
          [-24, 92],
          [52, 176],
        ],
        talking: false,
      },
    ],
    [
      0.4,
      {
        ...stand,
        hands: [
          [-24, 92],
          [34, 184],
        ],
        talking: true,
      },
    ],
  ],
  { zoom: 1.25, floorAt: 259 },
);

const overhead = (hands: FrontPose['hands']): FrontPose => ({
  ...stand,
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
    ...stand,
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
      ...stand,
      hands: [
        [-12, 158],
        [12, 158],
      ],
    },
  ],
  [
    0.4,
    {
      ...stand,
      hands: [
        [-14, 118],
        [14, 118],
      ],
    },
  ],
]);

const skip = (height: number): FrontPose => ({
  ...stand,
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
  ...stand,
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
      ...stand,
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
      ...stand,
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
      ...stand,
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
      ...stand,
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
      ...stand,
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
      ...stand,
      hip: [0, 89],
      feet: [
        [-8, 6],
        [8, 6],
      ],
    },
  ],
]);

const turned = (side: 1 | -1): FrontPose => ({
  ...stand,
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
        ...stand,
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
        ...stand,
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
  ...stand,
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
  [0.9, { ...stand }],
  [1.4, sideBend(24)],
  [1.0, sideBend(25)],
  [0.9, { ...stand }],
  [1.4, sideBend(-24)],
  [1.0, sideBend(-25)],
]);
