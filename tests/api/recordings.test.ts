import { randomUUID } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { probeRecording, removeObjects } from '../../server/jobs/definitions';
import { database } from '../../server/models/database';
import { ChapterRow } from '../../server/models/marks';
import { Recording } from '../../server/models/recordings';
import { Block } from '../../server/models/sessions';
import { becomeReady } from '../../server/services/recordingMaking';
import { refreshSearchOf } from '../../server/services/searchIndex';
import { madePrefix, originalsPrefix } from '../../storage/keys';
import { type Api, makeTeamOfFour, queuedJobs, startApi, type TeamOfFour, type Visitor } from '../support/api';
import { makeReadyRecording, makeSession } from '../support/footage';

let api: Api;
let ours: TeamOfFour;
let coach: Visitor;
let path: string;

beforeAll(async () => {
  api = await startApi();
  ours = await makeTeamOfFour();
  coach = await api.signedIn(ours.coach);
  path = `/api/teams/${ours.team.slug}/recordings`;
});
afterAll(() => api.close());

describe('the list', () => {
  it('is newest first, whole and without a repeat over its pages, at the same number of queries', async () => {
    const team = await makeTeamOfFour();
    const reader = await api.signedIn(team.editor);
    // two at the same instant, to the microsecond
    const at = [1, 2, 2, 3, 4].map((second) => new Date(Date.UTC(2026, 2, 3, 10, 0, second)));
    for (const createdAt of at) await makeReadyRecording(team.team.id, { createdAt });
    await database().query(`update recordings set created_at = created_at + interval '7 microseconds'`);
    const ids: string[] = [];
    let cursor = '';
    const queries: number[] = [];
    // there at run time, and not in the library's types
    const { options } = database() as unknown as { options: { logging: false | (() => void) } };
    do {
      let count = 0;
      options.logging = () => {
        count++;
      };
      const { body } = await reader
        .get(`/api/teams/${team.team.slug}/recordings?limit=2${cursor && `&cursor=${cursor}`}`)
        .expect(200);
      options.logging = false;
      queries.push(count);
      ids.push(...body.items.map((item: { id: string }) => item.id));
      cursor = body.nextCursor ?? '';
    } while (cursor !== '');
    const all = await Recording.findAll({
      where: { teamId: team.team.id },
      order: [
        ['createdAt', 'desc'],
        ['id', 'desc'],
      ],
    });
    expect(ids).toEqual(all.map((recording) => recording.id));
    expect(new Set(queries).size).toBe(1);
  });

  it.each(['nonsense', Buffer.from('["x","y"]').toString('base64url'), Buffer.from('[1]').toString('base64url')])(
    'refuses the cursor %s',
    async (cursor) => {
      const { body } = await coach.get(`${path}?cursor=${cursor}`).expect(400);
      expect(body.error.fields).toHaveProperty('cursor');
    },
  );

  it('is of the team alone, or of one of its sessions', async () => {
    const theirs = await makeTeamOfFour();
    await makeReadyRecording(theirs.team.id);
    const session = await makeSession(ours.team.id);
    const mine = await makeReadyRecording(ours.team.id, { sessionId: session.id, coachId: ours.coach.id });
    const { body } = await coach.get(`${path}?sessionId=${session.id}`).expect(200);
    expect(body.items).toHaveLength(1);
    expect(body.items[0]).toMatchObject({
      id: mine.id,
      session: { id: session.id, date: '2026-03-03', title: 'Hinge and hold', state: 'draft' },
      coach: { id: ours.coach.id, name: 'The coach' },
    });
    const poster = await fetch(`${api.url}${body.items[0].posterUrl}`);
    expect(await poster.text()).toBe(`poster of ${mine.id}`);
    const { body: whole } = await coach.get(path).expect(200);
    expect(whole.items.map((item: { id: string }) => item.id)).toEqual([mine.id]);
  });
});

describe('changing', () => {
  it('bumps the version, and a stale one is told the current state', async () => {
    const { id } = await makeReadyRecording(ours.team.id);
    const { body } = await coach
      .patch(`${path}/${id}`)
      .send({ title: ' Second try ', take: 2, version: 1 })
      .expect(200);
    expect(body).toMatchObject({ title: 'Second try', take: 2, version: 2 });
    const stale = await coach.patch(`${path}/${id}`).send({ title: 'Third', version: 1 }).expect(409);
    expect(stale.body.error).toMatchObject({ code: 'stale', current: { title: 'Second try', version: 2 } });
    expect((await Recording.findByPk(id))?.title).toBe('Second try');
  });

  it('to another session takes the old one’s blocks off its chapters', async () => {
    const [from, to] = await Promise.all([makeSession(ours.team.id), makeSession(ours.team.id)]);
    const block = await Block.create({ teamId: ours.team.id, sessionId: from.id, position: 0, kind: 'workout' });
    const { id } = await makeReadyRecording(ours.team.id, { sessionId: from.id });
    const chapter = await ChapterRow.create({
      teamId: ours.team.id,
      id: randomUUID(),
      recordingId: id,
      startMs: 0,
      endMs: 1000,
      kind: 'workout',
      title: 'Once through',
      blockId: block.id,
    });
    await coach.patch(`${path}/${id}`).send({ title: 'Same session', version: 1 }).expect(200);
    expect((await chapter.reload()).blockId).toBe(block.id);
    const { body } = await coach.patch(`${path}/${id}`).send({ sessionId: to.id, version: 2 }).expect(200);
    expect(body.session.id).toBe(to.id);
    expect((await chapter.reload()).blockId).toBeNull();
  });

  it('refuses what does not fit, and another team’s session', async () => {
    const { id } = await makeReadyRecording(ours.team.id);
    const theirs = await makeSession((await makeTeamOfFour()).team.id);
    for (const change of [{ title: '' }, { take: 0 }, { sessionId: theirs.id }]) {
      const { body } = await coach
        .patch(`${path}/${id}`)
        .send({ ...change, version: 1 })
        .expect(400);
      expect(Object.keys(body.error.fields)).toEqual(Object.keys(change));
    }
  });
});

describe('what members find', () => {
  const visibility = async (recordingId: string) => {
    const rows = await database().query<{ visibility: number }>(
      'select visibility from chapter_search where recording_id = :recordingId',
      { replacements: { recordingId }, type: QueryTypes.SELECT },
    );
    return rows.map((row) => row.visibility);
  };

  it('follows the recording: hidden until it plays, and with its session', async () => {
    const [shown, draft] = await Promise.all([
      makeSession(ours.team.id, { published: true }),
      makeSession(ours.team.id),
    ]);
    const recording = await makeReadyRecording(ours.team.id, { sessionId: shown.id });
    const { id } = recording;
    await recording.update({ state: 'making' });
    await ChapterRow.create({
      teamId: ours.team.id,
      id: randomUUID(),
      recordingId: id,
      startMs: 0,
      endMs: 1000,
      kind: 'demo',
      title: 'Hinge',
    });
    await refreshSearchOf({ recordingId: id });
    expect(await visibility(id)).toEqual([1]);
    await becomeReady(recording);
    expect(await visibility(id)).toEqual([0]);
    await coach.patch(`${path}/${id}`).send({ sessionId: draft.id, version: 1 }).expect(200);
    expect(await visibility(id)).toEqual([1]);
    await coach.delete(`${path}/${id}`).expect(200);
    expect(await visibility(id)).toEqual([]);
  });
});

describe('trying again', () => {
  const failed = (retry: boolean) =>
    Recording.create({
      teamId: ours.team.id,
      title: 'Broken',
      fileName: 'broken.mp4',
      sizeBytes: 10,
      contentType: 'video/mp4',
      state: 'failed',
      originalKey: retry ? 'originals/there' : null,
      failure: { code: 'broken', message: 'Something broke.', retry },
    });

  it('starts the making anew where that can help', async () => {
    const { id } = await failed(true);
    const { body } = await coach.post(`${path}/${id}/retry`).expect(200);
    expect(body).toMatchObject({ state: 'making', failure: null });
    expect((await queuedJobs(probeRecording)).filter((job) => job.recordingId === id)).toHaveLength(1);
    await coach.post(`${path}/${id}/retry`).expect(409);
  });

  it('says what to do where it cannot', async () => {
    const { id } = await failed(false);
    const { body } = await coach.post(`${path}/${id}/retry`).expect(409);
    expect(body.error).toMatchObject({
      code: 'notReady',
      message: 'Another try cannot help here. Upload the file again.',
    });
    const fine = await makeReadyRecording(ours.team.id);
    await coach.post(`${path}/${fine.id}/retry`).expect(409);
  });
});

describe('removing', () => {
  it('takes the rows at once and asks for the bytes', async () => {
    const { id } = await makeReadyRecording(ours.team.id);
    const editor = await api.signedIn(ours.editor);
    await editor.delete(`${path}/${id}`).expect(403);
    await coach.delete(`${path}/${id}`).expect(200);
    await coach.get(`${path}/${id}`).expect(404);
    await coach.delete(`${path}/${id}`).expect(404);
    const job = (await queuedJobs(removeObjects)).find((payload) => payload.recordingId === id);
    expect(job?.prefixes).toEqual([originalsPrefix(ours.team.id, id), madePrefix(ours.team.id, id)]);
  });
});

it('shows members and other teams nothing', async () => {
  const { id } = await makeReadyRecording(ours.team.id);
  const member = await api.signedIn(ours.member);
  await member.get(path).expect(403);
  await member.get(`${path}/${id}`).expect(403);
  const theirs = await makeTeamOfFour();
  const stranger = await api.signedIn(theirs.owner);
  await stranger.get(`/api/teams/${theirs.team.slug}/recordings/${id}`).expect(404);
  await stranger.delete(`/api/teams/${theirs.team.slug}/recordings/${id}`).expect(404);
  await stranger
    .patch(`/api/teams/${theirs.team.slug}/recordings/${id}`)
    .send({ title: 'Ours', version: 1 })
    .expect(404);
});
