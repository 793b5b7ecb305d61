import { describe, expect, it } from 'vitest';
import { body, distance, type Joints, type Point } from '../../server/demo/drawing/body';
import { pictureMs } from '../../server/demo/drawing/frames';
import type { Motion } from '../../server/demo/drawing/motion';
import { type MotionName, motionNames, motions } from '../../server/demo/drawing/motions';
import { picture } from '../../server/demo/drawing/place';

const momentsOf = (motion: Motion) =>
  Array.from({ length: Math.round(motion.periodMs / pictureMs) }, (_, i) => motion.jointsAt(i * pictureMs));

const pointsOf = ({ head, neck, hip, arms, legs, feet }: Joints): Point[] => [
  head,
  neck,
  hip,
  ...arms.flatMap(({ joint, end }) => [joint, end]),
  ...legs.flatMap(({ joint, end }) => [joint, end]),
  ...feet.flatMap(({ heel, toe }) => [heel, toe]),
];

const farthest = (points: readonly Point[]) => Math.max(...points.map((point) => distance(point, points[0] ?? point)));

describe.each(motionNames)('the figure in %s', (name) => {
  const motion: Motion = motions[name];

  it('comes back to where it started after a whole number of pictures', () => {
    expect(motion.periodMs % pictureMs).toBe(0);
    expect(pointsOf(motion.jointsAt(motion.periodMs))).toEqual(pointsOf(motion.jointsAt(0)));
  });

  it('stays in the picture', () => {
    const zoom = motion.zoom ?? 1.12;
    const floorAt = motion.floorAt ?? 250;
    for (const joints of momentsOf(motion)) {
      const top = Math.max(joints.head[1] + body.head, ...joints.arms.map(({ end }) => end[1] + 5));
      expect(floorAt - top * zoom).toBeGreaterThan(0);
      for (const [x, y] of pointsOf(joints)) {
        expect(Math.abs(x * zoom)).toBeLessThan(picture.width / 2 - 10);
        expect(floorAt - y * zoom).toBeLessThan(picture.height);
      }
    }
  });

  it('never sinks into the floor', () => {
    for (const joints of momentsOf(motion)) {
      for (const [, y] of pointsOf(joints)) expect(y).toBeGreaterThan(-8);
    }
  });

  it('moves', () => {
    const moments = momentsOf(motion);
    const travel = moments
      .map((joints) => pointsOf(joints))
      .reduce((most, points) => {
        const first = pointsOf(moments[0] as Joints);
        return Math.max(most, ...points.map((point, i) => distance(point, first[i] ?? point)));
      }, 0);
    expect(travel).toBeGreaterThan(0.5);
  });
});

const fromTheSide = motionNames.filter((name) => motions[name].jointsAt(0).view === 'side');

it.each(fromTheSide)('bones keep their length in %s', (name) => {
  for (const { arms, legs } of momentsOf(motions[name])) {
    for (const { root, joint, end } of arms) {
      expect(distance(root, joint)).toBeCloseTo(body.upperArm, 0);
      expect(distance(joint, end)).toBeCloseTo(body.forearm, 0);
    }
    for (const { root, joint, end } of legs) {
      expect(distance(root, joint)).toBeCloseTo(body.thigh, 0);
      expect(distance(joint, end)).toBeCloseTo(body.shin, 0);
    }
  }
});

/** Half a centimetre is less than a pixel. */
const still = 0.5;

const feetPlanted = [
  'airSquat',
  'gobletSquat',
  'splitSquat',
  'hipHinge',
  'bandGoodMorning',
  'bentOverRow',
  'kettlebellSwing',
  'hamstringStretch',
  'calfStretch',
  'hipFlexorStretch',
  'pushUp',
  'chairPushUp',
  'plank',
  'gluteBridge',
  'ringRow',
  'towelRow',
  'dumbbellPress',
  'bandPullApart',
] as const satisfies readonly MotionName[];

it.each(feetPlanted)('both feet stay where they are in %s', (name) => {
  const moments = momentsOf(motions[name]);
  for (const side of [0, 1] as const) expect(farthest(moments.map(({ legs }) => legs[side].end))).toBeLessThan(still);
});

const handsPlanted = [
  'pushUp',
  'chairPushUp',
  'plank',
  'pikePushUp',
  'ringRow',
  'towelRow',
  'pullUp',
  'bandPullUp',
  'deadHang',
  'calfStretch',
] as const satisfies readonly MotionName[];

it.each(handsPlanted)('both hands keep their hold in %s', (name) => {
  const moments = momentsOf(motions[name]);
  for (const side of [0, 1] as const) expect(farthest(moments.map(({ arms }) => arms[side].end))).toBeLessThan(still);
});

it.each(['suitcaseCarry', 'backpackCarry', 'tidyUp'] as const)(
  'one foot always stands while the other steps in %s',
  (name) => {
    const moments = momentsOf(motions[name]);
    const pass = moments.slice(0, moments.length / 2);
    for (const [i, joints] of pass.slice(1).entries()) {
      const before = pass[i] as Joints;
      const moved = joints.legs.map(({ end }, side) => distance(end, before.legs[side as 0 | 1].end));
      expect(Math.min(...moved)).toBeLessThan(still);
    }
  },
);

it('sits lower than the knee in a squat, with the hip behind the heel', () => {
  const lowest = momentsOf(motions.airSquat).reduce((low, joints) => (joints.hip[1] < low.hip[1] ? joints : low));
  expect(lowest.hip[1]).toBeLessThan(lowest.legs[0].joint[1]);
  expect(lowest.hip[0]).toBeLessThan(lowest.feet[0].heel[0]);
});

it('brings the chin over the bar in a pull-up', () => {
  const highest = momentsOf(motions.pullUp).reduce((high, joints) => (joints.head[1] > high.head[1] ? joints : high));
  expect(highest.head[1] - body.head).toBeGreaterThan(highest.arms[0].end[1] - 10);
});
