import { timingSafeEqual } from 'node:crypto';
import { Router } from 'express';
import { collectDefaultMetrics, Histogram, Registry } from 'prom-client';
import { AppError } from '../../shared/errors';
import { database } from '../models/database';
import { store } from '../services/context';

/** `/api/health`: the process is up. `/api/ready`: what it needs answers. `/metrics`: behind a token. */
export function healthRoutes(metricsToken: string | undefined): Router {
  const router = Router();
  const registry = new Registry();
  collectDefaultMetrics({ register: registry });
  const seconds = new Histogram({
    name: 'http_request_seconds',
    help: 'Time to answer by method and status',
    labelNames: ['method', 'status'],
    buckets: [0.01, 0.05, 0.1, 0.3, 1, 3, 10],
    registers: [registry],
  });
  router.use((req, res, next) => {
    const end = seconds.startTimer({ method: req.method });
    res.on('finish', () => end({ status: String(res.statusCode) }));
    next();
  });
  router.get('/api/health', (_req, res) => {
    res.json({ up: true });
  });
  router.get('/api/ready', async (_req, res) => {
    const [db, queue, objects] = await Promise.all([
      answers('select 1'),
      answers('select 1 from graphile_worker.jobs limit 1'),
      store().isReachable(),
    ]);
    res.status(db && queue && objects ? 200 : 503).json({ database: db, queue, store: objects });
  });
  router.get('/metrics', async (req, res) => {
    if (!metricsToken || !same(req.get('authorization') ?? '', `Bearer ${metricsToken}`))
      throw new AppError('notFound');
    res.type(registry.contentType).send(await registry.metrics());
  });
  return router;
}

async function answers(sql: string): Promise<boolean> {
  try {
    await database().query(sql);
    return true;
  } catch {
    return false;
  }
}

function same(given: string, wanted: string): boolean {
  const a = Buffer.from(given);
  const b = Buffer.from(wanted);
  return a.length === b.length && timingSafeEqual(a, b);
}
