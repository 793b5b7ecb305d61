import { col, fn, Op, where } from 'sequelize';
import type * as contract from '../../shared/contracts/kit';
import { AppError } from '../../shared/errors';
import { inTransaction } from '../models/database';
import { KitItem } from '../models/dictionary';
import { lowered } from '../models/lowered';
import type { Actor } from './actor';
import { audit } from './audit';
import { bumpDictionary } from './dictionary';
import { saveIfCurrent } from './versions';

type Fields = Omit<contract.KitItem, 'id' | 'version'>;

export async function list(actor: Actor): Promise<contract.KitItem[]> {
  const rows = await KitItem.findAll({
    where: { teamId: actor.team.id },
    order: [
      [fn('lower', col('name')), 'ASC'],
      ['id', 'ASC'],
    ],
  });
  return rows.map(present);
}

/** @throws AppError `nameTaken` */
export function add(actor: Actor, fields: Fields): Promise<contract.KitItem> {
  return inTransaction(async () => {
    await bumpDictionary(actor.team.id);
    await refuseTakenName(actor, fields.name);
    const item = await KitItem.create({ ...columnsOf(fields), teamId: actor.team.id });
    await audit(actor, 'kitItem.added', { type: 'kitItem', id: item.id }, { name: item.name });
    return present(item);
  });
}

/** @throws AppError `notFound`, `nameTaken`, or `stale` with the current item */
export function update(
  actor: Actor,
  kitItemId: string,
  { version, ...fields }: Fields & { version: number },
): Promise<contract.KitItem> {
  return inTransaction(async () => {
    await bumpDictionary(actor.team.id);
    const item = await KitItem.findOne({ where: { id: kitItemId, teamId: actor.team.id } });
    if (!item) throw new AppError('notFound');
    await refuseTakenName(actor, fields.name, item.id);
    const from = item.name;
    await saveIfCurrent(item, version, columnsOf(fields), async () => present(item));
    await audit(actor, 'kitItem.changed', { type: 'kitItem', id: item.id }, { from, to: item.name });
    return present(item);
  });
}

const columnsOf = ({ name, otherNames, withoutText, loadMatters }: Fields): Fields => ({
  name,
  otherNames,
  withoutText,
  loadMatters,
});

async function refuseTakenName(actor: Actor, name: string, exceptId?: string): Promise<void> {
  const taken = await KitItem.count({
    where: {
      teamId: actor.team.id,
      ...(exceptId ? { id: { [Op.ne]: exceptId } } : {}),
      [Op.and]: where(fn('lower', col('name')), lowered(name)),
    },
  });
  if (taken > 0) throw new AppError('nameTaken', { fields: { name: `“${name}” is in the list already.` } });
}

function present({ id, name, otherNames, withoutText, loadMatters, version }: KitItem): contract.KitItem {
  return { id, name, otherNames, withoutText, loadMatters, version };
}
