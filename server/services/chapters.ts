import { QueryTypes } from 'sequelize';
import { z } from 'zod';
import type { Chapters } from '../../shared/contracts/marks';
import { Chapter } from '../../shared/domain/chapters/chapter';
import { visibleToMembers } from '../../shared/domain/chapters/chapterAt';
import { chapterFaults, sortChapters } from '../../shared/domain/chapters/chapterRules';
import { AppError, type FieldErrors } from '../../shared/errors';
import { database, inTransaction } from '../models/database';
import { KitItem, Movement } from '../models/dictionary';
import { ChapterRow } from '../models/marks';
import { Recording, RecordingAsset } from '../models/recordings';
import { type Actor, actorMay } from './actor';
import { audit } from './audit';
import { requestChapterPictures } from './chapterPictures';
import { mediaUrl } from './context';
import { contentOfVersion, type How, keepVersion, recordingOf, versionsOf } from './documents';
import { followMerges } from './mergeMovements';
import { refreshSearchOf } from './searchIndex';
import { visibleRecordingOf } from './visibleRecording';

/** The chapters of a recording in order, asides included, with their pictures. */
export async function read(actor: Actor, recordingId: string): Promise<Chapters> {
  return present(actor, await recordingOf(actor, recordingId));
}

async function present(actor: Actor, recording: Recording): Promise<Chapters> {
  const [rows, pictures] = await Promise.all([
    ChapterRow.findAll({ where: { recordingId: recording.id }, order: [['startMs', 'ASC']] }),
    RecordingAsset.findAll({ where: { recordingId: recording.id, kind: 'chapterPicture' } }),
  ]);
  const nameOf = new Map(pictures.map((picture) => [picture.chapterId, picture.name]));
  return {
    version: recording.chaptersVersion,
    items: rows.map((row) => {
      const name = nameOf.get(row.id);
      return { ...asChapter(row), pictureUrl: name ? mediaUrl(actor.team.id, recording.id, name) : null };
    }),
  };
}

export function asChapter(row: ChapterRow): Chapter {
  const {
    id,
    startMs,
    endMs,
    kind,
    title,
    note,
    blockId,
    movementId,
    standsInForMovementId,
    missing,
    missingKitItemId,
  } = row;
  return {
    id,
    startMs,
    endMs,
    kind,
    title,
    note,
    blockId,
    movementId,
    standsInForMovementId,
    missing,
    missingKitItemId,
  };
}

/**
 * Saves a recording's chapters whole.
 * @throws AppError `stale` with the current chapters, `invalid` naming the chapter at fault, `notReady` while the length is not known
 */
export function save(
  actor: Actor,
  recordingId: string,
  version: number,
  sent: Chapter[],
  how: How = 'edit',
  origin?: string,
): Promise<Chapters> {
  return inTransaction(async () => {
    const recording = await recordingOf(actor, recordingId);
    const chapters = await withMergesFollowed(actor, sent);
    if (recording.durationMs === null)
      throw new AppError('notReady', {
        message: 'The recording’s length is not known yet. Mark its chapters in a moment.',
      });
    const inOrder = sortChapters(chapters);
    await refuseFaulty(actor, recording, chapters);
    await takeVersion(actor, recording, version);
    await replaceRows(actor, recording, inOrder);
    await keepVersion(actor, {
      recordingId,
      document: 'chapters',
      version: version + 1,
      how,
      origin: origin ?? null,
      content: inOrder,
    });
    await audit(
      actor,
      `chapters.${how === 'restore' ? 'restored' : 'saved'}`,
      { type: 'recording', id: recordingId },
      { version: version + 1, count: inOrder.length },
    );
    await refreshSearchOf({ recordingId });
    await requestChapterPictures(actor.team.id, recordingId);
    await recording.reload();
    return present(actor, recording);
  });
}

export function restore(actor: Actor, recordingId: string, wanted: number, version: number): Promise<Chapters> {
  return inTransaction(async () => {
    const recording = await recordingOf(actor, recordingId);
    const kept = z.array(Chapter).parse(await contentOfVersion(actor, recordingId, 'chapters', wanted));
    // what a chapter points at may have gone since: the chapter comes back without it
    return save(actor, recordingId, version, await withoutLostLinks(actor, recording, kept), 'restore', String(wanted));
  });
}

export function versions(actor: Actor, recordingId: string) {
  return versionsOf<Chapter>(actor, recordingId, 'chapters', (chapter) => chapter.id);
}

/** The chapters for a file: members get none of the asides, and none of a draft. */
export async function forExport(actor: Actor, recordingId: string): Promise<Chapter[]> {
  const recording = await visibleRecordingOf(actor, recordingId);
  const rows = await ChapterRow.findAll({ where: { recordingId: recording.id }, order: [['startMs', 'ASC']] });
  const chapters = rows.map(asChapter);
  return actorMay(actor, 'readDrafts') ? chapters : visibleToMembers(chapters);
}

async function takeVersion(actor: Actor, recording: Recording, version: number): Promise<void> {
  const [count] = await Recording.update(
    { chaptersVersion: version + 1 },
    { where: { id: recording.id, teamId: actor.team.id, chaptersVersion: version } },
  );
  if (count === 0) {
    await recording.reload();
    throw new AppError('stale', { current: await present(actor, recording) });
  }
}

async function refuseFaulty(actor: Actor, recording: Recording, chapters: Chapter[]): Promise<void> {
  const fields: FieldErrors = {};
  const place = new Map(chapters.map((chapter, index) => [chapter.id, index]));
  for (const fault of chapterFaults(chapters, recording.durationMs))
    if (fault.severity === 'refused') fields[`items.${place.get(fault.chapterId)}`] ??= fault.message;
  const known = await knownLinks(actor, recording, chapters);
  chapters.forEach((chapter, index) => {
    for (const [field, id] of linksOf(chapter))
      if (id && !known[field].has(id))
        fields[`items.${index}.${field}`] = 'This is not in the team’s library any more. Choose another.';
  });
  if (Object.keys(fields).length > 0) throw new AppError('invalid', { fields });
}

const linksOf = (chapter: Chapter) =>
  [
    ['blockId', chapter.blockId],
    ['movementId', chapter.movementId],
    ['standsInForMovementId', chapter.standsInForMovementId],
    ['missingKitItemId', chapter.missingKitItemId],
  ] as const;

type LinkField = ReturnType<typeof linksOf>[number][0];

/** Which of the things that chapters point at are there, by field: movements and kit of the team, blocks of the recording's session. */
async function knownLinks(
  actor: Actor,
  recording: Recording,
  chapters: Chapter[],
): Promise<Record<LinkField, ReadonlySet<string>>> {
  const ids = [...new Set(chapters.flatMap((chapter) => linksOf(chapter).flatMap(([, id]) => id ?? [])))];
  const none = new Set<string>();
  if (ids.length === 0) return { blockId: none, movementId: none, standsInForMovementId: none, missingKitItemId: none };
  const teamId = actor.team.id;
  const [movements, kit, blocks] = await Promise.all([
    Movement.findAll({ where: { teamId, id: ids, mergedIntoId: null }, attributes: ['id'] }),
    KitItem.findAll({ where: { teamId, id: ids }, attributes: ['id'] }),
    database().query<{ id: string }>(
      'select id from blocks where team_id = :teamId and session_id = :sessionId and id in (:ids)',
      {
        replacements: { teamId, sessionId: recording.sessionId, ids },
        type: QueryTypes.SELECT,
      },
    ),
  ]);
  const movementIds = new Set(movements.map(({ id }) => id));
  return {
    blockId: new Set(blocks.map(({ id }) => id)),
    movementId: movementIds,
    standsInForMovementId: movementIds,
    missingKitItemId: new Set(kit.map(({ id }) => id)),
  };
}

async function withoutLostLinks(actor: Actor, recording: Recording, chapters: Chapter[]): Promise<Chapter[]> {
  const followed = await withMergesFollowed(actor, chapters);
  const known = await knownLinks(actor, recording, followed);
  const keep = (field: LinkField, id: string | null) => (id && known[field].has(id) ? id : null);
  return followed.map((chapter) => ({
    ...chapter,
    blockId: keep('blockId', chapter.blockId),
    movementId: keep('movementId', chapter.movementId),
    standsInForMovementId: keep('standsInForMovementId', chapter.standsInForMovementId),
    missingKitItemId: keep('missingKitItemId', chapter.missingKitItemId),
  }));
}

/** A page that was open while a duplicate was merged still names it, and so does an earlier version. */
async function withMergesFollowed(actor: Actor, chapters: Chapter[]): Promise<Chapter[]> {
  const became = await followMerges(
    actor.team.id,
    chapters.flatMap(({ movementId, standsInForMovementId }) => [movementId, standsInForMovementId]),
  );
  return chapters.map((chapter) => ({
    ...chapter,
    movementId: became(chapter.movementId),
    standsInForMovementId: became(chapter.standsInForMovementId),
  }));
}

/** Chapters that stay keep their rows, so that pictures and search documents do too. */
async function replaceRows(actor: Actor, recording: Recording, chapters: Chapter[]): Promise<void> {
  const teamId = actor.team.id;
  const ids = chapters.map(({ id }) => id);
  // an id is the client's own choice: one that belongs to another recording is refused, never overwritten
  const elsewhere = await database().query<{ id: string }>(
    'select id from chapters where id in (:ids) and recording_id <> :recordingId',
    {
      replacements: { ids: ids.length > 0 ? ids : [recording.id], recordingId: recording.id },
      type: QueryTypes.SELECT,
    },
  );
  if (elsewhere.length > 0) {
    const index = ids.indexOf((elsewhere[0] as { id: string }).id);
    throw new AppError('invalid', { fields: { [`items.${index}.id`]: 'This id is taken. Make a new chapter.' } });
  }
  await database().query(
    'delete from chapters where team_id = :teamId and recording_id = :recordingId and not (id = any(array[:ids]::uuid[]))',
    {
      replacements: { teamId, recordingId: recording.id, ids: ids.length > 0 ? ids : [recording.id] },
    },
  );
  if (chapters.length === 0) return;
  await ChapterRow.bulkCreate(
    chapters.map((chapter) => ({ ...chapter, teamId, recordingId: recording.id })),
    {
      // another team's row with the same id is never written over, whatever was checked before
      conflictAttributes: ['teamId', 'id'],
      updateOnDuplicate: [
        'startMs',
        'endMs',
        'kind',
        'title',
        'note',
        'blockId',
        'movementId',
        'standsInForMovementId',
        'missing',
        'missingKitItemId',
      ],
    },
  );
}
