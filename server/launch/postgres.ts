import { createHash, randomBytes } from 'node:crypto';
import { existsSync } from 'node:fs';
import { mkdir, readFile, rename, writeFile } from 'node:fs/promises';
import path from 'node:path';
import pg from 'pg';
import { z } from 'zod';
import {
  bringDown,
  bringUp,
  clusterUrl,
  createCluster,
  runAsPostgres,
  runningPostmaster,
} from './cluster.ts';
import type { Cluster } from './cluster.ts';
import { LaunchFailure } from './failure.ts';
import { freePort, isFree } from './free-port.ts';
import { findPrograms, isRoot } from './postgres-programs.ts';
import type { Programs } from './postgres-programs.ts';

const DATABASE = 'ribband';
const SHARED_DIR = '/var/lib/ribband';

const rememberedSchema = z.object({ directory: z.string(), port: z.int(), password: z.string() });
type Remembered = z.infer<typeof rememberedSchema>;

/**
 * Brings up the PostgreSQL cluster that belongs to the data folder, making it the first time.
 * Returns the URL of the database; `onStop` is told how to stop the cluster before anything is started.
 */
export async function ownPostgres(
  dataDir: string,
  onStop: (stop: () => Promise<void>) => void,
): Promise<string> {
  const file = path.join(dataDir, 'postgres.json');
  const known = await recall(file);
  const directory = known?.directory ?? (await placeFor(dataDir));
  const programs = await findPrograms(await majorOf(directory));
  if (known === null) await moveAside(programs, directory);
  const password = known?.password ?? randomBytes(24).toString('hex');
  const port = await portFor(directory, known);
  await remember(file, { directory, port, password });

  const cluster: Cluster = { programs, directory, port, password };
  onStop(() => bringDown(cluster));
  if (!existsSync(directory)) await createCluster(cluster);
  const up = await bringUp(cluster);
  await ensureDatabase(up);
  return clusterUrl(up, DATABASE);
}

async function recall(file: string): Promise<Remembered | null> {
  if (!existsSync(file)) return null;
  const read = rememberedSchema.safeParse(JSON.parse(await readFile(file, 'utf8')));
  if (!read.success)
    throw new LaunchFailure(`${file} cannot be read; it says where the database is and its password.`);
  return read.data;
}

async function remember(file: string, what: Remembered): Promise<void> {
  await writeFile(`${file}.new`, JSON.stringify(what, null, 2), { mode: 0o600 });
  await rename(`${file}.new`, file);
}

/** In the data folder, or where the postgres user cannot enter that, in a folder that it can. */
async function placeFor(dataDir: string): Promise<string> {
  if (!isRoot() || (await canPostgresEnter(dataDir))) return path.join(dataDir, 'postgres');
  const name = createHash('sha256').update(dataDir).digest('hex').slice(0, 16);
  const place = path.join(SHARED_DIR, name);
  console.log(`The postgres user cannot enter ${dataDir}, so the database is kept in ${place}.`);
  await mkdir(SHARED_DIR, { recursive: true, mode: 0o711 });
  return place;
}

async function canPostgresEnter(folder: string): Promise<boolean> {
  await findPrograms(null); // the postgres user comes with the packages
  return (await runAsPostgres('test', ['-x', folder])).code === 0;
}

async function majorOf(directory: string): Promise<number | null> {
  const text = await readFile(path.join(directory, 'PG_VERSION'), 'utf8').catch(() => null);
  return text === null ? null : Number(text);
}

// the data folder was emptied or replaced: what is left under its name has a password that nobody knows any more
async function moveAside(programs: Programs, directory: string): Promise<void> {
  if (!existsSync(directory)) return;
  const aside = `${directory}.aside-${randomBytes(4).toString('hex')}`;
  await bringDown({ programs, directory });
  await rename(directory, aside);
  console.log(`A database of an earlier data folder was found and put aside in ${aside}.`);
}

async function portFor(directory: string, known: Remembered | null): Promise<number> {
  const running = await runningPostmaster(directory);
  if (running) return running.port;
  return known && (await isFree(known.port)) ? known.port : freePort();
}

async function ensureDatabase(cluster: Cluster): Promise<void> {
  const client = new pg.Client({ connectionString: clusterUrl(cluster, 'postgres') });
  await client.connect();
  try {
    const { rowCount } = await client.query('SELECT FROM pg_database WHERE datname = $1', [DATABASE]);
    if (rowCount === 0) await client.query(`CREATE DATABASE ${DATABASE}`);
  } finally {
    await client.end();
  }
}
