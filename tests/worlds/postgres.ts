import { randomBytes } from 'node:crypto';
import pg from 'pg';
import { migrate } from '#server/migrations/migrate.ts';
import { openDatabase } from '#server/models/database.ts';
import type { Database } from '#server/models/database.ts';

/** Set for tests and benches: the URL of a cluster in which databases may be made and dropped. */
export const CLUSTER_URL = 'RIBBAND_TEST_POSTGRES';

const PREFIX = 'ribband_test_';
const TEMPLATE = `${PREFIX}template`;

export type TestDatabase = { url: string; database: Database; drop: () => Promise<void> };

/** A migrated, empty database of the caller's own, opened as the app opens it. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const name = `${PREFIX}${randomBytes(6).toString('hex')}`;
  await inCluster(`CREATE DATABASE ${name} TEMPLATE ${TEMPLATE}`);
  const url = urlOf(name);
  const database = openDatabase(url);
  const drop = async () => {
    await database.close();
    await dropTestDatabase(name);
  };
  return { url, database, drop };
}

/** Makes the migrated database that each test's own is copied from. */
export async function prepareTemplate(): Promise<void> {
  await inCluster(`CREATE DATABASE ${TEMPLATE}`);
  await migrate(urlOf(TEMPLATE));
}

/** Drops a test's database with whoever is still connected to it; refuses any other. */
export async function dropTestDatabase(name: string): Promise<void> {
  if (!new RegExp(`^${PREFIX}\\w+$`).test(name))
    throw new Error(`${name} is not a test's database; it is left alone.`);
  await inCluster(`DROP DATABASE IF EXISTS ${name} WITH (FORCE)`);
}

function urlOf(name: string): string {
  const url = new URL(clusterUrl());
  url.pathname = `/${name}`;
  return url.href;
}

function clusterUrl(): string {
  const url = process.env[CLUSTER_URL];
  if (!url)
    throw new Error(`${CLUSTER_URL} is not set: this test belongs to a project without the test PostgreSQL.`);
  return url;
}

async function inCluster(sql: string): Promise<void> {
  const client = new pg.Client({ connectionString: clusterUrl() });
  await client.connect();
  try {
    await client.query(sql);
  } finally {
    await client.end();
  }
}
