import type { z } from 'zod';
import type { Moment } from '../../shared/contracts/moments';
import type {
  Finding,
  FindingGroup,
  find as findEndpoint,
  suggest as suggestEndpoint,
} from '../../shared/contracts/search';
import { explainRule } from '../../shared/domain/kit/convertDose';
import type { DoseRule } from '../../shared/domain/kit/doseRule';
import type { OwnedKit } from '../../shared/domain/kit/kit';
import { oneReason } from '../../shared/domain/kit/myVersion';
import { canDo } from '../../shared/domain/kit/owned';
import { doseFor, substitutionsFor } from '../../shared/domain/kit/substitutionsFor';
import { wordsOf } from '../../shared/domain/search/plainWords';
import { type ResolvedQuery, resolve } from '../../shared/domain/search/resolveQuery';
import { suggest as suggestMovements } from '../../shared/domain/search/suggest';
import { Dose, formatDose } from '../../shared/domain/training/dose';
import type { ChapterKind } from '../../shared/domain/words';
import { ChapterRow } from '../models/marks';
import type { Actor } from './actor';
import { dictionaryOf, type TeamDictionary } from './dictionary';
import { presentMoments } from './moments';
import { kitOf } from './myKit';
import { chaptersOfMovements, chaptersOfWords, type FoundChapter, saidIn } from './searchLanes';

type Found = z.infer<typeof findEndpoint.response>;
type Query = { q: string; kit: 'mine' | 'any'; kind?: ChapterKind | undefined };

/** A query that names a pattern means many movements: so many are shown. */
const mostMovements = 12;
const mostWays = 4;
const mostSaid = 10;

/**
 * Moments for a query: the movements that it names with their demos, what to do instead where kit is missing or left out,
 * and what was said. Members find nothing of drafts and asides.
 */
export async function find(actor: Actor, { q, kit, kind }: Query): Promise<Found> {
  if (q === '') return nothingAsked;
  const [dictionary, mine] = await Promise.all([dictionaryOf(actor.team.id), kitOf(actor)]);
  const query = resolve(dictionary.search, q);
  const usable = usableKit(dictionary, kit === 'mine' && mine.told ? mine.items : null, query.without);
  const needing = (id: string) => asksForAny(dictionary, id, query.without);
  // “without a rope” alone asks about everything that needs one
  const asked = query.accepted ? query.movements.map(({ id }) => id) : [...dictionary.movements.keys()].filter(needing);
  const meant = answersFirst(asked, needing).slice(0, mostMovements);
  const ways = new Map(meant.map((id) => [id, waysAround(dictionary, id, usable)] as const));
  const instead = [...ways.values()].flatMap((list) => list.map(({ movementId }) => movementId));

  const shown = await chaptersOfMovements(actor, [...new Set([...meant, ...instead])], kind ?? null);
  const words = wordsToFind(q, query);
  // beside a movement that is named, a line with only some of the words is noise
  const spoken = await chaptersOfWords(actor, words, query.accepted ? 'all' : 'any', kind ?? null, mostSaid * 2);

  const chapters = await chaptersByIds([...shown.all(), ...spoken]);
  const moments = new Map((await presentMoments(actor, chapters)).map((moment) => [moment.chapterId, moment]));
  const said = await saidIn(
    chapters.filter(({ id }) => spoken.some((one) => one.id === id)),
    words,
  );

  const groups: FindingGroup[] = [];
  const notFilmed: string[] = [];
  const offered = new Set<string>();
  let hiddenByKit = 0;
  for (const id of meant) {
    const movement = dictionary.movements.get(id);
    if (!movement) continue;
    const demos = shown
      .of(id)
      .flatMap((chapter) => finding(moments.get(chapter.id), chapter.kind === 'demo' ? 'demo' : 'movement'));
    const fits = usable === null || canDo(movement.kitNeeded, usable);
    const named = { id, name: movement.name };
    const inMyKit = mine.told ? canDo(movement.kitNeeded, mine.items) : null;
    // what serves for several of the movements that were meant is offered once
    const others = insteadOf(dictionary, id, ways.get(id) ?? [], (other) => shown.of(other), moments).filter(
      ({ moment }) => !offered.has(moment.chapterId),
    );
    for (const { moment } of others) offered.add(moment.chapterId);
    if (others.length > 0) groups.push({ movement: named, heading: 'insteadOf', inMyKit, findings: others });
    if (!fits) hiddenByKit += demos.length;
    else if (demos.length > 0) groups.push({ movement: named, heading: 'demos', inMyKit, findings: demos });
    if (demos.length === 0 && query.accepted) notFilmed.push(id);
  }
  const listed = new Set(groups.flatMap(({ findings }) => findings.map(({ moment }) => moment.chapterId)));
  const lines = spoken
    .filter(({ id, movementId }) => !listed.has(id) && !(movementId && meant.includes(movementId)))
    .slice(0, mostSaid)
    .flatMap((chapter) => finding(moments.get(chapter.id), 'said', said.get(chapter.id) ?? null));
  if (lines.length > 0) groups.push({ movement: null, heading: 'said', inMyKit: null, findings: lines });

  const name = (id: string) => ({ id, name: dictionary.movements.get(id)?.name ?? '' });
  return {
    understood: {
      movements: query.movements.slice(0, mostMovements).map(({ id }) => name(id)),
      without: query.without.map((id) => ({ id, name: dictionary.kitItems.get(id)?.name ?? '' })),
    },
    didYouMean: query.didYouMean.map(({ id }) => name(id)),
    groups,
    notFilmed: notFilmed.map(name),
    hiddenByKit,
  };
}

/** “Row without rings” is first about the row that needs rings; what never needed them comes behind. */
function answersFirst(ids: readonly string[], isAnswer: (id: string) => boolean): string[] {
  return [...ids.filter(isAnswer), ...ids.filter((id) => !isAnswer(id))];
}

function asksForAny({ movements }: TeamDictionary, id: string, kitItemIds: readonly string[]): boolean {
  const anyOf = movements.get(id)?.kitNeeded.flatMap((need) => need.anyOf) ?? [];
  return anyOf.some(({ kitItemId }) => kitItemIds.includes(kitItemId));
}

const nothingAsked: Found = {
  understood: { movements: [], without: [] },
  didYouMean: [],
  groups: [],
  notFilmed: [],
  hiddenByKit: 0,
};

/** Movements while one types, each with its newest demo. */
export async function suggest(actor: Actor, q: string): Promise<z.infer<typeof suggestEndpoint.response>> {
  const dictionary = await dictionaryOf(actor.team.id);
  const found = suggestMovements(dictionary.search, q, 8);
  const shown = await chaptersOfMovements(
    actor,
    found.map(({ id }) => id),
    null,
  );
  const best = found.map(({ id }) => shown.of(id)[0]);
  const chapters = await chaptersByIds(best.filter((chapter) => chapter !== undefined));
  const moments = new Map((await presentMoments(actor, chapters)).map((moment) => [moment.chapterId, moment]));
  return {
    items: found.map(({ id, name, matched }, index) => ({
      movement: { id, name },
      matched,
      demo: moments.get(best[index]?.id ?? '') ?? null,
    })),
  };
}

/**
 * The kit to judge by: one's own, or all that the team knows, less what the query says to do without.
 * Null where nothing narrows it.
 */
function usableKit(
  dictionary: TeamDictionary,
  owned: readonly OwnedKit[] | null,
  without: readonly string[],
): OwnedKit[] | null {
  if (owned === null && without.length === 0) return null;
  const all = owned ?? [...dictionary.kitItems.keys()].map((kitItemId) => ({ kitItemId, count: 50, loadsKg: [] }));
  return all.filter(({ kitItemId }) => !without.includes(kitItemId));
}

type Way = { movementId: string; note: string };

function waysAround(dictionary: TeamDictionary, movementId: string, usable: OwnedKit[] | null): Way[] {
  if (usable === null) return [];
  const answer = substitutionsFor(movementId, dictionary.kit, usable);
  if (answer.possible) return [];
  return answer.ways.slice(0, mostWays).map(({ movementId: id, reasons, doseRules }) => ({
    movementId: id,
    note: [oneReason(reasons), becomes(doseRules)].filter(Boolean).map(asSentence).join(' '),
  }));
}

/** How the dose changes: the rule of one step as the coach wrote it, several steps by what comes out. */
function becomes(doseRules: readonly DoseRule[]): string {
  const [rule] = doseRules;
  if (doseRules.length === 1 && rule) return explainRule(rule);
  const ten = Dose.parse({ amount: 10, unit: 'reps' });
  return `10 reps become ${formatDose(doseFor({ doseRules: [...doseRules] }, ten))}`;
}

const asSentence = (words: string) => `${words.charAt(0).toUpperCase()}${words.slice(1).replace(/\.$/, '')}.`;

/** The moment that shows each way: where it was filmed as this substitution, else its best demo. */
function insteadOf(
  dictionary: TeamDictionary,
  movementId: string,
  ways: readonly Way[],
  of: (movementId: string) => FoundChapter[],
  moments: ReadonlyMap<string, Moment>,
): Finding[] {
  return ways.flatMap((way) => {
    if (!dictionary.movements.has(way.movementId)) return [];
    const chapters = of(way.movementId);
    const chapter = chapters.find(({ standsInForMovementId }) => standsInForMovementId === movementId) ?? chapters[0];
    return finding(moments.get(chapter?.id ?? ''), 'substitution', null, way.note);
  });
}

function finding(
  moment: Moment | undefined,
  why: Finding['why'],
  said: Finding['said'] = null,
  note: string | null = null,
): Finding[] {
  return moment ? [{ moment, why, said, note }] : [];
}

/** What to look for in what was said: the words that name no movement, or else the name that was meant, spelled as it is. */
function wordsToFind(q: string, { accepted, leftOver, movements }: ResolvedQuery): string[] {
  if (leftOver.length > 0) return leftOver;
  return wordsOf(accepted ? (movements[0]?.matched ?? '') : q);
}

async function chaptersByIds(found: readonly { id: string }[]): Promise<ChapterRow[]> {
  const ids = [...new Set(found.map(({ id }) => id))];
  return ids.length === 0 ? [] : ChapterRow.findAll({ where: { id: ids } });
}
