import { QueryTypes } from 'sequelize';
import type { SaidLine } from '../../shared/contracts/search';
import { allWords, anyWord, markWords } from '../../shared/domain/search/textQuery';
import type { ChapterKind } from '../../shared/domain/words';
import { database } from '../models/database';
import type { ChapterRow } from '../models/marks';
import { type Actor, actorMay } from './actor';
import { asideOfLine } from './searchIndex';

/** The two ways into `chapter_search`: by movement, and by words. SQL by hand: both were measured at 1.2 million chapters. */

export type FoundChapter = {
  id: string;
  movementId: string | null;
  standsInForMovementId: string | null;
  kind: ChapterKind;
};

/** of one movement; more of the same are found on its own page */
const mostOfMovement = 6;
/** candidates are cut before they are ranked: ranking every match costs a hundred times as much */
const mostCandidates = 100;

/** Members see what is published; those who make the library drafts too; nobody finds asides. */
const furthest = (actor: Actor) => (actorMay(actor, 'readDrafts') ? 1 : 0);

/** A demo is the whole movement, a substitution shows it too, a block shows it in passing. */
const kindRank = `case kind when 'demo' then 0 when 'substitution' then 1 else 2 end`;

/**
 * Chapters that show movements, by movement: the best first, which is a demo before anything else, then the newest.
 * Plan: for each movement an index scan of `chapter_search_of_movement`, newest first, at most 24 rows, sorted in memory.
 */
export async function chaptersOfMovements(actor: Actor, movementIds: readonly string[], kind: ChapterKind | null) {
  const rows =
    movementIds.length === 0
      ? []
      : await database().query<FoundChapter>(
          `select found.chapter_id as id, found.movement_id as "movementId",
                  found.stands_in_for_movement_id as "standsInForMovementId", found.kind
           from unnest(array[:movementIds]::uuid[]) as wanted (movement_id)
           cross join lateral (
             select best.* from (
               select cs.* from chapter_search cs join recordings r on r.id = cs.recording_id and r.state = 'ready'
               where cs.movement_id = wanted.movement_id and cs.team_id = :teamId and cs.visibility <= :furthest
                 and (:kind::text is null or cs.kind = :kind)
               order by cs.sort_at desc, cs.chapter_id desc limit 24
             ) best order by ${kindRank}, sort_at desc, chapter_id desc limit ${mostOfMovement}
           ) found`,
          {
            replacements: { movementIds: [...movementIds], teamId: actor.team.id, furthest: furthest(actor), kind },
            type: QueryTypes.SELECT,
          },
        );
  const byMovement = new Map<string, FoundChapter[]>();
  for (const row of rows)
    byMovement.set(row.movementId as string, [...(byMovement.get(row.movementId as string) ?? []), row]);
  return { of: (movementId: string) => byMovement.get(movementId) ?? [], all: () => rows };
}

/**
 * Chapters in whose names, title, notes, cues or captions words stand: those with all of them; where none has and
 * `any` will do, those with some.
 * Plan: bitmap scan of `chapter_search_document`; `+ interval '0'` keeps the planner off a walk by date that filters by `@@`.
 */
export async function chaptersOfWords(
  actor: Actor,
  words: readonly string[],
  needed: 'all' | 'any',
  kind: ChapterKind | null,
  most: number,
): Promise<FoundChapter[]> {
  for (const text of needed === 'all' ? [allWords(words)] : [allWords(words), anyWord(words)]) {
    if (text === '') return [];
    const rows = await database().query<FoundChapter>(
      `select id, "movementId", "standsInForMovementId", kind from (
         select cs.chapter_id as id, cs.movement_id as "movementId", cs.stands_in_for_movement_id as "standsInForMovementId",
                cs.kind, cs.sort_at, cs.document
         from chapter_search cs join recordings r on r.id = cs.recording_id and r.state = 'ready'
         where cs.team_id = :teamId and cs.visibility <= :furthest and (:kind::text is null or cs.kind = :kind)
           and cs.document @@ websearch_to_tsquery('coach', :text)
         order by cs.sort_at + interval '0' desc limit ${mostCandidates}
       ) candidates
       order by ts_rank(document, websearch_to_tsquery('coach', :text)) desc, sort_at desc, id limit :most`,
      { replacements: { teamId: actor.team.id, furthest: furthest(actor), kind, text, most }, type: QueryTypes.SELECT },
    );
    if (rows.length > 0) return rows;
  }
  return [];
}

type Line = { chapterId: string; atMs: number; text: string };

/** For each chapter the caption line, or else the cue, with most of the words, in pieces with the words marked. */
export async function saidIn(
  chapters: readonly ChapterRow[],
  words: readonly string[],
): Promise<Map<string, SaidLine>> {
  if (chapters.length === 0) return new Map();
  const lines = await database().query<Line>(
    `select c.id as "chapterId", greatest(l.start_ms, c.start_ms) as "atMs", l.text
     from chapters c join caption_tracks t on t.recording_id = c.recording_id
     join caption_lines l on l.track_id = t.id and l.start_ms < c.end_ms and l.end_ms > c.start_ms
     where c.id = any(array[:ids]::uuid[]) and not exists (${asideOfLine})
     union all
     select c.id, q.at_ms, q.text from chapters c
     join cues q on q.recording_id = c.recording_id and q.at_ms >= c.start_ms and q.at_ms < c.end_ms
     where c.id = any(array[:ids]::uuid[])`,
    { replacements: { ids: chapters.map(({ id }) => id) }, type: QueryTypes.SELECT },
  );
  const best = new Map<string, { marks: number; said: SaidLine }>();
  for (const { chapterId, atMs, text } of lines) {
    const pieces = markWords(text.replace(/\s+/g, ' '), words);
    const marks = new Set(pieces.filter(({ marked }) => marked).map((piece) => piece.text.toLowerCase())).size;
    const known = best.get(chapterId);
    if (marks > 0 && (!known || marks > known.marks || (marks === known.marks && atMs < known.said.atMs)))
      best.set(chapterId, { marks, said: { atMs, pieces } });
  }
  return new Map([...best].map(([id, { said }]) => [id, said]));
}
