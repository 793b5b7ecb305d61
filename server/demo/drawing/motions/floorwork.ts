import { bySlope, fromTheSide } from '../motion';
import type { Prop } from '../props';
import type { SidePose } from '../sidePose';
import { at, bothHands, straightFrom } from './stances';

const low = { zoom: 1.3, floorAt: 226 } as const;
const mat = (left: number, width: number): Prop => ({ layer: 'behind', thing: 'mat', left, width });

const onToes = { toes: [72, 72] } as const;
const pushUpFeet = [-80, 14] as const;

export const pushUp = bySlope(
  [
    [0.9, 18.9],
    [0.2, 18.9],
    [1.3, 3.4],
    [0.2, 3.4],
  ],
  (degrees) => ({
    ...straightFrom(pushUpFeet, degrees),
    look: 66 - degrees,
    hands: bothHands(at(48, 4)),
    feet: [pushUpFeet, pushUpFeet],
    ...onToes,
  }),
  { ...low, props: () => [mat(-100, 180)] },
);

const raisedFeet = [-92, 14] as const;

export const chairPushUp = bySlope(
  [
    [0.9, 36.5],
    [0.2, 36.5],
    [1.3, 23],
    [0.2, 23],
  ],
  (degrees) => ({
    ...straightFrom(raisedFeet, degrees),
    look: 66 - degrees,
    hands: bothHands(at(33, 49)),
    feet: [raisedFeet, raisedFeet],
    ...onToes,
  }),
  { zoom: 1.2, floorAt: 234, props: () => [{ layer: 'behind', thing: 'chair', left: 22 }] },
);

export const plank = bySlope(
  [
    [1.6, 0],
    [1.4, 1],
  ],
  (breath) => {
    const { hip, lean } = straightFrom([-84, 14], 8.4 + breath * 0.5);
    return {
      hip: [hip[0], hip[1] + breath * 0.8],
      lean,
      look: 66,
      hands: bothHands(at(79, 5)),
      feet: [
        [-84, 14],
        [-88, 14],
      ],
      ...onToes,
    };
  },
  { ...low, props: () => [mat(-104, 200)] },
);

const pikeTop: SidePose = {
  hip: [-17, 88],
  lean: 130,
  look: 150,
  hands: bothHands(at(44, 5)),
  feet: [
    [-50, 13],
    [-54, 13],
  ],
  toes: [50, 50],
};
const pikeLow: SidePose = { ...pikeTop, hip: [4, 78], lean: 138, look: 128, toes: [66, 66] };

export const pikePushUp = fromTheSide(
  [
    [1.0, pikeTop],
    [0.3, pikeTop],
    [1.4, pikeLow],
    [0.2, pikeLow],
  ],
  { zoom: 1.25, floorAt: 230, props: () => [mat(-70, 150)] },
);

/** Lying on the back with bent knees; degrees that the trunk rises from the floor. */
export const gluteBridge = bySlope(
  [
    [1.2, 0],
    [0.3, 0],
    [1.2, 25],
    [0.8, 25],
  ],
  (degrees) => {
    const angle = (degrees * Math.PI) / 180;
    return {
      hip: [-50 + Math.cos(angle) * 52, 11 + Math.sin(angle) * 52],
      lean: -90 - degrees,
      look: -90 + degrees * 0.1,
      hands: bothHands(at(5, 6)),
      feet: [
        [35, 6],
        [31, 6],
      ],
      toes: [0, 0],
    };
  },
  { ...low, props: () => [mat(-95, 160)] },
);

const lying = { hip: [0, 11], lean: -90, look: -88 } as const;
const tucked: SidePose = {
  ...lying,
  hands: [at(-52, 66), at(-50, 66)],
  feet: [
    [43, 52],
    [41, 52],
  ],
  toes: [-90, -90],
};
const reachNear: SidePose = {
  ...tucked,
  hands: [at(-103, 22), at(-50, 66)],
  feet: [
    [43, 52],
    [84, 18],
  ],
};
const reachFar: SidePose = {
  ...tucked,
  hands: [at(-52, 66), at(-103, 22)],
  feet: [
    [84, 18],
    [41, 52],
  ],
};

export const deadBug = fromTheSide(
  [
    [1.0, tucked],
    [0.2, tucked],
    [1.4, reachNear],
    [0.3, reachNear],
    [1.0, tucked],
    [0.2, tucked],
    [1.4, reachFar],
    [0.3, reachFar],
  ],
  { ...low, props: () => [mat(-112, 190)] },
);

const allFours: SidePose = {
  hip: [-10, 47],
  lean: 78,
  look: 72,
  hands: bothHands(at(41, 5)),
  feet: [
    [-52, 7],
    [-55, 7],
  ],
  toes: [172, 172],
};

export const birdDog = fromTheSide(
  [
    [1.0, allFours],
    [0.3, allFours],
    [
      1.3,
      {
        ...allFours,
        hands: [at(93, 66), at(41, 5)],
        feet: [
          [-52, 7],
          [-95, 54],
        ],
        toes: [172, 95],
      },
    ],
    [
      0.9,
      {
        ...allFours,
        hands: [at(93, 67), at(41, 5)],
        feet: [
          [-52, 7],
          [-95, 55],
        ],
        toes: [172, 95],
      },
    ],
    [1.0, allFours],
    [0.3, allFours],
    [
      1.3,
      {
        ...allFours,
        hands: [at(41, 5), at(93, 66)],
        feet: [
          [-95, 54],
          [-55, 7],
        ],
        toes: [95, 172],
      },
    ],
    [
      0.9,
      {
        ...allFours,
        hands: [at(41, 5), at(93, 67)],
        feet: [
          [-95, 55],
          [-55, 7],
        ],
        toes: [95, 172],
      },
    ],
  ],
  { ...low, props: () => [mat(-80, 150)] },
);

const sitBack: SidePose = {
  hip: [-44, 27],
  lean: 96,
  look: 100,
  hands: bothHands(at(62, 6)),
  feet: [
    [-52, 7],
    [-55, 7],
  ],
  toes: [172, 172],
};

/** From hands and knees back onto the heels, arms long. */
export const kneelingReach = fromTheSide(
  [
    [1.6, { ...allFours, hands: bothHands(at(58, 5)), hip: [-8, 46] }],
    [0.2, { ...allFours, hands: bothHands(at(58, 5)), hip: [-8, 46] }],
    [1.8, sitBack],
    [1.6, sitBack],
  ],
  { ...low, props: () => [mat(-90, 180)] },
);

const faceDown: SidePose = {
  hip: [-10, 10],
  lean: 89,
  look: 84,
  hands: bothHands(at(-12, 9)),
  feet: [
    [-94, 9],
    [-97, 9],
  ],
  toes: [168, 168],
};

/** Lying face down, the elbows drawn up and back beside the ribs and held. */
export const proneRowHold = fromTheSide(
  [
    [0.8, faceDown],
    [0.3, faceDown],
    [0.9, { ...faceDown, lean: 80, look: 76, hands: bothHands(at(16, 16)) }],
    [2.2, { ...faceDown, lean: 79, look: 76, hands: bothHands(at(15, 17)) }],
  ],
  { ...low, props: () => [mat(-112, 210)] },
);
