import { Logger, runMigrations as migrateQueue } from 'graphile-worker';
import pg from 'pg';
import { QueryTypes, Sequelize, type Transaction } from 'sequelize';
import { Umzug, type UmzugStorage } from 'umzug';
import * as foundation from './0001-foundation';

/** Listed by import, in order, so that a bundle carries them all. */
const migrations = [foundation];

/** any number, the same in every process: two that start at once take turns */
const migrationLock = 7_210_433;

/**
 * Brings a database to the newest schema: all pending migrations in one transaction, then the queue's own tables.
 * Safe to run by several processes at once, and again.
 */
export async function migrate(databaseUrl: string): Promise<void> {
  const sequelize = new Sequelize(databaseUrl, {
    dialect: 'postgres',
    dialectModule: pg,
    logging: false,
    pool: { max: 2 },
  });
  try {
    await sequelize.transaction(async (transaction) => {
      const run = (sql: string) => sequelize.query(sql, { transaction });
      await run(`select pg_advisory_xact_lock(${migrationLock})`);
      const umzug = new Umzug({
        migrations: migrations.map(({ name, up }) => ({ name, up: () => run(up) })),
        storage: migrationNames(sequelize, transaction),
        logger: undefined,
      });
      await umzug.up();
    });
  } finally {
    await sequelize.close();
  }
  await migrateQueue({ connectionString: databaseUrl, logger: new Logger(() => () => undefined) });
}

/** Umzug's own storage opens connections of its own; this one stays inside the transaction that holds the lock. */
function migrationNames(sequelize: Sequelize, transaction: Transaction): UmzugStorage {
  const create =
    'create table if not exists schema_migrations (name text primary key, run_at timestamptz not null default now())';
  return {
    async executed() {
      await sequelize.query(create, { transaction });
      const rows = await sequelize.query<{ name: string }>('select name from schema_migrations order by name', {
        transaction,
        type: QueryTypes.SELECT,
      });
      return rows.map((row) => row.name);
    },
    async logMigration({ name }) {
      await sequelize.query('insert into schema_migrations (name) values (:name)', {
        transaction,
        replacements: { name },
      });
    },
    async unlogMigration({ name }) {
      await sequelize.query('delete from schema_migrations where name = :name', {
        transaction,
        replacements: { name },
      });
    },
  };
}
