import { AppError } from '../../shared/errors';
import { Membership, Team } from '../models/people';
import type { Actor } from './actor';

/**
 * The signed-in person as an actor in a team. Asked at every request, so that a changed role counts at once.
 * @throws AppError `notFound` where there is no such team or the person is not in it: nobody learns which
 */
export async function actorIn(
  slug: string,
  person: { id: string; name: string; email: string },
  requestId: string,
): Promise<Actor> {
  const membership = await Membership.findOne({
    where: { personId: person.id },
    include: [{ model: Team, as: 'team', where: { slug }, required: true }],
  });
  const team = (membership as unknown as { team?: Team } | null)?.team;
  if (!membership || !team) throw new AppError('notFound');
  return {
    person: { id: person.id, name: person.name, email: person.email },
    team: { id: team.id, slug: team.slug, name: team.name, timeZone: team.timeZone },
    role: membership.role,
    requestId,
  };
}
