import { createHash, randomUUID } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { basename } from 'node:path';
import { Recording, RecordingAsset } from '../../server/models/recordings';
import { Session } from '../../server/models/sessions';
import { store } from '../../server/services/context';
import type { Recording as RecordingAnswer, UploadState } from '../../shared/contracts/recordings';
import { madeKey } from '../../storage/keys';
import type { Visitor } from './api';

/** Footage for tests: uploads as a browser makes them, and recordings that are there already. */

export const sha256Of = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('base64');

export type Announced = {
  name?: string;
  type?: string;
  sessionId?: string | null;
  fileDate?: string;
  requestKey?: string;
};

export async function announce(
  visitor: Visitor,
  team: string,
  sizeBytes: number,
  file: Announced = {},
): Promise<UploadState> {
  const answer = await visitor
    .post(`/api/teams/${team}/uploads`)
    .send({
      requestKey: file.requestKey ?? randomUUID(),
      fileName: file.name ?? 'morning.mp4',
      sizeBytes,
      contentType: file.type ?? 'video/mp4',
      ...(file.sessionId === undefined ? {} : { sessionId: file.sessionId }),
      ...(file.fileDate === undefined ? {} : { fileDate: file.fileDate }),
    })
    .expect(201);
  return answer.body as UploadState;
}

/** The bytes of a part. @param number from 1 */
export const partOf = (bytes: Uint8Array, upload: UploadState, number: number) =>
  bytes.subarray((number - 1) * upload.partBytes, number * upload.partBytes);

/** Asks for an address and puts bytes there, as the browser does. @returns the store's answer */
export async function putPart(
  visitor: Visitor,
  team: string,
  upload: UploadState,
  number: number,
  bytes: Uint8Array,
  sent = bytes,
): Promise<Response> {
  const sha256 = sha256Of(bytes);
  const { body } = await visitor
    .post(`/api/teams/${team}/uploads/${upload.uploadId}/parts`)
    .send({ number, sizeBytes: bytes.length, sha256 })
    .expect(200);
  return fetch(body.url, { method: 'PUT', body: Buffer.from(sent), headers: body.headers });
}

export async function sendPart(
  visitor: Visitor,
  team: string,
  upload: UploadState,
  number: number,
  bytes: Uint8Array,
): Promise<void> {
  const answer = await putPart(visitor, team, upload, number, bytes);
  if (!answer.ok) throw new Error(`The store said ${answer.status}: ${await answer.text()}`);
  await visitor
    .put(`/api/teams/${team}/uploads/${upload.uploadId}/parts`)
    .send({ number, sizeBytes: bytes.length, sha256: sha256Of(bytes), etag: answer.headers.get('etag') })
    .expect(200);
}

/** A whole upload. @returns the recording as the last step answers it */
export async function uploadBytes(
  visitor: Visitor,
  team: string,
  bytes: Uint8Array,
  file: Announced = {},
): Promise<RecordingAnswer> {
  const upload = await announce(visitor, team, bytes.length, file);
  for (let number = 1; number <= upload.partCount; number++)
    await sendPart(visitor, team, upload, number, partOf(bytes, upload, number));
  const answer = await visitor.post(`/api/teams/${team}/uploads/${upload.uploadId}/complete`).expect(200);
  return answer.body as RecordingAnswer;
}

export const uploadFile = async (visitor: Visitor, team: string, path: string, file: Announced = {}) =>
  uploadBytes(visitor, team, await readFile(path), { name: basename(path), ...file });

/** Every key that this test's bucket holds. */
export async function keysInStore(prefix = ''): Promise<string[]> {
  const keys: string[] = [];
  for await (const key of store().list(prefix)) keys.push(key);
  return keys;
}

/** All bytes of an object. */
export async function bytesInStore(key: string): Promise<Buffer> {
  const chunks: Buffer[] = [];
  for await (const chunk of await store().read(key)) chunks.push(chunk as Buffer);
  return Buffer.concat(chunks);
}

export async function makeSession(
  teamId: string,
  values: { date?: string; title?: string; coachId?: string; published?: boolean } = {},
): Promise<Session> {
  const { date = '2026-03-03', title = 'Hinge and hold', coachId = null, published = false } = values;
  return Session.create({
    teamId,
    date,
    title,
    coachId,
    state: published ? 'published' : 'draft',
    publishedAt: published ? new Date() : null,
  });
}

/** A recording that plays, as the worker leaves it: a minute long, its playback and poster in the store. */
export async function makeReadyRecording(
  teamId: string,
  values: { sessionId?: string | null; title?: string; take?: number; coachId?: string | null; createdAt?: Date } = {},
): Promise<Recording> {
  const recording = await Recording.create({
    teamId,
    sessionId: null,
    title: 'Take one',
    fileName: 'take-one.mp4',
    sizeBytes: 1000,
    contentType: 'video/mp4',
    state: 'ready',
    originalKey: `originals/${teamId}/none`,
    durationMs: 60_000,
    width: 1280,
    height: 720,
    fps: 30,
    ...values,
  });
  const files = [
    { kind: 'playback', name: 'playback-test.mp4', contentType: 'video/mp4' },
    { kind: 'poster', name: 'poster-test.jpg', contentType: 'image/jpeg' },
  ] as const;
  for (const file of files) {
    const bytes = Buffer.from(`${file.kind} of ${recording.id}`);
    await store().putBytes(madeKey(teamId, recording.id, file.name), bytes, file.contentType);
    await RecordingAsset.create({ teamId, recordingId: recording.id, ...file, sizeBytes: bytes.length });
  }
  return recording;
}
