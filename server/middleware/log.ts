import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import { pino } from 'pino';
import { pinoHttp } from 'pino-http';

export type Log = ReturnType<typeof openLog>;

/** One JSON line each; no secrets, no caption text. */
export function openLog(level: string, process: 'web' | 'worker') {
  return pino({ level, base: { process }, redact: ['req.headers.cookie', 'req.headers.authorization'] });
}

const idPattern = /^[A-Za-z0-9-]{8,64}$/;

/** Gives each request an id (a balancer's own, where it sent a fitting one) and writes one line for it. */
export function requestLog(log: Log): RequestHandler {
  return pinoHttp({
    logger: log,
    genReqId: (req, res) => {
      const given = req.headers['x-request-id'];
      const id = typeof given === 'string' && idPattern.test(given) ? given : randomUUID();
      (req as unknown as { requestId: string }).requestId = id;
      res.setHeader('X-Request-Id', id);
      return id;
    },
    serializers: {
      // the path alone: queries hold what people search for, media paths hold signatures
      req: (req) => ({ id: req.id, method: req.method, path: loggedPath(String(req.url)) }),
      res: (res) => ({ status: res.statusCode }),
    },
    customLogLevel: (_req, res, error) => (error || res.statusCode >= 500 ? 'error' : 'info'),
    customSuccessMessage: () => 'answered',
    customErrorMessage: () => 'failed',
  });
}

function loggedPath(url: string): string {
  const path = url.split('?')[0] as string;
  return path.startsWith('/m/') ? path.replace(/^(\/m\/\d+\/)[^/]+/, '$1…') : path;
}
