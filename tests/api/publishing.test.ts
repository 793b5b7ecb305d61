import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { inTransaction } from '../../server/models/database';
import type { KitItem, Movement } from '../../server/models/dictionary';
import { AuditEvent, Notice } from '../../server/models/people';
import type { Recording } from '../../server/models/recordings';
import { Block, LineSubstitution, Session } from '../../server/models/sessions';
import { bumpDictionary } from '../../server/services/dictionary';
import { refreshSearchOf } from '../../server/services/searchIndex';
import { type Api, makeMember, makeTeamOfFour, startApi, type TeamOfFour, type Visitor } from '../support/api';
import {
  chapter,
  makeKitItem,
  makeMovement as makeMovementRow,
  makeRecording,
  makeSession,
  makeSubstitution as makeSubstitutionRow,
  needs,
  reps,
} from '../support/library';

let api: Api;
let ours: TeamOfFour;
let coach: Visitor;
let member: Visitor;

beforeAll(async () => {
  api = await startApi();
  ours = await makeTeamOfFour();
  [coach, member] = [await api.signedIn(ours.coach), await api.signedIn(ours.member)];
});
afterAll(() => api.close());

/** Rows made past the services are told of, as the services do. */
const makeMovement = async (...given: Parameters<typeof makeMovementRow>) => {
  const movement = await makeMovementRow(...given);
  await bumpDictionary(movement.teamId);
  return movement;
};
const makeSubstitution = async (...given: Parameters<typeof makeSubstitutionRow>) => {
  const substitution = await makeSubstitutionRow(...given);
  await bumpDictionary(substitution.teamId);
};

const at = (path: string) => `/api/teams/${ours.team.slug}/${path}`;
type Remark = { severity: string; text: string; recordingId: string | null; movementId: string | null };
const remarksOn = async (session: Session): Promise<Remark[]> =>
  (await coach.get(at(`sessions/${session.id}/publish-check`)).expect(200)).body.remarks;
const publish = (session: Session, version = 1) => coach.post(at(`sessions/${session.id}/publish`)).send({ version });
const unpublish = (session: Session, version: number) =>
  coach.post(at(`sessions/${session.id}/unpublish`)).send({ version });
const mark = (recording: Recording, items: object[], version = 0) =>
  coach
    .put(at(`recordings/${recording.id}/chapters`))
    .send({ version, items })
    .expect(200);

describe('what is missing before members can use a session', () => {
  it('a plan without blocks, or with nothing in them, is useless and is not published', async () => {
    const { session, block } = await makeSession(ours.team, { state: 'draft' });
    await block.update({ title: '', scheme: null });
    expect((await remarksOn(session)).filter(({ severity }) => severity === 'missing')).toHaveLength(1);
    await Block.destroy({ where: { id: block.id } });
    const [remark] = await remarksOn(session);
    expect(remark).toMatchObject({ severity: 'missing', text: 'The plan has no blocks yet.' });
    const { body } = await publish(session).expect(409);
    expect(body.error).toMatchObject({ code: 'notReady', message: remark?.text });
    expect((await session.reload()).state).toBe('draft');
  });

  it('everything else only says so', async () => {
    const bar = await makeKitItem(ours.team, 'bar', 'nothing to hang from');
    const pull = await makeMovement(ours.team, 'Pull-up', { kitNeeded: needs(bar) });
    const walk = await makeMovement(ours.team, 'Bear walk');
    const { session } = await makeSession(ours.team, { state: 'draft', movements: [pull, walk] });
    const texts = async () => (await remarksOn(session)).map(({ text }) => text);
    expect(await texts()).toEqual([
      'There is no recording yet: members get the plan alone.',
      'No demo shows “Pull-up” yet.',
      'No demo shows “Bear walk” yet.',
      '“Pull-up” has no substitution for members with nothing to hang from.',
    ]);
    const towel = await makeMovement(ours.team, 'Towel row');
    await makeSubstitution(ours.team, pull, towel, bar);
    expect(await texts()).toContain('“Towel row” stands in for “Pull-up”, and no demo shows it yet.');
    expect(await texts()).not.toContain('“Pull-up” has no substitution for members with nothing to hang from.');
    await publish(session).expect(200);
  });

  it('looks at the recordings: what is not ready, not marked, not linked, not captioned', async () => {
    const walk = await makeMovement(ours.team, 'Crab walk');
    const { session } = await makeSession(ours.team, { state: 'draft', movements: [walk] });
    const [marked, bare, making] = [
      await makeRecording(ours.team, { session, title: 'Marked' }),
      await makeRecording(ours.team, { session, title: 'Bare' }),
      await makeRecording(ours.team, { session, title: 'Making', state: 'making' }),
    ];
    const failed = await makeRecording(ours.team, { session, title: 'Failed', state: 'making' });
    await failed.update({ state: 'failed' });
    await mark(marked, [chapter(0, 9000, { movementId: walk.id }), chapter(9000, 12_000, { title: 'Loose' })]);
    const remarks = await remarksOn(session);
    expect(remarks.every(({ severity }) => severity === 'thin')).toBe(true);
    const about = (recording: Recording) =>
      remarks.filter(({ recordingId }) => recordingId === recording.id).map(({ text }) => text);
    expect(about(marked)).toEqual([
      expect.stringMatching(/“Loose” .* shows no movement yet/),
      expect.stringContaining('no captions'),
    ]);
    expect(about(bare)).toEqual([expect.stringContaining('no chapters'), expect.stringContaining('no captions')]);
    expect(about(making)).toEqual([expect.stringContaining('not ready yet')]);
    expect(about(failed)).toEqual([expect.stringContaining('could not be made')]);
    // its own ready recording will show the movement
    expect(remarks.filter(({ movementId }) => movementId === walk.id)).toEqual([]);

    const captions = { version: 0, lines: [{ startMs: 0, endMs: 2000, text: 'Hands down.' }] };
    await coach
      .put(at(`recordings/${marked.id}/captions`))
      .send(captions)
      .expect(200);
    await mark(marked, [chapter(0, 9000, { movementId: walk.id })], 1);
    expect((await remarksOn(session)).filter(({ recordingId }) => recordingId === marked.id)).toEqual([]);
  });

  it('does not count a demo that only a draft has', async () => {
    const crawl = await makeMovement(ours.team, 'Seal crawl');
    const { session: draft } = await makeSession(ours.team, { state: 'draft' });
    await mark(await makeRecording(ours.team, { session: draft }), [chapter(0, 9000, { movementId: crawl.id })]);
    const { session } = await makeSession(ours.team, { state: 'draft', movements: [crawl] });
    const isAsked = async () => (await remarksOn(session)).some(({ movementId }) => movementId === crawl.id);
    expect(await isAsked()).toBe(true);
    await publish(draft).expect(200);
    expect(await isAsked()).toBe(false);
  });

  it('asks for a demo of what the plan itself says to do instead', async () => {
    const [hop, step] = [await makeMovement(ours.team, 'Skips'), await makeMovement(ours.team, 'Quick step')];
    const { session, lines } = await makeSession(ours.team, { state: 'draft', movements: [hop] });
    await LineSubstitution.create({
      teamId: ours.team.id,
      lineId: lines[0]?.id ?? '',
      position: 0,
      movementId: step.id,
      missing: 'space',
      dose: reps(20),
    });
    expect((await remarksOn(session)).map(({ text }) => text)).toContain(
      '“Quick step” stands in for “Skips”, and no demo shows it yet.',
    );
  });

  it('is asked and said by coaches alone', async () => {
    const { session } = await makeSession(ours.team, { state: 'draft' });
    const editor = await api.signedIn(ours.editor);
    for (const browser of [member, editor]) {
      await browser.get(at(`sessions/${session.id}/publish-check`)).expect(403);
      await browser
        .post(at(`sessions/${session.id}/publish`))
        .send({ version: 1 })
        .expect(403);
    }
  });
});

describe('publishing', () => {
  let rings: KitItem;
  let row: Movement;
  let rows = 0;

  beforeAll(async () => {
    rings = await makeKitItem(ours.team, 'rings');
  });

  async function draftThatShows() {
    row = await makeMovement(ours.team, `Lantern row ${'abcdefgh'[rows++]}`, { kitNeeded: needs(rings) });
    const { session } = await makeSession(ours.team, { state: 'draft', title: 'Row day', movements: [row] });
    const recording = await makeRecording(ours.team, { session });
    await mark(recording, [
      chapter(0, 9000, { movementId: row.id, title: row.name }),
      chapter(9000, 12_000, { movementId: row.id, kind: 'aside', title: 'Outtake' }),
    ]);
    return { session, recording };
  }
  const found = async (browser: Visitor, words: string) => {
    const { groups } = (await browser.get(at('find')).query({ q: words }).expect(200)).body;
    return groups
      .flatMap((group: { findings: { moment: { movement: { id: string } | null; kind: string } }[] }) => group.findings)
      .filter(({ moment }: { moment: { movement: { id: string } | null } }) => moment.movement?.id === row.id)
      .map(({ moment }: { moment: { kind: string } }) => moment.kind);
  };

  it('lets members see and find what it shows, without asides, and back', async () => {
    const { session, recording } = await draftThatShows();
    const words = row.name;
    expect(await found(member, words)).toEqual([]);
    await member.get(at(`watch/${recording.id}`)).expect(404);

    const { body } = await publish(session).expect(200);
    expect(body).toMatchObject({ state: 'published', version: 2, publishedAt: expect.any(String) });
    expect(await found(member, words)).toEqual(['demo']);
    await member.get(at(`sessions/${session.id}`)).expect(200);
    await member.get(at(`watch/${recording.id}`)).expect(200);

    const back = (await unpublish(session, 2).expect(200)).body;
    expect(back).toMatchObject({ state: 'draft', publishedAt: null, version: 3 });
    expect(await found(member, words)).toEqual([]);
    await member.get(at(`sessions/${session.id}`)).expect(404);
    await member.get(at(`watch/${recording.id}`)).expect(404);
  });

  it('twice at once publishes once and tells each member once', async () => {
    const { session } = await draftThatShows();
    const second = await makeMember(ours.team, 'member');
    const answers = await Promise.all([publish(session), publish(session)]);
    expect(answers.map(({ status }) => status)).toEqual([200, 200]);
    expect(answers.map(({ body }) => body.version)).toEqual([2, 2]);
    expect(await AuditEvent.count({ where: { subjectId: session.id, action: 'session.published' } })).toBe(1);
    const notices = await Notice.findAll({ where: { subjectId: session.id } });
    expect(notices.map(({ personId }) => personId).sort()).toEqual([ours.member.id, second.id].sort());
    // 3 March 2026 is a Tuesday (ISO 8601 week date 2026-W10-2)
    expect(notices[0]?.text).toBe('“Row day” for Tuesday 3 March is up.');
    const twice = await Promise.all([unpublish(session, 2), unpublish(session, 2)]);
    expect(twice.map(({ status }) => status)).toEqual([200, 200]);
    expect(await Notice.count({ where: { subjectId: session.id } })).toBe(0);
  });

  it('of a plan that somebody changed meanwhile is refused with what is there', async () => {
    const { session } = await draftThatShows();
    const change = {
      date: session.date,
      title: 'Changed',
      blocks: [{ id: session.id, kind: 'briefing', note: 'Talk.' }],
    };
    await coach
      .put(at(`sessions/${session.id}`))
      .send({ ...change, version: 1 })
      .expect(200);
    const { body } = await publish(session, 1).expect(409);
    expect(body.error).toMatchObject({ code: 'stale', current: { title: 'Changed', version: 2, state: 'draft' } });
    await publish(session, 2).expect(200);
    expect((await unpublish(session, 1).expect(409)).body.error.code).toBe('stale');
    expect((await Session.findByPk(session.id))?.state).toBe('published');
  });

  it('and saving at the same time lose nothing: one of the two sees the other', async () => {
    const { session } = await draftThatShows();
    const current = (await coach.get(at(`sessions/${session.id}`)).expect(200)).body;
    const [published, saved] = await Promise.all([
      publish(session, 1),
      coach
        .put(at(`sessions/${session.id}`))
        .send({ date: session.date, title: 'Late change', blocks: current.blocks, version: 1 }),
    ]);
    expect([published.status, saved.status].sort()).toEqual([200, 409]);
  });

  it('back to a draft while somebody corrects the captions hides it all the same', async () => {
    const { session, recording } = await draftThatShows();
    await publish(session).expect(200);
    const captions = { version: 0, lines: [{ startMs: 0, endMs: 2000, text: 'Elbows back.' }] };
    let saving: Promise<{ status: number }> | undefined;
    await inTransaction(async () => {
      await Session.update({ state: 'draft', publishedAt: null }, { where: { id: session.id } });
      await refreshSearchOf({ sessionId: session.id });
      // arrives before the other has ended, and must wait for it
      saving = coach
        .put(at(`recordings/${recording.id}/captions`))
        .send(captions)
        .then((answer) => answer);
      await new Promise((resolve) => setTimeout(resolve, 400));
    });
    expect((await saving)?.status).toBe(200);
    expect(await found(member, row.name)).toEqual([]);
    expect(await found(coach, row.name)).toEqual(['demo']);
  });
});
