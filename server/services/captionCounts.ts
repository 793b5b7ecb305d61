import { QueryTypes } from 'sequelize';
import { database } from '../models/database';

/** How many caption lines recordings have, by recording. */
export async function countCaptionLines(teamId: string, recordingIds: readonly string[]): Promise<Map<string, number>> {
  const rows = await database().query<{ id: string; count: number }>(
    `select t.recording_id as id, count(*)::int as count
     from caption_tracks t join caption_lines l on l.team_id = t.team_id and l.track_id = t.id
     where t.team_id = :teamId and t.recording_id in (:recordingIds)
     group by t.recording_id`,
    { replacements: { teamId, recordingIds: [...recordingIds] }, type: QueryTypes.SELECT },
  );
  return new Map(rows.map((row) => [row.id, row.count]));
}
