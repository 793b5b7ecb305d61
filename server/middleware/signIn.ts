import connectPgSimple from 'connect-pg-simple';
import type { Request, RequestHandler, Response } from 'express';
import session from 'express-session';
import passport from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import type pg from 'pg';
import { AppError } from '../../shared/errors';
import { limits } from '../../shared/limits';
import type { Config } from '../config';
import { type Account, accountById, accountWith, sweepSignIns } from '../services/signIns';
import type { Limits } from './limits';

const dayMs = 24 * 60 * 60 * 1000;

/** Sign-in as middleware: the session in PostgreSQL, passport's local strategy, and the end of a sign-in's life. */
export function signInLayers(config: Config, pool: pg.Pool, rateLimits: Limits): RequestHandler[] {
  const Store = connectPgSimple(session);
  return [
    session({
      name: cookieName(config.publicUrl),
      secret: config.sessionSecret,
      store: new Store({ pool, tableName: 'sign_ins', createTableIfMissing: false, pruneSessionInterval: false }),
      resave: false,
      saveUninitialized: false,
      rolling: true,
      cookie: {
        httpOnly: true,
        sameSite: 'lax',
        secure: config.https,
        path: '/',
        maxAge: limits.sessionIdleDays * dayMs,
      },
    }),
    (req, _res, next) => {
      req.accountTries = rateLimits;
      next();
    },
    localPassport().session(),
    endOldSignIn,
  ];
}

/**
 * Over https the prefix binds the cookie to this host (ASVS 5.0 3.3.3). Cookies know no ports: on a machine that runs two of us
 * without https, the name keeps them apart.
 */
function cookieName(publicUrl: string): string {
  const { protocol, port } = new URL(publicUrl);
  return protocol === 'https:' ? '__Host-tapeline' : `tapeline${port ? `-${port}` : ''}`;
}

function localPassport(): passport.PassportStatic {
  passport.use(
    new LocalStrategy(
      { usernameField: 'email', passReqToCallback: true },
      async (req: Request, typed: string, password: string, done) => {
        try {
          done(null, (await accountFor(req, typed, password)) ?? false);
        } catch (error) {
          done(error);
        }
      },
    ),
  );
  passport.serializeUser((user, done) => done(null, user.id));
  passport.deserializeUser(async (id: string, done) => {
    try {
      done(null, (await accountById(id)) ?? false);
    } catch (error) {
      done(error);
    }
  });
  return passport;
}

/** The account that a typed e-mail and password belong to; every try counts. @throws AppError `tooOften` */
export async function accountFor(req: Request, typed: string, password: string): Promise<Account | null> {
  const email = typed.trim().toLowerCase();
  await req.accountTries.takeForAccount(email);
  const account = await accountWith(email, password);
  if (account) await req.accountTries.forgetAccount(email);
  return account;
}

/** ASVS 5.0 7.3: a sign-in ends at the latest after `sessionMaxDays`, however often it is used. */
const endOldSignIn: RequestHandler = (req, _res, next) => {
  const since = req.session?.signedInAt;
  if (req.user && since !== undefined && Date.now() - since > limits.sessionMaxDays * dayMs) {
    req.logout((error) => next(error));
    return;
  }
  next();
};

/** Runs passport's local strategy as a promise. @throws AppError `wrongSignIn`, `tooOften` */
export function checkPassword(req: Request): Promise<Express.User> {
  return new Promise((resolve, reject) => {
    passport.authenticate('local', (error: unknown, user: Express.User | false) => {
      if (error) reject(error);
      else if (!user) reject(new AppError('wrongSignIn'));
      else resolve(user);
    })(req, {} as never, reject);
  });
}

/** Starts a sign-in under a new session id, which passport renews (ASVS 5.0 7.2.4). */
export async function startSignIn(req: Request, user: Express.User): Promise<void> {
  await sweepSignIns();
  await new Promise<void>((resolve, reject) => {
    req.logIn(user, (error) => {
      if (error) return reject(error);
      req.session.signedInAt = Date.now();
      req.session.save((failure) => (failure ? reject(failure) : resolve()));
    });
  });
}

/** Ends this sign-in: its row goes, and the cookie with it. */
export async function endSignIn(req: Request, res: Response): Promise<void> {
  const { secure, path } = req.session.cookie;
  await new Promise<void>((resolve, reject) => req.session.destroy((error) => (error ? reject(error) : resolve())));
  res.clearCookie(cookieName(req.app.locals.publicUrl as string), {
    path,
    httpOnly: true,
    sameSite: 'lax',
    secure: Boolean(secure),
  });
}
