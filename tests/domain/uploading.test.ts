import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { partsOfFile, requireVideoFile } from '../../server/services/footageFile';
import { limits } from '../../shared/limits';
import { pause, waitMs } from '../../src/features/upload/backOff';
import { arrivedBytes, missingParts, rangeOfPart } from '../../src/features/upload/parts';
import { openSlots } from '../../src/features/upload/slots';
import { speedOf, timeLeftMs, withSample } from '../../src/features/upload/speed';
import { fileFault } from '../../src/features/upload/videoFile';

const file = (name: string, type: string, size = 5000) => ({ name, type, size });

describe('what is said before the first byte', () => {
  it('refuses an empty file, one that is too large, and what is no video', () => {
    expect(fileFault(file('squat.mp4', 'video/mp4', 0))).toContain('empty');
    expect(fileFault(file('squat.mp4', 'video/mp4', limits.recordingBytes + 1))).toContain('at most');
    expect(fileFault(file('squat.mp4', 'video/mp4', limits.recordingBytes))).toBeNull();
    expect(fileFault(file('plan.pdf', 'application/pdf'))).toContain('not a video');
  });

  it('takes and refuses the same names and types as the server', () => {
    const endings = fc.constantFrom(
      '',
      '.mp4',
      '.MOV',
      '.mkv',
      '.m2ts',
      '.3gp',
      '.txt',
      '.m3u8',
      '.exe',
      '.jpg',
      '.mp4.exe',
    );
    const types = fc.constantFrom(
      '',
      'video/mp4',
      'video/quicktime',
      'application/octet-stream',
      'text/plain',
      'image/jpeg',
    );
    fc.assert(
      fc.property(endings, types, (ending, type) => {
        const name = `take one${ending}`;
        const isTakenByServer = (() => {
          try {
            requireVideoFile(name, type);
            return true;
          } catch {
            return false;
          }
        })();
        expect(fileFault(file(name, type)) === null).toBe(isTakenByServer);
      }),
    );
  });
});

describe('parts', () => {
  const divided = fc
    .integer({ min: 1, max: limits.recordingBytes })
    .map((sizeBytes) => ({ sizeBytes, ...partsOfFile(sizeBytes) }));

  it('cover the file from its first byte to its last, without gap or overlap', () => {
    fc.assert(
      fc.property(divided, (division) => {
        let at = 0;
        for (const number of missingParts(division, new Set())) {
          const { from, to } = rangeOfPart(division, number);
          expect(from).toBe(at);
          expect(to).toBeGreaterThan(from);
          at = to;
        }
        expect(at).toBe(division.sizeBytes);
      }),
      { numRuns: 30 },
    );
  });

  it('count what has arrived: whole parts once, others as far as they are', () => {
    const division = { sizeBytes: 250, partBytes: 100, partCount: 3 };
    expect(missingParts(division, new Set([2]))).toEqual([1, 3]);
    expect(arrivedBytes(division, new Set([3]), new Map([[1, 40]]))).toBe(90);
    // the last word of a part that was noted meanwhile
    expect(arrivedBytes(division, new Set([1, 2]), new Map([[2, 100]]))).toBe(200);
  });
});

describe('speed', () => {
  it('is told after a moment, over what is recent', () => {
    let samples = withSample([], { atMs: 0, bytes: 0 });
    samples = withSample(samples, { atMs: 1000, bytes: 1000 });
    expect(speedOf(samples)).toBeNull();
    samples = withSample(samples, { atMs: 2000, bytes: 2000 });
    expect(speedOf(samples)).toBe(1000);
    expect(timeLeftMs(5000, 1000)).toBe(5000);
    samples = withSample(samples, { atMs: 60_000, bytes: 2000 });
    expect(speedOf(samples)).toBeNull();
  });
});

describe('another try', () => {
  it('waits longer each time, up to half a minute, and never at the same moment as everybody else', () => {
    expect([1, 2, 3, 4].map((failed) => waitMs(failed, 1))).toEqual([1000, 2000, 4000, 8000]);
    expect(waitMs(20, 1)).toBe(30_000);
    expect(waitMs(1, 0)).toBe(500);
  });

  it('stops waiting when it is cancelled', async () => {
    const stop = new AbortController();
    const waiting = pause(60_000, stop.signal);
    stop.abort(new Error('cancelled'));
    await expect(waiting).rejects.toThrow('cancelled');
  });
});

describe('places for parts', () => {
  const signal = new AbortController().signal;

  it('are never more than there are, and all tasks get one', async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(fc.integer({ min: 0, max: 3 }), { maxLength: 20 }), async (waits) => {
        const slots = openSlots(4);
        let [held, most, done] = [0, 0, 0];
        await Promise.all(
          waits.map((wait, order) =>
            slots.hold(order, signal, async () => {
              most = Math.max(most, ++held);
              for (let i = 0; i < wait; i++) await Promise.resolve();
              held -= 1;
              done += 1;
            }),
          ),
        );
        expect(most).toBeLessThanOrEqual(4);
        expect(done).toBe(waits.length);
      }),
      { numRuns: 50 },
    );
  });

  it('go to the file that was chosen first, and are given back after a failure or a cancel', async () => {
    const slots = openSlots(1);
    const ran: number[] = [];
    const stop = new AbortController();
    const task = (order: number, until = signal) =>
      slots.hold(order, until, async () => {
        ran.push(order);
        if (order === 1) throw new Error('broke');
      });
    const all = [task(9), task(3), task(2, stop.signal), task(1), task(5)];
    stop.abort();
    const ends = await Promise.allSettled(all);
    expect(ran).toEqual([9, 1, 3, 5]);
    expect(ends.map((end) => end.status)).toEqual(['fulfilled', 'fulfilled', 'rejected', 'rejected', 'fulfilled']);
  });
});
