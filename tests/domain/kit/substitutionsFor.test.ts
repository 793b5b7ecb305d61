import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { KitNeed } from '../../../shared/domain/kit/kit';
import { canDo } from '../../../shared/domain/kit/owned';
import {
  doseFor,
  kitDictionary,
  type LineSubstitution,
  type Substitution,
  substitutionsFor,
} from '../../../shared/domain/kit/substitutionsFor';
import type { Pattern } from '../../../shared/domain/words';
import { dictionary, dose, have, lineSubstitutions, moreKit, need, ownedKit, together } from './kitWorld';

const movement = (id: string, pattern: Pattern, kitNeeded: KitNeed[] = []) => ({ id, pattern, kitNeeded });
const instead = (fromMovementId: string, toMovementId: string, more: Partial<Substitution> = {}): Substitution => ({
  id: `${fromMovementId}>${toMovementId}`,
  fromMovementId,
  toMovementId,
  missing: 'kit',
  missingKitItemId: null,
  doseRule: { type: 'same' },
  reason: `${toMovementId} will do`,
  ...more,
});

const movements = [
  movement('pull-up', 'pull', [need('bar')]),
  movement('ring row', 'pull', [need('rings')]),
  movement('table row', 'pull', [need('table')]),
  movement('towel row', 'pull'),
  movement('plank', 'hold/stretch'),
];
const ways = (all: Substitution[], owned = [have('towel')], plan: LineSubstitution[] = []) => {
  const answer = substitutionsFor('pull-up', kitDictionary(movements, all), owned, plan);
  return answer.possible ? 'possible' : answer.ways;
};
const named = (all: Substitution[], owned = [have('towel')], plan: LineSubstitution[] = []) => {
  const found = ways(all, owned, plan);
  return found === 'possible' ? found : found.map((way) => way.movementId);
};

describe('what to do instead', () => {
  it('is nothing where the kit suffices', () => {
    expect(ways([instead('pull-up', 'towel row')], [have('bar')])).toBe('possible');
  });

  it('says what is missing when there is no way', () => {
    const answer = substitutionsFor('pull-up', kitDictionary(movements, [instead('pull-up', 'ring row')]), []);
    expect(answer).toEqual({ possible: false, missing: [need('bar')], ways: [] });
  });

  it('follows chains of three, not of four, and turns the dose at each step', () => {
    const chain = [
      instead('pull-up', 'ring row', { doseRule: { type: 'times', factor: 2, cap: null } }),
      instead('ring row', 'table row'),
      instead('table row', 'towel row', { doseRule: { type: 'secondsForReps', secondsPerRep: 3, cap: 30 } }),
      instead('towel row', 'plank'),
    ];
    const [way, ...others] = ways(chain);
    expect(others).toEqual([]);
    expect(way).toMatchObject({ movementId: 'towel row', via: ['ring row', 'table row'], from: 'dictionary' });
    expect(typeof way === 'object' && doseFor(way, dose({ amount: 4 }))).toEqual(dose({ amount: 24, unit: 'seconds' }));
  });

  it('walks one way only', () => {
    expect(named([instead('towel row', 'pull-up')])).toEqual([]);
  });

  it('ranks the item that is missing before the same pattern before fewer steps', () => {
    const all = [
      instead('pull-up', 'ring row'),
      instead('ring row', 'towel row'),
      instead('pull-up', 'plank'),
      instead('pull-up', 'table row', { missingKitItemId: 'bar' }),
    ];
    expect(named(all, [have('table')])).toEqual(['table row', 'towel row', 'plank']);
  });

  it('puts what the plan’s coach chose first, with the coach’s dose, and hides the dictionary’s to the same movement', () => {
    const plan: LineSubstitution[] = [
      {
        movementId: 'plank',
        missing: 'kit',
        missingKitItemId: 'bar',
        dose: dose({ amount: 30, unit: 'seconds' }),
        reason: 'Today we brace.',
      },
    ];
    const all = [instead('pull-up', 'towel row', { missingKitItemId: 'bar' }), instead('pull-up', 'plank')];
    const found = ways(all, [], plan);
    expect(found).toHaveLength(2);
    const [first] = found;
    expect(first).toMatchObject({ movementId: 'plank', from: 'plan', reasons: ['Today we brace.'] });
    expect(typeof first === 'object' && doseFor(first, dose({ amount: 5 }))).toEqual(
      dose({ amount: 30, unit: 'seconds' }),
    );
  });

  it('leaves out a movement that is no longer in the dictionary', () => {
    expect(named([instead('pull-up', 'merged away')])).toEqual([]);
  });

  const asked = fc.constantFrom('a', 'b', 'c');

  it('never shows one that needs missing kit, a circle, or a chain over three', () => {
    fc.assert(
      fc.property(asked, dictionary, ownedKit, lineSubstitutions, (id, known, owned, plan) => {
        const answer = substitutionsFor(id, known, owned, plan);
        if (answer.possible) return;
        for (const { movementId, via, doseRules } of answer.ways) {
          expect(canDo(known.movements.get(movementId)?.kitNeeded ?? [need('nothing')], owned)).toBe(true);
          const steps = [id, ...via, movementId];
          expect(new Set(steps).size).toBe(steps.length);
          expect(doseRules.length).toBe(steps.length - 1);
          expect(steps.length).toBeLessThanOrEqual(4);
        }
        expect(new Set(answer.ways.map((way) => way.movementId)).size).toBe(answer.ways.length);
      }),
      { numRuns: 300 },
    );
  });

  it('never loses a way with more kit, unless the movement itself became possible', () => {
    fc.assert(
      fc.property(asked, dictionary, ownedKit, moreKit, lineSubstitutions, (id, known, owned, more, plan) => {
        const before = substitutionsFor(id, known, owned, plan);
        const after = substitutionsFor(id, known, together(owned, more), plan);
        if (after.possible) return;
        expect(before.possible).toBe(false);
        const waysAfter = after.ways.map((way) => way.movementId);
        expect(
          before.possible ? [] : before.ways.map((way) => way.movementId).filter((way) => !waysAfter.includes(way)),
        ).toEqual([]);
      }),
      { numRuns: 300 },
    );
  });
});
