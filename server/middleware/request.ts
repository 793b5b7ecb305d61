import type { Request } from 'express';
import type { Actor } from '../services/actor';

/** What the layers of the stack leave on a request for the next one. */
declare module 'express-serve-static-core' {
  interface Request {
    requestId: string;
    actor?: Actor;
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
    interface User {
      id: string;
      name: string;
      email: string;
      noticeReadAt: Date | null;
    }
  }
}

export type SignedInRequest = Request & { user: Express.User };
