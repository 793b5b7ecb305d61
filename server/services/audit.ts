import { AuditEvent } from '../models/people';
import type { Actor } from './actor';

type Subject = { type: string; id: string | null };

/**
 * Notes a change in the audit trail, in the transaction that makes it.
 * @param action the subject's name and what happened to it: `movement.renamed`
 * @param details what changed; no caption text, no secrets
 */
export async function audit(
  actor: Actor,
  action: string,
  subject: Subject,
  details: Record<string, unknown> = {},
): Promise<void> {
  await AuditEvent.create({
    teamId: actor.team.id,
    actorId: actor.person.id,
    action,
    subjectType: subject.type,
    subjectId: subject.id,
    details,
    requestId: actor.requestId,
  });
}
