import { Op } from 'sequelize';
import type * as contract from '../../shared/contracts/movements';
import type { DoseRule } from '../../shared/domain/kit/doseRule';
import type { MissingThing } from '../../shared/domain/words';
import { AppError, type FieldErrors } from '../../shared/errors';
import { inTransaction } from '../models/database';
import { KitItem, Movement, Substitution } from '../models/dictionary';
import type { Actor } from './actor';
import { audit } from './audit';
import { bumpDictionary } from './dictionary';
import { saveIfCurrent } from './versions';

type Fields = {
  toMovementId: string;
  missing: MissingThing;
  missingKitItemId: string | null;
  doseRule: DoseRule;
  reason: string;
};

/** What to do instead of a movement, and what it stands in for itself. */
export async function substitutionsAround(actor: Actor, movementId: string) {
  const rows = await Substitution.findAll({
    where: { teamId: actor.team.id, [Op.or]: [{ fromMovementId: movementId }, { toMovementId: movementId }] },
    order: [
      ['createdAt', 'ASC'],
      ['id', 'ASC'],
    ],
  });
  const presented = await presentAll(actor, rows);
  return {
    substitutions: presented.filter(({ from }) => from.id === movementId),
    standsInFor: presented.filter(({ to }) => to.id === movementId),
  };
}

/** @throws AppError `notFound`, `invalid`, `nameTaken` where the same one is there already */
export function add(actor: Actor, movementId: string, fields: Fields): Promise<contract.Substitution> {
  return inTransaction(async () => {
    await bumpDictionary(actor.team.id);
    await refuseUnknownMovement(actor, movementId);
    await refuseFaulty(actor, movementId, fields);
    if (await sameOne(actor, movementId, fields)) throw new AppError('nameTaken', { message: isThere });
    const row = await Substitution.create({ ...columnsOf(fields), teamId: actor.team.id, fromMovementId: movementId });
    await audit(actor, 'substitution.added', subject(row), detailsOf(row));
    return presentOne(actor, row);
  });
}

/** @throws AppError `notFound`, `invalid`, or `stale` with the current substitution */
export function update(
  actor: Actor,
  movementId: string,
  substitutionId: string,
  { version, ...fields }: Fields & { version: number },
): Promise<contract.Substitution> {
  return inTransaction(async () => {
    await bumpDictionary(actor.team.id);
    const row = await substitutionOf(actor, movementId, substitutionId);
    if (row.version !== version) throw new AppError('stale', { current: await presentOne(actor, row) });
    await refuseFaulty(actor, movementId, fields);
    const same = await sameOne(actor, movementId, fields);
    if (same && same.id !== row.id) throw new AppError('invalid', { fields: { toMovementId: isThere } });
    await saveIfCurrent(row, version, columnsOf(fields), () => presentOne(actor, row));
    await audit(actor, 'substitution.changed', subject(row), detailsOf(row));
    return presentOne(actor, row);
  });
}

/** @throws AppError `notFound` */
export function remove(actor: Actor, movementId: string, substitutionId: string): Promise<void> {
  return inTransaction(async () => {
    await bumpDictionary(actor.team.id);
    const row = await substitutionOf(actor, movementId, substitutionId);
    await row.destroy();
    await audit(actor, 'substitution.removed', subject(row), detailsOf(row));
  });
}

const isThere = 'The dictionary has this substitution already.';

async function substitutionOf(actor: Actor, fromMovementId: string, id: string): Promise<Substitution> {
  const row = await Substitution.findOne({ where: { id, fromMovementId, teamId: actor.team.id } });
  if (!row) throw new AppError('notFound');
  return row;
}

const sameOne = (actor: Actor, fromMovementId: string, { toMovementId, missing, missingKitItemId }: Fields) =>
  Substitution.findOne({
    where: { teamId: actor.team.id, fromMovementId, toMovementId, missing, missingKitItemId },
  });

async function refuseUnknownMovement(actor: Actor, movementId: string): Promise<void> {
  const there = await Movement.count({ where: { id: movementId, teamId: actor.team.id, mergedIntoId: null } });
  if (there === 0) throw new AppError('notFound');
}

async function refuseFaulty(actor: Actor, fromMovementId: string, fields: Fields): Promise<void> {
  const teamId = actor.team.id;
  const { toMovementId, missing, missingKitItemId } = fields;
  const faults: FieldErrors = {};
  if (toMovementId === fromMovementId) faults.toMovementId = 'A movement does not stand in for itself.';
  else if ((await Movement.count({ where: { id: toMovementId, teamId, mergedIntoId: null } })) === 0)
    faults.toMovementId = 'This movement is not in the dictionary any more. Choose another.';
  if (missing === 'kit' && missingKitItemId === null) faults.missingKitItemId = 'Say which kit is missing.';
  if (missing !== 'kit' && missingKitItemId !== null)
    faults.missingKitItemId = 'Name kit only where kit is what is missing.';
  else if (missingKitItemId !== null && (await KitItem.count({ where: { id: missingKitItemId, teamId } })) === 0)
    faults.missingKitItemId = 'The team’s list has no such item any more.';
  if (Object.keys(faults).length > 0) throw new AppError('invalid', { fields: faults });
}

const columnsOf = ({ toMovementId, missing, missingKitItemId, doseRule, reason }: Fields): Fields => ({
  toMovementId,
  missing,
  missingKitItemId,
  doseRule,
  reason,
});

const subject = (row: Substitution) => ({ type: 'substitution', id: row.id });
const detailsOf = (row: Substitution) => ({ from: row.fromMovementId, to: row.toMovementId, missing: row.missing });

async function presentOne(actor: Actor, row: Substitution): Promise<contract.Substitution> {
  return (await presentAll(actor, [row]))[0] as contract.Substitution;
}

async function presentAll(actor: Actor, rows: Substitution[]): Promise<contract.Substitution[]> {
  const ids = [...new Set(rows.flatMap((row) => [row.fromMovementId, row.toMovementId]))];
  if (ids.length === 0) return [];
  const movements = await Movement.findAll({ where: { teamId: actor.team.id, id: ids }, attributes: ['id', 'name'] });
  const nameOf = new Map(movements.map(({ id, name }) => [id, name]));
  const named = (id: string) => ({ id, name: nameOf.get(id) ?? '' });
  return rows.map((row) => ({
    id: row.id,
    from: named(row.fromMovementId),
    to: named(row.toMovementId),
    missing: row.missing,
    missingKitItemId: row.missingKitItemId,
    doseRule: row.doseRule,
    reason: row.reason,
    version: row.version,
  }));
}
