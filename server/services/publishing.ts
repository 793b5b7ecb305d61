import type * as contract from '../../shared/contracts/sessions';
import { AppError } from '../../shared/errors';
import { database, inTransaction } from '../models/database';
import { Notice } from '../models/people';
import { Session } from '../models/sessions';
import type { Actor } from './actor';
import { audit } from './audit';
import { type PublishRemark, publishRemarks } from './publishRemarks';
import { refreshSearchOf } from './searchIndex';
import { presentSession } from './sessionPresent';
import { lockedSession, subject } from './sessions';

/** What is missing before members can use a session. @throws AppError `notFound` */
export async function check(actor: Actor, sessionId: string): Promise<PublishRemark[]> {
  const session = await Session.findOne({ where: { id: sessionId, teamId: actor.team.id } });
  if (!session) throw new AppError('notFound');
  return publishRemarks(actor, session);
}

/**
 * Shows a session and its recordings to members, and tells them. One that is published stays as it is, so that a double click
 * tells nobody twice.
 * @throws AppError `notFound`, `notReady` where something is missing, or `stale` with the current session
 */
export function publish(actor: Actor, sessionId: string, version: number): Promise<contract.Session> {
  return inTransaction(async () => {
    const session = await lockedSession(actor, sessionId);
    if (session.state === 'published') return presentSession(actor, session);
    await refuseStale(actor, session, version);
    const missing = (await publishRemarks(actor, session)).filter(({ severity }) => severity === 'missing');
    if (missing.length > 0) throw new AppError('notReady', { message: missing.map(({ text }) => text).join(' ') });
    await session.update({ state: 'published', publishedAt: new Date(), version: version + 1 });
    await refreshSearchOf({ sessionId });
    await tellMembers(actor, session);
    await audit(actor, 'session.published', subject(session), { date: session.date, title: session.title });
    return presentSession(actor, session);
  });
}

/** Takes a session back to a draft; one that is a draft stays as it is. @throws AppError `notFound`, `stale` */
export function unpublish(actor: Actor, sessionId: string, version: number): Promise<contract.Session> {
  return inTransaction(async () => {
    const session = await lockedSession(actor, sessionId);
    if (session.state === 'draft') return presentSession(actor, session);
    await refuseStale(actor, session, version);
    await session.update({ state: 'draft', publishedAt: null, version: version + 1 });
    await refreshSearchOf({ sessionId });
    // a notice that leads nowhere says nothing
    await Notice.destroy({
      where: { teamId: actor.team.id, kind: 'sessionPublished', subjectId: sessionId, readAt: null },
    });
    await audit(actor, 'session.unpublished', subject(session), { date: session.date, title: session.title });
    return presentSession(actor, session);
  });
}

async function refuseStale(actor: Actor, session: Session, version: number): Promise<void> {
  if (session.version !== version) throw new AppError('stale', { current: await presentSession(actor, session) });
}

/** In the transaction that publishes: one row for each member, in one statement. */
async function tellMembers(actor: Actor, session: Session): Promise<void> {
  await database().query(
    `insert into notices (team_id, person_id, kind, subject_id, text)
     select team_id, person_id, 'sessionPublished', :sessionId, :text from memberships
     where team_id = :teamId and role = 'member'`,
    {
      replacements: {
        teamId: actor.team.id,
        sessionId: session.id,
        text: `“${session.title}” for ${saidDate(session.date)} is up.`,
      },
    },
  );
}

/** A calendar date as people say it: "Tuesday 3 March". */
const saidDate = (date: string) =>
  new Intl.DateTimeFormat('en-GB', { weekday: 'long', day: 'numeric', month: 'long', timeZone: 'UTC' }).format(
    new Date(`${date}T00:00:00Z`),
  );
