import { isIPv6 } from 'node:net';
import type { RequestHandler } from 'express';
import type pg from 'pg';
import { RateLimiterPostgres, type RateLimiterRes } from 'rate-limiter-flexible';
import type { RateLimit } from '../../shared/contracts/endpoint';
import { AppError } from '../../shared/errors';

/** Points a minute (or the time given) by address, and by account where there is one; counted in PostgreSQL for all processes. */
const buckets = {
  read: { points: 1200, seconds: 60 },
  search: { points: 240, seconds: 60 },
  write: { points: 120, seconds: 60 },
  signIn: { points: 20, seconds: 300 },
  // an owner invites a whole team in one evening
  mail: { points: 60, seconds: 3600 },
} as const satisfies Record<RateLimit, { points: number; seconds: number }>;

/** Tries at one account, from wherever: guessing is slow, and its owner is never locked out for long. */
const perAccount = { points: 8, seconds: 300 };

/** Mails that strangers can have sent to one address. */
const perMailbox = { points: 5, seconds: 3600 };

export type Limits = ReturnType<typeof openLimits>;

export function openLimits(pool: pg.Pool) {
  const open = (keyPrefix: string, { points, seconds }: { points: number; seconds: number }) =>
    new RateLimiterPostgres({
      storeClient: pool,
      storeType: 'client',
      tableName: 'rate_limits',
      tableCreated: true,
      keyPrefix,
      points,
      duration: seconds,
      // rows whose time is over go; the timer holds up no exit
      clearExpiredByTimeout: true,
    });
  const byAddress = Object.fromEntries(
    Object.entries(buckets).map(([name, bucket]) => [name, open(name, bucket)]),
  ) as unknown as Record<RateLimit, RateLimiterPostgres>;
  const byAccount = open('account', perAccount);
  const byMailbox = open('mailbox', perMailbox);

  return {
    /** the first layer of a route's stack */
    layer(bucket: RateLimit): RequestHandler {
      return async (req, _res, next) => {
        await take(byAddress[bucket], networkOf(req.ip));
        next();
      };
    },
    /** @throws AppError `tooOften` when one account's password was tried too often */
    async takeForAccount(email: string): Promise<void> {
      await take(byAccount, email);
    },
    /** @throws AppError `tooOften` when too many mails to one address were asked for, known or not */
    async takeForMailbox(email: string): Promise<void> {
      await take(byMailbox, email);
    },
    async forgetAccount(email: string): Promise<void> {
      await byAccount.delete(email);
    },
  };
}

/** An IPv6 address counts with its whole /64: that many belong to one subscriber (RFC 6177). */
export function networkOf(address = 'unknown'): string {
  const v4 = /^::ffff:([\d.]+)$/i.exec(address)?.[1];
  if (v4) return v4;
  if (!isIPv6(address)) return address;
  const [head = '', tail] = address.replace(/%.*$/, '').toLowerCase().split('::');
  const groups = head === '' ? [] : head.split(':');
  // a tail may end in an IPv4 address, which is two groups
  const last = tail === undefined || tail === '' ? [] : tail.split(':');
  const length = last.length + (tail?.includes('.') ? 1 : 0);
  const all =
    tail === undefined ? groups : [...groups, ...Array(Math.max(0, 8 - groups.length - length)).fill('0'), ...last];
  return `${all
    .slice(0, 4)
    .map((group) => Number.parseInt(group, 16).toString(16))
    .join(':')}::/64`;
}

async function take(limiter: RateLimiterPostgres, key: string): Promise<void> {
  try {
    await limiter.consume(key.slice(0, 200));
  } catch (refusal) {
    if (refusal instanceof Error) throw refusal;
    const retryAfterSeconds = Math.ceil((refusal as RateLimiterRes).msBeforeNext / 1000);
    throw new AppError('tooOften', {
      retryAfterSeconds,
      message: `Too many tries. Wait ${retryAfterSeconds < 90 ? `${retryAfterSeconds} seconds` : `${Math.ceil(retryAfterSeconds / 60)} minutes`} and try again.`,
    });
  }
}
