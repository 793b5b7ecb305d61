import type { FrontPose } from '../frontPose';
import { fromTheFront } from '../motion';
import type { Prop } from '../props';
import { facing } from './stances';

const board: Prop = { layer: 'behind', thing: 'board' };

const talk = (hands: FrontPose['hands'], lean: number, talking: boolean): FrontPose => ({
  ...facing,
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
        ...facing,
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
        ...facing,
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
        ...facing,
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
        ...facing,
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
