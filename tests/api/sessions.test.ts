import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { KitItem, Movement } from '../../server/models/dictionary';
import { ChapterRow } from '../../server/models/marks';
import { AuditEvent } from '../../server/models/people';
import { Recording } from '../../server/models/recordings';
import { Block, BlockLine, LineSubstitution, Session } from '../../server/models/sessions';
import { type Api, makeTeamOfFour, startApi, type TeamOfFour, type Visitor } from '../support/api';
import { chapter, makeKitItem, makeMovement, makeRecording, makeSession, reps } from '../support/library';

let api: Api;
let ours: TeamOfFour;
let theirs: TeamOfFour;
let coach: Visitor;
let member: Visitor;
let rings: KitItem;
let row: Movement;
let hop: Movement;

beforeAll(async () => {
  api = await startApi();
  [ours, theirs] = [await makeTeamOfFour(), await makeTeamOfFour()];
  [coach, member] = [await api.signedIn(ours.coach), await api.signedIn(ours.member)];
  rings = await makeKitItem(ours.team, 'rings');
  [row, hop] = [await makeMovement(ours.team, 'Ring row'), await makeMovement(ours.team, 'Lateral hop')];
});
afterAll(() => api.close());

const at = (path: string, { team } = ours) => `/api/teams/${team.slug}/${path}`;

const line = (movement: Movement, more: object = {}) => ({
  id: randomUUID(),
  movementId: movement.id,
  dose: reps(8),
  note: '',
  substitutions: [],
  ...more,
});
const block = (more: object = {}) => ({
  id: randomUUID(),
  kind: 'workout',
  title: 'Main piece',
  scheme: { type: 'amrap', minutes: 12 },
  note: '',
  lines: [line(row), line(hop)],
  ...more,
});
const plan = (more: object = {}) => ({
  date: '2026-03-03',
  title: 'Step, row, hop',
  note: 'Slow down.',
  aim: '5 rounds',
  blocks: [block()],
  ...more,
});
const create = async (more: object = {}) => {
  const id = randomUUID();
  return (
    await coach
      .post(at('sessions'))
      .send({ id, ...plan(more) })
      .expect(201)
  ).body;
};
const save = (id: string, version: number, more: object) =>
  coach.put(at(`sessions/${id}`)).send({ ...plan(more), version });
const faultsOf = async (asked: ReturnType<typeof save>) => Object.keys((await asked.expect(400)).body.error.fields);

describe('a planned session', () => {
  it.each([
    ['as it is written', (id: string) => id],
    ['in capital letters', (id: string) => id.toUpperCase()],
  ])('never takes over a block or a line of another session by its id, %s', async (_how, spelled) => {
    const mine = await create();
    const stranger = await api.signedIn(theirs.coach);
    const theirRow = await makeMovement(theirs.team, `Their row ${randomUUID()}`);
    for (const [visitor, team, movement] of [
      [stranger, theirs, theirRow],
      [coach, ours, row],
    ] as const) {
      const attempt = (blocks: object[]) =>
        visitor
          .post(at('sessions', team))
          .send({ id: randomUUID(), ...plan({ blocks }) })
          .expect(400);
      const { body } = await attempt([block({ id: spelled(mine.blocks[0].id), title: 'Taken', lines: [] })]);
      expect(Object.keys(body.error.fields)).toEqual(['blocks.0.id']);
      await attempt([block({ lines: [line(movement, { id: spelled(mine.blocks[0].lines[0].id) })] })]);
    }
    expect((await coach.get(at(`sessions/${mine.id}`)).expect(200)).body.blocks).toEqual(mine.blocks);
  });

  it('knows its ids in capital letters too, and takes none twice', async () => {
    const mine = await create();
    const [main] = mine.blocks;
    const again = { ...main, id: main.id.toUpperCase(), title: 'Again' };
    const { body } = await save(mine.id.toUpperCase(), mine.version, { blocks: [again] }).expect(200);
    expect(body.blocks).toMatchObject([{ id: main.id, title: 'Again' }]);
    expect(await faultsOf(save(mine.id, body.version, { blocks: [main, { ...again, lines: [] }] }))).toEqual([
      'blocks.1.id',
    ]);
  });

  it('is read back as it was written, with names and who planned it', async () => {
    const substitution = {
      id: randomUUID(),
      movementId: hop.id,
      missing: 'kit',
      missingKitItemId: rings.id,
      dose: reps(10),
      reason: 'Same rhythm.',
    };
    const blocks = [
      block({ kind: 'briefing', scheme: null, lines: [], title: 'Talk' }),
      block({ lines: [line(row, { substitutions: [substitution], note: 'Heels down.' }), line(hop)] }),
    ];
    const made = await create({ blocks });
    expect(made).toMatchObject({ ...plan({ blocks }), state: 'draft', publishedAt: null, version: 1, recordings: [] });
    expect(made.coach).toEqual({ id: ours.coach.id, name: ours.coach.name });
    expect(made.movements).toEqual([
      { id: hop.id, name: 'Lateral hop' },
      { id: row.id, name: 'Ring row' },
    ]);
    await coach.get(at(`sessions/${made.id}`)).expect(200, made);
  });

  it('is made once by a double click, whatever comes with the second', async () => {
    const id = randomUUID();
    const asked = { id, ...plan() };
    const answers = await Promise.all([1, 2].map(() => coach.post(at('sessions')).send(asked)));
    expect(answers.map(({ status }) => status)).toEqual([201, 201]);
    expect(answers[0]?.body).toEqual(answers[1]?.body);
    const again = await coach
      .post(at('sessions'))
      .send({ ...asked, title: 'Another title' })
      .expect(201);
    expect(again.body.title).toBe(asked.title);
    expect(await AuditEvent.count({ where: { subjectId: id, action: 'session.created' } })).toBe(1);
  });

  it('takes no id, and no part, of another team or session', async () => {
    const { session: foreign, block: foreignBlock } = await makeSession(theirs.team);
    const { body } = await coach
      .post(at('sessions'))
      .send({ id: foreign.id, ...plan() })
      .expect(400);
    expect(body.error.fields).toHaveProperty('id');
    const other = await create();
    const [ownBlock] = other.blocks;
    const made = await create();
    expect(await faultsOf(save(made.id, 1, { blocks: [block({ id: foreignBlock.id })] }))).toEqual(['blocks.0.id']);
    expect(await faultsOf(save(made.id, 1, { blocks: [block({ id: ownBlock.id })] }))).toEqual(['blocks.0.id']);
    expect(
      await faultsOf(save(made.id, 1, { blocks: [block({ lines: [line(row, { id: ownBlock.lines[0].id })] })] })),
    ).toEqual(['blocks.0.lines.0.id']);
    const twice = block();
    expect(await faultsOf(save(made.id, 1, { blocks: [twice, { ...twice, lines: [] }] }))).toEqual(['blocks.1.id']);
    expect((await Block.findByPk(foreignBlock.id))?.sessionId).toBe(foreign.id);
    expect((await coach.get(at(`sessions/${other.id}`)).expect(200)).body).toEqual(other);
  });

  it('names only movements and kit of the team, each at its field', async () => {
    const foreign = await makeMovement(theirs.team, 'Their row');
    const foreignKit = await makeKitItem(theirs.team, 'their bar');
    const instead = (more: object) => ({
      id: randomUUID(),
      movementId: hop.id,
      missing: 'space',
      dose: reps(4),
      ...more,
    });
    const lines = [
      line(foreign),
      line(row, {
        substitutions: [
          instead({ movementId: row.id }),
          instead({ missing: 'kit' }),
          instead({ missing: 'kit', missingKitItemId: foreignKit.id }),
          instead({ missingKitItemId: rings.id }),
          instead({ movementId: foreign.id }),
        ],
      }),
    ];
    const made = await create();
    expect(await faultsOf(save(made.id, 1, { blocks: [block({ lines })] }))).toEqual([
      'blocks.0.lines.0.movementId',
      'blocks.0.lines.1.substitutions.0.movementId',
      'blocks.0.lines.1.substitutions.1.missingKitItemId',
      'blocks.0.lines.1.substitutions.2.missingKitItemId',
      'blocks.0.lines.1.substitutions.3.missingKitItemId',
      'blocks.0.lines.1.substitutions.4.movementId',
    ]);
    expect(await faultsOf(save(made.id, 1, { date: '2026-02-30' }))).toEqual(['date']);
    expect((await coach.get(at(`sessions/${made.id}`)).expect(200)).body).toEqual(made);
  });
});

describe('text that no database keeps', () => {
  it('is refused at its field: NUL', async () => {
    const made = await create();
    const nul = 'a\u0000b';
    const load = { kg: 16, typed: nul };
    const blocks = [block({ title: nul, note: nul, lines: [line(row, { note: nul, dose: { ...reps(3), load } })] })];
    expect((await faultsOf(save(made.id, 1, { aim: nul, note: nul, title: nul, blocks }))).sort()).toEqual([
      'aim',
      'blocks.0.lines.0.dose.load.typed',
      'blocks.0.lines.0.note',
      'blocks.0.note',
      'blocks.0.title',
      'note',
      'title',
    ]);
  });
});

describe('saving a plan', () => {
  it('keeps what stays, moves a line to another block, and removes what is gone', async () => {
    const [first, second] = [block(), block({ title: 'Second', lines: [line(hop)] })];
    const made = await create({ blocks: [first, second] });
    const moved = first.lines[1] as object;
    const blocks = [
      { ...second, lines: [moved, { ...second.lines[0], dose: reps(20) }] },
      block({ kind: 'cool-down', title: 'New', lines: [] }),
    ];
    const { body } = await save(made.id, 1, { blocks }).expect(200);
    expect(body.blocks).toEqual(blocks);
    expect(body.version).toBe(2);
    expect(await Block.count({ where: { sessionId: made.id } })).toBe(2);
    expect(await BlockLine.findByPk(first.lines[0]?.id)).toBeNull();
  });

  it('takes lines and substitutions in another order, and an empty plan', async () => {
    const instead = [1, 2].map((amount) => ({
      id: randomUUID(),
      movementId: hop.id,
      missing: 'space',
      missingKitItemId: null,
      dose: reps(amount),
      reason: '',
    }));
    const one = block({ lines: [line(row, { substitutions: instead }), line(hop)] });
    const made = await create({ blocks: [one] });
    const turned = [{ ...one, lines: [one.lines[1], { ...one.lines[0], substitutions: instead.toReversed() }] }];
    expect((await save(made.id, 1, { blocks: turned }).expect(200)).body.blocks).toEqual(turned);
    expect((await save(made.id, 2, { blocks: [] }).expect(200)).body.blocks).toEqual([]);
    expect(await LineSubstitution.count({ where: { id: instead.map(({ id }) => id) } })).toBe(0);
  });

  it('keeps the block that a chapter shows, and lets go of one that is removed', async () => {
    const [stays, goes] = [block(), block()];
    const made = await create({ blocks: [stays, goes] });
    const recording = await makeRecording(ours.team, { session: await Session.findByPk(made.id) });
    const items = [chapter(0, 9000, { blockId: stays.id }), chapter(9000, 20_000, { blockId: goes.id })];
    await coach
      .put(at(`recordings/${recording.id}/chapters`))
      .send({ version: 0, items })
      .expect(200);
    await save(made.id, 1, { blocks: [{ ...stays, title: 'Renamed' }] }).expect(200);
    const rows = await ChapterRow.findAll({ where: { recordingId: recording.id }, order: ['startMs'] });
    expect(rows.map(({ blockId }) => blockId)).toEqual([stays.id, null]);
  });

  it('is refused to the second of two tabs, with what is there; nothing of it is kept', async () => {
    const made = await create();
    const answers = await Promise.all(
      ['Mine', 'Yours'].map((title) => save(made.id, 1, { title, blocks: made.blocks })),
    );
    const [saved, refused] = answers.toSorted((a, b) => a.status - b.status);
    expect([saved?.status, refused?.status]).toEqual([200, 409]);
    expect(refused?.body.error).toMatchObject({ code: 'stale', current: saved?.body });
    await coach.get(at(`sessions/${made.id}`)).expect(200, saved?.body);
  });

  it('notes what changed, and for another date moves its moments in the search', async () => {
    const made = await create({ date: '2026-04-01' });
    const session = await Session.findByPk(made.id);
    const recording = await makeRecording(ours.team, { session });
    await coach
      .put(at(`recordings/${recording.id}/chapters`))
      .send({ version: 0, items: [chapter(0, 9000, { movementId: hop.id, title: 'Sideways' })] })
      .expect(200);
    await save(made.id, 1, { date: '2026-04-02', blocks: made.blocks }).expect(200);
    const [event] = await AuditEvent.findAll({ where: { subjectId: made.id, action: 'session.saved' } });
    expect(event?.details).toEqual({ version: 2, changed: ['date'], dateBefore: '2026-04-01', date: '2026-04-02' });
    const found = await coach.get(at('find')).query({ q: 'lateral hop' }).expect(200);
    const dates = found.body.groups.flatMap((group: { findings: { moment: { session: { date: string } } }[] }) =>
      group.findings.map(({ moment }) => moment.session?.date),
    );
    expect(dates).toContain('2026-04-02');
  });
});

describe('what a session keeps to itself', () => {
  it('a draft is not there for members, and no other team’s for anybody', async () => {
    const made = await create();
    await member.get(at(`sessions/${made.id}`)).expect(404);
    await member
      .post(at('sessions'))
      .send({ id: randomUUID(), ...plan() })
      .expect(403);
    const { session: foreign } = await makeSession(theirs.team);
    for (const ask of [
      coach.get(at(`sessions/${foreign.id}`)),
      coach.put(at(`sessions/${foreign.id}`)).send({ ...plan({ blocks: [] }), version: 1 }),
      coach.delete(at(`sessions/${foreign.id}`)),
      coach.get(at(`sessions/${foreign.id}/publish-check`)),
      coach.post(at(`sessions/${foreign.id}/publish`)).send({ version: 1 }),
      coach.post(at(`sessions/${foreign.id}/unpublish`)).send({ version: 1 }),
    ])
      await ask.expect(404);
    expect((await foreign.reload()).state).toBe('published');
  });

  it('members get the recordings that play, and count no asides', async () => {
    const { session } = await makeSession(ours.team);
    const ready = await makeRecording(ours.team, { session, title: 'Ready' });
    await makeRecording(ours.team, { session, state: 'making', title: 'Making' });
    await coach
      .put(at(`recordings/${ready.id}/chapters`))
      .send({ version: 0, items: [chapter(0, 900), chapter(900, 1900, { kind: 'aside' })] })
      .expect(200);
    const seen = async (browser: Visitor) =>
      (await browser.get(at(`sessions/${session.id}`)).expect(200)).body.recordings.map(
        (one: { title: string; chapterCount: number }) => [one.title, one.chapterCount],
      );
    expect(await seen(member)).toEqual([['Ready', 1]]);
    expect(await seen(coach)).toEqual([
      ['Ready', 2],
      ['Making', 0],
    ]);
  });

  it('is removed as a draft, and leaves its recordings', async () => {
    const made = await create();
    const recording = await makeRecording(ours.team, { session: await Session.findByPk(made.id) });
    await coach.delete(at(`sessions/${made.id}`)).expect(200);
    await coach.delete(at(`sessions/${made.id}`)).expect(404);
    expect((await Recording.findByPk(recording.id))?.sessionId).toBeNull();
    const { session } = await makeSession(ours.team);
    const { body } = await coach.delete(at(`sessions/${session.id}`)).expect(409);
    expect(body.error.code).toBe('inUse');
  });
});

describe('the list of sessions', () => {
  let team: TeamOfFour;
  let reader: Visitor;
  let writer: Visitor;

  beforeAll(async () => {
    team = await makeTeamOfFour();
    [reader, writer] = [await api.signedIn(team.member), await api.signedIn(team.coach)];
    const [shown, gap] = [await makeMovement(team.team, 'Shown'), await makeMovement(team.team, 'Gap')];
    for (const [date, state] of [
      ['2026-03-01', 'published'],
      ['2026-03-02', 'published'],
      ['2026-03-02', 'draft'],
      ['2026-03-03', 'published'],
      ['2026-03-04', 'draft'],
    ] as const)
      await makeSession(team.team, {
        date,
        state,
        title: `${date} ${state}`,
        coach: team.coach,
        movements: [shown, gap],
      });
    const session = await Session.findOne({ where: { teamId: team.team.id, date: '2026-03-03' } });
    const recording = await makeRecording(team.team, { session });
    await writer
      .put(at(`recordings/${recording.id}/chapters`, team))
      .send({ version: 0, items: [chapter(0, 900, { movementId: shown.id })] })
      .expect(200);
  });

  const listed = async (browser: Visitor, query: object = {}) => {
    const titles: string[] = [];
    let cursor: string | null = null;
    do {
      const { body }: { body: { items: { title: string }[]; nextCursor: string | null } } = await browser
        .get(at('sessions', team))
        .query({ limit: 2, ...query, ...(cursor ? { cursor } : {}) })
        .expect(200);
      titles.push(...body.items.map(({ title }) => title));
      cursor = body.nextCursor;
    } while (cursor);
    return titles;
  };

  it('goes from the newest date back, page by page, with nothing twice', async () => {
    const titles = await listed(writer);
    expect(titles).toHaveLength(5);
    expect(new Set(titles).size).toBe(5);
    expect(titles.map((title) => title.slice(0, 10))).toEqual([
      '2026-03-04',
      '2026-03-03',
      '2026-03-02',
      '2026-03-02',
      '2026-03-01',
    ]);
  });

  it('shows members what is published, and a range of dates', async () => {
    expect(await listed(reader)).toEqual(['2026-03-03 published', '2026-03-02 published', '2026-03-01 published']);
    expect(await listed(reader, { from: '2026-03-02', to: '2026-03-02' })).toEqual(['2026-03-02 published']);
  });

  it('counts recordings, movements, and those that a demo shows', async () => {
    const { body } = await reader.get(at('sessions', team)).query({ limit: 1 }).expect(200);
    expect(body.items[0]).toMatchObject({
      title: '2026-03-03 published',
      coach: 'The coach',
      blockKinds: ['workout'],
      recordingCount: 1,
      movementCount: 2,
      shownCount: 1,
    });
  });

  it('refuses a cursor that is none', async () => {
    for (const parts of [
      ['2026-13-01', randomUUID()],
      ['2026-03-01', 'x'],
      [1, 2],
    ])
      await reader
        .get(at('sessions', team))
        .query({ cursor: Buffer.from(JSON.stringify(parts)).toString('base64url') })
        .expect(400);
  });
});
