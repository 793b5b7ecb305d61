import { Op, Sequelize, type WhereOptions } from 'sequelize';
import { z } from 'zod';
import { Id } from '../../shared/domain/values';
import { AppError } from '../../shared/errors';
import { madePrefix, originalsPrefix } from '../../storage/keys';
import { enqueue, makePoster, removeObjects } from '../jobs/definitions';
import { database, inTransaction } from '../models/database';
import { ChapterRow } from '../models/marks';
import { Recording, RecordingStep, Upload } from '../models/recordings';
import type { Actor } from './actor';
import { audit } from './audit';
import { requestChapterPictures } from './chapterPictures';
import { store } from './context';
import { recordingOf } from './documents';
import { tell } from './live';
import { InstantInCursor, pageOf, readCursor } from './pages';
import { startMaking } from './recordingMaking';
import { presentRecording } from './recordingPresent';
import { sessionOf } from './recordingSession';
import { waitForStep } from './recordingSteps';
import { refreshSearchOf } from './searchIndex';
import { saveIfCurrent } from './versions';

/** Newest first. */
export async function listRecordings(
  actor: Actor,
  query: { cursor?: string | undefined; limit: number; sessionId?: string | undefined },
): Promise<{ items: Recording[]; nextCursor: string | null }> {
  const after = readPlace(query.cursor);
  const recordings = await Recording.findAll({
    where: {
      teamId: actor.team.id,
      ...(query.sessionId === undefined ? {} : { sessionId: query.sessionId }),
      ...(after ? olderThan(...after) : {}),
    },
    // the instant as PostgreSQL has it: JavaScript's lacks the microseconds
    attributes: { include: [[Sequelize.literal(`"created_at"::text`), 'createdAtText']] },
    order: [
      ['createdAt', 'desc'],
      ['id', 'desc'],
    ],
    limit: query.limit + 1,
  });
  return pageOf(recordings, query.limit, (recording) => [String(recording.get('createdAtText')), recording.id]);
}

const Place = z.tuple([InstantInCursor, Id]);

/** @throws AppError `invalid` for a cursor that holds no instant and no id */
function readPlace(cursor: string | undefined): [string, string] | undefined {
  const parts = readCursor(cursor, 2);
  if (!parts) return undefined;
  const place = Place.safeParse(parts);
  if (!place.success)
    throw new AppError('invalid', { fields: { cursor: 'This list changed. Start at its beginning.' } });
  return place.data;
}

const olderThan = (createdAt: string, id: string): WhereOptions<Recording> => ({
  [Op.and]: Sequelize.literal(`(created_at, id) < (${escaped(createdAt)}::timestamptz, ${escaped(id)}::uuid)`),
});

const escaped = (text: string) => database().escape(text);

/** @throws AppError `notFound` */
export function getRecording(actor: Actor, recordingId: string): Promise<Recording> {
  return recordingOf(actor, recordingId);
}

export type RecordingChange = {
  title?: string | undefined;
  take?: number | undefined;
  sessionId?: string | null | undefined;
  version: number;
};

/**
 * Changes title, take or session. In another session its chapters show none of the old one's blocks.
 * @throws AppError `notFound`, `stale` with the current recording, `invalid`
 */
export async function updateRecording(
  actor: Actor,
  recordingId: string,
  { version, ...change }: RecordingChange,
): Promise<Recording> {
  return inTransaction(async () => {
    const recording = await recordingOf(actor, recordingId);
    const before = { title: recording.title, take: recording.take, sessionId: recording.sessionId };
    if (change.sessionId) await sessionOf(actor.team.id, change.sessionId);
    const values = Object.fromEntries(Object.entries(change).filter(([, value]) => value !== undefined));
    await saveIfCurrent(recording, version, values, async () =>
      presentRecording(actor.team.id, await recordingOf(actor, recordingId)),
    );
    if (recording.sessionId !== before.sessionId) {
      await ChapterRow.update({ blockId: null }, { where: { teamId: actor.team.id, recordingId } });
      await refreshSearchOf({ recordingId });
    }
    await audit(actor, 'recording.changed', { type: 'recording', id: recordingId }, { from: before, to: values });
    await tell(actor.team.id, { type: 'recording', recordingId, state: recording.state });
    return recording;
  });
}

/**
 * Tries again what broke: the whole way for a recording that does not play, else the pictures that are missing.
 * @throws AppError `notFound`, `notReady` where nothing broke or another try cannot help
 */
export async function retryMaking(actor: Actor, recordingId: string): Promise<Recording> {
  return inTransaction(async () => {
    const recording = await recordingOf(actor, recordingId);
    const { teamId, originalKey } = recording;
    if (recording.state === 'failed') {
      if (!recording.failure?.retry || originalKey === null)
        throw new AppError('notReady', { message: 'Another try cannot help here. Upload the file again.' });
      await startMaking(recording, originalKey);
    } else await retryPictures({ teamId, recordingId });
    await audit(actor, 'recording.retried', { type: 'recording', id: recordingId });
    return recording;
  });
}

async function retryPictures(of: { teamId: string; recordingId: string }): Promise<void> {
  const failed = await RecordingStep.findAll({ where: { ...of, state: 'failed' } });
  if (failed.length === 0) throw new AppError('notReady', { message: 'Nothing broke here.' });
  for (const { step } of failed) {
    if (step === 'chapterPictures') await requestChapterPictures(of.teamId, of.recordingId);
    if (step !== 'poster') continue;
    await waitForStep(of, 'poster');
    await enqueue(makePoster, of);
  }
}

/**
 * Removes a recording with all that was marked on it; what lies in the store follows at once, by the worker.
 * @throws AppError `notFound`
 */
export async function removeRecording(actor: Actor, recordingId: string): Promise<void> {
  await inTransaction(async () => {
    const recording = await recordingOf(actor, recordingId);
    const teamId = actor.team.id;
    const uploads = await Upload.findAll({ where: { teamId, recordingId, state: 'open' } });
    for (const upload of uploads) await store().abortUpload(upload.objectKey, upload.storeUploadId);
    await Recording.destroy({ where: { teamId, id: recordingId } });
    await enqueue(removeObjects, {
      teamId,
      recordingId,
      prefixes: [originalsPrefix(teamId, recordingId), madePrefix(teamId, recordingId)],
    });
    await audit(actor, 'recording.removed', { type: 'recording', id: recordingId }, { title: recording.title });
    await tell(teamId, { type: 'removed', recordingId });
  });
}
