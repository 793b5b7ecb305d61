export type Owner = { pid: number; born: string; note?: unknown };
export type Held = { describe(note: unknown): void; release(): void };
export function takeLock(folder: string, note?: unknown): { held: Held } | { owner: Owner };
export function ownerOf(folder: string): Owner | undefined;
export function isAlive(owner: Owner): boolean;
export function livingOwnerOf(folder: string): Owner | undefined;
