import { describe, expect, it } from 'vitest';
import { comparePlans, entriesOf, joinEntries } from '../../src/features/plans/comparePlans';
import { addBlock, addLine, moveLine, newBlock, newLine, setBlock, setLine } from '../../src/features/plans/editPlan';
import { dictionaryWays, type MovementFacts } from '../../src/features/plans/lineWays';
import { nextDay } from '../../src/features/plans/nextDay';
import { asWritten, readPlan, type WrittenPlan } from '../../src/features/plans/writtenPlan';
import { mergeVersions } from '../../src/lib/mergeVersions';

const id = (n: number) => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;
const nameOf = () => 'Ring row';
const line = (n: number, dose: string) => ({ ...newLine(id(n)), movementId: id(100 + n), dose });

function plan(): WrittenPlan {
  const head = { date: '2026-03-03', title: 'Step, row, skip', note: '', aim: '', blocks: [] };
  const [warm, work] = [newBlock(id(1), 'warm-up'), newBlock(id(2), 'workout')];
  return addBlock(addBlock(head, { ...warm, lines: [line(11, '30 s')] }), {
    ...work,
    scheme: '12 min amrap',
    lines: [line(21, '6/side @ 35 lb'), line(22, '8')],
  });
}

describe('a plan while it is written', () => {
  it('is read into movements and doses, and comes back written out', () => {
    const read = readPlan(plan(), nameOf);
    if ('faults' in read) throw new Error(read.faults.join());
    expect(read.blocks[1]?.scheme).toEqual({ type: 'amrap', minutes: 12 });
    expect(read.blocks[1]?.lines[0]?.dose).toMatchObject({ amount: 6, perSide: true, load: { typed: '35 lb' } });
    expect(asWritten(read).blocks[1]).toMatchObject({
      scheme: 'AMRAP 12',
      lines: [{ dose: '6 / side at 35 lb' }, { dose: '8' }],
    });
  });

  it('leaves out a line that nobody wrote on, and names the place of every fault', () => {
    const blank = addLine(plan(), id(1), newLine(id(12)), null);
    expect(readPlan(blank, nameOf)).toEqual(readPlan(plan(), nameOf));
    const faulty = setLine(setBlock(blank, id(2), { scheme: 'hard' }), id(22), { dose: 'lots' });
    const read = readPlan({ ...faulty, title: ' ' }, nameOf);
    expect('faults' in read && read.faults).toEqual([
      'Give the session a title.',
      expect.stringMatching(/^Workout, Ring row: Say how much/),
      expect.stringMatching(/^Workout: Write it like/),
    ]);
  });

  it('moves a line over the edge of its block into the block beside it', () => {
    const moved = moveLine(plan(), id(21), -1);
    expect(moved.blocks.map(({ lines }) => lines.map((one) => one.id))).toEqual([[id(11), id(21)], [id(22)]]);
    expect(moveLine(moved, id(11), -1)).toBe(moved);
    expect(moveLine(moved, id(21), 1)).toEqual(plan());
  });
});

describe('two versions of a plan', () => {
  const merge = (base: WrittenPlan, mine: WrittenPlan, theirs: WrittenPlan) => {
    const entries = entriesOf(theirs);
    const differences = comparePlans(base, mine, entries);
    return { differences, joined: joinEntries(mergeVersions(entries, differences, []), mine) };
  };

  it('are joined where both changed different things, each added block behind the one it followed', () => {
    const mine = setLine(plan(), id(11), { dose: '40 s' });
    const theirs = addBlock({ ...plan(), aim: '7 to 9' }, newBlock(id(3), 'cool-down'));
    const { differences, joined } = merge(plan(), mine, theirs);
    expect(differences.some(({ conflict }) => conflict)).toBe(false);
    expect(joined).toEqual({ ...theirs, blocks: [mine.blocks[0], ...theirs.blocks.slice(1)] });
  });

  it('conflict where both changed the same block', () => {
    const { differences } = merge(
      plan(),
      setLine(plan(), id(22), { dose: '9' }),
      setLine(plan(), id(21), { dose: '7' }),
    );
    expect(differences.map(({ conflict }) => conflict)).toEqual([true]);
  });

  it('hold a line once that one of the two moved to another block', () => {
    const mine = moveLine(plan(), id(21), -1);
    const theirs = setBlock(plan(), id(2), { note: 'steady' });
    const joined = joinEntries(
      [
        ...entriesOf(theirs).filter(({ id: at }) => at !== id(1)),
        ...entriesOf(mine).filter(({ id: at }) => at === id(1)),
      ],
      mine,
    );
    const lines = joined.blocks.flatMap((block) => block.lines.map((one) => one.id));
    expect(lines.toSorted()).toEqual([id(11), id(21), id(22)]);
  });
});

describe('what the dictionary has instead of a line', () => {
  const facts: MovementFacts = {
    movement: {
      id: id(121),
      name: 'Rope skip',
      otherNames: [],
      pattern: 'jump',
      kitNeeded: [{ anyOf: [{ kitItemId: id(500), count: 1, minLoadKg: null }] }],
      points: [],
      faults: [],
      cautions: [],
      pictureUrl: null,
      version: 1,
    },
    substitutions: [
      substitution(1, { missing: 'kit', missingKitItemId: id(500), doseRule: { type: 'times', factor: 1.5, cap: 40 } }),
      substitution(2, { missing: 'ability', missingKitItemId: null, doseRule: { type: 'same' } }),
    ],
    moments: [],
  };

  function substitution(
    n: number,
    more: Pick<MovementFacts['substitutions'][number], 'missing' | 'missingKitItemId' | 'doseRule'>,
  ) {
    const from = { id: id(121), name: 'Rope skip' };
    return { id: id(600 + n), from, to: { id: id(700 + n), name: `Way ${n}` }, reason: '', version: 1, ...more };
  }

  it('is taken for the kit that the movement needs, with the dose that its rule makes', () => {
    const ways = dictionaryWays(line(21, '30'), facts, () => id(800));
    expect(ways).toEqual([
      { id: id(800), movementId: id(701), missing: 'kit', missingKitItemId: id(500), dose: '40', reason: '' },
    ]);
    expect(dictionaryWays({ ...line(21, '20'), substitutions: ways }, facts, () => id(801))).toEqual([]);
  });
});

it('plans next on the first free day from tomorrow on', () => {
  expect(nextDay('2026-02-27', ['2026-02-28', '2026-02-26'])).toBe('2026-03-01');
});
