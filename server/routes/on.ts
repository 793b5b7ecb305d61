import express, { type NextFunction, type Request, type RequestHandler, type Response, type Router } from 'express';
import multer, { MulterError } from 'multer';
import { z } from 'zod';
import {
  type Body,
  type Endpoint,
  type Output,
  type Params,
  paramsOf,
  type Query,
  type RateLimit,
} from '../../shared/contracts/endpoint';
import { AppError, type FieldErrors } from '../../shared/errors';
import { limits as sizeLimits } from '../../shared/limits';
import type { Limits } from '../middleware/limits';
import { type Actor, requireMay } from '../services/actor';
import { actorIn } from '../services/membership';

/** What a handler gets: everything checked and parsed. */
export type Call<E extends Endpoint> = {
  /** of a team's endpoints; reading it on another one is a mistake of ours */
  actor: Actor;
  params: Params<E['path']>;
  query: Query<E>;
  body: Body<E>;
  file: { bytes: Buffer; name: string };
  req: Request;
  res: Response;
};

type Answer<E extends Endpoint> = Promise<Output<E> | undefined> | Output<E> | undefined;

export type Route = { endpoint: Endpoint; mount: (router: Router, limits: Limits) => void };

/**
 * One operation as a visible stack: limit → sign-in → team and role → parse → service → present.
 * A handler that answers by itself (a stream) returns undefined.
 */
export function on<E extends Endpoint>(endpoint: E, handler: (call: Call<E>) => Answer<E>): Route {
  return {
    endpoint,
    mount(router, limits) {
      router[endpoint.method](
        endpoint.path,
        limits.layer(endpoint.limit ?? defaultLimit(endpoint)),
        signedIn(endpoint),
        teamAndRole(endpoint),
        ...(endpoint.file ? [oneFile(endpoint.file.maxBytes)] : [jsonOnly, readJson]),
        answer(endpoint, handler),
      );
    },
  };
}

const defaultLimit = (endpoint: Endpoint): RateLimit => (endpoint.method === 'get' ? 'read' : 'write');

function signedIn(endpoint: Endpoint): RequestHandler {
  return (req, _res, next) => next(endpoint.may === 'anyone' || req.user ? undefined : new AppError('signInFirst'));
}

function teamAndRole(endpoint: Endpoint): RequestHandler {
  const { may } = endpoint;
  if (may === 'anyone' || may === 'signedIn') return (_req, _res, next) => next();
  return async (req, _res, next) => {
    req.actor = await actorIn(String(req.params.team), req.user as Express.User, req.requestId);
    requireMay(req.actor, may);
    next();
  };
}

const jsonOnly: RequestHandler = (req, _res, next) => {
  const hasBody = req.headers['transfer-encoding'] !== undefined || Number(req.headers['content-length'] ?? 0) > 0;
  next(
    hasBody && !req.is('application/json')
      ? new AppError('wrongType', { message: 'Send the request’s body as application/json.' })
      : undefined,
  );
};

/** After limit, sign-in and role, so that nobody has megabytes read who may not send them. */
const readJson = express.json({ limit: sizeLimits.jsonBytes });

/** multer drains a body that is too large before it says so: the announced length is looked at first. */
function oneFile(maxBytes: number): RequestHandler {
  const read = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: maxBytes, files: 1, fields: 20, fieldSize: 100_000, parts: 22 },
    defParamCharset: 'utf8',
  }).single('file');
  const roomForFields = 64 * 1024;
  return (req, res, next) => {
    if (!req.is('multipart/form-data'))
      return next(new AppError('wrongType', { message: 'Send the file as multipart/form-data.' }));
    if (Number(req.headers['content-length'] ?? 0) > maxBytes + roomForFields) return next(tooLargeFile(maxBytes));
    read(req, res, (error: unknown) => {
      if (error instanceof MulterError)
        return next(
          error.code === 'LIMIT_FILE_SIZE'
            ? tooLargeFile(maxBytes)
            : new AppError('invalid', { fields: { file: 'Send one file, in the field “file”.' } }),
        );
      if (error) return next(new AppError('invalid', { message: 'The upload arrived broken. Try again.' }));
      next(req.file ? undefined : new AppError('invalid', { fields: { file: 'Choose a file.' } }));
    });
  };
}

const tooLargeFile = (maxBytes: number) =>
  new AppError('tooLarge', {
    message: `At most ${Math.floor(maxBytes / 1024 / 1024)} MB fit here. Choose a smaller file.`,
  });

function answer<E extends Endpoint>(endpoint: E, handler: (call: Call<E>) => Answer<E>): RequestHandler {
  return async (req: Request, res: Response, _next: NextFunction) => {
    const call = {
      params: readParams(endpoint, req),
      query: endpoint.query ? parse(endpoint.query, req.query) : undefined,
      body: endpoint.body ? parse(endpoint.body, req.body ?? {}) : undefined,
      file: req.file ? { bytes: req.file.buffer, name: req.file.originalname } : undefined,
      actor: req.actor,
      req,
      res,
    } as unknown as Call<E>;
    const answered = await handler(call);
    if (answered === undefined || res.headersSent) return;
    res.status(endpoint.status ?? 200);
    res.setHeader('Cache-Control', 'no-store');
    if (endpoint.answers === 'text/vtt') res.type('text/vtt; charset=utf-8').send(answered);
    else res.json(answered);
  };
}

const uuid = z.uuid();

/** An id that is none cannot be found. */
function readParams(endpoint: Endpoint, req: Request): Record<string, string> {
  const params: Record<string, string> = {};
  for (const name of paramsOf(endpoint.path)) {
    const value = String(req.params[name] ?? '');
    if (name.endsWith('Id') && !uuid.safeParse(value).success) throw new AppError('notFound');
    params[name] = name.endsWith('Id') ? value.toLowerCase() : value;
  }
  return params;
}

function parse(schema: z.ZodType, value: unknown): unknown {
  const read = schema.safeParse(value);
  if (read.success) return read.data;
  const fields: FieldErrors = {};
  for (const issue of read.error.issues) {
    const path = issue.path.join('.') || 'body';
    fields[path] ??= issue.message;
  }
  throw new AppError('invalid', { fields });
}
