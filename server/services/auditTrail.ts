import { AuditEvent, Person } from '../models/people';
import { type Actor, requireMay } from './actor';
import { newestFirst, type PageAsked } from './newestFirst';

/** Every change in the team, newest first, with the name of who made it where that person is still known. */
export async function listAudit(actor: Actor, asked: PageAsked) {
  requireMay(actor, 'readAudit');
  const { items, nextCursor } = await newestFirst(AuditEvent, { teamId: actor.team.id }, asked);
  const actorIds = [...new Set(items.flatMap((event) => event.actorId ?? []))];
  const actors = await Person.findAll({ where: { id: actorIds }, attributes: ['id', 'name'] });
  const names = new Map(actors.map((person) => [person.id, person.name]));
  return {
    items: items.map((event) => ({ event, actor: event.actorId ? (names.get(event.actorId) ?? null) : null })),
    nextCursor,
  };
}
