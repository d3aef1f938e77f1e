import { startTestCluster } from './cluster.ts';
import type { TestCluster } from './cluster.ts';
import { CLUSTER_URL, prepareTemplate } from './postgres.ts';

// Each project of the runner calls this in one process, with modules of its own; one cluster serves them all.
const shared = globalThis as { ribbandTest?: { users: number; cluster: Promise<TestCluster> } };

/** Vitest's global setup: the test PostgreSQL with a migrated template, until the last project is done. */
export default async function setup(): Promise<() => Promise<void>> {
  const state = (shared.ribbandTest ??= { users: 0, cluster: start() });
  state.users += 1;
  await state.cluster;
  return async () => {
    state.users -= 1;
    if (state.users > 0) return;
    delete shared.ribbandTest;
    await (await state.cluster).stop();
  };
}

async function start(): Promise<TestCluster> {
  const cluster = await startTestCluster();
  process.env[CLUSTER_URL] = cluster.url; // workers inherit it
  await prepareTemplate();
  return cluster;
}
