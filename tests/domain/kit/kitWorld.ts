import fc from 'fast-check';
import type { DoseRule } from '../../../shared/domain/kit/doseRule';
import type { KitNeed, OwnedKit } from '../../../shared/domain/kit/kit';
import { kitDictionary, type LineSubstitution, type Substitution } from '../../../shared/domain/kit/substitutionsFor';
import type { Dose } from '../../../shared/domain/training/dose';
import { missingThings, patterns } from '../../../shared/domain/words';

/** Small invented worlds of kit, movements and substitutions, crowded enough that chains meet. */

export const dose = (given: Partial<Dose> & { amount: number }): Dose => ({
  amountTo: null,
  unit: 'reps',
  perSide: false,
  load: null,
  tempo: null,
  ...given,
});

export const need = (kitItemId: string, count = 1, minLoadKg: number | null = null): KitNeed => ({
  anyOf: [{ kitItemId, count, minLoadKg }],
});

export const have = (kitItemId: string, count = 1, loadsKg: number[] = []): OwnedKit => ({ kitItemId, count, loadsKg });

const item = fc.constantFrom('bar', 'rope', 'bell', 'dumbbell');
const load = fc.constantFrom(8, 12, 16, 24);
const movementId = fc.constantFrom('a', 'b', 'c', 'd', 'e', 'f');

export const needs: fc.Arbitrary<KitNeed[]> = fc.array(
  fc.record({
    anyOf: fc.array(fc.record({ kitItemId: item, count: fc.integer({ min: 1, max: 3 }), minLoadKg: fc.option(load) }), {
      minLength: 1,
      maxLength: 3,
    }),
  }),
  { maxLength: 3 },
);

export const ownedKit: fc.Arbitrary<OwnedKit[]> = fc.uniqueArray(
  fc
    .record({ kitItemId: item, count: fc.integer({ min: 1, max: 4 }), loads: fc.array(load, { maxLength: 4 }) })
    .map(({ kitItemId, count, loads }) => ({ kitItemId, count, loadsKg: loads.slice(0, count) })),
  { selector: (kit) => kit.kitItemId, maxLength: 4 },
);

/** Kit to add to what is owned: more pieces, with or without a known load. */
export const moreKit = ownedKit;

export function together(owned: readonly OwnedKit[], more: readonly OwnedKit[]): OwnedKit[] {
  const sum = new Map(owned.map((kit) => [kit.kitItemId, kit]));
  for (const kit of more) {
    const before = sum.get(kit.kitItemId);
    sum.set(kit.kitItemId, {
      kitItemId: kit.kitItemId,
      count: (before?.count ?? 0) + kit.count,
      loadsKg: [...(before?.loadsKg ?? []), ...kit.loadsKg],
    });
  }
  return [...sum.values()];
}

const doseRule: fc.Arbitrary<DoseRule> = fc.oneof(
  fc.constant<DoseRule>({ type: 'same' }),
  fc.constant<DoseRule>({ type: 'times', factor: 1.5, cap: 30 }),
  fc.constant<DoseRule>({ type: 'secondsForReps', secondsPerRep: 2, cap: 40 }),
);

const step = {
  missing: fc.constantFrom(...missingThings),
  missingKitItemId: fc.option(item),
  reason: fc.constantFrom('Why not.', ''),
};

const substitutions: fc.Arbitrary<Substitution[]> = fc.array(
  fc.record({ id: fc.uuid(), fromMovementId: movementId, toMovementId: movementId, doseRule, ...step }),
  { maxLength: 14 },
);

export const lineSubstitutions: fc.Arbitrary<LineSubstitution[]> = fc.array(
  fc.record({ movementId, dose: fc.constant(dose({ amount: 8 })), ...step }),
  { maxLength: 3 },
);

export const dictionary = fc
  .tuple(
    fc.array(fc.record({ kitNeeded: needs, pattern: fc.constantFrom(...patterns) }), { minLength: 6, maxLength: 6 }),
    substitutions,
  )
  .map(([movements, all]) =>
    kitDictionary(
      movements.map((movement, i) => ({ id: 'abcdef'[i] ?? 'a', ...movement })),
      all,
    ),
  );
