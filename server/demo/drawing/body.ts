/** The figure's measures and its joints. Units are centimetres of a person 175 cm tall; x runs to the right, y up from the floor. */

export type Point = readonly [x: number, y: number];

export const body = {
  head: 12,
  neck: 19,
  torso: 52,
  upperArm: 29,
  forearm: 27,
  thigh: 43,
  shin: 43,
  foot: 15,
  shoulderHalf: 17,
  hipHalf: 9,
} as const;

/** Two bones: where they start, where they bend, where they end. */
export type Limb = { root: Point; joint: Point; end: Point };

/** A foot's sole from heel to toe. */
export type Foot = { heel: Point; toe: Point };

export type Joints = {
  view: 'side' | 'front';
  head: Point;
  /** which way the top of the head points, degrees from up, clockwise */
  headLean: number;
  /** between the shoulders, and between the hips */
  neck: Point;
  hip: Point;
  shoulderHalf: number;
  /** near then far from the side, left then right of the picture from the front */
  arms: readonly [Limb, Limb];
  legs: readonly [Limb, Limb];
  feet: readonly [Foot, Foot];
  talking: boolean;
};

export const add = (a: Point, b: Point): Point => [a[0] + b[0], a[1] + b[1]];
export const mix = (a: Point, b: Point, part: number): Point => [
  a[0] + (b[0] - a[0]) * part,
  a[1] + (b[1] - a[1]) * part,
];
export const distance = (a: Point, b: Point) => Math.hypot(a[0] - b[0], a[1] - b[1]);
export const radians = (degrees: number) => (degrees * Math.PI) / 180;

/** A point at a length from another; degrees from up, clockwise. */
export const towards = (from: Point, degrees: number, length: number): Point => [
  from[0] + Math.sin(radians(degrees)) * length,
  from[1] + Math.cos(radians(degrees)) * length,
];

/**
 * Bends two bones so that their end reaches a point; a point out of reach is approached with the limb straight.
 * @param side 1 bends to the left of the way from root to end (a knee, facing right), −1 to the right (an elbow)
 */
export function reach(root: Point, end: Point, upper: number, lower: number, side: 1 | -1): Limb {
  const away = Math.max(distance(root, end), 0.001);
  const longest = (upper + lower) * 0.999;
  const length = Math.min(away, longest);
  const along: Point = [(end[0] - root[0]) / away, (end[1] - root[1]) / away];
  const before = (upper * upper - lower * lower + length * length) / (2 * length);
  const out = Math.sqrt(Math.max(upper * upper - before * before, 0)) * side;
  return {
    root,
    joint: [root[0] + along[0] * before - along[1] * out, root[1] + along[1] * before + along[0] * out],
    end: [root[0] + along[0] * length, root[1] + along[1] * length],
  };
}
