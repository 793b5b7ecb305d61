import { performance } from 'node:perf_hooks';
import { afterAll, describe, expect, it } from 'vitest';
import { AuditEvent, MailLink, Membership, Person } from '../../server/models/people';
import { limits } from '../../shared/limits';
import {
  mailTo,
  makeMember,
  makePerson,
  makeTeam,
  makeTeamOfFour,
  startApi,
  type TeamOfFour,
  testPassword,
} from '../support/api';

const api = await startApi();
afterAll(() => api.close());

const newPassword = 'grub otter violin seventy';
const lastMailTo = async (email: string) => (await mailTo(email)).at(-1);
let strangers = 0;
const strangersAddress = () => `stranger${++strangers}@mail.example`;

async function invite(four: TeamOfFour, email: string, more: object = {}) {
  const owner = await api.signedIn(four.owner);
  const path = `/api/teams/${four.team.slug}/invitations`;
  const { body } = await owner
    .post(path)
    .send({ email, role: 'member', ...more })
    .expect(201);
  return { invitation: body, secret: (await lastMailTo(email))?.secret ?? '' };
}

const accept = (body: object) => api.visitor().post('/api/invitations/accept').send(body);

describe('one’s own account', () => {
  it('gets another name, and only that (ASVS 5.0 15.3.3)', async () => {
    const person = await makePerson();
    const browser = await api.signedIn(person);
    const { body } = await browser
      .patch('/api/me')
      .send({ name: '  Oda Brink ', email: 'other@mail.example', passwordHash: 'x', id: person.id })
      .expect(200);
    expect(body.me).toMatchObject({ name: 'Oda Brink', email: person.email });
    const after = await person.reload();
    expect([after.email, after.name]).toEqual([person.email, 'Oda Brink']);
    await browser.patch('/api/me').send({ name: ' ' }).expect(400);
  });

  it('remembers when the first-use notice was read, the first time', async () => {
    const browser = await api.signedIn(await makePerson());
    const first = (await browser.post('/api/me/notice-read').expect(200)).body.me.noticeReadAt;
    expect(Math.abs(Date.parse(first) - Date.now())).toBeLessThan(60_000);
    expect((await browser.post('/api/me/notice-read').expect(200)).body.me.noticeReadAt).toBe(first);
    expect((await browser.get('/api/me')).body.me.noticeReadAt).toBe(first);
  });
});

describe('changing the password', () => {
  const change = (body: object) => ({ current: testPassword, password: newPassword, ...body });

  // ASVS 5.0 6.2.3
  it('asks for the present one', async () => {
    const browser = await api.signedIn(await makePerson());
    const { body } = await browser
      .post('/api/me/password')
      .send(change({ current: 'a wrong one' }))
      .expect(400);
    expect(Object.keys(body.error.fields)).toEqual(['current']);
  });

  it('signs out elsewhere, goes on here under a new id, and tells by mail', async () => {
    const person = await makePerson();
    const [here, elsewhere] = [await api.signedIn(person), await api.signedIn(person)];
    const before = String((await here.get('/api/me')).get('Set-Cookie')).split(';')[0] as string;
    await here.post('/api/me/password').send(change({})).expect(200);

    expect((await here.get('/api/me')).body.me.id).toBe(person.id);
    expect((await elsewhere.get('/api/me')).body.me).toBeNull();
    // ASVS 5.0 7.2.4
    expect((await api.visitor().get('/api/me').set('Cookie', before)).body.me).toBeNull();
    const signIn = (password: string) => api.visitor().post('/api/sign-in').send({ email: person.email, password });
    await signIn(testPassword).expect(401);
    await signIn(newPassword).expect(200);
    expect((await lastMailTo(person.email))?.subject).toBe('Your password for Tapeline was changed');
    expect(await AuditEvent.count({ where: { actorId: person.id, action: 'account.passwordChanged' } })).toBe(1);
  });

  it.each([
    // ASVS 5.0 6.2.1
    ['too short', 'fourteen chars', 400],
    ['too long', 'ab7 '.repeat(65), 400],
    // ASVS 5.0 6.2.4
    ['a usual one', 'passwordpassword1', 400],
    ['the person’s own name', 'ilva marten ilva marten', 400],
    // ASVS 5.0 6.2.5 and 6.2.9
    ['lower case alone', 'grub otter violin seventy', 200],
    ['64 characters', 'grub otter violin seventy lantern marble fennel quilt bramble oak', 200],
    ['other scripts and signs', '七つの静かなランプが棚の上にある 🌊', 200],
  ])('judges %s', async (_what, password, status) => {
    const browser = await api.signedIn(await makePerson({ name: 'Ilva Marten' }));
    const { body } = await browser.post('/api/me/password').send(change({ password })).expect(status);
    expect(Object.keys(body.error?.fields ?? {})).toEqual(status === 200 ? [] : ['password']);
  });

  it('counts wrong present passwords as tries at the account', async () => {
    const browser = await api.signedIn(await makePerson());
    const codes: number[] = [];
    for (let i = 0; i < 9; i++)
      codes.push((await browser.post('/api/me/password').send(change({ current: `guess ${i}` }))).status);
    expect(codes).toEqual([...Array(8).fill(400), 429]);
  });
});

describe('a forgotten password', () => {
  const ask = (email: string) => api.visitor().post('/api/forgot-password').send({ email });
  const reset = (secret: string, password = newPassword) =>
    api.visitor().post('/api/reset-password').send({ secret, password });

  // ASVS 5.0 6.3.8
  it('answers the same in the same time whether the address is known, and mails only where it is', async () => {
    const person = await makePerson();
    const timed = async (email: string) => {
      const began = performance.now();
      const { body } = await ask(email).expect(202);
      return { body, ms: performance.now() - began };
    };
    const [known, unknown] = [await timed(person.email), await timed('nobody@mail.example')];
    expect(unknown.body).toEqual(known.body);
    // both take the least time; making the link takes less
    expect(Math.min(known.ms, unknown.ms)).toBeGreaterThan(295);
    expect(await mailTo(person.email)).toHaveLength(1);
    expect(await mailTo('nobody@mail.example')).toEqual([]);
  });

  // ASVS 5.0 6.4.1: single use, expiring
  it('is replaced by a link that works once and signs out everywhere', async () => {
    const person = await makePerson();
    const browser = await api.signedIn(person);
    await ask(person.email).expect(202);
    const mail = await lastMailTo(person.email);
    expect(mail?.text).toContain(`${api.config.publicUrl}/new-password#${mail?.secret}`);
    const { body } = await reset(mail?.secret ?? '', 'passwordpassword1').expect(400);
    expect(Object.keys(body.error.fields)).toEqual(['password']);
    await reset(mail?.secret ?? '').expect(200);
    expect((await browser.get('/api/me')).body.me).toBeNull();
    await api.visitor().post('/api/sign-in').send({ email: person.email, password: newPassword }).expect(200);
    const again = await reset(mail?.secret ?? '', 'another quiet morning walk').expect(404);
    expect(again.body.error.code).toBe('linkUsed');
  });

  it('keeps only a hash of the link’s secret, of 256 bits (ASVS 5.0 7.2.3)', async () => {
    const person = await makePerson();
    await ask(person.email).expect(202);
    const secret = (await lastMailTo(person.email))?.secret ?? '';
    expect(Buffer.from(secret, 'base64url')).toHaveLength(32);
    const row = await MailLink.findOne({ where: { personId: person.id }, raw: true });
    expect(JSON.stringify(row)).not.toContain(secret);
  });

  it('ends an older link with a newer one, and each after its time', async () => {
    const person = await makePerson();
    await ask(person.email).expect(202);
    const first = (await lastMailTo(person.email))?.secret ?? '';
    await ask(person.email).expect(202);
    const second = (await lastMailTo(person.email))?.secret ?? '';
    await reset(first).expect(404);
    await MailLink.update({ expiresAt: new Date(Date.now() - 1000) }, { where: { personId: person.id } });
    await reset(second).expect(404);
    await api.signedIn(person);
  });

  it('is one link after two requests at once, and is used once by two clicks at once', async () => {
    const person = await makePerson();
    await Promise.all([ask(person.email).expect(202), ask(person.email).expect(202)]);
    expect(await MailLink.count({ where: { personId: person.id } })).toBe(1);
    const secrets = (await mailTo(person.email)).map((mail) => mail.secret);
    const statuses = await Promise.all(
      secrets.flatMap((secret) => [reset(secret), reset(secret)]).map(async (answer) => (await answer).status),
    );
    expect(statuses.toSorted()).toEqual([200, 404, 404, 404]);
  });

  it('fills nobody’s mailbox: five an hour, known or not', async () => {
    for (const email of [(await makePerson()).email, 'flooded@mail.example']) {
      const codes: number[] = [];
      for (let i = 0; i < 6; i++) codes.push((await ask(email)).status);
      expect(codes).toEqual([202, 202, 202, 202, 202, 429]);
    }
  });
});

describe('an invitation', () => {
  it('is a mail with a link, which tells a stranger what it is for and lets them in, signed in', async () => {
    const four = await makeTeamOfFour();
    const email = strangersAddress();
    const { invitation, secret } = await invite(four, email, { name: 'Oda Brink', role: 'editor' });
    expect(invitation).toMatchObject({ email, name: 'Oda Brink', role: 'editor', invitedBy: 'The owner' });
    const days = (Date.parse(invitation.expiresAt) - Date.now()) / 86_400_000;
    expect(days).toBeCloseTo(limits.inviteHours / 24, 2);
    const mail = await lastMailTo(email);
    expect(mail?.subject).toBe(`The owner invites you to ${four.team.name}`);
    expect(mail?.text).toContain(`${api.config.publicUrl}/join#${secret}`);

    const read = await api.visitor().post('/api/invitations/read').send({ secret }).expect(200);
    expect(read.body).toEqual({ team: four.team.name, email, name: 'Oda Brink', role: 'editor', hasAccount: false });

    const browser = api.visitor();
    const joined = await browser
      .post('/api/invitations/accept')
      .send({ secret, name: 'Oda B. Brink', password: newPassword, role: 'owner' })
      .expect(200);
    expect(joined.body.teamSlug).toBe(four.team.slug);
    expect(joined.body.me).toMatchObject({
      email,
      name: 'Oda B. Brink',
      teams: [{ slug: four.team.slug, name: four.team.name, role: 'editor' }],
    });
    expect((await browser.get('/api/me')).body.me.email).toBe(email);
    const person = await Person.findOne({ where: { email } });
    // OWASP password storage cheat sheet
    expect(person?.passwordHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(await AuditEvent.count({ where: { action: 'person.joined', subjectId: person?.id ?? '' } })).toBe(1);
  });

  it('works once (ASVS 5.0 6.4.1), also for two clicks at once', async () => {
    const email = strangersAddress();
    const { secret } = await invite(await makeTeamOfFour(), email);
    const body = { secret, name: 'Oda Brink', password: newPassword };
    const answers = await Promise.all([accept(body), accept(body)]);
    expect(answers.map((answer) => answer.status).toSorted()).toEqual([200, 404]);
    const { body: again } = await accept(body).expect(404);
    expect(again.error.code).toBe('linkUsed');
    await api.visitor().post('/api/invitations/read').send({ secret }).expect(404);
    const person = await Person.findOne({ where: { email } });
    expect(await Membership.count({ where: { personId: person?.id ?? '' } })).toBe(1);
  });

  it('survives a body that does not fit, with the fields at fault', async () => {
    const { secret } = await invite(await makeTeamOfFour(), strangersAddress());
    const faults = async (body: object) =>
      Object.keys((await accept({ secret, ...body }).expect(400)).body.error.fields);
    expect(await faults({ password: newPassword })).toEqual(['name']);
    expect(await faults({ name: 'Oda Brink', password: 'short' })).toEqual(['password']);
    expect(await faults({ name: 'Oda Brink', password: 'Oda Brink, Oda Brink 1' })).toEqual(['password']);
    await accept({ secret, name: 'Oda Brink', password: newPassword }).expect(200);
  });

  it('is joined with the password of an account that is there already, and no other', async () => {
    const four = await makeTeamOfFour();
    const person = await makeMember(await makeTeam({ name: 'Elsewhere' }), 'coach', { name: 'Runa Feld' });
    const { secret } = await invite(four, person.email, { name: 'Somebody Else' });
    expect((await lastMailTo(person.email))?.text).toContain('the password that you have already');
    const read = await api.visitor().post('/api/invitations/read').send({ secret }).expect(200);
    expect(read.body).toMatchObject({ name: 'Runa Feld', hasAccount: true });
    const { body: refused } = await accept({ secret, name: 'New Name', password: newPassword }).expect(401);
    expect(refused.error.code).toBe('wrongSignIn');
    const { body } = await accept({ secret, name: 'New Name', password: testPassword }).expect(200);
    expect(body.me).toMatchObject({ name: 'Runa Feld' });
    expect(body.me.teams.map((team: { role: string }) => team.role).toSorted()).toEqual(['coach', 'member']);
    await api.signedIn(person);
  });

  it('is replaced by a second one to the same address', async () => {
    const four = await makeTeamOfFour();
    const email = strangersAddress();
    const first = await invite(four, email);
    const second = await invite(four, email, { role: 'coach' });
    const owner = await api.signedIn(four.owner);
    const { body } = await owner.get(`/api/teams/${four.team.slug}/invitations`).expect(200);
    expect(body.items).toEqual([second.invitation]);
    await accept({ secret: first.secret, name: 'Oda Brink', password: newPassword }).expect(404);
    const joined = await accept({ secret: second.secret, name: 'Oda Brink', password: newPassword }).expect(200);
    expect(joined.body.me.teams[0].role).toBe('coach');
    expect((await owner.get(`/api/teams/${four.team.slug}/invitations`)).body.items).toEqual([]);
  });

  it('is useless once revoked, and after its time', async () => {
    const four = await makeTeamOfFour();
    const owner = await api.signedIn(four.owner);
    const path = `/api/teams/${four.team.slug}/invitations`;
    const revoked = await invite(four, strangersAddress());
    await owner.delete(`${path}/${revoked.invitation.id}`).expect(200);
    await owner.delete(`${path}/${revoked.invitation.id}`).expect(404);
    await api.visitor().post('/api/invitations/read').send({ secret: revoked.secret }).expect(404);

    const old = await invite(four, strangersAddress());
    await MailLink.update({ expiresAt: new Date(Date.now() - 1000) }, { where: { id: old.invitation.id } });
    await accept({ secret: old.secret, name: 'Oda Brink', password: newPassword }).expect(404);
    expect((await owner.get(path)).body.items).toEqual([]);
  });

  it('is refused for somebody who is in the team already', async () => {
    const four = await makeTeamOfFour();
    const owner = await api.signedIn(four.owner);
    const { body } = await owner
      .post(`/api/teams/${four.team.slug}/invitations`)
      .send({ email: four.member.email, role: 'coach' })
      .expect(409);
    expect(body.error.code).toBe('alreadyMember');
    expect(await mailTo(four.member.email)).toEqual([]);
  });

  it('of another team is not there to revoke', async () => {
    const { invitation } = await invite(await makeTeamOfFour(), strangersAddress());
    const other = await makeTeamOfFour();
    const owner = await api.signedIn(other.owner);
    await owner.delete(`/api/teams/${other.team.slug}/invitations/${invitation.id}`).expect(404);
    expect(await MailLink.count({ where: { id: invitation.id } })).toBe(1);
  });

  it('never opens the other kind of door', async () => {
    const person = await makePerson();
    await api.visitor().post('/api/forgot-password').send({ email: person.email }).expect(202);
    const ofReset = (await lastMailTo(person.email))?.secret ?? '';
    await accept({ secret: ofReset, name: 'Oda Brink', password: newPassword }).expect(404);
    const { secret } = await invite(await makeTeamOfFour(), strangersAddress());
    await api.visitor().post('/api/reset-password').send({ secret, password: newPassword }).expect(404);
  });
});
