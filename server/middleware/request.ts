import type { Request } from 'express';
import type { Actor } from '../services/actor';
import type { Account } from '../services/signIns';
import type { Limits } from './limits';

/** What the layers of the stack leave on a request for the next one. */
declare module 'express-serve-static-core' {
  interface Request {
    requestId: string;
    actor?: Actor;
    /** counts the tries at one account's password */
    accountTries: Limits;
  }
}

declare module 'express-session' {
  interface SessionData {
    /** when the sign-in was made, ms; it ends for good some time later */
    signedInAt: number;
  }
}

declare global {
  namespace Express {
    interface User extends Account {}
  }
}

export type SignedInRequest = Request & { user: Express.User };
