import { AppError } from '../../shared/errors';
import type { Recording } from '../models/recordings';
import { Session } from '../models/sessions';
import { type Actor, actorMay } from './actor';
import { recordingOf } from './documents';

/**
 * A recording that the actor may watch: members see those of published sessions, once they play.
 * @throws AppError `notFound` otherwise: nobody learns that there is a draft
 */
export async function visibleRecordingOf(actor: Actor, recordingId: string): Promise<Recording> {
  const recording = await recordingOf(actor, recordingId);
  if (actorMay(actor, 'readDrafts')) return recording;
  const session = recording.sessionId
    ? await Session.findOne({ where: { id: recording.sessionId, teamId: actor.team.id } })
    : null;
  if (recording.state !== 'ready' || session?.state !== 'published') throw new AppError('notFound');
  return recording;
}
