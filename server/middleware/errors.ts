import type { ErrorRequestHandler, RequestHandler } from 'express';
import { AppError } from '../../shared/errors';

type BodyParserError = { type?: string; status?: number };

/** What the platform's own parsers say, in our codes. */
function known(error: unknown): AppError | null {
  if (error instanceof AppError) return error;
  const { type, status } = (error ?? {}) as BodyParserError;
  if (type === 'entity.too.large') return new AppError('tooLarge');
  if (type === 'entity.parse.failed') return new AppError('invalid', { message: 'The request’s body is no JSON.' });
  if (type === 'encoding.unsupported' || type === 'charset.unsupported') return new AppError('wrongType');
  if (error instanceof URIError) return new AppError('notFound');
  // the files of the client: what is not there, or hidden, or asked for behind its end
  if (status === 404 || status === 403) return new AppError('notFound');
  if (status === 416) return new AppError('rangeNotSatisfiable');
  // a body that is shorter than announced, or packed and broken; a condition that no file of ours meets
  if (status !== undefined && status >= 400 && status < 500)
    return new AppError('invalid', { message: 'The request arrived broken.' });
  if (unstorable.has(databaseCode(error) ?? '')) return new AppError('invalid', { message: 'Plain text only.' });
  return null;
}

/** PostgreSQL's text holds no NUL and its JSON no half of a character: 22021, 22P05, 22P02. */
const unstorable = new Set(['22021', '22P05', '22P02']);

/** PostgreSQL's code, also inside Sequelize's own error. */
function databaseCode(error: unknown): string | undefined {
  const { code, original } = (error ?? {}) as { code?: string; original?: { code?: string } };
  return original?.code ?? code;
}

/** The one place where an error becomes an answer. */
export const answerError: ErrorRequestHandler = (error, req, res, next) => {
  // not `req.destroyed`, which is also true of a request that was read to its end
  const gone = req.socket.destroyed || (error as BodyParserError | null)?.type === 'request.aborted';
  if (gone && !(error instanceof AppError)) {
    // a client that went away is not an error
    res.destroy();
    return;
  }
  const refusal = known(error);
  if (!refusal) req.log?.error({ err: error }, 'unexpected');
  if (res.headersSent) {
    next(error);
    return;
  }
  const said = refusal ?? new AppError('broken');
  if (said.retryAfterSeconds !== undefined)
    res.setHeader('Retry-After', String(Math.max(1, Math.ceil(said.retryAfterSeconds))));
  res.setHeader('Cache-Control', 'no-store');
  // a file's own headers are set before it turns out that it cannot be sent
  res.setHeader('Content-Type', 'application/json; charset=utf-8');
  for (const name of ['ETag', 'Last-Modified']) res.removeHeader(name);
  res.status(said.status).json({
    error: {
      code: said.code,
      message: said.message,
      ...(said.fields ? { fields: said.fields } : {}),
      ...(said.current !== undefined ? { current: said.current } : {}),
      requestId: req.requestId,
    },
  });
};

export const answerNotFound: RequestHandler = () => {
  throw new AppError('notFound');
};
