import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { type Browser, type Page, chromium } from 'playwright-core';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { buildSite } from '#tests/e2e/build-site.ts';
import { CHROMIUM_FLAGS, CHROMIUM_PATH } from '#tests/e2e/gallery/open-gallery.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { PASSWORD, makeShop, type TestShop } from '#tests/worlds/shop.ts';

// Goal: a foreman gives a boat her whole list of work from a template, without signal, and the server keeps all of it.
// Method: the product's own build over the real server; the browser loses its signal after the boat page is open.

let outDir: string;
let server: TestServer;
let shop: TestShop;
let browser: Browser;

beforeAll(async () => {
  outDir = await mkdtemp(join(tmpdir(), 'order-of-work-'));
  await buildSite(outDir);
  server = await startServer({ distDir: outDir, clock: { now: Date.now, set: () => {}, advance: () => {} } });
  shop = await makeShop(server.database);
  browser = await chromium.launch({ executablePath: CHROMIUM_PATH, args: CHROMIUM_FLAGS });
});

afterAll(async () => {
  await browser?.close();
  await server?.close();
  await rm(outDir, { recursive: true });
});

async function signIn(page: Page, email: string): Promise<void> {
  await page.goto(server.url);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByLabel('Password').waitFor({ state: 'detached' });
  await page.waitForFunction(() => navigator.serviceWorker.controller?.state === 'activated');
}

const countTasks = () =>
  server.database.inShop(shop.shopId, (transaction) =>
    server.database.models.Task.count({ where: { shopId: shop.shopId }, transaction }),
  );

it('a list of work made without signal reaches the server whole', async () => {
  const context = await browser.newContext({ viewport: { width: 390, height: 844 } });
  const page = await context.newPage();
  await signIn(page, shop.people.foreman.email);
  await page.goto(`${server.url}/boats`);
  await page.getByRole('button', { name: 'Add a boat' }).click();
  await page.getByRole('textbox', { name: 'Name', exact: true }).fill('Sedge Warbler');
  await page.getByLabel('Length').fill('20 ft');
  await page.getByRole('button', { name: 'Add her' }).click();
  await page.getByRole('heading', { name: 'Sedge Warbler', level: 1 }).waitFor();

  await context.setOffline(true);
  await page.getByRole('link', { name: 'Her order of work' }).click();
  await page.getByRole('button', { name: 'Make her list from a template' }).click();
  await page.getByText('Painted lapstrake hull, 18-24 ft').click();
  await page.getByLabel('How many ribs are to be made').fill('12');
  await page.getByLabel('Which ribs, where known').fill('4 port, 7-9 starboard');
  await page.getByText('11 stages, 71 tasks').waitFor();
  await page.getByRole('button', { name: 'Make the list' }).click();
  await page.getByRole('dialog').waitFor({ state: 'detached', timeout: 60_000 });
  await page.getByText('0 of 71 tasks done').waitFor();
  await page.reload();
  await page.getByText('0 of 71 tasks done').waitFor();
  expect(await countTasks()).toBe(0);

  await context.setOffline(false);
  await expect.poll(countTasks, { timeout: 30_000 }).toBe(71);
  await context.close();
});
