import { pathToFileURL } from 'node:url';
import { startTestCluster } from './cluster.ts';
import { CLUSTER_URL, prepareTemplate } from './postgres.ts';

// Runs the module named on the command line beside a PostgreSQL of its own, set as the product sets its own:
// figures measured without fsync would flatter.
const [, , module] = process.argv;
if (!module) throw new Error('Which module? node --import tsx tests/worlds/with-postgres.ts <file>');
const cluster = await startTestCluster(true);
process.env[CLUSTER_URL] = cluster.url;
for (const signal of ['SIGINT', 'SIGTERM'] as const) {
  process.once(signal, () => void cluster.stop().then(() => process.exit(1)));
}
try {
  await prepareTemplate();
  await import(pathToFileURL(module).href);
} finally {
  await cluster.stop();
}
