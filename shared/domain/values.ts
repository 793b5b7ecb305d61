import { z } from 'zod';

/** Values that many resources share. Times are whole milliseconds, dates are calendar dates in the team's time zone. */

/** Kept in lower case, as PostgreSQL writes them: `A…` and `a…` are one id to it, and have to be one in every comparison of ours. */
export const Id = z.uuid().toLowerCase();
export type Id = z.infer<typeof Id>;

export const Ms = z.int().min(0).max(86_400_000);

/** A calendar date, `2026-03-03`, that exists. ISO 8601 has a year 0000; PostgreSQL's calendar starts with 0001. */
export const CalendarDate = z.iso.date().regex(/^(?!0000)/, 'There is no such day.');
export type CalendarDate = z.infer<typeof CalendarDate>;

export const Instant = z.iso.datetime();

/** The next one has to fit PostgreSQL's integer too. */
export const Version = z
  .int()
  .min(0)
  .max(2 ** 31 - 2);

/** One line of text as people type it: trimmed, not empty, no control characters. */
export const shortText = (max: number) =>
  z
    .string()
    .trim()
    .min(1, 'Write something here.')
    .max(max, `At most ${max} characters.`)
    // biome-ignore lint/suspicious/noControlCharactersInRegex: they are what is refused, and halves of a character
    .regex(/^[^\u0000-\u001f\u007f\p{Surrogate}]*$/u, 'Only one line of plain text fits here.');

/** Several lines of text; may be empty. */
export const longText = (max: number) =>
  z
    .string()
    .trim()
    .max(max, `At most ${max} characters.`)
    // biome-ignore lint/suspicious/noControlCharactersInRegex: PostgreSQL's text holds no NUL, its JSON no half of a character
    .regex(/^[^\u0000\p{Surrogate}]*$/u, 'Plain text only.');
