/** Every way in which the product says no: a stable code, its HTTP status, and a sentence for people. */
export const errorCodes = {
  invalid: [400, 'Some of what was sent does not fit. Check the marked fields.'],
  signInFirst: [401, 'Sign in first.'],
  wrongSignIn: [401, 'E-mail and password do not belong together.'],
  notAllowed: [403, 'Your role in this team does not allow this.'],
  crossSite: [403, 'This request came from another site and was refused.'],
  notFound: [404, 'There is nothing here, or it is not yours to see.'],
  linkUsed: [404, 'This link was used already, or its time is over. Ask for a new one.'],
  stale: [409, 'Somebody saved a newer version while you were writing. Compare the two and decide.'],
  nameTaken: [409, 'This name is taken.'],
  inUse: [409, 'This is still in use.'],
  alreadyMember: [409, 'This person is in the team already.'],
  lastOwner: [409, 'A team needs an owner. Make somebody else owner first.'],
  notReady: [409, 'This is not ready yet. Try again when it is.'],
  uploadIncomplete: [409, 'Parts of the upload are missing.'],
  tooLarge: [413, 'This is too large.'],
  wrongType: [415, 'This kind of file is not taken here.'],
  badFile: [400, 'This file cannot be used.'],
  rangeNotSatisfiable: [416, 'The recording has no such part.'],
  tooOften: [429, 'Too many tries. Wait a little and try again.'],
  broken: [500, 'Something broke on our side. It was noted; try again.'],
  unavailable: [503, 'A part of Tapeline does not answer right now. Try again in a moment.'],
} as const satisfies Record<string, readonly [number, string]>;

export type ErrorCode = keyof typeof errorCodes;

export type FieldErrors = Record<string, string>;

type Extra = {
  /** a sentence that says more than the code's own */
  message?: string;
  fields?: FieldErrors;
  /** with `stale`: the current state, presented as the endpoint's response would be */
  current?: unknown;
  /** with `tooOften`: seconds until the next try */
  retryAfterSeconds?: number;
};

export class AppError extends Error {
  readonly status: number;
  readonly fields: FieldErrors | undefined;
  readonly current: unknown;
  readonly retryAfterSeconds: number | undefined;

  constructor(
    readonly code: ErrorCode,
    extra: Extra = {},
  ) {
    super(extra.message ?? errorCodes[code][1]);
    this.name = 'AppError';
    this.status = errorCodes[code][0];
    this.fields = extra.fields;
    this.current = extra.current;
    this.retryAfterSeconds = extra.retryAfterSeconds;
  }
}
