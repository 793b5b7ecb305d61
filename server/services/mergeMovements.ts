import type * as contract from '../../shared/contracts/movements';
import { AppError } from '../../shared/errors';
import { currentTransaction, database, inTransaction } from '../models/database';
import { Movement } from '../models/dictionary';
import type { Actor } from './actor';
import { audit } from './audit';
import { bumpDictionary } from './dictionary';
import { movementOf, namesBeside, present, refuseTooManyNames, subject } from './movements';
import { refreshSearchOf } from './searchIndex';

/**
 * Folds a duplicate into a movement: all that points at the duplicate points at the movement, its names become other names.
 * The duplicate's row stays, so that old links and old versions lead on. Asking again changes nothing.
 * @throws AppError `notFound`, `invalid`, or `stale` with the current movement where either was changed meanwhile
 */
export function merge(
  actor: Actor,
  movementId: string,
  asked: { duplicateId: string; version: number; duplicateVersion: number },
): Promise<contract.Movement> {
  return inTransaction(async () => {
    if (asked.duplicateId === movementId)
      throw new AppError('invalid', { fields: { duplicateId: 'Choose another movement than this one.' } });
    await bumpDictionary(actor.team.id);
    await lock(actor, [movementId, asked.duplicateId]);
    const movement = await movementOf(actor, movementId);
    const duplicate = await Movement.findOne({ where: { id: asked.duplicateId, teamId: actor.team.id } });
    if (duplicate?.mergedIntoId === movement.id) return present(movement);
    if (!duplicate || duplicate.mergedIntoId)
      throw new AppError('invalid', { fields: { duplicateId: 'This movement is not in the dictionary any more.' } });
    if (movement.version !== asked.version || duplicate.version !== asked.duplicateVersion)
      throw new AppError('stale', { current: present(movement) });

    const otherNames = namesBeside(movement.name, [...movement.otherNames, duplicate.name, ...duplicate.otherNames]);
    refuseTooManyNames(otherNames, 'duplicateId');
    for (const statement of moves)
      await database().query(statement, {
        replacements: { teamId: actor.team.id, kept: movement.id, duplicate: duplicate.id },
      });
    await movement.update({
      otherNames,
      // what keeps people safe is never lost; the rest is as the one that stays says it
      cautions: withCautionsOf(movement, duplicate),
      version: movement.version + 1,
    });
    await duplicate.update({ mergedIntoId: movement.id, version: duplicate.version + 1 });
    await audit(actor, 'movement.merged', subject(movement), {
      duplicateId: duplicate.id,
      name: movement.name,
      duplicateName: duplicate.name,
    });
    await refreshSearchOf({ movementId });
    return present(movement);
  });
}

/** In the order of ids, so that two merges at once never wait for each other; keeps plans from pointing at what goes. */
async function lock(actor: Actor, ids: string[]): Promise<void> {
  const transaction = currentTransaction();
  if (transaction)
    await Movement.findAll({
      where: { id: ids, teamId: actor.team.id },
      attributes: ['id'],
      order: [['id', 'ASC']],
      lock: transaction.LOCK.UPDATE,
    });
}

function withCautionsOf(movement: Movement, duplicate: Movement) {
  const said = new Set(movement.cautions.map(({ say }) => say.toLowerCase()));
  return [...movement.cautions, ...duplicate.cautions.filter(({ say }) => !said.has(say.toLowerCase()))].slice(0, 10);
}

const moves = [
  'update movements set merged_into_id = :kept where team_id = :teamId and merged_into_id = :duplicate',
  'update cues set movement_id = :kept where team_id = :teamId and movement_id = :duplicate',
  `update chapters set movement_id = :kept where team_id = :teamId and movement_id = :duplicate`,
  `update chapters set stands_in_for_movement_id = :kept where team_id = :teamId and stands_in_for_movement_id = :duplicate`,
  // nothing stands in for itself
  `update chapters set stands_in_for_movement_id = null
   where team_id = :teamId and movement_id = :kept and stands_in_for_movement_id = :kept`,

  'update block_lines set movement_id = :kept where team_id = :teamId and movement_id = :duplicate',
  `delete from line_substitutions s using line_substitutions other
   where s.team_id = :teamId and s.movement_id = :duplicate and other.line_id = s.line_id and other.movement_id = :kept
     and other.missing = s.missing and other.missing_kit_item_id is not distinct from s.missing_kit_item_id`,
  'update line_substitutions set movement_id = :kept where team_id = :teamId and movement_id = :duplicate',
  `delete from line_substitutions s using block_lines l
   where s.team_id = :teamId and l.id = s.line_id and s.movement_id = :kept and l.movement_id = :kept`,

  `delete from substitutions where team_id = :teamId
     and from_movement_id in (:kept, :duplicate) and to_movement_id in (:kept, :duplicate)`,
  `delete from substitutions s using substitutions other
   where s.team_id = :teamId and s.from_movement_id = :duplicate
     and other.from_movement_id = :kept and other.to_movement_id = s.to_movement_id
     and other.missing = s.missing and other.missing_kit_item_id is not distinct from s.missing_kit_item_id`,
  `delete from substitutions s using substitutions other
   where s.team_id = :teamId and s.to_movement_id = :duplicate
     and other.to_movement_id = :kept and other.from_movement_id = s.from_movement_id
     and other.missing = s.missing and other.missing_kit_item_id is not distinct from s.missing_kit_item_id`,
  'update substitutions set from_movement_id = :kept where team_id = :teamId and from_movement_id = :duplicate',
  'update substitutions set to_movement_id = :kept where team_id = :teamId and to_movement_id = :duplicate',
];

/**
 * What merged duplicates became, for ids that somebody still has from before: duplicate → movement. In a transaction the movements
 * are held until its end: a merge waits for it, and then moves what it wrote.
 * @param ids in any order, null for none
 */
export async function followMerges(
  teamId: string,
  ids: readonly (string | null)[],
): Promise<(id: string | null) => string | null> {
  const wanted = [...new Set(ids.filter((id) => id !== null))];
  const transaction = currentTransaction();
  const movements =
    wanted.length === 0
      ? []
      : await Movement.findAll({
          where: { teamId, id: wanted },
          attributes: ['id', 'mergedIntoId'],
          order: [['id', 'ASC']],
          ...(transaction ? { lock: transaction.LOCK.KEY_SHARE } : {}),
        });
  const became = new Map(movements.map(({ id, mergedIntoId }) => [id, mergedIntoId]));
  return (id) => (id === null ? null : (became.get(id) ?? id));
}
