import { type ChildProcess, spawn } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { QueryTypes } from 'sequelize';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import {
  enqueue,
  type JobDefinition,
  makePlayback,
  probeRecording,
  removeObjects,
} from '../../server/jobs/definitions';
import { type Handler, handle } from '../../server/jobs/handler';
import { type Queue, startQueue } from '../../server/jobs/queue';
import { openLog } from '../../server/middleware/log';
import { database, inTransaction } from '../../server/models/database';
import { Recording, RecordingStep } from '../../server/models/recordings';
import { type Api, makeTeamOfFour, queuedJobs, startApi, type TeamOfFour, type Visitor } from '../support/api';
import { clip, drawn, played, removeClips } from '../support/clips';
import { uploadBytes } from '../support/footage';
import { startWorker, until, untilIdle } from '../support/worker';

let api: Api;
let ours: TeamOfFour;
let coach: Visitor;
let running: Queue | undefined;
const usualFolder = process.env.TMPDIR;
const temporary = mkdtempSync(join(tmpdir(), 'tapeline-queue-'));

beforeAll(async () => {
  // whatever is left lying about lies here
  process.env.TMPDIR = temporary;
  api = await startApi();
  ours = await makeTeamOfFour();
  coach = await api.signedIn(ours.coach);
});
afterEach(async () => {
  await running?.stop();
  running = undefined;
  await database().query('delete from graphile_worker._private_jobs');
});
afterAll(async () => {
  await api.close();
  removeClips();
  if (usualFolder === undefined) delete process.env.TMPDIR;
  else process.env.TMPDIR = usualFolder;
  rmSync(temporary, { recursive: true, force: true });
});

/** Nothing to copy in it: some seconds of work for the encoder. */
const slowClip = () =>
  clip('slow.avi', [...drawn('640x360', 30), ...played(30), '-c:v', 'mpeg4', '-q:v', '5', '-c:a', 'mp3', '-g', '30']);

const stepOf = (recordingId: string, step: 'probe' | 'playback') =>
  RecordingStep.findOne({ where: { recordingId, step } });

const untilEncoding = (recordingId: string) =>
  until('the encoder at work', async () => {
    const step = await stepOf(recordingId, 'playback');
    return step?.state === 'running' && step.percent > 0;
  });

const untilReady = (recordingId: string) =>
  until('a recording that plays', async () => (await Recording.findByPk(recordingId))?.state === 'ready', 90_000);

const privateFolders = () => readdirSync(temporary).filter((name) => name.startsWith('tapeline-making-'));

/** As if the time had passed after which a silent worker counts as dead. */
async function letTimePass(): Promise<void> {
  await database().query(`update worker_heartbeats set seen_at = now() - interval '1 minute'`);
  await database().query(
    `update graphile_worker._private_jobs set locked_at = now() - interval '1 minute' where locked_at is not null`,
  );
}

async function startWorkerProcess(): Promise<ChildProcess> {
  const { config } = api;
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/worker.ts'], {
    env: {
      ...process.env,
      NODE_ENV: 'test',
      DATABASE_URL: config.databaseUrl,
      S3_ENDPOINT: config.store.endpoint,
      S3_REGION: config.store.region,
      S3_BUCKET: config.store.bucket,
      S3_ACCESS_KEY_ID: config.store.accessKeyId,
      S3_SECRET_ACCESS_KEY: config.store.secretAccessKey,
      SMTP_URL: config.mail.url,
      SESSION_SECRET: config.sessionSecret,
      MEDIA_SECRET: config.mediaSecret,
      LOG_LEVEL: 'fatal',
    },
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
    // a group of its own: what it started can be ended with it
    detached: true,
  });
  await new Promise<void>((resolve, reject) => {
    child.once('message', () => resolve());
    child.once('exit', (code) => reject(new Error(`The worker ended with ${code}.`)));
  });
  return child;
}

describe('a worker that is killed in the middle of its work', () => {
  it('loses its job to another, which does the rest and not again what was done', async () => {
    const child = await startWorkerProcess();
    const { id } = await uploadBytes(coach, ours.team.slug, await readFile(await slowClip()), { name: 'slow.avi' });
    await untilEncoding(id);
    const gone = new Promise((resolve) => child.once('exit', resolve));
    process.kill(-(child.pid ?? 0), 'SIGKILL');
    await gone;
    expect(privateFolders()).not.toEqual([]);
    const probed = await stepOf(id, 'probe');
    expect(probed?.state).toBe('done');

    await letTimePass();
    running = await startWorker(api);
    await untilReady(id);
    await untilIdle();
    expect((await stepOf(id, 'probe'))?.startedAt).toEqual(probed?.startedAt);
    expect(privateFolders()).toEqual([]);
  });
});

describe('a worker that is stopped in the middle of its work', () => {
  it('ends the encoder, leaves nothing half made, and gives the job back', async () => {
    running = await startWorker(api);
    const { id } = await uploadBytes(coach, ours.team.slug, await readFile(await slowClip()), { name: 'slow.avi' });
    await untilEncoding(id);
    // as if it had been tried before: a stop is nobody's last try
    await database().query(`update graphile_worker._private_jobs set attempts = max_attempts where key = :key`, {
      replacements: { key: makePlayback.key({ teamId: ours.team.id, recordingId: id }) },
    });
    const asked = Date.now();
    await running.stop();
    expect(Date.now() - asked).toBeLessThan(8000);
    running = undefined;
    expect(privateFolders()).toEqual([]);
    expect((await Recording.findByPk(id))?.state).toBe('making');

    running = await startWorker(api);
    await untilReady(id);
  });
});

describe('a worker that lives', () => {
  it('says so in the name that its jobs are locked in', async () => {
    running = await startWorker(api);
    const { id } = await uploadBytes(coach, ours.team.slug, await readFile(await slowClip()), { name: 'slow.avi' });
    await untilEncoding(id);
    const holders = await database().query<{ id: string }>(
      'select distinct locked_by as id from graphile_worker.jobs where locked_by is not null',
      { type: QueryTypes.SELECT },
    );
    const living = await database().query<{ id: string }>('select worker_id as id from worker_heartbeats', {
      type: QueryTypes.SELECT,
    });
    expect(holders).toHaveLength(1);
    expect(living).toEqual(holders);
  });
});

describe('a job that was tried as often as it may', () => {
  it('tells what became of it when each of its workers was lost', async () => {
    const recording = await Recording.create({
      teamId: ours.team.id,
      title: 'Lost',
      fileName: 'lost.mp4',
      sizeBytes: 10,
      contentType: 'video/mp4',
      state: 'making',
      originalKey: `originals/${randomUUID()}`,
    });
    await enqueue(probeRecording, { teamId: ours.team.id, recordingId: recording.id });
    await database().query(
      `update graphile_worker._private_jobs set attempts = max_attempts, locked_at = now() - interval '1 minute', locked_by = 'gone'`,
    );
    running = await startWorker(api);
    await until('the end', async () => (await recording.reload()).state === 'failed');
    expect(recording.failure).toMatchObject({ code: 'lostWorker', retry: true });
    await untilIdle();
  });
});

describe('asking for a job', () => {
  const of = () => ({ teamId: ours.team.id, recordingId: randomUUID() });

  it('is undone with the transaction that asked', async () => {
    await expect(
      inTransaction(async () => {
        await enqueue(probeRecording, of());
        throw new Error('undone');
      }),
    ).rejects.toThrow('undone');
    expect(await queuedJobs(probeRecording)).toEqual([]);
  });

  it('twice before it runs asks once', async () => {
    const payload = { ...of(), prefixes: ['originals/nobody/'] };
    await enqueue(removeObjects, payload);
    await enqueue(removeObjects, payload);
    expect(await queuedJobs(removeObjects)).toHaveLength(1);
    running = await startWorker(api);
    await untilIdle();
  });

  it('while it runs is followed by one more, and the first one’s end tells nothing', async () => {
    const started: number[] = [];
    const endings: string[] = [];
    const definition: JobDefinition = {
      name: 'countUp',
      payload: z.object({}),
      key: () => 'countUp',
      priority: 0,
      attempts: 1,
    };
    let let1st: () => void = () => undefined;
    const first = new Promise<void>((resolve) => {
      let1st = resolve;
    });
    const handler: Handler = handle(
      definition,
      async () => {
        started.push(started.length);
        if (started.length > 1) return;
        await first;
        throw new Error('the first one breaks');
      },
      async () => {
        endings.push('given up');
      },
    );
    running = await startQueue(api.config.databaseUrl, [handler], 2, openLog('fatal', 'worker'));
    await enqueue(definition, {});
    await until('the first', async () => started.length === 1);
    await enqueue(definition, {});
    let1st();
    await until('the second', async () => started.length === 2);
    await untilIdle();
    expect(endings).toEqual([]);
  });
});
