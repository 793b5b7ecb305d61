import { QueryTypes } from 'sequelize';
import type { KitNeed } from '../../shared/domain/kit/kit';
import { type KitDictionary, kitDictionary, type Substitution } from '../../shared/domain/kit/substitutionsFor';
import { buildDictionary, type SearchDictionary } from '../../shared/domain/search/dictionary';
import type { Caution } from '../../shared/domain/training/caution';
import type { Pattern } from '../../shared/domain/words';
import { currentTransaction, database } from '../models/database';
import { KitItem, Movement, Substitution as SubstitutionRow } from '../models/dictionary';

/** A movement as everything but its own page needs it. */
export type KnownMovement = {
  id: string;
  name: string;
  otherNames: readonly string[];
  pattern: Pattern;
  kitNeeded: readonly KitNeed[];
  points: readonly string[];
  cautions: readonly Caution[];
};

export type KnownKit = {
  id: string;
  name: string;
  otherNames: readonly string[];
  withoutText: string;
  loadMatters: boolean;
};

/** A team's dictionary, whole and indexed; without merged duplicates. Never changed once built. */
export type TeamDictionary = {
  version: number;
  /** for `resolve` and `suggest` of shared/domain/search */
  search: SearchDictionary;
  /** for `substitutionsFor` and `myVersion` of shared/domain/kit */
  kit: KitDictionary;
  movements: ReadonlyMap<string, KnownMovement>;
  kitItems: ReadonlyMap<string, KnownKit>;
  /** substitutions from each movement */
  substitutionsFrom: ReadonlyMap<string, readonly Substitution[]>;
};

/** Teams whose dictionary a process keeps; beyond it the one asked for longest ago goes. */
const mostKept = 200;
const kept = new Map<string, { version: number; dictionary: Promise<TeamDictionary> }>();

/**
 * The team's dictionary as it is now: one small query while nothing changed, built anew when the version did, so that a change
 * made through any process counts at once in all of them.
 */
export async function dictionaryOf(teamId: string): Promise<TeamDictionary> {
  const version = await versionOf(teamId);
  const known = kept.get(teamId);
  if (known?.version === version) {
    kept.delete(teamId);
    kept.set(teamId, known);
    return known.dictionary;
  }
  // what a transaction sees may be rolled back: it is not kept for others
  if (currentTransaction()) return build(teamId, version);
  const fresh = { version, dictionary: build(teamId, version) };
  kept.set(teamId, fresh);
  if (kept.size > mostKept) kept.delete(kept.keys().next().value as string);
  // a failed build is tried again by whoever asks next
  fresh.dictionary.catch(() => kept.get(teamId) === fresh && kept.delete(teamId));
  return fresh.dictionary;
}

/**
 * Says that a movement, kit item or substitution of the team changed; in the transaction that changes it. Until that ends, no
 * other one changes the team's dictionary, so that two can't take the same name.
 */
export async function bumpDictionary(teamId: string): Promise<void> {
  await database().query('update teams set dictionary_version = dictionary_version + 1 where id = :teamId', {
    replacements: { teamId },
  });
}

async function versionOf(teamId: string): Promise<number> {
  const [row] = await database().query<{ version: number }>(
    'select dictionary_version as version from teams where id = :teamId',
    { replacements: { teamId }, type: QueryTypes.SELECT },
  );
  return row?.version ?? 0;
}

async function build(teamId: string, version: number): Promise<TeamDictionary> {
  const [movementRows, kitRows, substitutionRows] = await Promise.all([
    Movement.findAll({ where: { teamId, mergedIntoId: null }, order: [['name', 'ASC']] }),
    KitItem.findAll({ where: { teamId }, order: [['name', 'ASC']] }),
    SubstitutionRow.findAll({ where: { teamId }, order: [['createdAt', 'ASC']] }),
  ]);
  const movements = movementRows.map(
    ({ id, name, otherNames, pattern, kitNeeded, points, cautions }): KnownMovement => ({
      id,
      name,
      otherNames,
      pattern,
      kitNeeded,
      points,
      cautions,
    }),
  );
  const kitItems = kitRows.map(
    ({ id, name, otherNames, withoutText, loadMatters }): KnownKit => ({
      id,
      name,
      otherNames,
      withoutText,
      loadMatters,
    }),
  );
  const kit = kitDictionary(movements, substitutionRows.map(asSubstitution));
  return {
    version,
    search: buildDictionary(movements, kitItems),
    kit,
    movements: new Map(movements.map((movement) => [movement.id, movement])),
    kitItems: new Map(kitItems.map((item) => [item.id, item])),
    substitutionsFrom: kit.substitutionsFrom,
  };
}

function asSubstitution(row: SubstitutionRow): Substitution {
  const { id, fromMovementId, toMovementId, missing, missingKitItemId, doseRule, reason } = row;
  return { id, fromMovementId, toMovementId, missing, missingKitItemId, doseRule, reason };
}
