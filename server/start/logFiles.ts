import { mkdirSync, openSync, readFileSync, renameSync, statSync } from 'node:fs';
import path from 'node:path';

/** A log that is larger than this at a start is put aside, and the one before it forgotten. */
const keptBytes = 10 * 1024 * 1024;

/** Opens a process's log for appending. @returns the open file */
export function openLog(dataFolder: string, name: string): number {
  const file = logFile(dataFolder, name);
  mkdirSync(path.dirname(file), { recursive: true });
  if ((statSync(file, { throwIfNoEntry: false })?.size ?? 0) > keptBytes) renameSync(file, `${file}.before`);
  return openSync(file, 'a', 0o600);
}

/** The last lines that a process said. */
export function endOfLog(dataFolder: string, name: string, lines = 15): string {
  try {
    return readFileSync(logFile(dataFolder, name), 'utf8').trimEnd().split('\n').slice(-lines).join('\n');
  } catch {
    return '';
  }
}

const logFile = (dataFolder: string, name: string) => path.join(dataFolder, 'log', `${name}.log`);
