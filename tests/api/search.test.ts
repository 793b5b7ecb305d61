import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { KitItem, Movement } from '../../server/models/dictionary';
import type { Recording } from '../../server/models/recordings';
import type { Session } from '../../server/models/sessions';
import { type Api, makeTeamOfFour, startApi, type TeamOfFour, type Visitor } from '../support/api';
import {
  chapter,
  makeKitItem,
  makeMovement,
  makeRecording,
  makeSession,
  makeSubstitution,
  needs,
} from '../support/library';

let api: Api;
let ours: TeamOfFour;
let coach: Visitor;
let member: Visitor;
let rings: KitItem;
let ringRow: Movement;
let towelRow: Movement;
let session: Session;
let recording: Recording;

const at = (path: string) => `/api/teams/${ours.team.slug}/${path}`;

beforeAll(async () => {
  api = await startApi();
  ours = await makeTeamOfFour();
  coach = await api.signedIn(ours.coach);
  member = await api.signedIn(ours.member);
  rings = await makeKitItem(ours.team, 'rings');
  const door = await makeKitItem(ours.team, 'door');
  ringRow = await makeMovement(ours.team, 'Ring row', { otherNames: ['Body row'], kitNeeded: needs(rings) });
  towelRow = await makeMovement(ours.team, 'Towel row', { kitNeeded: needs(door) });
  await makeMovement(ours.team, 'Kettlebell swing', { pattern: 'hinge' });
  await makeSubstitution(ours.team, ringRow, towelRow, rings, 'The same pull with a door.');
  ({ session } = await makeSession(ours.team, { date: '2026-03-03' }));
  recording = await makeRecording(ours.team, { session, coach: ours.coach });
  const items = [
    chapter(0, 10_000, { kind: 'briefing', title: 'What today is for' }),
    chapter(10_000, 20_000, { movementId: ringRow.id }),
    chapter(20_000, 30_000, {
      kind: 'substitution',
      title: 'Towel row',
      movementId: towelRow.id,
      standsInForMovementId: ringRow.id,
      missing: 'kit',
      missingKitItemId: rings.id,
    }),
    chapter(30_000, 40_000, { kind: 'workout', title: 'Once through' }),
    chapter(40_000, 50_000, { kind: 'aside', title: 'The parrot' }),
  ];
  await coach
    .put(at(`recordings/${recording.id}/chapters`))
    .send({ version: 0, items })
    .expect(200);
  const lines = [
    { startMs: 31_000, endMs: 33_000, text: 'Squeeze at the top, don’t rush it.' },
    // starts while the workout still runs, and is said in the aside
    { startMs: 39_000, endMs: 42_000, text: 'A marmalade jar rolls away.' },
    { startMs: 42_000, endMs: 44_000, text: 'Mind the parrot.' },
  ];
  await coach
    .put(at(`recordings/${recording.id}/captions`))
    .send({ version: 0, lines })
    .expect(200);
});
afterAll(() => api.close());

const find = async (visitor: Visitor, q: string, more: Record<string, string> = {}) =>
  (
    await visitor
      .get(at('find'))
      .query({ q, ...more })
      .expect(200)
  ).body;

it('nobody finds in the chapter before it what is said in an aside', async () => {
  for (const visitor of [member, coach]) expect((await find(visitor, 'marmalade jar')).groups).toEqual([]);
  const next = await find(member, 'squeeze marmalade');
  expect(next.groups[0].findings[0].said.pieces.map(({ text }: { text: string }) => text).join('')).toContain(
    'Squeeze',
  );
  expect(JSON.stringify(next)).not.toContain('jar');
});

describe('find', () => {
  it.each(['ring row', 'rinng row', 'body row', 'RING ROWS', 'row ring'])(
    'lands “%s” on the second that shows it',
    async (q) => {
      const found = await find(member, q);
      expect(found.groups[0]).toMatchObject({ heading: 'demos', movement: { name: 'Ring row' } });
      expect(found.groups[0].findings[0].moment).toMatchObject({
        recordingId: recording.id,
        startMs: 10_000,
        kind: 'demo',
        movement: { name: 'Ring row' },
        session: { date: '2026-03-03' },
        coach: 'The coach',
      });
    },
  );

  it('understands “without” and offers what to do instead, with the reason and the dose', async () => {
    const found = await find(member, 'ring row without rings');
    expect(found.understood).toMatchObject({ movements: [{ name: 'Ring row' }], without: [{ name: 'rings' }] });
    expect(found.groups[0]).toMatchObject({ heading: 'insteadOf', movement: { name: 'Ring row' } });
    const [instead] = found.groups[0].findings;
    expect(instead).toMatchObject({
      why: 'substitution',
      moment: { startMs: 20_000, missingText: 'no rings', standsInFor: { name: 'Ring row' } },
    });
    expect(instead.note).toBe('The same pull with a door. Half again as many, at most 15.');
    expect(found.hiddenByKit).toBe(1);
  });

  it.each(['no rings', 'what do I do without rings', 'row without rings'])(
    'answers “%s” with what to do instead of what needs them, before anything else',
    async (q) => {
      const [first] = (await find(member, q)).groups;
      expect(first).toMatchObject({ heading: 'insteadOf', movement: { name: 'Ring row' } });
      expect(first.findings[0].moment).toMatchObject({ startMs: 20_000 });
    },
  );

  it('keeps to the member’s own kit when asked to, and counts what that hides', async () => {
    const door = (await member.get(at('kit'))).body.items.find(({ name }: { name: string }) => name === 'door');
    await member
      .put(at('my-kit'))
      .send({ items: [{ kitItemId: door.id, count: 1, loadsKg: [] }] })
      .expect(200);
    const mine = await find(member, 'ring row', { kit: 'mine' });
    expect(mine.groups.map(({ heading }: { heading: string }) => heading)).toEqual(['insteadOf']);
    expect(mine.hiddenByKit).toBe(1);
    const any = await find(member, 'ring row', { kit: 'any' });
    expect(any.groups[0]).toMatchObject({ heading: 'demos', inMyKit: false });
  });

  it('finds a word that was said, marks it and lands on it', async () => {
    const found = await find(member, 'squeezing');
    expect(found.groups).toMatchObject([
      { heading: 'said', findings: [{ why: 'said', moment: { title: 'Once through' }, said: { atMs: 31_000 } }] },
    ]);
    expect(found.groups[0].findings[0].said.pieces[0]).toEqual({ text: 'Squeeze', marked: true });
  });

  it('never finds an aside', async () => {
    expect((await find(member, 'parrot')).groups).toEqual([]);
    expect((await find(coach, 'parrot')).groups).toEqual([]);
  });

  it('says which movements nobody has filmed, and what was perhaps meant', async () => {
    expect(await find(member, 'kettlebell swing')).toMatchObject({
      groups: [],
      notFilmed: [{ name: 'Kettlebell swing' }],
    });
    expect((await find(member, 'zzzz qqqq')).groups).toEqual([]);
  });

  it('is fresh the moment something is saved, taken back or corrected', async () => {
    const swing = await makeMovement(ours.team, 'Bell clean');
    const { session: other } = await makeSession(ours.team, { date: '2026-03-05', state: 'draft' });
    const take = await makeRecording(ours.team, { session: other });
    expect((await find(coach, 'bell clean')).groups).toEqual([]);
    const marked = chapter(0, 5000, { movementId: swing.id, title: 'Bell clean' });
    await coach
      .put(at(`recordings/${take.id}/chapters`))
      .send({ version: 0, items: [marked] })
      .expect(200);
    expect((await find(coach, 'bell clean')).groups).toHaveLength(1);
    expect((await find(member, 'bell clean')).groups).toEqual([]);
    await coach
      .post(at(`sessions/${other.id}/publish`))
      .send({ version: 1 })
      .expect(200);
    expect((await find(member, 'bell clean')).groups).toHaveLength(1);
    await coach
      .post(at(`sessions/${other.id}/unpublish`))
      .send({ version: 2 })
      .expect(200);
    expect((await find(member, 'bell clean')).groups).toEqual([]);
  });

  it('keeps teams apart', async () => {
    const theirs = await makeTeamOfFour();
    const stranger = await api.signedIn(theirs.coach);
    const { body } = await stranger
      .get(`/api/teams/${theirs.team.slug}/find`)
      .query({ q: 'ring row squeeze' })
      .expect(200);
    expect(body.groups).toEqual([]);
    await stranger.get(at('find')).query({ q: 'ring row' }).expect(404);
  });

  it.each(["' or 1=1 --", '"unbalanced', '& | ! <->', ':* \\', '(('])('takes %j as words', async (q) => {
    expect((await find(member, q)).groups).toEqual([]);
  });

  it('refuses a query that is none', async () => {
    await member
      .get(at('find'))
      .query({ q: 'x'.repeat(201) })
      .expect(400);
    expect((await find(member, '  ')).groups).toEqual([]);
  });
});

describe('suggest', () => {
  it('offers movements while one types, with a picture’s moment', async () => {
    const { body } = await member.get(at('suggest')).query({ q: 'rin' }).expect(200);
    expect(body.items[0]).toMatchObject({ movement: { name: 'Ring row' }, demo: { startMs: 10_000 } });
  });
});
