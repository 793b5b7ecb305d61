import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convertDose, explainRule } from '../../../shared/domain/kit/convertDose';
import type { DoseRule } from '../../../shared/domain/kit/doseRule';
import { doseUnits } from '../../../shared/domain/training/dose';
import { dose } from './kitWorld';

const times = (factor: number, cap: number | null = null): DoseRule => ({ type: 'times', factor, cap });
const seconds = (secondsPerRep: number, cap: number | null = null): DoseRule => ({
  type: 'secondsForReps',
  secondsPerRep,
  cap,
});

describe('the dose of what is done instead', () => {
  it('is about 10 light rows in place of 7 heavier pulls, never 14', () => {
    // common practice, no source
    expect(convertDose(dose({ amount: 7 }), times(1.5, 12)).amount).toBe(10);
    expect(convertDose(dose({ amount: 7 }), times(2, 12)).amount).toBe(12);
  });

  it('is the same count of lateral hops without a rope', () => {
    // common practice, no source
    expect(convertDose(dose({ amount: 20 }), { type: 'same' })).toEqual(dose({ amount: 20 }));
  });

  it('drops the load of the kit that is missing and keeps the tempo', () => {
    const heavy = dose({ amount: 5, load: { kg: 60, typed: '60 kg' }, tempo: '3-0-1-0' });
    expect(convertDose(heavy, { type: 'same' })).toEqual(dose({ amount: 5, tempo: '3-0-1-0' }));
    const bell = dose({ amount: 8, load: { kg: 16, typed: '16 kg' } });
    expect(convertDose(heavy, { type: 'fixed', dose: bell })).toEqual(bell);
  });

  it('turns repetitions into seconds, a side where they were a side', () => {
    expect(convertDose(dose({ amount: 10, perSide: true, tempo: '3-0-1-0' }), seconds(2))).toEqual(
      dose({ amount: 20, unit: 'seconds', perSide: true }),
    );
    expect(convertDose(dose({ amount: 30 }), seconds(2, 40)).amount).toBe(40);
  });

  it('leaves what is in seconds already, up to the cap', () => {
    expect(convertDose(dose({ amount: 30, unit: 'seconds' }), seconds(2))).toEqual(
      dose({ amount: 30, unit: 'seconds' }),
    );
    expect(convertDose(dose({ amount: 90, unit: 'seconds' }), seconds(2, 40)).amount).toBe(40);
  });

  it('takes the same count on each side', () => {
    expect(convertDose(dose({ amount: 6 }), { type: 'samePerSide' })).toEqual(dose({ amount: 6, perSide: true }));
  });

  it('scales both ends of a range and drops a range that the cap closes', () => {
    expect(convertDose(dose({ amount: 8, amountTo: 10 }), times(1.5))).toMatchObject({ amount: 12, amountTo: 15 });
    expect(convertDose(dose({ amount: 8, amountTo: 10 }), times(1.5, 12))).toMatchObject({
      amount: 12,
      amountTo: null,
    });
  });

  it('never goes over a cap, below something to do, or out of what a dose can be', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 10_000 }),
        fc.option(fc.integer({ min: 1, max: 10_000 })),
        fc.constantFrom(...doseUnits),
        fc.double({ min: 0.05, max: 20, noNaN: true }),
        fc.option(fc.integer({ min: 1, max: 3600 })),
        fc.constantFrom(times, seconds),
        (amount, amountTo, unit, factor, cap, rule) => {
          const converted = convertDose(dose({ amount, amountTo, unit }), rule(factor, cap));
          for (const value of [converted.amount, converted.amountTo ?? converted.amount]) {
            expect(value).toBeGreaterThanOrEqual(1);
            expect(value).toBeLessThanOrEqual(Math.min(cap ?? 10_000, 10_000));
            expect(Number.isInteger(value)).toBe(true);
          }
        },
      ),
    );
  });
});

describe('a dose rule in a coach’s words', () => {
  it.each<[DoseRule, string]>([
    [{ type: 'same' }, 'same count'],
    [{ type: 'samePerSide' }, 'same count on each side'],
    [times(1.5, 30), 'half again as many, at most 30'],
    [times(2), 'twice as many'],
    [times(0.5), 'half as many'],
    [times(1.2), '1.2 times as many'],
    [seconds(2, 40), '2 s for each rep, at most 40 s'],
    [{ type: 'fixed', dose: dose({ amount: 40, unit: 'seconds', perSide: true }) }, 'always 40 s / side'],
  ])('%j', (rule, words) => {
    expect(explainRule(rule)).toBe(words);
  });
});
