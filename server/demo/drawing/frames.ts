import { createCanvas } from '@napi-rs/canvas';
import { type Dress, drawFigure } from './figure';
import { type MotionName, motions } from './motions';
import { drawPlace, type Place, picture } from './place';
import { drawProp } from './props';

/** Drawn pictures a second; the film shows each three times. */
export const picturesPerSecond = 10;
export const pictureMs = 1000 / picturesPerSecond;

/** One loop of a motion, each picture as RGBA bytes (480×270). The same input gives the same bytes. */
export function drawLoop(name: MotionName, dress: Dress, place: Place): Buffer[] {
  const motion = motions[name];
  const zoom = motion.zoom ?? 1.12;
  const floorAt = motion.floorAt ?? 250;
  const empty = drawPlace(place, floorAt);
  const canvas = createCanvas(picture.width, picture.height);
  const g = canvas.getContext('2d');
  const count = Math.round(motion.periodMs / pictureMs);
  return Array.from({ length: count }, (_, i) => {
    const ms = i * pictureMs;
    const joints = motion.jointsAt(ms);
    const props = motion.props?.(joints, ms) ?? [];
    const draw = (layer: 'behind' | 'far' | 'near') => {
      for (const prop of props) if (prop.layer === layer) drawProp(g, prop);
    };
    g.setTransform(1, 0, 0, 1, 0, 0);
    g.drawImage(empty, 0, 0);
    g.setTransform(motion.facesLeftAt?.(ms) ? -zoom : zoom, 0, 0, -zoom, picture.width / 2, floorAt);
    draw('behind');
    drawFigure(g, joints, dress, { far: () => draw('far'), near: () => draw('near') });
    return Buffer.from(canvas.data());
  });
}
