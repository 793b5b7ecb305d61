import { existsSync } from 'node:fs';
import { join } from 'node:path';
import compression from 'compression';
import express, { type Express, Router } from 'express';
import helmet from 'helmet';
import pg from 'pg';
import type { Config } from './config';
import { refuseCrossSite } from './middleware/crossSite';
import { answerError, answerNotFound } from './middleware/errors';
import { openLimits } from './middleware/limits';
import { type Log, requestLog } from './middleware/log';
import './middleware/request';
import { signInLayers } from './middleware/signIn';
import { allRoutes, unanswered } from './routes/all';
import { healthRoutes } from './routes/health';
import { LiveHub } from './routes/liveHub';
import { serveMedia } from './routes/media';
import { openApiDocument } from './routes/openapi';
import { store } from './services/context';

export type App = { express: Express; close(): Promise<void> };

/** The web process without its listener; the database and the services are connected before. */
export async function createApp(config: Config, log: Log): Promise<App> {
  const missing = unanswered();
  if (missing.length > 0) throw new Error(`No route answers: ${missing.join(', ')}.`);

  const pool = new pg.Pool({ connectionString: config.databaseUrl, max: 4 });
  pool.on('error', (error) => log.warn({ err: error }, 'sign-in pool'));
  const hub = new LiveHub(config.databaseUrl, log);
  await hub.listen();
  const rateLimits = openLimits(pool);

  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustedProxies);
  app.set('query parser', 'simple');
  app.locals.liveHub = hub;
  app.locals.publicUrl = config.publicUrl;

  app.use(requestLog(log));
  app.use(securityHeaders(config));
  app.use(healthRoutes(config.metricsToken));
  app.get('/m/:expiry/:signature/:teamId/:ownerId/:name', serveMedia(config.mediaSecret));
  app.use(
    compression({ filter: (req, res) => req.headers.accept !== 'text/event-stream' && compression.filter(req, res) }),
  );

  const api = Router();
  const openApi = openApiDocument();
  api.get('/openapi.json', (_req, res) => {
    res.json(openApi);
  });
  api.use(refuseCrossSite(config.publicUrl));
  api.use(signInLayers(config, pool, rateLimits));
  for (const route of allRoutes) route.mount(api, rateLimits);
  api.use(answerNotFound);
  app.use('/api', api);

  serveClient(app, config.clientDir);
  app.use(answerNotFound);
  app.use(answerError);

  return {
    express: app,
    async close() {
      await hub.close();
      await pool.end();
    },
  };
}

function securityHeaders(config: Config) {
  const storeOrigin = store().publicOrigin;
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'"],
        // sizes and positions that code computes
        styleSrcAttr: ["'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        mediaSrc: ["'self'", 'blob:'],
        fontSrc: ["'self'", 'data:'],
        workerSrc: ["'self'", 'blob:'],
        connectSrc: ["'self'", ...(storeOrigin ? [storeOrigin] : [])],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
      },
    },
    // ASVS 5.0 3.4.1: at least a year; on http it would be ignored
    strictTransportSecurity: config.https ? { maxAge: 31_536_000, includeSubDomains: true } : false,
    referrerPolicy: { policy: 'no-referrer' },
    crossOriginResourcePolicy: { policy: 'same-origin' },
  });
}

/** The built client: files with a hash in their name for ever, the page itself asked for anew. */
function serveClient(app: Express, dir: string | undefined): void {
  if (!dir || !existsSync(join(dir, 'index.html'))) return;
  app.use(
    '/assets',
    express.static(join(dir, 'assets'), { immutable: true, maxAge: '1y', fallthrough: false, index: false }),
  );
  app.use(express.static(dir, { index: false, maxAge: '1h', redirect: false, dotfiles: 'ignore' }));
  app.get(/^\/(?!api\/|m\/|metrics).*/, (req, res, next) => {
    if (!req.accepts('html')) return next();
    res.setHeader('Cache-Control', 'no-cache');
    res.sendFile(join(dir, 'index.html'));
  });
}
