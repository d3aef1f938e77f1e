import { chmod, mkdtemp, readdir, rm } from 'node:fs/promises';
import { existsSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { bringDown, bringUp, clusterUrl, createCluster } from '#server/launch/cluster.ts';
import { freePort } from '#server/launch/free-port.ts';
import { findPrograms } from '#server/launch/postgres-programs.ts';
import type { Programs } from '#server/launch/postgres-programs.ts';

const PREFIX = 'ribband-test-';

const UNSAFE_AND_FAST = { fsync: 'off', synchronous_commit: 'off', full_page_writes: 'off' };

export type TestCluster = { url: string; stop: () => Promise<void> };

/** A PostgreSQL cluster in a temporary folder, gone after `stop`; `isDurable` keeps fsync on, for measuring. */
export async function startTestCluster(isDurable = false): Promise<TestCluster> {
  const programs = await findPrograms(null);
  await sweepAbandoned(programs);
  const folder = await mkdtemp(path.join(os.tmpdir(), `${PREFIX}${process.pid}-`));
  await chmod(folder, 0o711); // the postgres user must get through to the cluster
  const cluster = {
    programs,
    directory: path.join(folder, 'postgres'),
    port: await freePort(),
    password: 'test',
    settings: { max_connections: '200', ...(isDurable ? {} : UNSAFE_AND_FAST) },
  };
  await createCluster(cluster, isDurable);
  const up = await bringUp(cluster);
  const stop = async () => {
    await bringDown(cluster);
    await rm(folder, { recursive: true, force: true });
  };
  return { url: clusterUrl(up, 'postgres'), stop };
}

// a test run that was killed could not clean up; its folder's name says which process it was
async function sweepAbandoned(programs: Programs): Promise<void> {
  for (const name of await readdir(os.tmpdir())) {
    const pid = Number(new RegExp(`^${PREFIX}(\\d+)-`).exec(name)?.[1]);
    if (!(pid > 0) || existsSync(`/proc/${pid}`)) continue;
    const folder = path.join(os.tmpdir(), name);
    await bringDown({ programs, directory: path.join(folder, 'postgres') });
    await rm(folder, { recursive: true, force: true });
  }
}
