import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { KitItem } from '../../shared/contracts/kit';
import type { MovementFields } from '../../shared/contracts/movements';
import type { DoseRule } from '../../shared/domain/kit/doseRule';
import { parseDose } from '../../shared/domain/training/dose';
import { compareMovements, entriesOf, movementOf } from '../../src/features/dictionary/compareMovements';
import { kitById, kitWords } from '../../src/features/dictionary/kitWords';
import { fieldsOf, MovementValues, placeInForm, valuesOf } from '../../src/features/dictionary/movementValues';
import { draftOf, emptyRule, readRule } from '../../src/features/dictionary/ruleDraft';
import { mergeVersions } from '../../src/lib/mergeVersions';

const item = (id: string, name: string): KitItem => ({
  id,
  name,
  otherNames: [],
  withoutText: `no ${name}`,
  loadMatters: false,
  version: 1,
});
const bell = '019a0000-0000-7000-8000-000000000001';
const dumbbell = '019a0000-0000-7000-8000-000000000002';
const bar = '019a0000-0000-7000-8000-000000000003';
const kit = kitById([item(bell, 'kettlebell'), item(dumbbell, 'dumbbell'), item(bar, 'bar to hang from')]);
const option = (kitItemId: string, count = 1, minLoadKg: number | null = null) => ({ kitItemId, count, minLoadKg });

const row: MovementFields = {
  name: 'Low row',
  otherNames: ['crate row'],
  pattern: 'pull',
  kitNeeded: [{ anyOf: [option(dumbbell, 2, 7.5), option(bell)] }],
  points: ['Back long'],
  faults: [],
  cautions: [{ say: 'Check the crate.', more: '' }],
};

describe('kit needed in words', () => {
  it('says the items of one need as a choice', () => {
    expect(kitWords([{ anyOf: [option(bell), option(dumbbell)] }], kit)).toBe('kettlebell, or dumbbell');
  });
  it('says counts and least loads', () => {
    expect(kitWords([{ anyOf: [option(dumbbell, 2, 6)] }], kit)).toBe('2 dumbbells from 6 kg');
    expect(kitWords([{ anyOf: [option(bar, 2)] }], kit)).toBe('2 × bar to hang from');
  });
  it('says several needs so that what belongs together stays together', () => {
    expect(kitWords([{ anyOf: [option(bar)] }, { anyOf: [option(bell), option(dumbbell)] }], kit)).toBe(
      'bar to hang from, and kettlebell or dumbbell',
    );
  });
  it('says nothing where nothing is needed', () => {
    expect(kitWords([], kit)).toBe('');
  });
});

describe('the form of a movement', () => {
  it('sends a movement as it came', () => {
    expect(fieldsOf(valuesOf(row))).toEqual(row);
  });
  it('leaves empty lines out, and reads a decimal comma', () => {
    const values = valuesOf(row);
    values.points.unshift({ text: '  ' });
    values.cautions.push({ say: '', more: '' });
    const first = values.kitNeeded[0]?.options[0];
    if (first) first.minLoadKg = '7,5';
    expect(MovementValues.safeParse(values).success).toBe(true);
    expect(fieldsOf(values)).toEqual(row);
  });
  it('asks for what to do where a caution only says more', () => {
    const read = MovementValues.safeParse({ ...valuesOf(row), cautions: [{ say: '', more: 'Stop on sharp pain.' }] });
    expect(read.error?.issues.map(({ path }) => path)).toEqual([['cautions', 0, 'say']]);
  });
  it('refuses counts and loads that nobody has', () => {
    const with_ = (count: string, minLoadKg: string) =>
      MovementValues.safeParse({ ...valuesOf(row), kitNeeded: [{ options: [{ kitItemId: bell, count, minLoadKg }] }] })
        .success;
    expect(['0', '51', '1.5', 'two'].map((count) => with_(count, ''))).toEqual([false, false, false, false]);
    expect(['0', '-1', 'heavy', '501'].map((load) => with_('1', load))).toEqual([false, false, false, false]);
    expect(with_('50', '500')).toBe(true);
  });
  it('knows where the server’s refusals belong', () => {
    expect(placeInForm('points.2')).toBe('points.2.text');
    expect(placeInForm('otherNames.7')).toBe('otherNames');
    expect(placeInForm('kitNeeded.0.anyOf.1.kitItemId')).toBe('kitNeeded.0.options.1.kitItemId');
    expect(placeInForm('cautions.1.say')).toBe('cautions.1.say');
  });
});

describe('two versions of a movement', () => {
  const mine: MovementFields = { ...row, faults: ['Back rounds'], points: ['Back long', 'Elbows past the ribs'] };

  it('keeps both where two people changed different fields', () => {
    const theirs = entriesOf({ ...row, name: 'Crate row' });
    const differences = compareMovements(row, mine, theirs);
    expect(differences.map(({ conflict }) => conflict)).toEqual([false, false, false]);
    const both = movementOf(mergeVersions(theirs, differences, []), { ...row, name: 'Crate row' });
    expect(both).toEqual({ ...mine, name: 'Crate row' });
  });
  it('asks where both changed the same field to different things', () => {
    const theirs = entriesOf({ ...row, points: ['Long back'] });
    const differences = compareMovements(row, mine, theirs);
    expect(differences.filter(({ conflict }) => conflict).map((one) => one.theirs?.field)).toEqual(['points']);
  });
  it('does not ask where both changed it alike', () => {
    expect(compareMovements(row, mine, entriesOf(mine)).some(({ conflict }) => conflict)).toBe(false);
  });
});

describe('a dose rule in its fields', () => {
  const figure = (most: number) => fc.integer({ min: 1, max: most * 4 }).map((quarters) => quarters / 4);
  const cap = (most: number) => fc.option(fc.integer({ min: 1, max: most }), { nil: null });
  const rule: fc.Arbitrary<DoseRule> = fc.oneof(
    fc.constantFrom<DoseRule>({ type: 'same' }, { type: 'samePerSide' }),
    fc.record({ type: fc.constant('times' as const), factor: figure(20), cap: cap(10_000) }),
    fc.record({ type: fc.constant('secondsForReps' as const), secondsPerRep: figure(60), cap: cap(3600) }),
    fc.constantFrom('20 s', '8 / side', '12 at 8 kg', '200 m').map((text): DoseRule => {
      const dose = parseDose(text);
      if ('fault' in dose) throw new Error(dose.fault);
      return { type: 'fixed', dose };
    }),
  );

  it('comes back as it went in', () => {
    fc.assert(
      fc.property(rule, (one) => {
        expect(readRule(draftOf(one))).toEqual(one);
      }),
    );
  });
  it('says which field does not fit', () => {
    expect(readRule({ ...emptyRule, type: 'times', factor: '0' })).toMatchObject({ field: 'factor' });
    expect(readRule({ ...emptyRule, type: 'times', cap: 'many' })).toMatchObject({ field: 'cap' });
    expect(readRule({ ...emptyRule, type: 'secondsForReps', secondsPerRep: '61' })).toMatchObject({
      field: 'secondsPerRep',
    });
    expect(readRule({ ...emptyRule, type: 'fixed', dose: 'some' })).toMatchObject({ field: 'dose' });
  });
});
