import { col, fn, literal, Op } from 'sequelize';
import { z } from 'zod';
import type { Role } from '../../shared/domain/words';
import { AppError } from '../../shared/errors';
import { database, inTransaction } from '../models/database';
import { Membership, Person, Team } from '../models/people';
import { type Actor, requireMay } from './actor';
import { audit } from './audit';
import type { PageAsked } from './newestFirst';
import { pageOf, readCursor } from './pages';
import { isTimeZone } from './teamDay';

export type TeamPerson = { person: Person; role: Role; since: Date };

/** Everybody in the team, by name. */
export async function listPeople(actor: Actor, { cursor, limit }: PageAsked) {
  requireMay(actor, 'managePeople');
  const memberships = await Membership.findAll({
    where: { teamId: actor.team.id, [Op.and]: cursor ? [afterPerson(cursor)] : [] },
    include: [{ model: Person, as: 'person', required: true }],
    order: [
      [fn('lower', col('person.name')), 'ASC'],
      ['personId', 'ASC'],
    ],
    limit: limit + 1,
  });
  return pageOf(memberships.map(withPerson), limit, ({ person }) => [person.name, person.id]);
}

const Place = z.tuple([z.string(), z.uuid()]);

function afterPerson(cursor: string) {
  const place = Place.safeParse(readCursor(cursor, 2));
  if (!place.success)
    throw new AppError('invalid', { fields: { cursor: 'This list changed. Start at its beginning.' } });
  const [name, id] = place.data.map((part) => database().escape(part));
  return literal(`(lower("person"."name"), "Membership"."person_id") > (lower(${name}), ${id}::uuid)`);
}

/**
 * Gives a person another role; it counts from their next request on.
 * @throws AppError `notFound`, or `lastOwner` where nobody would be left to run the team
 */
export function changeRole(actor: Actor, personId: string, role: Role): Promise<TeamPerson> {
  return inTransaction(async () => {
    await lockPeople(actor);
    const membership = await membershipOf(actor, personId);
    const from = membership.role;
    if (from === role) return withPerson(membership);
    if (from === 'owner') await requireAnotherOwner(actor, personId);
    await membership.update({ role });
    await audit(actor, 'person.roleChanged', { type: 'person', id: personId }, { from, to: role });
    return withPerson(membership);
  });
}

/**
 * Takes a person out of the team; what they keep in it (kit, places, notices) goes, their account and other teams stay.
 * @throws AppError `notFound`, `lastOwner`
 */
export function removePerson(actor: Actor, personId: string): Promise<void> {
  return inTransaction(async () => {
    await lockPeople(actor);
    const membership = await membershipOf(actor, personId);
    if (membership.role === 'owner') await requireAnotherOwner(actor, personId);
    await membership.destroy();
    await audit(actor, 'person.removed', { type: 'person', id: personId }, { role: membership.role });
  });
}

/** Changes the team's name or time zone. @throws AppError `invalid` for a zone that does not exist */
export function updateTeam(actor: Actor, change: { name?: string | undefined; timeZone?: string | undefined }) {
  requireMay(actor, 'editTeam');
  if (change.timeZone !== undefined && !isTimeZone(change.timeZone))
    throw new AppError('invalid', {
      fields: { timeZone: 'There is no such time zone. Write one like Europe/Berlin.' },
    });
  return inTransaction(async () => {
    const team = await lockTeam(actor);
    const from = { name: team.name, timeZone: team.timeZone };
    const to = { name: change.name ?? team.name, timeZone: change.timeZone ?? team.timeZone };
    if (from.name === to.name && from.timeZone === to.timeZone) return to;
    await team.update(to);
    await audit(actor, 'team.changed', { type: 'team', id: team.id }, { from, to });
    return to;
  });
}

async function lockTeam(actor: Actor): Promise<Team> {
  const team = await Team.findByPk(actor.team.id, { lock: true });
  if (!team) throw new AppError('notFound');
  return team;
}

/**
 * Changes to who is in a team take turns, so that two owners who step down at once don't leave it without one; and
 * whoever waited may have lost the right meanwhile.
 */
export async function lockPeople(actor: Actor): Promise<void> {
  await lockTeam(actor);
  const own = await Membership.findOne({ where: { teamId: actor.team.id, personId: actor.person.id } });
  if (!own) throw new AppError('notFound');
  requireMay({ ...actor, role: own.role }, 'managePeople');
}

async function membershipOf(actor: Actor, personId: string): Promise<Membership> {
  const membership = await Membership.findOne({
    where: { teamId: actor.team.id, personId },
    include: [{ model: Person, as: 'person', required: true }],
  });
  if (!membership) throw new AppError('notFound');
  return membership;
}

async function requireAnotherOwner(actor: Actor, personId: string): Promise<void> {
  const others = await Membership.count({
    where: { teamId: actor.team.id, role: 'owner', personId: { [Op.ne]: personId } },
  });
  if (others === 0) throw new AppError('lastOwner');
}

function withPerson(membership: Membership): TeamPerson {
  const { person } = membership as unknown as { person: Person };
  return { person, role: membership.role, since: membership.createdAt };
}
