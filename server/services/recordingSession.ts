import { AppError } from '../../shared/errors';
import { currentTransaction } from '../models/database';
import { Recording } from '../models/recordings';
import { Session } from '../models/sessions';
import type { Actor } from './actor';
import { dateInZone } from './teamDay';

/** Which session a recording belongs to, and which of its takes it is. */

/**
 * The session that was chosen; where none was asked about, the only one on the file's own date in the team's time zone.
 * @param sessionId null is a choice: no session
 * @throws AppError `invalid` for a session that the team has not
 */
export async function sessionFor(
  actor: Actor,
  chosen: { sessionId?: string | null | undefined; fileDate?: string | undefined },
): Promise<Session | null> {
  const teamId = actor.team.id;
  if (chosen.sessionId) return sessionOf(teamId, chosen.sessionId);
  if (chosen.sessionId === null || chosen.fileDate === undefined) return null;
  const date = dateInZone(actor.team.timeZone, new Date(chosen.fileDate));
  const [only, other] = await Session.findAll({ where: { teamId, date }, limit: 2 });
  return only && !other ? only : null;
}

/** @throws AppError `invalid` */
export async function sessionOf(teamId: string, id: string): Promise<Session> {
  const session = await Session.findOne({ where: { teamId, id } });
  if (!session) throw new AppError('invalid', { fields: { sessionId: 'This session is not there any more.' } });
  return session;
}

/** The number after the session's last take; two that ask at once get two. */
export async function nextTake(teamId: string, sessionId: string | null): Promise<number> {
  if (sessionId === null) return 1;
  const transaction = currentTransaction();
  if (transaction)
    await Session.findOne({ where: { teamId, id: sessionId }, attributes: ['id'], lock: transaction.LOCK.UPDATE });
  const last = await Recording.max<number | null, Recording>('take', { where: { teamId, sessionId } });
  return Math.min(99, Number(last ?? 0) + 1);
}
