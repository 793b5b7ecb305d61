import type { IncomingMessage } from 'node:http';
import { pipeline } from 'node:stream';
import type { Request, RequestHandler, Response } from 'express';
import { AppError } from '../../shared/errors';
import { madeKey } from '../../storage/keys';
import { mediaPathIsValid } from '../../storage/signing';
import { store } from '../services/context';
import { openBytes } from './storeBytes';

const namePattern = /^[a-z0-9][a-zA-Z0-9._-]{0,120}$/;
const passedOn = ['content-type', 'content-length', 'content-range', 'etag', 'last-modified'] as const;

/**
 * Bytes of the store behind a signed path: `/m/<expiry>/<signature>/<team>/<owner>/<name>`.
 * The store's own answer to Range is passed on; a reader that vanishes ends the store's stream with it.
 */
export function serveMedia(secret: string): RequestHandler {
  return async (req, res) => {
    const { expiry = '', signature = '', teamId = '', ownerId = '', name = '' } = req.params as Record<string, string>;
    if (!mediaPathIsValid(secret, { expiry, signature, teamId, ownerId }) || !namePattern.test(name))
      throw new AppError('notFound');
    // what lies under a name never changes, and the address ends by itself
    const seconds = Math.max(0, Math.floor((Number(expiry) - Date.now()) / 1000));
    res.setHeader('Cache-Control', `private, max-age=${seconds}, immutable`);
    res.setHeader('Accept-Ranges', 'bytes');
    res.setHeader('Cross-Origin-Resource-Policy', 'same-origin');

    const gone = new AbortController();
    res.on('close', () => gone.abort());
    try {
      const key = madeKey(teamId, ownerId, name);
      const bytes = await askedBytes(req, key, gone.signal);
      if (bytes.statusCode === 416) await refuseRange(bytes, key, res);
      await pass(bytes, req, res);
    } catch (error) {
      // a reader that went away is not an error
      if (!gone.signal.aborted) throw error;
    }
  };
}

/**
 * RFC 9110, 13.1.5: "If the validator does not match, the recipient SHOULD ignore the Range header field".
 * The store doesn't know If-Range, so the answer's own ETag is compared.
 */
async function askedBytes(req: Request, key: string, signal: AbortSignal): Promise<IncomingMessage> {
  const range = req.method === 'GET' ? req.headers.range : undefined;
  const bytes = await openBytes(key, range, signal);
  const validator = req.headers['if-range'];
  if (range === undefined || validator === undefined || validator === bytes.headers.etag) return bytes;
  bytes.destroy();
  return openBytes(key, undefined, signal);
}

/** RFC 9110, 15.5.17: the answer says how long the whole is; not every store does. */
async function refuseRange(bytes: IncomingMessage, key: string, res: Response): Promise<never> {
  bytes.resume();
  const size = (await store().head(key))?.sizeBytes;
  if (size !== undefined) res.setHeader('Content-Range', `bytes */${size}`);
  throw new AppError('rangeNotSatisfiable');
}

async function pass(bytes: IncomingMessage, req: Request, res: Response): Promise<void> {
  const status = bytes.statusCode ?? 500;
  if (status !== 200 && status !== 206) {
    bytes.resume();
    throw new AppError(status === 404 || status === 403 ? 'notFound' : 'unavailable');
  }
  for (const header of passedOn) {
    const value = bytes.headers[header];
    if (value !== undefined) res.setHeader(header, value);
  }
  res.setHeader('Content-Disposition', 'inline');
  const unchanged = status === 200 && bytes.headers.etag !== undefined && isHeld(req, bytes.headers.etag);
  if (unchanged || req.method === 'HEAD') {
    bytes.destroy();
    if (unchanged) res.removeHeader('Content-Length');
    res.status(unchanged ? 304 : 200).end();
    return;
  }
  res.status(status);
  await new Promise<void>((resolve) => pipeline(bytes, res, () => resolve()));
}

/** RFC 9110, 13.1.2: the reader holds this already. */
const isHeld = (req: Request, etag: string) =>
  (req.get('if-none-match') ?? '').split(',').some((held) => held.trim().replace(/^W\//, '') === etag);
