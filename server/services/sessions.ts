import { isDeepStrictEqual } from 'node:util';
import { literal, Op, QueryTypes } from 'sequelize';
import { z } from 'zod';
import type * as contract from '../../shared/contracts/sessions';
import { CalendarDate, Id } from '../../shared/domain/values';
import { AppError } from '../../shared/errors';
import { currentTransaction, database, inTransaction } from '../models/database';
import { Recording } from '../models/recordings';
import { Session } from '../models/sessions';
import { type Actor, actorMay } from './actor';
import { audit } from './audit';
import { pageOf, readCursor } from './pages';
import { savePlan } from './savePlan';
import { refreshSearchOf } from './searchIndex';
import { plansOf } from './sessionPlan';
import { presentSession, presentSessionList } from './sessionPresent';

type ListQuery = { from?: string | undefined; to?: string | undefined; cursor?: string | undefined; limit: number };

/** Sessions, newest date first; members see published ones. */
export async function list(actor: Actor, { from, to, cursor, limit }: ListQuery) {
  const after = readSessionCursor(cursor);
  const rows = await Session.findAll({
    where: {
      teamId: actor.team.id,
      ...visibleState(actor),
      ...(from || to ? { date: { ...(from ? { [Op.gte]: from } : {}), ...(to ? { [Op.lte]: to } : {}) } } : {}),
      ...(after
        ? { [Op.and]: literal(`(date, id) < (${database().escape(after.date)}, ${database().escape(after.id)})`) }
        : {}),
    },
    order: [
      ['date', 'DESC'],
      ['id', 'DESC'],
    ],
    limit: limit + 1,
  });
  const page = pageOf(rows, limit, (row) => [row.date, row.id]);
  return { items: await presentSessionList(actor, page.items), nextCursor: page.nextCursor };
}

const SessionCursor = z.object({ date: CalendarDate, id: Id });

/** @throws AppError `invalid` */
function readSessionCursor(cursor: string | undefined) {
  const parts = readCursor(cursor, 2);
  if (!parts) return undefined;
  const read = SessionCursor.safeParse({ date: parts[0], id: parts[1] });
  if (!read.success)
    throw new AppError('invalid', { fields: { cursor: 'This list changed. Start at its beginning.' } });
  return read.data;
}

const visibleState = (actor: Actor) => (actorMay(actor, 'readDrafts') ? {} : ({ state: 'published' } as const));

/** @throws AppError `notFound`, for members of drafts too */
export async function read(actor: Actor, sessionId: string): Promise<contract.Session> {
  const session = await Session.findOne({ where: { id: sessionId, teamId: actor.team.id, ...visibleState(actor) } });
  if (!session) throw new AppError('notFound');
  return presentSession(actor, session);
}

/**
 * Plans a session under the client's own id; the same id again answers with the session that is there.
 * @throws AppError `invalid`
 */
export function create(actor: Actor, { id, ...plan }: contract.PlanFields & { id: string }): Promise<contract.Session> {
  return inTransaction(async () => {
    const isNew = await insert(actor, id, plan);
    const session = await Session.findOne({ where: { id, teamId: actor.team.id } });
    if (!session) throw new AppError('invalid', { fields: { id: 'This id is taken. Plan the session anew.' } });
    if (!isNew) return presentSession(actor, session);
    await savePlan(actor, session.id, plan.blocks);
    await audit(actor, 'session.created', subject(session), {
      date: plan.date,
      title: plan.title,
      blocks: plan.blocks.length,
    });
    return presentSession(actor, session);
  });
}

/** Of two inserts at once the second waits for the first and then does nothing. */
async function insert(actor: Actor, id: string, plan: contract.PlanFields): Promise<boolean> {
  const rows = await database().query<{ id: string }>(
    `insert into sessions (team_id, id, date, title, note, aim, coach_id)
     values (:teamId, :id, :date, :title, :note, :aim, :coachId) on conflict (id) do nothing returning id`,
    {
      replacements: {
        teamId: actor.team.id,
        id,
        date: plan.date,
        title: plan.title,
        note: plan.note,
        aim: plan.aim,
        coachId: actor.person.id,
      },
      type: QueryTypes.SELECT,
    },
  );
  return rows.length > 0;
}

/**
 * Saves a plan whole; blocks and lines that stay keep their ids, so that chapters keep pointing at them.
 * @throws AppError `notFound`, `invalid`, or `stale` with the current session
 */
export function save(
  actor: Actor,
  sessionId: string,
  { version, ...plan }: contract.PlanFields & { version: number },
): Promise<contract.Session> {
  return inTransaction(async () => {
    const session = await lockedSession(actor, sessionId);
    if (session.version !== version) throw new AppError('stale', { current: await presentSession(actor, session) });
    const before = {
      date: session.date,
      title: session.title,
      note: session.note,
      aim: session.aim,
      blocks: (await plansOf(actor.team.id, [session.id])).get(session.id) ?? [],
    };
    const { date, title, note, aim } = plan;
    await session.update({ date, title, note, aim, version: version + 1 });
    const blocks = await savePlan(actor, session.id, plan.blocks);
    const after: contract.PlanFields = { date, title, note, aim, blocks };
    const changed = planFields.filter((field) => !isDeepStrictEqual(before[field], after[field]));
    await audit(actor, 'session.saved', subject(session), {
      version: session.version,
      changed,
      ...(before.date === date ? {} : { dateBefore: before.date, date }),
    });
    if (changed.includes('date') || changed.includes('title')) await refreshSearchOf({ sessionId });
    return presentSession(actor, session);
  });
}

const planFields = ['date', 'title', 'note', 'aim', 'blocks'] as const satisfies (keyof contract.PlanFields)[];

/** Removes a draft; its recordings stay. @throws AppError `notFound`, `inUse` while it is published */
export function remove(actor: Actor, sessionId: string): Promise<void> {
  return inTransaction(async () => {
    const session = await lockedSession(actor, sessionId);
    if (session.state === 'published')
      throw new AppError('inUse', { message: 'Members see this session. Take it back to a draft first.' });
    const recordings = await Recording.findAll({
      where: { teamId: actor.team.id, sessionId },
      attributes: ['id'],
    });
    await session.destroy();
    await audit(actor, 'session.removed', subject(session), { date: session.date, title: session.title });
    for (const { id } of recordings) await refreshSearchOf({ recordingId: id });
  });
}

/** A session to change, held until the transaction ends. @throws AppError `notFound` */
export async function lockedSession(actor: Actor, sessionId: string): Promise<Session> {
  const transaction = currentTransaction();
  const session = await Session.findOne({
    where: { id: sessionId, teamId: actor.team.id },
    ...(transaction ? { lock: transaction.LOCK.UPDATE } : {}),
  });
  if (!session) throw new AppError('notFound');
  return session;
}

export const subject = (session: Session) => ({ type: 'session', id: session.id });
