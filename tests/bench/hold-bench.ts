import { mkdtemp, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { chromium } from 'playwright-core';
import { buildSite } from '#tests/e2e/build-site.ts';
import { CHROMIUM_FLAGS, CHROMIUM_PATH } from '#tests/e2e/gallery/open-gallery.ts';
import { makeClock } from '#tests/worlds/clock.ts';
import { startServer } from '#tests/worlds/server.ts';
import { PASSWORD } from '#tests/worlds/shop.ts';
import { entryData, entryOps, makeCrew, type Crew } from './crew.ts';
import type { HoldOrder } from './hold-page/page.ts';
import type { Finding, Pair } from './measuring.ts';

const CONFIG = path.join(import.meta.dirname, 'hold-page/vite.config.ts');
const RECORD_BATCHES = 5;
const OPS_A_BATCH = 400;
const ORDER = { warmUps: 40, rounds: 300, sendEvery: 20 };
const GOAL = 2;

/** The phone's own hold() in Chromium, against one put into an IndexedDB; both strict, on disk, over a record of 2,000 entries. */
export async function benchHold(): Promise<Finding> {
  const folder = await mkdtemp(path.join(os.tmpdir(), 'hold-bench-'));
  const distDir = path.join(folder, 'page');
  await buildSite(distDir, CONFIG);
  const server = await startServer({ distDir, clock: makeClock(Date.now()) });
  try {
    const crew = await makeCrew(server, ['crew']);
    for (const hand of crew.hands.slice(0, RECORD_BATCHES)) await hand.send(...entryOps(hand, crew, OPS_A_BATCH));
    const pairs = await timeHolds(server.url, path.join(folder, 'browser'), orderFor(crew));
    return { what: 'tap to durable: hold() and one put, both strict', pairs, goal: GOAL };
  } finally {
    await server.close();
    await rm(folder, { recursive: true, force: true });
  }
}

function orderFor(crew: Crew): HoldOrder {
  const { email, shopId } = crew.hands[0]!.session.person;
  return { email, shopId, password: PASSWORD, entry: entryData(crew.hands[0]!, crew), ...ORDER };
}

// a profile on disk: without one Chromium keeps IndexedDB in memory, where durable costs nothing
async function timeHolds(url: string, profile: string, order: HoldOrder): Promise<Pair[]> {
  const context = await chromium.launchPersistentContext(profile, { executablePath: CHROMIUM_PATH, args: CHROMIUM_FLAGS });
  try {
    const page = await context.newPage();
    await page.goto(url);
    await page.waitForFunction(() => 'timeHolds' in window);
    return await page.evaluate((asked) => window.timeHolds(asked), order);
  } finally {
    await context.close();
  }
}
