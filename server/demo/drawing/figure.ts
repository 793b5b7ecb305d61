import type { SKRSContext2D } from '@napi-rs/canvas';
import { add, body, type Foot, type Joints, type Limb, mix, type Point, radians } from './body';

/** What somebody wears, so that coaches can be told apart. */
export type Dress = {
  shirt: string;
  sleeve: string;
  legs: string;
  farLegs: string;
  skin: string;
  shoes: string;
  hair: string;
  hairCut: 'bun' | 'short' | 'cap';
};

const ink = '#23292d';

function line(g: SKRSContext2D, points: readonly Point[], width: number, colour: string) {
  g.strokeStyle = colour;
  g.lineWidth = width;
  g.beginPath();
  points.forEach(([x, y], i) => {
    if (i === 0) g.moveTo(x, y);
    else g.lineTo(x, y);
  });
  g.stroke();
}

function drawLeg(g: SKRSContext2D, leg: Limb, foot: Foot, colour: string, shoes: string) {
  line(g, [leg.root, leg.joint], 14, colour);
  line(g, [leg.joint, leg.end], 11.5, colour);
  line(g, [foot.heel, foot.toe], 7, shoes);
}

function drawArm(g: SKRSContext2D, arm: Limb, sleeve: string, skin: string) {
  line(g, [arm.root, arm.joint, arm.end], 8.5, skin);
  line(g, [arm.root, mix(arm.root, arm.joint, 0.62)], 10.5, sleeve);
  g.fillStyle = skin;
  g.beginPath();
  g.arc(arm.end[0], arm.end[1], 5.2, 0, 7);
  g.fill();
}

function drawTorso(g: SKRSContext2D, joints: Joints, dress: Dress) {
  if (joints.view === 'side') {
    line(g, [joints.hip, mix(joints.hip, joints.neck, 0.3)], 17, dress.legs);
    line(g, [mix(joints.hip, joints.neck, 0.2), mix(joints.hip, joints.neck, 0.96)], 19, dress.shirt);
    return;
  }
  const half = Math.max(joints.shoulderHalf, 7);
  const [left, right] = [joints.arms[0].root, joints.arms[1].root];
  line(g, [add(joints.hip, [-5, 2]), add(joints.hip, [5, 2])], 17, dress.legs);
  g.fillStyle = dress.shirt;
  g.strokeStyle = dress.shirt;
  g.lineWidth = 9;
  g.beginPath();
  g.moveTo(left[0] + 2, left[1] - 1);
  g.lineTo(right[0] - 2, right[1] - 1);
  g.lineTo(joints.hip[0] + half * 0.58, joints.hip[1] + 11);
  g.lineTo(joints.hip[0] - half * 0.58, joints.hip[1] + 11);
  g.closePath();
  g.fill();
  g.stroke();
}

function drawHead(g: SKRSContext2D, joints: Joints, dress: Dress) {
  line(g, [joints.neck, joints.head], 8, dress.skin);
  g.save();
  g.translate(joints.head[0], joints.head[1]);
  g.rotate(-radians(joints.headLean));
  const side = joints.view === 'side';
  g.fillStyle = dress.hair;
  if (dress.hairCut === 'bun') {
    g.beginPath();
    g.arc(side ? -11 : 0, side ? 7 : 14, 5.5, 0, 7);
    g.fill();
  }
  g.fillStyle = dress.skin;
  g.strokeStyle = ink;
  g.lineWidth = 2.5;
  g.beginPath();
  g.arc(0, 0, body.head, 0, 7);
  g.fill();
  g.stroke();
  g.fillStyle = dress.hair;
  g.beginPath();
  if (side)
    g.arc(
      0,
      0,
      body.head + 1,
      radians(dress.hairCut === 'short' ? 50 : 35),
      radians(dress.hairCut === 'cap' ? 165 : 225),
    );
  else g.arc(0, 0, body.head + 1, radians(25), radians(155));
  g.closePath();
  g.fill();
  if (dress.hairCut === 'cap')
    line(
      g,
      side
        ? [
            [4, 7],
            [17, 6],
          ]
        : [
            [-9, 6],
            [9, 6],
          ],
      3.5,
      dress.hair,
    );
  if (side) {
    line(
      g,
      [
        [body.head - 0.5, -0.5],
        [body.head + 1.2, -1.6],
      ],
      4,
      dress.skin,
    );
    g.fillStyle = ink;
    g.beginPath();
    g.arc(6, 1.5, 1.5, 0, 7);
    g.fill();
  } else {
    g.fillStyle = ink;
    for (const x of [-4.5, 4.5]) {
      g.beginPath();
      g.arc(x, 1, 1.6, 0, 7);
      g.fill();
    }
    if (joints.talking) {
      g.beginPath();
      g.ellipse(0, -5.5, 3.4, 2.6, 0, 0, 7);
      g.fill();
    } else
      line(
        g,
        [
          [-3.2, -5.5],
          [3.2, -5.5],
        ],
        1.6,
        ink,
      );
  }
  g.restore();
}

/** Far limbs first, so that the near ones lie over them. The context already maps centimetres, y up. */
export function drawFigure(
  g: SKRSContext2D,
  joints: Joints,
  dress: Dress,
  held: { far: () => void; near: () => void },
) {
  g.lineCap = 'round';
  g.lineJoin = 'round';
  const side = joints.view === 'side';
  if (side) drawArm(g, joints.arms[1], dress.sleeve, dress.farLegs);
  held.far();
  drawLeg(g, joints.legs[1], joints.feet[1], side ? dress.farLegs : dress.legs, dress.shoes);
  if (!side) drawLeg(g, joints.legs[0], joints.feet[0], dress.legs, dress.shoes);
  if (side) drawLeg(g, joints.legs[0], joints.feet[0], dress.legs, dress.shoes);
  drawTorso(g, joints, dress);
  drawHead(g, joints, dress);
  if (!side) drawArm(g, joints.arms[1], dress.sleeve, dress.skin);
  drawArm(g, joints.arms[0], dress.sleeve, dress.skin);
  held.near();
}
