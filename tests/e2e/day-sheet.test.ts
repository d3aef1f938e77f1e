import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { DEMO_PASSWORD } from '#server/demo/demo-people.ts';
import { DEMO_SHOP_ID, seedDemo } from '#server/demo/seed.ts';
import { dayAt } from '#shared/sync/day.ts';
import type { SessionAnswer } from '#shared/identity/session.ts';
import { formatStamp } from '#shared/sync/stamp.ts';
import { buildSite } from '#tests/e2e/build-site.ts';
import { CHROMIUM_FLAGS, CHROMIUM_PATH, SIZES } from '#tests/e2e/gallery/open-gallery.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';

// Goal: the foreman sees and settles the shop's day in the built app, as it changes, with signal and without.
// Method: the product's build over the real server with the demo shop in it; another device speaks to the server by hand.

const ZONE = 'UTC';
const ALIVE_WITHIN_MS = 2000;
const realClock = { now: Date.now, set: () => {}, advance: () => {} };

let outDir: string;
let server: TestServer;
let browser: Browser;
let context: BrowserContext;
let page: Page;

beforeAll(async () => {
  outDir = await mkdtemp(join(tmpdir(), 'day-sheet-'));
  await buildSite(outDir);
  server = await startServer({ clock: realClock, distDir: outDir });
  await seedDemo(server.database, Date.now(), ZONE);
  browser = await chromium.launch({ executablePath: CHROMIUM_PATH, args: CHROMIUM_FLAGS });
  context = await browser.newContext({ viewport: SIZES.desk, baseURL: server.url });
  page = await foremanIn(context);
});

afterAll(async () => {
  await browser?.close();
  await server?.close();
  await rm(outDir, { recursive: true });
});

async function foremanIn(within: BrowserContext): Promise<Page> {
  const opened = await within.newPage();
  await opened.goto('/sign-in');
  await opened.getByLabel('E-mail').fill('orrin@hornbeam.example');
  await opened.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
  await opened.getByRole('button', { name: 'Sign in' }).click();
  await opened.getByRole('button', { name: 'Go on' }).click();
  await opened.getByRole('heading', { name: 'Loose ends' }).waitFor();
  return opened;
}

/** Logs an entry as a crew member's phone would, and says when the server had it. */
async function rosaLogs(text: string): Promise<number> {
  const deviceId = v7();
  const post = async (path: string, body: object, token?: string) => {
    const headers = {
      'Content-Type': 'application/json',
      ...(token ? { Authorization: `Bearer ${token}` } : {}),
    };
    const response = await fetch(server.url + path, { method: 'POST', headers, body: JSON.stringify(body) });
    expect(response.status).toBe(200);
    return response.json();
  };
  const credentials = { email: 'rosa@hornbeam.example', password: DEMO_PASSWORD, shopId: DEMO_SHOP_ID };
  const session = (await post('/api/session', {
    ...credentials,
    device: { id: deviceId, label: 'Rosa, spare' },
  })) as SessionAnswer;
  const boat = await server.database.inShop(DEMO_SHOP_ID, (transaction) =>
    server.database.models.Boat.findOne({
      where: { shopId: DEMO_SHOP_ID, name: 'Penny Candle' },
      transaction,
      rejectOnEmpty: true,
    }),
  );
  const personId = session.person.id;
  const workDate = dayAt(Date.now(), ZONE);
  const data = {
    entryId: v7(),
    boatId: boat.id,
    workDate,
    text,
    spoken: false,
    hours: [{ personId, minutes: 75 }],
  };
  const op = {
    id: v7(),
    v: 1,
    kind: 'entry.write',
    at: formatStamp({ ms: Date.now(), counter: 0 }, deviceId),
    personId,
    over: {},
    data,
  };
  await post('/api/sync', { deviceId, cursor: null, ops: [op], limit: 1 }, session.accessToken);
  return performance.now();
}

const section = (name: string) =>
  page.locator('section').filter({ has: page.getByRole('heading', { name, exact: false }) });

describe('the day sheet in a browser', () => {
  test('shows what another phone sends within two seconds, without a reload', async () => {
    await page.goto('/day');
    await page.getByRole('heading', { name: 'Loose ends' }).waitFor();
    const sentMs = await rosaLogs('Swept the shavings from under Penny Candle');
    await page.getByText('Swept the shavings').first().waitFor();
    expect(performance.now() - sentMs).toBeLessThan(ALIVE_WITHIN_MS);
  });

  test('settles a loose end by one tap, and the figure that was taken stands', async () => {
    const ends = section('Loose ends');
    await ends.getByRole('button', { name: 'take 3 1/2 h of Rosa' }).click();
    await ends.getByText('None.').waitFor();
    await page.reload();
    await section('Loose ends').getByText('None.').waitFor();
  });

  test('admits what was set aside, with a reason, and it counts', async () => {
    await section('Set aside').getByRole('button', { name: 'Admit' }).click();
    await page.getByLabel('Why does it count?').fill('I looked, they are done');
    await page.getByRole('button', { name: 'Admit it' }).click();
    await section('Set aside').getByText('Nothing. All that came counts.').waitFor();
    await page.goto('/boats');
    await page.getByRole('link', { name: 'Hickory Moon' }).click();
    await page.getByText(/^finished .* by Lenny/).waitFor();
  });

  test('sets the kind of hours in place', async () => {
    await page.goto('/day');
    const kind = page.getByRole('combobox', { name: "Kind of Rosa's hours" }).last();
    await kind.selectOption('yard work');
    await page.getByText(/^All sent/).waitFor();
    await page.reload();
    await expect
      .poll(() => page.getByRole('combobox', { name: "Kind of Rosa's hours" }).last().inputValue())
      .toBe('yard');
  });

  test('logs for somebody who has not, and comes back to the day', async () => {
    await page.goto('/day');
    await page.getByRole('link', { name: 'Log for Lenny' }).click();
    await page.getByLabel('What did you do?').fill('Lenny held the staging, I saw him');
    await page.getByRole('group', { name: "Lenny's hours" }).getByRole('textbox').fill('2 1/2');
    await page.getByRole('button', { name: 'Log it' }).click();
    const lenny = page.getByRole('listitem').filter({ has: page.getByRole('heading', { name: 'Lenny' }) });
    await lenny.getByText('Lenny held the staging, I saw him').waitFor();
    await lenny.getByText('by you').waitFor();
  });

  test('goes from day to day by the arrow keys', async () => {
    await page.goto('/day/2026-03-04');
    await page.getByRole('heading', { name: /^Wednesday 4 March/ }).waitFor();
    await page.keyboard.press('ArrowLeft');
    await page.getByRole('heading', { name: /^Tuesday 3 March/ }).waitFor();
    await page.keyboard.press('ArrowRight');
    await page.getByRole('heading', { name: /^Wednesday 4 March/ }).waitFor();
  });

  test('adds a boat, a stage and a task, and marks the stage finished', async () => {
    await page.goto('/boats');
    await page.getByRole('button', { name: 'Add a boat' }).click();
    await page.getByLabel('Name', { exact: true }).fill('Nutmeg Belle');
    await page.getByLabel('Length').fill('17 ft 6 in');
    await page.getByRole('button', { name: 'Add her' }).click();
    await page.getByRole('heading', { name: 'Nutmeg Belle', level: 1 }).waitFor();
    await page.getByText('17 ft 6 in').waitFor();
    await page.getByRole('link', { name: 'Her order of work' }).click();
    await page.getByRole('button', { name: 'Add a stage' }).click();
    await page.getByLabel('Name', { exact: true }).fill('Strip out');
    await page.getByRole('button', { name: 'Add it' }).click();
    await page.getByRole('button', { name: 'Add a task to Strip out' }).click();
    await page.getByLabel('What is to be done').fill('Thwarts out');
    await page.getByRole('button', { name: 'Add it' }).click();
    await page.getByText('0 of 1 task done').first().waitFor();
    await page.getByRole('button', { name: 'Stage finished Strip out' }).click();
    await page.getByRole('button', { name: 'Finished all the same' }).click();
    await page.getByText(/^finished .* by you/).waitFor();
  });

  test('names the owner of a boat', async () => {
    await page.getByRole('link', { name: 'Her particulars' }).click();
    await page.getByRole('button', { name: 'Change', exact: true }).nth(1).click();
    await page.getByText('Ottilie Framm').click();
    await page.getByRole('button', { name: 'Set her owners' }).click();
    await page
      .locator('section')
      .filter({ hasText: /^Owner/ })
      .getByText('Ottilie Framm')
      .waitFor();
  });

  test('adds a person, who can then sign in', async () => {
    await page.goto('/people');
    await page.getByRole('button', { name: 'Add a person' }).click();
    await page.getByLabel('Name', { exact: true }).fill('Magda');
    await page.getByLabel('E-mail').fill('magda@hornbeam.example');
    await page.getByLabel('Password').fill('short');
    await page.getByRole('button', { name: 'Add', exact: true }).click();
    await page.getByText('It needs at least 8 characters').waitFor();
    await page.getByLabel('Password').fill('long enough');
    await page.getByRole('button', { name: 'Add', exact: true }).click();
    await page.getByRole('heading', { name: 'Magda' }).waitFor();
    const answer = await fetch(`${server.url}/api/session`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify({
        email: 'magda@hornbeam.example',
        password: 'long enough',
        device: { id: v7(), label: 'hers' },
      }),
    });
    expect(answer.status).toBe(200);
  });

  test('shuts out a device once it is said what that means', async () => {
    await page.goto('/devices');
    await page.getByRole('button', { name: 'Shut out Bench tablet' }).click();
    await page.getByText('What it sends from now on does not count').waitFor();
    await page.getByRole('button', { name: 'Shut it out' }).click();
    await page.getByText(/shut out .* \d/).waitFor();
  });

  test('opens and settles without signal, and sends when it is back', async () => {
    await page.goto('/day');
    await page.waitForFunction(() => navigator.serviceWorker.controller?.state === 'activated');
    await context.setOffline(true);
    await page.reload();
    await page.getByText(/^No signal here: this is as last heard/).waitFor();
    await page.getByRole('combobox', { name: "Kind of Rosa's hours" }).last().selectOption('teaching');
    await page
      .getByText(/^1 held on this/)
      .first()
      .waitFor();
    await context.setOffline(false);
    await page.getByText(/^All sent/).waitFor();
  });
});
