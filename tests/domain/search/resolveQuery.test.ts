import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { resolve } from '../../../shared/domain/search/resolveQuery';
import { gym, kit, movements } from './gym';

const first = (query: string) => resolve(gym, query).movements[0]?.id;
const ids = (query: string) => resolve(gym, query).movements.map(({ id }) => id);

describe('which movement a query means', () => {
  it.each([
    ['goblet squat', 'goblet squat'],
    ['GOBLET   Squats!', 'goblet squat'],
    ['how do I do a goblet squat?', 'goblet squat'],
    ['squat goblet', 'goblet squat'],
    ['gobelt sqaut', 'goblet squat'],
    ['gobletsquat', 'goblet squat'],
    ['goblet', 'goblet squat'],
    ['kettle bell swing', 'kettlebell swing'],
    ['KB swing', 'kettlebell swing'],
    ['rdl', 'Romanian deadlift'],
    ['RDLs', 'Romanian deadlift'],
    ['romainian dedlift', 'Romanian deadlift'],
    ['row one dumbbell', 'one-arm dumbbell row'],
    ['1 arm db row', 'one-arm dumbbell row'],
    ['single arm dumbell row', 'one-arm dumbbell row'],
    ['ring rows', 'ring row'],
    ['pullup', 'pull-up'],
    ['push ups', 'push-up'],
    ['box step ups', 'step-up'],
    ['dubble unders', 'double-under'],
    ['developpe', 'développé'],
    ['sit to stand', 'sit-to-stand'],
    ['lunges', 'reverse lunge'],
    ['kettlebell row', 'gorilla row'],
  ])('“%s” means the %s', (query, id) => {
    expect(first(query)).toBe(id);
    expect(resolve(gym, query).accepted).toBe(true);
  });

  it('gives a whole name the full score and says which name matched', () => {
    expect(resolve(gym, 'inverted row').movements[0]).toEqual({ id: 'ring row', score: 1, matched: 'inverted row' });
  });

  it('gives a pattern word the movements called so first, then all of the pattern', () => {
    expect(ids('hinge')[0]).toBe('hip hinge drill');
    expect(ids('hinge').sort()).toEqual(['Romanian deadlift', 'hip hinge drill', 'kettlebell swing'].sort());
    expect(ids('brace')).toEqual(['dead bug']);
  });

  it('finds two movements in one query', () => {
    expect(ids('ring row and goblet squat').slice(0, 2).sort()).toEqual(['goblet squat', 'ring row']);
    expect(resolve(gym, 'ring row and goblet squat').leftOver).toEqual([]);
  });

  it('hands on the words that name no movement, as they were typed', () => {
    expect(resolve(gym, 'goblet squat knees caving')).toMatchObject({ accepted: true, leftOver: ['knees', 'caving'] });
    expect(resolve(gym, 'what about my knees')).toMatchObject({
      accepted: false,
      movements: [],
      leftOver: ['about', 'knees'],
    });
  });

  it('asks rather than guesses when it is half sure', () => {
    const { accepted, movements: sure, didYouMean, leftOver } = resolve(gym, 'squat depth');
    expect(accepted).toBe(false);
    expect(sure).toEqual([]);
    expect(didYouMean.map(({ id }) => id)).toContain('air squat');
    expect(leftOver).toEqual(['squat', 'depth']);
  });

  it.each(['', '   ', '?', 'x', 'asdf qwer', 'banana bread', 'good morning everyone', '0', '🙂'])(
    'makes nothing of “%s”',
    (query) => {
      expect(resolve(gym, query)).toMatchObject({ movements: [], accepted: false });
    },
  );
});

describe('kit to do without', () => {
  it.each([
    ['no rope', ['rope']],
    ['without a rope', ['rope']],
    ['w/o rope', ['rope']],
    ['without a skiping rope', ['rope']],
    ['no kettlebells', ['kettlebell']],
    ['no KB', ['kettlebell']],
    ['without a ketlebell', ['kettlebell']],
    ['I don’t have a dumbbell', ['dumbbell']],
    ['no bar or rings', ['hang', 'rings']],
    ['without a box, rope or any rings', ['box', 'rope', 'rings']],
    ['without equipment', kit.map(({ id }) => id)],
  ])('“%s”', (query, without) => {
    const resolved = resolve(gym, query);
    expect(resolved.without.sort()).toEqual([...without].sort());
    expect(resolved).toMatchObject({ movements: [], leftOver: [] });
  });

  it('is taken out before the movement is looked for', () => {
    expect(resolve(gym, 'pull-ups no bar or rings')).toMatchObject({
      accepted: true,
      without: ['hang', 'rings'],
      leftOver: [],
    });
    expect(first('pull-ups no bar or rings')).toBe('pull-up');
    expect(resolve(gym, 'no rope double under').without).toEqual(['rope']);
    expect(first('no rope double under')).toBe('double-under');
    expect(resolve(gym, 'no rope and ring row')).toMatchObject({ without: ['rope'], accepted: true });
    expect(first('without a rope, ring row')).toBe('ring row');
  });

  it('is not made of words that name no kit', () => {
    expect(resolve(gym, 'no push-ups')).toMatchObject({ without: [], accepted: true });
    expect(resolve(gym, 'without pain').without).toEqual([]);
  });
});

describe('any text', () => {
  const known = new Set(movements.map(({ id }) => id));
  const word = fc.constantFrom(
    'no',
    'without',
    'or',
    'rope',
    'bar',
    'squat',
    'row',
    'a',
    'w/o',
    'hinge',
    'KB',
    'goblet',
    '-',
    'knees',
  );
  const text = fc.oneof(
    fc.string({ unit: 'binary', maxLength: 250 }),
    fc.array(word, { maxLength: 20 }).map((words) => words.join(' ')),
  );

  it('gets an answer that keeps its promises', () => {
    fc.assert(
      fc.property(text, (query) => {
        const { movements: sure, didYouMean, accepted, without, leftOver } = resolve(gym, query);
        expect(accepted).toBe(sure.length > 0);
        for (const { id, score } of sure) expect(known.has(id) && score >= 0.6 && score <= 1).toBe(true);
        for (const { score } of didYouMean) expect(score >= 0.45 && score < 0.6).toBe(true);
        expect(sure.map(({ score }) => score)).toEqual(sure.map(({ score }) => score).sort((a, b) => b - a));
        expect(new Set(without).size).toBe(without.length);
        expect(leftOver.every((left) => left !== '')).toBe(true);
      }),
      { numRuns: 300 },
    );
  });

  it('finds every movement by each of its names', () => {
    for (const { id, name, otherNames } of movements)
      for (const one of [name, ...otherNames]) expect(first(one)).toBe(id);
  });
});
