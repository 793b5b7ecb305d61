import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { KitItem } from '../../server/models/dictionary';
import { AuditEvent, Team } from '../../server/models/people';
import {
  type Api,
  makeMember,
  makeMembership,
  makeTeamOfFour,
  startApi,
  type TeamOfFour,
  type Visitor,
} from '../support/api';
import { makeKitItem } from '../support/library';

let api: Api;
let ours: TeamOfFour;
let theirs: TeamOfFour;
let coach: Visitor;
let member: Visitor;

beforeAll(async () => {
  api = await startApi();
  [ours, theirs] = [await makeTeamOfFour(), await makeTeamOfFour()];
  [coach, member] = [await api.signedIn(ours.coach), await api.signedIn(ours.member)];
});
afterAll(() => api.close());

const at = (path: string, { team } = ours) => `/api/teams/${team.slug}/${path}`;
const rope = { name: 'rope', otherNames: ['skipping rope'], withoutText: 'no rope', loadMatters: false };
const versionOf = async () => (await Team.findByPk(ours.team.id, { rejectOnEmpty: true }))?.dictionaryVersion ?? -1;

describe('the team’s kit', () => {
  it('is listed by name in any case, and only the team’s own', async () => {
    await makeKitItem(theirs.team, 'their rower');
    for (const name of ['sled', 'Band', 'anvil']) await makeKitItem(ours.team, name);
    const { body } = await member.get(at('kit')).expect(200);
    expect(body.items.map((item: KitItem) => item.name)).toEqual(['anvil', 'Band', 'sled']);
  });

  it('takes no name twice, whatever signs it has', async () => {
    const odd = { ...rope, name: "5 $1 'rope' \\ :id" };
    await coach.post(at('kit')).send(odd).expect(201);
    expect((await coach.post(at('kit')).send(odd).expect(409)).body.error.code).toBe('nameTaken');
  });

  it('grows by an item, once: a double click is told that it is there', async () => {
    const before = await versionOf();
    const answers = await Promise.all([coach.post(at('kit')).send(rope), coach.post(at('kit')).send(rope)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
    expect(answers.find(({ status }) => status === 409)?.body.error).toMatchObject({
      code: 'nameTaken',
      fields: { name: expect.stringContaining('rope') },
    });
    expect(await KitItem.count({ where: { teamId: ours.team.id, name: 'rope' } })).toBe(1);
    expect(await versionOf()).toBe(before + 1);
    await coach
      .post(at('kit'))
      .send({ ...rope, name: 'ROPE' })
      .expect(409);
  });

  it('changes an item for the one who read it last, and says what is there to the other', async () => {
    const item = (await coach.post(at('kit')).send({ name: 'crate', withoutText: 'no crate' }).expect(201)).body;
    const change = { name: 'box', otherNames: ['crate'], withoutText: 'no box', loadMatters: false, version: 1 };
    await coach
      .put(at(`kit/${item.id}`))
      .send(change)
      .expect(200);
    const { body } = await coach
      .put(at(`kit/${item.id}`))
      .send({ ...change, name: 'step' })
      .expect(409);
    expect(body.error).toMatchObject({ code: 'stale', current: { name: 'box', version: 2 } });
    await coach
      .put(at(`kit/${item.id}`))
      .send({ ...change, name: 'Sled', version: 2 })
      .expect(409);
    const [event] = await AuditEvent.findAll({ where: { subjectId: item.id, action: 'kitItem.changed' } });
    expect(event?.details).toEqual({ from: 'crate', to: 'box' });
  });

  it('is not another team’s to change', async () => {
    const item = await makeKitItem(theirs.team, 'their rings');
    await coach
      .put(at(`kit/${item.id}`))
      .send({ ...rope, name: 'mine', version: 1 })
      .expect(404);
    await coach
      .put(at(`kit/${item.id}`, theirs))
      .send({ ...rope, name: 'mine', version: 1 })
      .expect(404);
    expect((await item.reload()).name).toBe('their rings');
  });

  it('is not a member’s to change', async () => {
    await member
      .post(at('kit'))
      .send({ ...rope, name: 'trapeze' })
      .expect(403);
  });
});

describe('one’s own kit', () => {
  const kitUnknown = async (browser: Visitor) => (await browser.get(at('my-day')).expect(200)).body.kitUnknown;

  it('is kept with counts and loads, and is nobody else’s', async () => {
    const bell = await makeKitItem(ours.team, 'kettlebell');
    const items = [{ kitItemId: bell.id, count: 2, loadsKg: [8, 12.5] }];
    await member.put(at('my-kit')).send({ items }).expect(200, { items });
    await member.get(at('my-kit')).expect(200, { items });
    await coach.get(at('my-kit')).expect(200, { items: [] });
  });

  it('can be nothing, which is not the same as not having said', async () => {
    const browser = await api.signedIn(await makeMember(ours.team, 'member'));
    expect(await kitUnknown(browser)).toBe(true);
    await browser.put(at('my-kit')).send({ items: [] }).expect(200, { items: [] });
    expect(await kitUnknown(browser)).toBe(false);
  });

  it('is a team’s own for somebody who is in two', async () => {
    const person = await makeMember(ours.team, 'member');
    await makeMembership(theirs.team, person, 'member');
    const browser = await api.signedIn(person);
    const mat = await makeKitItem(ours.team, 'mat');
    await browser
      .put(at('my-kit'))
      .send({ items: [{ kitItemId: mat.id, count: 1 }] })
      .expect(200);
    await browser.get(at('my-kit', theirs)).expect(200, { items: [] });
    // and a team's list is not filled with another's items
    const { body } = await browser
      .put(at('my-kit', theirs))
      .send({ items: [{ kitItemId: mat.id, count: 1 }] })
      .expect(400);
    expect(Object.keys(body.error.fields)).toEqual(['items.0.kitItemId']);
  });

  it('refuses what does not fit, naming each field, and keeps what was there', async () => {
    const wall = await makeKitItem(ours.team, 'wall');
    const browser = await api.signedIn(await makeMember(ours.team, 'member'));
    const items = [{ kitItemId: wall.id, count: 1, loadsKg: [] }];
    await browser.put(at('my-kit')).send({ items }).expect(200);
    const { body } = await browser
      .put(at('my-kit'))
      .send({
        items: [
          { kitItemId: wall.id, count: 1, loadsKg: [4, 8] },
          { kitItemId: wall.id, count: 1, loadsKg: [0.001] },
          { kitItemId: randomUUID(), count: 1 },
        ],
      })
      .expect(400);
    expect(Object.keys(body.error.fields).sort()).toEqual([
      'items.0.loadsKg',
      'items.1.kitItemId',
      'items.1.loadsKg',
      'items.2.kitItemId',
    ]);
    await browser.get(at('my-kit')).expect(200, { items });
  });

  it('saved from two tabs at once is what one of them said', async () => {
    const person = await makeMember(ours.team, 'member');
    const browser = await api.signedIn(person);
    const [one, two] = [await makeKitItem(ours.team, 'towel'), await makeKitItem(ours.team, 'broomstick')];
    const only = (item: KitItem) => ({ items: [{ kitItemId: item.id, count: 1, loadsKg: [] }] });
    const answers = await Promise.all([only(one), only(two)].map((kit) => browser.put(at('my-kit')).send(kit)));
    expect(answers.map(({ status }) => status)).toEqual([200, 200]);
    const { body } = await browser.get(at('my-kit')).expect(200);
    expect([only(one), only(two)]).toContainEqual(body);
  });
});
