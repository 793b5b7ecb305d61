import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type KitItem, Movement, Substitution } from '../../server/models/dictionary';
import { AuditEvent } from '../../server/models/people';
import { LineSubstitution } from '../../server/models/sessions';
import { type Api, makeTeamOfFour, startApi, type TeamOfFour, type Visitor } from '../support/api';
import {
  chapter,
  makeKitItem,
  makeMovement,
  makeRecording,
  makeSession,
  makeSubstitution,
  reps,
} from '../support/library';

let api: Api;
let ours: TeamOfFour;
let theirs: TeamOfFour;
let coach: Visitor;
let member: Visitor;
let rings: KitItem;

beforeAll(async () => {
  api = await startApi();
  [ours, theirs] = [await makeTeamOfFour(), await makeTeamOfFour()];
  [coach, member] = [await api.signedIn(ours.coach), await api.signedIn(ours.member)];
  rings = await makeKitItem(ours.team, 'rings');
});
afterAll(() => api.close());

const at = (path: string) => `/api/teams/${ours.team.slug}/${path}`;
const merge = (kept: Movement, duplicate: Movement, versions: object = {}) =>
  coach
    .post(at(`movements/${kept.id}/merge`))
    .send({ duplicateId: duplicate.id, version: 1, duplicateVersion: 1, ...versions });

let pairs = 0;
async function pair() {
  pairs++;
  return [
    await makeMovement(ours.team, `Ring row ${pairs}`, { otherNames: ['Body row'] }),
    await makeMovement(ours.team, `Row on rings ${pairs}`, { otherNames: ['body row', 'Strap row'] }),
  ] as const;
}

describe('merging a duplicate', () => {
  it('moves its names, chapters, plan lines, cues and substitutions, and leaves nothing behind', async () => {
    const [kept, duplicate] = await pair();
    const other = await makeMovement(ours.team, 'Towel row');
    const { session, lines } = await makeSession(ours.team, { movements: [duplicate, other] });
    await LineSubstitution.create({
      teamId: ours.team.id,
      lineId: lines[1]?.id ?? '',
      position: 0,
      movementId: duplicate.id,
      missing: 'space',
      dose: reps(5),
    });
    const recording = await makeRecording(ours.team, { session });
    const path = at(`recordings/${recording.id}`);
    const items = [
      chapter(0, 9000, { movementId: duplicate.id, title: 'One' }),
      chapter(9000, 20_000, {
        kind: 'substitution',
        movementId: other.id,
        standsInForMovementId: duplicate.id,
        missing: 'kit',
        missingKitItemId: rings.id,
      }),
    ];
    await coach.put(`${path}/chapters`).send({ version: 0, items }).expect(200);
    const cue = { id: randomUUID(), atMs: 500, kind: 'go', text: 'Ribs down.', movementId: duplicate.id };
    await coach
      .put(`${path}/cues`)
      .send({ version: 0, items: [cue] })
      .expect(200);
    await makeSubstitution(ours.team, duplicate, other, rings);
    await makeSubstitution(ours.team, other, duplicate, rings);

    const { body } = await merge(kept, duplicate).expect(200);
    expect(body).toMatchObject({ id: kept.id, version: 2, otherNames: ['Body row', duplicate.name, 'Strap row'] });

    const chapters = (await coach.get(`${path}/chapters`).expect(200)).body.items;
    expect(chapters[0].movementId).toBe(kept.id);
    expect(chapters[1].standsInForMovementId).toBe(kept.id);
    expect((await coach.get(`${path}/cues`).expect(200)).body.items[0].movementId).toBe(kept.id);
    const plan = (await coach.get(at(`sessions/${session.id}`)).expect(200)).body.blocks[0].lines;
    expect(plan[0].movementId).toBe(kept.id);
    expect(plan[1].substitutions[0].movementId).toBe(kept.id);
    const page = (await member.get(at(`movements/${kept.id}`)).expect(200)).body;
    expect([page.substitutions.length, page.standsInFor.length, page.moments.length]).toEqual([1, 1, 1]);

    // old links lead on, lists and searches show one
    const old = (await member.get(at(`movements/${duplicate.id}`)).expect(200)).body;
    expect(old.movement).toEqual(page.movement);
    const found = await member.get(at('find')).query({ q: duplicate.name }).expect(200);
    expect(found.body.groups[0].findings[0].moment.movement).toEqual({ id: kept.id, name: kept.name });
    const names = (await member.get(at('movement-names')).expect(200)).body.items.map((one: { id: string }) => one.id);
    expect(names).not.toContain(duplicate.id);
    const [event] = await AuditEvent.findAll({ where: { subjectId: kept.id, action: 'movement.merged' } });
    expect(event?.details).toMatchObject({ duplicateId: duplicate.id, duplicateName: duplicate.name });
  });

  it('makes no substitution of a movement by itself, and none twice', async () => {
    const [kept, duplicate] = await pair();
    const other = await makeMovement(ours.team, 'Door row');
    await makeSubstitution(ours.team, kept, duplicate, rings);
    await makeSubstitution(ours.team, kept, other, rings);
    await makeSubstitution(ours.team, duplicate, other, rings);
    await makeSubstitution(ours.team, other, kept, rings);
    await makeSubstitution(ours.team, other, duplicate, rings);
    const { session, lines } = await makeSession(ours.team, { movements: [kept, other] });
    const inLine = (line: number, movement: Movement, position: number) =>
      LineSubstitution.create({
        teamId: ours.team.id,
        lineId: lines[line]?.id ?? '',
        position,
        movementId: movement.id,
        missing: 'space',
        dose: reps(5),
      });
    await inLine(0, duplicate, 0);
    await inLine(1, kept, 0);
    await inLine(1, duplicate, 1);
    const recording = await makeRecording(ours.team);
    await coach
      .put(at(`recordings/${recording.id}/chapters`))
      .send({
        version: 0,
        items: [chapter(0, 900, { kind: 'substitution', movementId: kept.id, standsInForMovementId: duplicate.id })],
      })
      .expect(200);

    await merge(kept, duplicate).expect(200);
    const rows = await Substitution.findAll({ where: { missingKitItemId: rings.id } });
    const links = rows
      .filter((row) => [row.fromMovementId, row.toMovementId].includes(kept.id))
      .map((row) => [row.fromMovementId, row.toMovementId]);
    expect(links).toHaveLength(2);
    expect(links).toEqual(
      expect.arrayContaining([
        [kept.id, other.id],
        [other.id, kept.id],
      ]),
    );
    const plan = (await coach.get(at(`sessions/${session.id}`)).expect(200)).body.blocks[0].lines;
    expect(plan.map((line: { substitutions: unknown[] }) => line.substitutions.length)).toEqual([0, 1]);
    const { body } = await coach.get(at(`recordings/${recording.id}/chapters`)).expect(200);
    expect(body.items[0]).toMatchObject({ movementId: kept.id, standsInForMovementId: null });
  });

  it('keeps the cautions of both, each once', async () => {
    const kept = await makeMovement(ours.team, 'Box jump', { cautions: [{ say: 'Clear the floor.', more: '' }] });
    const duplicate = await makeMovement(ours.team, 'Jump to box', {
      cautions: [
        { say: 'Clear the floor.', more: '' },
        { say: 'Step down.', more: '' },
      ],
    });
    const { body } = await merge(kept, duplicate).expect(200);
    expect(body.cautions.map(({ say }: { say: string }) => say)).toEqual(['Clear the floor.', 'Step down.']);
  });

  it('is done once by a double click', async () => {
    const [kept, duplicate] = await pair();
    const answers = await Promise.all([merge(kept, duplicate), merge(kept, duplicate)]);
    expect(answers.map(({ status }) => status)).toEqual([200, 200]);
    expect(answers[0]?.body).toEqual(answers[1]?.body);
  });

  it('the other way round at the same time merges one of the two ways', async () => {
    const [kept, duplicate] = await pair();
    const answers = await Promise.all([merge(kept, duplicate), merge(duplicate, kept)]);
    expect(answers.map(({ status }) => status === 200).sort()).toEqual([false, true]);
    const rows = await Movement.findAll({ where: { id: [kept.id, duplicate.id] } });
    expect(rows.filter(({ mergedIntoId }) => mergedIntoId === null)).toHaveLength(1);
  });

  it('is refused where either was changed meanwhile, with what is there', async () => {
    const [kept, duplicate] = await pair();
    const { body } = await merge(kept, duplicate, { duplicateVersion: 0 }).expect(409);
    expect(body.error).toMatchObject({ code: 'stale', current: { id: kept.id, version: 1 } });
    await merge(kept, duplicate, { version: 7 }).expect(409);
    expect((await duplicate.reload()).mergedIntoId).toBeNull();
  });

  it('is refused with itself, with another team’s and with one that was merged elsewhere', async () => {
    const [kept, duplicate] = await pair();
    const foreign = await makeMovement(theirs.team, 'Their row');
    for (const wrong of [kept, foreign]) {
      const { body } = await merge(kept, wrong).expect(400);
      expect(body.error.fields).toHaveProperty('duplicateId');
    }
    await merge(foreign, kept).expect(404);
    await merge(kept, duplicate).expect(200);
    const third = await makeMovement(ours.team, 'Third row');
    await merge(third, duplicate).expect(400);
    const change = { name: 'New name', pattern: 'pull', version: 2 };
    const { body } = await coach
      .put(at(`movements/${duplicate.id}`))
      .send(change)
      .expect(404);
    expect(body.error.message).toContain(kept.name);
  });

  it('of what was merged into before leads both on', async () => {
    const [first, second] = await pair();
    const last = await makeMovement(ours.team, 'Last row');
    await merge(second, first).expect(200);
    await merge(last, second, { duplicateVersion: 2 }).expect(200);
    const { body } = await member.get(at(`movements/${first.id}`)).expect(200);
    expect(body.movement.id).toBe(last.id);
  });
});

describe('what still names the duplicate', () => {
  it('a page that was open saves chapters, cues and plan all the same', async () => {
    const [kept, duplicate] = await pair();
    const { session, block, lines } = await makeSession(ours.team, { movements: [duplicate] });
    const recording = await makeRecording(ours.team, { session });
    await merge(kept, duplicate).expect(200);

    const path = at(`recordings/${recording.id}`);
    const items = [chapter(0, 9000, { movementId: duplicate.id })];
    const saved = await coach.put(`${path}/chapters`).send({ version: 0, items }).expect(200);
    expect(saved.body.items[0].movementId).toBe(kept.id);
    const cue = { id: randomUUID(), atMs: 500, kind: 'go', text: 'Ribs down.', movementId: duplicate.id };
    const cued = await coach
      .put(`${path}/cues`)
      .send({ version: 0, items: [cue] })
      .expect(200);
    expect(cued.body.items[0].movementId).toBe(kept.id);
    const line = { id: lines[0]?.id, movementId: duplicate.id, dose: reps(9), substitutions: [] };
    const own = { id: randomUUID(), movementId: kept.id, missing: 'space', dose: reps(4) };
    const planned = await coach
      .put(at(`sessions/${session.id}`))
      .send({
        date: session.date,
        title: session.title,
        version: 1,
        blocks: [{ id: block.id, kind: 'workout', lines: [{ ...line, substitutions: [own] }] }],
      })
      .expect(200);
    // what the page wrote as a substitution is the planned movement now
    expect(planned.body.blocks[0].lines[0]).toMatchObject({ movementId: kept.id, substitutions: [] });
  });

  it('an earlier version comes back with what the duplicate became', async () => {
    const [kept, duplicate] = await pair();
    const recording = await makeRecording(ours.team);
    const path = at(`recordings/${recording.id}/chapters`);
    await coach
      .put(path)
      .send({ version: 0, items: [chapter(0, 9000, { movementId: duplicate.id })] })
      .expect(200);
    await coach.put(path).send({ version: 1, items: [] }).expect(200);
    await merge(kept, duplicate).expect(200);
    const { body } = await coach.post(`${path}/restore`).send({ restore: 1, version: 2 }).expect(200);
    expect(body.items[0].movementId).toBe(kept.id);
  });

  it('a plan that is saved while its movement is merged ends with the movement', async () => {
    const [kept, duplicate] = await pair();
    const { session, block } = await makeSession(ours.team);
    const plan = {
      date: session.date,
      title: session.title,
      version: 1,
      blocks: [
        {
          id: block.id,
          kind: 'workout',
          lines: Array.from({ length: 20 }, () => ({ id: randomUUID(), movementId: duplicate.id, dose: reps(9) })),
        },
      ],
    };
    const [saved, merged] = await Promise.all([
      coach.put(at(`sessions/${session.id}`)).send(plan),
      merge(kept, duplicate),
    ]);
    expect([saved.status, merged.status]).toEqual([200, 200]);
    const { body } = await coach.get(at(`sessions/${session.id}`)).expect(200);
    expect(new Set(body.blocks[0].lines.map((line: { movementId: string }) => line.movementId))).toEqual(
      new Set([kept.id]),
    );
  });
});
