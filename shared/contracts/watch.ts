import { z } from 'zod';
import { CaptionLine } from '../domain/captions/captionLine';
import { Chapter } from '../domain/chapters/chapter';
import { Cue } from '../domain/chapters/cue';
import { Caution } from '../domain/training/caution';
import { CalendarDate, Id, Instant, Ms } from '../domain/values';
import { endpoint, Nothing } from './endpoint';

export const WatchedMovement = z.object({
  id: Id,
  name: z.string(),
  points: z.array(z.string()),
  faults: z.array(z.string()),
  cautions: z.array(Caution),
});

/** All that the player needs, in one answer: chapters without asides for members, captions, cues, addresses that expire. */
export const Watch = z.object({
  recordingId: Id,
  title: z.string(),
  take: z.int(),
  durationMs: Ms,
  fps: z.number(),
  width: z.int(),
  height: z.int(),
  session: z.object({ id: Id, date: CalendarDate, title: z.string(), published: z.boolean() }).nullable(),
  coach: z.string().nullable(),
  playback: z.object({ url: z.string(), type: z.string() }),
  posterUrl: z.string().nullable(),
  /** when the addresses stop working; the player asks again before */
  addressesEndAt: Instant,
  chapters: z.array(Chapter.extend({ pictureUrl: z.string().nullable(), missingText: z.string().nullable() })),
  /** stretches that members skip: asides, by time alone */
  skips: z.array(z.object({ startMs: Ms, endMs: Ms })),
  captions: z.array(CaptionLine),
  cues: z.array(Cue),
  movements: z.array(WatchedMovement),
  /** other recordings of the session, in order of takes */
  takes: z.array(z.object({ recordingId: Id, title: z.string(), take: z.int() })),
  /** where the person stopped, if they did */
  placeMs: Ms.nullable(),
});
export type Watch = z.infer<typeof Watch>;

export const getWatch = endpoint({
  method: 'get',
  path: '/teams/:team/watch/:recordingId',
  may: 'readLibrary',
  summary: 'What the player needs',
  response: Watch,
  errors: ['notReady'],
});

export const keepPlace = endpoint({
  method: 'put',
  path: '/teams/:team/watch/:recordingId/place',
  may: 'keepOwn',
  summary: 'Where one stopped',
  limit: 'read',
  body: z.object({ atMs: Ms }),
  response: Nothing,
});
