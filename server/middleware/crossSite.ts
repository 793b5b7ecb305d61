import type { RequestHandler } from 'express';
import { AppError } from '../../shared/errors';

const safe = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses unsafe requests that another site's page made. Browsers say where a request comes from in Sec-Fetch-Site;
 * older ones say it in Origin; a program without either carries no cookies that it did not get itself.
 * Source: ASVS 5.0 3.5.1; W3C Fetch Metadata Request Headers.
 */
export function refuseCrossSite(publicUrl: string): RequestHandler {
  const ours = new URL(publicUrl).origin;
  return (req, _res, next) => {
    if (safe.has(req.method)) return next();
    const site = req.get('sec-fetch-site');
    const origin = req.get('origin');
    const fine =
      site !== undefined
        ? site === 'same-origin' || site === 'none'
        : origin === undefined || origin === ours || origin === `${req.protocol}://${req.get('host')}`;
    next(fine ? undefined : new AppError('crossSite'));
  };
}
