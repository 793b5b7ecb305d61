import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { insideFrame } from '../../src/components/pictureMedia';
import { gapsOf, loopStep, skipAt } from '../../src/features/player/playRules';

describe('looping a chapter', () => {
  const chapter = { startMs: 30_000, endMs: 35_000 };

  it('goes again when the end is reached, even when nobody looked for a second', () => {
    expect(loopStep(chapter, 34_999, 60_000)).toBe('stay');
    expect(loopStep(chapter, 35_000, 60_000)).toBe('again');
    expect(loopStep(chapter, 36_000, 60_000)).toBe('again');
  });

  it('lets go of a chapter that somebody left', () => {
    expect(loopStep(chapter, 29_999, 60_000)).toBe('left');
    expect(loopStep(chapter, 50_000, 60_000)).toBe('left');
  });

  it('goes again at the end of a recording that is shorter than its chapter says', () => {
    expect(loopStep({ startMs: 54_000, endMs: 60_000 }, 60_000, 59_980)).toBe('again');
  });
});

describe('passing over', () => {
  it('passes over from the first to the last moment of an aside, and not a moment more', () => {
    const skips = [{ startMs: 40_000, endMs: 43_000 }];
    expect(skipAt(skips, 39_999)).toBeUndefined();
    expect(skipAt(skips, 40_000)).toEqual(skips[0]);
    expect(skipAt(skips, 42_999)).toEqual(skips[0]);
    expect(skipAt(skips, 43_000)).toBeUndefined();
  });
});

describe('the bar’s gaps', () => {
  it('says which stretch is only unmarked and which is passed over', () => {
    const chapters = [
      { startMs: 0, endMs: 10_000 },
      { startMs: 12_000, endMs: 20_000 },
    ];
    expect(gapsOf(chapters, [{ startMs: 20_000, endMs: 25_000 }], 30_000)).toEqual([
      { startMs: 10_000, endMs: 12_000, gap: 'open' },
      { startMs: 20_000, endMs: 25_000, gap: 'skipped' },
      { startMs: 25_000, endMs: 30_000, gap: 'open' },
    ]);
  });

  it('covers with chapters and gaps the whole recording, once', () => {
    const lengths = fc.array(
      fc.record({ gap: fc.nat(5000), length: fc.integer({ min: 1, max: 9000 }), skip: fc.boolean() }),
      {
        maxLength: 12,
      },
    );
    fc.assert(
      fc.property(lengths, fc.nat(5000), (stretches, rest) => {
        let at = 0;
        const spans = stretches.map(({ gap, length, skip }) => {
          const startMs = at + gap;
          at = startMs + length;
          return { startMs, endMs: at, skip };
        });
        const durationMs = at + rest;
        const chapters = spans.filter(({ skip }) => !skip);
        const skips = spans.filter(({ skip }) => skip);
        const all = [...chapters, ...gapsOf(chapters, skips, durationMs)].toSorted((a, b) => a.startMs - b.startMs);
        let end = 0;
        for (const span of all) {
          expect(span.startMs).toBe(end);
          expect(span.endMs).toBeGreaterThan(span.startMs);
          end = span.endMs;
        }
        expect(end).toBe(durationMs);
      }),
    );
  });
});

describe('seeking inside a frame', () => {
  // measured: a seek to exactly n/fps lands one frame early in half of the cases, to (n + 0.5)/fps never
  it('goes to the middle of the frame that holds the time', () => {
    expect(insideFrame(0, 30)).toBeCloseTo(0.5 / 30);
    expect(insideFrame(100, 30)).toBeCloseTo(3.5 / 30);
    expect(insideFrame(271_200, 30)).toBeCloseTo(8136.5 / 30);
  });

  it('stays in the frame that holds the time and is never before it', () => {
    const rates = fc.constantFrom(24, 25, 30_000 / 1001, 30, 50, 60);
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 14_400_000 }), rates, (ms, fps) => {
        const seconds = insideFrame(ms, fps);
        expect(seconds * 1000).toBeGreaterThanOrEqual(ms);
        expect(Math.floor(seconds * fps + 1e-6)).toBe(Math.floor((ms / 1000) * fps + 1e-6));
      }),
    );
  });
});
