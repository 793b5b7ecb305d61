import { literal } from 'sequelize';
import type { Recording as RecordingAnswer } from '../../shared/contracts/recordings';
import { makingSteps } from '../../shared/domain/words';
import { ChapterRow } from '../models/marks';
import { Person } from '../models/people';
import { type Recording, RecordingAsset, RecordingStep } from '../models/recordings';
import { Session } from '../models/sessions';
import { countCaptionLines } from './captionCounts';
import { mediaUrl } from './context';

/**
 * Recordings as those who work on drafts see them, in the order given; a query a table, however many there are, one after
 * the other: it may be called in a transaction, which is one connection.
 */
export async function presentRecordings(teamId: string, recordings: readonly Recording[]): Promise<RecordingAnswer[]> {
  if (recordings.length === 0) return [];
  const ids = recordings.map((recording) => recording.id);
  const sessionIds = distinct(recordings.map((recording) => recording.sessionId));
  const sessions = await Session.findAll({ where: { teamId, id: sessionIds } });
  const coachIds = distinct(recordings.map((recording) => recording.coachId));
  const coaches = await Person.findAll({ where: { id: coachIds }, attributes: ['id', 'name'] });
  const steps = await RecordingStep.findAll({ where: { teamId, recordingId: ids } });
  const posters = await posterUrls(teamId, ids);
  const chapters = await chapterCounts(teamId, ids);
  const lines = await countCaptionLines(teamId, ids);
  const sessionById = new Map(sessions.map((session) => [session.id, session]));
  const coachById = new Map(coaches.map((coach) => [coach.id, coach]));
  return recordings.map((recording) => {
    const session = sessionById.get(recording.sessionId ?? '');
    const coach = coachById.get(recording.coachId ?? '');
    return {
      id: recording.id,
      title: recording.title,
      take: recording.take,
      session: session ? { id: session.id, date: session.date, title: session.title, state: session.state } : null,
      coach: coach ? { id: coach.id, name: coach.name } : null,
      fileName: recording.fileName,
      sizeBytes: recording.sizeBytes,
      state: recording.state,
      steps: steps
        .filter((step) => step.recordingId === recording.id)
        .map(({ step, state, percent }) => ({ step, state, percent }))
        .toSorted((a, b) => makingSteps.indexOf(a.step) - makingSteps.indexOf(b.step)),
      failure: recording.failure
        ? { code: recording.failure.code, message: recording.failure.message, retry: recording.failure.retry }
        : null,
      durationMs: recording.durationMs,
      width: recording.width,
      height: recording.height,
      fps: recording.fps,
      posterUrl: posters.get(recording.id) ?? null,
      chapterCount: chapters.get(recording.id) ?? 0,
      captionLineCount: lines.get(recording.id) ?? 0,
      createdAt: recording.createdAt.toISOString(),
      version: recording.version,
    };
  });
}

export async function presentRecording(teamId: string, recording: Recording): Promise<RecordingAnswer> {
  const [answer] = await presentRecordings(teamId, [recording]);
  if (!answer) throw new Error('One recording gives one answer.');
  return answer;
}

/** Signed addresses of posters, by recording. Ask first whether the recordings may be seen. */
export async function posterUrls(teamId: string, recordingIds: readonly string[]): Promise<Map<string, string>> {
  const posters = await RecordingAsset.findAll({
    where: { teamId, recordingId: [...recordingIds], kind: 'poster' },
    attributes: ['recordingId', 'name'],
  });
  return new Map(posters.map(({ recordingId, name }) => [recordingId, mediaUrl(teamId, recordingId, name)]));
}

/** How many chapters recordings have, asides included. */
export async function chapterCounts(teamId: string, recordingIds: readonly string[]): Promise<Map<string, number>> {
  const rows = await ChapterRow.findAll({
    where: { teamId, recordingId: [...recordingIds] },
    attributes: ['recordingId', [literal('count(*)::int'), 'count']],
    group: ['recordingId'],
  });
  return new Map(rows.map((row) => [row.recordingId, Number(row.get('count'))]));
}

const distinct = (ids: readonly (string | null)[]) => [...new Set(ids.filter((id) => id !== null))];
