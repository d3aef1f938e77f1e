import { Sequelize, type Transaction } from 'sequelize';
import { readInShop, runInShop, type InShopOptions } from './shop-transaction.ts';
import { defineModels, type Models } from './models.ts';

const BIGINT_OID = 20;

export interface Database {
  sequelize: Sequelize;
  models: Models;
  /** Runs `work` in one transaction that sees and writes the rows of one shop only. */
  inShop<T>(
    shopId: string,
    work: (transaction: Transaction) => Promise<T>,
    options?: InShopOptions,
  ): Promise<T>;
  /** Rows of one shop by one statement, with `values` as :name: in one round trip, in a transaction of its own. */
  readInShop<Row>(shopId: string, sql: string, values: Record<string, string>): Promise<Row[]>;
  close(): Promise<void>;
}

interface PgClient {
  query(sql: string): Promise<unknown>;
  setTypeParser(oid: number, parse: (text: string) => unknown): void;
}

// The user of the URL owns the tables and may be a superuser, whom row security would let pass.
async function becomeApp(connection: unknown): Promise<void> {
  const client = connection as PgClient;
  // feed numbers stay far below 2^53
  client.setTypeParser(BIGINT_OID, Number);
  await client.query('SET ROLE ribband_app');
}

/** Opens the pool through which the server works, as the role `ribband_app`. The database must be migrated. */
export function openDatabase(url: string, { connectionsMax = 10 } = {}): Database {
  const sequelize = new Sequelize(url, {
    dialect: 'postgres',
    timezone: '+00:00',
    logging: false,
    pool: { max: connectionsMax },
    define: { timestamps: false, underscored: true },
    hooks: { afterConnect: becomeApp },
  });
  return {
    sequelize,
    models: defineModels(sequelize),
    inShop: (shopId, work, options) => runInShop(sequelize, shopId, work, options),
    readInShop: (shopId, sql, values) => readInShop(sequelize, shopId, sql, values),
    close: () => sequelize.close(),
  };
}
