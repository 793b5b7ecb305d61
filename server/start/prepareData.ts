import { spawn } from 'node:child_process';
import { z } from 'zod';
import { CannotStart } from './cannotStart.mjs';

const Prepared = z.object({
  seeded: z.boolean(),
  signIns: z.array(z.object({ role: z.string(), email: z.string(), password: z.string() })),
});
export type SignIn = z.infer<typeof Prepared>['signIns'][number];

/** Migrates and seeds in a process of its own, which reads the whole environment as the others do. */
export function prepareData(
  args: string[],
  env: Record<string, string | undefined>,
  signal: AbortSignal,
): Promise<SignIn[]> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, args, {
      env,
      detached: true,
      signal,
      stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
    });
    let signIns: SignIn[] = [];
    let said = '';
    const keep = (chunk: Buffer) => {
      said = (said + chunk).slice(0, 2000);
    };
    child.stdout?.on('data', keep);
    child.stderr?.on('data', keep);
    child.on('message', (message) => {
      signIns = Prepared.parse(message).signIns;
    });
    child.once('error', reject);
    child.once('close', (code, ended) => {
      if (code === 0) resolve(signIns);
      else reject(new CannotStart(`Preparing the database ended with ${ended ?? code}:\n${said}`));
    });
  });
}
