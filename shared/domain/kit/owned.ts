import type { KitNeed, KitOption, OwnedKit } from './kit';

/**
 * Whether somebody with this kit can do a movement with these needs. All needs are met at the same time, each by pieces of its own:
 * two needs of one dumbbell take two dumbbells. A piece whose load nobody noted counts as fitting; refusing it would hide
 * demos from members who never weigh their kit.
 */
export function canDo(needs: readonly KitNeed[], owned: readonly OwnedKit[]): boolean {
  return missingFor(needs, owned).length === 0;
}

/**
 * The needs that this kit leaves unmet, in order; empty exactly where `canDo` says yes. Where two needs compete for the same
 * pieces, the later one is missing.
 */
export function missingFor(needs: readonly KitNeed[], owned: readonly OwnedKit[]): KitNeed[] {
  const stock = stockOf(owned);
  const met: KitNeed[] = [];
  return needs.filter((need) => {
    if (!canMeetTogether([...met, need], stock)) return true;
    met.push(need);
    return false;
  });
}

/** The items that would meet a need, for "without a rope". */
export const itemsOf = (needs: readonly KitNeed[]): Set<string> =>
  new Set(needs.flatMap((need) => need.anyOf.map((option) => option.kitItemId)));

type Stock = ReadonlyMap<string, { loadsKg: readonly number[]; unknown: number }>;

function stockOf(owned: readonly OwnedKit[]): Stock {
  const stock = new Map<string, { loadsKg: number[]; unknown: number }>();
  for (const { kitItemId, count, loadsKg } of owned) {
    const have = stock.get(kitItemId) ?? { loadsKg: [], unknown: 0 };
    // more loads than pieces: the heaviest are believed, so that one more note never takes anything away
    const known = loadsKg.toSorted((a, b) => b - a).slice(0, count);
    have.loadsKg.push(...known);
    have.unknown += count - known.length;
    stock.set(kitItemId, have);
  }
  return stock;
}

/** Tries the options of one need after the other; a choice of pieces that led nowhere is not tried twice. */
function canMeetTogether(needs: readonly KitNeed[], stock: Stock): boolean {
  const deadEnds = new Set<string>();
  const meetFrom = (at: number, taken: readonly KitOption[]): boolean => {
    const need = needs[at];
    if (!need) return true;
    const state = `${at}|${taken.map(optionKey).sort().join()}`;
    if (deadEnds.has(state)) return false;
    const works = need.anyOf.some((option) => {
      const next = [...taken, option];
      return suffices(next, option.kitItemId, stock) && meetFrom(at + 1, next);
    });
    if (!works) deadEnds.add(state);
    return works;
  };
  return meetFrom(0, []);
}

const optionKey = (option: KitOption) => `${option.kitItemId}:${option.count}:${option.minLoadKg ?? 0}`;

/**
 * Whether the pieces of one item suffice for all that is taken of it. Least loads are nested (what is heavy enough for 24 kg is
 * enough for 16), so it is enough to count from the heaviest down: Hall's condition for nested sets.
 */
function suffices(taken: readonly KitOption[], kitItemId: string, stock: Stock): boolean {
  const have = stock.get(kitItemId);
  if (!have) return false;
  const wanted = taken.filter((option) => option.kitItemId === kitItemId);
  return wanted.every(({ minLoadKg }) => {
    const least = minLoadKg ?? 0;
    const pieces = wanted.reduce((sum, other) => sum + ((other.minLoadKg ?? 0) >= least ? other.count : 0), 0);
    return pieces <= have.unknown + have.loadsKg.filter((kg) => kg >= least).length;
  });
}
