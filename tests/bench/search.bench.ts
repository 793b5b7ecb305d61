import { performance } from 'node:perf_hooks';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { closeDatabase, connectDatabase, database } from '../../server/models/database';
import { Movement } from '../../server/models/dictionary';
import { ChapterRow } from '../../server/models/marks';
import type { Actor } from '../../server/services/actor';
import { connectServices } from '../../server/services/context';
import { find, suggest } from '../../server/services/search';
import { refreshSearchOf } from '../../server/services/searchIndex';
import { makeMember, makeTeam } from '../support/api';
import { freshDatabase } from '../support/database';
import { freshStore } from '../support/store';

/**
 * Search through its service against a named floor in the same run: reading one chapter by its primary key, through the same
 * connection pool. Figures are ratios of medians; a time alone says nothing on a machine that others use too.
 */

const recordings = 2000;
const chaptersEach = 12;
const words = ['heron', 'otter', 'lantern', 'crate', 'ladder', 'harbour', 'willow', 'gravel', 'copper', 'sail'];
const kinds = ['row', 'squat', 'press', 'step', 'hold', 'swing', 'hop', 'carry', 'reach', 'bridge'];

let own: Awaited<ReturnType<typeof freshDatabase>>;
let actor: Actor;
let someChapter: string;

beforeAll(async () => {
  const [fresh, store] = await Promise.all([freshDatabase(), freshStore()]);
  own = fresh;
  connectDatabase(own.url, 4);
  connectServices({ store, mediaSecret: 'x'.repeat(32), publicUrl: 'http://localhost' });
  const team = await makeTeam();
  const person = await makeMember(team, 'member');
  actor = {
    person: { id: person.id, name: person.name, email: person.email },
    team: { id: team.id, slug: team.slug, name: team.name, timeZone: team.timeZone },
    role: 'member',
    requestId: 'bench',
  };
  await Movement.bulkCreate(
    words.flatMap((word) =>
      kinds.map((kind) => ({ teamId: team.id, name: `${word} ${kind}`, pattern: 'pull' as const })),
    ),
  );
  const fill = (sql: string) => database().query(sql, { replacements: { teamId: team.id, recordings, chaptersEach } });
  await fill(`insert into sessions (team_id, date, title, state, published_at)
    select :teamId, date '2020-01-01' + n, 'Day ' || n, 'published', now() from generate_series(1, :recordings) n`);
  await fill(`insert into recordings (team_id, session_id, title, file_name, size_bytes, content_type, state, duration_ms, width, height, fps)
    select team_id, id, title, 'take.mp4', 1, 'video/mp4', 'ready', 3600000, 1280, 720, 30 from sessions where team_id = :teamId`);
  await fill(
    `insert into caption_tracks (team_id, recording_id) select team_id, id from recordings where team_id = :teamId`,
  );
  await fill(`insert into chapters (team_id, id, recording_id, start_ms, end_ms, kind, title, movement_id)
    select r.team_id, gen_random_uuid(), r.id, n * 10000, n * 10000 + 9000, 'demo', m.name, m.id
    from (select *, row_number() over (order by id) as place from recordings where team_id = :teamId) r
    cross join generate_series(0, :chaptersEach - 1) n
    join (select *, row_number() over (order by id) as place from movements where team_id = :teamId) m
      on m.place = 1 + (r.place * 7 + n * 13) % 100`);
  await fill(`insert into caption_lines (team_id, track_id, position, start_ms, end_ms, text)
    select t.team_id, t.id, n, n * 10000, n * 10000 + 3000, 'Keep the ribs down and breathe, number ' || n || ' of ' || (n * 7 % 11)
    from caption_tracks t cross join generate_series(0, :chaptersEach - 1) n where t.team_id = :teamId`);
  await refreshSearchOf({ teamId: team.id });
  await database().query('analyze');
  someChapter = (await ChapterRow.findOne({ rejectOnEmpty: true }))?.id as string;
});

afterAll(async () => {
  await closeDatabase();
  await own.drop();
});

/** @returns the median in ms */
async function median(times: number, task: (at: number) => Promise<unknown>): Promise<number> {
  const taken: number[] = [];
  for (let at = 0; at < times; at++) {
    const began = performance.now();
    await task(at);
    taken.push(performance.now() - began);
  }
  return taken.toSorted((a, b) => a - b)[Math.floor(times / 2)] as number;
}

it(`finds among ${recordings * chaptersEach} chapters`, async () => {
  const name = (at: number) => `${words[at % 10]} ${kinds[(at * 3) % 10]}`;
  const typo = (at: number) => name(at).replace(/(.)(.)(.*)/, '$2$1$3');
  await find(actor, { q: name(0), kit: 'any' });
  const floor = await median(200, () => ChapterRow.findByPk(someChapter));
  const measured = {
    'a movement by its name': await median(60, (at) => find(actor, { q: name(at), kit: 'any' })),
    'a movement with a typo': await median(60, (at) => find(actor, { q: typo(at), kit: 'any' })),
    'a word that is said everywhere': await median(20, () => find(actor, { q: 'breathe', kit: 'any' })),
    'suggestions while typing': await median(60, (at) => suggest(actor, name(at).slice(0, 4))),
  };
  console.log(`floor, a chapter by its primary key: 1 (${floor.toFixed(2)} ms)`);
  for (const [what, ms] of Object.entries(measured))
    console.log(`${what}: ${(ms / floor).toFixed(1)} × (${ms.toFixed(1)} ms)`);
  expect((await find(actor, { q: name(3), kit: 'any' })).groups.length).toBeGreaterThan(0);
});
