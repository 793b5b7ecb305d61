import { randomBytes } from 'node:crypto';
import { fileTypeFromBuffer } from 'file-type';
import sharp from 'sharp';
import type * as contract from '../../shared/contracts/movements';
import { setMovementPicture } from '../../shared/contracts/movements';
import { AppError } from '../../shared/errors';
import { madeKey } from '../../storage/keys';
import { afterCommit, currentTransaction, inTransaction } from '../models/database';
import { Movement } from '../models/dictionary';
import type { Actor } from './actor';
import { audit } from './audit';
import { store } from './context';
import { movementOf, present, subject } from './movements';

/** Longest side in pixels: a phone's screen at full width. */
const longestSide = 1280;

/** A phone's photograph has up to 50 million pixels; a small file that unfolds into more is no photograph. ASVS 5.0 5.2.6. */
const mostPixels = 50_000_000;

/**
 * Gives a movement a picture. What is stored is drawn anew from the file's pixels: nothing else of it is kept, neither where it
 * was taken nor what hides behind the picture.
 * @throws AppError `notFound`, `wrongType`, `badFile`
 */
export async function setPicture(actor: Actor, movementId: string, bytes: Buffer): Promise<contract.Movement> {
  await movementOf(actor, movementId);
  const picture = await redrawn(bytes);
  // never a name that was there before: browsers keep what lies under one
  const name = `picture-${randomBytes(8).toString('hex')}.webp`;
  await store().putBytes(madeKey(actor.team.id, movementId, name), picture, 'image/webp');
  try {
    return await inTransaction(() => change(actor, movementId, name));
  } catch (error) {
    removeFromStore(actor, movementId, name);
    throw error;
  }
}

/** @throws AppError `notFound` */
export function removePicture(actor: Actor, movementId: string): Promise<contract.Movement> {
  return inTransaction(() => change(actor, movementId, null));
}

async function change(actor: Actor, movementId: string, name: string | null): Promise<contract.Movement> {
  // holds the row: of two pictures at once the first is seen, and removed, by the second
  const transaction = currentTransaction();
  if (transaction)
    await Movement.findOne({
      where: { id: movementId, teamId: actor.team.id },
      attributes: ['id'],
      lock: transaction.LOCK.UPDATE,
    });
  const movement = await movementOf(actor, movementId);
  const before = movement.pictureName;
  if (before === name) return present(movement);
  await movement.update({ pictureName: name });
  await audit(actor, name ? 'movement.pictureSet' : 'movement.pictureRemoved', subject(movement));
  if (before) afterCommit(() => removeFromStore(actor, movementId, before));
  return present(movement);
}

/** A picture that stays behind takes room and nothing else. */
function removeFromStore(actor: Actor, movementId: string, name: string): void {
  store()
    .remove(madeKey(actor.team.id, movementId, name))
    .catch(() => undefined);
}

async function redrawn(bytes: Buffer): Promise<Buffer> {
  // ASVS 5.0 5.2.2: by what the file is, not by what it says it is
  const type = await fileTypeFromBuffer(bytes);
  if (!type || !setMovementPicture.file?.types.includes(type.mime))
    throw new AppError('wrongType', { message: 'A picture is a JPEG, PNG or WebP file.' });
  try {
    return await sharp(bytes, { limitInputPixels: mostPixels, failOn: 'error', pages: 1 })
      .autoOrient()
      .resize({ width: longestSide, height: longestSide, fit: 'inside', withoutEnlargement: true })
      .webp({ quality: 80 })
      .toBuffer();
  } catch {
    throw new AppError('badFile', {
      message: 'This picture is broken, or has more than 50 million pixels. Choose another one.',
    });
  }
}
