import { describe, expect, it } from 'vitest';
import { missingText, missingTexts } from '../../../shared/domain/kit/missingText';
import { have, need } from './kitWorld';

const items = new Map([
  ['bar', { name: 'bar to hang from', withoutText: 'nothing to hang from' }],
  ['rope', { name: 'rope', withoutText: 'no rope' }],
  ['bell', { name: 'kettlebell', withoutText: 'no kettlebell' }],
  ['dumbbell', { name: 'dumbbell', withoutText: 'no dumbbell' }],
]);

describe('what somebody lacks, in words', () => {
  it.each([
    ['an item that they do not own', need('bar'), [], 'nothing to hang from'],
    ['too few pieces', need('dumbbell', 2), [have('dumbbell', 1)], 'only 1 dumbbell of 2'],
    ['pieces that are too light', need('bell', 1, 16), [have('bell', 1, [8])], 'no kettlebell of 16 kg'],
    ['the only piece, taken by another need', need('dumbbell'), [have('dumbbell', 1)], 'only 1 dumbbell'],
  ] as const)('says %s', (_what, wanted, owned, said) => {
    expect(missingText(wanted, owned, items)).toBe(said);
  });

  it('speaks of the option that somebody is closest to', () => {
    const either = { anyOf: [...need('bar').anyOf, ...need('dumbbell', 2).anyOf] };
    expect(missingText(either, [have('dumbbell', 1)], items)).toBe('only 1 dumbbell of 2');
    expect(missingText(either, [], items)).toBe('nothing to hang from');
  });

  it('says the same thing once', () => {
    expect(missingTexts([need('rope'), need('bar'), need('rope')], [], items)).toEqual([
      'no rope',
      'nothing to hang from',
    ]);
  });
});
