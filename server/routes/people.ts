import {
  changeRole,
  getTeam,
  invitePerson,
  listAudit,
  listInvitations,
  listNotices,
  listPeople,
  readNotices,
  removePerson,
  revokeInvitation,
  updateTeam,
} from '../../shared/contracts/people';
import type { Actor } from '../services/actor';
import * as auditTrail from '../services/auditTrail';
import * as invitations from '../services/invitations';
import * as notices from '../services/notices';
import * as people from '../services/people';
import { dateInZone } from '../services/teamDay';
import { on, type Route } from './on';

export const peopleRoutes: Route[] = [
  on(getTeam, ({ actor }) => presentTeam(actor, actor.team)),

  on(updateTeam, async ({ actor, body }) => presentTeam(actor, await people.updateTeam(actor, body))),

  on(listPeople, async ({ actor, query }) => {
    const { items, nextCursor } = await people.listPeople(actor, query);
    return { items: items.map(presentPerson), nextCursor };
  }),

  on(changeRole, async ({ actor, params, body }) =>
    presentPerson(await people.changeRole(actor, params.personId, body.role)),
  ),

  on(removePerson, async ({ actor, params }) => {
    await people.removePerson(actor, params.personId);
    return {};
  }),

  on(listInvitations, async ({ actor }) => ({
    items: (await invitations.listInvitations(actor)).map(presentInvitation),
  })),

  on(invitePerson, async ({ actor, body }) => presentInvitation(await invitations.invitePerson(actor, body))),

  on(revokeInvitation, async ({ actor, params }) => {
    await invitations.revokeInvitation(actor, params.invitationId);
    return {};
  }),

  on(listAudit, async ({ actor, query }) => {
    const { items, nextCursor } = await auditTrail.listAudit(actor, query);
    return { items: items.map(presentAuditEntry), nextCursor };
  }),

  on(listNotices, async ({ actor, query }) => {
    const { items, nextCursor, unread } = await notices.listNotices(actor, query);
    return { items: items.map(presentNotice), nextCursor, unread };
  }),

  on(readNotices, async ({ actor }) => {
    await notices.readNotices(actor);
    return {};
  }),
];

type ItemOf<T extends (...args: never[]) => Promise<{ items: unknown[] }>> = Awaited<ReturnType<T>>['items'][number];

function presentTeam(actor: Actor, { name, timeZone }: { name: string; timeZone: string }) {
  return { slug: actor.team.slug, name, timeZone, today: dateInZone(timeZone), role: actor.role };
}

function presentPerson({ person, role, since }: people.TeamPerson) {
  return { id: person.id, name: person.name, email: person.email, role, since: since.toISOString() };
}

function presentInvitation({ link, role, invitedBy }: invitations.Invited) {
  return {
    id: link.id,
    email: link.email,
    name: link.name,
    role,
    expiresAt: link.expiresAt.toISOString(),
    invitedBy,
  };
}

function presentAuditEntry({ event, actor, subject }: ItemOf<typeof auditTrail.listAudit>) {
  return {
    id: event.id,
    at: event.createdAt.toISOString(),
    actor,
    action: event.action,
    subjectType: event.subjectType,
    subjectId: event.subjectId,
    subject,
    details: event.details,
  };
}

function presentNotice(notice: ItemOf<typeof notices.listNotices>) {
  return {
    id: notice.id,
    kind: notice.kind,
    subjectId: notice.subjectId,
    text: notice.text,
    at: notice.createdAt.toISOString(),
    readAt: notice.readAt?.toISOString() ?? null,
  };
}
