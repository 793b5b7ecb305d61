import type { KitItem } from '../../../shared/contracts/kit';
import type { KitNeed, KitOption } from '../../../shared/domain/kit/kit';
import type { MissingThing } from '../../../shared/domain/words';
import { formatList } from '../../lib/format';

export type KitById = ReadonlyMap<string, KitItem>;

export const kitById = (items: readonly KitItem[]): KitById => new Map(items.map((item) => [item.id, item]));

/** “dumbbells”; a name of several words, such as “bar to hang from”, has no plural that can be guessed. */
function several(count: number, name: string): string {
  if (!/^[\p{L}-]+$/u.test(name)) return `${count} × ${name}`;
  if (name.endsWith('s')) return `${count} ${name}`;
  return `${count} ${name}${/(x|ch|sh)$/.test(name) ? 'es' : 's'}`;
}

/** “2 dumbbells from 6 kg”. */
function optionWords({ kitItemId, count, minLoadKg }: KitOption, kit: KitById): string {
  const name = kit.get(kitItemId)?.name ?? 'an item that is gone';
  const load = minLoadKg === null ? '' : ` from ${minLoadKg} kg`;
  return `${count === 1 ? name : several(count, name)}${load}`;
}

/** The kit that a movement needs, in words: “kettlebell, or dumbbell”; empty where it needs nothing. */
export function kitWords(needs: readonly KitNeed[], kit: KitById): string {
  const [only] = needs;
  if (only && needs.length === 1) return only.anyOf.map((option) => optionWords(option, kit)).join(', or ');
  const each = needs.map(({ anyOf }) =>
    formatList(
      anyOf.map((option) => optionWords(option, kit)),
      'or',
    ),
  );
  return each.length === 0 ? '' : `${each.slice(0, -1).join(', ')}, and ${each.at(-1)}`;
}

/** How what is missing is said: “no rope”, “no space”. */
export function lackWords(lack: { missing: MissingThing; missingKitItemId: string | null }, kit: KitById): string {
  if (lack.missing === 'space') return 'no space';
  if (lack.missing === 'ability') return 'not able to';
  return (lack.missingKitItemId !== null && kit.get(lack.missingKitItemId)?.withoutText) || 'missing kit';
}
