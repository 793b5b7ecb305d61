import { z } from 'zod';
import { CaptionLine } from '../domain/captions/captionLine';
import { Chapter } from '../domain/chapters/chapter';
import { Cue } from '../domain/chapters/cue';
import { Instant, Version } from '../domain/values';
import { limits } from '../limits';
import { endpoint } from './endpoint';

/** Chapters, cues and captions of a recording: three documents, each saved whole with a version, each version kept. */

/** A chapter as it is read back, with its picture. */
export const ChapterWithPicture = Chapter.extend({ pictureUrl: z.string().nullable() });

export const Chapters = z.object({ version: Version, items: z.array(ChapterWithPicture) });
export type Chapters = z.infer<typeof Chapters>;

export const Cues = z.object({ version: Version, items: z.array(Cue) });
export type Cues = z.infer<typeof Cues>;

export const Captions = z.object({ version: Version, language: z.string(), lines: z.array(CaptionLine) });
export type Captions = z.infer<typeof Captions>;

export const SavedVersion = z.object({
  version: Version,
  at: Instant,
  author: z.string().nullable(),
  how: z.enum(['edit', 'import', 'restore', 'made']),
  origin: z.string().nullable(),
  /** how many chapters, cues or lines it has, and how they differ from the version before */
  count: z.int(),
  added: z.int(),
  removed: z.int(),
  changed: z.int(),
});
export type SavedVersion = z.infer<typeof SavedVersion>;

const history = z.object({ items: z.array(SavedVersion) });
const restore = z.object({ restore: Version.min(1), version: Version });

export const getChapters = endpoint({
  method: 'get',
  path: '/teams/:team/recordings/:recordingId/chapters',
  may: 'readDrafts',
  summary: 'The chapters of a recording, asides included',
  response: Chapters,
});

export const saveChapters = endpoint({
  method: 'put',
  path: '/teams/:team/recordings/:recordingId/chapters',
  may: 'editChapters',
  summary: 'Save the chapters; a stale version answers 409 with the current ones',
  body: z.object({ version: Version, items: z.array(Chapter).max(limits.chaptersPerRecording) }),
  response: Chapters,
  errors: ['stale', 'invalid', 'notReady'],
});

export const listChapterVersions = endpoint({
  method: 'get',
  path: '/teams/:team/recordings/:recordingId/chapters/versions',
  may: 'readDrafts',
  summary: 'Every saved version of the chapters, newest first',
  response: history,
});

export const restoreChapters = endpoint({
  method: 'post',
  path: '/teams/:team/recordings/:recordingId/chapters/restore',
  may: 'editChapters',
  summary: 'Bring an earlier version back as a new one',
  body: restore,
  response: Chapters,
  errors: ['stale', 'invalid'],
});

export const exportChapters = endpoint({
  method: 'get',
  path: '/teams/:team/recordings/:recordingId/chapters.vtt',
  may: 'readLibrary',
  summary: 'The chapters as a WebVTT file; members get no asides',
  answers: 'text/vtt',
  response: z.string(),
});

export const getCues = endpoint({
  method: 'get',
  path: '/teams/:team/recordings/:recordingId/cues',
  may: 'readDrafts',
  summary: 'The coaching cues of a recording',
  response: Cues,
});

export const saveCues = endpoint({
  method: 'put',
  path: '/teams/:team/recordings/:recordingId/cues',
  may: 'editWords',
  summary: 'Save the cues',
  body: z.object({ version: Version, items: z.array(Cue).max(limits.cuesPerRecording) }),
  response: Cues,
  errors: ['stale', 'invalid'],
});

export const listCueVersions = endpoint({
  method: 'get',
  path: '/teams/:team/recordings/:recordingId/cues/versions',
  may: 'readDrafts',
  summary: 'Every saved version of the cues, newest first',
  response: history,
});

export const restoreCues = endpoint({
  method: 'post',
  path: '/teams/:team/recordings/:recordingId/cues/restore',
  may: 'editWords',
  summary: 'Bring an earlier version back as a new one',
  body: restore,
  response: Cues,
  errors: ['stale', 'invalid'],
});

export const getCaptions = endpoint({
  method: 'get',
  path: '/teams/:team/recordings/:recordingId/captions',
  may: 'readDrafts',
  summary: 'The caption lines of a recording',
  response: Captions,
});

export const saveCaptions = endpoint({
  method: 'put',
  path: '/teams/:team/recordings/:recordingId/captions',
  may: 'editWords',
  summary: 'Save the caption lines',
  body: z.object({ version: Version, lines: z.array(CaptionLine).max(limits.captionLinesPerRecording) }),
  response: Captions,
  errors: ['stale', 'invalid'],
});

export const importCaptions = endpoint({
  method: 'post',
  path: '/teams/:team/recordings/:recordingId/captions/import',
  may: 'editWords',
  summary: 'Replace the caption lines by those of a WebVTT or SRT file; a malformed file changes nothing',
  limit: 'write',
  file: { maxBytes: limits.captionFileBytes, types: ['text/vtt', 'application/x-subrip', 'text/plain'] },
  body: z.object({ version: z.coerce.number().pipe(Version) }),
  response: Captions.extend({ warnings: z.array(z.string()) }),
  errors: ['stale', 'badFile', 'tooLarge', 'wrongType'],
});

export const listCaptionVersions = endpoint({
  method: 'get',
  path: '/teams/:team/recordings/:recordingId/captions/versions',
  may: 'readDrafts',
  summary: 'Every saved version of the captions, newest first',
  response: history,
});

export const restoreCaptions = endpoint({
  method: 'post',
  path: '/teams/:team/recordings/:recordingId/captions/restore',
  may: 'editWords',
  summary: 'Bring an earlier version back as a new one',
  body: restore,
  response: Captions,
  errors: ['stale'],
});

export const exportCaptions = endpoint({
  method: 'get',
  path: '/teams/:team/recordings/:recordingId/captions.vtt',
  may: 'readLibrary',
  summary: 'The captions as a WebVTT file',
  answers: 'text/vtt',
  response: z.string(),
});
