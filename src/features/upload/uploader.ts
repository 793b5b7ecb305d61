import { abortUpload } from '../../../shared/contracts/recordings';
import { limits } from '../../../shared/limits';
import { ApiError, call } from '../../lib/api';
import { isLostConnection, isOffline, isPassing, untilDone } from './connection';
import { holdPage } from './holdPage';
import { type SessionChoice, sendFile } from './sendFile';
import { openSlots } from './slots';
import { type Sample, speedOf, withSample } from './speed';
import {
  addUploads,
  changeUpload,
  currentUploads,
  dropUploads,
  isUnderWay,
  subscribeToUploads,
  type Upload,
  uploadOf,
} from './uploadList';
import { fileFault } from './videoFile';

/** Two, so that the second one's first parts fill the gap that the first one's last parts leave. */
const files = openSlots(2);
const parts = openSlots(limits.partsAtOnce);

/** What an upload needs that no page shows. */
type Source = {
  file: File;
  session: SessionChoice;
  order: number;
  requestKey: string;
  uploadId: string | null;
  stop: AbortController;
  /** the run that is under way; it never rejects */
  run: Promise<void>;
  lostConnection: boolean;
};

const sources = new Map<string, Source>();
let lastOrder = 0;

export type NotTaken = { fileName: string; reason: string };

type From = { personId: string; team: string; session: SessionChoice };

/**
 * Takes files into the queue.
 * @returns those that were not taken, each with a sentence
 */
export function addFiles(picked: readonly File[], { personId, team, session }: From): NotTaken[] {
  const notTaken: NotTaken[] = [];
  for (const file of picked) {
    const reason = insecurePage() ?? fileFault(file) ?? alreadyThere(file, team);
    if (reason !== null) {
      notTaken.push({ fileName: file.name, reason });
      continue;
    }
    const id = crypto.randomUUID();
    sources.set(id, {
      ...{ file, session, order: ++lastOrder, requestKey: id, uploadId: null, lostConnection: false },
      ...{ stop: new AbortController(), run: Promise.resolve() },
    });
    addUploads([{ ...freshUpload, id, personId, team, fileName: file.name, sizeBytes: file.size }]);
    start(id);
  }
  return notTaken;
}

const freshUpload = {
  state: 'queued',
  arrivedBytes: 0,
  bytesPerSecond: null,
  connection: 'there',
  recordingId: null,
  fault: null,
} as const satisfies Partial<Upload>;

/** Goes on with an upload that failed: only what is missing is sent. */
export function tryAgain(id: string): void {
  if (uploadOf(id)?.state === 'failed') start(id);
}

/** Gives an upload up. Nothing of it stays; while that cannot be said to the server it stays in the list. */
export async function cancelUpload(id: string): Promise<void> {
  const source = sources.get(id);
  const upload = uploadOf(id);
  if (!source || !upload || upload.state === 'cancelling' || upload.state === 'done') return;
  changeUpload(id, { state: 'cancelling', fault: null });
  source.stop.abort();
  // the announcement may be on its way: what it opened has to be known to be taken back
  await source.run;
  const { uploadId } = source;
  if (uploadId === null) return forget(id);
  try {
    await untilDone(() => call(abortUpload, { team: upload.team, uploadId }), new AbortController().signal);
    forget(id);
  } catch (error) {
    if (error instanceof ApiError && error.code === 'notFound') forget(id);
    else if (error instanceof ApiError && error.code === 'notReady')
      changeUpload(id, { state: 'done', arrivedBytes: upload.sizeBytes });
    else
      changeUpload(id, { state: 'failed', fault: { message: `Not cancelled yet. ${sentence(error)}`, again: true } });
  }
}

/** Takes uploads that are over off the list; what they brought stays. */
export function dismissUploads(ids: readonly string[]): void {
  for (const id of ids) sources.delete(id);
  dropUploads(ids);
}

/** After a change of person: what the last one had chosen is sent no further, and nobody sees it. */
export function keepOnlyUploadsOf(personId: string): void {
  const others = currentUploads().filter((upload) => upload.personId !== personId);
  if (others.length === 0) return;
  for (const { id } of others) sources.get(id)?.stop.abort();
  dismissUploads(others.map(({ id }) => id));
}

function start(id: string): void {
  const source = sources.get(id);
  if (!source) return;
  source.stop = new AbortController();
  source.lostConnection = false;
  changeUpload(id, { state: 'queued', fault: null, bytesPerSecond: null });
  source.run = files.hold(source.order, source.stop.signal, () => run(id, source)).catch(() => undefined);
}

async function run(id: string, source: Source): Promise<void> {
  const upload = uploadOf(id);
  if (!upload) return;
  const { signal } = source.stop;
  const change = (values: Partial<Upload>) => {
    if (!signal.aborted) changeUpload(id, values);
  };
  change({ state: 'sending', connection: isOffline() ? 'awaited' : 'there' });
  try {
    const progress = progressOf(change);
    const recording = await sendFile({ ...source, team: upload.team }, parts, {
      signal,
      onOpened: (opened) => {
        // noted after a cancel too: it has to be taken back
        source.uploadId = opened.uploadId;
        change({ state: 'sending', recordingId: opened.recordingId });
      },
      onProgress: progress,
      onFinishing: () => change({ state: 'finishing', arrivedBytes: upload.sizeBytes, bytesPerSecond: null }),
    });
    change({ state: 'done', recordingId: recording.id, arrivedBytes: upload.sizeBytes });
  } catch (error) {
    if (signal.aborted) return;
    source.lostConnection = isLostConnection(error);
    if (isOver(error)) Object.assign(source, { uploadId: null, requestKey: crypto.randomUUID() });
    change({ state: 'failed', bytesPerSecond: null, fault: { message: sentence(error), again: canMend(error) } });
  }
}

/** Shows of the progress what an eye can follow. */
function progressOf(change: (values: Partial<Upload>) => void) {
  const everyMs = 250;
  let samples: Sample[] = [];
  let lastMs = 0;
  return (bytes: number) => {
    const atMs = performance.now();
    if (atMs - lastMs < everyMs) return;
    lastMs = atMs;
    // parts that are sent again were not that fast
    if (bytes < (samples.at(-1)?.bytes ?? 0)) samples = [];
    samples = withSample(samples, { atMs, bytes });
    change({ arrivedBytes: bytes, bytesPerSecond: speedOf(samples) });
  };
}

function forget(id: string): void {
  sources.delete(id);
  dropUploads([id]);
}

function alreadyThere(file: File, team: string): string | null {
  const same = currentUploads().find((upload) => {
    const other = sources.get(upload.id)?.file;
    return (
      upload.team === team &&
      other?.name === file.name &&
      other.size === file.size &&
      other.lastModified === file.lastModified
    );
  });
  if (!same) return null;
  if (same.state === 'done') return 'This file was uploaded a moment ago.';
  return same.state === 'failed'
    ? 'This file is in the list already: try it again there.'
    : 'This file is on its way already.';
}

/** Parts are hashed by the browser, which it does on secure pages alone. */
const insecurePage = () =>
  window.isSecureContext ? null : 'Uploading needs a secure address. Open Tapeline at its https address.';

/** The server knows the upload no more, or has ended it: another try starts anew. */
const isOver = (error: unknown) =>
  error instanceof ApiError && (error.code === 'notFound' || error.code === 'notReady');

const canMend = (error: unknown) =>
  isPassing(error) ||
  isOver(error) ||
  (error instanceof ApiError && (error.code === 'uploadIncomplete' || error.code === 'signInFirst'));

function sentence(error: unknown): string {
  if (isLostConnection(error)) return 'The connection was lost. What has arrived is kept.';
  if (isOver(error)) return 'This upload was ended elsewhere. Another try sends the whole file again.';
  return error instanceof Error ? error.message : 'Something broke on this page. Load it again.';
}

/** What stopped for want of a connection goes on when it is back. */
function goOn(): void {
  for (const upload of currentUploads()) {
    if (upload.connection === 'awaited') changeUpload(upload.id, { connection: 'there' });
    if (upload.state === 'failed' && upload.fault?.again && sources.get(upload.id)?.lostConnection) start(upload.id);
  }
}

function waitForConnection(): void {
  for (const upload of currentUploads())
    if (isUnderWay(upload)) changeUpload(upload.id, { connection: 'awaited', bytesPerSecond: null });
}

window.addEventListener('online', goOn);
window.addEventListener('offline', waitForConnection);
subscribeToUploads(() => holdPage(currentUploads().some(isUnderWay) ? 'held' : 'free'));
