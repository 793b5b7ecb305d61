import { execFile } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { accessUnits } from '../../server/demo/accessUnits';
import { dresses } from '../../server/demo/drawing/dresses';
import { drawLoop } from '../../server/demo/drawing/frames';
import { layOutScript, type Timing } from '../../server/demo/layOutScript';
import { drawDemoRecording } from '../../server/demo/makeClip';
import { demoTeams } from '../../server/demo/scenario/scenario';
import { dario } from '../../server/demo/scenario/voices';
import type { RecordingScript } from '../../server/demo/script';
import { shotsOf } from '../../server/demo/shots';

const run = promisify(execFile);

/** Long enough that a shot repeats and is cut, short enough to be drawn in a moment. */
const short: RecordingScript = {
  ...dario,
  place: 'loft',
  chapters: [
    { kind: 'briefing', title: 'Hello', motion: 'wave', says: ['Morning, pickers.'] },
    {
      kind: 'demo',
      title: 'Air squat',
      movement: 'air-squat',
      motion: 'airSquat',
      says: [
        { text: 'Whole foot on the floor, and hips back and down between the heels, as if a low chair stood there.' },
        { text: 'Stand all the way up.', cue: { kind: 'go', text: 'Stand all the way up' }, thenMs: 1500 },
      ],
    },
    {
      kind: 'substitution',
      title: 'Line hop',
      motion: 'ropeSkip',
      says: ['Two skips.', { text: 'Then hop.', motion: 'lineHop' }],
    },
  ],
};

let folder: string;
let file: string;
let timing: Timing;
const progress: number[] = [];

beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'demo-clips-'));
  file = path.join(folder, 'short.mp4');
  timing = await drawDemoRecording(short, file, { onProgress: (percent) => progress.push(percent) });
}, 60_000);

afterAll(() => rm(folder, { recursive: true, force: true }));

async function probe() {
  const { stdout } = await run('ffprobe', [
    '-v',
    'error',
    '-of',
    'json',
    '-count_frames',
    '-show_format',
    '-show_streams',
    file,
  ]);
  return JSON.parse(stdout);
}

/** The loudest sample of each hundredth of a second, of what a player would hear. */
async function loudness(): Promise<number[]> {
  const rate = 8000;
  const args = ['-v', 'error', '-i', file, '-map', '0:a', '-ac', '1', '-ar', String(rate), '-f', 's16le', 'pipe:1'];
  const { stdout } = await run('ffmpeg', args, { encoding: 'buffer', maxBuffer: 1 << 26 });
  const step = rate / 100;
  return Array.from({ length: Math.floor(stdout.length / 2 / step) }, (_, i) => {
    let peak = 0;
    for (let j = 0; j < step; j++) peak = Math.max(peak, Math.abs(stdout.readInt16LE((i * step + j) * 2)));
    return peak;
  });
}

describe('a drawn and spoken recording', () => {
  it('is as long as it was laid out, in picture and sound', async () => {
    const { format, streams } = await probe();
    const [video, audio] = ['video', 'audio'].map((type) =>
      streams.find((s: { codec_type: string }) => s.codec_type === type),
    );
    expect(Math.abs(Number(format.duration) * 1000 - timing.durationMs)).toBeLessThan(34);
    expect(Math.abs(Number(audio.duration) * 1000 - timing.durationMs)).toBeLessThan(34);
    expect(video).toMatchObject({
      codec_name: 'h264',
      pix_fmt: 'yuv420p',
      width: 1280,
      height: 720,
      avg_frame_rate: '30/1',
    });
    expect(Number(video.nb_read_frames)).toBe((timing.durationMs * 30) / 1000);
    expect(audio.codec_name).toBe('aac');
  });

  it('has a key frame where every chapter starts, and at least every two seconds', async () => {
    const args = [
      '-v',
      'error',
      '-select_streams',
      'v',
      '-show_entries',
      'packet=pts_time,flags',
      '-of',
      'csv=p=0',
      file,
    ];
    const { stdout } = await run('ffprobe', args);
    const keys = stdout
      .split('\n')
      .filter((row) => row.includes('K'))
      .map((row) => Math.round(Number(row.split(',')[0]) * 1000));
    expect(keys).toEqual(expect.arrayContaining(timing.chapters.map(({ startMs }) => startMs)));
    for (const [i, key] of keys.entries()) expect((keys[i + 1] ?? timing.durationMs) - key).toBeLessThanOrEqual(2000);
  });

  it('has captions that start and end with the voice, to a tenth of a second', async () => {
    const peaks = await loudness();
    const isLoud = (peak: number) => peak > 400;
    const sentences = timing.captions.filter(({ startMs }, i) => startMs !== timing.captions[i - 1]?.endMs);
    expect(sentences.length).toBe(5);
    for (const first of sentences) {
      let last = first;
      for (const next of timing.captions) if (next.startMs === last.endMs) last = next;
      const from = Math.floor(first.startMs / 10) - 20;
      const onset = (from + peaks.slice(from).findIndex(isLoud)) * 10;
      expect(Math.abs(onset - first.startMs), first.text).toBeLessThanOrEqual(100);
      const end = (peaks.slice(0, Math.ceil(last.endMs / 10) + 20).findLastIndex(isLoud) + 1) * 10;
      expect(Math.abs(end - last.endMs), last.text).toBeLessThanOrEqual(100);
    }
  });

  it('is silent between its sentences', async () => {
    const peaks = await loudness();
    for (const [i, { startMs }] of timing.captions.entries()) {
      const before = timing.captions[i - 1]?.endMs ?? 0;
      if (startMs - before < 300) continue;
      const between = peaks.slice(Math.ceil(before / 10) + 10, Math.floor(startMs / 10) - 10);
      expect(Math.max(...between)).toBeLessThan(400);
    }
  });

  it('shows what it says: another picture from chapter to chapter, the same after one loop', async () => {
    const pictureAt = async (ms: number) => {
      const args = [
        '-v',
        'error',
        '-ss',
        (ms / 1000).toFixed(3),
        '-i',
        file,
        '-frames:v',
        '1',
        '-vf',
        'scale=160:90,format=gray',
        '-f',
        'rawvideo',
        'pipe:1',
      ];
      return (await run('ffmpeg', args, { encoding: 'buffer' })).stdout;
    };
    const apart = (a: Buffer, b: Buffer) =>
      a.reduce((sum, value, i) => sum + Math.abs(value - (b[i] ?? 0)), 0) / a.length;
    const [hello, squat, hop] = await Promise.all(timing.chapters.map(({ startMs }) => pictureAt(startMs + 17)));
    if (!hello || !squat || !hop) throw new Error('a picture is missing');
    expect(apart(hello, squat)).toBeGreaterThan(1.5);
    expect(apart(squat, hop)).toBeGreaterThan(1.5);
    const again = await pictureAt((timing.chapters[1]?.startMs ?? 0) + 17 + 3200);
    expect(apart(squat, again)).toBeLessThan(0.3);
  });

  it('tells its progress rising to 100', () => {
    expect(progress.at(-1)).toBe(100);
    expect(progress).toEqual([...new Set(progress)].toSorted((a, b) => a - b));
  });

  it('is the same file when it is drawn again', async () => {
    const again = path.join(folder, 'again.mp4');
    expect(await drawDemoRecording(short, again)).toEqual(timing);
    const [first, second] = await Promise.all(
      [file, again].map(async (name) =>
        createHash('sha256')
          .update(await readFile(name))
          .digest('hex'),
      ),
    );
    expect(second).toBe(first);
    await rm(again);
  }, 60_000);

  it('leaves nothing behind when it is stopped', async () => {
    const stop = new AbortController();
    const stopped = path.join(folder, 'stopped.mp4');
    const drawing = drawDemoRecording(short, stopped, {
      signal: stop.signal,
      onProgress: (percent) => percent >= 20 && stop.abort(new Error('enough')),
    });
    await expect(drawing).rejects.toThrow('enough');
    expect(await readdir(folder)).toEqual(['short.mp4']);
  }, 30_000);
});

describe('drawing', () => {
  it('gives the same bytes for the same motion, others for another dress', () => {
    const hash = (pictures: Buffer[]) => createHash('sha256').update(Buffer.concat(pictures)).digest('hex');
    const first = hash(drawLoop('birdDog', dresses.plum, 'yard'));
    expect(hash(drawLoop('birdDog', dresses.plum, 'yard'))).toBe(first);
    expect(hash(drawLoop('birdDog', dresses.green, 'yard'))).not.toBe(first);
  });
});

describe('cutting a stream into pictures', () => {
  it('starts each at its delimiter and loses no byte', () => {
    const stream = Buffer.from([0, 0, 0, 1, 9, 16, 0, 0, 1, 0x65, 7, 0, 0, 0, 1, 9, 48, 0, 0, 1, 0x41, 8]);
    const units = accessUnits(stream);
    expect(units.map(({ length }) => length)).toEqual([11, 11]);
    expect(Buffer.concat(units)).toEqual(stream);
  });
});

describe.each(
  demoTeams
    .flatMap(({ sessions }) => sessions.flatMap(({ recording }) => recording ?? []))
    .map((r) => [r.title, r.script] as const),
)('the layout of %s', (_title, script) => {
  it('takes one to four minutes, is the same every time, and fits together', async () => {
    const layout = await layOutScript(script);
    expect(await layOutScript(script)).toEqual(layout);
    expect(layout.durationMs).toBeGreaterThanOrEqual(60_000);
    expect(layout.durationMs).toBeLessThanOrEqual(240_000);
    let atMs = 0;
    for (const { startMs, endMs } of layout.chapters) {
      expect(startMs).toBe(atMs);
      expect(endMs).toBeGreaterThan(startMs);
      atMs = endMs;
    }
    expect(atMs).toBe(layout.durationMs);
    for (const { chapter, atMs } of layout.cues) {
      const about = layout.chapters[chapter];
      expect(atMs).toBeGreaterThanOrEqual(about?.startMs ?? Number.POSITIVE_INFINITY);
      expect(atMs).toBeLessThan(about?.endMs ?? 0);
    }
    const shown = shotsOf(layout).reduce((sum, shot) => sum + shot.shown, 0);
    expect(shown * 100).toBe(layout.durationMs);
  }, 30_000);
});
