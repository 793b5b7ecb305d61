import {
  completeUpload,
  createUpload,
  getUpload,
  type Recording,
  reportPart,
  signPart,
  type UploadState,
} from '../../../shared/contracts/recordings';
import { ApiError, call } from '../../lib/api';
import { untilDone } from './connection';
import { hashPart } from './hashPart';
import { arrivedBytes, missingParts, rangeOfPart } from './parts';
import { putPart } from './putPart';
import type { Slots } from './slots';

/** Which session a recording belongs to: chosen, none on purpose, or found by the file's date. */
export type SessionChoice = { by: 'fileDate' } | { by: 'choice'; sessionId: string | null };

export type FileToSend = {
  team: string;
  file: File;
  requestKey: string;
  session: SessionChoice;
  /** of an upload that was begun before */
  uploadId: string | null;
  /** among all files; the smaller one's parts go first */
  order: number;
};

type Watcher = {
  signal: AbortSignal;
  onOpened: (upload: UploadState) => void;
  /** bytes that have arrived in all */
  onProgress: (bytes: number) => void;
  onFinishing: () => void;
};

/** How often the server may find parts missing after all were sent. */
const rounds = 3;

/**
 * Brings one file into the store, or the rest of it: announces it, sends the parts that are missing, has them put together.
 * @throws ApiError, LostPart or UnreadableFile once no further try is made, or the signal's reason
 */
export async function sendFile(source: FileToSend, slots: Slots, watcher: Watcher): Promise<Recording> {
  const { team } = source;
  let upload = await openUpload(source, watcher.signal);
  watcher.onOpened(upload);
  for (let round = 1; ; round++) {
    await sendParts(source, upload, slots, watcher);
    watcher.onFinishing();
    const { uploadId } = upload;
    try {
      return await untilDone(() => call(completeUpload, { team, uploadId }), watcher.signal);
    } catch (error) {
      if (!(error instanceof ApiError) || error.code !== 'uploadIncomplete' || round === rounds) throw error;
      upload = await untilDone(() => call(getUpload, { team, uploadId }), watcher.signal);
      watcher.onOpened(upload);
    }
  }
}

async function openUpload({ team, file, requestKey, session, uploadId }: FileToSend, signal: AbortSignal) {
  if (uploadId !== null) return untilDone(() => call(getUpload, { team, uploadId }), signal);
  return untilDone(
    () =>
      call(createUpload, {
        team,
        requestKey,
        fileName: file.name,
        sizeBytes: file.size,
        contentType: file.type.slice(0, 100),
        fileDate: new Date(file.lastModified).toISOString(),
        ...(session.by === 'choice' ? { sessionId: session.sessionId } : {}),
      }),
    signal,
  );
}

/** Sends all parts that are missing. After one failed for good, those on their way still arrive, and no further one starts. */
async function sendParts(
  { team, file, order }: FileToSend,
  upload: UploadState,
  slots: Slots,
  { signal, onProgress }: Watcher,
): Promise<void> {
  const { uploadId } = upload;
  const held = new Set(upload.parts.map((part) => part.number));
  const onTheirWay = new Map<number, number>();
  const told = () => onProgress(arrivedBytes(upload, held, onTheirWay));
  const failures: unknown[] = [];

  const sendPart = async (number: number) => {
    if (failures.length > 0) return;
    const { from, to } = rangeOfPart(upload, number);
    const bytes = file.slice(from, to);
    const part = { team, uploadId, number, sizeBytes: bytes.size, sha256: await hashPart(bytes) };
    await untilDone(async () => {
      try {
        const target = await call(signPart, part, { signal });
        const etag = await putPart(target, bytes, signal, (sent) => {
          onTheirWay.set(number, sent);
          told();
        });
        await call(reportPart, { ...part, etag }, { signal });
      } catch (error) {
        onTheirWay.delete(number);
        told();
        throw error;
      }
    }, signal);
    onTheirWay.delete(number);
    held.add(number);
    told();
  };

  told();
  await Promise.all(
    missingParts(upload, held).map((number) =>
      slots
        .hold(order, signal, () => sendPart(number))
        .catch((error: unknown) => {
          failures.push(error);
        }),
    ),
  );
  signal.throwIfAborted();
  if (failures.length > 0) throw failures[0];
}
