import { createHash, randomBytes, randomUUID } from 'node:crypto';
import { Op } from 'sequelize';
import { AppError } from '../../shared/errors';
import { enqueue, sendMail } from '../jobs/definitions';
import type { Message } from '../mail/messages';
import { MailLink } from '../models/people';
import { publicUrl } from './context';

/** Links sent by mail: 256 random bits (ASVS 5.0 7.2.3 asks for 128), of which only the SHA-256 is kept; each works once. */

type LinkValues = Pick<MailLink, 'purpose' | 'email' | 'expiresAt'> &
  Partial<Pick<MailLink, 'teamId' | 'personId' | 'name' | 'role' | 'invitedById'>>;

const hashOf = (secret: string) => createHash('sha256').update(secret).digest('hex');

/** Keeps a new link. @returns it with the secret, which is nowhere else */
export async function makeLink(values: LinkValues): Promise<{ link: MailLink; secret: string }> {
  const secret = randomBytes(32).toString('base64url');
  return { link: await MailLink.create({ ...values, secretHash: hashOf(secret) }), secret };
}

/** @throws AppError `linkUsed` for a secret that is unknown, used, replaced or too old: nobody learns which */
export async function findLink(secret: string, purpose: MailLink['purpose']): Promise<MailLink> {
  const link = await MailLink.findOne({
    where: { secretHash: hashOf(secret), purpose, usedAt: null, expiresAt: { [Op.gt]: new Date() } },
  });
  if (!link) throw new AppError('linkUsed');
  return link;
}

/**
 * Takes a link in the surrounding transaction. A second click waits here for the first and then finds it taken.
 * @throws AppError `linkUsed`
 */
export async function takeLink(link: MailLink): Promise<void> {
  const [taken] = await MailLink.update({ usedAt: new Date() }, { where: { id: link.id, usedAt: null } });
  if (taken === 0) throw new AppError('linkUsed');
}

/** The secret is in the fragment, which browsers send to nobody: no log and no referrer keeps it. */
export function linkAddress(page: 'join' | 'new-password', secret: string): string {
  return `${publicUrl()}/${page}#${secret}`;
}

/** Sends a mail by the queue: in a transaction it goes only if that commits. */
export function postMail(message: Message): Promise<void> {
  return enqueue(sendMail, { id: randomUUID(), ...message });
}
