import { AuditEvent, Person } from '../models/people';
import { type Actor, requireMay } from './actor';
import { newestFirst, type PageAsked } from './newestFirst';
import { subjectNames } from './trailSubjects';

/** Every change in the team, newest first, with who made it and what it is about, by name, where they are still known. */
export async function listAudit(actor: Actor, asked: PageAsked) {
  requireMay(actor, 'readAudit');
  const { items, nextCursor } = await newestFirst(AuditEvent, { teamId: actor.team.id }, asked);
  const actorIds = [...new Set(items.flatMap((event) => event.actorId ?? []))];
  const actors = await Person.findAll({ where: { id: actorIds }, attributes: ['id', 'name'] });
  const names = new Map(actors.map((person) => [person.id, person.name]));
  const subjects = await subjectNames(actor.team.id, items);
  return {
    items: items.map((event) => ({
      event,
      actor: event.actorId ? (names.get(event.actorId) ?? null) : null,
      subject: event.subjectId ? (subjects.get(event.subjectId) ?? null) : null,
    })),
    nextCursor,
  };
}
