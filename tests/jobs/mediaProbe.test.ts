import { execFileSync } from 'node:child_process';
import { stat } from 'node:fs/promises';
import { afterAll, describe, expect, it } from 'vitest';
import { probeRecording } from '../../server/media/probe';
import { recordedAt, rotationOf, shownSize } from '../../server/media/readProbe';
import { clip, drawn, h264, heldUpright, phoneClip, played, removeClips } from '../support/clips';

afterAll(removeClips);

const hasMediainfo = (() => {
  try {
    execFileSync('mediainfo', ['--Version'], { stdio: 'ignore' });
    return true;
  } catch {
    return false;
  }
})();

describe('what a recording is', { timeout: 60_000 }, () => {
  it('tells length, size, rate and codecs of a phone’s clip', async () => {
    const path = await phoneClip();
    expect(await probeRecording(path)).toMatchObject({
      durationMs: 4000,
      pictureMs: 4000,
      width: 640,
      height: 360,
      rotation: 0,
      fps: 30,
      evenRate: true,
      videoCodec: 'h264',
      audioCodec: 'aac',
      pixFmt: 'yuv420p',
      interlaced: false,
      channels: 2,
      bytes: (await stat(path)).size,
      container: 'mov,mp4,m4a,3gp,3g2,mj2',
      recordedAt: null,
    });
  });

  it.skipIf(!hasMediainfo)('agrees with mediainfo', async () => {
    const path = await phoneClip();
    const told = execFileSync('mediainfo', ['--Inform=Video;%Duration%|%Width%|%Height%|%Format%', path], {
      encoding: 'utf8',
    });
    const { pictureMs, width, height } = await probeRecording(path);
    expect(told.trim()).toBe(`${pictureMs}|${width}|${height}|AVC`);
  });

  it('gives the size as shown when the phone was held upright', async () => {
    const upright = await heldUpright('upright.mp4', await phoneClip());
    expect(await probeRecording(upright)).toMatchObject({ width: 360, height: 640, rotation: 90 });
  });

  it('gives the size as shown when pixels are not square', async () => {
    const anamorphic = await clip('anamorphic.mp4', [...drawn('360x288', 1), '-vf', 'setsar=16/11', ...h264()]);
    expect(await probeRecording(anamorphic)).toMatchObject({
      width: 524,
      height: 288,
      audioCodec: null,
      channels: null,
    });
  });

  it('measures a recording whose container keeps no length, as browsers write them', async () => {
    const live = await clip('live.webm', [
      ...drawn('320x180', 3),
      ...played(3),
      '-c:v',
      'libvpx-vp9',
      '-deadline',
      'realtime',
      '-cpu-used',
      '8',
      '-live',
      '1',
    ]);
    const probed = await probeRecording(live);
    expect(probed.pictureMs).toBeNull();
    expect(Math.abs(probed.durationMs - 3000)).toBeLessThan(60);
  });

  it('reads when it was filmed, and nothing from a clock that was never set', async () => {
    const dated = await clip('dated.mp4', [
      '-i',
      await phoneClip(),
      '-c',
      'copy',
      '-metadata',
      'creation_time=2026-03-02T05:41:07Z',
    ]);
    expect((await probeRecording(dated)).recordedAt).toBe('2026-03-02T05:41:07.000Z');
    expect(recordedAt({ creation_time: '1904-01-01T00:00:00.000000Z' })).toBeNull();
    expect(recordedAt({ creation_time: 'yesterday' })).toBeNull();
    expect(
      recordedAt({
        creation_time: '2026-03-05T00:00:00Z',
        'com.apple.quicktime.creationdate': '2026-03-02T06:41:07+0100',
      }),
    ).toBe('2026-03-02T05:41:07.000Z');
  });

  it('skips a cover picture and takes the moving one', async () => {
    const covered = await clip('covered.mp4', [
      '-f',
      'lavfi',
      '-i',
      'color=red:size=64x64:rate=1:duration=1',
      '-i',
      await phoneClip(),
      '-map',
      '0:v',
      '-map',
      '1:v',
      '-map',
      '1:a',
      '-c:v:0',
      'mjpeg',
      '-c:v:1',
      'copy',
      '-c:a',
      'copy',
      '-disposition:v:0',
      'attached_pic',
    ]);
    expect(await probeRecording(covered)).toMatchObject({ videoCodec: 'h264', width: 640, height: 360 });
  });

  it('stops at once when it is no longer wanted', async () => {
    const reason = new Error('not wanted');
    await expect(probeRecording(await phoneClip(), AbortSignal.abort(reason))).rejects.toBe(reason);
  });
});

describe('turning', () => {
  // ffprobe counts degrees against the clock, from -180 to 180
  it.each([
    [-90, 90],
    [90, 270],
    [180, 180],
    [-180, 180],
    [0, 0],
  ] as const)('%i in the file is %i clockwise', (told, clockwise) => {
    expect(rotationOf({ index: 0, side_data_list: [{ rotation: told }] })).toBe(clockwise);
  });

  it('changes width and height only for a quarter', () => {
    expect(shownSize({ index: 0, width: 640, height: 360, side_data_list: [{ rotation: 180 }] })).toEqual({
      width: 640,
      height: 360,
    });
    expect(shownSize({ index: 0, width: 640, height: 360, side_data_list: [{ rotation: 90 }] })).toEqual({
      width: 360,
      height: 640,
    });
  });
});
