import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { pino } from 'pino';
import { createApp } from '#server/app.ts';
import { Hails } from '#server/hails/hails.ts';
import { listen } from '#server/main.ts';
import { migrate } from '#server/migrations/migrate.ts';
import { openDatabase } from '#server/models/database.ts';
import { openPictureFolder } from '#server/photos/folder-store.ts';
import { judgeAllAgain } from '#server/sync/judge-again.ts';
import { claimDataFolder } from './data-folder.ts';
import { readEnvironment } from './environment.ts';
import { LaunchFailure } from './failure.ts';
import { ensureFrontEnd } from './front-end.ts';
import { ownPostgres } from './postgres.ts';
import { orderlyStop } from './stopping.ts';
import type { Stopping } from './stopping.ts';
import { waysIn } from './ways-in.ts';

const projectDir = path.resolve(fileURLToPath(import.meta.url), '../../..');

// in development Vite serves the front end
const isApiOnly = process.argv.includes('--api-only');

const stopping = orderlyStop();
try {
  await start(stopping);
} catch (error) {
  if (!stopping.isUnderWay()) console.error(error instanceof LaunchFailure ? error.message : error);
  await stopping.stop(1);
}

async function start(stopping: Stopping): Promise<void> {
  const environment = readEnvironment(process.env);
  await claimDataFolder(environment.dataDir);
  const [databaseUrl, distDir] = await Promise.all([
    environment.databaseUrl ?? ownPostgres(environment.dataDir, stopping.before),
    isApiOnly ? undefined : ensureFrontEnd(projectDir),
  ]);
  await migrate(databaseUrl);
  const database = openDatabase(databaseUrl);
  stopping.before(() => database.close());

  const { timeZone } = Intl.DateTimeFormat().resolvedOptions();
  const pictures = await openPictureFolder(path.join(environment.dataDir, 'pictures'));
  const ways = await waysIn(database, {
    pictures,
    isDemoWanted: environment.isDemoWanted,
    nowMs: Date.now(),
    timeZone,
    tell: (line) => console.log(line),
  });
  const log = pino();
  const hails = new Hails({ url: databaseUrl, database, log });
  await judgeAllAgain({ database, log, onChanged: (shopId, seq) => hails.announce(shopId, seq) });
  const app = createApp({ database, pictures, now: Date.now, log, hails, ...(distDir ? { distDir } : {}) });
  const { url, close } = await listen(app, environment.port, environment.host).catch(
    (error: NodeJS.ErrnoException) => {
      throw error.code === 'EADDRINUSE' || error.code === 'EACCES' || error.code === 'EADDRNOTAVAIL'
        ? new LaunchFailure(
            `Cannot listen on ${environment.host}:${environment.port} (${error.code}). Set PORT or HOST.`,
          )
        : error;
    },
  );
  stopping.before(close);
  stopping.before(() => hails.close()); // first of all, since its streams would hold the server open
  console.log([`Ribband is ready at ${url}`, ...ways].join('\n'));
}
