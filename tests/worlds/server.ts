import { mkdtemp, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import type { Express } from 'express';
import { pino } from 'pino';
import { createApp } from '#server/app.ts';
import { Hails } from '#server/hails/hails.ts';
import { listen } from '#server/main.ts';
import type { Database } from '#server/models/database.ts';
import { openPictureFolder } from '#server/photos/folder-store.ts';
import type { PictureStore } from '#server/photos/store.ts';
import { makeClock } from './clock.ts';
import type { Clock } from './clock.ts';
import { createTestDatabase } from './postgres.ts';

type ServerOptions = {
  /** by default the server has a clock of its own that stands still, `clock` in what is returned */
  clock?: Clock;
  /** the built front end, for tests with a browser */
  distDir?: string;
};

export type TestServer = {
  url: string;
  app: Express;
  database: Database;
  databaseUrl: string;
  pictures: PictureStore;
  /** where they are kept */
  pictureFolder: string;
  hails: Hails;
  clock: Clock;
  close: () => Promise<void>;
};

/** The real server on a free port, over a migrated database of its own. */
export async function startServer({ clock = makeClock(), distDir }: ServerOptions = {}): Promise<TestServer> {
  const { database, url: databaseUrl, drop } = await createTestDatabase();
  const log = pino({ level: process.env.RIBBAND_TEST_LOG ?? 'silent' });
  const hails = new Hails({ url: databaseUrl, database, log });
  const pictureFolder = await mkdtemp(path.join(os.tmpdir(), 'ribband-pictures-'));
  const pictures = await openPictureFolder(pictureFolder);
  const app = createApp({ database, pictures, now: clock.now, log, hails, ...(distDir ? { distDir } : {}) });
  const { url, close: closeServer } = await listen(app, 0, '127.0.0.1');
  const close = async () => {
    await hails.close();
    await closeServer();
    await drop();
    await rm(pictureFolder, { recursive: true, force: true });
  };
  return { url, app, database, databaseUrl, pictures, pictureFolder, hails, clock, close };
}
