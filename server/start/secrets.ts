import { randomBytes } from 'node:crypto';
import { readFileSync, renameSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';

const Secrets = z.object({
  SESSION_SECRET: z.string().min(32),
  MEDIA_SECRET: z.string().min(32),
  S3_ACCESS_KEY_ID: z.string().min(1),
  S3_SECRET_ACCESS_KEY: z.string().min(32),
});
export type Secrets = z.infer<typeof Secrets>;

/** This folder's own secrets, made once and kept for its owner alone: with others every sign-in would end. */
export function secretsIn(dataFolder: string): Secrets {
  const file = path.join(dataFolder, 'secrets.json');
  const kept = Secrets.safeParse(readIfThere(file));
  if (kept.success) return kept.data;
  const secret = () => randomBytes(32).toString('base64url');
  const made: Secrets = {
    SESSION_SECRET: secret(),
    MEDIA_SECRET: secret(),
    S3_ACCESS_KEY_ID: `local${randomBytes(6).toString('hex')}`,
    S3_SECRET_ACCESS_KEY: secret(),
  };
  writeFileSync(`${file}.new`, `${JSON.stringify(made, null, 2)}\n`, { mode: 0o600 });
  renameSync(`${file}.new`, file);
  return made;
}

function readIfThere(file: string): unknown {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}
