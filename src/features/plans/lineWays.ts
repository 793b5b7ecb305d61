import type { KitItem } from '../../../shared/contracts/kit';
import type { Moment } from '../../../shared/contracts/moments';
import type { Movement, Substitution } from '../../../shared/contracts/movements';
import { convertDose } from '../../../shared/domain/kit/convertDose';
import { missingTexts } from '../../../shared/domain/kit/missingText';
import { itemsOf } from '../../../shared/domain/kit/owned';
import { formatDose, parseDose } from '../../../shared/domain/training/dose';
import type { MissingThing } from '../../../shared/domain/words';
import type { WrittenLine, WrittenSubstitution } from './writtenPlan';

/** What the dictionary and the library know of a movement. */
export type MovementFacts = { movement: Movement; substitutions: Substitution[]; moments: Moment[] };

export type KitById = ReadonlyMap<string, KitItem>;

/** The newest moment that shows how the movement is done; a substitution's chapter is a demo of what is done instead. */
export const demoOf = ({ movement, moments }: MovementFacts): Moment | undefined =>
  moments.find(
    (moment) => (moment.kind === 'demo' || moment.kind === 'substitution') && moment.movement?.id === movement.id,
  );

/** How what is missing is said: “no rope”, “little space”. */
export function lackText(lack: { missing: MissingThing; missingKitItemId: string | null }, kit: KitById): string {
  if (lack.missing === 'space') return 'little space';
  if (lack.missing === 'ability') return 'easier';
  return (lack.missingKitItemId !== null && kit.get(lack.missingKitItemId)?.withoutText) || 'missing kit';
}

export type Way = {
  lack: string;
  movementId: string;
  /** the plan's own; the dictionary makes one of the line's dose */
  dose: string | null;
  from: 'plan' | 'dictionary';
};

/** What there is to do instead of a line: what the plan says, then what the dictionary adds to it. */
export function waysOf(line: WrittenLine, facts: MovementFacts | undefined, kit: KitById): Way[] {
  const planned = line.substitutions.flatMap((one): Way[] =>
    one.movementId === null
      ? []
      : [{ lack: lackText(one, kit), movementId: one.movementId, dose: one.dose, from: 'plan' }],
  );
  const inPlan = new Set(planned.map(({ movementId }) => movementId));
  const known = (facts?.substitutions ?? [])
    .filter(({ to }) => !inPlan.has(to.id))
    .map((one): Way => ({ lack: lackText(one, kit), movementId: one.to.id, dose: null, from: 'dictionary' }));
  return [...planned, ...known];
}

/** The kit that the movement needs, as its absence is said; empty where none is needed. */
export const needTexts = ({ movement }: MovementFacts, kit: KitById): string[] =>
  missingTexts(movement.kitNeeded, [], kit);

/**
 * The dictionary's substitutions for the kit that a line's movement needs, as far as the line has none like them, each with the
 * dose that its rule makes of the line's.
 * @param id makes the new ids
 */
export function dictionaryWays(line: WrittenLine, facts: MovementFacts, id: () => string): WrittenSubstitution[] {
  const needed = itemsOf(facts.movement.kitNeeded);
  const [first = null] = needed;
  const dose = parseDose(line.dose);
  return facts.substitutions.flatMap(({ to, missing, missingKitItemId, doseRule, reason }) => {
    const lacking = missingKitItemId ?? first;
    if (missing !== 'kit' || lacking === null || !needed.has(lacking)) return [];
    if (line.substitutions.some((one) => one.movementId === to.id && one.missingKitItemId === lacking)) return [];
    const own = 'fault' in dose ? (doseRule.type === 'fixed' ? doseRule.dose : null) : convertDose(dose, doseRule);
    return [
      {
        id: id(),
        movementId: to.id,
        missing,
        missingKitItemId: lacking,
        dose: own ? formatDose(own) : '',
        reason,
      },
    ];
  });
}
