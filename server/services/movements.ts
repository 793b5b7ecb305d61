import { col, fn, literal, Op, type WhereOptions, where } from 'sequelize';
import { z } from 'zod';
import type * as contract from '../../shared/contracts/movements';
import { resolve } from '../../shared/domain/search/resolveQuery';
import { Id, shortText } from '../../shared/domain/values';
import type { Pattern } from '../../shared/domain/words';
import { AppError, type FieldErrors } from '../../shared/errors';
import { limits } from '../../shared/limits';
import { database, inTransaction } from '../models/database';
import { KitItem, Movement } from '../models/dictionary';
import { lowered } from '../models/lowered';
import { ChapterRow } from '../models/marks';
import type { Actor } from './actor';
import { audit } from './audit';
import { mediaUrl } from './context';
import { newestDemos } from './demos';
import { bumpDictionary, dictionaryOf, type TeamDictionary } from './dictionary';
import { chapterPictureUrls, presentMoments, visibleChaptersWhere } from './moments';
import { pageOf, readCursor } from './pages';
import { refreshSearchOf } from './searchIndex';
import { substitutionsAround } from './substitutions';
import { saveIfCurrent } from './versions';

type ListQuery = { q?: string | undefined; pattern?: Pattern | undefined; cursor?: string | undefined; limit: number };
type Page = { items: contract.MovementInList[]; nextCursor: string | null };

/** The most moments that a movement's page lists, newest first. */
const mostMoments = 200;

/** The dictionary by name, a page at a time; with words to look for one page, best first. */
export function list(actor: Actor, { q, ...query }: ListQuery): Promise<Page> {
  const typed = q?.trim() ?? '';
  return typed === '' ? byName(actor, query) : byMeaning(actor, typed, query);
}

async function byName(actor: Actor, { pattern, cursor, limit }: ListQuery): Promise<Page> {
  const after = readNameCursor(cursor);
  const rows = await Movement.findAll({
    attributes: { include: [[fn('lower', col('name')), 'sortName']] },
    where: {
      teamId: actor.team.id,
      mergedIntoId: null,
      ...(pattern ? { pattern } : {}),
      ...(after
        ? {
            [Op.and]: literal(`(lower(name), id) > (${database().escape(after.name)}, ${database().escape(after.id)})`),
          }
        : {}),
    },
    order: [
      [fn('lower', col('name')), 'ASC'],
      ['id', 'ASC'],
    ],
    limit: limit + 1,
  });
  const page = pageOf(rows, limit, (row) => [String(row.get('sortName')), row.id]);
  return { items: await presentList(actor, page.items), nextCursor: page.nextCursor };
}

/** @throws AppError `invalid` */
function readNameCursor(cursor: string | undefined): { name: string; id: string } | undefined {
  const parts = readCursor(cursor, 2);
  if (!parts) return undefined;
  const read = NameCursor.safeParse({ name: parts[0], id: parts[1] });
  if (!read.success)
    throw new AppError('invalid', { fields: { cursor: 'This list changed. Start at its beginning.' } });
  return read.data;
}

const NameCursor = z.object({ name: shortText(200), id: Id });

async function byMeaning(actor: Actor, q: string, { pattern, limit }: ListQuery): Promise<Page> {
  const dictionary = await dictionaryOf(actor.team.id);
  const { movements, didYouMean, without } = resolve(dictionary.search, q);
  const meant = (movements.length > 0 ? movements : didYouMean).map(({ id }) => id);
  const ids = without.length > 0 ? doneWithout(dictionary, without, meant) : meant;
  const rows = await Movement.findAll({
    where: { teamId: actor.team.id, id: ids, mergedIntoId: null, ...(pattern ? { pattern } : {}) },
  });
  const inOrder = rows.toSorted((a, b) => ids.indexOf(a.id) - ids.indexOf(b.id)).slice(0, limit);
  return { items: await presentList(actor, inOrder), nextCursor: null };
}

/** "row without rings": what asks for none of these; of all movements where the query names only kit. */
function doneWithout({ movements }: TeamDictionary, without: readonly string[], meant: readonly string[]): string[] {
  const isDone = (id: string) =>
    (movements.get(id)?.kitNeeded ?? []).every(({ anyOf }) =>
      anyOf.some((option) => !without.includes(option.kitItemId)),
    );
  return (meant.length > 0 ? meant : [...movements.keys()]).filter(isDone);
}

async function presentList(actor: Actor, rows: Movement[]): Promise<contract.MovementInList[]> {
  const ids = rows.map(({ id }) => id);
  const shown = await shownCounts(actor, ids);
  // where nobody gave a movement a picture, its newest demo shows what it is
  const demos = await newestDemos(actor, ids);
  const stills = await chapterPictureUrls(
    actor.team.id,
    [...demos.values()].map(({ id }) => id),
  );
  return rows.map((row) => ({
    id: row.id,
    name: row.name,
    otherNames: row.otherNames,
    pattern: row.pattern,
    kitNeeded: row.kitNeeded,
    pictureUrl: pictureUrlOf(row) ?? stills.get(demos.get(row.id)?.id ?? '') ?? null,
    demoCount: Math.min(limits.countCap, shown.get(row.id) ?? 0),
  }));
}

async function shownCounts(actor: Actor, ids: string[]): Promise<Map<string, number>> {
  if (ids.length === 0) return new Map();
  const counts = await ChapterRow.count({ where: shownWhere(actor, ids), group: ['movementId'] });
  return new Map(counts.map((row) => [String(row.movementId ?? row.movement_id), Number(row.count)]));
}

/** What shows a movement: nobody looks for it in outtakes. */
const shownWhere = (actor: Actor, movementId: string | string[]): WhereOptions<ChapterRow> => ({
  [Op.and]: [visibleChaptersWhere(actor), { movementId, kind: { [Op.ne]: 'aside' } }],
});

/** Every name, for completion while typing. */
export async function names(actor: Actor) {
  const { movements } = await dictionaryOf(actor.team.id);
  return Array.from(movements.values(), ({ id, name, otherNames, pattern }) => ({
    id,
    name,
    otherNames: [...otherNames],
    pattern,
  }));
}

/**
 * A movement with its substitutions and the moments that show it; a merged duplicate leads to what it became.
 * @throws AppError `notFound`
 */
export async function read(actor: Actor, movementId: string) {
  const asked = await Movement.findOne({ where: { id: movementId, teamId: actor.team.id } });
  const movement = asked?.mergedIntoId
    ? await Movement.findOne({ where: { id: asked.mergedIntoId, teamId: actor.team.id } })
    : asked;
  if (!movement) throw new AppError('notFound');
  const [around, chapters] = await Promise.all([
    substitutionsAround(actor, movement.id),
    ChapterRow.findAll({
      where: shownWhere(actor, movement.id),
      order: [
        [literal(filmedAt), 'DESC'],
        ['startMs', 'ASC'],
        ['id', 'ASC'],
      ],
      limit: mostMoments,
    }),
  ]);
  return { movement: present(movement), ...around, moments: await presentMoments(actor, chapters) };
}

const filmedAt = `(select coalesce(s.date::timestamptz, r.created_at) from recordings r left join sessions s on s.id = r.session_id
  where r.id = "ChapterRow"."recording_id")`;

/** @throws AppError `nameTaken`, `invalid` for kit that the team has not */
export function create(actor: Actor, fields: contract.MovementFields): Promise<contract.Movement> {
  return inTransaction(async () => {
    await bumpDictionary(actor.team.id);
    await refuseTakenName(actor, fields.name);
    await refuseUnknownKit(actor, fields);
    if ((await Movement.count({ where: { teamId: actor.team.id, mergedIntoId: null } })) >= limits.movementsPerTeam)
      throw new AppError('invalid', { message: `A dictionary holds at most ${limits.movementsPerTeam} movements.` });
    const movement = await Movement.create({ ...columnsOf(fields), teamId: actor.team.id });
    await audit(actor, 'movement.created', subject(movement), { name: movement.name });
    return present(movement);
  });
}

/**
 * Changes a movement; a former name stays as another name, so that nobody's search breaks.
 * @throws AppError `notFound`, `nameTaken`, `invalid`, or `stale` with the current movement
 */
export function update(
  actor: Actor,
  movementId: string,
  { version, ...fields }: contract.MovementFields & { version: number },
): Promise<contract.Movement> {
  return inTransaction(async () => {
    await bumpDictionary(actor.team.id);
    const movement = await movementOf(actor, movementId);
    if (movement.version !== version) throw new AppError('stale', { current: present(movement) });
    await refuseTakenName(actor, fields.name, movement.id);
    await refuseUnknownKit(actor, fields);
    const from = movement.name;
    const otherNames = namesBeside(fields.name, [...fields.otherNames, ...(from === fields.name ? [] : [from])]);
    refuseTooManyNames(otherNames, 'otherNames');
    await saveIfCurrent(movement, version, { ...columnsOf(fields), otherNames }, async () => present(movement));
    await audit(actor, from === movement.name ? 'movement.changed' : 'movement.renamed', subject(movement), {
      from,
      to: movement.name,
    });
    await refreshSearchOf({ movementId });
    return present(movement);
  });
}

/** A movement to change. @throws AppError `notFound` for a merged duplicate too, saying what it became */
export async function movementOf(actor: Actor, movementId: string): Promise<Movement> {
  const movement = await Movement.findOne({ where: { id: movementId, teamId: actor.team.id } });
  if (!movement) throw new AppError('notFound');
  if (!movement.mergedIntoId) return movement;
  const became = await Movement.findOne({ where: { id: movement.mergedIntoId, teamId: actor.team.id } });
  throw new AppError('notFound', { message: `“${movement.name}” was merged into “${became?.name ?? ''}”.` });
}

/** Other names without doubles in any case and without the name itself. */
export function namesBeside(name: string, otherNames: readonly string[]): string[] {
  const seen = new Set([name.toLowerCase()]);
  return otherNames.filter((other) => !seen.has(other.toLowerCase()) && seen.add(other.toLowerCase()));
}

/** @throws AppError `invalid` at a field */
export function refuseTooManyNames(otherNames: readonly string[], field: string): void {
  if (otherNames.length > mostOtherNames)
    throw new AppError('invalid', {
      fields: { [field]: `Together these are more than ${mostOtherNames} other names. Take some away first.` },
    });
}

const mostOtherNames = 40;

/** A name leads to one movement; other names may be shared, the search then offers each. */
async function refuseTakenName(actor: Actor, name: string, exceptId?: string): Promise<void> {
  const taken = await Movement.count({
    where: {
      teamId: actor.team.id,
      mergedIntoId: null,
      ...(exceptId ? { id: { [Op.ne]: exceptId } } : {}),
      [Op.and]: where(fn('lower', col('name')), lowered(name)),
    },
  });
  if (taken > 0) throw new AppError('nameTaken', { fields: { name: `“${name}” is in the dictionary already.` } });
}

async function refuseUnknownKit(actor: Actor, { kitNeeded }: contract.MovementFields): Promise<void> {
  const ids = kitNeeded.flatMap((need) => need.anyOf.map(({ kitItemId }) => kitItemId));
  if (ids.length === 0) return;
  const rows = await KitItem.findAll({ where: { teamId: actor.team.id, id: ids }, attributes: ['id'] });
  const known = new Set(rows.map(({ id }) => id));
  const fields: FieldErrors = {};
  kitNeeded.forEach((need, at) => {
    need.anyOf.forEach(({ kitItemId }, option) => {
      if (!known.has(kitItemId))
        fields[`kitNeeded.${at}.anyOf.${option}.kitItemId`] = 'The team’s list has no such item any more.';
    });
  });
  if (Object.keys(fields).length > 0) throw new AppError('invalid', { fields });
}

const columnsOf = (fields: contract.MovementFields): contract.MovementFields => ({
  name: fields.name,
  otherNames: namesBeside(fields.name, fields.otherNames),
  pattern: fields.pattern,
  kitNeeded: fields.kitNeeded,
  points: fields.points,
  faults: fields.faults,
  cautions: fields.cautions,
});

export const subject = (movement: Movement) => ({ type: 'movement', id: movement.id });

const pictureUrlOf = (movement: Movement) =>
  movement.pictureName ? mediaUrl(movement.teamId, movement.id, movement.pictureName) : null;

export function present(movement: Movement): contract.Movement {
  return {
    id: movement.id,
    name: movement.name,
    otherNames: movement.otherNames,
    pattern: movement.pattern,
    kitNeeded: movement.kitNeeded,
    points: movement.points,
    faults: movement.faults,
    cautions: movement.cautions,
    pictureUrl: pictureUrlOf(movement),
    version: movement.version,
  };
}
