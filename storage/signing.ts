import { createHmac, timingSafeEqual } from 'node:crypto';
import { limits } from '../shared/limits';

/**
 * Signed media paths, `/m/<expiry>/<signature>/<team>/<owner>/<name>`: the right to everything made from one recording
 * (or movement), until the expiry. Given out after the sign-in and the policy were checked; a cache needs neither.
 */

/** The end of an address's life in ms; rounded, so that a browser meets the same address again. */
export function mediaExpiry(now = Date.now()): number {
  const { mediaAddressMs, mediaAddressRoundMs } = limits;
  return Math.ceil((now + mediaAddressMs) / mediaAddressRoundMs) * mediaAddressRoundMs;
}

const signatureOf = (secret: string, teamId: string, ownerId: string, expiry: number) =>
  createHmac('sha256', secret).update(`${teamId}/${ownerId}/${expiry}`).digest('base64url');

export function mediaPath(
  secret: string,
  teamId: string,
  ownerId: string,
  name: string,
  expiry = mediaExpiry(),
): string {
  return `/m/${expiry}/${signatureOf(secret, teamId, ownerId, expiry)}/${teamId}/${ownerId}/${name}`;
}

/** Whether a path's signature fits and its time is not over. */
export function mediaPathIsValid(
  secret: string,
  path: { expiry: string; signature: string; teamId: string; ownerId: string },
  now = Date.now(),
): boolean {
  if (!/^\d{13}$/.test(path.expiry)) return false;
  const expiry = Number(path.expiry);
  if (expiry <= now) return false;
  const wanted = Buffer.from(signatureOf(secret, path.teamId, path.ownerId, expiry));
  const given = Buffer.from(path.signature);
  return wanted.length === given.length && timingSafeEqual(wanted, given);
}
