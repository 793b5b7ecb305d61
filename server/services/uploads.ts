import { randomUUID } from 'node:crypto';
import { UniqueConstraintError } from 'sequelize';
import type { UploadState } from '../../shared/contracts/recordings';
import { AppError } from '../../shared/errors';
import { limits } from '../../shared/limits';
import { originalKey } from '../../storage/keys';
import { currentTransaction, inTransaction } from '../models/database';
import { Recording, Upload, UploadPart } from '../models/recordings';
import type { Session } from '../models/sessions';
import { type Actor, actorMay } from './actor';
import { audit } from './audit';
import { store } from './context';
import {
  bytesOfPart,
  partsOfFile,
  plainFileName,
  requireVideoFile,
  storedType,
  titleFromFileName,
} from './footageFile';
import { tell } from './live';
import { startMaking } from './recordingMaking';
import { nextTake, sessionFor } from './recordingSession';

/** How long a part's address works: a part of 16 MB takes 20 minutes at 100 kbit/s. */
const partAddressSeconds = 30 * 60;

export type AnnouncedFile = {
  requestKey: string;
  fileName: string;
  sizeBytes: number;
  contentType: string;
  sessionId?: string | null | undefined;
  fileDate?: string | undefined;
};

/**
 * Announces a file: a recording that waits for its bytes, and a multipart upload to send them to. The same person's
 * same `requestKey` answers with the same upload, so that a double click makes one.
 * @throws AppError `wrongType`, `tooLarge`, `invalid`
 */
export async function createUpload(actor: Actor, file: AnnouncedFile): Promise<Upload> {
  requireVideoFile(file.fileName, file.contentType);
  if (file.sizeBytes > limits.recordingBytes)
    throw new AppError('tooLarge', { fields: { sizeBytes: 'At most 8 GB a file.' } });
  const known = await uploadOfRequest(actor, file);
  if (known) return known;
  const session = await sessionFor(actor, file);
  const [recordingId, id] = [randomUUID(), randomUUID()];
  const objectKey = originalKey(actor.team.id, recordingId, id);
  const storeUploadId = await store().openUpload(objectKey, storedType(file.contentType));
  try {
    return await inTransaction(async () => {
      const recording = await addRecording(actor, recordingId, file, session);
      const upload = await Upload.create({
        teamId: actor.team.id,
        id,
        recordingId,
        personId: actor.person.id,
        requestKey: file.requestKey,
        objectKey,
        storeUploadId,
        sizeBytes: file.sizeBytes,
        ...partsOfFile(file.sizeBytes),
      });
      await audit(actor, 'upload.started', { type: 'recording', id: recordingId }, { fileName: recording.fileName });
      await tell(actor.team.id, { type: 'recording', recordingId, state: 'uploading' });
      return upload;
    });
  } catch (error) {
    await store().abortUpload(objectKey, storeUploadId);
    // the other click of a double click was faster
    const other = error instanceof UniqueConstraintError ? await uploadOfRequest(actor, file) : null;
    if (other) return other;
    throw error;
  }
}

async function uploadOfRequest(actor: Actor, file: AnnouncedFile): Promise<Upload | null> {
  const upload = await Upload.findOne({
    where: { teamId: actor.team.id, personId: actor.person.id, requestKey: file.requestKey },
  });
  if (upload && upload.sizeBytes !== file.sizeBytes)
    throw new AppError('invalid', { fields: { requestKey: 'This key belongs to another file.' } });
  return upload;
}

async function addRecording(
  actor: Actor,
  id: string,
  file: AnnouncedFile,
  session: Session | null,
): Promise<Recording> {
  return Recording.create({
    teamId: actor.team.id,
    id,
    sessionId: session?.id ?? null,
    // whoever leads the session is who is seen; without a session, the coach who uploads
    coachId: session?.coachId ?? (actorMay(actor, 'editPlan') ? actor.person.id : null),
    title: titleFromFileName(file.fileName),
    take: await nextTake(actor.team.id, session?.id ?? null),
    fileName: plainFileName(file.fileName),
    sizeBytes: file.sizeBytes,
    contentType: storedType(file.contentType),
  });
}

/** @throws AppError `notFound` */
export async function getUpload(actor: Actor, uploadId: string): Promise<Upload> {
  const upload = await Upload.findOne({ where: { teamId: actor.team.id, id: uploadId } });
  if (!upload) throw new AppError('notFound');
  return upload;
}

export async function presentUpload(upload: Upload): Promise<UploadState> {
  const parts = await UploadPart.findAll({
    where: { teamId: upload.teamId, uploadId: upload.id },
    order: [['number', 'asc']],
  });
  return {
    uploadId: upload.id,
    recordingId: upload.recordingId,
    partBytes: upload.partBytes,
    partCount: upload.partCount,
    sizeBytes: upload.sizeBytes,
    state: upload.state,
    parts: parts.map(({ number, etag, sizeBytes }) => ({ number, etag, sizeBytes })),
  };
}

type AnnouncedPart = { number: number; sizeBytes: number; sha256: string };

/**
 * The address at which a browser may put exactly these bytes, and the headers that it must send along.
 * @throws AppError `invalid` for a number or size that the file has not, `notReady` for an upload that has ended
 */
export async function signPart(actor: Actor, uploadId: string, part: AnnouncedPart) {
  const upload = await getUpload(actor, uploadId);
  requireOpen(upload);
  requireFitting(upload, part);
  const url = await store().presignPart(
    upload.objectKey,
    { ...part, uploadId: upload.storeUploadId },
    partAddressSeconds,
  );
  return { url, headers: { 'x-amz-checksum-sha256': part.sha256 } };
}

/**
 * Notes a part that the store has taken; sent again it replaces what was noted.
 * @throws AppError `invalid`, `notReady`
 */
export async function reportPart(actor: Actor, uploadId: string, part: AnnouncedPart & { etag: string }) {
  await inTransaction(async () => {
    const upload = await lockedUpload(actor, uploadId);
    requireOpen(upload);
    requireFitting(upload, part);
    await UploadPart.upsert({ teamId: actor.team.id, uploadId, ...part });
  });
}

/**
 * Puts the parts together once all are there, and starts the making. Safe to send twice, at once or later.
 * @returns the recording
 * @throws AppError `uploadIncomplete` naming the parts to send again, `notReady`
 */
export async function completeUpload(actor: Actor, uploadId: string): Promise<Recording> {
  const outcome = await inTransaction(async () => {
    // a second request waits here for the first
    const upload = await lockedUpload(actor, uploadId);
    if (upload.state === 'completed') return { recording: await recordingOf(upload) };
    requireOpen(upload);
    const missing = await joinParts(upload);
    if (missing.length > 0) return { missing };
    await upload.update({ state: 'completed' });
    const recording = await recordingOf(upload);
    await startMaking(recording, upload.objectKey);
    await audit(actor, 'upload.completed', { type: 'recording', id: recording.id }, { sizeBytes: upload.sizeBytes });
    return { recording };
  });
  // thrown out here, so that what was found missing stays noted
  if (outcome.missing)
    throw new AppError('uploadIncomplete', { message: `Send these parts again: ${listed(outcome.missing)}.` });
  return outcome.recording;
}

/**
 * Gives an upload up: its parts, its object and its recording go.
 * @throws AppError `notReady` when it is complete already
 */
export async function abortUpload(actor: Actor, uploadId: string): Promise<void> {
  await inTransaction(async () => {
    const upload = await lockedUpload(actor, uploadId);
    requireOpen(upload);
    await store().abortUpload(upload.objectKey, upload.storeUploadId);
    // the store may have joined the parts before a process died
    await store().remove(upload.objectKey);
    await Recording.destroy({ where: { teamId: actor.team.id, id: upload.recordingId } });
    await audit(actor, 'upload.aborted', { type: 'recording', id: upload.recordingId });
    await tell(actor.team.id, { type: 'removed', recordingId: upload.recordingId });
  });
}

/** @returns the numbers of parts that are not there as they should be; none when the object is whole */
async function joinParts(upload: Upload): Promise<number[]> {
  const noted = await UploadPart.findAll({ where: { teamId: upload.teamId, uploadId: upload.id } });
  const held = await store().partsOf(upload.objectKey, upload.storeUploadId);
  if (held === null) {
    // the store joined them before a process could note it; or it lost the upload
    if (await isWhole(upload)) return [];
    throw new AppError('uploadIncomplete', {
      message: 'The store no longer knows this upload. Give it up and upload the file again.',
    });
  }
  const parts = new Map(noted.map((part) => [part.number, part]));
  const inStore = new Map(held.map((part) => [part.number, part]));
  const missing = Array.from({ length: upload.partCount }, (_, i) => i + 1).filter((number) => {
    const part = parts.get(number);
    const there = inStore.get(number);
    return !part || !there || there.sizeBytes !== part.sizeBytes || unquoted(there.etag) !== unquoted(part.etag);
  });
  if (missing.length > 0) {
    await UploadPart.destroy({ where: { teamId: upload.teamId, uploadId: upload.id, number: missing } });
    return missing;
  }
  await store().completeUpload(
    upload.objectKey,
    upload.storeUploadId,
    noted
      .toSorted((a, b) => a.number - b.number)
      .map(({ number, sha256 }) => ({ number, sha256, etag: inStore.get(number)?.etag ?? '' })),
  );
  if (!(await isWhole(upload))) throw new Error(`The store joined ${upload.objectKey} to another length.`);
  return [];
}

async function isWhole(upload: Upload): Promise<boolean> {
  return (await store().head(upload.objectKey))?.sizeBytes === upload.sizeBytes;
}

async function lockedUpload(actor: Actor, uploadId: string): Promise<Upload> {
  const transaction = currentTransaction();
  const upload = await Upload.findOne({
    where: { teamId: actor.team.id, id: uploadId },
    ...(transaction ? { lock: transaction.LOCK.UPDATE } : {}),
  });
  if (!upload) throw new AppError('notFound');
  return upload;
}

async function recordingOf(upload: Upload): Promise<Recording> {
  const recording = await Recording.findOne({ where: { teamId: upload.teamId, id: upload.recordingId } });
  if (!recording) throw new AppError('notFound');
  return recording;
}

function requireOpen(upload: Upload): void {
  if (upload.state !== 'open') throw new AppError('notReady', { message: 'This upload is over.' });
}

function requireFitting(upload: Upload, part: AnnouncedPart): void {
  if (part.number > upload.partCount)
    throw new AppError('invalid', { fields: { number: `This upload has ${upload.partCount} parts.` } });
  const wanted = bytesOfPart(upload, part.number);
  if (part.sizeBytes !== wanted)
    throw new AppError('invalid', { fields: { sizeBytes: `Part ${part.number} has ${wanted} bytes.` } });
}

const unquoted = (etag: string) => etag.replace(/^"|"$/g, '');

const listed = (numbers: readonly number[]) =>
  numbers.length > 20 ? `${numbers.slice(0, 20).join(', ')} and ${numbers.length - 20} more` : numbers.join(', ');
