import type { MakingStep } from '../../shared/domain/words';
import { madeKey, madePrefix, originalsPrefix } from '../../storage/keys';
import { enqueue, makePlayback, makePoster, probeRecording, removeObjects } from '../jobs/definitions';
import { currentTransaction, inTransaction } from '../models/database';
import { ChapterRow } from '../models/marks';
import { Membership, Notice } from '../models/people';
import { Recording, RecordingAsset, type RecordingFailure, Upload } from '../models/recordings';
import { requestChapterPictures } from './chapterPictures';
import { store } from './context';
import { tell } from './live';
import { failStep, finishStep, type OfRecording, waitForStep } from './recordingSteps';
import { refreshSearchOf } from './searchIndex';

/** The way of a recording from its bytes to something that plays, as the worker notes it. */

/** Steps that every uploaded recording goes through before it plays. */
const firstSteps = ['probe', 'poster', 'playback'] as const satisfies readonly MakingStep[];

/**
 * Starts the making of a recording whose original is in the store, in the surrounding transaction. Started again, only
 * what is not done yet is done.
 */
export async function startMaking(recording: Recording, originalKey: string): Promise<void> {
  await inTransaction(async () => {
    const { teamId, id: recordingId } = recording;
    await recording.update({ state: 'making', originalKey, failure: null });
    for (const step of firstSteps) await waitForStep({ teamId, recordingId }, step);
    await enqueue(probeRecording, { teamId, recordingId });
    await tell(teamId, { type: 'recording', recordingId, state: 'making' });
  });
}

export type WithOriginal = Recording & { originalKey: string };

/** A recording that there is something to make from; null where it was removed or refused meanwhile. */
export async function recordingToMake({ teamId, recordingId }: OfRecording): Promise<WithOriginal | null> {
  const recording = await Recording.findOne({ where: { teamId, id: recordingId } });
  return recording && hasOriginal(recording) && recording.state !== 'failed' ? recording : null;
}

const hasOriginal = (recording: Recording): recording is WithOriginal => recording.originalKey !== null;

export type ProbedFacts = {
  durationMs: number;
  width: number;
  height: number;
  fps: number;
  recordedAt: string | null;
  /** of the whole original, in hexadecimal */
  sha256: string;
};

/** Notes what a recording is and asks for its poster and its playback. */
export async function noteProbed(of: OfRecording, originalKey: string, input: string, facts: ProbedFacts) {
  await inTransaction(async () => {
    const recording = await lockedRecording(of, originalKey);
    if (!recording) return;
    const recordedAt = facts.recordedAt === null ? null : new Date(facts.recordedAt);
    // what was marked before the file was read may end within its last picture
    const markedMs = (await ChapterRow.max<number | null, ChapterRow>('endMs', { where: of })) ?? 0;
    await recording.update({ ...facts, durationMs: Math.max(facts.durationMs, markedMs), recordedAt });
    await finishStep(of, 'probe', input);
    await askForMaking(of);
  });
}

/** The jobs that follow a probe; each finds out by itself whether it was done before. */
export async function askForMaking(of: OfRecording): Promise<void> {
  await enqueue(makePoster, of);
  await enqueue(makePlayback, of);
}

export type MadeFile = {
  kind: 'poster' | 'playback';
  name: string;
  contentType: string;
  sizeBytes: number;
  width: number;
  height: number;
  details?: Record<string, unknown>;
};

export async function notePoster(of: OfRecording, originalKey: string, input: string, file: MadeFile): Promise<void> {
  await keepOrRemove(of, originalKey, file, () => finishStep(of, 'poster', input));
}

/** Notes the playback: from now on the recording plays. */
export async function notePlayback(of: OfRecording, originalKey: string, input: string, file: MadeFile): Promise<void> {
  await keepOrRemove(of, originalKey, file, async (recording) => {
    await finishStep(of, 'playback', input);
    await becomeReady(recording);
  });
}

/** A recording that plays already, told again after a step that was not needed. */
export async function becomeReady(recording: Recording): Promise<void> {
  const { teamId, id: recordingId, title } = recording;
  await inTransaction(async () => {
    if (recording.state !== 'ready') {
      await recording.update({ state: 'ready', failure: null });
      await notify(recording, 'recordingReady', `“${title}” is ready to watch and to mark.`);
      await refreshSearchOf({ recordingId });
      await tell(teamId, { type: 'recording', recordingId, state: 'ready' });
    }
    await requestChapterPictures(teamId, recordingId);
  });
}

/**
 * Ends a step for good. A recording that plays already goes on playing; one that does not is failed with a sentence, and
 * where another try cannot help, nothing of it stays in the store.
 */
export async function giveUp(of: OfRecording, step: MakingStep, failure: RecordingFailure): Promise<void> {
  await inTransaction(async () => {
    const recording = await lockedRecording(of);
    if (!recording) return;
    await failStep(of, step);
    const { teamId, recordingId } = of;
    if (recording.state === 'ready' || recording.state === 'failed') return;
    if (step === 'poster' || step === 'chapterPictures') return;
    await recording.update({ state: 'failed', failure, ...(failure.retry ? {} : { originalKey: null }) });
    if (!failure.retry) {
      await RecordingAsset.destroy({ where: of });
      await enqueue(removeObjects, {
        ...of,
        prefixes: [originalsPrefix(teamId, recordingId), madePrefix(teamId, recordingId)],
      });
    }
    await notify(recording, 'recordingFailed', `“${recording.title}” could not be prepared. ${failure.message}`);
    await tell(teamId, { type: 'recording', recordingId, state: 'failed' });
  });
}

/** Notes a file that lies in the store, or takes it away where its recording is gone or was refused meanwhile. */
async function keepOrRemove(
  of: OfRecording,
  originalKey: string,
  file: MadeFile,
  then: (recording: Recording) => Promise<void>,
): Promise<void> {
  const old = await inTransaction(async () => {
    const recording = await lockedRecording(of, originalKey);
    if (!recording) return [file.name];
    const others = await RecordingAsset.findAll({ where: { ...of, kind: file.kind } });
    await RecordingAsset.destroy({ where: { ...of, kind: file.kind } });
    await RecordingAsset.create({ ...of, ...file });
    await then(recording);
    return others.map((asset) => asset.name).filter((name) => name !== file.name);
  });
  for (const name of old) await store().remove(madeKey(of.teamId, of.recordingId, name));
}

/** @param originalKey where given, the recording must still be made from it */
async function lockedRecording(of: OfRecording, originalKey?: string): Promise<Recording | null> {
  const transaction = currentTransaction();
  const recording = await Recording.findOne({
    where: { teamId: of.teamId, id: of.recordingId },
    ...(transaction ? { lock: transaction.LOCK.UPDATE } : {}),
  });
  return recording && (originalKey === undefined || recording.originalKey === originalKey) ? recording : null;
}

/** Tells whoever uploaded the recording, if they are still in the team. */
async function notify(recording: Recording, kind: 'recordingReady' | 'recordingFailed', text: string): Promise<void> {
  const { teamId, id } = recording;
  const upload = await Upload.findOne({ where: { teamId, recordingId: id }, attributes: ['personId'] });
  if (!upload) return;
  const { personId } = upload;
  if ((await Membership.count({ where: { teamId, personId } })) === 0) return;
  await Notice.create({ teamId, personId, kind, subjectId: id, text });
}
