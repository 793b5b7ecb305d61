import { describe, expect, it } from 'vitest';
import { suggest } from '../../../shared/domain/search/suggest';
import { gym, movements } from './gym';

const names = (typed: string, limit = 5) => suggest(gym, typed, limit).map(({ name }) => name);

describe('suggestions while typing', () => {
  it('begin with names that begin so', () => {
    expect(names('gob')[0]).toBe('goblet squat');
    expect(names('pu').slice(0, 2)).toEqual(['pull-up', 'push-up']);
  });

  it('find the beginning of any word, in any order', () => {
    expect(names('squ')).toEqual(expect.arrayContaining(['air squat', 'goblet squat', 'jump squat']));
    expect(names('row d')[0]).toBe('one-arm dumbbell row');
  });

  it('say which other name matched', () => {
    expect(suggest(gym, 'inver', 3)[0]).toEqual({ id: 'ring row', name: 'ring row', matched: 'inverted row' });
  });

  it('follow with what a typo may mean', () => {
    expect(names('gobelt')[0]).toBe('goblet squat');
    expect(names('ketlebell sw')[0]).toBe('kettlebell swing');
  });

  it('are none for nothing, and never more than asked for or twice the same', () => {
    expect(names('')).toEqual([]);
    expect(names('zzzz')).toEqual([]);
    expect(names('s', 3)).toHaveLength(3);
    const many = names('s', 100);
    expect(new Set(many).size).toBe(many.length);
  });

  it('show every movement before its name is typed to the end', () => {
    for (const { name } of movements) expect(names(name.slice(0, -1))).toContain(name);
  });
});
