import type { Request } from 'express';
import {
  acceptInvitation,
  changePassword,
  forgotPassword,
  type Me,
  readInvitation,
  readNotice,
  renameMe,
  resetPassword,
  signIn,
  signOut,
  signOutEverywhere,
  whoAmI,
} from '../../shared/contracts/account';
import { AppError } from '../../shared/errors';
import { accountFor, checkPassword, endSignIn, startSignIn } from '../middleware/signIn';
import * as accounts from '../services/accounts';
import * as invitations from '../services/invitations';
import { type Account, endSignInsOf } from '../services/signIns';
import { on, type Route } from './on';

export const accountRoutes: Route[] = [
  on(whoAmI, async ({ req }) => ({ me: req.user ? await presentMe(req.user) : null })),

  on(signIn, async ({ req }) => {
    const account = await checkPassword(req);
    await startSignIn(req, account);
    return { me: await presentMe(account) };
  }),

  on(signOut, async ({ req, res }) => {
    await endSignIn(req, res);
    return {};
  }),

  on(signOutEverywhere, async ({ req, res }) => {
    await endSignInsOf(signedIn(req).id);
    await endSignIn(req, res);
    return {};
  }),

  on(readNotice, async ({ req }) => ({ me: await presentMe(await accounts.readNotice(signedIn(req))) })),

  on(renameMe, async ({ req, body }) => ({
    me: await presentMe(await accounts.rename(signedIn(req), body.name, req.requestId)),
  })),

  on(changePassword, async ({ req, body }) => {
    const account = signedIn(req);
    // ASVS 5.0 6.2.3
    if (!(await accountFor(req, account.email, body.current)))
      throw new AppError('invalid', { fields: { current: 'This is not your present password.' } });
    await accounts.changePassword(account, body.password, req.requestId);
    await startSignIn(req, account);
    return {};
  }),

  on(forgotPassword, async ({ req, body }) => {
    await req.accountTries.takeForMailbox(body.email);
    await accounts.forgotPassword(body.email);
    return {};
  }),

  on(resetPassword, async ({ req, body }) => {
    await accounts.resetPassword(body.secret, body.password, req.requestId);
    return {};
  }),

  on(readInvitation, async ({ body }) => presentInvitation(await invitations.readInvitation(body.secret))),

  on(acceptInvitation, async ({ req, body }) => {
    const invitation = await invitations.readInvitation(body.secret);
    const account = invitation.person?.passwordHash
      ? await joinWithAccount(req, invitation, body.password)
      : await invitations.joinAsNew(invitation, { name: body.name, password: body.password }, req.requestId);
    await startSignIn(req, account);
    return { me: await presentMe(account), teamSlug: invitation.team.slug };
  }),
];

async function joinWithAccount(req: Request, invitation: invitations.Invitation, password: string): Promise<Account> {
  const account = await accountFor(req, invitation.link.email, password);
  if (!account) throw new AppError('wrongSignIn');
  await invitations.joinWithAccount(invitation, account, req.requestId);
  return account;
}

function signedIn(req: Request): Account {
  if (!req.user) throw new AppError('signInFirst');
  return req.user;
}

async function presentMe(account: Account): Promise<Me> {
  const teams = await accounts.teamsOf(account.id);
  return {
    id: account.id,
    name: account.name,
    email: account.email,
    noticeReadAt: account.noticeReadAt?.toISOString() ?? null,
    teams: teams.map(({ slug, name, role }) => ({ slug, name, role })),
  };
}

function presentInvitation({ team, link, role, person }: invitations.Invitation) {
  return {
    team: team.name,
    email: link.email,
    name: person?.name ?? link.name,
    role,
    hasAccount: Boolean(person?.passwordHash),
  };
}
