import { add, body, type Foot, type Joints, mix, type Point, radians, reach, towards } from './body';

/** A hand: at a place, swung from the shoulder (degrees from hanging, forward), or held before the trunk (forward, up from the shoulder). */
export type Hand = { at: Point } | { swing: number; reach: number } | { held: Point };

/** Somebody seen from the side, facing right. */
export type SidePose = {
  hip: Point;
  /** the trunk, degrees forward of upright */
  lean: number;
  /** the head, degrees forward of upright; half of the trunk's when left out */
  look?: number;
  /** near, far */
  hands: readonly [Hand, Hand];
  /** ankles: near, far */
  feet: readonly [Point, Point];
  /** degrees that the toes point down; 0 stands flat, −90 points up, 170 lies on the instep */
  toes: readonly [number, number];
};

function handAt(hand: Hand, shoulder: Point, lean: number): Point {
  if ('at' in hand) return hand.at;
  const arm = body.upperArm + body.forearm;
  if ('swing' in hand) return towards(shoulder, 180 - hand.swing, arm * hand.reach);
  const [forward, up] = hand.held;
  return add(shoulder, [
    Math.cos(radians(lean)) * forward + Math.sin(radians(lean)) * up,
    -Math.sin(radians(lean)) * forward + Math.cos(radians(lean)) * up,
  ]);
}

function footOf(ankle: Point, pitch: number): Foot {
  const p = radians(pitch);
  const sole: Point = [ankle[0] - Math.sin(p) * 4, ankle[1] - Math.cos(p) * 4];
  return {
    heel: [sole[0] - Math.cos(p) * 3, sole[1] + Math.sin(p) * 3],
    toe: [sole[0] + Math.cos(p) * (body.foot - 3), sole[1] - Math.sin(p) * (body.foot - 3)],
  };
}

export function sideJoints(pose: SidePose): Joints {
  const shoulder = towards(pose.hip, pose.lean, body.torso);
  const headLean = pose.look ?? pose.lean * 0.5;
  const headAt = towards(shoulder, (pose.lean + headLean) / 2, body.neck);
  const arm = (hand: Hand) => reach(shoulder, handAt(hand, shoulder, pose.lean), body.upperArm, body.forearm, -1);
  const leg = (foot: Point) => reach(pose.hip, foot, body.thigh, body.shin, 1);
  return {
    view: 'side',
    head: headAt,
    headLean,
    neck: shoulder,
    hip: pose.hip,
    shoulderHalf: 0,
    arms: [arm(pose.hands[0]), arm(pose.hands[1])],
    legs: [leg(pose.feet[0]), leg(pose.feet[1])],
    feet: [footOf(pose.feet[0], pose.toes[0]), footOf(pose.feet[1], pose.toes[1])],
    talking: false,
  };
}

function mixHands(a: Hand, b: Hand, part: number, from: SidePose, to: SidePose): Hand {
  const between = (x: number, y: number) => x + (y - x) * part;
  if ('swing' in a && 'swing' in b) return { swing: between(a.swing, b.swing), reach: between(a.reach, b.reach) };
  if ('held' in a && 'held' in b) return { held: mix(a.held, b.held, part) };
  const place = (hand: Hand, pose: SidePose) => handAt(hand, towards(pose.hip, pose.lean, body.torso), pose.lean);
  return { at: mix(place(a, from), place(b, to), part) };
}

/** The pose on the way from one to another: hands and feet that stay where they were, stay. */
export function mixSide(a: SidePose, b: SidePose, part: number): SidePose {
  const between = (x: number, y: number) => x + (y - x) * part;
  return {
    hip: mix(a.hip, b.hip, part),
    lean: between(a.lean, b.lean),
    look: between(a.look ?? a.lean * 0.5, b.look ?? b.lean * 0.5),
    hands: [mixHands(a.hands[0], b.hands[0], part, a, b), mixHands(a.hands[1], b.hands[1], part, a, b)],
    feet: [mix(a.feet[0], b.feet[0], part), mix(a.feet[1], b.feet[1], part)],
    toes: [between(a.toes[0], b.toes[0]), between(a.toes[1], b.toes[1])],
  };
}
