import { z } from 'zod';
import { AppError } from '../../shared/errors';

/** Keyset paging: a cursor is the sort key of the last row, so that a page costs the same at any depth. */

const Cursor = z.array(z.union([z.string().max(200), z.number()])).max(4);

/** An instant as PostgreSQL writes one in UTC: it keeps microseconds, a Date only milliseconds. */
export const InstantInCursor = z
  .string()
  .regex(/^(?!0000)\d{4}-\d\d-\d\d \d\d:\d\d:\d\d(\.\d{1,6})?\+00$/)
  .refine((text) => !Number.isNaN(Date.parse(`${text.slice(0, 10)}T${text.slice(11, 19)}Z`)));

export function writeCursor(parts: (string | number)[]): string {
  return Buffer.from(JSON.stringify(parts)).toString('base64url');
}

/** @throws AppError `invalid` for a cursor that was not ours, or has not `length` parts */
export function readCursor(cursor: string | undefined, length: number): (string | number)[] | undefined {
  if (cursor === undefined) return undefined;
  try {
    const parts = Cursor.parse(JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8')));
    if (parts.length === length) return parts;
  } catch {
    // falls through to the refusal
  }
  throw new AppError('invalid', { fields: { cursor: 'This list changed. Start at its beginning.' } });
}

/** Cuts a page from rows that were read one over the limit. */
export function pageOf<T>(
  rows: T[],
  limit: number,
  cursorOf: (row: T) => (string | number)[],
): { items: T[]; nextCursor: string | null } {
  const items = rows.slice(0, limit);
  const last = items.at(-1);
  return { items, nextCursor: rows.length > limit && last ? writeCursor(cursorOf(last)) : null };
}
