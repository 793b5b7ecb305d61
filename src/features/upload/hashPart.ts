import type { HashAnswer, HashQuestion } from './hash.worker';

/** The file on the device is not what it was when it was chosen. */
export class UnreadableFile extends Error {
  constructor() {
    super('The file can no longer be read: it was moved, changed or removed on this device. Choose it again.');
    this.name = 'UnreadableFile';
  }
}

type Waiting = { resolve: (sha256: string) => void; reject: (error: Error) => void };

let worker: Worker | null = null;
let lastId = 0;
const waiting = new Map<number, Waiting>();

/**
 * The SHA-256 of a part, in base64, worked out beside the page so that it stays responsive.
 * @throws UnreadableFile
 */
export function hashPart(bytes: Blob): Promise<string> {
  worker ??= openWorker();
  const question: HashQuestion = { id: ++lastId, bytes };
  return new Promise((resolve, reject) => {
    waiting.set(question.id, { resolve, reject });
    worker?.postMessage(question);
  });
}

function openWorker(): Worker {
  const opened = new Worker(new URL('./hash.worker.ts', import.meta.url), { type: 'module' });
  opened.addEventListener('message', ({ data }: MessageEvent<HashAnswer>) => {
    const asked = waiting.get(data.id);
    waiting.delete(data.id);
    if ('sha256' in data) asked?.resolve(data.sha256);
    else asked?.reject(new UnreadableFile());
  });
  opened.addEventListener('error', () => {
    const fault = new Error('The part of the page that checks files did not start. Load the page again.');
    for (const { reject } of waiting.values()) reject(fault);
    waiting.clear();
    opened.terminate();
    worker = null;
  });
  return opened;
}
