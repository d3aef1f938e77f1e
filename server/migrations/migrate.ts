import { Sequelize, type Transaction } from 'sequelize';
import { Umzug, type UmzugStorage } from 'umzug';
import { migration as shops } from './0001-shops.ts';
import { migration as identity } from './0002-identity.ts';
import { migration as record } from './0003-record.ts';
import { migration as notes } from './0004-notes.ts';
import { migration as pictureFiles } from './0005-picture-files.ts';
import type { MigrationContext } from './migration.ts';

const MIGRATIONS = [shops, identity, record, notes, pictureFiles];

// any number, so long as every Ribband takes the same one
const MIGRATION_LOCK = 7_424_233;

interface Context extends MigrationContext {
  executed(): Promise<string[]>;
}

function contextOf(sequelize: Sequelize, transaction: Transaction): Context {
  return {
    async run(sql, values) {
      await sequelize.query(sql, values ? { bind: values, transaction } : { transaction });
    },
    async executed() {
      const [rows] = await sequelize.query('SELECT name FROM migrations ORDER BY name', { transaction });
      return (rows as { name: string }[]).map((row) => row.name);
    },
  };
}

// in the same transaction as the migrations, so that one killed halfway leaves nothing behind
const storage: UmzugStorage<Context> = {
  executed: ({ context }) => context.executed(),
  logMigration: ({ name, context }) => context.run('INSERT INTO migrations (name) VALUES ($1)', [name]),
  unlogMigration: () => Promise.reject(new Error('Migrations only go forward.')),
};

async function runPending(context: Context): Promise<string[]> {
  const umzug = new Umzug({
    migrations: MIGRATIONS.map(({ name, up }) => ({
      name,
      up: (params: { context: Context }) => up(params.context),
    })),
    context,
    storage,
    logger: undefined,
  });
  const done = await umzug.up();
  return done.map((migration) => migration.name);
}

/**
 * Brings the database up to date as the user of `url`, all of it or nothing; servers that start together wait for
 * one another. Returns the names of the migrations that were run.
 */
export async function migrate(url: string): Promise<string[]> {
  const sequelize = new Sequelize(url, { dialect: 'postgres', logging: false, pool: { max: 1 } });
  try {
    return await sequelize.transaction(async (transaction) => {
      const context = contextOf(sequelize, transaction);
      await context.run('SELECT pg_advisory_xact_lock($1)', [MIGRATION_LOCK]);
      await context.run(
        'CREATE TABLE IF NOT EXISTS migrations (name text PRIMARY KEY, run_at timestamptz NOT NULL DEFAULT now())',
      );
      return runPending(context);
    });
  } finally {
    await sequelize.close();
  }
}
