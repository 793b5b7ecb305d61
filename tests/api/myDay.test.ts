import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '../../server/models/database';
import type { KitItem, Movement } from '../../server/models/dictionary';
import type { Team } from '../../server/models/people';
import type { Recording } from '../../server/models/recordings';
import { Block, LineSubstitution, type Session } from '../../server/models/sessions';
import { dateInZone } from '../../server/services/teamDay';
import {
  type Api,
  makeMember,
  makeTeam,
  makeTeamOfFour,
  startApi,
  type TeamOfFour,
  type Visitor,
} from '../support/api';
import {
  chapter,
  makeKitItem,
  makeMovement,
  makeRecording,
  makeSession,
  makeSubstitution,
  needs,
  reps,
} from '../support/library';

let api: Api;
let ours: TeamOfFour;
let coach: Visitor;
let member: Visitor;
let bar: KitItem;
let rope: KitItem;
let pull: Movement;
let towel: Movement;
let skips: Movement;
let walk: Movement;
let session: Session;
let block: Block;
let lineIds: string[];
let recording: Recording;

const at = (path: string, team: Team = ours.team) => `/api/teams/${team.slug}/${path}`;
const dayOf = async (browser: Visitor, date = '2026-03-03') =>
  (await browser.get(at('my-day')).query({ date }).expect(200)).body;
const own = (browser: Visitor, ...items: KitItem[]) =>
  browser
    .put(at('my-kit'))
    .send({ items: items.map(({ id }) => ({ kitItemId: id, count: 1 })) })
    .expect(200);
const mark = (on: Recording, items: object[]) =>
  coach
    .put(at(`recordings/${on.id}/chapters`))
    .send({ version: 0, items })
    .expect(200);

beforeAll(async () => {
  api = await startApi();
  ours = await makeTeamOfFour();
  const { team } = ours;
  [coach, member] = [await api.signedIn(ours.coach), await api.signedIn(ours.member)];
  bar = await makeKitItem(team, 'bar', 'nothing to hang from');
  rope = await makeKitItem(team, 'rope');
  pull = await makeMovement(team, 'Pull-up', {
    kitNeeded: needs(bar),
    points: ['Chest to the bar.'],
    cautions: [{ say: 'Check the anchor before you hang.', more: '' }],
  });
  towel = await makeMovement(team, 'Towel row', { points: ['Lean back.'] });
  skips = await makeMovement(team, 'Skips', { kitNeeded: needs(rope), pattern: 'jump' });
  walk = await makeMovement(team, 'Bear walk', { pattern: 'locomotion' });
  await makeSubstitution(team, pull, towel, bar, 'The same pull with a towel.');
  const made = await makeSession(team, { coach: ours.coach, movements: [pull, skips, walk] });
  ({ session, block } = made);
  lineIds = made.lines.map(({ id }) => id);
  recording = await makeRecording(team, { session, coach: ours.coach });
});
afterAll(() => api.close());

describe('the day in a member’s own version', () => {
  it('is the plan as written until they have said what they own', async () => {
    const day = await dayOf(await api.signedIn(await makeMember(ours.team, 'member')));
    expect(day).toMatchObject({ date: '2026-03-03', kitUnknown: true });
    const [mine] = day.sessions;
    expect(mine).toMatchObject({ id: session.id, coach: 'The coach', changedLines: 0, missingTexts: [] });
    expect(mine.blocks[0].lines.map((line: { movement: { name: string } }) => line.movement.name)).toEqual([
      'Pull-up',
      'Skips',
      'Bear walk',
    ]);
    expect(mine.blocks[0].lines[0]).toMatchObject({
      lineId: lineIds[0],
      dose: reps(8),
      points: ['Chest to the bar.'],
      cautions: [{ say: 'Check the anchor before you hang.' }],
      insteadOf: null,
      noWayText: null,
      demo: null,
    });
  });

  it('for somebody who owns nothing replaces what it can, and says what is missing where it can’t', async () => {
    const browser = await api.signedIn(await makeMember(ours.team, 'member'));
    await own(browser);
    const day = await dayOf(browser);
    expect(day.kitUnknown).toBe(false);
    const [mine] = day.sessions;
    expect(mine).toMatchObject({ changedLines: 1, missingTexts: ['nothing to hang from', 'no rope'] });
    const [first, second, third] = mine.blocks[0].lines;
    expect(first).toMatchObject({
      movement: { id: towel.id, name: 'Towel row' },
      // 8 × 1.5, the dictionary's rule
      dose: reps(12),
      points: ['Lean back.'],
      cautions: [],
      insteadOf: {
        movement: { id: pull.id, name: 'Pull-up' },
        dose: reps(8),
        reason: 'The same pull with a towel.',
        missingText: 'nothing to hang from',
      },
    });
    expect(second).toMatchObject({ movement: { name: 'Skips' }, insteadOf: null, noWayText: 'no rope' });
    expect(third).toMatchObject({ movement: { name: 'Bear walk' }, insteadOf: null, noWayText: null });
  });

  it('is the plan for somebody who owns what it asks for', async () => {
    const browser = await api.signedIn(await makeMember(ours.team, 'member'));
    await own(browser, bar, rope);
    const [mine] = (await dayOf(browser)).sessions;
    expect(mine).toMatchObject({ changedLines: 0, missingTexts: [] });
  });

  it('takes what the plan’s coach chose before what the dictionary has', async () => {
    const { session: chosen, lines } = await makeSession(ours.team, { date: '2026-05-05', movements: [pull] });
    await LineSubstitution.create({
      teamId: ours.team.id,
      lineId: lines[0]?.id ?? '',
      position: 0,
      movementId: walk.id,
      missing: 'kit',
      missingKitItemId: bar.id,
      dose: reps(5),
      reason: 'Today it is about the shoulders.',
    });
    const browser = await api.signedIn(await makeMember(ours.team, 'member'));
    await own(browser, rope);
    const [mine] = (await dayOf(browser, chosen.date)).sessions;
    expect(mine.blocks[0].lines[0]).toMatchObject({
      movement: { name: 'Bear walk' },
      dose: reps(5),
      insteadOf: { reason: 'Today it is about the shoulders.' },
    });
  });
});

describe('what a day shows', () => {
  let older: Recording;
  let briefing: { id: string };
  let whole: { id: string };
  let ownDemo: { id: string };
  let ownSubstitution: { id: string };
  let olderTowel: { id: string };

  beforeAll(async () => {
    const { session: before } = await makeSession(ours.team, { date: '2026-02-24', title: 'Before' });
    older = await makeRecording(ours.team, { session: before });
    olderTowel = chapter(0, 900, { movementId: towel.id, title: 'Towel, before' });
    await mark(older, [olderTowel, chapter(900, 1900, { movementId: walk.id, title: 'Walk, before' })]);
    const { session: draft } = await makeSession(ours.team, { date: '2026-03-10', state: 'draft' });
    await mark(await makeRecording(ours.team, { session: draft }), [chapter(0, 900, { movementId: skips.id })]);
    briefing = chapter(0, 5000, { kind: 'briefing', title: 'Talk', blockId: block.id });
    ownDemo = chapter(5000, 9000, { movementId: pull.id, blockId: block.id, title: 'Pull' });
    ownSubstitution = chapter(9000, 12_000, {
      kind: 'substitution',
      movementId: towel.id,
      standsInForMovementId: pull.id,
      missing: 'kit',
      missingKitItemId: bar.id,
      title: 'Towel',
    });
    whole = chapter(12_000, 20_000, { kind: 'workout', movementId: walk.id, blockId: block.id, title: 'Once through' });
    await mark(recording, [
      briefing,
      ownDemo,
      ownSubstitution,
      whole,
      chapter(20_000, 25_000, { kind: 'aside', movementId: walk.id, blockId: block.id, title: 'Outtake' }),
    ]);
  });

  const demosOf = async (browser: Visitor) =>
    (await dayOf(browser)).sessions[0].blocks[0].lines.map(
      (line: { demo: { chapterId: string; title: string } | null }) => line.demo?.title ?? null,
    );

  it('is a demo for each line: the session’s own, else the newest that members see', async () => {
    expect(await demosOf(member)).toEqual(['Pull', null, 'Walk, before']);
    // the coach looks at what members see: no draft's demo either
    expect(await demosOf(coach)).toEqual(['Pull', null, 'Walk, before']);
  });

  it('is the substitution’s own chapter for a replaced line', async () => {
    const browser = await api.signedIn(await makeMember(ours.team, 'member'));
    await own(browser, rope);
    expect(await demosOf(browser)).toEqual(['Towel', null, 'Walk, before']);
    const [line] = (await dayOf(browser)).sessions[0].blocks[0].lines;
    expect(line.demo).toMatchObject({
      chapterId: ownSubstitution.id,
      recordingId: recording.id,
      startMs: 9000,
      standsInFor: { name: 'Pull-up' },
      missingText: 'nothing to hang from',
    });
    expect(olderTowel.id).not.toBe(line.demo.chapterId);
  });

  it('are the chapters of a block as a whole, never an aside', async () => {
    const [mine] = (await dayOf(coach)).sessions;
    expect(mine.blocks[0].moments.map((moment: { chapterId: string }) => moment.chapterId)).toEqual([
      briefing.id,
      whole.id,
    ]);
    expect(mine.recordings).toEqual([expect.objectContaining({ id: recording.id, chapterCount: 4 })]);
  });
});

describe('which day it is', () => {
  it('is today in the team’s time zone where none is asked for', async () => {
    for (const timeZone of ['Pacific/Kiritimati', 'Pacific/Pago_Pago']) {
      const team = await makeTeam({ timeZone });
      const browser = await api.signedIn(await makeMember(team, 'member'));
      const today = dateInZone(timeZone);
      const { session: planned } = await makeSession(team, { date: today });
      const { body } = await browser.get(at('my-day', team)).expect(200);
      expect(body).toMatchObject({ date: today, today, previous: null, next: null });
      expect(body.sessions.map(({ id }: { id: string }) => id)).toEqual([planned.id]);
    }
    // the two are 25 hours apart (IANA time zone database): never the same date
    expect(dateInZone('Pacific/Kiritimati')).not.toBe(dateInZone('Pacific/Pago_Pago'));
  });

  it('leads to the published days around it, past drafts and gaps', async () => {
    const team = await makeTeam();
    const browser = await api.signedIn(await makeMember(team, 'coach'));
    for (const [date, state] of [
      ['2026-06-01', 'published'],
      ['2026-06-03', 'draft'],
      ['2026-06-05', 'published'],
      ['2026-06-06', 'draft'],
      ['2026-06-08', 'published'],
    ] as const)
      await makeSession(team, { date, state, title: date });
    const ask = async (date: string) => (await browser.get(at('my-day', team)).query({ date }).expect(200)).body;
    expect(await ask('2026-06-05')).toMatchObject({
      previous: { date: '2026-06-01' },
      next: { date: '2026-06-08' },
      sessions: [{ title: '2026-06-05' }],
    });
    expect(await ask('2026-06-03')).toMatchObject({
      previous: { date: '2026-06-01' },
      next: { date: '2026-06-05' },
      sessions: [],
    });
  });

  it('is a date that exists', async () => {
    const { body } = await member.get(at('my-day')).query({ date: '2026-02-29' }).expect(400);
    expect(body.error.fields).toHaveProperty('date');
  });
});

describe('a long plan', () => {
  it('costs as many queries as a short one', async () => {
    const browser = await api.signedIn(await makeMember(ours.team, 'member'));
    await own(browser);
    let queries = 0;
    database().addHook('beforeQuery', () => {
      queries++;
    });
    const queriesFor = async (date: string) => {
      queries = 0;
      await dayOf(browser, date);
      return queries;
    };
    await makeSession(ours.team, { date: '2026-07-01', movements: [pull] });
    const long = await makeSession(ours.team, {
      date: '2026-07-02',
      movements: Array.from({ length: 30 }, (_, i) => [pull, skips, walk][i % 3] as Movement),
    });
    for (let position = 1; position < 8; position++)
      await Block.create({
        teamId: ours.team.id,
        id: randomUUID(),
        sessionId: long.session.id,
        position,
        kind: 'workout',
      });
    const short = await queriesFor('2026-07-01');
    expect(await queriesFor('2026-07-02')).toBe(short);
    expect(short).toBeGreaterThan(0);
    expect(short).toBeLessThan(30);
  });
});
