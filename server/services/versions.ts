import type { Model, ModelStatic, WhereOptions } from 'sequelize';
import { AppError } from '../../shared/errors';

type Versioned = Model & { id: string; version: number };

/**
 * Saves a row only where its version is still the one that was read, and bumps it there: Sequelize's own `version`
 * option never looks at what a client sent.
 * @param current gives the present state, as the endpoint would answer it, for the refusal
 * @throws AppError `stale` with the current state
 */
export async function saveIfCurrent<M extends Versioned>(
  row: M,
  version: number,
  values: Partial<M['_attributes']>,
  current: () => Promise<unknown>,
): Promise<void> {
  const model = row.constructor as ModelStatic<M>;
  const [count] = await model.update({ ...values, version: version + 1 } as never, {
    where: { id: row.id, version } as unknown as WhereOptions<M['_attributes']>,
  });
  if (count === 0) throw new AppError('stale', { current: await current() });
  await row.reload();
}
