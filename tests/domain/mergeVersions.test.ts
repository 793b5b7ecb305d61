import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { inOrder } from '../../shared/domain/captions/captionFaults';
import { compareLineVersions } from '../../shared/domain/captions/compareVersions';
import { compareCueVersions, cueFromLine, putCue, sortCues } from '../../src/features/cues/editCues';
import { mergeVersions } from '../../src/lib/mergeVersions';

const line = (second: number, text: string) => ({ startMs: second * 1000, endMs: second * 1000 + 900, text });

describe('two versions together', () => {
  it('keeps what each changed, added and removed', () => {
    const base = [line(1, 'one'), line(2, 'two'), line(3, 'three'), line(4, 'four')];
    const mine = [line(1, 'ONE'), line(2, 'two'), line(4, 'four'), line(5, 'five')];
    const theirs = [line(0, 'zero'), line(1, 'one'), line(2, 'TWO'), line(3, 'three'), line(4, 'four')];
    const differences = compareLineVersions(base, mine, theirs);
    expect(differences.some(({ conflict }) => conflict)).toBe(false);
    expect(inOrder(mergeVersions(theirs, differences, [])).map(({ text }) => text)).toEqual([
      'zero',
      'ONE',
      'TWO',
      'four',
      'five',
    ]);
  });

  it('takes the chosen side where both changed the same', () => {
    const base = [line(1, 'kettle bell')];
    const mine = [line(1, 'kettlebell')];
    const theirs = [line(1, 'cattle bell')];
    const differences = compareLineVersions(base, mine, theirs);
    expect(differences.map(({ conflict }) => conflict)).toEqual([true]);
    expect(mergeVersions(theirs, differences, ['mine'])).toEqual(mine);
    expect(mergeVersions(theirs, differences, ['theirs'])).toEqual(theirs);
  });

  const versions = fc
    .uniqueArray(fc.integer({ min: 0, max: 30 }), { maxLength: 12 })
    .map((seconds) => seconds.toSorted((a, b) => a - b).map((second) => line(second, `at ${second}`)));

  it('is my version when they changed nothing, and theirs when I did not', () => {
    fc.assert(
      fc.property(versions, versions, (base, changed) => {
        const asMine = mergeVersions([...base], compareLineVersions(base, changed, base), []);
        expect(inOrder(asMine)).toEqual(changed);
        expect(inOrder(mergeVersions(changed, compareLineVersions(base, base, changed), []))).toEqual(changed);
      }),
    );
  });
});

const id = (n: number) => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;
const cue = (n: number, text: string) => ({ id: id(n), atMs: n * 1000, kind: 'go' as const, text, movementId: null });

describe('cues', () => {
  it('are told apart by id: a moved one is changed, not removed and added', () => {
    const base = [cue(1, 'Ribs down'), cue(2, 'Breathe')];
    const mine = [{ ...cue(1, 'Ribs down'), atMs: 5000 }, cue(2, 'Breathe')];
    const theirs = [cue(1, 'Ribs down')];
    expect(compareCueVersions(base, mine, theirs).map(({ myChange, theirChange }) => [myChange, theirChange])).toEqual([
      ['same', 'removed'],
      ['changed', 'same'],
    ]);
    const both = sortCues(mergeVersions(theirs, compareCueVersions(base, mine, theirs), []));
    expect(both.map(({ atMs, text }) => [atMs, text])).toEqual([[5000, 'Ribs down']]);
  });

  it('stay in order of time, and one without words is refused', () => {
    const edit = putCue([cue(3, 'Stand')], cue(1, 'Feet under your hips'));
    expect('cues' in edit && edit.cues.map(({ atMs }) => atMs)).toEqual([1000, 3000]);
    expect(putCue([], cue(1, '  '))).toEqual({ refused: 'Write something here.' });
  });

  it('start from the spoken line in one row, cut between words at 140 characters', () => {
    expect(cueFromLine('Hands under the shoulders,\nknees under the hips.')).toBe(
      'Hands under the shoulders, knees under the hips.',
    );
    const long = Array.from({ length: 40 }, () => 'press').join(' ');
    expect(cueFromLine(long)).toHaveLength(137);
    expect(long.startsWith(`${cueFromLine(long)} `)).toBe(true);
  });
});
