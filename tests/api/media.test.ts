import { randomBytes, randomUUID } from 'node:crypto';
import http from 'node:http';
import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readsInProgress } from '../../server/routes/storeBytes';
import { mediaUrl, store } from '../../server/services/context';
import { madeKey, originalKey } from '../../storage/keys';
import { mediaExpiry, mediaPath } from '../../storage/signing';
import { type Api, startApi } from '../support/api';
import { until } from '../support/worker';

let api: Api;
const teamId = randomUUID();
const recordingId = randomUUID();
const name = 'playback-test.mp4';
const bytes = randomBytes(10_000);

beforeAll(async () => {
  api = await startApi();
  await store().putBytes(madeKey(teamId, recordingId, name), bytes, 'video/mp4');
});
afterAll(() => api.close());

const address = (path = mediaUrl(teamId, recordingId, name)) => `${api.url}${path}`;
const bodyOf = async (answer: Response) => Buffer.from(await answer.arrayBuffer());

/** A request without fetch's own tidying of headers. */
function ask(path: string, headers: Record<string, string>, method = 'GET') {
  return new Promise<{ status: number; headers: http.IncomingHttpHeaders; body: Buffer }>((resolve, reject) => {
    const request = http.request(`${api.url}${path}`, { method, headers }, (answer) => {
      const chunks: Buffer[] = [];
      answer.on('data', (chunk: Buffer) => chunks.push(chunk));
      answer.on('end', () =>
        resolve({ status: answer.statusCode ?? 0, headers: answer.headers, body: Buffer.concat(chunks) }),
      );
    });
    request.on('error', reject);
    request.end();
  });
}

describe('a signed address', () => {
  it('gives the bytes without a sign-in, to this site alone, for as long as it lives', async () => {
    const answer = await fetch(address());
    expect(answer.status).toBe(200);
    expect((await bodyOf(answer)).equals(bytes)).toBe(true);
    expect(answer.headers.get('content-type')).toBe('video/mp4');
    expect(answer.headers.get('content-length')).toBe('10000');
    expect(answer.headers.get('accept-ranges')).toBe('bytes');
    // ASVS 5.0 3.5.8 and 3.4.4
    expect(answer.headers.get('cross-origin-resource-policy')).toBe('same-origin');
    expect(answer.headers.get('x-content-type-options')).toBe('nosniff');
    const lives = Number(/^private, max-age=(\d+), immutable$/.exec(answer.headers.get('cache-control') ?? '')?.[1]);
    expect(lives).toBeGreaterThan(3500);
    expect(lives).toBeLessThanOrEqual(70 * 60);
  });

  it('is refused when it is over, changed, or meant for something else', async () => {
    const other = randomUUID();
    await store().putBytes(madeKey(teamId, other, name), bytes, 'video/mp4');
    await store().putBytes(originalKey(teamId, recordingId, 'upload'), bytes, 'video/mp4');
    const good = mediaUrl(teamId, recordingId, name);
    const [, , expiry = '', signature = ''] = good.split('/');
    const over = Math.floor(Date.now() / 1000) * 1000;
    const later = String(Number(expiry) + 600_000);
    const refused = [
      mediaPath(api.config.mediaSecret, teamId, recordingId, name, over),
      mediaPath('another secret that is long enough too', teamId, recordingId, name),
      good.replace(expiry, later),
      good.replace(signature, `${signature.slice(0, -1)}${signature.endsWith('A') ? 'E' : 'A'}`),
      good.replace(signature, ''),
      // ASVS 5.0 8.2.2: the signature of one recording opens no other, nor another team's
      good.replace(recordingId, other),
      good.replace(teamId, randomUUID()),
      // nothing but what was made, and nothing outside its folder
      good.replace(name, '..%2f..%2f..%2foriginals'),
      good.replace(name, encodeURIComponent(`../../../originals/${teamId}/${recordingId}/upload`)),
      good.replace(name, 'upload'),
      good.replace(name, 'playback-none.mp4'),
      good.replace(name, ''),
      `/m/${expiry}/${signature}/originals/${teamId}/${recordingId}/upload`,
    ];
    for (const path of refused) expect([path, (await ask(path, {})).status]).toEqual([path, 404]);
    for (const path of refused) expect([path, (await ask(path, { range: 'bytes=0-9' })).status]).toEqual([path, 404]);
    expect((await ask(good, {})).status).toBe(200);
  });

  it('stays the same for minutes, so that a browser can keep what it has', () => {
    const start = 1_800_000_000_000;
    expect(mediaExpiry(start + 1)).toBe(mediaExpiry(start + 599_999));
    expect(mediaExpiry(start + 1) - (start + 1)).toBeGreaterThanOrEqual(3_600_000);
  });
});

describe('ranges', () => {
  // RFC 9110, 14.1.2, for a length of 10000
  it.each([
    ['bytes=0-0', 0, 0],
    ['bytes=0-499', 0, 499],
    ['bytes=500-999', 500, 999],
    ['bytes=-500', 9500, 9999],
    ['bytes=9500-', 9500, 9999],
    ['bytes=9500-20000', 9500, 9999],
    ['bytes=-20000', 0, 9999],
  ])('%s gives bytes %i to %i', async (range, start, end) => {
    const answer = await ask(mediaUrl(teamId, recordingId, name), { range });
    expect(answer.status).toBe(206);
    expect(answer.headers['content-range']).toBe(`bytes ${start}-${end}/10000`);
    expect(answer.headers['content-length']).toBe(String(end - start + 1));
    expect(answer.body.equals(bytes.subarray(start, end + 1))).toBe(true);
  });

  // RFC 9110, 14.2: "A server MAY ignore the Range header field"; these it must or may not understand
  it.each(['bytes=0-0,-1', 'bytes= 0-999, 4500-5499, -1000', 'lines=1-2', 'bytes=5-2', 'bytes=x-y'])(
    '%s gives the whole',
    async (range) => {
      const answer = await ask(mediaUrl(teamId, recordingId, name), { range });
      expect(answer.status).toBe(200);
      expect(answer.body.equals(bytes)).toBe(true);
    },
  );

  it.each(['bytes=10000-', 'bytes=20000-20001', 'bytes=-0'])('%s cannot be satisfied', async (range) => {
    const answer = await ask(mediaUrl(teamId, recordingId, name), { range });
    expect(answer.status).toBe(416);
    // RFC 9110, 14.4
    expect(answer.headers['content-range']).toBe('bytes */10000');
    expect(JSON.parse(answer.body.toString()).error.code).toBe('rangeNotSatisfiable');
  });

  it('are ignored where the reader holds something older', async () => {
    const path = mediaUrl(teamId, recordingId, name);
    const whole = await ask(path, {});
    const etag = whole.headers.etag ?? '';
    expect(etag).toMatch(/^"/);
    expect((await ask(path, { range: 'bytes=0-9', 'if-range': etag })).status).toBe(206);
    const older = await ask(path, { range: 'bytes=0-9', 'if-range': '"something else"' });
    expect([older.status, older.body.length]).toEqual([200, 10_000]);
    const held = await ask(path, { 'if-none-match': etag });
    expect([held.status, held.body.length]).toEqual([304, 0]);
  });
});

it('answers HEAD with the headers of GET and no body', async () => {
  const answer = await ask(mediaUrl(teamId, recordingId, name), {}, 'HEAD');
  expect(answer).toMatchObject({ status: 200, headers: { 'content-length': '10000', 'content-type': 'video/mp4' } });
  expect(answer.body).toHaveLength(0);
});

it('holds nothing for readers that went away', async () => {
  const large = 'playback-large.mp4';
  await store().putBytes(madeKey(teamId, recordingId, large), randomBytes(12 * 1024 * 1024), 'video/mp4');
  const path = mediaUrl(teamId, recordingId, large);
  await Promise.all(
    Array.from({ length: 100 }, async (_, i) => {
      // spread out, so that some leave before, some during the answer
      await pause(i * 10);
      const reader = http.get(`${api.url}${path}`, { agent: false });
      reader.on('error', () => undefined);
      await new Promise<void>((resolve) => {
        if (i % 3 === 0) return resolve();
        reader.on('response', (answer) => {
          answer.on('error', () => undefined);
          answer.once('data', () => resolve());
        });
        reader.on('error', () => resolve());
      });
      reader.destroy();
    }),
  );
  await until('all connections to the store free', async () => readsInProgress() === 0, 10_000);
  const whole = await fetch(address());
  expect((await bodyOf(whole)).equals(bytes)).toBe(true);
});
