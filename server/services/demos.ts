import { QueryTypes } from 'sequelize';
import type { ChapterKind } from '../../shared/domain/words';
import { database } from '../models/database';
import { ChapterRow } from '../models/marks';
import type { Actor } from './actor';

/** Chapters that show how a movement is done: a substitution's chapter is a demo of what is done instead. */
export const demoKinds = ['demo', 'substitution'] as const satisfies readonly ChapterKind[];

/**
 * For each movement the newest demo that members see, by movement; those without one are left out. Reads one row a movement from
 * the index of published chapters, so that it costs the same in a library of any size.
 */
export async function newestDemos(actor: Actor, movementIds: readonly string[]): Promise<Map<string, ChapterRow>> {
  const ids = [...new Set(movementIds)];
  if (ids.length === 0) return new Map();
  const found = await database().query<{ chapter_id: string }>(
    `select newest.chapter_id
     from unnest(array[:ids]::uuid[]) as wanted (movement_id)
     cross join lateral (
       select s.chapter_id from chapter_search s
       where s.movement_id = wanted.movement_id and s.team_id = :teamId and s.visibility = 0 and s.kind in (:kinds)
       order by s.sort_at desc, s.chapter_id desc limit 1
     ) newest`,
    { replacements: { ids, teamId: actor.team.id, kinds: [...demoKinds] }, type: QueryTypes.SELECT },
  );
  const chapters = await ChapterRow.findAll({
    where: { teamId: actor.team.id, id: found.map(({ chapter_id }) => chapter_id) },
  });
  return new Map(chapters.flatMap((chapter) => (chapter.movementId ? [[chapter.movementId, chapter] as const] : [])));
}
