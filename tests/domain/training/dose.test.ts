import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Dose, doseUnits, formatDose, parseDose } from '../../../shared/domain/training/dose';

const plain = { amountTo: null, unit: 'reps', perSide: false, load: null, tempo: null } as const;

const written: [string, Partial<Dose> & { amount: number }, string][] = [
  ['10', { amount: 10 }, '10'],
  ['10 reps', { amount: 10 }, '10'],
  ['x10', { amount: 10 }, '10'],
  ['6/side', { amount: 6, perSide: true }, '6 / side'],
  ['6 each side', { amount: 6, perSide: true }, '6 / side'],
  ['6 per leg', { amount: 6, perSide: true }, '6 / side'],
  ['12 each', { amount: 12, perSide: true }, '12 / side'],
  ['30s', { amount: 30, unit: 'seconds' }, '30 s'],
  ['40 sec/side', { amount: 40, unit: 'seconds', perSide: true }, '40 s / side'],
  ['1 min', { amount: 60, unit: 'seconds' }, '60 s'],
  ['1:30', { amount: 90, unit: 'seconds' }, '90 s'],
  ['2 min', { amount: 120, unit: 'seconds' }, '2 min'],
  ['200m', { amount: 200, unit: 'metres' }, '200 m'],
  ['1,000 metres', { amount: 1000, unit: 'metres' }, '1000 m'],
  ['1.5 km', { amount: 1500, unit: 'metres' }, '1500 m'],
  ['12 cal', { amount: 12, unit: 'calories' }, '12 cal'],
  ['8–10', { amount: 8, amountTo: 10 }, '8 to 10'],
  [
    '8-10 reps @ 16 kg tempo 3-0-1-0',
    { amount: 8, amountTo: 10, load: { kg: 16, typed: '16 kg' }, tempo: '3-0-1-0' },
    '8 to 10 at 16 kg, tempo 3-0-1-0',
  ],
  ['10 @ 16', { amount: 10, load: { kg: 16, typed: '16 kg' } }, '10 at 16 kg'],
  ['10 x 16 kg', { amount: 10, load: { kg: 16, typed: '16 kg' } }, '10 at 16 kg'],
  ['10 at 2x16kg', { amount: 10, load: { kg: 16, typed: '2 × 16 kg' } }, '10 at 2 × 16 kg'],
  // 35 × 0.45359237 = 15.876 kg; NIST Handbook 44, appendix C
  ['10 @ 35 lb', { amount: 10, load: { kg: 15.88, typed: '35 lb' } }, '10 at 35 lb'],
  ['5, tempo 3010', { amount: 5, tempo: '3-0-1-0' }, '5, tempo 3-0-1-0'],
];

describe('a dose as coaches type it', () => {
  it.each(written)('reads “%s”', (text, dose, shown) => {
    expect(parseDose(text)).toEqual({ ...plain, ...dose });
    expect(formatDose({ ...plain, ...dose })).toBe(shown);
  });

  it.each([
    ['', /Say how much/],
    ['max', /Say how much/],
    ['35 lb', /Say how much/],
    ['20 swings', /“swings” is not understood/],
    ['10 to 8', /smaller number first/],
    ['5 tempo fast', /four numbers/],
    ['5 @ 80%', /in kg or lb/],
    ['0', /more than 0/],
    ['99999', /at most 10,000/],
    ['10 @ 5000 kg', /at most 1000 kg/],
    ['9'.repeat(200), /too long/],
  ])('says what is wrong with “%s”', (text, fault) => {
    expect(parseDose(text)).toEqual({ fault: expect.stringMatching(fault) });
  });

  const tenths = (max: number) => fc.integer({ min: 1, max: max * 10 }).map((n) => n / 10);
  const load = fc.record({
    value: tenths(900),
    unit: fc.constantFrom('kg', 'lb'),
    pieces: fc.constantFrom('', '2 × '),
  });
  const doses = fc.record({
    from: tenths(4999),
    more: fc.option(tenths(4999)),
    unit: fc.constantFrom(...doseUnits),
    perSide: fc.boolean(),
    load: fc.option(load),
    tempo: fc.option(
      fc.array(fc.integer({ min: 0, max: 20 }), { minLength: 4, maxLength: 4 }).map((parts) => parts.join('-')),
    ),
  });

  it('reads back what it writes', () => {
    fc.assert(
      fc.property(doses, ({ from, more, load, ...rest }) => {
        const amountTo = more === null ? null : Math.round((from + more) * 10) / 10;
        const kg = load && (load.unit === 'kg' ? load.value : Math.round(load.value * 0.45359237 * 100) / 100);
        const dose: Dose = {
          ...rest,
          amount: from,
          amountTo,
          load: load && kg ? { kg, typed: `${load.pieces}${load.value} ${load.unit}` } : null,
        };
        expect(parseDose(formatDose(dose))).toEqual(dose);
      }),
    );
  });

  it('answers any text with a dose or a sentence, never with a throw', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 100, unit: 'binary' }), (text) => {
        const read = parseDose(text);
        expect('fault' in read ? read.fault.length : read.amount).toBeGreaterThan(0);
      }),
    );
  });
});
