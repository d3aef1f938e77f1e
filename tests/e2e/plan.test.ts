import { AxeBuilder } from '@axe-core/playwright';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { DEMO_PASSWORD } from '#server/demo/demo-people.ts';
import { seedDemo } from '#server/demo/seed.ts';
import { dayAt } from '#shared/sync/day.ts';
import { nextWorkDay } from '#shared/task/plan.ts';
import { buildSite } from '#tests/e2e/build-site.ts';
import { CHROMIUM_FLAGS, CHROMIUM_PATH, SIZES } from '#tests/e2e/gallery/open-gallery.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';

// Goal: tomorrow is planned by person in few taps, without signal, and each person finds theirs on their own phone.
// Method: the product's build over the real server with the demo shop; the foreman on a desk, the crew each on a phone.

const ZONE = 'UTC';
const CREW = ['Rosa', 'Wes', 'Tamsin', 'Lenny'];
const realClock = { now: Date.now, set: () => {}, advance: () => {} };

let outDir: string;
let server: TestServer;
let browser: Browser;
let context: BrowserContext;
let page: Page;

beforeAll(async () => {
  outDir = await mkdtemp(join(tmpdir(), 'plan-'));
  await buildSite(outDir);
  server = await startServer({ clock: realClock, distDir: outDir });
  await seedDemo(server.database, Date.now(), ZONE);
  browser = await chromium.launch({ executablePath: CHROMIUM_PATH, args: CHROMIUM_FLAGS });
  context = await browser.newContext({ viewport: SIZES.desk, baseURL: server.url });
  page = await signIn(context, 'orrin');
});

afterAll(async () => {
  await browser?.close();
  await server?.close();
  await rm(outDir, { recursive: true });
});

async function signIn(within: BrowserContext, name: string): Promise<Page> {
  const opened = await within.newPage();
  await opened.goto('/sign-in');
  await opened.getByLabel('E-mail').fill(`${name}@hornbeam.example`);
  await opened.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
  await opened.getByRole('button', { name: 'Sign in' }).click();
  await opened.getByRole('button', { name: 'Go on' }).click();
  await opened.getByRole('button', { name: 'Go on' }).waitFor({ state: 'detached' });
  await opened.waitForFunction(() => navigator.serviceWorker.controller?.state === 'activated');
  return opened;
}

const columnOf = (name: string) =>
  page.getByRole('listitem').filter({ has: page.getByRole('heading', { name, level: 2, exact: true }) });

/** Gives a person the first tasks that are offered; answers their titles and how many taps it took. */
async function giveWork(name: string, count: number): Promise<{ titles: string[]; taps: number }> {
  await columnOf(name)
    .getByRole('button', { name: `Give ${name} work` })
    .click();
  const sheet = page.getByRole('dialog');
  const offered = sheet
    .locator('fieldset')
    .filter({ has: page.getByRole('checkbox') })
    .locator('label');
  const titles: string[] = [];
  for (let index = 0; index < count; index += 1) {
    titles.push(await offered.nth(index).locator('span.font-semibold').innerText());
    await offered.nth(index).click();
  }
  await sheet.getByRole('button', { name: /^Give (it|these)/ }).click();
  await sheet.waitFor({ state: 'detached' });
  return { titles, taps: count + 2 };
}

describe('tomorrow', () => {
  const given = new Map<string, string[]>();

  test('is planned for four people without signal, in two taps a person and one a task', async () => {
    await page.goto('/plan');
    await page.getByRole('heading', { level: 1 }).waitFor();
    await context.setOffline(true);
    let taps = 0;
    for (const name of CREW) {
      const gift = await giveWork(name, 2);
      given.set(name, gift.titles);
      taps += gift.taps;
    }
    expect(taps).toBe(16);
    for (const name of CREW)
      for (const title of given.get(name)!) await columnOf(name).getByText(title).waitFor();
    await page.reload();
    for (const name of CREW)
      for (const title of given.get(name)!) await columnOf(name).getByText(title).waitFor();
    await page
      .getByText(/held on this computer/)
      .first()
      .waitFor();
    await context.setOffline(false);
    await page.getByText(/^All sent/).waitFor();
  });

  test.each(CREW)('reaches the phone of %s, who reads it without signal too', async (name) => {
    const phone = await browser.newContext({ viewport: SIZES.phone, baseURL: server.url });
    const own = await signIn(phone, name.toLowerCase());
    await own.goto('/plan');
    for (const title of given.get(name)!) await own.getByText(title).waitFor();
    expect(await own.getByRole('button', { name: /^Give/ }).count()).toBe(0);
    await phone.setOffline(true);
    await own.reload();
    for (const title of given.get(name)!) await own.getByText(title).waitFor();
    await phone.close();
  });

  test('is moved to somebody else in two taps, and back by the undo key', async () => {
    const [title] = given.get('Rosa')!;
    await columnOf('Rosa').getByRole('button', { name: title! }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Hob', exact: true }).click();
    await columnOf('Hob').getByText(title!).waitFor();
    await columnOf('Rosa').getByText(title!).waitFor({ state: 'detached' });
    await page.getByRole('button', { name: 'Undo' }).click();
    await columnOf('Rosa').getByText(title!).waitFor();
  });

  test('is given again where it was not done', async () => {
    const today = dayAt(Date.now(), ZONE);
    await page.goto(`/plan/${today}`);
    const { titles } = await giveWork('Wes', 1);
    const [title] = titles;
    await page.goto(`/plan/${nextWorkDay(nextWorkDay(today))}`);
    const again = columnOf('Wes').getByRole('button', { name: new RegExp(`^Again .*${title}`) });
    await again.click();
    await again.waitFor({ state: 'detached' });
    await columnOf('Wes').getByRole('button', { name: title! }).waitFor();
    await page.getByRole('button', { name: 'Undo' }).click();
  });
});

/** The first stage that could be marked finished. */
async function underWay(on: Page): Promise<string> {
  const words = await on
    .getByRole('button', { name: /^Stage finished/ })
    .first()
    .innerText();
  return words.replace(/^Stage finished\s*/, '');
}

describe('the order of work', () => {
  test('lists what is open before a stage is finished, opens it again, and what comes after waits again', async () => {
    await page.goto('/order');
    await page.getByRole('link', { name: 'Penny Candle' }).click();
    const name = await underWay(page);
    const stage = page.locator('li').filter({ has: page.getByRole('heading', { name, level: 2 }) });
    const waiting = page.getByText('waits', { exact: true });
    const before = await waiting.count();
    expect(before).toBeGreaterThan(0);
    await page.getByRole('button', { name: `Stage finished ${name}` }).click();
    await page
      .getByRole('dialog')
      .getByText(/^Still open: \d+ tasks/)
      .waitFor();
    await page.getByRole('button', { name: 'Finished all the same' }).click();
    await expect.poll(() => waiting.count()).toBeLessThan(before);
    await stage.locator('summary').first().click();
    await page.getByRole('button', { name: `Take it up again ${name}` }).click();
    await expect.poll(() => waiting.count()).toBe(before);
  });

  test('has a task added by one of the crew, started and ticked off, and undone', async () => {
    const phone = await browser.newContext({ viewport: SIZES.phone, baseURL: server.url });
    const own = await signIn(phone, 'rosa');
    await own.goto('/order');
    await own.getByRole('link', { name: 'Penny Candle' }).click();
    await own
      .getByRole('button', { name: /^Add a task to/ })
      .first()
      .click();
    await own.getByLabel('What is to be done').fill('Oil the new ribs');
    await own.getByRole('button', { name: 'Add it' }).click();
    const task = own.getByRole('button', { name: /Oil the new ribs/ });
    await task.click();
    await own.getByRole('button', { name: 'Start', exact: true }).click();
    await task.getByText(/^started by you/).waitFor();
    await task.click();
    await own.getByRole('button', { name: 'Tick off' }).click();
    await own.getByRole('button', { name: 'Undo' }).click();
    await task.getByText(/^started by you/).waitFor();
    expect(await own.getByRole('button', { name: /^Stage finished/ }).count()).toBe(0);
    await phone.close();
  });
});

describe('the day sheet', () => {
  test('splits an entry in two, with the totals as they were, and makes it whole again', async () => {
    await page.goto('/week');
    await page.getByRole('heading', { level: 1 }).waitFor();
    const total = () => page.getByRole('row', { name: /^All/ }).first().innerText();
    const before = await total();
    const busy = page.getByRole('cell').getByRole('link').filter({ hasText: /[1-9]/ }).first();
    await busy.click();
    await page
      .getByRole('button', { name: /^Split or move/ })
      .first()
      .click();
    const sheet = page.getByRole('dialog');
    await sheet.getByLabel('Second part', { exact: true }).fill('The rest of it, on the other side');
    await sheet.getByRole('button', { name: 'A quarter hour more' }).first().click();
    await sheet.getByLabel('Why is it divided?').fill('two things in one');
    await sheet.getByRole('button', { name: 'Split it in two' }).click();
    await sheet.waitFor({ state: 'detached' });
    const second = page.getByText('The rest of it, on the other side').first();
    await second.waitFor();
    await page
      .getByText(/Divided from .* two things in one/)
      .first()
      .waitFor();
    await page.getByRole('button', { name: 'Undo' }).click();
    await page.getByText('undone at once').first().waitFor();
    await page.goto('/week');
    await expect.poll(total).toBe(before);
  });
});

describe.each(['/order', '/plan', '/week', '/day'])('%s', (path) => {
  test.each(['light', 'dark', 'sunlight'])('has nothing for axe to find in the %s set', async (set) => {
    await page.goto(path);
    await page.locator('h1').waitFor();
    await page.evaluate((chosen) => (document.documentElement.dataset['set'] = chosen), set);
    const { violations } = await new AxeBuilder({ page }).analyze();
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.html).join(' ')}`)).toEqual(
      [],
    );
  });

  test.each(Object.entries(SIZES))('fits the width of a %s', async (_name, size) => {
    await page.setViewportSize(size);
    await page.goto(path);
    await page.locator('h1').waitFor();
    const [scrollWidth, clientWidth] = await page.evaluate(() => [
      document.documentElement.scrollWidth,
      document.documentElement.clientWidth,
    ]);
    expect(scrollWidth).toBeLessThanOrEqual(clientWidth!);
  });
});
