import { Op, UniqueConstraintError } from 'sequelize';
import { NewPassword } from '../../shared/contracts/account';
import type { Role } from '../../shared/domain/words';
import { AppError } from '../../shared/errors';
import { limits } from '../../shared/limits';
import { invitationMessage } from '../mail/messages';
import { inTransaction } from '../models/database';
import { MailLink, Membership, Person, Team } from '../models/people';
import { hashNewPassword } from './accounts';
import { type Actor, requireMay } from './actor';
import { audit } from './audit';
import { findLink, linkAddress, makeLink, postMail, takeLink } from './mailLinks';
import { lockPeople } from './people';
import { type Account, accountOf } from './signIns';

export type Invited = { link: MailLink; role: Role; invitedBy: string | null };

/**
 * Sends a single-use link into the team; an earlier one to the same address stops working.
 * @throws AppError `alreadyMember`
 */
export function invitePerson(
  actor: Actor,
  { email, name = null, role }: { email: string; name?: string | null | undefined; role: Role },
): Promise<Invited> {
  requireMay(actor, 'managePeople');
  return inTransaction(async () => {
    await lockPeople(actor);
    const known = await Person.findOne({ where: { email } });
    const isMember = known && (await Membership.count({ where: { teamId: actor.team.id, personId: known.id } })) > 0;
    if (isMember) throw new AppError('alreadyMember', { fields: { email: `${known.name} is in the team already.` } });
    await MailLink.destroy({ where: { ...waitingIn(actor), email } });
    const expiresAt = new Date(Date.now() + limits.inviteHours * 3_600_000);
    const { link, secret } = await makeLink({
      purpose: 'join',
      teamId: actor.team.id,
      email,
      name,
      role,
      invitedById: actor.person.id,
      expiresAt,
    });
    await postMail(
      invitationMessage({
        to: email,
        name: known?.name ?? name,
        team: actor.team.name,
        role,
        invitedBy: actor.person.name,
        link: linkAddress('join', secret),
        until: new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone: actor.team.timeZone }).format(expiresAt),
        hasAccount: Boolean(known?.passwordHash),
      }),
    );
    await audit(actor, 'invitation.sent', { type: 'invitation', id: link.id }, { email, role });
    return { link, role, invitedBy: actor.person.name };
  });
}

/** Invitations that wait for an answer, newest first. */
export async function listInvitations(actor: Actor): Promise<Invited[]> {
  requireMay(actor, 'managePeople');
  const links = await MailLink.findAll({
    where: { ...waitingIn(actor), expiresAt: { [Op.gt]: new Date() } },
    order: [['createdAt', 'DESC']],
  });
  const inviters = await Person.findAll({ where: { id: links.flatMap((link) => link.invitedById ?? []) } });
  const names = new Map(inviters.map((person) => [person.id, person.name]));
  return links.map((link) => ({
    link,
    role: roleOf(link),
    invitedBy: link.invitedById ? (names.get(link.invitedById) ?? null) : null,
  }));
}

/** Makes an invitation's link useless. @throws AppError `notFound` */
export function revokeInvitation(actor: Actor, invitationId: string): Promise<void> {
  requireMay(actor, 'managePeople');
  return inTransaction(async () => {
    const link = await MailLink.findOne({ where: { ...waitingIn(actor), id: invitationId } });
    // one that was accepted this moment is no longer there to take back
    if (!link || (await MailLink.destroy({ where: { ...waitingIn(actor), id: link.id } })) === 0)
      throw new AppError('notFound');
    await audit(actor, 'invitation.revoked', { type: 'invitation', id: link.id }, { email: link.email });
  });
}

export type Invitation = { team: Team; link: MailLink; role: Role; person: Person | null };

/** What a link is for. @throws AppError `linkUsed` */
export async function readInvitation(secret: string): Promise<Invitation> {
  const link = await findLink(secret, 'join');
  const team = link.teamId ? await Team.findByPk(link.teamId) : null;
  if (!team) throw new AppError('linkUsed');
  const person = await Person.findOne({ where: { email: link.email } });
  return { team, link, role: roleOf(link), person };
}

/** A person who has an account already joins with it, once its password was checked. @throws AppError `linkUsed` */
export function joinWithAccount({ team, link, role }: Invitation, account: Account, requestId: string): Promise<void> {
  return inTransaction(async () => {
    await takeLink(link);
    await join(team, account, role, requestId);
  });
}

/**
 * A new person joins with a name and a password.
 * @throws AppError `linkUsed`, or `invalid` with the fields at fault; the link then stays as it is
 */
export async function joinAsNew(
  { team, link, role, person }: Invitation,
  given: { name: string | undefined; password: string },
  requestId: string,
): Promise<Account> {
  const name = given.name ?? link.name;
  if (!name) throw new AppError('invalid', { fields: { name: 'Write your name.' } });
  const password = NewPassword.safeParse(given.password);
  if (!password.success)
    throw new AppError('invalid', { fields: { password: password.error.issues[0]?.message ?? 'Choose another.' } });
  const passwordHash = await hashNewPassword(password.data, [link.email, name, team.name]);
  try {
    return await inTransaction(async () => {
      await takeLink(link);
      const joined = person
        ? await person.update({ name, passwordHash })
        : await Person.create({ email: link.email, name, passwordHash });
      const account = accountOf(joined);
      await join(team, account, role, requestId);
      return account;
    });
  } catch (error) {
    // invitations of two teams accepted at once: the other one made the account
    if (error instanceof UniqueConstraintError)
      throw new AppError('invalid', { message: 'This address has just got an account. Open the link again.' });
    throw error;
  }
}

async function join(team: Team, account: Account, role: Role, requestId: string): Promise<void> {
  const values = { teamId: team.id, personId: account.id };
  // somebody who is in by now keeps the role that they were given since
  if ((await Membership.count({ where: values })) === 0) await Membership.create({ ...values, role });
  const actor: Actor = { person: account, team, role, requestId };
  await audit(actor, 'person.joined', { type: 'person', id: account.id }, { role });
}

const waitingIn = (actor: Actor) => ({ purpose: 'join' as const, teamId: actor.team.id, usedAt: null });

function roleOf(link: MailLink): Role {
  if (!link.role) throw new Error('An invitation without a role: the schema forbids it.');
  return link.role;
}
