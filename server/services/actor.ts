import type { Action } from '../../shared/domain/permissions';
import { may } from '../../shared/domain/permissions';
import type { Role } from '../../shared/domain/words';
import { AppError } from '../../shared/errors';

/** Who acts, and in which team: every service of a team takes one. */
export type Actor = {
  person: { id: string; name: string; email: string };
  team: { id: string; slug: string; name: string; timeZone: string };
  role: Role;
  requestId: string;
};

/** @throws AppError `notAllowed` */
export function requireMay(actor: Actor, action: Action): void {
  if (!may(actor.role, action)) throw new AppError('notAllowed');
}

export function actorMay(actor: Actor, action: Action): boolean {
  return may(actor.role, action);
}
