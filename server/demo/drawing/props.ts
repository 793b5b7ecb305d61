import type { SKRSContext2D } from '@napi-rs/canvas';
import { mix, type Point } from './body';

/** Things of a training room. `layer` says whether the figure is in front of it (`behind`), holds it far or near, in centimetres. */
type Layer = 'behind' | 'far' | 'near';

export type Prop = { layer: Layer } & (
  | { thing: 'box'; left: number; width: number; height: number }
  | { thing: 'wall'; x: number }
  | { thing: 'door'; x: number; handle: number }
  | { thing: 'mat'; left: number; width: number }
  | { thing: 'chair'; left: number }
  | { thing: 'bar'; y: number }
  | { thing: 'ring'; at: Point; top: number }
  | { thing: 'dumbbell'; at: Point; seen: 'along' | 'end' }
  | { thing: 'kettlebell'; at: Point; hangs: number }
  | { thing: 'band' | 'towel'; points: readonly Point[] }
  | { thing: 'rope'; left: Point; right: Point; dip: number }
  | { thing: 'floorTape'; x: number }
  | { thing: 'board' }
  | { thing: 'backpack'; at: Point; lean: number }
);

const ink = '#23292d';
const wood = '#b98f5c';

function path(g: SKRSContext2D, points: readonly Point[], width: number, colour: string) {
  g.strokeStyle = colour;
  g.lineWidth = width;
  g.beginPath();
  points.forEach(([x, y], i) => {
    if (i === 0) g.moveTo(x, y);
    else g.lineTo(x, y);
  });
  g.stroke();
}

function slab(g: SKRSContext2D, x: number, y: number, width: number, height: number, fill: string, edge = ink) {
  g.fillStyle = fill;
  g.strokeStyle = edge;
  g.lineWidth = 3;
  g.beginPath();
  g.rect(x, y, width, height);
  g.fill();
  g.stroke();
}

function disc(g: SKRSContext2D, [x, y]: Point, radius: number, fill: string) {
  g.fillStyle = fill;
  g.beginPath();
  g.arc(x, y, radius, 0, 7);
  g.fill();
}

function drawBoard(g: SKRSContext2D) {
  path(
    g,
    [
      [66, 100],
      [58, -3],
    ],
    4,
    '#7c6a4d',
  );
  path(
    g,
    [
      [116, 100],
      [124, -3],
    ],
    4,
    '#7c6a4d',
  );
  slab(g, 52, 98, 78, 54, '#fbfaf4', '#7c6a4d');
  for (const [i, width] of [46, 58, 38, 52].entries()) {
    path(
      g,
      [
        [60, 142 - i * 11],
        [60 + width, 142 - i * 11],
      ],
      2.6,
      i === 0 ? '#c4452f' : '#59636a',
    );
  }
}

export function drawProp(g: SKRSContext2D, prop: Prop) {
  g.lineCap = 'round';
  g.lineJoin = 'round';
  switch (prop.thing) {
    case 'box':
      slab(g, prop.left, 0, prop.width, prop.height, wood);
      for (const part of [0.33, 0.66]) {
        const y = prop.height * part;
        path(
          g,
          [
            [prop.left + 3, y],
            [prop.left + prop.width - 3, y],
          ],
          1.6,
          '#8d6a40',
        );
      }
      return;
    case 'wall':
      return slab(g, prop.x, -6, 60, 260, '#c9b79b', '#9b8766');
    case 'door':
      slab(g, prop.x, 0, 34, 212, '#8a6f52', '#5d4a36');
      return disc(g, [prop.x + 2, prop.handle], 4, '#e3c25a');
    case 'mat':
      return slab(g, prop.left, -7, prop.width, 6, '#4c8f8a', '#35706c');
    case 'chair':
      path(
        g,
        [
          [prop.left, 0],
          [prop.left + 3, 45],
          [prop.left + 42, 45],
          [prop.left + 45, 0],
        ],
        5,
        '#6b4f35',
      );
      return path(
        g,
        [
          [prop.left + 42, 45],
          [prop.left + 47, 92],
        ],
        5,
        '#6b4f35',
      );
    case 'bar':
      path(
        g,
        [
          [-62, prop.y],
          [-62, 260],
        ],
        5,
        '#5d4a36',
      );
      path(
        g,
        [
          [62, prop.y],
          [62, 260],
        ],
        5,
        '#5d4a36',
      );
      return path(
        g,
        [
          [-74, prop.y],
          [74, prop.y],
        ],
        8,
        '#5d4a36',
      );
    case 'ring':
      path(
        g,
        [
          [prop.at[0], prop.top],
          [prop.at[0], prop.at[1] + 8],
        ],
        2.4,
        '#3b4347',
      );
      g.strokeStyle = '#a9773c';
      g.lineWidth = 4;
      g.beginPath();
      g.arc(prop.at[0], prop.at[1], 8.5, 0, 7);
      return g.stroke();
    case 'dumbbell': {
      const [x, y] = prop.at;
      if (prop.seen === 'end') {
        disc(g, prop.at, 10, '#3c464c');
        return disc(g, prop.at, 4, '#8d979c');
      }
      path(
        g,
        [
          [x - 12, y],
          [x + 12, y],
        ],
        4,
        '#8d979c',
      );
      path(
        g,
        [
          [x - 12, y - 6],
          [x - 12, y + 6],
        ],
        7,
        '#3c464c',
      );
      return path(
        g,
        [
          [x + 12, y - 6],
          [x + 12, y + 6],
        ],
        7,
        '#3c464c',
      );
    }
    case 'kettlebell': {
      const [x, y] = prop.at;
      const turn = (prop.hangs * Math.PI) / 180;
      g.save();
      g.translate(x, y);
      g.rotate(turn);
      g.strokeStyle = '#37424a';
      g.lineWidth = 4;
      g.beginPath();
      g.arc(0, -5, 7, 0, 7);
      g.stroke();
      disc(g, [0, -17], 12.5, '#aeb7ba');
      disc(g, [0, -17], 11, '#37424a');
      disc(g, [0, -17], 4, '#d9573f');
      return g.restore();
    }
    case 'band':
      return path(g, prop.points, 4, '#c4452f');
    case 'towel':
      return path(g, prop.points, 6, '#5f93c9');
    case 'rope': {
      g.strokeStyle = '#c4452f';
      g.lineWidth = 2.6;
      g.beginPath();
      g.moveTo(prop.left[0], prop.left[1]);
      const middle = mix(prop.left, prop.right, 0.5);
      const y = middle[1] + prop.dip * 1.34;
      g.bezierCurveTo(prop.left[0] - 34, y, prop.right[0] + 34, y, prop.right[0], prop.right[1]);
      return g.stroke();
    }
    case 'floorTape':
      g.fillStyle = '#f2c53d';
      g.beginPath();
      g.moveTo(prop.x - 2.5, 16);
      g.lineTo(prop.x + 2.5, 16);
      g.lineTo(prop.x + 4.5, -22);
      g.lineTo(prop.x - 4.5, -22);
      return g.fill();
    case 'board':
      return drawBoard(g);
    case 'backpack':
      g.save();
      g.translate(prop.at[0], prop.at[1]);
      g.rotate((-prop.lean * Math.PI) / 180);
      slab(g, -10, -17, 20, 34, '#6d7f4a', '#4b5933');
      return g.restore();
  }
}
