import { performance } from 'node:perf_hooks';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '../../server/models/database';
import type { Person } from '../../server/models/people';
import { limits } from '../../shared/limits';
import {
  makeMember,
  makeMembership,
  makePerson,
  makeTeam,
  makeTeamOfFour,
  startApi,
  testPassword,
  type Visitor,
} from '../support/api';

const api = await startApi();
afterAll(() => api.close());

const signIn = (browser: Visitor, email: string, password: string) =>
  browser.post('/api/sign-in').send({ email, password });

const isSignedIn = async (browser: Visitor) => (await browser.get('/api/me').expect(200)).body.me !== null;

/** The session id in a cookie: "s:<id>.<signature>". */
function sessionIdOf(setCookie: unknown): string | undefined {
  return /tapeline(?:-\d+)?=s%3A([^.]+)\./.exec(String(setCookie))?.[1];
}

function signInRows(person: Person) {
  return database().query<{ sid: string }>(`select sid from sign_ins where sess -> 'passport' ->> 'user' = :id`, {
    replacements: { id: person.id },
    type: QueryTypes.SELECT,
  });
}

describe('sign-in', () => {
  it('answers who one is, with one’s teams and roles', async () => {
    const [north, south] = [await makeTeam({ name: 'North Loft' }), await makeTeam({ name: 'South Loft' })];
    const person = await makeMember(south, 'coach');
    await person.reload();
    const browser = api.visitor();
    const { body } = await signIn(browser, person.email, testPassword).expect(200);
    expect(body).toEqual({
      me: {
        id: person.id,
        name: person.name,
        email: person.email,
        noticeReadAt: null,
        teams: [{ slug: south.slug, name: 'South Loft', role: 'coach' }],
      },
    });
    expect((await browser.get('/api/me').expect(200)).body).toEqual(body);
    await browser.get(`/api/teams/${north.slug}`).expect(404);
  });

  it('takes an address in any case, with spaces around it', async () => {
    const person = await makePerson();
    await signIn(api.visitor(), `  ${person.email.toUpperCase()} `, testPassword).expect(200);
  });

  it('answers null to somebody who is not signed in', async () => {
    expect((await api.visitor().get('/api/me').expect(200)).body).toEqual({ me: null });
  });

  // ASVS 5.0 6.3.8
  it('says the same of a wrong password and of an unknown address', async () => {
    const person = await makePerson();
    const wrong = await signIn(api.visitor(), person.email, 'another password').expect(401);
    const unknown = await signIn(api.visitor(), 'nobody@mail.example', 'another password').expect(401);
    const { requestId: _, ...ofWrong } = wrong.body.error;
    const { requestId: __, ...ofUnknown } = unknown.body.error;
    expect(ofUnknown).toEqual(ofWrong);
    expect(ofWrong.code).toBe('wrongSignIn');
    expect(ofWrong.fields).toBeUndefined();
  });

  // ASVS 5.0 6.3.8; hashing takes tens of milliseconds, everything else a few: an answer without it would be several times faster
  it('hashes for an unknown address too', async () => {
    const person = await makePerson();
    const timed = async (email: string) => {
      const began = performance.now();
      await signIn(api.visitor(), email, 'another password').expect(401);
      return performance.now() - began;
    };
    await timed('nobody@mail.example');
    const known: number[] = [];
    const unknown: number[] = [];
    for (let i = 0; i < 7; i++) {
      known.push(await timed(person.email));
      unknown.push(await timed(`nobody${i}@mail.example`));
    }
    expect(Math.min(...unknown)).toBeGreaterThan(Math.min(...known) / 2);
  });

  it('cuts nothing off a password (ASVS 5.0 6.2.8)', async () => {
    const person = await makePerson();
    await signIn(api.visitor(), person.email, `${testPassword} `).expect(401);
    await signIn(api.visitor(), person.email, testPassword.slice(0, -1)).expect(401);
  });

  it('marks the fields of a body that does not fit', async () => {
    const { body } = await api.visitor().post('/api/sign-in').send({ email: 5 }).expect(400);
    expect(Object.keys(body.error.fields).toSorted()).toEqual(['email', 'password']);
  });

  it('refuses an address that no database can hold', async () => {
    const { body } = await signIn(api.visitor(), 'a\u0000@mail.example', testPassword).expect(400);
    expect(body.error.code).toBe('invalid');
  });
});

describe('throttling', () => {
  // ASVS 5.0 6.3.1
  it('stops guessing at one account from many addresses, says how long, and leaves others alone', async () => {
    const person = await makePerson();
    const codes: number[] = [];
    for (let i = 0; i < 9; i++) codes.push((await signIn(api.visitor(), person.email, `guess ${i}`)).status);
    expect(codes.slice(0, 8)).toEqual(Array(8).fill(401));
    expect(codes[8]).toBe(429);
    const refused = await signIn(api.visitor(), person.email, testPassword).expect(429);
    expect(Number(refused.get('Retry-After'))).toBeGreaterThan(0);
    expect(refused.body.error.code).toBe('tooOften');
    await api.signedIn(await makePerson());
  });

  it('stops guessing from one address at many accounts', async () => {
    const browser = api.visitor();
    const codes: number[] = [];
    for (let i = 0; i < 21; i++)
      codes.push((await browser.post('/api/invitations/read').send({ secret: `${i}`.padEnd(43, 'x') })).status);
    expect(codes.slice(0, 20)).toEqual(Array(20).fill(404));
    const refused = await signIn(browser, (await makePerson()).email, testPassword).expect(429);
    expect(codes[20]).toBe(429);
    expect(Number(refused.get('Retry-After'))).toBeGreaterThan(0);
  });

  it('forgets the wrong tries after a right one', async () => {
    const person = await makePerson();
    for (let round = 0; round < 2; round++) {
      for (let i = 0; i < 6; i++) await signIn(api.visitor(), person.email, `guess ${i}`).expect(401);
      await signIn(api.visitor(), person.email, testPassword).expect(200);
    }
  });
});

describe('a sign-in’s life', () => {
  let person: Person;
  beforeAll(async () => {
    person = await makePerson();
  });

  // ASVS 5.0 7.2.4
  it('begins under a new session id each time', async () => {
    const browser = api.visitor();
    const first = sessionIdOf((await signIn(browser, person.email, testPassword)).get('Set-Cookie'));
    const second = sessionIdOf((await signIn(browser, person.email, testPassword)).get('Set-Cookie'));
    expect(first).toMatch(/^[\w-]{32}$/);
    expect(second).toMatch(/^[\w-]{32}$/);
    expect(second).not.toBe(first);
    expect((await signInRows(person)).map((row) => row.sid)).not.toContain(first);
  });

  it('keeps no row for somebody who never signs in', async () => {
    const answer = await api.visitor().get('/api/me');
    expect(answer.get('Set-Cookie')).toBeUndefined();
  });

  // ASVS 5.0 7.4.1
  it('is dead after signing out, for a copied cookie too', async () => {
    const browser = api.visitor();
    const { headers } = await signIn(browser, person.email, testPassword).expect(200);
    const cookie = String(headers['set-cookie']).split(';')[0] as string;
    const copy = () => api.visitor().get('/api/me').set('Cookie', cookie);
    expect((await copy()).body.me).not.toBeNull();
    const out = await browser.post('/api/sign-out').expect(200);
    expect(String(out.get('Set-Cookie'))).toContain('Expires=Thu, 01 Jan 1970');
    expect((await copy()).body.me).toBeNull();
  });

  it('signing out twice is fine', async () => {
    const browser = await api.signedIn(person);
    await browser.post('/api/sign-out').expect(200);
    await browser.post('/api/sign-out').expect(200);
  });

  it('ends on every device when one asks for that, and for nobody else', async () => {
    const [phone, laptop] = [await api.signedIn(person), await api.signedIn(person)];
    const other = await api.signedIn(await makePerson());
    await phone.post('/api/sign-out-everywhere').expect(200);
    expect(await isSignedIn(phone)).toBe(false);
    expect(await isSignedIn(laptop)).toBe(false);
    expect(await isSignedIn(other)).toBe(true);
    expect(await signInRows(person)).toEqual([]);
  });

  // ASVS 5.0 7.3: idle and absolute expiry
  it('ends for good after its longest time, however often it is used', async () => {
    const old = await makePerson();
    const browser = await api.signedIn(old);
    const since = Date.now() - limits.sessionMaxDays * 86_400_000 - 1000;
    await database().query(
      `update sign_ins set sess = jsonb_set(sess::jsonb, '{signedInAt}', to_jsonb(:since::bigint))::json
       where sess -> 'passport' ->> 'user' = :id`,
      { replacements: { id: old.id, since } },
    );
    expect(await isSignedIn(browser)).toBe(false);
    expect(await signInRows(old)).toEqual([]);
  });

  it('ends when it was not used for long, and the next sign-in removes its row', async () => {
    const idle = await makePerson();
    const browser = await api.signedIn(idle);
    await database().query(
      `update sign_ins set expire = now() - interval '1 minute' where sess -> 'passport' ->> 'user' = :id`,
      { replacements: { id: idle.id } },
    );
    expect(await isSignedIn(browser)).toBe(false);
    await api.signedIn(await makePerson());
    expect(await signInRows(idle)).toEqual([]);
  });

  it('is prolonged by use', async () => {
    const browser = await api.signedIn(person);
    const { headers } = await browser.get('/api/me').expect(200);
    const until = Date.parse(/Expires=([^;]+)/.exec(String(headers['set-cookie']))?.[1] ?? '');
    expect(until - Date.now()).toBeGreaterThan((limits.sessionIdleDays - 1) * 86_400_000);
  });
});

describe('a right that was taken away', () => {
  // ASVS 5.0 8.3.2
  it('is gone at the next request when the role is lowered', async () => {
    const four = await makeTeamOfFour();
    const second = await makeMember(four.team, 'owner');
    const [owner, lowered] = [await api.signedIn(four.owner), await api.signedIn(second)];
    const people = `/api/teams/${four.team.slug}/people`;
    await lowered.get(people).expect(200);
    await owner.patch(`${people}/${second.id}`).send({ role: 'member' }).expect(200);
    await lowered.get(people).expect(403);
    await lowered.get(`/api/teams/${four.team.slug}`).expect(200);
  });

  // ASVS 5.0 7.4.2
  it('is gone at the next request when the person is taken out; their other team stays', async () => {
    const four = await makeTeamOfFour();
    const elsewhere = await makeTeam();
    const { coach, team } = four;
    await makeMembership(elsewhere, coach, 'member');
    const [owner, removed] = [await api.signedIn(four.owner), await api.signedIn(coach)];
    await owner.delete(`/api/teams/${team.slug}/people/${coach.id}`).expect(200);
    await removed.get(`/api/teams/${team.slug}`).expect(404);
    await removed.get(`/api/teams/${elsewhere.slug}`).expect(200);
  });
});
