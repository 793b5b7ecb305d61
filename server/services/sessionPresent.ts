import { Op, QueryTypes } from 'sequelize';
import type { z } from 'zod';
import type * as contract from '../../shared/contracts/sessions';
import type { BlockKind } from '../../shared/domain/words';
import { database } from '../models/database';
import { Movement } from '../models/dictionary';
import { ChapterRow } from '../models/marks';
import { Person } from '../models/people';
import { Recording, RecordingAsset } from '../models/recordings';
import type { Session } from '../models/sessions';
import { type Actor, actorMay } from './actor';
import { mediaUrl } from './context';
import { demoKinds } from './demos';
import { visibleChaptersWhere } from './moments';
import { groupBy, movementsOf, plansOf } from './sessionPlan';

type RecordingOfSession = z.infer<typeof contract.RecordingOfSession>;

/** A session as its page shows it. */
export async function presentSession(actor: Actor, session: Session): Promise<contract.Session> {
  const blocks = (await plansOf(actor.team.id, [session.id])).get(session.id) ?? [];
  const [movements, coaches, recordings] = await Promise.all([
    Movement.findAll({
      where: { teamId: actor.team.id, id: movementsOf(blocks) },
      attributes: ['id', 'name'],
      order: [['name', 'ASC']],
    }),
    namesOfPeople([session.coachId]),
    recordingsOf(actor, [session.id], actorMay(actor, 'readDrafts') ? 'all' : 'ready'),
  ]);
  const coach = session.coachId === null ? undefined : coaches.get(session.coachId);
  return {
    id: session.id,
    date: session.date,
    title: session.title,
    note: session.note,
    aim: session.aim,
    blocks,
    coach: session.coachId !== null && coach !== undefined ? { id: session.coachId, name: coach } : null,
    state: session.state,
    publishedAt: session.publishedAt?.toISOString() ?? null,
    version: session.version,
    movements: movements.map(({ id, name }) => ({ id, name })),
    recordings: recordings.get(session.id) ?? [],
  };
}

/** Names of people by id. */
export async function namesOfPeople(ids: readonly (string | null)[]): Promise<Map<string, string>> {
  const wanted = [...new Set(ids.filter((id) => id !== null))];
  if (wanted.length === 0) return new Map();
  const people = await Person.findAll({ where: { id: wanted }, attributes: ['id', 'name'] });
  return new Map(people.map(({ id, name }) => [id, name]));
}

/**
 * The recordings of sessions in order of takes, by session. Asides are counted only for those who see them.
 * @param which members, and whoever looks at what members see, get those that play
 */
export async function recordingsOf(
  actor: Actor,
  sessionIds: readonly string[],
  which: 'all' | 'ready',
): Promise<Map<string, RecordingOfSession[]>> {
  if (sessionIds.length === 0) return new Map();
  const teamId = actor.team.id;
  const recordings = await Recording.findAll({
    where: { teamId, sessionId: [...sessionIds], ...(which === 'ready' ? { state: 'ready' } : {}) },
    order: [
      ['take', 'ASC'],
      ['createdAt', 'ASC'],
      ['id', 'ASC'],
    ],
  });
  const ids = recordings.map(({ id }) => id);
  if (ids.length === 0) return new Map();
  const [posters, counts] = await Promise.all([
    RecordingAsset.findAll({
      where: { teamId, recordingId: ids, kind: 'poster' },
      attributes: ['recordingId', 'name'],
      order: [['createdAt', 'ASC']],
    }),
    ChapterRow.count({
      where: { teamId, recordingId: ids, ...(which === 'ready' ? { kind: { [Op.ne]: 'aside' } } : {}) },
      group: ['recordingId'],
    }),
  ]);
  const posterOf = new Map(posters.map(({ recordingId, name }) => [recordingId, mediaUrl(teamId, recordingId, name)]));
  const chaptersOf = new Map(counts.map((row) => [String(row.recordingId ?? row.recording_id), Number(row.count)]));
  const groups = groupBy(recordings, ({ sessionId }) => sessionId ?? '');
  return new Map(
    Array.from(groups, ([sessionId, rows]) => [
      sessionId,
      rows.map(({ id, title, take, state, durationMs }) => ({
        id,
        title,
        take,
        state,
        durationMs,
        posterUrl: posterOf.get(id) ?? null,
        chapterCount: chaptersOf.get(id) ?? 0,
      })),
    ]),
  );
}

/** Sessions as a list shows them; a query a table, however many there are. */
export async function presentSessionList(actor: Actor, sessions: Session[]): Promise<contract.SessionInList[]> {
  if (sessions.length === 0) return [];
  const teamId = actor.team.id;
  const ids = sessions.map(({ id }) => id);
  const [coaches, blocks, planned, recordings] = await Promise.all([
    namesOfPeople(sessions.map(({ coachId }) => coachId)),
    database().query<{ session_id: string; kind: BlockKind }>(
      'select session_id, kind from blocks where team_id = :teamId and session_id in (:ids) order by position',
      { replacements: { teamId, ids }, type: QueryTypes.SELECT },
    ),
    database().query<{ session_id: string; movement_id: string }>(
      `select distinct b.session_id, l.movement_id from blocks b join block_lines l on l.block_id = b.id
       where b.team_id = :teamId and b.session_id in (:ids)`,
      { replacements: { teamId, ids }, type: QueryTypes.SELECT },
    ),
    Recording.count({
      where: { teamId, sessionId: ids, ...(actorMay(actor, 'readDrafts') ? {} : { state: 'ready' }) },
      group: ['sessionId'],
    }),
  ]);
  const shown = await shownMovements(
    actor,
    planned.map(({ movement_id }) => movement_id),
  );
  const blocksOf = groupBy(blocks, ({ session_id }) => session_id);
  const plannedIn = groupBy(planned, ({ session_id }) => session_id);
  const recordingsIn = new Map(recordings.map((row) => [String(row.sessionId ?? row.session_id), Number(row.count)]));
  return sessions.map((session) => {
    const movements = plannedIn.get(session.id) ?? [];
    return {
      id: session.id,
      date: session.date,
      title: session.title,
      state: session.state,
      coach: session.coachId === null ? null : (coaches.get(session.coachId) ?? null),
      blockKinds: (blocksOf.get(session.id) ?? []).map(({ kind }) => kind),
      recordingCount: recordingsIn.get(session.id) ?? 0,
      movementCount: movements.length,
      shownCount: movements.filter(({ movement_id }) => shown.has(movement_id)).length,
      version: session.version,
    };
  });
}

/** Which of these movements the library shows in a demo that the actor may see. */
async function shownMovements(actor: Actor, movementIds: readonly string[]): Promise<Set<string>> {
  const ids = [...new Set(movementIds)];
  if (ids.length === 0) return new Set();
  const rows = await ChapterRow.findAll({
    where: { [Op.and]: [visibleChaptersWhere(actor), { movementId: ids, kind: [...demoKinds] }] },
    attributes: ['movementId'],
    group: ['movementId'],
  });
  return new Set(rows.flatMap(({ movementId }) => movementId ?? []));
}
