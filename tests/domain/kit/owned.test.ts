import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { canDo, missingFor } from '../../../shared/domain/kit/owned';
import { have, moreKit, need, needs, ownedKit, together } from './kitWorld';

describe('what a kit allows', () => {
  it('allows what needs nothing', () => {
    expect(canDo([], [])).toBe(true);
  });

  it('counts pieces', () => {
    expect(canDo([need('dumbbell', 2)], [have('dumbbell', 1)])).toBe(false);
    expect(canDo([need('dumbbell', 2)], [have('dumbbell', 2)])).toBe(true);
  });

  it('takes any one option of a need', () => {
    const barOrRings = { anyOf: [...need('bar').anyOf, ...need('rings').anyOf] };
    expect(canDo([barOrRings], [have('rings')])).toBe(true);
    expect(canDo([barOrRings], [have('rope')])).toBe(false);
  });

  it('asks each piece for the least load, and lets unknown loads pass', () => {
    expect(canDo([need('bell', 2, 16)], [have('bell', 2, [16, 12])])).toBe(false);
    expect(canDo([need('bell', 2, 16)], [have('bell', 2, [16, 24])])).toBe(true);
    expect(canDo([need('bell', 2, 16)], [have('bell', 2)])).toBe(true);
    expect(canDo([need('bell', 2, 16)], [have('bell', 3, [12, 16])])).toBe(true);
  });

  it('does not count one piece for two needs', () => {
    expect(canDo([need('dumbbell'), need('dumbbell')], [have('dumbbell', 1)])).toBe(false);
    expect(missingFor([need('dumbbell'), need('dumbbell')], [have('dumbbell', 1)])).toEqual([need('dumbbell')]);
  });

  it('gives the heavy piece to the need that asks for it, whatever the order', () => {
    expect(canDo([need('bell'), need('bell', 1, 24)], [have('bell', 2, [24, 8])])).toBe(true);
    const either = { anyOf: [...need('bell').anyOf, ...need('rope').anyOf] };
    expect(canDo([either, need('bell')], [have('bell'), have('rope')])).toBe(true);
  });

  it('names the needs that are missing', () => {
    expect(missingFor([need('bar'), need('rope'), need('bell', 1, 16)], [have('rope'), have('bell', 1, [12])])).toEqual(
      [need('bar'), need('bell', 1, 16)],
    );
  });

  it('answers quickly when many needs compete for little', () => {
    const items = Array.from({ length: 10 }, (_, i) => `item${i}`);
    const crowded = Array.from({ length: 10 }, () => ({ anyOf: items.flatMap((id) => need(id).anyOf) }));
    expect(
      canDo(
        crowded,
        items.map((id) => have(id)),
      ),
    ).toBe(true);
    expect(
      missingFor(
        crowded,
        items.slice(0, 9).map((id) => have(id)),
      ),
    ).toHaveLength(1);
  });

  it('never loses a movement with more kit', () => {
    fc.assert(
      fc.property(needs, ownedKit, moreKit, (wanted, owned, more) => {
        fc.pre(canDo(wanted, owned));
        expect(canDo(wanted, together(owned, more))).toBe(true);
      }),
    );
  });

  it('allows a movement exactly where nothing is missing for it', () => {
    fc.assert(
      fc.property(needs, ownedKit, (wanted, owned) => {
        const missing = missingFor(wanted, owned);
        expect(canDo(wanted, owned)).toBe(missing.length === 0);
        expect(
          canDo(
            wanted.filter((one) => !missing.includes(one)),
            owned,
          ),
        ).toBe(true);
      }),
    );
  });
});
