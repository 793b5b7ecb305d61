import { readdir, readFile, rm, stat } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { jailPath } from '../../server/media/jail';
import { makePlayback } from '../../server/media/makePlayback';
import { makingLimits, pictureLimits } from '../../server/media/policy';
import { probeRecording } from '../../server/media/probe';
import { runFfmpeg } from '../../server/media/runFfmpeg';
import { clip, clipFolder, drawn, fileOf, phoneClip, removeClips } from '../support/clips';

afterAll(removeClips);

/** The processes whose arguments name a path, by id; this one aside. */
async function processesOn(path: string): Promise<number[]> {
  const ids = (await readdir('/proc')).filter((name) => /^\d+$/.test(name)).map(Number);
  const named = await Promise.all(
    ids.map(async (id) => ((await readFile(`/proc/${id}/cmdline`, 'utf8').catch(() => '')).includes(path) ? [id] : [])),
  );
  return named.flat().filter((id) => id !== process.pid);
}

async function until(what: () => Promise<boolean>, withinMs: number) {
  const end = Date.now() + withinMs;
  while (!(await what())) {
    if (Date.now() > end) throw new Error(`not within ${withinMs} ms`);
    await wait(20);
  }
}

const endless = ['-stream_loop', '-1', '-re'];
const toMp4 = ['-c:v', 'libx264', '-preset', 'ultrafast', '-threads', '1', '-f', 'mp4'];

describe('a run of ffmpeg', { timeout: 60_000 }, () => {
  let input: string;
  beforeAll(async () => {
    input = await phoneClip();
  });

  const running = (output: string, signal?: AbortSignal, deadlineMs = 60_000) =>
    runFfmpeg({
      inputs: [{ path: input, options: endless }],
      outputs: [{ path: output, options: toMp4 }],
      limits: makingLimits(4000),
      deadlineMs,
      signal,
    });

  it('ends within two seconds of an abort and leaves neither process nor file', async () => {
    const output = join(clipFolder(), 'aborted.mp4');
    const abort = new AbortController();
    const outcome = running(output, abort.signal).catch((error: unknown) => error);
    await until(async () => (await processesOn('-aborted.mp4')).length === 1, 20_000);
    const reason = new Error('stop');
    const asked = Date.now();
    abort.abort(reason);
    expect(await outcome).toBe(reason);
    expect(Date.now() - asked).toBeLessThan(2000);
    expect(await processesOn('-aborted.mp4')).toEqual([]);
    expect((await readdir(clipFolder())).filter((name) => name.includes('aborted'))).toEqual([]);
  });

  it('does not start when it is no longer wanted, nor go on when that is found out at the start', async () => {
    const reason = new Error('stop');
    const output = join(clipFolder(), 'unwanted.mp4');
    await expect(running(output, AbortSignal.abort(reason))).rejects.toBe(reason);
    const abort = new AbortController();
    const outcome = running(output, abort.signal).catch((error: unknown) => error);
    abort.abort(reason);
    expect(await outcome).toBe(reason);
    expect(await processesOn('-unwanted.mp4')).toEqual([]);
  });

  it('is stopped at its deadline, to be tried again', async () => {
    const outcome = running(join(clipFolder(), 'late.mp4'), undefined, 1500);
    await expect(outcome).rejects.toMatchObject({ code: 'tookTooLong', retry: true });
    expect(await processesOn('-late.mp4')).toEqual([]);
  });

  it('is stopped by the kernel where it writes more than it may', async () => {
    await expect(
      runFfmpeg({
        inputs: [{ path: input, options: [] }],
        outputs: [{ path: join(clipFolder(), 'much.mkv'), options: ['-c:v', 'rawvideo'] }],
        limits: { ...pictureLimits, fileBytes: 100_000 },
        deadlineMs: 30_000,
      }),
    ).rejects.toMatchObject({ code: 'tooLarge' });
  });

  it('opens no file that another one names', async () => {
    const script = await fileOf('script.ffconcat', `ffconcat version 1.0\nfile '${input}'\n`);
    const read = runFfmpeg({
      inputs: [{ path: script, options: [] }],
      outputs: [{ path: join(clipFolder(), 'named.mp4'), options: ['-c', 'copy'] }],
      limits: makingLimits(4000),
      deadlineMs: 30_000,
    });
    await expect(read).rejects.toMatchObject({
      code: 'unsupported',
      detail: expect.stringMatching(/not on whitelist/i),
    });
  });

  it('keeps what was there when the check refuses what came out', async () => {
    const output = await fileOf('kept.mp4', 'the one before');
    const refusal = new Error('refused');
    const outcome = runFfmpeg({
      inputs: [{ path: input, options: [] }],
      outputs: [{ path: output, options: ['-c', 'copy'] }],
      limits: makingLimits(4000),
      deadlineMs: 30_000,
      check: async () => {
        throw refusal;
      },
    });
    await expect(outcome).rejects.toBe(refusal);
    expect(await readFile(output, 'utf8')).toBe('the one before');
  });

  it('takes paths with spaces, percent signs and colons as they are', async () => {
    const output = join(clipFolder(), 'day 1: 50 %d.mp4');
    const written = await runFfmpeg({
      inputs: [{ path: await fileOf('a b: c%02d.mp4', await readFile(input)), options: [] }],
      outputs: [{ path: output, options: ['-c', 'copy'] }],
      limits: makingLimits(4000),
      deadlineMs: 30_000,
    });
    expect(written).toEqual([output]);
    expect((await probeRecording(output)).durationMs).toBe(4000);
  });

  it('goes through a wrapper that nobody else can read or change, written anew when it was taken away', async () => {
    await rm(jailPath());
    expect((await stat(dirname(jailPath()))).mode & 0o777).toBe(0o700);
    expect((await stat(jailPath())).mode & 0o777).toBe(0o700);
  });
});

describe('making a playback', { timeout: 60_000 }, () => {
  it('is abandoned in the middle without a trace', async () => {
    const input = await clip('large.mkv', [...drawn('1920x1080', 4), '-c:v', 'mpeg4']);
    const output = join(clipFolder(), 'abandoned.mp4');
    const abort = new AbortController();
    const outcome = await makePlayback({
      input,
      output,
      probed: await probeRecording(input),
      signal: abort.signal,
      onProgress: () => abort.abort(),
    }).catch((error: unknown) => error);
    expect(outcome).toMatchObject({ name: 'AbortError' });
    expect(await processesOn('-abandoned.mp4')).toEqual([]);
    expect((await readdir(clipFolder())).filter((name) => name.includes('abandoned'))).toEqual([]);
  });
});
