import { type Canvas, createCanvas } from '@napi-rs/canvas';

/** Where a recording was made: the loft itself, or the yard below it. */
export type Place = 'loft' | 'yard';

/** The drawn picture's size in pixels; 1 pixel is 1 cm before zooming. */
export const picture = { width: 480, height: 270 } as const;

const grounds = {
  loft: { wall: '#d9dcd2', far: '#c8ccc0', floor: '#8d998f', tape: '#f2c53d' },
  yard: { wall: '#cfdfe6', far: '#b7c9a6', floor: '#a8a294', tape: '#f2c53d' },
} as const satisfies Record<Place, Record<string, string>>;

/** The empty place, floor tape included. `floorAt` is where feet stand, in pixels from the top. */
export function drawPlace(place: Place, floorAt: number): Canvas {
  const canvas = createCanvas(picture.width, picture.height);
  const g = canvas.getContext('2d');
  const ground = grounds[place];
  const horizon = floorAt - 16;
  g.fillStyle = ground.wall;
  g.fillRect(0, 0, picture.width, picture.height);
  g.fillStyle = ground.far;
  if (place === 'loft') {
    g.fillRect(0, 0, picture.width, 9);
    for (const x of [36, 436]) {
      g.beginPath();
      g.moveTo(x - 6, horizon);
      g.lineTo(x - 6, 0);
      g.lineTo(x + 6, 0);
      g.lineTo(x + 6, horizon);
      g.fill();
    }
    g.fillStyle = '#e8efef';
    g.fillRect(70, 44, 58, 46);
    g.fillStyle = ground.far;
    g.fillRect(97, 44, 4, 46);
    g.fillRect(70, 65, 58, 4);
  } else {
    g.beginPath();
    g.moveTo(0, horizon);
    g.quadraticCurveTo(110, horizon - 74, 230, horizon - 24);
    g.quadraticCurveTo(360, horizon - 86, 480, horizon - 30);
    g.lineTo(480, horizon);
    g.fill();
  }
  g.fillStyle = ground.floor;
  g.fillRect(0, horizon, picture.width, picture.height - horizon);
  g.fillStyle = ground.tape;
  g.fillRect(68, floorAt - 4, 96, 4);
  g.fillRect(318, floorAt + 6, 104, 4);
  return canvas;
}
