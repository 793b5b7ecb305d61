import { randomUUID } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { afterAll, describe, expect, it } from 'vitest';
import { database } from '../../server/models/database';
import { AuditEvent, Membership, Notice } from '../../server/models/people';
import {
  makeMember,
  makeMembership,
  makePerson,
  makeTeam,
  makeTeamOfFour,
  startApi,
  type Visitor,
} from '../support/api';

const api = await startApi();
afterAll(() => api.close());

/** Walks a list to its end, page by page. */
async function allPages(browser: Visitor, path: string, limit: number) {
  const items: Record<string, unknown>[] = [];
  let cursor: string | null = null;
  do {
    const { body }: { body: { items: Record<string, unknown>[]; nextCursor: string | null } } = await browser
      .get(path)
      .query({ limit, ...(cursor ? { cursor } : {}) })
      .expect(200);
    expect(body.items.length).toBeLessThanOrEqual(limit);
    items.push(...body.items);
    cursor = body.nextCursor;
  } while (cursor);
  return items;
}

describe('the team', () => {
  it('says what day it is there', async () => {
    const team = await makeTeam({ timeZone: 'Pacific/Kiritimati' });
    const browser = await api.signedIn(await makeMember(team, 'member'));
    const { body } = await browser.get(`/api/teams/${team.slug}`).expect(200);
    // UTC+14 all year (IANA time zone database, Pacific/Kiritimati)
    const there = new Date(Date.now() + 14 * 3_600_000).toISOString().slice(0, 10);
    expect(body).toEqual({
      slug: team.slug,
      name: team.name,
      timeZone: 'Pacific/Kiritimati',
      today: there,
      role: 'member',
    });
  });

  it('gets another name and zone, in the trail; nothing else that is sent counts (ASVS 5.0 15.3.3)', async () => {
    const { team, owner } = await makeTeamOfFour();
    const browser = await api.signedIn(owner);
    const path = `/api/teams/${team.slug}`;
    const change = { name: 'Harbour', timeZone: 'Asia/Tokyo', slug: 'stolen', id: randomUUID(), dictionaryVersion: 99 };
    const { body } = await browser.patch(path).send(change).expect(200);
    expect(body).toMatchObject({ slug: team.slug, name: 'Harbour', timeZone: 'Asia/Tokyo' });
    await team.reload();
    expect([team.slug, team.name, team.dictionaryVersion]).toEqual([path.split('/').at(-1), 'Harbour', 0]);
    const event = await AuditEvent.findOne({ where: { teamId: team.id, action: 'team.changed' } });
    expect(event?.details).toEqual({
      from: { name: 'Quayside', timeZone: 'Europe/Berlin' },
      to: { name: 'Harbour', timeZone: 'Asia/Tokyo' },
    });
  });

  it('refuses a zone that does not exist', async () => {
    const { team, owner } = await makeTeamOfFour();
    const browser = await api.signedIn(owner);
    const { body } = await browser.patch(`/api/teams/${team.slug}`).send({ timeZone: 'Moon/Base' }).expect(400);
    expect(Object.keys(body.error.fields)).toEqual(['timeZone']);
    expect((await team.reload()).timeZone).toBe('Europe/Berlin');
  });
});

describe('the people of a team', () => {
  it('are listed by name in pages, each once, and nobody of another team', async () => {
    const team = await makeTeam();
    const owner = await makeMember(team, 'owner', { name: 'mila Voss' });
    for (const name of ['Zeno Ark', 'ada Lund', 'Ada Lund', 'Ada Lund', 'Émile Roe', 'bo Tarn'])
      await makeMember(team, 'member', { name });
    await makeMember(await makeTeam(), 'member', { name: 'Bo Elsewhere' });
    const browser = await api.signedIn(owner);
    const path = `/api/teams/${team.slug}/people`;
    const whole = await allPages(browser, path, 100);
    expect(whole).toHaveLength(7);
    expect(await allPages(browser, path, 2)).toEqual(whole);
    const lower = whole.map((person) => String(person.name).toLowerCase());
    expect(lower.slice(0, 4)).toEqual(['ada lund', 'ada lund', 'ada lund', 'bo tarn']);
    expect(Object.keys(whole[0] ?? {}).toSorted()).toEqual(['email', 'id', 'name', 'role', 'since']);
  });

  it.each(['nonsense', Buffer.from('["a"]').toString('base64url'), Buffer.from('["a","b"]').toString('base64url')])(
    'refuse the made-up cursor %s',
    async (cursor) => {
      const { team, owner } = await makeTeamOfFour();
      const browser = await api.signedIn(owner);
      for (const list of ['people', 'audit', 'notices']) {
        const { body } = await browser.get(`/api/teams/${team.slug}/${list}`).query({ cursor }).expect(400);
        expect(Object.keys(body.error.fields)).toEqual(['cursor']);
      }
    },
  );

  it('get another role, in the trail', async () => {
    const { team, owner, member } = await makeTeamOfFour();
    const browser = await api.signedIn(owner);
    const path = `/api/teams/${team.slug}/people/${member.id}`;
    const { body } = await browser.patch(path).send({ role: 'coach' }).expect(200);
    expect(body).toMatchObject({ id: member.id, name: 'The member', email: member.email, role: 'coach' });
    await browser.patch(path).send({ role: 'coach' }).expect(200);
    const events = await AuditEvent.findAll({ where: { teamId: team.id, action: 'person.roleChanged' } });
    expect(events.map((event) => [event.actorId, event.subjectId, event.details])).toEqual([
      [owner.id, member.id, { from: 'member', to: 'coach' }],
    ]);
    await browser.patch(path).send({ role: 'king' }).expect(400);
  });

  it('of another team are not there', async () => {
    const [ours, theirs] = [await makeTeamOfFour(), await makeTeamOfFour()];
    const browser = await api.signedIn(ours.owner);
    const path = `/api/teams/${ours.team.slug}/people/${theirs.member.id}`;
    await browser.patch(path).send({ role: 'coach' }).expect(404);
    await browser.delete(path).expect(404);
    await browser.delete(`/api/teams/${theirs.team.slug}/people/${theirs.member.id}`).expect(404);
    expect((await Membership.findOne({ where: { personId: theirs.member.id } }))?.role).toBe('member');
  });

  it('are taken out with what they kept in the team; other teams keep them', async () => {
    const { team, owner, member } = await makeTeamOfFour();
    const elsewhere = await makeTeam();
    await makeMembership(elsewhere, member, 'coach');
    await Notice.create({
      teamId: team.id,
      personId: member.id,
      kind: 'sessionPublished',
      text: 'A session is there.',
    });
    const browser = await api.signedIn(owner);
    const path = `/api/teams/${team.slug}/people/${member.id}`;
    await browser.delete(path).expect(200);
    await browser.delete(path).expect(404);
    const left = await Membership.findAll({ where: { personId: member.id } });
    expect(left.map((membership) => membership.teamId)).toEqual([elsewhere.id]);
    expect(await Notice.count({ where: { personId: member.id } })).toBe(0);
    expect(await AuditEvent.count({ where: { teamId: team.id, action: 'person.removed' } })).toBe(1);
  });
});

describe('the last owner', () => {
  it('cannot step down or leave', async () => {
    const { team, owner } = await makeTeamOfFour();
    const browser = await api.signedIn(owner);
    const path = `/api/teams/${team.slug}/people/${owner.id}`;
    expect((await browser.patch(path).send({ role: 'coach' }).expect(409)).body.error.code).toBe('lastOwner');
    expect((await browser.delete(path).expect(409)).body.error.code).toBe('lastOwner');
    await browser.patch(path).send({ role: 'owner' }).expect(200);
  });

  it('is left when two owners step down, leave or remove each other at once', async () => {
    for (const at of ['themselves', 'each other'] as const) {
      const { team, owner } = await makeTeamOfFour();
      const second = await makeMember(team, 'owner');
      const browsers = [await api.signedIn(owner), await api.signedIn(second)];
      const targets = at === 'themselves' ? [owner, second] : [second, owner];
      const statuses = await Promise.all(
        browsers.map(async (browser, i) => {
          const path = `/api/teams/${team.slug}/people/${targets[i]?.id}`;
          return (await (i === 0 ? browser.patch(path).send({ role: 'member' }) : browser.delete(path))).status;
        }),
      );
      expect(statuses.filter((status) => status === 200)).toHaveLength(1);
      expect(await Membership.count({ where: { teamId: team.id, role: 'owner' } })).toBe(1);
    }
  });
});

describe('notices', () => {
  it('are one’s own, newest first in pages, and read all at once', async () => {
    const { team, member, coach } = await makeTeamOfFour();
    // many in one millisecond: the cursor must tell microseconds apart
    await database().query(
      `insert into notices (team_id, person_id, kind, text, created_at)
       select :team, :person, 'sessionPublished', 'Notice ' || n, timestamptz '2026-03-03 06:00:00.000500Z' + n * interval '70 microseconds'
       from generate_series(1, 23) n`,
      { replacements: { team: team.id, person: member.id } },
    );
    await Notice.create({ teamId: team.id, personId: coach.id, kind: 'recordingReady', text: 'Not yours.' });
    const browser = await api.signedIn(member);
    const path = `/api/teams/${team.slug}/notices`;
    const items = await allPages(browser, path, 5);
    expect(items.map((notice) => notice.text)).toEqual(Array.from({ length: 23 }, (_, i) => `Notice ${23 - i}`));
    expect((await browser.get(path)).body.unread).toBe(23);
    await browser.post(`${path}/read`).expect(200);
    const { body } = await browser.get(path).expect(200);
    expect(body.unread).toBe(0);
    expect(body.items.every((notice: { readAt: string | null }) => notice.readAt !== null)).toBe(true);
    expect(await Notice.count({ where: { personId: coach.id, readAt: null } })).toBe(1);
  });
});

describe('the audit trail', () => {
  it('tells who did what, newest first, of this team alone', async () => {
    const [ours, theirs] = [await makeTeamOfFour(), await makeTeamOfFour()];
    const browser = await api.signedIn(ours.owner);
    const other = await api.signedIn(theirs.owner);
    await other.patch(`/api/teams/${theirs.team.slug}`).send({ name: 'Theirs' }).expect(200);
    for (const name of ['One', 'Two', 'Three']) {
      const answer = await browser.patch(`/api/teams/${ours.team.slug}`).send({ name }).expect(200);
      expect(answer.get('X-Request-Id')).toBeTruthy();
    }
    const entries = await allPages(browser, `/api/teams/${ours.team.slug}/audit`, 2);
    expect(entries.map((entry) => (entry.details as { to: { name: string } }).to.name)).toEqual([
      'Three',
      'Two',
      'One',
    ]);
    expect(entries[0]).toMatchObject({
      actor: 'The owner',
      action: 'team.changed',
      subjectType: 'team',
      subjectId: ours.team.id,
    });
  });

  it('says by its present name what each entry is about, and nothing of what is gone', async () => {
    const { team, owner, member } = await makeTeamOfFour();
    const browser = await api.signedIn(owner);
    const day = `/api/teams/${team.slug}/sessions`;
    const make = async (title: string) =>
      (await browser.post(day).send({ id: randomUUID(), date: '2026-03-02', title }).expect(201)).body;
    const [kept, gone] = [await make('Slow hinge'), await make('Not this one')];
    await browser.delete(`${day}/${gone.id}`).expect(200);
    await browser.patch(`/api/teams/${team.slug}/people/${member.id}`).send({ role: 'editor' }).expect(200);
    const entries = await allPages(browser, `/api/teams/${team.slug}/audit`, 10);
    const subjectOf = (action: string, id: string) =>
      entries.find((entry) => entry.action === action && entry.subjectId === id)?.subject;
    expect(subjectOf('session.created', kept.id)).toBe('Slow hinge');
    expect(subjectOf('session.removed', gone.id)).toBeNull();
    expect(subjectOf('person.roleChanged', member.id)).toBe(member.name);
  });

  it('leaves nothing behind of a change that was refused', async () => {
    const { team, owner } = await makeTeamOfFour();
    const browser = await api.signedIn(owner);
    await browser.delete(`/api/teams/${team.slug}/people/${owner.id}`).expect(409);
    await browser.delete(`/api/teams/${team.slug}/people/${(await makePerson()).id}`).expect(404);
    const [row] = await database().query<{ count: string }>('select count(*) from audit_events where team_id = :id', {
      replacements: { id: team.id },
      type: QueryTypes.SELECT,
    });
    expect(row?.count).toBe('0');
  });
});
