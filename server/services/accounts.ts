import { setTimeout as wait } from 'node:timers/promises';
import type { Role } from '../../shared/domain/words';
import { AppError } from '../../shared/errors';
import { limits } from '../../shared/limits';
import { newPasswordMessage, passwordChangedMessage } from '../mail/messages';
import { inTransaction } from '../models/database';
import { AuditEvent, MailLink, Membership, Person, Team } from '../models/people';
import { publicUrl } from './context';
import { findLink, linkAddress, makeLink, postMail, takeLink } from './mailLinks';
import { passwordFault } from './passwordRules';
import { hashPassword } from './passwords';
import { type Account, accountOf, endSignInsOf } from './signIns';

export type TeamOfMine = { slug: string; name: string; role: Role };

/** The teams that a person is in, by name. */
export async function teamsOf(personId: string): Promise<TeamOfMine[]> {
  const memberships = await Membership.findAll({
    where: { personId },
    include: [{ model: Team, as: 'team', required: true }],
  });
  return memberships
    .map((membership) => {
      const { team } = membership as unknown as { team: Team };
      return { slug: team.slug, name: team.name, role: membership.role };
    })
    .toSorted((a, b) => a.name.localeCompare(b.name) || a.slug.localeCompare(b.slug));
}

/** Notes that the first-use notice was read; the first time counts. */
export async function readNotice(account: Account): Promise<Account> {
  await Person.update({ noticeReadAt: new Date() }, { where: { id: account.id, noticeReadAt: null } });
  return accountOf(await personOf(account));
}

export function rename(account: Account, name: string, requestId: string): Promise<Account> {
  return inTransaction(async () => {
    const person = await personOf(account);
    const from = person.name;
    await person.update({ name });
    await auditAccount(person, 'account.renamed', requestId, { from, to: name });
    return accountOf(person);
  });
}

/**
 * Sets another password and ends every sign-in of the person, the present one included; whoever asked for the present
 * one before starts a new one.
 * @throws AppError `invalid` for a password that is easy to guess
 */
export async function changePassword(account: Account, password: string, requestId: string): Promise<void> {
  const person = await personOf(account);
  const passwordHash = await hashNewPassword(password, await ownWordsOf(person));
  await inTransaction(() => setPassword(person, passwordHash, requestId));
}

/** how long an answer takes at least: longer than making the link does, so that time doesn't tell whether there is one */
const forgotMs = 300;

/**
 * Sends a link for a new password where the address has an account; an older one stops working.
 * ASVS 5.0 6.3.8: answer and time are the same where there is none.
 */
export async function forgotPassword(email: string): Promise<void> {
  await Promise.all([sendNewPasswordLink(email), wait(forgotMs)]);
}

async function sendNewPasswordLink(email: string): Promise<void> {
  await inTransaction(async () => {
    // locked, so that two requests at once leave one link
    const person = await Person.findOne({ where: { email }, lock: true });
    if (!person) return;
    await MailLink.destroy({ where: { purpose: 'reset', personId: person.id } });
    const { secret } = await makeLink({
      purpose: 'reset',
      personId: person.id,
      email,
      expiresAt: new Date(Date.now() + limits.resetMinutes * 60_000),
    });
    const link = linkAddress('new-password', secret);
    await postMail(newPasswordMessage({ to: email, name: person.name, link, minutes: limits.resetMinutes }));
  });
}

/**
 * Sets a new password with the link from a mail; signs out everywhere. A refused password leaves the link as it is.
 * @throws AppError `linkUsed`, or `invalid` for a password that is easy to guess
 */
export async function resetPassword(secret: string, password: string, requestId: string): Promise<void> {
  const link = await findLink(secret, 'reset');
  const person = link.personId ? await Person.findByPk(link.personId) : null;
  if (!person) throw new AppError('linkUsed');
  const passwordHash = await hashNewPassword(password, await ownWordsOf(person));
  await inTransaction(async () => {
    await takeLink(link);
    await setPassword(person, passwordHash, requestId);
  });
}

/** @param own what the person is known by. @throws AppError `invalid` for a password that is easy to guess */
export function hashNewPassword(password: string, own: readonly string[]): Promise<string> {
  const fault = passwordFault(password, own);
  if (fault) throw new AppError('invalid', { fields: { password: fault } });
  return hashPassword(password);
}

async function setPassword(person: Person, passwordHash: string, requestId: string): Promise<void> {
  await person.update({ passwordHash });
  await endSignInsOf(person.id);
  await MailLink.destroy({ where: { purpose: 'reset', personId: person.id, usedAt: null } });
  await auditAccount(person, 'account.passwordChanged', requestId);
  // ASVS 5.0 6.3.7: a change of credentials is told
  await postMail(
    passwordChangedMessage({ to: person.email, name: person.name, link: `${publicUrl()}/forgot-password` }),
  );
}

const ownWordsOf = async (person: Person) => [
  person.email,
  person.name,
  ...(await teamsOf(person.id)).map((team) => team.name),
];

async function personOf(account: Account): Promise<Person> {
  const person = await Person.findByPk(account.id);
  if (!person) throw new AppError('signInFirst');
  return person;
}

/** An account is no team's: its changes are kept beside every team's trail. */
async function auditAccount(person: Person, action: string, requestId: string, details: Record<string, unknown> = {}) {
  await AuditEvent.create({
    teamId: null,
    actorId: person.id,
    action,
    subjectType: 'person',
    subjectId: person.id,
    details,
    requestId,
  });
}
