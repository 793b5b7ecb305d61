import { z } from 'zod';
import { Id, Instant, shortText } from '../domain/values';
import { roles } from '../domain/words';
import { limits } from '../limits';
import { endpoint, Nothing } from './endpoint';

export const Email = z
  .string()
  .trim()
  .toLowerCase()
  .max(254)
  .pipe(z.email('Write an e-mail address, like name@example.org.'));

/** ASVS 5.0 6.2.5: no composition rules; 6.2.8: nothing is trimmed or cut. */
export const NewPassword = z
  .string()
  .min(limits.passwordMin, `At least ${limits.passwordMin} characters; a few words in a row are good.`)
  .max(limits.passwordMax, `At most ${limits.passwordMax} characters.`);

export const PersonName = shortText(80);

export const TeamOfMine = z.object({ slug: z.string(), name: z.string(), role: z.enum(roles) });

export const Me = z.object({
  id: Id,
  name: z.string(),
  email: z.string(),
  /** null until the first-use notice was read */
  noticeReadAt: Instant.nullable(),
  teams: z.array(TeamOfMine),
});
export type Me = z.infer<typeof Me>;

export const whoAmI = endpoint({
  method: 'get',
  path: '/me',
  may: 'anyone',
  summary: 'Who is signed in, with their teams; null when nobody is',
  response: z.object({ me: Me.nullable() }),
});

export const signIn = endpoint({
  method: 'post',
  path: '/sign-in',
  may: 'anyone',
  summary: 'Sign in with e-mail and password',
  limit: 'signIn',
  body: z.object({ email: z.string().max(254), password: z.string().max(limits.passwordMax) }),
  response: z.object({ me: Me }),
  errors: ['wrongSignIn', 'tooOften'],
});

export const signOut = endpoint({
  method: 'post',
  path: '/sign-out',
  may: 'anyone',
  summary: 'Sign out here',
  response: Nothing,
});

export const signOutEverywhere = endpoint({
  method: 'post',
  path: '/sign-out-everywhere',
  may: 'signedIn',
  summary: 'Sign out on every device, this one included',
  response: Nothing,
});

export const readNotice = endpoint({
  method: 'post',
  path: '/me/notice-read',
  may: 'signedIn',
  summary: 'The first-use notice was read',
  response: z.object({ me: Me }),
});

export const changePassword = endpoint({
  method: 'post',
  path: '/me/password',
  may: 'signedIn',
  summary: 'Change the password; signs out everywhere else',
  limit: 'signIn',
  body: z.object({ current: z.string().max(limits.passwordMax), password: NewPassword }),
  response: Nothing,
  errors: ['invalid', 'tooOften'],
});

export const renameMe = endpoint({
  method: 'patch',
  path: '/me',
  may: 'signedIn',
  summary: 'Change how one is called',
  body: z.object({ name: PersonName }),
  response: z.object({ me: Me }),
});

export const forgotPassword = endpoint({
  method: 'post',
  path: '/forgot-password',
  may: 'anyone',
  summary: 'Send a link for a new password; answers the same whether the address is known or not',
  limit: 'mail',
  body: z.object({ email: Email }),
  response: Nothing,
  status: 202,
  errors: ['tooOften'],
});

const Secret = z.string().min(20).max(100);

export const resetPassword = endpoint({
  method: 'post',
  path: '/reset-password',
  may: 'anyone',
  summary: 'Set a new password with the link from the mail; signs out everywhere',
  limit: 'signIn',
  body: z.object({ secret: Secret, password: NewPassword }),
  response: Nothing,
  errors: ['linkUsed', 'invalid', 'tooOften'],
});

export const readInvitation = endpoint({
  method: 'post',
  path: '/invitations/read',
  may: 'anyone',
  summary: 'What an invitation is for; the secret is in the body so that no log keeps it',
  limit: 'signIn',
  body: z.object({ secret: Secret }),
  response: z.object({
    team: z.string(),
    email: z.string(),
    name: z.string().nullable(),
    role: z.enum(roles),
    /** the address has an account already: only its password is asked for, no new one is made */
    hasAccount: z.boolean(),
  }),
  errors: ['linkUsed', 'tooOften'],
});

export const acceptInvitation = endpoint({
  method: 'post',
  path: '/invitations/accept',
  may: 'anyone',
  summary: 'Join the team; a new person gives a name and a password, a known one their password',
  limit: 'signIn',
  body: z.object({ secret: Secret, name: PersonName.optional(), password: z.string().max(limits.passwordMax) }),
  response: z.object({ me: Me, teamSlug: z.string() }),
  errors: ['linkUsed', 'invalid', 'wrongSignIn', 'tooOften'],
});
