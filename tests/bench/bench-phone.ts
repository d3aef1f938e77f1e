import { mkdtemp, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { chromium, type BrowserContext, type Page } from 'playwright-core';
import { buildSite } from '#tests/e2e/build-site.ts';
import { CHROMIUM_FLAGS, CHROMIUM_PATH, SIZES } from '#tests/e2e/gallery/open-gallery.ts';
import { makeClock } from '#tests/worlds/clock.ts';
import { layDown } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makePerson, PASSWORD, type TestPerson } from '#tests/worlds/shop.ts';
import { entryOps, makeCrew, type Crew } from './crew.ts';

const BOATS = 5;
const ENTRIES_A_DAY = 40;
const OPS_A_BATCH = 400;
const DAY_MS = 86_400_000;
/** how many times a page's work is slowed down */
export const CPU_SLOWED = 4;
const SIGN_IN_MAX_MS = 120_000;
const PHONE = { viewport: SIZES.phone, isMobile: true, hasTouch: true, deviceScaleFactor: 2 };

/** A crew member's phone: the built app in Chromium, its profile on disk, with the record of a shop in it. */
export class BenchPhone {
  readonly entries: number;
  private readonly server: TestServer;
  private readonly folder: string;

  private constructor(server: TestServer, folder: string, entries: number) {
    this.entries = entries;
    this.server = server;
    this.folder = folder;
  }

  /** where the app was built */
  get distDir(): string {
    return path.join(this.folder, 'dist');
  }

  /** Builds the app, fills a shop with so many entries (40 a day on five boats, the newest of today), and has the phone pull them. */
  static async unpack(entries: number): Promise<BenchPhone> {
    const folder = await mkdtemp(path.join(os.tmpdir(), 'bench-phone-'));
    const distDir = path.join(folder, 'dist');
    await buildSite(distDir);
    const server = await startServer({ distDir, clock: makeClock(Date.now()) });
    const crew = await makeCrew(server, ['crew']);
    await fill(crew, entries);
    const phone = new BenchPhone(server, folder, entries);
    await phone.signIn(await makePerson(server.database, crew.shop.shopId, ['crew']));
    return phone;
  }

  /** Starts the browser on its profile, without signal, and runs `work` on a page that is slowed down to a quarter. */
  async withPage<T>(work: (page: Page) => Promise<T>): Promise<T> {
    const context = await this.start();
    try {
      await context.setOffline(true);
      const page = await context.newPage();
      const session = await context.newCDPSession(page);
      await session.send('Emulation.setCPUThrottlingRate', { rate: CPU_SLOWED });
      return await work(page);
    } finally {
      await context.close();
    }
  }

  async putAway(): Promise<void> {
    await this.server.close();
    await rm(this.folder, { recursive: true, force: true });
  }

  // a profile on disk: without one Chromium keeps IndexedDB in memory
  private start(): Promise<BrowserContext> {
    return chromium.launchPersistentContext(path.join(this.folder, 'browser'), {
      ...PHONE,
      executablePath: CHROMIUM_PATH,
      args: CHROMIUM_FLAGS,
      baseURL: this.server.url,
    });
  }

  private async signIn({ email }: TestPerson): Promise<void> {
    const context = await this.start();
    const page = await context.newPage();
    page.setDefaultTimeout(SIGN_IN_MAX_MS);
    await page.goto('/');
    await page.getByLabel('E-mail').fill(email);
    await page.getByLabel('Password', { exact: true }).fill(PASSWORD);
    await page.getByLabel(/^This .* is called$/).fill('phone');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByText(/^All sent/).waitFor();
    await page.waitForFunction(() => navigator.serviceWorker.controller?.state === 'activated');
    await context.close();
  }
}

async function fill(crew: Crew, entries: number): Promise<void> {
  const yards = [crew.yard];
  while (yards.length < BOATS) yards.push(await layDown(crew.foreman));
  for (let from = 0; from < entries; from += OPS_A_BATCH) {
    const hand = crew.hands[(from / OPS_A_BATCH) % crew.hands.length]!;
    const ops = entryOps(hand, crew, Math.min(OPS_A_BATCH, entries - from));
    for (const [index, op] of ops.entries()) {
      const { boatId, stageId } = yards[index % BOATS]!;
      const workDate = dayBefore(crew.server.clock.now(), Math.floor((from + index) / ENTRIES_A_DAY));
      Object.assign(op.data, { boatId, stageId, workDate });
    }
    const outcomes = await hand.send(...ops);
    if (outcomes.some(({ outcome }) => outcome !== 'kept')) throw new Error('Some entries were not kept.');
  }
}

function dayBefore(nowMs: number, days: number): string {
  return new Date(nowMs - days * DAY_MS).toISOString().slice(0, 10);
}
