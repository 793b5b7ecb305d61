import { inTransaction } from '../models/database';
import { Notice } from '../models/people';
import { type Actor, requireMay } from './actor';
import { newestFirst, type PageAsked } from './newestFirst';

/** What happened for the person who asks, newest first, and how much of it they have not read. */
export async function listNotices(actor: Actor, asked: PageAsked) {
  requireMay(actor, 'keepOwn');
  const own = { teamId: actor.team.id, personId: actor.person.id };
  const [page, unread] = await Promise.all([
    newestFirst(Notice, own, asked),
    Notice.count({ where: { ...own, readAt: null } }),
  ]);
  return { ...page, unread };
}

export async function readNotices(actor: Actor): Promise<void> {
  requireMay(actor, 'keepOwn');
  await inTransaction(() =>
    Notice.update(
      { readAt: new Date() },
      { where: { teamId: actor.team.id, personId: actor.person.id, readAt: null } },
    ),
  );
}
