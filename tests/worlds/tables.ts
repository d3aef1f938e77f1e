import pg from 'pg';
import type { Database } from '#server/models/database.ts';
import { query } from '#server/models/query.ts';
import type { TestServer } from './server.ts';

const COUNTED = ['ops', 'boats', 'stages', 'tasks', 'entries', 'set_asides', 'loose_ends'];

/** How many rows of a shop each table of the record holds, and how far the feed has come. */
export function countRows(database: Database, shopId: string): Promise<Record<string, number>> {
  const counts = COUNTED.map((table) => `(SELECT count(*) FROM ${table}) AS ${table}`);
  return database.inShop(shopId, async (transaction) => {
    const [counted] = await query<Record<string, number>>(transaction, `SELECT ${counts.join(', ')}, seq FROM shops`);
    return counted!;
  });
}

/** Runs SQL in the test's own database as its owner, whom no row security holds. */
export async function asOwner(server: TestServer, sql: string, values: unknown[] = []): Promise<Record<string, unknown>[]> {
  const client = new pg.Client({ connectionString: server.databaseUrl });
  await client.connect();
  try {
    return (await client.query(sql, values)).rows as Record<string, unknown>[];
  } finally {
    await client.end();
  }
}
