import { existsSync, readFileSync } from 'node:fs';
import { doubleMetaphone } from 'double-metaphone';
import { describe, expect, it } from 'vitest';
import { editDistance } from '../../shared/domain/search/editDistance';
import { soundOf } from '../../shared/domain/search/soundOf';

describe('edit distance: Damerau–Levenshtein, optimal string alignment', () => {
  it.each([
    // the restricted form says 3 where the unrestricted one says 2
    ['CA', 'ABC', 3],
    ['kitten', 'sitting', 3],
    ['MARTHA', 'MARHTA', 1],
    ['', 'rope', 4],
    ['rope', 'rope', 0],
  ])('%s → %s is %i', (a, b, edits) => {
    expect(editDistance(a, b)).toBe(edits);
    expect(editDistance(b, a)).toBe(edits);
  });
});

describe('sound: Double Metaphone', () => {
  it.each([
    // Philips’ own examples
    ['Smith', 'SM0', 'XMT'],
    ['Schmidt', 'XMT', 'SMT'],
    ['Thumb', '0M', 'TM'],
  ])('%s is %s or %s', (word, primary, secondary) => {
    expect(soundOf(word)).toEqual({ primary, secondary });
  });

  const words =
    'squat hinge lunge thruster kettlebell dumbbell snatch clean jerk burpee knight knee wrist gnat school laugh though bridge edge judge success accident catch machine anchor chorus ghost finger danger language pizza jazz exam xylophone psoas phase sugar shoulder stretch calf plyometric';
  it.each(words.split(' '))('%s sounds as another implementation of the same paper says', (word) => {
    const [primary, secondary] = doubleMetaphone(word);
    expect(soundOf(word)).toEqual({ primary, secondary });
  });

  const movements = new URL('../../../shared/data/gold/movements.json', import.meta.url);
  it.skipIf(!existsSync(movements))(
    'agrees with it on every word of a dictionary of movements (skipped without the reference data)',
    () => {
      const entries: { name: string; names: string[] }[] = JSON.parse(readFileSync(movements, 'utf8'));
      const all = new Set(
        entries
          .flatMap(({ name, names }) => [name, ...names])
          .flatMap((name) => name.split(/[^A-Za-z]+/).filter(Boolean)),
      );
      // Spanish "ll" is left out on purpose
      all.delete('gorilla');
      const differing = [...all].filter((word) => {
        const [primary, secondary] = doubleMetaphone(word);
        const sound = soundOf(word);
        return sound.primary !== primary || sound.secondary !== secondary;
      });
      expect(all.size).toBeGreaterThan(100);
      expect(differing).toEqual([]);
    },
  );
});
