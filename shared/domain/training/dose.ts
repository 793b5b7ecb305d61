import { z } from 'zod';
import { longText } from '../values';
import { figure, figurePattern, readFigure, saidInMinutes, secondsPerUnit, secondsText } from './figures';

/** How much of a movement is done: "10 reps", "6 / side", "30 s", "200 m", "12 cal", with a load and a tempo where they matter. */

export const doseUnits = ['reps', 'seconds', 'metres', 'calories'] as const;
export type DoseUnit = (typeof doseUnits)[number];

export const Load = z.object({
  kg: z.number().positive().max(1000),
  /** as the coach typed it, "53 lb", so that nobody has to read a converted figure */
  typed: longText(20),
});
export type Load = z.infer<typeof Load>;

export const Dose = z.object({
  amount: z.number().positive().max(10_000),
  /** the upper end of "8 to 10" */
  amountTo: z.number().positive().max(10_000).nullable().default(null),
  unit: z.enum(doseUnits),
  perSide: z.boolean().default(false),
  load: Load.nullable().default(null),
  /** lowering, pause, rising, pause: "3-0-1-0" */
  tempo: z
    .string()
    .regex(/^\d{1,2}-\d{1,2}-\d{1,2}-\d{1,2}$/, 'Write a tempo as four numbers: 3-0-1-0.')
    .nullable()
    .default(null),
});
export type Dose = z.infer<typeof Dose>;

/** A dose as it is read on a screen: "8 to 10 / side at 16 kg, tempo 3-0-1-0". `parseDose` reads it back. */
export function formatDose(dose: Dose): string {
  const side = dose.perSide ? ' / side' : '';
  const load = dose.load ? ` at ${dose.load.typed}` : '';
  const tempo = dose.tempo ? `, tempo ${dose.tempo}` : '';
  return `${formatAmount(dose)}${side}${load}${tempo}`;
}

function formatAmount({ amount, amountTo, unit }: Dose): string {
  const range = (each: (value: number) => string) =>
    amountTo === null ? each(amount) : `${each(amount)} to ${each(amountTo)}`;
  if (unit === 'reps') return range(figure);
  if (unit === 'metres') return `${range(figure)} m`;
  if (unit === 'calories') return `${range(figure)} cal`;
  if (amountTo === null) return secondsText(amount);
  return saidInMinutes(amount) && saidInMinutes(amountTo)
    ? `${range((s) => figure(s / 60))} min`
    : `${range(figure)} s`;
}

export type DoseFault = { fault: string };

/** Longer than any dose that a person writes. */
const longestText = 80;
const empty = 'Say how much: 10, 30 s, 200 m or 12 cal.';

/**
 * Reads a dose as coaches type it: "10", "6/side", "30s", "1 min", "8-10 reps @ 35 lb tempo 3-0-1-0". A bare number counts reps,
 * a bare load is in kg.
 * @returns the dose, or what is wrong with the text in words for the form's field
 */
export function parseDose(text: string): Dose | DoseFault {
  if (text.length > longestText) return { fault: 'That is too long for a dose.' };
  const plain = text
    .toLowerCase()
    .replaceAll('×', 'x')
    .replace(/[–—]/g, '-')
    .replace(/[\s,]+$/, '')
    .replace(/\s+/g, ' ')
    .trim();
  if (plain === '') return { fault: empty };
  const tempo = takeTempo(plain);
  if (/\btempo\b/.test(tempo.rest)) return { fault: 'Write a tempo as four numbers: 3-0-1-0.' };
  if (tempo.rest.includes('%'))
    return { fault: 'Write the load itself, in kg or lb: a share of somebody’s best is not known here.' };
  const load = takeLoad(tempo.rest);
  const side = takeSide(load.rest);
  const amount = readAmount(side.rest);
  if ('fault' in amount) return amount;
  const dose = Dose.safeParse({ ...amount, perSide: side.perSide, load: load.load, tempo: tempo.tempo });
  return dose.success ? dose.data : { fault: faultOf(dose.error.issues[0]?.path[0]) };
}

const faultOf = (field: PropertyKey | undefined) =>
  field === 'load' ? 'A load is more than 0 and at most 1000 kg.' : 'A dose is more than 0 and at most 10,000.';

function takeTempo(text: string): { tempo: string | null; rest: string } {
  const found =
    /,? ?(?:\btempo ?:? ?)?(?<![\d-])(\d{1,2})-(\d{1,2})-(\d{1,2})-(\d{1,2})(?![\d-])/.exec(text) ??
    /,? ?\btempo ?:? ?(\d)(\d)(\d)(\d)(?!\d)/.exec(text);
  if (!found) return { tempo: null, rest: text };
  return { tempo: found.slice(1, 5).join('-'), rest: without(text, found) };
}

/** The international pound, exactly. Source: NIST Handbook 44, appendix C. */
const kgPerPound = 0.45359237;

function takeLoad(text: string): { load: Load | null; rest: string } {
  const unit = String.raw`(kgs?|kilos?|lbs?|pounds?)\b`;
  // "10 x 16 kg" is ten reps at 16 kg; only after "@", "at" or "with" does "2 x 16 kg" say two weights
  const found =
    new RegExp(String.raw`,? ?(?:@|\b(?:at|with)\b) ?(?:(\d{1,2}) ?x ?)?(${figurePattern}) ?(?:${unit})?$`).exec(
      text,
    ) ??
    new RegExp(String.raw`,? ?(?:@|\b(?:at|with)\b) ?(?:(\d{1,2}) ?x ?)?(${figurePattern}) ?${unit}`).exec(text) ??
    new RegExp(String.raw`,? ?(?:\bx ?|(?<=\d)x ?)?()(?<![\d.,])(${figurePattern}) ?${unit}`).exec(text);
  if (!found) return { load: null, rest: text };
  const [, pieces, amount = '', said = 'kg'] = found;
  const value = readFigure(amount);
  const isPounds = /^(?:lb|pound)/.test(said);
  const typed = `${pieces ? `${Number(pieces)} × ` : ''}${figure(value)} ${isPounds ? 'lb' : 'kg'}`;
  const kg = isPounds ? Math.round(value * kgPerPound * 100) / 100 : value;
  return { load: { kg, typed }, rest: without(text, found) };
}

function takeSide(text: string): { perSide: boolean; rest: string } {
  const found =
    /,? ?(?:\/|\b(?:per|on each|each|every|ea|a)\b\.?) ?(?:side|leg|arm|hand|foot|way)s?\b/.exec(text) ??
    /,? ?(?:\b(?:each|ea)\b\.?|\be\/s\b|\/ ?s\b)$/.exec(text);
  return found ? { perSide: true, rest: without(text, found) } : { perSide: false, rest: text };
}

const without = (text: string, found: RegExpExecArray) =>
  `${text.slice(0, found.index)} ${text.slice(found.index + found[0].length)}`.replace(/\s+/g, ' ').trim();

type Amount = Pick<Dose, 'amount' | 'amountTo' | 'unit'>;

function readAmount(text: string): Amount | DoseFault {
  const clock =
    /^(\d{1,3}):([0-5]\d)(?: ?min(?:utes?)?)?$/.exec(text) ??
    /^(\d{1,3}) ?min(?:utes?)? (\d{1,2}) ?s(?:ec(?:ond)?s?)?$/.exec(text);
  if (clock) return { amount: Number(clock[1]) * 60 + Number(clock[2]), amountTo: null, unit: 'seconds' };
  const pattern = `^(?:x ?)?(${figurePattern})(?: ?(?:-|to) ?(${figurePattern}))? ?(.*)$`;
  const [, from, to, word = ''] = new RegExp(pattern).exec(text) ?? [];
  if (from === undefined) return { fault: empty };
  const unit = unitOf(word);
  if (!unit) return { fault: `“${word}” is not understood here. A dose is in reps, s, min, m, km or cal.` };
  const amount = readFigure(from) * unit.each;
  const amountTo = to === undefined ? null : readFigure(to) * unit.each;
  if (amountTo !== null && amountTo < amount) return { fault: 'Write the smaller number first: 8 to 10.' };
  return { amount, amountTo: amountTo === amount ? null : amountTo, unit: unit.unit };
}

function unitOf(word: string): { unit: DoseUnit; each: number } | undefined {
  if (/^(?:|x|r|reps?|times|repetitions?)$/.test(word)) return { unit: 'reps', each: 1 };
  if (/^(?:m|met(?:re|er)s?)$/.test(word)) return { unit: 'metres', each: 1 };
  if (/^(?:km|kilomet(?:re|er)s?)$/.test(word)) return { unit: 'metres', each: 1000 };
  if (/^(?:k?cals?|calories?)$/.test(word)) return { unit: 'calories', each: 1 };
  const each = secondsPerUnit(word);
  return each === undefined ? undefined : { unit: 'seconds', each };
}
