import { z } from 'zod';
import { Caution } from '../domain/training/caution';
import { Dose } from '../domain/training/dose';
import { Scheme } from '../domain/training/scheme';
import { CalendarDate, Id, Instant, longText, shortText, Version } from '../domain/values';
import { blockKinds, missingThings, sessionStates } from '../domain/words';
import { limits } from '../limits';
import { endpoint, Nothing, PageQuery, page } from './endpoint';
import { Moment, NamedMovement } from './moments';

export const LineSubstitution = z.object({
  id: Id,
  movementId: Id,
  missing: z.enum(missingThings),
  missingKitItemId: Id.nullable().default(null),
  dose: Dose,
  reason: longText(200).default(''),
});

/** Ids are made by whoever adds a line, so that chapters keep pointing at the block they show. */
export const PlanLine = z.object({
  id: Id,
  movementId: Id,
  dose: Dose,
  note: longText(200).default(''),
  substitutions: z.array(LineSubstitution).max(limits.substitutionsPerLine).default([]),
});
export type PlanLine = z.infer<typeof PlanLine>;

export const Block = z.object({
  id: Id,
  kind: z.enum(blockKinds),
  title: longText(120).default(''),
  scheme: Scheme.nullable().default(null),
  note: longText(1000).default(''),
  lines: z.array(PlanLine).max(limits.linesPerBlock).default([]),
});
export type Block = z.infer<typeof Block>;

export const PlanFields = z.object({
  date: CalendarDate,
  title: shortText(120),
  note: longText(2000).default(''),
  /** the score to aim for, in the coach’s words */
  aim: longText(200).default(''),
  blocks: z.array(Block).max(limits.blocksPerSession).default([]),
});
export type PlanFields = z.infer<typeof PlanFields>;

export const RecordingOfSession = z.object({
  id: Id,
  title: z.string(),
  take: z.int(),
  state: z.string(),
  durationMs: z.int().nullable(),
  posterUrl: z.string().nullable(),
  chapterCount: z.int(),
});

export const Session = PlanFields.extend({
  id: Id,
  coach: z.object({ id: Id, name: z.string() }).nullable(),
  state: z.enum(sessionStates),
  publishedAt: Instant.nullable(),
  version: Version,
  movements: z.array(NamedMovement),
  recordings: z.array(RecordingOfSession),
});
export type Session = z.infer<typeof Session>;

export const SessionInList = z.object({
  id: Id,
  date: CalendarDate,
  title: z.string(),
  state: z.enum(sessionStates),
  coach: z.string().nullable(),
  blockKinds: z.array(z.enum(blockKinds)),
  recordingCount: z.int(),
  /** movements in the plan, and how many of them the library shows in a demo */
  movementCount: z.int(),
  shownCount: z.int(),
  version: Version,
});
export type SessionInList = z.infer<typeof SessionInList>;

export const listSessions = endpoint({
  method: 'get',
  path: '/teams/:team/sessions',
  may: 'readLibrary',
  summary: 'Sessions, newest date first; members see published ones only',
  query: PageQuery.extend({ from: CalendarDate.optional(), to: CalendarDate.optional() }),
  response: page(SessionInList),
});

export const getSession = endpoint({
  method: 'get',
  path: '/teams/:team/sessions/:sessionId',
  may: 'readLibrary',
  summary: 'A session’s plan and recordings',
  response: Session,
});

export const createSession = endpoint({
  method: 'post',
  path: '/teams/:team/sessions',
  may: 'editPlan',
  summary: 'Plan a session; the id is the client’s own, so that a double click makes one session',
  body: PlanFields.extend({ id: Id }),
  response: Session,
  status: 201,
  errors: ['invalid'],
});

export const saveSession = endpoint({
  method: 'put',
  path: '/teams/:team/sessions/:sessionId',
  may: 'editPlan',
  summary: 'Save a plan',
  body: PlanFields.extend({ version: Version }),
  response: Session,
  errors: ['stale', 'invalid'],
});

export const removeSession = endpoint({
  method: 'delete',
  path: '/teams/:team/sessions/:sessionId',
  may: 'editPlan',
  summary: 'Remove a draft; its recordings stay in the library without a session',
  response: Nothing,
  errors: ['inUse'],
});

/** Something that is missing; `missing` refuses publishing, `thin` only says so. */
export const PublishRemark = z.object({
  severity: z.enum(['missing', 'thin']),
  text: z.string(),
  recordingId: Id.nullable(),
  movementId: Id.nullable(),
});

export const checkPublish = endpoint({
  method: 'get',
  path: '/teams/:team/sessions/:sessionId/publish-check',
  may: 'publish',
  summary: 'What is missing before members can use the session',
  response: z.object({ remarks: z.array(PublishRemark) }),
});

export const publishSession = endpoint({
  method: 'post',
  path: '/teams/:team/sessions/:sessionId/publish',
  may: 'publish',
  summary: 'Show the session and its recordings to members',
  body: z.object({ version: Version }),
  response: Session,
  errors: ['stale', 'notReady'],
});

export const unpublishSession = endpoint({
  method: 'post',
  path: '/teams/:team/sessions/:sessionId/unpublish',
  may: 'publish',
  summary: 'Take the session back to a draft',
  body: z.object({ version: Version }),
  response: Session,
  errors: ['stale'],
});

export const MyLine = z.object({
  lineId: Id,
  movement: NamedMovement,
  dose: Dose,
  note: z.string(),
  points: z.array(z.string()),
  cautions: z.array(Caution),
  /** set where the member's kit changed the line */
  insteadOf: z.object({ movement: NamedMovement, dose: Dose, reason: z.string(), missingText: z.string() }).nullable(),
  /** what is missing when no way was found */
  noWayText: z.string().nullable(),
  demo: Moment.nullable(),
});
export type MyLine = z.infer<typeof MyLine>;

export const MyBlock = z.object({
  id: Id,
  kind: z.enum(blockKinds),
  title: z.string(),
  scheme: Scheme.nullable(),
  note: z.string(),
  lines: z.array(MyLine),
  /** chapters that show the block as a whole: the briefing, the workout once through */
  moments: z.array(Moment),
});
export type MyBlock = z.infer<typeof MyBlock>;

export const MyDay = z.object({
  date: CalendarDate,
  today: CalendarDate,
  /** neighbouring published sessions, to step from one to the next */
  previous: z.object({ date: CalendarDate, title: z.string() }).nullable(),
  next: z.object({ date: CalendarDate, title: z.string() }).nullable(),
  sessions: z.array(
    z.object({
      id: Id,
      title: z.string(),
      note: z.string(),
      aim: z.string(),
      coach: z.string().nullable(),
      changedLines: z.int(),
      /** kit that the plan asks for and the member lacks, in words */
      missingTexts: z.array(z.string()),
      blocks: z.array(MyBlock),
      recordings: z.array(RecordingOfSession),
    }),
  ),
  /** true until the member has said what they own */
  kitUnknown: z.boolean(),
});
export type MyDay = z.infer<typeof MyDay>;

export const getMyDay = endpoint({
  method: 'get',
  path: '/teams/:team/my-day',
  may: 'readLibrary',
  summary: 'A day’s published sessions in the asker’s own version: kit, then substitutions, then doses',
  query: z.object({ date: CalendarDate.optional() }),
  response: MyDay,
});
