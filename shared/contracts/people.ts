import { z } from 'zod';
import { Id, Instant, shortText } from '../domain/values';
import { roles } from '../domain/words';
import { Email, PersonName } from './account';
import { endpoint, Nothing, PageQuery, page } from './endpoint';

export const TeamPerson = z.object({
  id: Id,
  name: z.string(),
  email: z.string(),
  role: z.enum(roles),
  since: Instant,
});
export type TeamPerson = z.infer<typeof TeamPerson>;

export const Invitation = z.object({
  id: Id,
  email: z.string(),
  name: z.string().nullable(),
  role: z.enum(roles),
  expiresAt: Instant,
  invitedBy: z.string().nullable(),
});
export type Invitation = z.infer<typeof Invitation>;

export const getTeam = endpoint({
  method: 'get',
  path: '/teams/:team',
  may: 'readLibrary',
  summary: 'The team, and what day it is there',
  response: z.object({
    slug: z.string(),
    name: z.string(),
    timeZone: z.string(),
    today: z.string(),
    role: z.enum(roles),
  }),
});

export const updateTeam = endpoint({
  method: 'patch',
  path: '/teams/:team',
  may: 'editTeam',
  summary: 'Change the team’s name or time zone',
  body: z.object({ name: shortText(80).optional(), timeZone: z.string().max(60).optional() }),
  response: getTeam.response,
  errors: ['invalid'],
});

export const listPeople = endpoint({
  method: 'get',
  path: '/teams/:team/people',
  may: 'managePeople',
  summary: 'Everybody in the team',
  query: PageQuery,
  response: page(TeamPerson),
});

export const listInvitations = endpoint({
  method: 'get',
  path: '/teams/:team/invitations',
  may: 'managePeople',
  summary: 'Invitations that wait for an answer',
  response: z.object({ items: z.array(Invitation) }),
});

export const invitePerson = endpoint({
  method: 'post',
  path: '/teams/:team/invitations',
  may: 'managePeople',
  summary: 'Send a single-use link into the team; a second one to the same address replaces the first',
  limit: 'mail',
  body: z.object({ email: Email, name: PersonName.optional(), role: z.enum(roles) }),
  response: Invitation,
  status: 201,
  errors: ['alreadyMember', 'tooOften'],
});

export const revokeInvitation = endpoint({
  method: 'delete',
  path: '/teams/:team/invitations/:invitationId',
  may: 'managePeople',
  summary: 'Make an invitation’s link useless',
  response: Nothing,
});

export const changeRole = endpoint({
  method: 'patch',
  path: '/teams/:team/people/:personId',
  may: 'managePeople',
  summary: 'Give a person another role; it counts from their next request on',
  body: z.object({ role: z.enum(roles) }),
  response: TeamPerson,
  errors: ['lastOwner'],
});

export const removePerson = endpoint({
  method: 'delete',
  path: '/teams/:team/people/:personId',
  may: 'managePeople',
  summary: 'Take a person out of the team',
  response: Nothing,
  errors: ['lastOwner'],
});

export const AuditEntry = z.object({
  id: Id,
  at: Instant,
  actor: z.string().nullable(),
  action: z.string(),
  subjectType: z.string(),
  subjectId: Id.nullable(),
  /** what it is called now; nothing where it is gone or has no name */
  subject: z.string().nullable(),
  details: z.record(z.string(), z.unknown()),
});

export type AuditEntry = z.infer<typeof AuditEntry>;

export const listAudit = endpoint({
  method: 'get',
  path: '/teams/:team/audit',
  may: 'readAudit',
  summary: 'Every change, newest first',
  query: PageQuery,
  response: page(AuditEntry),
});

export const TeamNotice = z.object({
  id: Id,
  kind: z.enum(['recordingReady', 'recordingFailed', 'sessionPublished']),
  subjectId: Id.nullable(),
  text: z.string(),
  at: Instant,
  readAt: Instant.nullable(),
});
export type TeamNotice = z.infer<typeof TeamNotice>;

export const listNotices = endpoint({
  method: 'get',
  path: '/teams/:team/notices',
  may: 'keepOwn',
  summary: 'What happened for the person who asks, newest first',
  query: PageQuery,
  response: page(TeamNotice).extend({ unread: z.int() }),
});

export const readNotices = endpoint({
  method: 'post',
  path: '/teams/:team/notices/read',
  may: 'keepOwn',
  summary: 'All notices up to now were read',
  response: Nothing,
});
