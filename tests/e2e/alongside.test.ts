import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { AxeBuilder } from '@axe-core/playwright';
import { type Browser, type BrowserContext, type Locator, type Page, chromium } from 'playwright-core';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { v7 } from 'uuid';
import { buildSite } from '#tests/e2e/build-site.ts';
import { CHROMIUM_FLAGS, CHROMIUM_PATH, SETS, SIZES } from '#tests/e2e/gallery/open-gallery.ts';
import { senderFor } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, PASSWORD, type TestShop } from '#tests/worlds/shop.ts';

// Goal: a crew member's day is a few taps on a phone without signal, on screens that a gloved thumb can hit and tired eyes can read.
// Method: the product's own build over the real server with three boats; taps are counted as they are made; every screen is
// given to axe and measured in each set and size.

const TARGET_MIN_PX = 56;
const TEXT_MIN_PX = 18;
const FINDING_TAPS_MAX = 10;
const ENTRY_TAPS_MAX = 3;
const THREE_BOATS_TAPS_MAX = 18;

let outDir: string;
let server: TestServer;
let shop: TestShop;
let browser: Browser;
let context: BrowserContext;
let page: Page;
let taps = 0;

beforeAll(async () => {
  outDir = await mkdtemp(join(tmpdir(), 'alongside-'));
  await buildSite(outDir);
  server = await startServer({ distDir: outDir, clock: { now: Date.now, set: () => {}, advance: () => {} } });
  shop = await makeShop(server.database);
  await layDownBoats();
  browser = await chromium.launch({ executablePath: CHROMIUM_PATH, args: CHROMIUM_FLAGS });
  context = await browser.newContext({ viewport: SIZES.phone, hasTouch: true, isMobile: true });
  page = await context.newPage();
  await signIn();
});

afterAll(async () => {
  await browser?.close();
  await server?.close();
  await rm(outDir, { recursive: true });
});

/** Three boats with a stage and two tasks each, the first with an entry of yesterday. */
async function layDownBoats(): Promise<void> {
  const foreman = await senderFor(server, shop.people.foreman);
  for (const name of ['Amber Reach', 'Dunlin', 'Sedge Warbler']) {
    const [boatId, stageId] = [v7(), v7()];
    const task = (title: string) => foreman.op('task.add', { taskId: v7(), boatId, stageId, title });
    const yesterday = new Date(Date.now() - 24 * 60 * 60_000).toISOString().slice(0, 10);
    await foreman.send(
      foreman.op('boat.add', { boatId, name, arrivedOn: yesterday }),
      foreman.op('stage.add', { stageId, boatId, name: 'Open up', order: 1, after: [] }),
      task('Take the foredeck off'),
      task('Number the beams'),
      foreman.op('entry.write', {
        entryId: v7(),
        boatId,
        stageId,
        workDate: yesterday,
        text: 'She came in on the trailer.',
        spoken: false,
        hours: [{ personId: foreman.personId, minutes: 60 }],
      }),
    );
  }
}

async function signIn(): Promise<void> {
  await page.goto(server.url);
  await page.getByLabel('E-mail').fill(shop.people.crew.email);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByRole('link', { name: 'Log it' }).waitFor();
  await page.waitForFunction(() => navigator.serviceWorker.controller?.state === 'activated');
}

async function tap(target: Locator): Promise<void> {
  taps += 1;
  await target.tap();
}

const key = (name: string | RegExp) => page.getByRole('button', { name, exact: true });
const link = (name: string) => page.getByRole('link', { name, exact: true });

async function picture(colour: string): Promise<{ name: string; mimeType: string; buffer: Buffer }> {
  const buffer = await sharp({ create: { width: 800, height: 600, channels: 3, background: colour } })
    .jpeg()
    .toBuffer();
  return { name: `${colour}.jpg`, mimeType: 'image/jpeg', buffer };
}

/** One tap on the camera's key; what the camera's own app asks for is not ours to count. */
async function shoot(colour: string, count: number): Promise<void> {
  taps += 1;
  await page.getByLabel('Take a photo').setInputFiles(await picture(colour));
  await page.getByRole('button', { name: `Take photo ${count} out` }).waitFor();
}

/** How many rows of an entity the server has; entries alone are there before the day begins. */
async function countRows(...entities: string[]): Promise<number[]> {
  const foreman = await senderFor(server, shop.people.foreman);
  const { rows } = await foreman.pullAll();
  return entities.map((entity) => rows.filter((row) => row.entity === entity).length);
}

describe('without signal', () => {
  beforeAll(() => context.setOffline(true));
  afterAll(() => context.setOffline(false));

  it('a finding with two photos, its part and side takes a handful of taps', async () => {
    taps = 0;
    await tap(link('Found'));
    await tap(key('Rot'));
    await tap(key(/^Which part/));
    await tap(key('Foredeck'));
    await tap(key('Port'));
    await shoot('brown', 1);
    await shoot('maroon', 2);
    await tap(key('Log the finding'));
    await page.getByText('Found: Rot, foredeck port').waitFor();
    expect(taps).toBeLessThanOrEqual(FINDING_TAPS_MAX);
    await page.getByText('On this phone').nth(1).waitFor();
  });

  it('an entry with its hours takes three taps beside the words', async () => {
    taps = 0;
    await tap(link('Log it'));
    await page.getByLabel('What did you do?').fill('Opened the foredeck');
    await tap(key('4 h'));
    await tap(key('Log it'));
    await page.getByText(/^Logged on Amber Reach: 4 h/).waitFor();
    expect(taps).toBe(ENTRY_TAPS_MAX);
  });

  it('a day on three boats is logged from one screen', async () => {
    taps = 0;
    for (const boat of [null, 1, 2]) {
      await tap(link('Log it'));
      if (boat !== null) {
        await tap(key('Other boat'));
        await tap(page.getByRole('group', { name: 'Boats' }).getByRole('button').nth(boat));
        await tap(
          page
            .getByRole('group', { name: /^Stages of/ })
            .getByRole('button')
            .first(),
        );
      }
      await page.getByLabel('What did you do?').fill(`Work ${boat ?? 0}`);
      await tap(key('2 h'));
      await tap(key('Log it'));
      await page.getByText(/^Logged on .*: 2 h/).waitFor();
    }
    expect(taps).toBeLessThanOrEqual(THREE_BOATS_TAPS_MAX);
  });

  it('the search finds what is held, and its page opens', async () => {
    await page.goto(`${server.url}/search?boats=all`);
    await page.getByRole('searchbox').fill('foredeck port');
    await page.getByRole('link', { name: 'Rot, foredeck port' }).tap();
    await page.getByRole('button', { name: 'Change it' }).waitFor();
    await page
      .getByRole('button', { name: /^Foredeck port/ })
      .first()
      .tap();
    await page.getByRole('dialog', { name: 'Photo' }).waitFor();
    await page.keyboard.press('Escape');
  });
});

it('all of it reaches the server once there is signal, the pictures once each', async () => {
  await page.goto(`${server.url}/held`);
  await page.getByText(/^Nothing is held/).waitFor({ timeout: 60_000 });
  expect(await countRows('finding', 'photo', 'entry')).toEqual([1, 2, 3 + 4]);
});

const SCREENS: [name: string, path: string, ready: RegExp][] = [
  ['Alongside', '/alongside', /^Hours$/],
  ['the entry form', '/log', /^Not done, and why$/],
  ['the finding form', '/found', /^Log the finding$/],
  ['the photo form', '/photos', /^Log the photos$/],
  ['the tasks', '/tasks', /^Add the task$/],
];

async function open(path: string, ready: RegExp): Promise<void> {
  await page.goto(server.url + path);
  await page.getByRole('button', { name: ready }).first().waitFor();
}

describe.each(SCREENS)('%s', (_name, path, ready) => {
  it.each(SETS)('has nothing for axe to find in the %s set', async (set) => {
    await page.evaluate((chosen) => localStorage.setItem('ribband.set', chosen), set);
    await open(path, ready);
    const axe = new AxeBuilder({ page }).options({ rules: { 'color-contrast-enhanced': { enabled: true } } });
    const { violations } = await axe.analyze();
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)).toEqual(
      [],
    );
  });

  it('has targets of 56 px and text of 18 px', async () => {
    await open(path, ready);
    expect(await smallTargets()).toEqual([]);
    expect(await smallTexts()).toEqual([]);
  });

  it.each(Object.keys(SIZES) as (keyof typeof SIZES)[])('fits the width of a %s', async (size) => {
    await page.setViewportSize(SIZES[size]);
    await open(path, ready);
    const { scrollWidth, clientWidth } = await page.evaluate(() => document.documentElement);
    expect(scrollWidth).toBe(clientWidth);
    await page.setViewportSize(SIZES.phone);
  });
});

function smallTargets(): Promise<string[]> {
  return page.evaluate((minPx) => {
    // a boat's name answers for the whole bar
    const all = [
      ...document.querySelectorAll(
        'button:not(h1 button), textarea, select, label:has(input), [data-keys] a, header a',
      ),
    ];
    return all
      .map((element) => ({ element, box: element.getBoundingClientRect() }))
      .filter(({ box }) => box.width > 0 && (box.height < minPx - 0.5 || box.width < minPx - 0.5))
      .map(({ element, box }) => `${element.textContent} ${box.width}x${box.height}`);
  }, TARGET_MIN_PX);
}

function smallTexts(): Promise<string[]> {
  return page.evaluate((minPx) => {
    const all = [...document.querySelectorAll('main *, header *, footer *')];
    return all
      .filter((element) =>
        [...element.childNodes].some(({ nodeType, textContent }) => nodeType === 3 && textContent?.trim()),
      )
      .filter((element) => element.getBoundingClientRect().width > 1)
      .filter((element) => parseFloat(getComputedStyle(element).fontSize) < minPx)
      .map((element) => element.textContent ?? '');
  }, TEXT_MIN_PX);
}
