import type { Dose } from '../training/dose';
import type { MissingThing, Pattern } from '../words';
import { convertDose } from './convertDose';
import type { DoseRule } from './doseRule';
import type { KitNeed, OwnedKit } from './kit';
import { canDo, itemsOf, missingFor } from './owned';

/** A substitution that the coach wrote into a line of the plan, with a dose of its own. */
export type LineSubstitution = {
  /** what is done instead */
  movementId: string;
  missing: MissingThing;
  /** the item that it does without; null where something else is missing, or any kit */
  missingKitItemId: string | null;
  dose: Dose;
  reason: string;
};

/** A substitution of the team's dictionary: one way only, from a movement to what is done instead. */
export type Substitution = {
  id: string;
  fromMovementId: string;
  toMovementId: string;
  missing: MissingThing;
  missingKitItemId: string | null;
  doseRule: DoseRule;
  reason: string;
};

export type MovementKit = { pattern: Pattern; kitNeeded: readonly KitNeed[] };

/** What the rules of this folder know of a team's dictionary. */
export type KitDictionary = {
  movements: ReadonlyMap<string, MovementKit>;
  substitutionsFrom: ReadonlyMap<string, readonly Substitution[]>;
};

export function kitDictionary(
  movements: Iterable<{ id: string } & MovementKit>,
  substitutions: Iterable<Substitution>,
): KitDictionary {
  const substitutionsFrom = new Map<string, Substitution[]>();
  for (const substitution of substitutions) {
    const others = substitutionsFrom.get(substitution.fromMovementId);
    if (others) others.push(substitution);
    else substitutionsFrom.set(substitution.fromMovementId, [substitution]);
  }
  return {
    movements: new Map(Array.from(movements, ({ id, pattern, kitNeeded }) => [id, { pattern, kitNeeded }])),
    substitutionsFrom,
  };
}

/** One way to do without: a movement that the kit allows, and how one gets there. */
export type RankedSubstitution = {
  movementId: string;
  /** the movements between, for "no bar → ring row → table row"; empty for a direct one */
  via: string[];
  from: 'plan' | 'dictionary';
  /** why, one reason a step; steps without one are left out */
  reasons: string[];
  /** what turns the dose, one rule a step; see `doseFor` */
  doseRules: DoseRule[];
};

export type SubstitutionAnswer =
  | { possible: true }
  | { possible: false; missing: KitNeed[]; ways: RankedSubstitution[] };

/** Longer chains have little left of what the coach wanted. */
const longestChain = 3;

/**
 * What somebody with this kit can do instead of a movement, best first: what the plan's coach chose for this very line, then what
 * the dictionary has for the missing item, then the same pattern, then fewer steps. Only movements that the kit allows, each once.
 * Everything within three steps is looked at, past a movement that is possible too, so that more kit never loses a way.
 * @param lineSubstitutions the plan's own; one to the same movement hides the dictionary's
 */
export function substitutionsFor(
  movementId: string,
  dictionary: KitDictionary,
  owned: readonly OwnedKit[],
  lineSubstitutions: readonly LineSubstitution[] = [],
): SubstitutionAnswer {
  const movement = dictionary.movements.get(movementId);
  const missing = missingFor(movement?.kitNeeded ?? [], owned);
  if (missing.length === 0) return { possible: true };

  const missingItems = itemsOf(missing);
  const isPossible = (id: string) => canDo(dictionary.movements.get(id)?.kitNeeded ?? [], owned);
  const best = new Map<string, Chain>();
  for (const chain of chainsFrom(movementId, dictionary, lineSubstitutions)) {
    const target = chain.at(-1)?.toMovementId;
    if (target === undefined || !isPossible(target)) continue;
    const known = best.get(target);
    if (!known || compare(rankOf(chain), rankOf(known)) < 0) best.set(target, chain);
  }

  function rankOf(chain: Chain): number[] {
    const [first] = chain;
    const between = chain.slice(0, -1).map((step) => step.toMovementId);
    // what the plan names leads; what lies behind a movement of the plan only where that one is out of reach
    const isPlans = first?.from === 'plan' && !between.some(isPossible);
    const isForItem =
      first?.missing === 'kit' && first.missingKitItemId !== null && missingItems.has(first.missingKitItemId);
    const pattern = dictionary.movements.get(chain.at(-1)?.toMovementId ?? '')?.pattern;
    return [
      isPlans ? 0 : 1,
      isPlans ? chain.length : 0,
      isForItem ? 0 : 1,
      pattern === movement?.pattern ? 0 : 1,
      chain.length,
      first?.missing === 'kit' ? 0 : 1,
    ];
  }

  const ways = [...best.values()].sort((a, b) => compare(rankOf(a), rankOf(b))).map(wayOf);
  return { possible: false, missing, ways };
}

/** The dose of a way: its rules one after the other. */
export function doseFor(way: Pick<RankedSubstitution, 'doseRules'>, dose: Dose): Dose {
  return way.doseRules.reduce(convertDose, dose);
}

type Step = Omit<Substitution, 'id' | 'fromMovementId'> & { from: 'plan' | 'dictionary' };
type Chain = readonly Step[];

/** Every chain of substitutions that meets no movement twice, shorter ones first. */
function chainsFrom(start: string, dictionary: KitDictionary, lineSubstitutions: readonly LineSubstitution[]): Chain[] {
  const inPlan = new Set(lineSubstitutions.map((substitution) => substitution.movementId));
  const dictionarySteps = (id: string): Step[] =>
    (dictionary.substitutionsFrom.get(id) ?? []).map(
      ({ toMovementId, doseRule, missing, missingKitItemId, reason }) => ({
        toMovementId,
        doseRule,
        missing,
        missingKitItemId,
        reason,
        from: 'dictionary',
      }),
    );
  const firstSteps: Step[] = [
    ...lineSubstitutions.map(
      ({ movementId, dose, missing, missingKitItemId, reason }): Step => ({
        toMovementId: movementId,
        doseRule: { type: 'fixed', dose },
        missing,
        missingKitItemId,
        reason,
        from: 'plan',
      }),
    ),
    ...dictionarySteps(start).filter((step) => !inPlan.has(step.toMovementId)),
  ];
  const chains: Chain[] = firstSteps.filter((step) => isNew(step, [])).map((step) => [step]);
  // the list grows while it is walked
  for (const chain of chains) {
    if (chain.length === longestChain) continue;
    const last = chain.at(-1)?.toMovementId ?? start;
    chains.push(
      ...dictionarySteps(last)
        .filter((step) => isNew(step, chain))
        .map((step) => [...chain, step]),
    );
  }
  return chains;

  function isNew({ toMovementId }: Step, chain: Chain): boolean {
    return (
      toMovementId !== start &&
      dictionary.movements.has(toMovementId) &&
      chain.every((step) => step.toMovementId !== toMovementId)
    );
  }
}

function wayOf(chain: Chain): RankedSubstitution {
  return {
    movementId: chain.at(-1)?.toMovementId ?? '',
    via: chain.slice(0, -1).map((step) => step.toMovementId),
    from: chain[0]?.from ?? 'dictionary',
    reasons: chain.map((step) => step.reason).filter((reason) => reason !== ''),
    doseRules: chain.map((step) => step.doseRule),
  };
}

function compare(a: readonly number[], b: readonly number[]): number {
  const at = a.findIndex((value, i) => value !== b[i]);
  return at < 0 ? 0 : (a[at] ?? 0) - (b[at] ?? 0);
}
