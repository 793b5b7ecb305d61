import type { OwnedKit } from '../../shared/domain/kit/kit';
import { AppError, type FieldErrors } from '../../shared/errors';
import { inTransaction } from '../models/database';
import { KitItem, MemberKit } from '../models/dictionary';
import { Membership } from '../models/people';
import type { Actor } from './actor';
import { audit } from './audit';

/** What the actor owns; `told` is false until they have said so, even if it was "nothing". */
export async function kitOf(actor: Actor): Promise<{ told: boolean; items: OwnedKit[] }> {
  const where = { teamId: actor.team.id, personId: actor.person.id };
  const [membership, rows] = await Promise.all([
    Membership.findOne({ where, attributes: ['kitToldAt'] }),
    MemberKit.findAll({ where, order: [['kitItemId', 'ASC']] }),
  ]);
  return { told: rows.length > 0 || membership?.kitToldAt != null, items: rows.map(asOwned) };
}

/** Replaces what the actor owns; an empty list says "nothing". @throws AppError `invalid` */
export function save(actor: Actor, items: OwnedKit[]): Promise<OwnedKit[]> {
  return inTransaction(async () => {
    const where = { teamId: actor.team.id, personId: actor.person.id };
    // holds the row until the end: of two tabs the later one wins whole
    await Membership.update({ kitToldAt: new Date() }, { where });
    await refuseFaulty(actor, items);
    await MemberKit.destroy({ where });
    await MemberKit.bulkCreate(
      items.map(({ kitItemId, count, loadsKg }) => ({ ...where, kitItemId, count, loadsKg: [...loadsKg] })),
    );
    await audit(actor, 'memberKit.saved', { type: 'person', id: actor.person.id }, { items: items.length });
    return (await kitOf(actor)).items;
  });
}

async function refuseFaulty(actor: Actor, items: OwnedKit[]): Promise<void> {
  const ids = items.map(({ kitItemId }) => kitItemId);
  const known = new Set(
    (await KitItem.findAll({ where: { teamId: actor.team.id, id: ids }, attributes: ['id'] })).map(({ id }) => id),
  );
  const fields: FieldErrors = {};
  items.forEach(({ kitItemId, count, loadsKg }, index) => {
    if (!known.has(kitItemId)) fields[`items.${index}.kitItemId`] = 'The team’s list has no such item any more.';
    else if (ids.indexOf(kitItemId) < index) fields[`items.${index}.kitItemId`] = 'This item is in the list twice.';
    if (loadsKg.length > count) fields[`items.${index}.loadsKg`] = 'These are more loads than pieces.';
    // kept with two decimals
    else if (loadsKg.some((kg) => kg < 0.01)) fields[`items.${index}.loadsKg`] = 'A load is at least 0.01 kg.';
  });
  if (Object.keys(fields).length > 0) throw new AppError('invalid', { fields });
}

const asOwned = ({ kitItemId, count, loadsKg }: MemberKit): OwnedKit => ({
  kitItemId,
  count,
  loadsKg: loadsKg.map(Number),
});
