import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { buildDictionary, type NamedMovement } from '../../../shared/domain/search/dictionary';
import { resolve } from '../../../shared/domain/search/resolveQuery';
import type { Pattern } from '../../../shared/domain/words';
import { gym, movements as gymMovements } from './gym';
import { seeded, slip } from './typos';

/** How often the movement that was meant is among the first three, for every name of five letters and more. */
function recallAt3(
  movements: readonly NamedMovement[],
  dictionary: typeof gym,
  change: (name: string, random: () => number) => string,
) {
  const random = seeded(20260303);
  const asked = movements.flatMap(({ id, name, otherNames }) =>
    [name, ...otherNames].filter((one) => one.length > 4).map((one) => ({ id, query: change(one, random) })),
  );
  const found = asked.filter(({ id, query }) => {
    const { movements: sure, didYouMean } = resolve(dictionary, query);
    return [...sure, ...didYouMean].slice(0, 3).some((one) => one.id === id);
  });
  return found.length / asked.length;
}

const changes: [string, number, (name: string, random: () => number) => string][] = [
  ['one slip', 0.95, slip],
  ['two slips', 0.9, (name, random) => slip(slip(name, random), random)],
  [
    'a slip among other words',
    0.9,
    (name, random) => `show me the ${slip(name, random)} ${random() < 0.5 ? 'slowly' : 'for beginners'}`,
  ],
  ['the beginning alone', 0.8, (name) => name.slice(0, Math.max(4, Math.ceil(name.length * 0.7)))],
];

describe('a query with typos', () => {
  it.each(changes)('%s: the first three hold the movement in at least %d of a small dictionary', (_, least, change) => {
    expect(recallAt3(gymMovements, gym, change)).toBeGreaterThanOrEqual(least);
  });

  const file = new URL('../../../../shared/data/gold/movements.json', import.meta.url);
  describe.skipIf(!existsSync(file))(
    'against a dictionary that others wrote (skipped without the reference data)',
    () => {
      const entries: { name: string; names: string[]; pattern: Pattern }[] = existsSync(file)
        ? JSON.parse(readFileSync(file, 'utf8'))
        : [];
      const movements = entries.map(({ name, names, pattern }) => ({ id: name, name, otherNames: names, pattern }));
      const dictionary = buildDictionary(movements, []);

      it.each(changes)('%s: the first three hold the movement in at least %d', (_, least, change) => {
        expect(movements.length).toBeGreaterThan(100);
        expect(recallAt3(movements, dictionary, change)).toBeGreaterThanOrEqual(least);
      });
    },
  );
});
