import { literal, Op, type WhereOptions } from 'sequelize';
import type { Moment } from '../../shared/contracts/moments';
import { database } from '../models/database';
import { KitItem, Movement } from '../models/dictionary';
import type { ChapterRow } from '../models/marks';
import { Person } from '../models/people';
import { Recording, RecordingAsset } from '../models/recordings';
import { Session } from '../models/sessions';
import { type Actor, actorMay } from './actor';
import { mediaUrl } from './context';

/**
 * Which chapters somebody may see, as a condition on `ChapterRow`: those who work on drafts all of the team's, members
 * the ones of ready recordings of published sessions, asides never.
 */
export function visibleChaptersWhere(actor: Actor): WhereOptions<ChapterRow> {
  const teamId = actor.team.id;
  if (actorMay(actor, 'readDrafts')) return { teamId };
  const published = `(select r.id from recordings r join sessions s on s.team_id = r.team_id and s.id = r.session_id
    where r.team_id = ${database().escape(teamId)} and r.state = 'ready' and s.state = 'published')`;
  return { teamId, kind: { [Op.ne]: 'aside' }, recordingId: { [Op.in]: literal(published) } };
}

/** The part of a chapter that a moment is made from. */
export type MomentSource = Pick<
  ChapterRow,
  | 'id'
  | 'recordingId'
  | 'startMs'
  | 'endMs'
  | 'kind'
  | 'title'
  | 'movementId'
  | 'standsInForMovementId'
  | 'missing'
  | 'missingKitItemId'
>;

/**
 * Chapters as moments, in the order given; a query a table, however many there are, one after the other: it may be
 * called in a transaction, which is one connection.
 * Whoever calls has asked for visible chapters alone (`visibleChaptersWhere`).
 */
export async function presentMoments(actor: Actor, chapters: readonly MomentSource[]): Promise<Moment[]> {
  if (chapters.length === 0) return [];
  const teamId = actor.team.id;
  const recordings = await recordingsOf(teamId, chapters);
  const movementIds = chapters.flatMap((chapter) => [chapter.movementId, chapter.standsInForMovementId]);
  const movements = await namesOfMovements(teamId, movementIds);
  const kitItemIds = chapters.map((chapter) => chapter.missingKitItemId);
  const withoutTexts = await withoutTextsOf(teamId, kitItemIds);
  const chapterIds = chapters.map((chapter) => chapter.id);
  const pictures = await chapterPictureUrls(teamId, chapterIds);
  const movement = (id: string | null) => {
    const name = id === null ? undefined : movements.get(id);
    return id === null || name === undefined ? null : { id, name };
  };
  return chapters.map((chapter) => ({
    recordingId: chapter.recordingId,
    chapterId: chapter.id,
    startMs: chapter.startMs,
    endMs: chapter.endMs,
    kind: chapter.kind,
    title: chapter.title,
    movement: movement(chapter.movementId),
    standsInFor: movement(chapter.standsInForMovementId),
    missing: chapter.missing,
    missingText: missingTextOf(chapter, withoutTexts),
    session: recordings.get(chapter.recordingId)?.session ?? null,
    coach: recordings.get(chapter.recordingId)?.coach ?? null,
    pictureUrl: pictures.get(chapter.id) ?? null,
  }));
}

/** What a substitution does without, in words: "nothing to hang from". */
export function missingTextOf(
  chapter: Pick<MomentSource, 'missing' | 'missingKitItemId'>,
  withoutTexts: ReadonlyMap<string, string>,
): string | null {
  if (chapter.missing === 'space') return 'little room';
  if (chapter.missing === 'ability') return 'an easier way';
  return chapter.missingKitItemId === null ? null : (withoutTexts.get(chapter.missingKitItemId) ?? null);
}

/** How the absence of each kit item is said. */
export async function withoutTextsOf(teamId: string, ids: readonly (string | null)[]): Promise<Map<string, string>> {
  const wanted = distinct(ids);
  if (wanted.length === 0) return new Map();
  const items = await KitItem.findAll({ where: { teamId, id: wanted }, attributes: ['id', 'withoutText'] });
  return new Map(items.map((item) => [item.id, item.withoutText]));
}

/** Signed addresses of the pictures that chapters have, by chapter; where a chapter moved, its last picture until the new one is there. */
export async function chapterPictureUrls(teamId: string, chapterIds: readonly string[]): Promise<Map<string, string>> {
  if (chapterIds.length === 0) return new Map();
  const pictures = await RecordingAsset.findAll({
    where: { teamId, kind: 'chapterPicture', chapterId: [...chapterIds] },
    attributes: ['chapterId', 'recordingId', 'name'],
    order: [['createdAt', 'asc']],
  });
  return new Map(
    pictures.flatMap((picture) =>
      picture.chapterId === null
        ? []
        : [[picture.chapterId, mediaUrl(teamId, picture.recordingId, picture.name)] as const],
    ),
  );
}

async function namesOfMovements(teamId: string, ids: readonly (string | null)[]): Promise<Map<string, string>> {
  const wanted = distinct(ids);
  if (wanted.length === 0) return new Map();
  const movements = await Movement.findAll({ where: { teamId, id: wanted }, attributes: ['id', 'name'] });
  return new Map(movements.map((movement) => [movement.id, movement.name]));
}

type Origin = Pick<Moment, 'session' | 'coach'>;

async function recordingsOf(teamId: string, chapters: readonly MomentSource[]): Promise<Map<string, Origin>> {
  const recordings = await Recording.findAll({
    where: { teamId, id: distinct(chapters.map((chapter) => chapter.recordingId)) },
    attributes: ['id', 'sessionId', 'coachId'],
  });
  const sessionIds = distinct(recordings.map((recording) => recording.sessionId));
  const coachIds = distinct(recordings.map((recording) => recording.coachId));
  const sessions = await Session.findAll({ where: { teamId, id: sessionIds }, attributes: ['id', 'date', 'title'] });
  const coaches = await Person.findAll({ where: { id: coachIds }, attributes: ['id', 'name'] });
  const session = new Map(sessions.map(({ id, date, title }) => [id, { id, date, title }]));
  const coach = new Map(coaches.map(({ id, name }) => [id, name]));
  return new Map(
    recordings.map(({ id, sessionId, coachId }) => [
      id,
      { session: session.get(sessionId ?? '') ?? null, coach: coach.get(coachId ?? '') ?? null },
    ]),
  );
}

const distinct = (ids: readonly (string | null)[]) => [...new Set(ids.filter((id) => id !== null))];
