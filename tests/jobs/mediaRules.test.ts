import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { canCopyPicture } from '../../server/media/arguments/copyPlayback';
import { playbackRate } from '../../server/media/arguments/frameRate';
import { fitWithin } from '../../server/media/arguments/frameSize';
import { makePlayback } from '../../server/media/arguments/makePlayback';
import { longestGap } from '../../server/media/keyFrames';
import type { ProbedRecording } from '../../server/media/probe';
import { percentDone } from '../../server/media/progress';

const phone: ProbedRecording = {
  durationMs: 60_000,
  pictureMs: 60_000,
  width: 1920,
  height: 1080,
  rotation: 0,
  fps: 30,
  evenRate: true,
  videoCodec: 'h264',
  audioCodec: 'aac',
  pixFmt: 'yuv420p',
  interlaced: false,
  channels: 2,
  videoStream: 0,
  audioStream: 1,
  bytes: 60_000_000,
  container: 'mov,mp4,m4a,3gp,3g2,mj2',
  recordedAt: null,
};

describe('the size of a picture', () => {
  const side = fc.integer({ min: 16, max: 8192 });

  it('is even, within the box, never above the source, and keeps its shape', () => {
    fc.assert(
      fc.property(side, side, (width, height) => {
        const fit = fitWithin({ width, height }, { long: 1280, short: 720 });
        expect(fit.width % 2 || fit.height % 2).toBe(0);
        expect(Math.max(fit.width, fit.height)).toBeLessThanOrEqual(1280);
        expect(Math.min(fit.width, fit.height)).toBeLessThanOrEqual(720);
        expect(fit.width).toBeLessThanOrEqual(width);
        expect(fit.height).toBeLessThanOrEqual(height);
        // each side loses less than 2 px to being even
        expect(Math.abs(fit.width * height - fit.height * width)).toBeLessThanOrEqual(2 * Math.max(width, height));
      }),
    );
  });

  it('is the same lying as standing', () => {
    fc.assert(
      fc.property(side, side, (width, height) => {
        const box = { long: 1280, short: 720 };
        const lying = fitWithin({ width, height }, box);
        expect(fitWithin({ width: height, height: width }, box)).toEqual({ width: lying.height, height: lying.width });
      }),
    );
  });
});

describe('the rate of a playback', () => {
  it.each([
    ['even 30', 30, true, '30'],
    ['even 29.97', 30_000 / 1001, true, '30000/1001'],
    ['even 60', 60, true, '60'],
    ['even 10', 10, true, '10.000'],
    ['slow motion', 240, true, '60'],
    ['a phone at night', 24.5, false, '25'],
    ['a phone whose clock is a little fast', 30.02, false, '30'],
    ['a phone whose pictures come nearly evenly', 29.83, false, '30'],
    ['uneven and slow', 17, false, '24'],
    ['uneven and fast', 118, false, '60'],
  ] as const)('of %s', (_what, fps, evenRate, written) => {
    expect(playbackRate({ fps, evenRate }).written).toBe(written);
  });
});

describe('what is copied', () => {
  it('is a phone’s clip', () => expect(canCopyPicture(phone)).toBe(true));

  it.each([
    ['another codec', { videoCodec: 'hevc' }],
    ['10 bits', { pixFmt: 'yuv420p10le' }],
    ['half pictures', { interlaced: true }],
    ['slow motion', { fps: 120 }],
    ['4K', { width: 3840, height: 2160 }],
    ['a rate that no phone network carries', { bytes: 600_000_000 }],
    ['a transport stream', { container: 'mpegts' }],
  ] satisfies [string, Partial<ProbedRecording>][])('is not %s', (_what, change) => {
    expect(canCopyPicture({ ...phone, ...change })).toBe(false);
  });

  it('is a picture that stands upright as well', () => {
    expect(canCopyPicture({ ...phone, width: 1080, height: 1920, rotation: 90 })).toBe(true);
  });
});

describe('the arguments of a made playback', () => {
  it('take the very streams that were probed', () => {
    const args = makePlayback({ ...phone, videoStream: 2, audioStream: 4 });
    expect(args.flatMap((arg, i) => (arg === '-map' ? [args[i + 1]] : []))).toEqual(['0:2', '0:4']);
  });

  it('even out half pictures only where there are some', () => {
    expect(makePlayback(phone).join(' ')).not.toContain('bwdif');
    expect(makePlayback({ ...phone, interlaced: true }).join(' ')).toContain('bwdif');
  });
});

describe('how far a run is', () => {
  it('counts pictures, or reads the time', () => {
    const line = 'frame=   45 fps= 30 q=28.0 size=     256kB time=00:01:30.50 bitrate= 200kbits/s speed=1x';
    expect(percentDone(line, { frames: 90 })).toBe(50);
    expect(percentDone(line, { durationMs: 181_000 })).toBe(50);
  });

  it('is never a hundred before the end, and nothing where the line says nothing', () => {
    expect(percentDone('frame=  95 time=00:00:09.00', { frames: 90 })).toBe(99);
    expect(percentDone('time=-577014:32:22.77', { durationMs: 1000 })).toBeUndefined();
    expect(percentDone('time=N/A', { durationMs: 1000 })).toBeUndefined();
    expect(percentDone('Stream mapping:', { frames: 10 })).toBeUndefined();
  });
});

describe('key frames', () => {
  it('leave the longest stretch, the one after the last included', () => {
    expect(longestGap('0.0,K__\n1.0,___\n2.0,K__\n5.5,K__\n6.0,___\n')).toBe(3500);
    expect(longestGap('0.0,K__\n1.0,___\n9.5,___\n')).toBe(9500);
    expect(longestGap('N/A,K__\n0.000000,K__,\n')).toBe(0);
  });
});
