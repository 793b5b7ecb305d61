import { randomUUID } from 'node:crypto';
import { mkdir, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { QueryTypes } from 'sequelize';
import { afterAll, describe, expect, it } from 'vitest';
import { networkOf } from '../../server/middleware/limits';
import { database } from '../../server/models/database';
import { limits } from '../../shared/limits';
import { mailTo, makePerson, makeTeamOfFour, startApi, testPassword } from '../support/api';
import { openRunFolder } from '../support/runFolder';

/** Rows of OWASP ASVS 5.0, their numbers beside the checks; on https see securityHttps.test.ts, on sign-ins signIn.test.ts. */

const run = await openRunFolder('client');
const client = path.join(run.folder, 'client');
await mkdir(path.join(client, 'assets'), { recursive: true });
await mkdir(path.join(client, '.git'));
await writeFile(path.join(client, 'index.html'), '<!doctype html><title>The page</title>');
await writeFile(path.join(client, 'assets', 'main-1a2b3c.js'), 'export {};');
await writeFile(path.join(client, '.git', 'config'), 'hidden-repository');
await writeFile(path.join(client, '.env'), 'hidden-environment');
await writeFile(path.join(run.folder, 'outside.txt'), 'hidden-outside');

const metricsToken = 'a-token-for-metrics';
const api = await startApi({ CLIENT_DIR: client, METRICS_TOKEN: metricsToken });
afterAll(async () => {
  await api.close();
  await run.remove();
});

describe('the cookie', () => {
  it('is kept from scripts and from other sites’ requests (3.3.2, 3.3.4)', async () => {
    const person = await makePerson();
    const { headers } = await api.visitor().post('/api/sign-in').send({ email: person.email, password: testPassword });
    const [cookie, ...flags] = String(headers['set-cookie']).split('; ');
    expect(cookie).toMatch(/^tapeline(-\d+)?=s%3A/);
    expect(flags).toEqual(expect.arrayContaining(['HttpOnly', 'SameSite=Lax', 'Path=/']));
    expect(flags.join()).not.toContain('Domain');
  });

  it('is not believed when it was changed', async () => {
    const person = await makePerson();
    const { headers } = await api.visitor().post('/api/sign-in').send({ email: person.email, password: testPassword });
    const cookie = String(headers['set-cookie']).split(';')[0] as string;
    const me = async (value: string) => (await api.visitor().get('/api/me').set('Cookie', value)).body.me;
    expect(await me(cookie)).not.toBeNull();
    expect(await me(cookie.replace(/\.[^.]{4}/, '.AAAA'))).toBeNull();
  });
});

describe('every answer', () => {
  it.each(['/', '/api/me', '/api/nothing', '/api/openapi.json', '/assets/main-1a2b3c.js', '/m/1/x/y/z/name'])(
    'carries the headers that protect a page: %s',
    async (address) => {
      const { headers } = await api.visitor().get(address).set('Origin', 'https://elsewhere.example');
      const policy = new Map(
        String(headers['content-security-policy'])
          .split(';')
          .map((part) => part.trim().split(/ (.*)/) as [string, string]),
      );
      // 3.4.3, 3.4.6
      expect(policy.get('object-src')).toBe("'none'");
      expect(policy.get('base-uri')).toBe("'none'");
      expect(policy.get('frame-ancestors')).toBe("'none'");
      expect(policy.get('script-src')).toBe("'self'");
      expect(policy.get('style-src')).toBe("'self'");
      expect(policy.get('default-src')).toBe("'self'");
      expect(policy.get('connect-src')).toContain(new URL(api.config.store.endpoint ?? '').origin);
      // 3.4.4, 3.4.5, 3.5.8
      expect(headers['x-content-type-options']).toBe('nosniff');
      expect(headers['referrer-policy']).toBe('no-referrer');
      expect(headers['cross-origin-resource-policy']).toBe('same-origin');
      // 3.4.2
      expect(headers['access-control-allow-origin']).toBeUndefined();
      // 13.4
      expect(headers['x-powered-by']).toBeUndefined();
      expect(headers.server).toBeUndefined();
    },
  );

  it('says what it is (4.1.1), and is not kept where it is somebody’s', async () => {
    const browser = await api.signedIn(await makePerson());
    const { headers } = await browser.get('/api/me').expect(200);
    expect(headers['content-type']).toBe('application/json; charset=utf-8');
    expect(headers['cache-control']).toBe('no-store');
    const page = await api.visitor().get('/').expect(200);
    expect(page.headers['content-type']).toBe('text/html; charset=utf-8');
  });

  it('carries a request id; a made-up one with odd characters is not taken', async () => {
    const fine = await api.visitor().get('/api/nothing').set('X-Request-Id', 'abcdef-123456').expect(404);
    expect(fine.get('X-Request-Id')).toBe('abcdef-123456');
    expect(fine.body.error.requestId).toBe('abcdef-123456');
    const odd = await api.visitor().get('/api/nothing').set('X-Request-Id', 'a"}{"b').expect(404);
    expect(odd.get('X-Request-Id')).toMatch(/^[0-9a-f-]{36}$/);
  });
});

describe('another site’s page (3.5.1)', () => {
  it.each([
    [{ 'Sec-Fetch-Site': 'cross-site' }, 403],
    [{ 'Sec-Fetch-Site': 'same-site' }, 403],
    [{ 'Sec-Fetch-Site': 'cross-site', Origin: 'http://127.0.0.1:4310' }, 403],
    [{ Origin: 'https://elsewhere.example' }, 403],
    [{ Origin: 'null' }, 403],
    [{ 'Sec-Fetch-Site': 'same-origin' }, 200],
    [{ Origin: 'http://127.0.0.1:4310' }, 200],
    [{}, 200],
  ])('with %o gets %i', async (headers, status) => {
    const person = await makePerson({ name: 'As Before' });
    const browser = await api.signedIn(person);
    const { body } = await browser.patch('/api/me').set(headers).send({ name: 'Changed' }).expect(status);
    if (status === 403) expect(body.error.code).toBe('crossSite');
    expect((await person.reload()).name).toBe(status === 403 ? 'As Before' : 'Changed');
  });

  it.each(['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x'])(
    'cannot send JSON in a form, as %s',
    async (type) => {
      const person = await makePerson({ name: 'As Before' });
      const browser = await api.signedIn(person);
      await browser.patch('/api/me').set('Content-Type', type).send('{"name":"Changed"}').expect(415);
      expect((await person.reload()).name).toBe('As Before');
    },
  );
});

describe('reading (3.5.3)', () => {
  it('changes nothing, whatever is read', async () => {
    const { team, owner } = await makeTeamOfFour();
    const browser = await api.signedIn(owner);
    const { paths } = (await browser.get('/api/openapi.json').expect(200)).body;
    const before = await everything();
    const reads = Object.keys(paths).filter((each) => 'get' in paths[each] && !each.endsWith('/live'));
    expect(reads.length).toBeGreaterThan(10);
    for (const each of reads) {
      const address = each.replace('{team}', team.slug).replace(/\{\w+Id\}/g, () => randomUUID());
      await browser
        .get(`/api${address}`)
        .query({ q: 'row', _method: 'DELETE' })
        .set('X-HTTP-Method-Override', 'DELETE');
    }
    expect(await everything()).toEqual(before);
  });

  /** A digest of each table; what counts requests and prolongs sign-ins is left out. */
  async function everything() {
    const select = { type: QueryTypes.SELECT } as const;
    const tables = await database().query<{ name: string }>(
      `select tablename as name from pg_tables where schemaname = 'public' and tablename not in ('sign_ins', 'rate_limits') order by 1`,
      select,
    );
    return Promise.all(
      tables.map(async ({ name }) => [
        name,
        await database().query(
          `select md5(string_agg(t::text, '' order by t::text)) as digest from "${name}" t`,
          select,
        ),
      ]),
    );
  }
});

describe('a request that does not fit', () => {
  const post = () => api.visitor().post('/api/sign-in');

  it('is told so when its JSON is broken', async () => {
    for (const text of ['{"email":', '[', 'nonsense', '"text"', '{"email":"a\u0000'])
      expect((await post().set('Content-Type', 'application/json').send(text).expect(400)).body.error.code).toBe(
        'invalid',
      );
  });

  it('is told so when it is empty, a list or null', async () => {
    for (const text of ['', '[]', '{}'])
      expect(
        Object.keys((await post().set('Content-Type', 'application/json').send(text).expect(400)).body.error.fields),
      ).not.toEqual([]);
  });

  it('is told so when it is packed and broken', async () => {
    const broken = post().set('Content-Type', 'application/json').set('Content-Encoding', 'gzip').send('{"a":1}');
    expect((await broken.expect(400)).body.error.code).toBe('invalid');
  });

  it('is refused with 413 when it is too large (5.2.1)', async () => {
    const { body } = await post()
      .send({ email: 'x'.repeat(limits.jsonBytes) })
      .expect(413);
    expect(body.error.code).toBe('tooLarge');
  });

  it('is refused with 415 when it is of another kind (4.1.1)', async () => {
    for (const type of ['text/xml', 'application/x-yaml', 'application/json5'])
      expect((await post().set('Content-Type', type).send('<a/>').expect(415)).body.error.code).toBe('wrongType');
    await post().set('Content-Type', 'application/json; charset=latin1').send('{}').expect(415);
  });

  it('finds nothing at a broken address', async () => {
    for (const address of ['/api/%', '/api/teams/%E0%A4%A', '/api/teams/..%2f..%2fetc', "/api/teams/'%20or%201=1"])
      expect((await (await api.signedIn(await makePerson())).get(address)).status).toBe(404);
  });

  it('leaves nothing behind of a polluted prototype', async () => {
    await post().set('Content-Type', 'application/json').send('{"__proto__":{"role":"owner"},"email":1}').expect(400);
    expect(({} as { role?: string }).role).toBeUndefined();
  });
});

describe('a failure of ours (16.5.1)', () => {
  it('says so and nothing else', async () => {
    const { team, member } = await makeTeamOfFour();
    const browser = await api.signedIn(member);
    await database().query('alter table notices rename to notices_away');
    try {
      const { body, text } = await browser.get(`/api/teams/${team.slug}/notices`).expect(500);
      expect(body).toEqual({
        error: {
          code: 'broken',
          message: 'Something broke on our side. It was noted; try again.',
          requestId: expect.any(String),
        },
      });
      expect(text).not.toMatch(/notices|select|\bat \w|node_modules|Sequelize/i);
    } finally {
      await database().query('alter table notices_away rename to notices');
    }
    await browser.get(`/api/teams/${team.slug}/notices`).expect(200);
  });
});

describe('too many requests (6.3.1)', () => {
  it('get 429 with the time to wait', async () => {
    const browser = api.visitor();
    let refused = await browser.post('/api/sign-out');
    for (let i = 0; i < 125 && refused.status === 200; i++) refused = await browser.post('/api/sign-out');
    expect(refused.status).toBe(429);
    expect(refused.body.error.code).toBe('tooOften');
    expect(Number(refused.get('Retry-After'))).toBeGreaterThan(0);
    expect(Number(refused.get('Retry-After'))).toBeLessThanOrEqual(60);
    await api.visitor().post('/api/sign-out').expect(200);
  });
});

describe('an address', () => {
  it('of IPv6 counts with its whole network (RFC 6177)', async () => {
    const ask = (address: string) => api.visitor().post('/api/forgot-password').set('X-Forwarded-For', address);
    const statuses = new Set<number>();
    for (let i = 1; i <= 61; i++) statuses.add((await ask(`2001:db8:1:2:${i.toString(16)}::${i}`).send({})).status);
    expect([...statuses]).toEqual([400, 429]);
    await ask('2001:db8:1:3::1').send({}).expect(400);
  });

  it.each([
    ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2::/64'],
    ['2001:DB8::1', '2001:db8:0:0::/64'],
    ['2001:db8:1::1.2.3.4', '2001:db8:1:0::/64'],
    ['fe80::1%eth0', 'fe80:0:0:0::/64'],
    ['::1', '0:0:0:0::/64'],
    ['::ffff:10.0.0.7', '10.0.0.7'],
    ['10.0.0.7', '10.0.0.7'],
    [undefined, 'unknown'],
  ])('%s counts as %s', (address, network) => {
    expect(networkOf(address)).toBe(network);
  });
});

describe('the body of a request that is refused anyway', () => {
  it.each([
    ['of nobody', '/api/teams/any/sessions', 401],
    ['to nothing', '/api/nothing', 404],
  ])('is not read: %s', async (_whose, address, status) => {
    await api.visitor().post(address).set('Content-Type', 'application/json').send('{"broken":').expect(status);
  });
});

describe('what lies beside the page (13.4)', () => {
  it.each([
    '/.git/config',
    '/.git/',
    '/.env',
    '/assets/',
    '/assets/../.env',
    '/assets/..%2f.env',
    '/..%2foutside.txt',
    '/assets/%2e%2e/%2e%2e/outside.txt',
    '/package.json',
    '/index.html/../.git/config',
  ])('is not shown: %s', async (address) => {
    const { text } = await api.visitor().get(address).set('Accept', 'text/html');
    expect(text).not.toContain('hidden-');
    expect(text).not.toContain('main-1a2b3c');
    expect(text).not.toContain('"dependencies"');
  });

  it.each([
    ['/assets/nothing.js', {}, 404, 'notFound'],
    ['/assets/.env', {}, 404, 'notFound'],
    ['/assets/%2e%2e%2f%2e%2e%2foutside.txt', {}, 404, 'notFound'],
    ['/assets/main-1a2b3c.js', { Range: 'bytes=99999-' }, 416, 'rangeNotSatisfiable'],
    ['/', { Range: 'bytes=99999-' }, 416, 'rangeNotSatisfiable'],
    ['/assets/main-1a2b3c.js', { 'If-Match': '"another"' }, 400, 'invalid'],
  ])('is refused, and no failure of ours: %s with %o', async (address, headers, status, code) => {
    const { body } = await api.visitor().get(address).set(headers).expect(status);
    expect(body.error).toMatchObject({ code, requestId: expect.any(String) });
  });

  it('is told to machines that hold the token alone', async () => {
    await api.visitor().get('/metrics').expect(404);
    await api.visitor().get('/metrics').set('Authorization', 'Bearer a-token-for-metricz').expect(404);
    const { text } = await api.visitor().get('/metrics').set('Authorization', `Bearer ${metricsToken}`).expect(200);
    expect(text).toContain('http_request_seconds_bucket');
  });

  it('says only yes or no about its parts', async () => {
    expect((await api.visitor().get('/api/health').expect(200)).body).toEqual({ up: true });
    expect((await api.visitor().get('/api/ready').expect(200)).body).toEqual({
      database: true,
      queue: true,
      store: true,
    });
  });
});

describe('links in mail', () => {
  it('lead to the configured address, whatever host a request names', async () => {
    const person = await makePerson();
    await api
      .visitor()
      .post('/api/forgot-password')
      .set({ Host: 'elsewhere.example', 'X-Forwarded-Host': 'elsewhere.example' })
      .send({ email: person.email })
      .expect(202);
    const [mail] = await mailTo(person.email);
    expect(mail?.text).toContain(`${api.config.publicUrl}/new-password#`);
    expect(mail?.text).not.toContain('elsewhere');
  });
});
