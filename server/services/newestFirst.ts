import { literal, type Model, type ModelStatic, Op, type WhereOptions } from 'sequelize';
import { z } from 'zod';
import { Id } from '../../shared/domain/values';
import { AppError } from '../../shared/errors';
import { database } from '../models/database';
import { InstantInCursor, pageOf, readCursor } from './pages';

export type PageAsked = { cursor?: string | undefined; limit: number };

const Place = z.tuple([InstantInCursor, Id]);

/** A page of rows by the time they were made, newest first, on an index over (…, created_at desc, id desc). */
export async function newestFirst<M extends Model & { id: string }>(
  model: ModelStatic<M>,
  where: Record<string, unknown>,
  { cursor, limit }: PageAsked,
): Promise<{ items: M[]; nextCursor: string | null }> {
  const madeAt = `"${model.name}"."created_at"`;
  const rows = await model.findAll({
    attributes: { include: [[literal(`${madeAt}::text`), 'madeAt']] },
    where: { ...where, [Op.and]: cursor ? [before(cursor, madeAt, model.name)] : [] } as WhereOptions,
    order: [
      ['createdAt', 'DESC'],
      ['id', 'DESC'],
    ],
    limit: limit + 1,
  });
  return pageOf(rows, limit, (row) => [String(row.get('madeAt')), row.id]);
}

function before(cursor: string, madeAt: string, name: string) {
  const place = Place.safeParse(readCursor(cursor, 2));
  if (!place.success)
    throw new AppError('invalid', { fields: { cursor: 'This list changed. Start at its beginning.' } });
  const [time, id] = place.data.map((part) => database().escape(part));
  return literal(`(${madeAt}, "${name}"."id") < (${time}::timestamptz, ${id}::uuid)`);
}
