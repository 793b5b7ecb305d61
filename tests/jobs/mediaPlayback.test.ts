import { execFileSync } from 'node:child_process';
import { readFile, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { longestKeyFrameGapMs } from '../../server/media/keyFrames';
import { makePlayback } from '../../server/media/makePlayback';
import { type ProbedRecording, probeRecording } from '../../server/media/probe';
import { aac, clip, clipFolder, drawn, h264, heldUpright, phoneClip, played, removeClips } from '../support/clips';

afterAll(removeClips);

/** A playback of a clip, with what it says it is and what it is. */
async function playbackOf(input: string) {
  const output = join(clipFolder(), 'playback.mp4');
  const source = await probeRecording(input);
  const percents: number[] = [];
  const playback = await makePlayback({
    input,
    output,
    probed: source,
    onProgress: (percent) => percents.push(percent),
  });
  const made = await probeRecording(output);
  expect(playback).toMatchObject({
    bytes: (await stat(output)).size,
    width: made.width,
    height: made.height,
    durationMs: made.durationMs,
  });
  expect(percents).toEqual(percents.toSorted((a, b) => a - b));
  expect(percents.every((percent) => percent >= 1 && percent <= 99)).toBe(true);
  expect(boxes(await readFile(output)).slice(0, 2)).toEqual(['ftyp', 'moov']);
  return { playback, source, made, output };
}

/** Top-level boxes in order. Source: ISO/IEC 14496-12, 4.2. */
function boxes(file: Buffer): string[] {
  const types: string[] = [];
  for (let at = 0; at + 8 <= file.length; at += Math.max(8, file.readUInt32BE(at)))
    types.push(file.toString('latin1', at + 4, at + 8));
  return types;
}

/** What every made playback is, whatever it was made from. */
const playsEverywhere = {
  videoCodec: 'h264',
  pixFmt: 'yuv420p',
  rotation: 0,
  interlaced: false,
} satisfies Partial<ProbedRecording>;

const vp9 = ['-c:v', 'libvpx-vp9', '-deadline', 'realtime', '-cpu-used', '8'];

describe('a playback that is copied', { timeout: 60_000 }, () => {
  it('is the phone’s own picture and sound', async () => {
    const { playback, made } = await playbackOf(await phoneClip());
    expect(playback).toMatchObject({ how: 'copied', width: 640, height: 360, durationMs: 4000 });
    expect(made).toMatchObject({ videoCodec: 'h264', audioCodec: 'aac' });
  });

  it('keeps its turning', async () => {
    const { playback, made } = await playbackOf(await heldUpright('upright.mp4', await phoneClip()));
    expect(playback).toMatchObject({ how: 'copied', width: 360, height: 640 });
    expect(made.rotation).toBe(90);
  });

  it('needs no sound', async () => {
    const { playback, made } = await playbackOf(await clip('silent.mov', [...drawn('320x180', 2), ...h264()]));
    expect(playback.how).toBe('copied');
    expect(made.audioCodec).toBeNull();
  });

  it('has its sound made where only that does not play everywhere', async () => {
    const { playback, made } = await playbackOf(
      await clip('pcm.mkv', [...drawn('320x180', 2), ...played(2, 'mono'), ...h264(), '-c:a', 'pcm_s16le']),
    );
    expect(playback.how).toBe('copied');
    expect(made).toMatchObject({ audioCodec: 'aac', channels: 2 });
  });

  it('does not tell where it was filmed', async () => {
    const located = await clip('located.mp4', [
      '-i',
      await phoneClip(),
      '-c',
      'copy',
      '-metadata',
      'location=+12.3456+065.4321/',
      '-metadata',
      'title=backyard',
    ]);
    const { output } = await playbackOf(located);
    const bytes = await readFile(output, 'latin1');
    expect(bytes).not.toContain('+12.3456');
    expect(bytes).not.toContain('backyard');
  });
});

describe('a playback that is made', { timeout: 120_000 }, () => {
  it.each([
    [
      'HEVC',
      () =>
        clip('hevc.mp4', [
          ...drawn('320x180', 2),
          '-c:v',
          'libx265',
          '-preset',
          'ultrafast',
          '-x265-params',
          'log-level=error:pools=1',
        ]),
    ],
    ['MPEG-4', () => clip('mpeg4.avi', [...drawn('320x180', 2), ...played(2), '-c:v', 'mpeg4', '-c:a', 'mp2'])],
    ['VP9', () => clip('vp9.webm', [...drawn('320x180', 2), ...played(2), ...vp9, '-c:a', 'libopus'])],
    [
      'H.264 with 10 bits',
      () =>
        clip('tenBits.mp4', [
          ...drawn('320x180', 2),
          '-c:v',
          'libx264',
          '-preset',
          'ultrafast',
          '-pix_fmt',
          'yuv420p10le',
        ]),
    ],
    [
      'H.264 in 4:4:4',
      () =>
        clip('fullColour.mp4', [
          ...drawn('320x180', 2),
          '-c:v',
          'libx264',
          '-preset',
          'ultrafast',
          '-pix_fmt',
          'yuv444p',
        ]),
    ],
    ['a transport stream', () => clip('camera.ts', [...drawn('320x180', 2), ...played(2), ...h264(), ...aac])],
  ])('from %s plays everywhere', async (_what, make) => {
    const { playback, source, made } = await playbackOf(await make());
    expect(playback).toMatchObject({ how: 'made', width: 320, height: 180 });
    expect(made).toMatchObject({
      ...playsEverywhere,
      audioCodec: source.audioCodec && 'aac',
      channels: source.channels && 2,
    });
    expect(Math.abs(made.durationMs - source.durationMs)).toBeLessThan(100);
  });

  it('is turned upright', async () => {
    const mpeg4 = await clip('lying.mp4', [...drawn('320x180', 2), '-c:v', 'mpeg4']);
    const { playback, made } = await playbackOf(await heldUpright('standing.mp4', mpeg4));
    expect(playback).toMatchObject({ how: 'made', width: 180, height: 320 });
    expect(made).toMatchObject(playsEverywhere);
  });

  it('turns the left of the picture to the top', async () => {
    const halves = await clip('halves.mp4', [
      '-f',
      'lavfi',
      '-i',
      'color=white:size=160x128:rate=10:duration=1,pad=320:128:0:0:black',
      '-c:v',
      'mpeg4',
    ]);
    const { output } = await playbackOf(await heldUpright('halvesUpright.mp4', halves));
    const luma = execFileSync('ffmpeg', [
      '-v',
      'error',
      '-i',
      output,
      '-frames:v',
      '1',
      '-f',
      'rawvideo',
      '-pix_fmt',
      'gray',
      '-',
    ]);
    // 128 wide and 320 high: the middle of the upper half, of the lower half
    expect(luma[80 * 128 + 64]).toBeGreaterThan(200);
    expect(luma[240 * 128 + 64]).toBeLessThan(50);
  });

  it.each([
    ['of odd sides', '641x361', 640, 360],
    ['portrait', '720x1080', 720, 1080],
    ['tall portrait', '1080x1920', 720, 1280],
    ['square', '1080x1080', 720, 720],
    ['wide', '1920x1080', 1280, 720],
    ['small', '160x90', 160, 90],
  ])('has even sides within 1280 × 720 when the picture is %s', async (_what, size, width, height) => {
    const { playback, made } = await playbackOf(
      await clip(`size${size}.mkv`, [...drawn(size, 0.5, '10'), '-c:v', 'mpeg4']),
    );
    expect(playback).toMatchObject({ how: 'made', width, height });
    expect(made).toMatchObject(playsEverywhere);
  });

  it('mixes six channels down to two', async () => {
    const surround = await clip('surround.mkv', [
      ...drawn('320x180', 2),
      ...played(2, '5.1'),
      '-c:v',
      'mpeg4',
      '-c:a',
      'ac3',
    ]);
    expect((await playbackOf(surround)).made).toMatchObject({ audioCodec: 'aac', channels: 2 });
  });

  it('has a key frame every two seconds, also from a source with one in twelve', async () => {
    const sparse = await clip('sparse.mp4', [...drawn('160x90', 12.5), ...h264(10_000)]);
    const { playback, output, made } = await playbackOf(sparse);
    expect(playback.how).toBe('made');
    expect(await longestKeyFrameGapMs(output, made.videoStream)).toBe(2000);
  });

  it('has an even rate from a source that stretches its pictures', async () => {
    // every picture of the second half is shown twice as long
    const uneven = await clip('uneven.mp4', [
      ...drawn('320x180', 3),
      '-vf',
      "setpts='if(lt(N,45),N,45+(N-45)*2)/30/TB'",
      '-vsync',
      'vfr',
      '-c:v',
      'mpeg4',
    ]);
    const { source, made } = await playbackOf(uneven);
    expect(source.evenRate).toBe(false);
    expect(made).toMatchObject({ evenRate: true, fps: 24 });
  });
});
