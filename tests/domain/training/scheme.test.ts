import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatScheme, parseScheme, type Scheme, schemeSeconds } from '../../../shared/domain/training/scheme';

const written: [string, Scheme, string][] = [
  ['AMRAP 12', { type: 'amrap', minutes: 12 }, 'AMRAP 12'],
  ['12 min amrap:', { type: 'amrap', minutes: 12 }, 'AMRAP 12'],
  ['AMRAP 7:30', { type: 'amrap', minutes: 7.5 }, 'AMRAP 7.5'],
  ['emom 10', { type: 'emom', minutes: 10, everySeconds: 60 }, 'EMOM 10'],
  ['every minute for 8 min', { type: 'emom', minutes: 8, everySeconds: 60 }, 'EMOM 8'],
  ['every 1:30 for 12', { type: 'emom', minutes: 12, everySeconds: 90 }, 'every 90 s for 12 min'],
  ['every 2 min x 6', { type: 'emom', minutes: 12, everySeconds: 120 }, 'every 2 min for 12 min'],
  [
    '8 x 20/10',
    { type: 'intervals', rounds: 8, workSeconds: 20, restSeconds: 10, restAfterLast: false },
    '8 × 20 s on, 10 s off',
  ],
  [
    '8 rounds of 20 s on, 10 s off',
    { type: 'intervals', rounds: 8, workSeconds: 20, restSeconds: 10, restAfterLast: false },
    '8 × 20 s on, 10 s off',
  ],
  [
    '20 on 10 off x 8',
    { type: 'intervals', rounds: 8, workSeconds: 20, restSeconds: 10, restAfterLast: false },
    '8 × 20 s on, 10 s off',
  ],
  [
    '4 x 30 s with 4 min between',
    { type: 'intervals', rounds: 4, workSeconds: 30, restSeconds: 240, restAfterLast: false },
    '4 × 30 s on, 4 min off',
  ],
  [
    '5 × 60 s on, 60 s off, rest after the last',
    { type: 'intervals', rounds: 5, workSeconds: 60, restSeconds: 60, restAfterLast: true },
    '5 × 60 s on, 60 s off, rest after the last',
  ],
  [
    '3 x 40 s on, no rest',
    { type: 'intervals', rounds: 3, workSeconds: 40, restSeconds: 0, restAfterLast: false },
    '3 × 40 s on, no rest',
  ],
  ['5 RFT', { type: 'roundsForTime', rounds: 5, capMinutes: null }, '5 rounds for time'],
  ['For time', { type: 'roundsForTime', rounds: 1, capMinutes: null }, '1 round for time'],
  [
    '5 rounds for time (20 min cap)',
    { type: 'roundsForTime', rounds: 5, capMinutes: 20 },
    '5 rounds for time, cap 20 min',
  ],
  ['3 sets', { type: 'sets', sets: 3, restSeconds: null }, '3 sets'],
  ['3 sets, rest 1:30', { type: 'sets', sets: 3, restSeconds: 90 }, '3 sets, 90 s rest'],
  ['2 rounds of holds', { type: 'holds', rounds: 2 }, 'holds, 2 rounds'],
  ['2 rounds, not for time', { type: 'quality', rounds: 2, minutes: null }, 'quality, 2 rounds'],
  ['quality', { type: 'quality', rounds: null, minutes: null }, 'quality'],
  ['easy 6 min', { type: 'quality', rounds: null, minutes: 6 }, '6 min easy'],
  ['quality, 2 rounds, 6 min', { type: 'quality', rounds: 2, minutes: 6 }, 'quality, 2 rounds, 6 min'],
];

describe('a scheme as coaches type it', () => {
  it.each(written)('reads “%s”', (text, scheme, shown) => {
    expect(parseScheme(text)).toEqual(scheme);
    expect(formatScheme(scheme)).toBe(shown);
  });

  it.each([
    ['', /AMRAP 12/],
    ['as you like', /AMRAP 12/],
    ['2 rounds', /Say how/],
    ['8 x 20 s', /Say the rest too/],
    ['AMRAP 500', /outside/],
    ['1 '.repeat(100), /too long/],
  ])('says what is wrong with “%s”', (text, fault) => {
    expect(parseScheme(text)).toEqual({ fault: expect.stringMatching(fault) });
  });

  const rounds = fc.integer({ min: 1, max: 100 });
  const seconds = fc.integer({ min: 1, max: 7200 });
  const minutes = fc.integer({ min: 1, max: 360 }).map((n) => n / 2);
  const schemes: fc.Arbitrary<Scheme> = fc.oneof(
    fc.record({ type: fc.constant('amrap' as const), minutes }),
    fc.record({ type: fc.constant('emom' as const), minutes, everySeconds: seconds }),
    fc
      .record({
        type: fc.constant('intervals' as const),
        rounds,
        workSeconds: seconds,
        restSeconds: fc.nat(7200),
        restAfterLast: fc.boolean(),
      })
      // a rest of no length after the last is the same as none
      .map((s) => ({ ...s, restAfterLast: s.restAfterLast && s.restSeconds > 0 })),
    fc.record({ type: fc.constant('roundsForTime' as const), rounds, capMinutes: fc.option(minutes) }),
    fc.record({ type: fc.constant('sets' as const), sets: rounds, restSeconds: fc.option(seconds) }),
    fc.record({ type: fc.constant('holds' as const), rounds }),
    fc.record({ type: fc.constant('quality' as const), rounds: fc.option(rounds), minutes: fc.option(minutes) }),
  );

  it('reads back what it writes', () => {
    fc.assert(
      fc.property(schemes, (scheme) => {
        expect(parseScheme(formatScheme(scheme))).toEqual(scheme);
      }),
      { numRuns: 500 },
    );
  });

  it('knows the length of what runs by the clock, and of nothing else', () => {
    fc.assert(
      fc.property(schemes, (scheme) => {
        const byClock =
          scheme.type === 'amrap' ||
          scheme.type === 'emom' ||
          scheme.type === 'intervals' ||
          (scheme.type === 'quality' && scheme.minutes !== null);
        expect(schemeSeconds(scheme) !== null).toBe(byClock);
      }),
    );
  });
});
