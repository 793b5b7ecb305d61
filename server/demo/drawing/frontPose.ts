import { add, body, type Foot, type Joints, type Limb, mix, type Point, radians, reach, towards } from './body';

/** Somebody seen from the front; left and right are those of the picture. */
export type FrontPose = {
  hip: Point;
  /** the trunk, degrees to the right of upright */
  lean: number;
  /** degrees that the shoulders are turned away, which makes them look narrower */
  turn?: number;
  hands: readonly [Point, Point];
  /** ankles */
  feet: readonly [Point, Point];
  /** degrees that the toes point down: 25 stands, 80 hangs */
  toes?: number;
  talking?: boolean;
};

/** Of the two ways to bend, the one outwards and down: where an elbow goes, turned a little from the camera. */
function bendOut(root: Point, end: Point, upper: number, lower: number, outward: 1 | -1): Limb {
  const ways = [reach(root, end, upper, lower, 1), reach(root, end, upper, lower, -1)] as const;
  const score = ({ joint }: Limb) => joint[0] * outward - joint[1] * 0.7;
  const way = score(ways[0]) >= score(ways[1]) ? ways[0] : ways[1];
  return { ...way, joint: mix(mix(way.root, way.end, 0.5), way.joint, 0.7) };
}

/** A knee that bends points mostly at the camera: little of it is seen to the side. */
function kneeOut(root: Point, end: Point, outward: 1 | -1): Limb {
  const limb = reach(root, end, body.thigh, body.shin, outward);
  return { ...limb, joint: mix(mix(limb.root, limb.end, 0.5), limb.joint, 0.28) };
}

function footOf(ankle: Point, outward: 1 | -1, pitch: number): Foot {
  const down = Math.sin(radians(pitch)) * body.foot * 0.7;
  return { heel: add(ankle, [0, -1.5]), toe: add(ankle, [outward * 6 * Math.cos(radians(pitch)), -1.5 - down * 0.6]) };
}

export function frontJoints(pose: FrontPose): Joints {
  const neck = towards(pose.hip, pose.lean, body.torso);
  const half = body.shoulderHalf * Math.cos(radians(pose.turn ?? 0));
  const tilt = radians(pose.lean);
  const side = (middle: Point, width: number, outward: 1 | -1): Point =>
    add(middle, [Math.cos(tilt) * width * outward, -Math.sin(tilt) * width * outward]);
  const arm = (hand: Point, outward: 1 | -1) =>
    bendOut(side(add(neck, [0, -3]), half, outward), hand, body.upperArm, body.forearm, outward);
  const leg = (foot: Point, outward: 1 | -1) => kneeOut(side(pose.hip, body.hipHalf, outward), foot, outward);
  return {
    view: 'front',
    head: towards(neck, pose.lean * 0.6, body.neck),
    headLean: pose.lean * 0.6,
    neck,
    hip: pose.hip,
    shoulderHalf: half,
    arms: [arm(pose.hands[0], -1), arm(pose.hands[1], 1)],
    legs: [leg(pose.feet[0], -1), leg(pose.feet[1], 1)],
    feet: [footOf(pose.feet[0], -1, pose.toes ?? 25), footOf(pose.feet[1], 1, pose.toes ?? 25)],
    talking: pose.talking ?? false,
  };
}

export function mixFront(a: FrontPose, b: FrontPose, part: number): FrontPose {
  const between = (x: number, y: number) => x + (y - x) * part;
  return {
    hip: mix(a.hip, b.hip, part),
    lean: between(a.lean, b.lean),
    turn: between(a.turn ?? 0, b.turn ?? 0),
    hands: [mix(a.hands[0], b.hands[0], part), mix(a.hands[1], b.hands[1], part)],
    feet: [mix(a.feet[0], b.feet[0], part), mix(a.feet[1], b.feet[1], part)],
    toes: between(a.toes ?? 25, b.toes ?? 25),
    talking: part < 0.5 ? (a.talking ?? false) : (b.talking ?? false),
  };
}
