import { z } from 'zod';
import type { Captions } from '../../shared/contracts/marks';
import { captionFaults, inOrder } from '../../shared/domain/captions/captionFaults';
import { CaptionLine } from '../../shared/domain/captions/captionLine';
import { isInAside } from '../../shared/domain/chapters/chapterAt';
import { AppError, type FieldErrors } from '../../shared/errors';
import { limits } from '../../shared/limits';
import { readCaptionFile } from '../formats/readCaptions';
import { inTransaction } from '../models/database';
import { CaptionLineRow, CaptionTrack, ChapterRow } from '../models/marks';
import type { Recording } from '../models/recordings';
import { type Actor, actorMay } from './actor';
import { audit } from './audit';
import { contentOfVersion, type How, keepVersion, recordingOf, versionsOf } from './documents';
import { refreshSearchOf } from './searchIndex';
import { visibleRecordingOf } from './visibleRecording';

const language = 'en';

/** The caption lines of a recording in order; version 0 and none while it has no captions. */
export async function read(actor: Actor, recordingId: string): Promise<Captions> {
  return present(await recordingOf(actor, recordingId));
}

async function present(recording: Recording): Promise<Captions> {
  const track = await CaptionTrack.findOne({ where: { recordingId: recording.id, language } });
  return { version: track?.version ?? 0, language, lines: track ? await linesOf(track.id) : [] };
}

async function linesOf(trackId: string): Promise<CaptionLine[]> {
  const rows = await CaptionLineRow.findAll({ where: { trackId }, order: [['position', 'ASC']] });
  return rows.map(({ startMs, endMs, text }) => ({ startMs, endMs, text }));
}

/** Saves the caption lines whole. @throws AppError `stale` with the current ones, `invalid` */
export function save(
  actor: Actor,
  recordingId: string,
  version: number,
  lines: CaptionLine[],
  how: How = 'edit',
  origin: string | null = null,
): Promise<Captions> {
  return inTransaction(async () => {
    const recording = await recordingOf(actor, recordingId);
    refuseFaulty(recording, lines);
    const ordered = inOrder(lines);
    const track = await takeVersion(actor, recording, version);
    await CaptionLineRow.destroy({ where: { trackId: track.id } });
    await CaptionLineRow.bulkCreate(
      ordered.map((line, position) => ({ ...line, position, teamId: actor.team.id, trackId: track.id })),
    );
    await keepVersion(actor, {
      recordingId,
      document: 'captions',
      version: version + 1,
      how,
      origin,
      content: ordered,
    });
    const verb = how === 'restore' ? 'restored' : how === 'import' ? 'imported' : 'saved';
    await audit(
      actor,
      `captions.${verb}`,
      { type: 'recording', id: recordingId },
      { version: version + 1, lines: ordered.length },
    );
    await refreshSearchOf({ recordingId });
    return present(recording);
  });
}

/**
 * Replaces the caption lines by those of a file; a file with a fault changes nothing.
 * @throws AppError `badFile` naming line and reason, `stale`
 */
export async function importFile(
  actor: Actor,
  recordingId: string,
  version: number,
  file: { bytes: Buffer; name: string },
) {
  const recording = await recordingOf(actor, recordingId);
  const { lines, warnings } = readCaptionFile(file.bytes, { fileName: file.name });
  if (lines.length === 0)
    throw new AppError('badFile', { message: 'The file has no caption lines. Nothing was changed.' });
  if (lines.length > limits.captionLinesPerRecording)
    throw new AppError('badFile', {
      message: `The file has ${lines.length} lines; at most ${limits.captionLinesPerRecording} fit a recording.`,
    });
  const late = captionFaults(lines, recording.durationMs).find(({ code }) => code === 'pastEnd');
  if (late)
    throw new AppError('badFile', {
      message: `Caption ${late.index + 1} of the file lies after the end of the recording. Is it the file of another take? Nothing was changed.`,
    });
  const captions = await save(actor, recordingId, version, lines, 'import', file.name.slice(0, 200));
  return { ...captions, warnings: warnings.map(({ line, reason }) => `Line ${line}: ${reason}`) };
}

export function restore(actor: Actor, recordingId: string, wanted: number, version: number): Promise<Captions> {
  return inTransaction(async () => {
    await recordingOf(actor, recordingId);
    const kept = z.array(CaptionLine).parse(await contentOfVersion(actor, recordingId, 'captions', wanted));
    return save(actor, recordingId, version, kept, 'restore', String(wanted));
  });
}

export function versions(actor: Actor, recordingId: string) {
  // a line has no name of its own: the same start is the same line
  return versionsOf<CaptionLine>(actor, recordingId, 'captions', (line) => String(line.startMs));
}

/** The lines for a file or the player; members get nothing of what is said in an aside. */
export async function forExport(actor: Actor, recordingId: string): Promise<CaptionLine[]> {
  const recording = await visibleRecordingOf(actor, recordingId);
  const { lines } = await present(recording);
  if (actorMay(actor, 'readDrafts')) return lines;
  const chapters = await ChapterRow.findAll({ where: { recordingId, kind: 'aside' } });
  return lines.filter((line) => !isInAside(chapters, (line.startMs + line.endMs) / 2));
}

async function takeVersion(actor: Actor, recording: Recording, version: number): Promise<CaptionTrack> {
  const where = { recordingId: recording.id, language };
  await CaptionTrack.bulkCreate([{ teamId: actor.team.id, ...where, version: 0 }], { ignoreDuplicates: true });
  const [count] = await CaptionTrack.update({ version: version + 1 }, { where: { ...where, version } });
  if (count === 0) throw new AppError('stale', { current: await present(recording) });
  return (await CaptionTrack.findOne({ where, rejectOnEmpty: true })) as CaptionTrack;
}

function refuseFaulty(recording: Recording, lines: CaptionLine[]): void {
  const fields: FieldErrors = {};
  for (const fault of captionFaults(inOrder(lines), recording.durationMs))
    if (fault.severity === 'refused') fields[`lines.${fault.index}`] ??= fault.message;
  if (Object.keys(fields).length > 0) throw new AppError('invalid', { fields });
}
