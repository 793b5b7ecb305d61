import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { myVersion, oneReason } from '../../../shared/domain/kit/myVersion';
import { canDo } from '../../../shared/domain/kit/owned';
import { kitDictionary } from '../../../shared/domain/kit/substitutionsFor';
import { dictionary, dose, have, lineSubstitutions, need, ownedKit } from './kitWorld';

const known = kitDictionary(
  [
    { id: 'skips', pattern: 'jump', kitNeeded: [need('rope')] },
    { id: 'hops', pattern: 'jump', kitNeeded: [] },
    { id: 'swings', pattern: 'hinge', kitNeeded: [need('bell')] },
    { id: 'squats', pattern: 'squat', kitNeeded: [] },
  ],
  [
    {
      id: '1',
      fromMovementId: 'skips',
      toMovementId: 'hops',
      missing: 'kit',
      missingKitItemId: 'rope',
      doseRule: { type: 'same' },
      reason: 'Hop over a line.',
    },
  ],
);
const line = (id: string, movementId: string, amount: number) => ({
  id,
  movementId,
  dose: dose({ amount }),
  substitutions: [],
});
const plan = [
  { kind: 'warm-up', lines: [line('1', 'skips', 30), line('2', 'squats', 10)] },
  { kind: 'workout', lines: [line('3', 'swings', 12)] },
];

describe('a session in one’s own version', () => {
  it('replaces what the kit does not allow, and asks the coach where no way is known', () => {
    const mine = myVersion(plan, [have('table')], known);
    expect(
      mine.blocks.map(({ block, lines }) => [block.kind, lines.map((l) => [l.line.id, l.state, l.movementId])]),
    ).toEqual([
      [
        'warm-up',
        [
          ['1', 'replaced', 'hops'],
          ['2', 'asPlanned', 'squats'],
        ],
      ],
      ['workout', [['3', 'askTheCoach', 'swings']]],
    ]);
    expect(mine.blocks[0]?.lines[0]).toMatchObject({
      insteadOf: 'skips',
      dose: dose({ amount: 30 }),
      reason: 'Hop over a line.',
      missing: [need('rope')],
    });
    expect(mine.blocks[1]?.lines[0]).toMatchObject({ missing: [need('bell')] });
    expect([mine.changed, mine.toAsk]).toEqual([1, 1]);
  });

  it('is the plan itself for somebody who has everything', () => {
    const mine = myVersion(plan, [have('rope'), have('bell')], known);
    expect([mine.changed, mine.toAsk]).toEqual([0, 0]);
    expect(mine.blocks.flatMap(({ lines }) => lines.map((l) => l.movementId))).toEqual(['skips', 'squats', 'swings']);
  });

  it('never asks for kit that is missing, except where it says so', () => {
    fc.assert(
      fc.property(dictionary, ownedKit, lineSubstitutions, (any, owned, substitutions) => {
        const lines = ['a', 'b', 'c'].map((movementId) => ({ movementId, dose: dose({ amount: 10 }), substitutions }));
        const mine = myVersion([{ lines }], owned, any);
        const all = mine.blocks.flatMap((block) => block.lines);
        for (const one of all) {
          expect(canDo(any.movements.get(one.movementId)?.kitNeeded ?? [], owned)).toBe(one.state !== 'askTheCoach');
        }
        expect(mine.changed).toBe(all.filter((one) => one.movementId !== one.line.movementId).length);
      }),
    );
  });

  it('joins the reasons of a chain', () => {
    expect(oneReason(['No bar: row on rings.', 'No rings: use a table'])).toBe(
      'No bar: row on rings. No rings: use a table',
    );
    expect(oneReason(['no bar', 'no rings'])).toBe('no bar; no rings');
    expect(oneReason([])).toBe('');
  });
});
