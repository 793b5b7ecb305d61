import { AsyncLocalStorage } from 'node:async_hooks';
import pg from 'pg';
import { Sequelize, type Transaction } from 'sequelize';
import { initModels } from './models';

/** Sequelize keeps the transaction of a call chain in this store, so that no service has to hand it on. */
const calls = new AsyncLocalStorage<Map<string, unknown>>();

// biome-ignore lint/correctness/useHookAtTopLevel: not a React hook
Sequelize.useCLS({
  get: (key: string) => calls.getStore()?.get(key),
  set: (key: string, value: unknown) => {
    calls.getStore()?.set(key, value);
  },
  run: (task: () => void) => calls.run(new Map(calls.getStore() ?? []), task),
  bind: (task: (...values: unknown[]) => unknown) => AsyncLocalStorage.bind(task),
} as unknown as Parameters<typeof Sequelize.useCLS>[0]);

let current: Sequelize | undefined;

/** The process's database. @throws Error before `connectDatabase` */
export function database(): Sequelize {
  if (!current) throw new Error('The database is not connected.');
  return current;
}

/** Connects the process to its database and binds the models to it. */
export function connectDatabase(url: string, pool = 10): Sequelize {
  current = new Sequelize(url, {
    dialect: 'postgres',
    dialectModule: pg,
    logging: false,
    pool: { max: pool, idle: 10_000, acquire: 15_000 },
    define: { underscored: true },
  });
  initModels(current);
  return current;
}

export async function closeDatabase(): Promise<void> {
  const closing = current;
  current = undefined;
  await closing?.close();
}

/** The transaction that this call chain is in, if any. */
export function currentTransaction(): Transaction | undefined {
  return calls.getStore()?.get('transaction') as Transaction | undefined;
}

/** Runs a task in a transaction; inside another one it joins that. */
export function inTransaction<T>(task: () => Promise<T>): Promise<T> {
  if (currentTransaction()) return task();
  return database().transaction(task);
}

/** Runs something once the surrounding transaction has committed; at once where there is none. */
export function afterCommit(task: () => void | Promise<void>): void {
  const transaction = currentTransaction();
  if (transaction) transaction.afterCommit(() => task());
  else void task();
}
