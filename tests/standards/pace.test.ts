import { describe, expect, it } from 'vitest';
import { type Scheme, schemeSeconds } from '../../shared/domain/training/scheme';

/** Interval arithmetic that studies print; they disagree on the rest after the last interval, so a scheme says it. */

const intervals = (rounds: number, workSeconds: number, restSeconds: number, restAfterLast: boolean): Scheme => ({
  type: 'intervals',
  rounds,
  workSeconds,
  restSeconds,
  restAfterLast,
});

describe('how long a scheme lasts', () => {
  it('4 × 30 s with 4 min between is 14:00', () => {
    // Gist et al., Sports Medicine 2014
    expect(schemeSeconds(intervals(4, 30, 240, false))).toBe(14 * 60);
  });

  it('two times 5 × 60/60 with 2 min between is 22:00 when the last recovery of each is counted', () => {
    // a study of 2022, second-hand
    const part = schemeSeconds(intervals(5, 60, 60, true));
    expect(part).toBe(10 * 60);
    expect(2 * (part ?? 0) + 120).toBe(22 * 60);
  });

  it('8 × 20/10 is 230 s, or 240 s with the rest after the last', () => {
    expect(schemeSeconds(intervals(8, 20, 10, false))).toBe(230);
    expect(schemeSeconds(intervals(8, 20, 10, true))).toBe(240);
  });

  it('says nothing about work that ends when it is done', () => {
    expect(schemeSeconds({ type: 'roundsForTime', rounds: 5, capMinutes: 20 })).toBeNull();
  });
});
