import { Op } from 'sequelize';
import type { Watch } from '../../shared/contracts/watch';
import { AppError } from '../../shared/errors';
import { mediaExpiry } from '../../storage/signing';
import { Movement } from '../models/dictionary';
import { CaptionLineRow, CaptionTrack, ChapterRow, CueRow } from '../models/marks';
import { Person } from '../models/people';
import { Recording, RecordingAsset, WatchPlace } from '../models/recordings';
import { Session } from '../models/sessions';
import { type Actor, actorMay } from './actor';
import { mediaUrl } from './context';
import { chapterPictureUrls, missingTextOf, withoutTextsOf } from './moments';
import { visibleRecordingOf } from './visibleRecording';

/**
 * All that the player needs. Members get neither asides nor what is said or pinned in them, only the times to skip.
 * @throws AppError `notFound` where the actor may not see the recording, `notReady` while it does not play
 */
export async function getWatch(actor: Actor, recordingId: string): Promise<Watch> {
  const recording = await visibleRecordingOf(actor, recordingId);
  const teamId = actor.team.id;
  const of = { teamId, recordingId };
  const [playback, poster, chapters, captions, cues, session, coach, takes, place] = await Promise.all([
    RecordingAsset.findOne({ where: { ...of, kind: 'playback' } }),
    RecordingAsset.findOne({ where: { ...of, kind: 'poster' } }),
    ChapterRow.findAll({ where: of, order: [['startMs', 'asc']] }),
    captionLinesOf(teamId, recordingId),
    CueRow.findAll({
      where: of,
      order: [
        ['atMs', 'asc'],
        ['id', 'asc'],
      ],
    }),
    recording.sessionId ? Session.findOne({ where: { teamId, id: recording.sessionId } }) : null,
    recording.coachId ? Person.findByPk(recording.coachId, { attributes: ['name'] }) : null,
    otherTakes(recording),
    WatchPlace.findOne({ where: { ...of, personId: actor.person.id } }),
  ]);
  const { durationMs, width, height, fps } = recording;
  if (!playback || durationMs === null || width === null || height === null)
    throw new AppError('notReady', { message: 'This recording does not play yet.' });

  const skips = actorMay(actor, 'readDrafts') ? [] : chapters.filter((chapter) => chapter.kind === 'aside');
  const isShown = (atMs: number) => !skips.some((skip) => atMs >= skip.startMs && atMs < skip.endMs);
  const shownChapters = chapters.filter((chapter) => !skips.includes(chapter));
  const shownCues = cues.filter((cue) => isShown(cue.atMs));
  // read before the addresses are made: they work at least so long
  const addressesEndAt = new Date(mediaExpiry()).toISOString();
  return {
    recordingId,
    title: recording.title,
    take: recording.take,
    durationMs,
    fps: fps ?? 30,
    width,
    height,
    session: session
      ? { id: session.id, date: session.date, title: session.title, published: session.state === 'published' }
      : null,
    coach: coach?.name ?? null,
    playback: { url: mediaUrl(teamId, recordingId, playback.name), type: playback.contentType },
    posterUrl: poster ? mediaUrl(teamId, recordingId, poster.name) : null,
    addressesEndAt,
    chapters: await presentChapters(teamId, shownChapters),
    skips: skips.map(({ startMs, endMs }) => ({ startMs, endMs })),
    captions: captions.filter((line) => isShown((line.startMs + line.endMs) / 2)),
    cues: shownCues.map(({ id, atMs, kind, text, movementId }) => ({ id, atMs, kind, text, movementId })),
    movements: await movementsOf(teamId, [
      ...shownChapters.flatMap((chapter) => [chapter.movementId, chapter.standsInForMovementId]),
      ...shownCues.map((cue) => cue.movementId),
    ]),
    takes,
    placeMs: place?.atMs ?? null,
  };
}

/** Keeps where somebody stopped. @throws AppError `notFound` where they may not see the recording */
export async function keepPlace(actor: Actor, recordingId: string, atMs: number): Promise<void> {
  const recording = await visibleRecordingOf(actor, recordingId);
  await WatchPlace.upsert({
    teamId: actor.team.id,
    personId: actor.person.id,
    recordingId,
    atMs: Math.min(atMs, recording.durationMs ?? atMs),
    updatedAt: new Date(),
  });
}

async function presentChapters(teamId: string, chapters: readonly ChapterRow[]): Promise<Watch['chapters']> {
  const [pictures, withoutTexts] = await Promise.all([
    chapterPictureUrls(
      teamId,
      chapters.map((chapter) => chapter.id),
    ),
    withoutTextsOf(
      teamId,
      chapters.map((chapter) => chapter.missingKitItemId),
    ),
  ]);
  return chapters.map((chapter) => ({
    id: chapter.id,
    startMs: chapter.startMs,
    endMs: chapter.endMs,
    kind: chapter.kind,
    title: chapter.title,
    note: chapter.note,
    blockId: chapter.blockId,
    movementId: chapter.movementId,
    standsInForMovementId: chapter.standsInForMovementId,
    missing: chapter.missing,
    missingKitItemId: chapter.missingKitItemId,
    pictureUrl: pictures.get(chapter.id) ?? null,
    missingText: missingTextOf(chapter, withoutTexts),
  }));
}

async function captionLinesOf(teamId: string, recordingId: string): Promise<Watch['captions']> {
  const track = await CaptionTrack.findOne({ where: { teamId, recordingId }, order: [['language', 'asc']] });
  if (!track) return [];
  const lines = await CaptionLineRow.findAll({ where: { teamId, trackId: track.id }, order: [['position', 'asc']] });
  return lines.map(({ startMs, endMs, text }) => ({ startMs, endMs, text }));
}

async function otherTakes(recording: Recording): Promise<Watch['takes']> {
  const { teamId, sessionId } = recording;
  if (sessionId === null) return [];
  const others = await Recording.findAll({
    where: { teamId, sessionId, state: 'ready', id: { [Op.ne]: recording.id } },
    order: [
      ['take', 'asc'],
      ['createdAt', 'asc'],
    ],
  });
  return others.map(({ id, title, take }) => ({ recordingId: id, title, take }));
}

async function movementsOf(teamId: string, ids: readonly (string | null)[]): Promise<Watch['movements']> {
  const wanted = [...new Set(ids.filter((id) => id !== null))];
  const movements = await Movement.findAll({ where: { teamId, id: wanted }, order: [['name', 'asc']] });
  return movements.map(({ id, name, points, faults, cautions }) => ({ id, name, points, faults, cautions }));
}
