import http from 'node:http';
import https from 'node:https';
import { pipeline } from 'node:stream';
import type { RequestHandler } from 'express';
import { AppError } from '../../shared/errors';
import { madeKey } from '../../storage/keys';
import { mediaPathIsValid } from '../../storage/signing';
import { store } from '../services/context';

const addressSeconds = 3600;
/** presigning costs more than a range's bytes do: an address is used again until shortly before it ends */
const addresses = new Map<string, { url: string; until: number }>();
const agents = {
  'http:': new http.Agent({ keepAlive: true, maxSockets: 256 }),
  'https:': new https.Agent({ keepAlive: true, maxSockets: 256 }),
};

const namePattern = /^[a-z0-9][a-zA-Z0-9._-]{0,120}$/;
const passedOn = ['content-type', 'content-length', 'content-range', 'accept-ranges', 'etag', 'last-modified'] as const;

/**
 * Bytes of the store behind a signed path: `/m/<expiry>/<signature>/<team>/<owner>/<name>`.
 * The store's own answer to Range is passed on; a reader that vanishes ends the store's stream with it.
 */
export function serveMedia(secret: string): RequestHandler {
  return async (req, res) => {
    const { expiry, signature, teamId, ownerId, name } = req.params as Record<string, string>;
    const path = { expiry: expiry ?? '', signature: signature ?? '', teamId: teamId ?? '', ownerId: ownerId ?? '' };
    if (!mediaPathIsValid(secret, path) || !namePattern.test(name ?? '')) throw new AppError('notFound');
    const url = new URL(await addressOf(madeKey(path.teamId, path.ownerId, name as string)));

    // the address is signed for GET; HEAD is answered from the headers of a GET that ends at once
    const upstream = (url.protocol === 'https:' ? https : http).get(url, {
      agent: agents[url.protocol as keyof typeof agents],
      headers: { ...(req.headers.range ? { range: req.headers.range } : {}) },
    });
    res.on('close', () => upstream.destroy());
    await new Promise<void>((resolve, reject) => {
      upstream.on('error', (error) =>
        res.destroyed
          ? resolve()
          : reject(
              new AppError('unavailable', {
                message: error.message ? 'The store does not answer. Try again in a moment.' : '',
              }),
            ),
      );
      upstream.on('response', (bytes) => {
        const status = bytes.statusCode ?? 500;
        if (status === 404 || status === 403) {
          bytes.resume();
          return reject(new AppError('notFound'));
        }
        if (status === 416) {
          bytes.resume();
          const range = bytes.headers['content-range'];
          if (range) res.setHeader('Content-Range', range);
          return reject(new AppError('rangeNotSatisfiable'));
        }
        if (status !== 200 && status !== 206) {
          bytes.resume();
          return reject(new AppError('unavailable'));
        }
        res.status(status);
        for (const header of passedOn) {
          const value = bytes.headers[header];
          if (value !== undefined) res.setHeader(header, value);
        }
        res.setHeader('Accept-Ranges', 'bytes');
        // what lies under a name never changes, and the address ends by itself
        res.setHeader(
          'Cache-Control',
          `private, max-age=${Math.max(0, Math.floor((Number(expiry) - Date.now()) / 1000))}, immutable`,
        );
        res.setHeader('Cross-Origin-Resource-Policy', 'same-origin');
        res.setHeader('Content-Disposition', 'inline');
        if (req.method === 'HEAD') {
          res.end();
          upstream.destroy();
          return resolve();
        }
        // a reader that went away is not an error
        pipeline(bytes, res, () => resolve());
      });
    });
  };
}

async function addressOf(key: string): Promise<string> {
  const known = addresses.get(key);
  if (known && known.until > Date.now()) return known.url;
  if (addresses.size > 5000) addresses.clear();
  const url = await store().presignRead(key, addressSeconds);
  addresses.set(key, { url, until: Date.now() + (addressSeconds - 300) * 1000 });
  return url;
}
