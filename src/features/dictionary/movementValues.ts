import { z } from 'zod';
import { type MovementFields, MovementName } from '../../../shared/contracts/movements';
import { patterns } from '../../../shared/domain/words';

/** A movement as its form holds it: figures and other names as typed, empty lines allowed. */

const mostNames = 40;
const line = (max: number) => z.string().trim().max(max, `At most ${max} characters.`);

const Option = z.object({
  kitItemId: z.uuid('Choose an item.'),
  count: z.string().refine((text) => /^\s*([1-9]|[1-4]\d|50)\s*$/.test(text), '1 to 50'),
  minLoadKg: z.string().refine((text) => text.trim() === '' || isBetween(readFigure(text), 0, 500), 'Up to 500 kg'),
});

export const MovementValues = z.object({
  name: MovementName,
  otherNames: z
    .string()
    .refine((text) => namesIn(text).length <= mostNames, `At most ${mostNames} other names.`)
    .refine((text) => namesIn(text).every((name) => name.length <= 80), 'At most 80 characters a name.'),
  pattern: z.enum(patterns, 'Choose the pattern that fits best.'),
  kitNeeded: z.array(z.object({ options: z.array(Option) })),
  points: z.array(z.object({ text: line(200) })),
  faults: z.array(z.object({ text: line(200) })),
  cautions: z.array(z.object({ say: line(160), more: line(300) })).superRefine((cautions, context) =>
    cautions.forEach(({ say, more }, at) => {
      if (say.trim() === '' && more.trim() !== '')
        context.addIssue({ code: 'custom', path: [at, 'say'], message: 'Say what to do.' });
    }),
  ),
});
export type MovementValues = z.input<typeof MovementValues>;

/** A comma is a decimal comma too. NaN where it is no figure. */
export const readFigure = (text: string): number => Number(text.trim().replace(',', '.'));

const isBetween = (value: number, over: number, most: number) => value > over && value <= most;

const namesIn = (text: string): string[] =>
  text
    .split(/[,;\n]/)
    .map((name) => name.replace(/\s+/g, ' ').trim())
    .filter(Boolean);

export const newOption = (kitItemId = '') => ({ kitItemId, count: '1', minLoadKg: '' });

export function emptyValues(name: string): MovementValues {
  return {
    name,
    otherNames: '',
    pattern: '' as MovementFields['pattern'],
    kitNeeded: [],
    points: [],
    faults: [],
    cautions: [],
  };
}

export function valuesOf(movement: MovementFields): MovementValues {
  const lines = (texts: readonly string[]) => texts.map((text) => ({ text }));
  return {
    name: movement.name,
    otherNames: movement.otherNames.join(', '),
    pattern: movement.pattern,
    kitNeeded: movement.kitNeeded.map(({ anyOf }) => ({
      options: anyOf.map(({ kitItemId, count, minLoadKg }) => ({
        kitItemId,
        count: String(count),
        minLoadKg: minLoadKg === null ? '' : String(minLoadKg),
      })),
    })),
    points: lines(movement.points),
    faults: lines(movement.faults),
    cautions: movement.cautions.map(({ say, more }) => ({ say, more })),
  };
}

/** The same without its empty lines, so that the server's places are the form's. */
export function tidied(values: MovementValues): MovementValues {
  const written = ({ text }: { text: string }) => text.trim() !== '';
  return {
    ...values,
    points: values.points.filter(written),
    faults: values.faults.filter(written),
    cautions: values.cautions.filter(({ say, more }) => `${say}${more}`.trim() !== ''),
  };
}

/** What is sent, of values that the schema has passed. */
export function fieldsOf(values: MovementValues): MovementFields {
  const { kitNeeded, points, faults, cautions, ...rest } = tidied(values);
  return {
    name: rest.name.trim(),
    otherNames: namesIn(rest.otherNames),
    pattern: rest.pattern,
    kitNeeded: kitNeeded.map(({ options }) => ({
      anyOf: options.map(({ kitItemId, count, minLoadKg }) => ({
        kitItemId,
        count: Number(count),
        minLoadKg: minLoadKg.trim() === '' ? null : readFigure(minLoadKg),
      })),
    })),
    points: points.map(({ text }) => text.trim()),
    faults: faults.map(({ text }) => text.trim()),
    cautions: cautions.map(({ say, more }) => ({ say: say.trim(), more: more.trim() })),
  };
}

/** Where the form shows what the server refused: `points.2` is `points.2.text`. */
export const placeInForm = (field: string): string =>
  field
    .replace(/^otherNames\..*/, 'otherNames')
    .replace('.anyOf.', '.options.')
    .replace(/^(points|faults)\.(\d+)$/, '$1.$2.text');
