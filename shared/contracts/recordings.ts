import { z } from 'zod';
import { CalendarDate, Id, Instant, Ms, shortText, Version } from '../domain/values';
import { makingSteps, recordingStates, stepStates } from '../domain/words';
import { limits } from '../limits';
import { endpoint, Nothing, PageQuery, page } from './endpoint';

export const Step = z.object({ step: z.enum(makingSteps), state: z.enum(stepStates), percent: z.int() });
export type Step = z.infer<typeof Step>;

export const Failure = z.object({ code: z.string(), message: z.string(), retry: z.boolean() });

export const Recording = z.object({
  id: Id,
  title: z.string(),
  take: z.int(),
  session: z.object({ id: Id, date: CalendarDate, title: z.string(), state: z.string() }).nullable(),
  coach: z.object({ id: Id, name: z.string() }).nullable(),
  fileName: z.string(),
  sizeBytes: z.int(),
  state: z.enum(recordingStates),
  steps: z.array(Step),
  failure: Failure.nullable(),
  durationMs: Ms.nullable(),
  width: z.int().nullable(),
  height: z.int().nullable(),
  fps: z.number().nullable(),
  posterUrl: z.string().nullable(),
  chapterCount: z.int(),
  captionLineCount: z.int(),
  createdAt: Instant,
  version: Version,
});
export type Recording = z.infer<typeof Recording>;

export const listRecordings = endpoint({
  method: 'get',
  path: '/teams/:team/recordings',
  may: 'readDrafts',
  summary: 'All footage, newest first',
  query: PageQuery.extend({ sessionId: Id.optional() }),
  response: page(Recording),
});

export const getRecording = endpoint({
  method: 'get',
  path: '/teams/:team/recordings/:recordingId',
  may: 'readDrafts',
  summary: 'One recording with its progress',
  response: Recording,
});

export const updateRecording = endpoint({
  method: 'patch',
  path: '/teams/:team/recordings/:recordingId',
  may: 'uploadFootage',
  summary: 'Change title, take or session',
  body: z.object({
    title: shortText(120).optional(),
    take: z.int().min(1).max(99).optional(),
    sessionId: Id.nullable().optional(),
    version: Version,
  }),
  response: Recording,
  errors: ['stale', 'invalid'],
});

export const retryMaking = endpoint({
  method: 'post',
  path: '/teams/:team/recordings/:recordingId/retry',
  may: 'uploadFootage',
  summary: 'Try again what broke',
  response: Recording,
  errors: ['notReady'],
});

export const removeRecording = endpoint({
  method: 'delete',
  path: '/teams/:team/recordings/:recordingId',
  may: 'removeFootage',
  summary: 'Remove a recording and everything made from it',
  response: Nothing,
});

export const UploadState = z.object({
  uploadId: Id,
  recordingId: Id,
  partBytes: z.int(),
  partCount: z.int(),
  sizeBytes: z.int(),
  state: z.enum(['open', 'completed', 'aborted']),
  /** parts that are in the store already */
  parts: z.array(z.object({ number: z.int(), etag: z.string(), sizeBytes: z.int() })),
});
export type UploadState = z.infer<typeof UploadState>;

export const createUpload = endpoint({
  method: 'post',
  path: '/teams/:team/uploads',
  may: 'uploadFootage',
  summary:
    'Announce a file: makes a recording and opens a multipart upload; the same `requestKey` again answers with the same upload',
  limit: 'write',
  body: z.object({
    requestKey: Id,
    fileName: z.string().trim().min(1).max(255),
    /** above the limit it is refused as too large */
    sizeBytes: z.int().min(1, 'The file is empty. Choose another one.'),
    contentType: z.string().max(100),
    /** left out: the session on the file's own date, if there is exactly one */
    sessionId: Id.nullable().optional(),
    /** the file's own last change, to find the session it belongs to */
    fileDate: Instant.optional(),
  }),
  response: UploadState,
  status: 201,
  errors: ['invalid', 'tooLarge', 'wrongType', 'tooOften'],
});

export const getUpload = endpoint({
  method: 'get',
  path: '/teams/:team/uploads/:uploadId',
  may: 'uploadFootage',
  summary: 'Which parts are there',
  response: UploadState,
});

/** base64 of 32 bytes */
const Sha256 = z.string().regex(/^[A-Za-z0-9+/]{43}=$/, 'A SHA-256 in base64.');
const PartNumber = z.int().min(1).max(limits.uploadParts);

export const signPart = endpoint({
  method: 'post',
  path: '/teams/:team/uploads/:uploadId/parts',
  may: 'uploadFootage',
  summary: 'An address to put one part at, for exactly these bytes',
  limit: 'read',
  body: z.object({ number: PartNumber, sizeBytes: z.int().min(1), sha256: Sha256 }),
  response: z.object({ url: z.string(), headers: z.record(z.string(), z.string()) }),
  errors: ['invalid', 'notReady'],
});

export const reportPart = endpoint({
  method: 'put',
  path: '/teams/:team/uploads/:uploadId/parts',
  may: 'uploadFootage',
  summary: 'A part is in the store',
  limit: 'read',
  body: z.object({ number: PartNumber, sizeBytes: z.int().min(1), sha256: Sha256, etag: z.string().min(1).max(100) }),
  response: Nothing,
  errors: ['invalid', 'notReady'],
});

export const completeUpload = endpoint({
  method: 'post',
  path: '/teams/:team/uploads/:uploadId/complete',
  may: 'uploadFootage',
  summary: 'All parts are there; can be sent again',
  response: Recording,
  errors: ['uploadIncomplete', 'notReady'],
});

export const abortUpload = endpoint({
  method: 'delete',
  path: '/teams/:team/uploads/:uploadId',
  may: 'uploadFootage',
  summary: 'Give an upload up; nothing of it stays',
  response: Nothing,
  errors: ['notReady'],
});
