import { execFileSync } from 'node:child_process';
import { mkdir, readdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, describe, expect, it } from 'vitest';
import { makePoster, makeThumbnails } from '../../server/media/pictures';
import { probeRecording } from '../../server/media/probe';
import { clip, clipFolder, drawn, h264, heldUpright, phoneClip, removeClips } from '../support/clips';

afterAll(removeClips);

/** Two seconds of black, then two of grey that gets lighter: its luma tells the time. */
const fromBlack = () =>
  clip('fromBlack.mp4', [
    '-f',
    'lavfi',
    '-i',
    "color=black:size=320x180:rate=30:duration=4,format=yuv420p,geq=lum='if(lt(T,2),16,60+T*40)':cb=128:cr=128",
    ...h264(),
  ]);

const lumaOf = async (path: string) => {
  const { channels } = await sharp(path).greyscale().stats();
  return channels[0]?.mean ?? Number.NaN;
};

async function emptyFolder(name: string) {
  const folder = join(clipFolder(), name);
  await mkdir(folder, { recursive: true });
  return folder;
}

describe('a poster', { timeout: 60_000 }, () => {
  it('shows something although the recording opens in black', async () => {
    const input = await fromBlack();
    const output = join(clipFolder(), 'poster.jpg');
    await makePoster({ input, output, probed: await probeRecording(input) });
    expect(await sharp(output).metadata()).toMatchObject({ format: 'jpeg', width: 320, height: 180 });
    expect(await lumaOf(output)).toBeGreaterThan(100);
  });

  it('stands upright and is at most 720 wide', async () => {
    const input = await heldUpright('big.mp4', await clip('bigLying.mp4', [...drawn('1920x1080', 1), ...h264()]));
    const output = join(clipFolder(), 'upright.jpg');
    await makePoster({ input, output, probed: await probeRecording(input) });
    expect(await sharp(output).metadata()).toMatchObject({ width: 720, height: 1280 });
  });

  it('is black where the whole recording is', async () => {
    const input = await clip('black.mp4', [
      '-f',
      'lavfi',
      '-i',
      'color=black:size=320x180:rate=10:duration=2',
      ...h264(),
    ]);
    const output = join(clipFolder(), 'black.jpg');
    await makePoster({ input, output, probed: await probeRecording(input) });
    expect(await lumaOf(output)).toBeLessThan(5);
  });
});

describe('thumbnails', { timeout: 60_000 }, () => {
  it('are 320 wide, named after their ids, one for each time', async () => {
    const folder = await emptyFolder('many');
    const times = Array.from({ length: 8 }, (_, i) => ({ id: `chapter-${i}`, atMs: i * 500 }));
    const made = await makeThumbnails({ input: await phoneClip(), times, folder });
    expect(made).toEqual(times.map(({ id }) => ({ id, path: join(folder, `${id}.jpg`) })));
    expect((await readdir(folder)).toSorted()).toEqual(times.map(({ id }) => `${id}.jpg`));
    for (const { path } of made)
      expect(await sharp(path).metadata()).toMatchObject({ format: 'jpeg', width: 320, height: 180 });
  });

  it('show the time that was asked for', async () => {
    const made = await makeThumbnails({
      input: await fromBlack(),
      times: [
        { id: 'early', atMs: 2100 },
        { id: 'late', atMs: 3500 },
      ],
      folder: await emptyFolder('times'),
    });
    const [early = Number.NaN, late = Number.NaN] = await Promise.all(made.map(({ path }) => lumaOf(path)));
    // 40 a second in the limited range is about 46.6 in a JPEG; 1.4 s apart, each within the 0.4 s that are looked at
    expect(late - early).toBeGreaterThan(45);
    expect(late - early).toBeLessThan(85);
  });

  it('pass over black that follows the time', async () => {
    const [made] = await makeThumbnails({
      input: await fromBlack(),
      times: [{ id: 'start', atMs: 500 }],
      folder: await emptyFolder('passed'),
    });
    expect(await lumaOf(made?.path ?? '')).toBeGreaterThan(100);
  });

  it('give the last picture for a time past the end', async () => {
    const [made] = await makeThumbnails({
      input: await fromBlack(),
      times: [{ id: 'past', atMs: 60_000 }],
      folder: await emptyFolder('past'),
    });
    expect(await lumaOf(made?.path ?? '')).toBeGreaterThan(150);
  });

  it('refuse a name that leaves the folder', async () => {
    await expect(
      makeThumbnails({ input: await phoneClip(), times: [{ id: '../out', atMs: 0 }], folder: clipFolder() }),
    ).rejects.toThrow('no name');
  });

  it('are whole JPEG files', async () => {
    const [made] = await makeThumbnails({
      input: await phoneClip(),
      times: [{ id: 'whole', atMs: 1000 }],
      folder: await emptyFolder('whole'),
    });
    const bytes = await readFile(made?.path ?? '');
    // ITU-T T.81, B.1.1.3: a JPEG ends with the EOI marker
    expect(bytes.subarray(-2)).toEqual(Buffer.from([0xff, 0xd9]));
    expect(() => execFileSync('ffprobe', ['-v', 'error', made?.path ?? ''])).not.toThrow();
  });
});
