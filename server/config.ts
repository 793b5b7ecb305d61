import { z } from 'zod';

/** The environment, parsed once at boot; a wrong value stops the process with one clear line. Secrets have no defaults. */
const Environment = z.object({
  NODE_ENV: z.enum(['development', 'production', 'test']).default('production'),
  HOST: z.string().default('127.0.0.1'),
  PORT: z.coerce.number().int().min(0).max(65535).default(4310),
  /** where browsers reach the product; decides on secure cookies and on the links in mail */
  PUBLIC_URL: z.url({ protocol: /^https?$/ }).optional(),
  /** how many balancers stand in front, so that addresses are counted right */
  TRUSTED_PROXIES: z.coerce.number().int().min(0).max(10).default(0),
  DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }),
  DATABASE_POOL: z.coerce.number().int().min(1).max(100).default(10),
  S3_ENDPOINT: z.url({ protocol: /^https?$/ }).optional(),
  /** where browsers reach the store, when that is another address */
  S3_PUBLIC_ENDPOINT: z.url({ protocol: /^https?$/ }).optional(),
  S3_REGION: z.string().min(1).default('us-east-1'),
  S3_BUCKET: z.string().min(3),
  S3_ACCESS_KEY_ID: z.string().min(1),
  S3_SECRET_ACCESS_KEY: z.string().min(1),
  SMTP_URL: z.url({ protocol: /^smtps?$/ }),
  MAIL_FROM: z.string().min(3).default('Tapeline <tapeline@localhost>'),
  SESSION_SECRET: z.string().min(32, 'at least 32 characters'),
  MEDIA_SECRET: z.string().min(32, 'at least 32 characters'),
  METRICS_TOKEN: z.string().min(16).optional(),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  /** jobs at once in one worker process; ffmpeg takes a core each */
  WORKER_JOBS: z.coerce.number().int().min(1).max(32).default(2),
  CLIENT_DIR: z.string().optional(),
});

export type Config = ReturnType<typeof readConfig>;

/** @throws Error with one line that names each wrong variable */
export function readConfig(env: Record<string, string | undefined>) {
  const given = Object.fromEntries(Object.entries(env).filter(([, value]) => value !== undefined && value !== ''));
  const read = Environment.safeParse(given);
  if (!read.success) {
    const faults = read.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`Configuration: ${faults.join('; ')}`);
  }
  const e = read.data;
  const publicUrl = (e.PUBLIC_URL ?? `http://${e.HOST}:${e.PORT}`).replace(/\/+$/, '');
  return {
    production: e.NODE_ENV === 'production',
    host: e.HOST,
    port: e.PORT,
    publicUrl,
    https: publicUrl.startsWith('https:'),
    trustedProxies: e.TRUSTED_PROXIES,
    databaseUrl: e.DATABASE_URL,
    databasePool: e.DATABASE_POOL,
    store: {
      endpoint: e.S3_ENDPOINT,
      publicEndpoint: e.S3_PUBLIC_ENDPOINT ?? e.S3_ENDPOINT,
      region: e.S3_REGION,
      bucket: e.S3_BUCKET,
      accessKeyId: e.S3_ACCESS_KEY_ID,
      secretAccessKey: e.S3_SECRET_ACCESS_KEY,
    },
    mail: { url: e.SMTP_URL, from: e.MAIL_FROM },
    sessionSecret: e.SESSION_SECRET,
    mediaSecret: e.MEDIA_SECRET,
    metricsToken: e.METRICS_TOKEN,
    logLevel: e.LOG_LEVEL,
    workerJobs: e.WORKER_JOBS,
    clientDir: e.CLIENT_DIR,
  };
}

export type StoreConfig = Config['store'];
