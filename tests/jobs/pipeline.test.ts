import { createHash, randomBytes, randomUUID } from 'node:crypto';
import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { enqueue, makePlayback, makePoster, probeRecording } from '../../server/jobs/definitions';
import type { Queue } from '../../server/jobs/queue';
import { probeRecording as probe } from '../../server/media/probe';
import { database } from '../../server/models/database';
import { ChapterRow } from '../../server/models/marks';
import { Notice } from '../../server/models/people';
import { Recording, RecordingAsset, RecordingStep } from '../../server/models/recordings';
import { requestChapterPictures } from '../../server/services/chapterPictures';
import { store } from '../../server/services/context';
import { madeKey, madePrefix, originalsPrefix } from '../../storage/keys';
import { type Api, makeTeamOfFour, startApi, type TeamOfFour, type Visitor } from '../support/api';
import { drawn, clip as drawnClip, fileOf, h264, phoneClip, removeClips } from '../support/clips';
import { bytesInStore, keysInStore, uploadBytes, uploadFile } from '../support/footage';
import { startWorker, until, untilIdle } from '../support/worker';

let api: Api;
let queue: Queue;
let ours: TeamOfFour;
let coach: Visitor;
const usualFolder = process.env.TMPDIR;
const temporary = mkdtempSync(join(tmpdir(), 'tapeline-pipeline-'));

beforeAll(async () => {
  // whatever is left lying about lies here
  process.env.TMPDIR = temporary;
  api = await startApi();
  ours = await makeTeamOfFour();
  coach = await api.signedIn(ours.coach);
  queue = await startWorker(api);
});
afterAll(async () => {
  await queue.stop();
  await api.close();
  removeClips();
  if (usualFolder === undefined) delete process.env.TMPDIR;
  else process.env.TMPDIR = usualFolder;
  rmSync(temporary, { recursive: true, force: true });
});

const slug = () => ours.team.slug;
const keysOf = async (recordingId: string) => [
  ...(await keysInStore(originalsPrefix(ours.team.id, recordingId))),
  ...(await keysInStore(madePrefix(ours.team.id, recordingId))),
];
const ended = (id: string) =>
  until('the end of making', async () => {
    const { body } = await coach.get(`/api/teams/${slug()}/recordings/${id}`).expect(200);
    return (body.state === 'ready' || body.state === 'failed') && body;
  });
const ready = async (path: string) => {
  const { id } = await uploadFile(coach, slug(), path);
  const body = await ended(id);
  expect(body).toMatchObject({ state: 'ready', failure: null });
  await untilIdle();
  return body;
};
const made = (recordingId: string) => RecordingAsset.findAll({ where: { recordingId }, order: [['name', 'asc']] });

describe('a real clip', () => {
  it('becomes a recording with playback and poster, and tells who uploaded it', async () => {
    const path = await phoneClip();
    const { id } = await ready(path);
    const { body } = await coach.get(`/api/teams/${slug()}/recordings/${id}`).expect(200);
    expect(body).toMatchObject({ state: 'ready', width: 640, height: 360, fps: 30, chapterCount: 0 });
    expect(Math.abs(body.durationMs - 4000)).toBeLessThan(100);
    expect(body.steps).toEqual(
      ['probe', 'poster', 'playback', 'chapterPictures'].map((step) => ({ step, state: 'done', percent: 100 })),
    );
    const recording = await Recording.findByPk(id);
    expect(recording?.sha256).toBe(
      createHash('sha256')
        .update(await readFile(path))
        .digest('hex'),
    );

    const poster = await fetch(`${api.url}${body.posterUrl}`);
    expect(poster.headers.get('content-type')).toBe('image/jpeg');
    const { width, height } = await sharp(Buffer.from(await poster.arrayBuffer())).metadata();
    expect(width / height).toBeCloseTo(640 / 360, 1);

    const { body: watch } = await coach.get(`/api/teams/${slug()}/watch/${id}`).expect(200);
    const playback = await fetch(`${api.url}${watch.playback.url}`);
    const played = await probe(await fileOf('played.mp4', Buffer.from(await playback.arrayBuffer())));
    expect(played).toMatchObject({ videoCodec: 'h264', audioCodec: 'aac', width: 640, height: 360 });
    expect(Math.abs(played.durationMs - 4000)).toBeLessThan(150);

    const notices = await Notice.findAll({ where: { subjectId: id } });
    expect(notices.map((notice) => [notice.personId, notice.kind])).toEqual([[ours.coach.id, 'recordingReady']]);
  });

  it('gets a picture for each chapter, at its time, and loses those that no chapter shows any more', async () => {
    const { id } = await ready(await phoneClip());
    const chapter = (startMs: number, endMs: number) => ({
      teamId: ours.team.id,
      recordingId: id,
      id: randomUUID(),
      startMs,
      endMs,
      kind: 'demo' as const,
      title: 'Hinge',
    });
    const [first, second] = await ChapterRow.bulkCreate([chapter(0, 1500), chapter(2000, 4000)]);
    await requestChapterPictures(ours.team.id, id);
    await untilIdle();
    const pictures = (await made(id)).filter((asset) => asset.kind === 'chapterPicture');
    expect(new Map(pictures.map((picture) => [picture.chapterId, picture.atMs]))).toEqual(
      new Map([
        [first?.id, 600],
        [second?.id, 2800],
      ]),
    );
    const { body: watch } = await coach.get(`/api/teams/${slug()}/watch/${id}`).expect(200);
    for (const shown of watch.chapters) {
      const answer = await fetch(`${api.url}${shown.pictureUrl}`);
      expect((await sharp(Buffer.from(await answer.arrayBuffer())).metadata()).width).toBe(320);
    }

    // one is moved, one goes: one picture stays to be taken anew, none of the old ones
    await first?.destroy();
    await second?.update({ startMs: 1000 });
    await requestChapterPictures(ours.team.id, id);
    await untilIdle();
    const after = (await made(id)).filter((asset) => asset.kind === 'chapterPicture');
    expect(after.map((picture) => [picture.chapterId, picture.atMs])).toEqual([[second?.id, 2200]]);
    expect((await keysInStore(madePrefix(ours.team.id, id))).filter((key) => key.includes('chapter-'))).toEqual([
      madeKey(ours.team.id, id, after[0]?.name ?? ''),
    ]);
  });

  it('is made once: asked again, every step finds its result and leaves it as it is', async () => {
    const { id } = await ready(await phoneClip());
    const before = await made(id);
    const starts = await RecordingStep.findAll({ where: { recordingId: id } });
    const of = { teamId: ours.team.id, recordingId: id };
    await enqueue(probeRecording, of);
    await untilIdle();
    await enqueue(makePoster, of);
    await enqueue(makePlayback, of);
    await untilIdle();
    expect((await made(id)).map((asset) => [asset.id, asset.name])).toEqual(
      before.map((asset) => [asset.id, asset.name]),
    );
    const after = new Map((await RecordingStep.findAll({ where: { recordingId: id } })).map((row) => [row.step, row]));
    for (const row of starts.filter(({ step }) => step !== 'chapterPictures')) {
      expect(after.get(row.step)?.startedAt).toEqual(row.startedAt);
      expect(after.get(row.step)?.state).toBe('done');
    }
    expect(await Notice.count({ where: { subjectId: id } })).toBe(1);
  });

  it('is written over under the same names where a result was lost before it was noted', async () => {
    const { id } = await ready(await phoneClip());
    const before = await keysOf(id);
    await RecordingAsset.destroy({ where: { recordingId: id, kind: 'poster' } });
    await RecordingStep.update({ input: null, state: 'waiting' }, { where: { recordingId: id, step: 'poster' } });
    await enqueue(makePoster, { teamId: ours.team.id, recordingId: id });
    await untilIdle();
    expect(await keysOf(id)).toEqual(before);
    expect(await RecordingAsset.count({ where: { recordingId: id, kind: 'poster' } })).toBe(1);
  });

  it('takes all it left in the store along when it is removed', async () => {
    const { id } = await ready(await phoneClip());
    expect(await keysOf(id)).toHaveLength(3);
    await coach.delete(`/api/teams/${slug()}/recordings/${id}`).expect(200);
    await untilIdle();
    expect(await keysOf(id)).toEqual([]);
  });

  it('leaves no folder behind', async () => {
    await untilIdle();
    expect(readdirSync(temporary).filter((name) => name.startsWith('tapeline-making-'))).toEqual([]);
  });
});

describe('a file that is none', () => {
  const cutInTheMiddle = async () => {
    const whole = await readFile(
      await drawnClip('long.mp4', [...drawn('640x360', 20), ...h264(), '-movflags', '+faststart']),
    );
    return whole.subarray(0, Math.floor(whole.length * 0.5));
  };
  it.each([
    ['noise', 'notVideo', async () => randomBytes(50_000)],
    ['a single byte', 'notVideo', async () => Buffer.from([0])],
    ['a recording cut off in the middle', 'truncated', cutInTheMiddle],
    ['a recording without its index', 'truncated', async () => (await readFile(await noIndex())).subarray(0, 20_000)],
    [
      'a disguised playlist',
      'disguised',
      async () => Buffer.from('#EXTM3U\n#EXTINF:10,\nhttp://127.0.0.1:9/secret.ts\n#EXT-X-ENDLIST\n'),
    ],
    ['a disguised list of files', 'disguised', async () => Buffer.from("ffconcat version 1.0\nfile '/etc/hostname'\n")],
    ['sound alone', 'noPicture', async () => readFile(await soundAlone())],
  ])('%s is refused with a sentence and leaves nothing in the store', async (_name, code, bytes) => {
    const { id } = await uploadBytes(coach, slug(), await bytes(), { name: 'morning.mp4' });
    const body = await ended(id);
    expect(body).toMatchObject({ state: 'failed', failure: { code, retry: false }, posterUrl: null });
    expect(body.failure.message).toMatch(/^[A-Z].*\.$/);
    await untilIdle();
    expect(await keysOf(id)).toEqual([]);
    const notices = await Notice.findAll({ where: { subjectId: id } });
    expect(notices.map((notice) => notice.kind)).toEqual(['recordingFailed']);
    expect(notices[0]?.text).toContain(body.failure.message);
    await coach.post(`/api/teams/${slug()}/recordings/${id}/retry`).expect(409);
  });
});

const noIndex = () => drawnClip('index-last.mp4', [...drawn('320x180', 3), ...h264()]);
const soundAlone = () => drawnClip('sound.m4a', ['-f', 'lavfi', '-i', 'sine=duration=2', '-c:a', 'aac']);

describe('a fault of ours', () => {
  it('fails the recording with a sentence and a way to try again, and the try makes it ready', async () => {
    const bytes = await readFile(await phoneClip());
    await queue.stop();
    const { id } = await uploadBytes(coach, slug(), bytes);
    const recording = await Recording.findByPk(id);
    // the store has lost the object: nothing that the file is to blame for
    const kept = await bytesInStore(recording?.originalKey ?? '');
    await store().remove(recording?.originalKey ?? '');
    await database().query('update graphile_worker._private_jobs set max_attempts = 1');
    queue = await startWorker(api);
    const failed = await ended(id);
    expect(failed).toMatchObject({ state: 'failed', failure: { code: 'broken', retry: true } });

    await store().putBytes(recording?.originalKey ?? '', kept, 'video/mp4');
    const { body } = await coach.post(`/api/teams/${slug()}/recordings/${id}/retry`).expect(200);
    expect(body).toMatchObject({ state: 'making', failure: null });
    expect(await ended(id)).toMatchObject({ state: 'ready' });
  });
});
