import { type MovementFields, MovementFields as Schema } from '../../../shared/contracts/movements';
import type { Difference } from '../../lib/mergeVersions';
import { type KitById, kitWords } from './kitWords';

/** One field of one version of a movement. */
export type FieldEntry = { field: keyof MovementFields; of: MovementFields };

const fields = Object.keys(Schema.shape) as (keyof MovementFields)[];

export const fieldNames = {
  name: 'Name',
  otherNames: 'Other names',
  pattern: 'Pattern',
  kitNeeded: 'Kit needed',
  points: 'Points of performance',
  faults: 'Common faults',
  cautions: 'Cautions',
} as const satisfies Record<keyof MovementFields, string>;

export const entriesOf = (of: MovementFields): FieldEntry[] => fields.map((field) => ({ field, of }));

/** Field by field what two people changed of the same version. @param theirs as `entriesOf` gave them */
export function compareMovements(
  base: MovementFields,
  mine: MovementFields,
  theirs: readonly FieldEntry[],
): Difference<FieldEntry>[] {
  return theirs.flatMap((theirEntry) => {
    const { field, of } = theirEntry;
    const differs = (one: MovementFields, other: MovementFields) =>
      JSON.stringify(one[field]) !== JSON.stringify(other[field]);
    const [iChanged, theyChanged] = [differs(base, mine), differs(base, of)];
    if (!iChanged && !theyChanged) return [];
    return [
      {
        base: { field, of: base },
        mine: { field, of: mine },
        theirs: theirEntry,
        myChange: iChanged ? ('changed' as const) : ('same' as const),
        theirChange: theyChanged ? ('changed' as const) : ('same' as const),
        conflict: iChanged && theyChanged && differs(mine, of),
      },
    ];
  });
}

/** The movement that a choice of fields makes. */
export const movementOf = (entries: readonly FieldEntry[], start: MovementFields): MovementFields =>
  Object.assign({}, start, ...entries.map(({ field, of }) => ({ [field]: of[field] })));

/** A field's content in lines. */
export function linesOf({ field, of }: FieldEntry, kit: KitById): string[] {
  if (field === 'kitNeeded') return [kitWords(of.kitNeeded, kit) || 'nothing'];
  if (field === 'cautions') return of.cautions.map(({ say, more }) => (more ? `${say} ${more}` : say));
  if (field === 'otherNames') return [of.otherNames.join(', ') || 'none'];
  const value = of[field];
  return typeof value === 'string' ? [value] : value;
}
