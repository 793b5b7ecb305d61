import { database } from '../models/database';

/** Which search documents to make anew: those of recordings, or of every recording that shows or plans something. */
export type Scope = { recordingId: string } | { sessionId: string } | { movementId: string } | { teamId: string };

/** From what each scope's team is read. */
const teams = {
  recordingId: 'select team_id from recordings where id = :id',
  sessionId: 'select team_id from sessions where id = :id',
  movementId: 'select team_id from movements where id = :id',
  teamId: 'select :id::uuid as team_id',
} as const;

const scopes = {
  recordingId: 'c.recording_id = :id',
  sessionId: 'r.session_id = :id',
  movementId: ':id in (c.movement_id, c.stands_in_for_movement_id)',
  teamId: 'c.team_id = :id',
} as const;

/**
 * Makes search documents anew, in the transaction that changed what they are made from: names and other names (A), title (B),
 * notes and cues (C), words said (D). One statement for all chapters in scope; removed chapters take theirs with them.
 * Measured by others for 250 lines and 12 chapters: 11 ms, where a trigger for each row costs 389.
 * A team's refreshes follow one another until their transactions end: of two at once, one that has not seen that a session was
 * taken back to a draft would show it to members again. So it comes last, after what the transaction changes.
 */
export async function refreshSearchOf(scope: Scope): Promise<void> {
  const [[key, id]] = Object.entries(scope) as [[keyof typeof scopes, string]];
  await database().query(`select pg_advisory_xact_lock(hashtextextended(team_id::text, 0)) from (${teams[key]}) team`, {
    replacements: { id },
  });
  await database().query(`${refresh} where ${scopes[key]} ${onConflict}`, { replacements: { id } });
}

/**
 * The aside that a caption line `l` is said in, next to the chapter `c` that it reaches into: members read and find none of it.
 * By the line's middle, as the player and the files have it.
 */
export const asideOfLine = `
  select from chapters a where a.recording_id = c.recording_id and a.kind = 'aside' and a.id <> c.id
    and l.start_ms + l.end_ms >= a.start_ms * 2 and l.start_ms + l.end_ms < a.end_ms * 2`;

const refresh = `
insert into chapter_search (chapter_id, team_id, recording_id, session_id, movement_id, stands_in_for_movement_id, kind,
                            visibility, coach_id, sort_at, start_ms, end_ms, document)
select c.id, c.team_id, c.recording_id, r.session_id, c.movement_id, c.stands_in_for_movement_id, c.kind,
       case when c.kind = 'aside' then 2 when s.state = 'published' and r.state = 'ready' then 0 else 1 end,
       r.coach_id, coalesce(s.date::timestamp at time zone 'UTC', r.created_at), c.start_ms, c.end_ms,
       setweight(to_tsvector('coach', concat_ws(' ', m.name, array_to_string(m.other_names, ' '))), 'A')
       || setweight(to_tsvector('coach', c.title), 'B')
       || setweight(to_tsvector('coach', concat_ws(' ', c.note, cued.words)), 'C')
       || setweight(to_tsvector('coach', coalesce(said.words, '')), 'D')
from chapters c
join recordings r on r.id = c.recording_id
left join sessions s on s.id = r.session_id
left join movements m on m.id = c.movement_id
left join lateral (
  select string_agg(q.text, ' ' order by q.at_ms) as words from cues q
  where q.recording_id = c.recording_id and q.at_ms >= c.start_ms and q.at_ms < c.end_ms
) cued on true
left join lateral (
  select string_agg(l.text, ' ' order by l.position) as words
  from caption_tracks t join caption_lines l on l.track_id = t.id
  where t.recording_id = c.recording_id and l.start_ms < c.end_ms and l.end_ms > c.start_ms
    and not exists (${asideOfLine})
) said on true`;

const onConflict = `
on conflict (chapter_id) do update set
  session_id = excluded.session_id, movement_id = excluded.movement_id,
  stands_in_for_movement_id = excluded.stands_in_for_movement_id, kind = excluded.kind, visibility = excluded.visibility,
  coach_id = excluded.coach_id, sort_at = excluded.sort_at, start_ms = excluded.start_ms, end_ms = excluded.end_ms,
  document = excluded.document`;
