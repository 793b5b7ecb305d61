import { z } from 'zod';
import type { Cues } from '../../shared/contracts/marks';
import { Cue } from '../../shared/domain/chapters/cue';
import { AppError, type FieldErrors } from '../../shared/errors';
import { inTransaction } from '../models/database';
import { Movement } from '../models/dictionary';
import { CueRow } from '../models/marks';
import { Recording } from '../models/recordings';
import type { Actor } from './actor';
import { audit } from './audit';
import { contentOfVersion, type How, keepVersion, recordingOf, versionsOf } from './documents';
import { followMerges } from './mergeMovements';
import { refreshSearchOf } from './searchIndex';

export async function read(actor: Actor, recordingId: string): Promise<Cues> {
  return present(await recordingOf(actor, recordingId));
}

async function present(recording: Recording): Promise<Cues> {
  const rows = await CueRow.findAll({
    where: { recordingId: recording.id },
    order: [
      ['atMs', 'ASC'],
      ['id', 'ASC'],
    ],
  });
  return { version: recording.cuesVersion, items: rows.map(asCue) };
}

export function asCue({ id, atMs, kind, text, movementId }: CueRow): Cue {
  return { id, atMs, kind, text, movementId };
}

/** Saves a recording's coaching cues whole. @throws AppError `stale` with the current ones, `invalid` */
export function save(
  actor: Actor,
  recordingId: string,
  version: number,
  sent: Cue[],
  how: How = 'edit',
  origin?: string,
): Promise<Cues> {
  return inTransaction(async () => {
    const recording = await recordingOf(actor, recordingId);
    const cues = await withMergesFollowed(actor, sent);
    const inOrder = cues.toSorted((a, b) => a.atMs - b.atMs);
    await refuseFaulty(actor, recording, cues);
    const [count] = await Recording.update(
      { cuesVersion: version + 1 },
      { where: { id: recordingId, teamId: actor.team.id, cuesVersion: version } },
    );
    await recording.reload();
    if (count === 0) throw new AppError('stale', { current: await present(recording) });
    await CueRow.destroy({ where: { teamId: actor.team.id, recordingId } });
    await CueRow.bulkCreate(inOrder.map((cue) => ({ ...cue, teamId: actor.team.id, recordingId })));
    await keepVersion(actor, {
      recordingId,
      document: 'cues',
      version: version + 1,
      how,
      origin: origin ?? null,
      content: inOrder,
    });
    await audit(
      actor,
      `cues.${how === 'restore' ? 'restored' : 'saved'}`,
      { type: 'recording', id: recordingId },
      { version: version + 1, count: inOrder.length },
    );
    await refreshSearchOf({ recordingId });
    return present(recording);
  });
}

export function restore(actor: Actor, recordingId: string, wanted: number, version: number): Promise<Cues> {
  return inTransaction(async () => {
    const kept = await withMergesFollowed(
      actor,
      z.array(Cue).parse(await contentOfVersion(actor, recordingId, 'cues', wanted)),
    );
    const known = await knownMovements(actor, kept);
    const cues = kept.map((cue) => ({
      ...cue,
      movementId: cue.movementId && known.has(cue.movementId) ? cue.movementId : null,
    }));
    return save(actor, recordingId, version, cues, 'restore', String(wanted));
  });
}

export function versions(actor: Actor, recordingId: string) {
  return versionsOf<Cue>(actor, recordingId, 'cues', (cue) => cue.id);
}

/** A page that was open while a duplicate was merged still names it, and so does an earlier version. */
async function withMergesFollowed(actor: Actor, cues: Cue[]): Promise<Cue[]> {
  const became = await followMerges(
    actor.team.id,
    cues.map(({ movementId }) => movementId),
  );
  return cues.map((cue) => ({ ...cue, movementId: became(cue.movementId) }));
}

async function refuseFaulty(actor: Actor, recording: Recording, cues: Cue[]): Promise<void> {
  const fields: FieldErrors = {};
  const known = await knownMovements(actor, cues);
  const taken = new Set(
    (await CueRow.findAll({ where: { id: cues.map(({ id }) => id) }, attributes: ['id', 'recordingId'] }))
      .filter((row) => row.recordingId !== recording.id)
      .map(({ id }) => id),
  );
  const seen = new Set<string>();
  cues.forEach((cue, index) => {
    if (recording.durationMs !== null && cue.atMs > recording.durationMs)
      fields[`items.${index}.atMs`] = 'This cue lies after the end of the recording.';
    if (cue.movementId && !known.has(cue.movementId))
      fields[`items.${index}.movementId`] = 'This movement is not in the dictionary any more. Choose another.';
    if (taken.has(cue.id) || seen.has(cue.id)) fields[`items.${index}.id`] = 'This id is taken. Make a new cue.';
    seen.add(cue.id);
  });
  if (Object.keys(fields).length > 0) throw new AppError('invalid', { fields });
}

async function knownMovements(actor: Actor, cues: Cue[]): Promise<Set<string>> {
  const ids = [...new Set(cues.flatMap((cue) => cue.movementId ?? []))];
  if (ids.length === 0) return new Set();
  const rows = await Movement.findAll({
    where: { teamId: actor.team.id, id: ids, mergedIntoId: null },
    attributes: ['id'],
  });
  return new Set(rows.map(({ id }) => id));
}
