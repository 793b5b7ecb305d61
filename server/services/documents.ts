import { QueryTypes } from 'sequelize';
import type { SavedVersion } from '../../shared/contracts/marks';
import { AppError } from '../../shared/errors';
import { database } from '../models/database';
import { type DocumentName, DocumentVersion } from '../models/marks';
import { Recording } from '../models/recordings';
import type { Actor } from './actor';
import { tell } from './live';

/** Chapters, cues and captions are documents: saved whole, each version kept with its author. */

export type How = 'edit' | 'import' | 'restore' | 'made';

/** @throws AppError `notFound` for another team's recording too */
export async function recordingOf(actor: Actor, recordingId: string): Promise<Recording> {
  const recording = await Recording.findOne({ where: { id: recordingId, teamId: actor.team.id } });
  if (!recording) throw new AppError('notFound');
  return recording;
}

/** Keeps a version that was just saved, and tells open pages of it. */
export async function keepVersion(
  actor: Actor,
  saved: {
    recordingId: string;
    document: DocumentName;
    version: number;
    how: How;
    origin?: string | null;
    content: unknown[];
  },
): Promise<void> {
  await DocumentVersion.create({
    teamId: actor.team.id,
    recordingId: saved.recordingId,
    document: saved.document,
    version: saved.version,
    authorId: actor.person.id,
    how: saved.how,
    origin: saved.origin ?? null,
    content: saved.content,
  });
  await tell(actor.team.id, {
    type: 'saved',
    recordingId: saved.recordingId,
    document: saved.document,
    version: saved.version,
    by: actor.person.id,
  });
}

/** What a version held, to bring it back. @throws AppError `notFound` */
export async function contentOfVersion(
  actor: Actor,
  recordingId: string,
  document: DocumentName,
  version: number,
): Promise<unknown> {
  const kept = await DocumentVersion.findOne({ where: { teamId: actor.team.id, recordingId, document, version } });
  if (!kept) throw new AppError('notFound', { message: 'There is no such version.' });
  return kept.content;
}

/**
 * Every kept version, newest first, with how many entries each has and how it differs from the one before.
 * @param keyOf what makes an entry the same one in two versions
 */
export async function versionsOf<T>(
  actor: Actor,
  recordingId: string,
  document: DocumentName,
  keyOf: (entry: T) => string,
): Promise<SavedVersion[]> {
  await recordingOf(actor, recordingId);
  const rows = await database().query<{
    version: number;
    created_at: Date;
    author: string | null;
    how: How;
    origin: string | null;
    content: T[];
  }>(
    `select v.version, v.created_at, p.name as author, v.how, v.origin, v.content
     from document_versions v left join people p on p.id = v.author_id
     where v.team_id = :teamId and v.recording_id = :recordingId and v.document = :document
     order by v.version desc limit 200`,
    { replacements: { teamId: actor.team.id, recordingId, document }, type: QueryTypes.SELECT },
  );
  return rows.map((row, index) => ({
    version: row.version,
    at: row.created_at.toISOString(),
    author: row.author,
    how: row.how,
    origin: row.origin,
    count: row.content.length,
    ...difference(rows[index + 1]?.content ?? [], row.content, keyOf),
  }));
}

function difference<T>(before: T[], after: T[], keyOf: (entry: T) => string) {
  const was = new Map(before.map((entry) => [keyOf(entry), JSON.stringify(entry)]));
  const is = new Map(after.map((entry) => [keyOf(entry), JSON.stringify(entry)]));
  const kept = [...is.keys()].filter((key) => was.has(key));
  return {
    added: is.size - kept.length,
    removed: was.size - kept.length,
    changed: kept.filter((key) => was.get(key) !== is.get(key)).length,
  };
}
