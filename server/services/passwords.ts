import { hash, verify } from '@node-rs/argon2';

/** OWASP password storage cheat sheet: argon2id, m = 19456 KiB, t = 2, p = 1 (argon2id is the library's default). */
const settings = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

export function hashPassword(password: string): Promise<string> {
  return hash(password, settings);
}

let nobody: Promise<string> | undefined;

/** Whether a password fits; where there is none to compare with, it takes as long and says no. */
export async function passwordFits(passwordHash: string | null, password: string): Promise<boolean> {
  nobody ??= hashPassword('a password that nobody has');
  const fits = await verify(passwordHash ?? (await nobody), password);
  return passwordHash !== null && fits;
}
