import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';
import passport from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import type pg from 'pg';
import { AppError } from '../../shared/errors';
import { limits } from '../../shared/limits';
import type { Config } from '../config';
import { Person } from '../models/people';
import { passwordFits } from '../services/passwords';
import type { Limits } from './limits';

const dayMs = 24 * 60 * 60 * 1000;

/** Sign-in as middleware: the session in PostgreSQL, passport's local strategy, and the end of a sign-in's life. */
export function signInLayers(config: Config, pool: pg.Pool, rateLimits: Limits): RequestHandler[] {
  const Store = connectPgSimple(session);
  return [
    session({
      // ASVS 5.0 3.3.3: the prefix binds the cookie to this host over https
      name: cookieName(config.https),
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
    localPassport(rateLimits).session(),
    endOldSignIn,
  ];
}

export const cookieName = (isHttps: boolean): string => (isHttps ? '__Host-tapeline' : 'tapeline');

function localPassport(rateLimits: Limits): passport.PassportStatic {
  passport.use(
    new LocalStrategy({ usernameField: 'email' }, async (typed, password, done) => {
      try {
        const email = typed.trim().toLowerCase();
        await rateLimits.takeForAccount(email);
        const person = await Person.findOne({ where: { email } });
        // ASVS 5.0 6.3.8: an unknown address costs the same time and gets the same answer
        const fits = await passwordFits(person?.passwordHash ?? null, password);
        if (!person || !fits) return done(null, false);
        await rateLimits.forgetAccount(email);
        return done(null, asUser(person));
      } catch (error) {
        return done(error);
      }
    }),
  );
  passport.serializeUser((user, done) => done(null, user.id));
  passport.deserializeUser(async (id: string, done) => {
    try {
      const person = await Person.findByPk(id);
      done(null, person ? asUser(person) : false);
    } catch (error) {
      done(error);
    }
  });
  return passport;
}

const asUser = (person: Person): Express.User => ({
  id: person.id,
  name: person.name,
  email: person.email,
  noticeReadAt: person.noticeReadAt,
});

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
export function checkPassword(req: Parameters<RequestHandler>[0]): Promise<Express.User> {
  return new Promise((resolve, reject) => {
    passport.authenticate('local', (error: unknown, user: Express.User | false) => {
      if (error) reject(error);
      else if (!user) reject(new AppError('wrongSignIn'));
      else resolve(user);
    })(req, {} as never, reject);
  });
}

/** Starts a sign-in under a new session id, which passport renews (ASVS 5.0 7.2.4). */
export function startSignIn(req: Parameters<RequestHandler>[0], user: Express.User): Promise<void> {
  return new Promise((resolve, reject) => {
    req.logIn(user, (error) => {
      if (error) return reject(error);
      req.session.signedInAt = Date.now();
      req.session.save((failure) => (failure ? reject(failure) : resolve()));
    });
  });
}

export function endSignIn(req: Parameters<RequestHandler>[0]): Promise<void> {
  return new Promise((resolve, reject) => req.session.destroy((error) => (error ? reject(error) : resolve())));
}
