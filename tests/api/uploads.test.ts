import { randomBytes, randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { probeRecording } from '../../server/jobs/definitions';
import { AuditEvent } from '../../server/models/people';
import { Recording, Upload, UploadPart } from '../../server/models/recordings';
import { store } from '../../server/services/context';
import { limits } from '../../shared/limits';
import { type Api, makeTeamOfFour, queuedJobs, startApi, type TeamOfFour, type Visitor } from '../support/api';
import {
  announce,
  bytesInStore,
  keysInStore,
  makeSession,
  partOf,
  putPart,
  sendPart,
  sha256Of,
  uploadBytes,
} from '../support/footage';

let api: Api;
let ours: TeamOfFour;
let slug: string;
let coach: Visitor;

beforeAll(async () => {
  api = await startApi();
  ours = await makeTeamOfFour();
  slug = ours.team.slug;
  coach = await api.signedIn(ours.coach);
});
afterAll(() => api.close());

const uploadPath = (id: string, rest = '') => `/api/teams/${slug}/uploads/${id}${rest}`;
const announcement = (change: Record<string, unknown> = {}) => ({
  requestKey: randomUUID(),
  fileName: 'morning.mp4',
  sizeBytes: 1000,
  contentType: 'video/mp4',
  ...change,
});

describe('announcing a file', () => {
  it.each([
    ['a picture', { fileName: 'squat.jpg', contentType: 'image/jpeg' }],
    ['a picture that calls itself a video', { fileName: 'squat.jpg', contentType: 'video/mp4' }],
    ['a page that calls itself a video', { fileName: 'squat.html', contentType: 'video/mp4' }],
    ['a video’s name with a page’s type', { fileName: 'squat.mp4', contentType: 'text/html' }],
    ['a playlist', { fileName: 'squat.m3u8', contentType: 'application/vnd.apple.mpegurl' }],
    ['bytes without an ending', { fileName: 'squat', contentType: 'application/octet-stream' }],
  ])('refuses %s before the first byte', async (_name, change) => {
    const before = await Recording.count();
    const answer = await coach.post(`/api/teams/${slug}/uploads`).send(announcement(change)).expect(415);
    expect(answer.body.error.code).toBe('wrongType');
    expect(await Recording.count()).toBe(before);
  });

  it('takes a video whose type the browser does not know, and stores it under a type that nothing runs', async () => {
    const { recordingId } = await announce(coach, slug, 10, { name: 'long walk.mkv', type: '' });
    const recording = await Recording.findByPk(recordingId);
    expect(recording).toMatchObject({
      title: 'long walk',
      contentType: 'application/octet-stream',
      state: 'uploading',
    });
  });

  it('keeps of a name what one line of plain text can hold', async () => {
    const { recordingId } = await announce(coach, slug, 10, { name: 'C:\\clips\\a\u0000b\u0007_two-handed swing.MOV' });
    const recording = await Recording.findByPk(recordingId);
    expect(recording).toMatchObject({ fileName: 'ab_two-handed swing.MOV', title: 'ab two handed swing' });
  });

  it.each([
    ['empty', 0, 400],
    ['larger than anything taken', limits.recordingBytes + 1, 413],
  ])('refuses a file that is %s, at its field', async (_name, sizeBytes, status) => {
    const answer = await coach.post(`/api/teams/${slug}/uploads`).send(announcement({ sizeBytes }));
    expect(answer.status).toBe(status);
    expect(answer.body.error.message).not.toBe('');
    expect(answer.body.error.fields ?? {}).toHaveProperty('sizeBytes');
  });

  it('answers the same key of the same person with the same upload, also at once', async () => {
    const body = announcement();
    const before = await Recording.count();
    const answers = await Promise.all(
      Array.from({ length: 4 }, () => coach.post(`/api/teams/${slug}/uploads`).send(body).expect(201)),
    );
    answers.push(await coach.post(`/api/teams/${slug}/uploads`).send(body).expect(201));
    expect(new Set(answers.map((answer) => answer.body.uploadId)).size).toBe(1);
    expect(await Recording.count()).toBe(before + 1);
    const owner = await api.signedIn(ours.owner);
    const other = await owner.post(`/api/teams/${slug}/uploads`).send(body).expect(201);
    expect(other.body.uploadId).not.toBe(answers[0]?.body.uploadId);
  });

  it('finds the session by the file’s date in the team’s zone, and counts its takes', async () => {
    const session = await makeSession(ours.team.id, { date: '2026-05-12', coachId: ours.owner.id });
    // 00:30 on the 12th in Berlin
    const first = await announce(coach, slug, 10, { fileDate: '2026-05-11T22:30:00.000Z' });
    const second = await announce(coach, slug, 10, { fileDate: '2026-05-12T21:59:00.000Z' });
    const dayBefore = await announce(coach, slug, 10, { fileDate: '2026-05-11T21:30:00.000Z' });
    const none = await announce(coach, slug, 10, { fileDate: '2026-05-12T10:00:00.000Z', sessionId: null });
    const recordings = await Promise.all(
      [first, second, dayBefore, none].map(({ recordingId }) => Recording.findByPk(recordingId)),
    );
    expect(recordings.map((recording) => [recording?.sessionId, recording?.take, recording?.coachId])).toEqual([
      [session.id, 1, ours.owner.id],
      [session.id, 2, ours.owner.id],
      [null, 1, ours.coach.id],
      [null, 1, ours.coach.id],
    ]);
  });

  it('chooses none of two sessions on one day', async () => {
    await makeSession(ours.team.id, { date: '2026-05-20' });
    await makeSession(ours.team.id, { date: '2026-05-20', title: 'Evening' });
    const { recordingId } = await announce(coach, slug, 10, { fileDate: '2026-05-20T10:00:00.000Z' });
    expect((await Recording.findByPk(recordingId))?.sessionId).toBeNull();
  });

  it('gives two files of one moment two takes', async () => {
    const session = await makeSession(ours.team.id, { date: '2026-06-01' });
    const uploads = await Promise.all(
      Array.from({ length: 4 }, () => announce(coach, slug, 10, { sessionId: session.id })),
    );
    const takes = await Recording.findAll({ where: { id: uploads.map((upload) => upload.recordingId) } });
    expect(takes.map((recording) => recording.take).toSorted()).toEqual([1, 2, 3, 4]);
  });

  it('refuses another team’s session at its field', async () => {
    const theirs = await makeTeamOfFour();
    const session = await makeSession(theirs.team.id);
    const answer = await coach
      .post(`/api/teams/${slug}/uploads`)
      .send(announcement({ sessionId: session.id }))
      .expect(400);
    expect(answer.body.error.fields).toHaveProperty('sessionId');
  });
});

describe('sending parts', () => {
  it('signs for exactly the size that a part has, and the store takes exactly those bytes', async () => {
    const bytes = randomBytes(2000);
    const upload = await announce(coach, slug, bytes.length);
    for (const part of [
      { number: 1, sizeBytes: 1999 },
      { number: 2, sizeBytes: 2000 },
    ])
      await coach
        .post(uploadPath(upload.uploadId, '/parts'))
        .send({ ...part, sha256: sha256Of(bytes) })
        .expect(400);
    const wrongByte = Buffer.from(bytes);
    wrongByte[7] = (wrongByte[7] ?? 0) ^ 1;
    expect((await putPart(coach, slug, upload, 1, bytes, wrongByte)).ok).toBe(false);
    expect((await putPart(coach, slug, upload, 1, bytes, Buffer.concat([bytes, bytes]))).ok).toBe(false);
    expect((await putPart(coach, slug, upload, 1, bytes)).ok).toBe(true);
  });

  it('goes on after a reload where it was, and joins parts in order whatever order they came in', async () => {
    const bytes = randomBytes(limits.uploadPartBytes + 1234);
    const upload = await announce(coach, slug, bytes.length);
    expect(upload).toMatchObject({ partCount: 2, partBytes: limits.uploadPartBytes, state: 'open', parts: [] });
    await sendPart(coach, slug, upload, 2, partOf(bytes, upload, 2));
    const reloaded = await coach.get(uploadPath(upload.uploadId)).expect(200);
    expect(reloaded.body.parts).toEqual([{ number: 2, sizeBytes: 1234, etag: expect.any(String) }]);

    const early = await coach.post(uploadPath(upload.uploadId, '/complete')).expect(409);
    expect(early.body.error).toMatchObject({ code: 'uploadIncomplete', message: 'Send these parts again: 1.' });
    await sendPart(coach, slug, upload, 1, partOf(bytes, upload, 1));
    await coach.post(uploadPath(upload.uploadId, '/complete')).expect(200);
    const row = await Upload.findByPk(upload.uploadId);
    expect((await bytesInStore(row?.objectKey ?? '')).equals(bytes)).toBe(true);
  });
});

describe('completing', () => {
  it('starts the making once, however often and however fast it is asked', async () => {
    const bytes = randomBytes(500);
    const upload = await announce(coach, slug, bytes.length);
    await sendPart(coach, slug, upload, 1, bytes);
    const answers = await Promise.all(
      Array.from({ length: 5 }, () => coach.post(uploadPath(upload.uploadId, '/complete')).expect(200)),
    );
    answers.push(await coach.post(uploadPath(upload.uploadId, '/complete')).expect(200));
    for (const answer of answers)
      expect(answer.body).toMatchObject({ id: upload.recordingId, state: 'making', sizeBytes: 500 });
    const jobs = await queuedJobs(probeRecording);
    expect(jobs.filter((job) => job.recordingId === upload.recordingId)).toHaveLength(1);
    const events = await AuditEvent.findAll({ where: { action: 'upload.completed', subjectId: upload.recordingId } });
    expect(events).toHaveLength(1);
    for (const request of [
      coach
        .put(uploadPath(upload.uploadId, '/parts'))
        .send({ number: 1, sizeBytes: 500, sha256: sha256Of(bytes), etag: 'x' }),
      coach.post(uploadPath(upload.uploadId, '/parts')).send({ number: 1, sizeBytes: 500, sha256: sha256Of(bytes) }),
      coach.delete(uploadPath(upload.uploadId)),
    ])
      expect((await request).status).toBe(409);
  });

  it('believes the store, not the report', async () => {
    const bytes = randomBytes(500);
    const upload = await announce(coach, slug, bytes.length);
    const report = (etag: string) =>
      coach
        .put(uploadPath(upload.uploadId, '/parts'))
        .send({ number: 1, sizeBytes: 500, sha256: sha256Of(bytes), etag })
        .expect(200);
    await report('"0123456789abcdef0123456789abcdef"');
    await coach.post(uploadPath(upload.uploadId, '/complete')).expect(409);
    await putPart(coach, slug, upload, 1, bytes);
    await report('"0123456789abcdef0123456789abcdef"');
    await coach.post(uploadPath(upload.uploadId, '/complete')).expect(409);
    expect(await UploadPart.count({ where: { uploadId: upload.uploadId } })).toBe(0);
    expect((await Recording.findByPk(upload.recordingId))?.state).toBe('uploading');
    await sendPart(coach, slug, upload, 1, bytes);
    await coach.post(uploadPath(upload.uploadId, '/complete')).expect(200);
  });

  it('goes on where a process died after the store had joined the parts', async () => {
    const bytes = randomBytes(500);
    const upload = await announce(coach, slug, bytes.length);
    await sendPart(coach, slug, upload, 1, bytes);
    const row = await Upload.findByPk(upload.uploadId);
    if (!row) throw new Error('no upload');
    const parts = await UploadPart.findAll({ where: { uploadId: row.id } });
    await store().completeUpload(row.objectKey, row.storeUploadId, parts);
    const answer = await coach.post(uploadPath(upload.uploadId, '/complete')).expect(200);
    expect(answer.body.state).toBe('making');
  });
});

describe('giving up', () => {
  it('leaves nothing behind, neither rows nor bytes', async () => {
    const bytes = randomBytes(500);
    const upload = await announce(coach, slug, bytes.length);
    await sendPart(coach, slug, upload, 1, bytes);
    const row = await Upload.findByPk(upload.uploadId);
    await coach.delete(uploadPath(upload.uploadId)).expect(200);
    expect(await Recording.findByPk(upload.recordingId)).toBeNull();
    expect(await Upload.findByPk(upload.uploadId)).toBeNull();
    expect(await UploadPart.count({ where: { uploadId: upload.uploadId } })).toBe(0);
    expect(await store().partsOf(row?.objectKey ?? '', row?.storeUploadId ?? '')).toBeNull();
    expect(await keysInStore(`originals/${ours.team.id}/${upload.recordingId}/`)).toEqual([]);
    await coach.delete(uploadPath(upload.uploadId)).expect(404);
  });
});

describe('who may', () => {
  it('keeps members out, and other teams see nothing', async () => {
    const member = await api.signedIn(ours.member);
    await member.post(`/api/teams/${slug}/uploads`).send(announcement()).expect(403);
    const editor = await api.signedIn(ours.editor);
    const recording = await uploadBytes(editor, slug, randomBytes(300));
    expect(recording.coach).toBeNull();

    const theirs = await makeTeamOfFour();
    const stranger = await api.signedIn(theirs.coach);
    const upload = await announce(coach, slug, 10);
    const path = `/api/teams/${theirs.team.slug}/uploads/${upload.uploadId}`;
    await stranger.get(path).expect(404);
    await stranger.post(`${path}/complete`).expect(404);
    await stranger.delete(path).expect(404);
    await stranger.get(uploadPath(upload.uploadId)).expect(404);
  });
});
