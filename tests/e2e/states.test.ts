import type { BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '#server/demo/demo-people.ts';
import { SIZES } from '#tests/e2e/gallery/open-gallery.ts';
import { openScreensWorld, type ScreensWorld } from '#tests/e2e/screens/world.ts';

// Goal: whatever is wrong, a screen says so in words and what was logged is still there.
// Method: the built product with the signal, the server, the session or the disk taken away from it, one at a time.

let world: ScreensWorld;
let context: BrowserContext;

beforeAll(async () => {
  world = await openScreensWorld();
});
afterEach(() => context.close());
afterAll(() => world.close());

async function rosaAlongside(): Promise<Page> {
  const page = await world.signIn('rosa');
  context = page.context();
  await page.setViewportSize(SIZES.phone);
  await page.goto('/alongside');
  await page.getByRole('heading', { level: 1, name: 'Penny Candle' }).waitFor();
  return page;
}

async function log(page: Page, words: string): Promise<void> {
  await page.getByRole('link', { name: 'Log it' }).click();
  await page.getByLabel('What did you do?').fill(words);
  await page.getByRole('textbox', { name: 'Your hours' }).fill('2');
  await page.getByRole('button', { name: 'Log it' }).click();
}

/** The words stand on the line, also after the app is opened anew. */
async function keepsWords(page: Page, words: string): Promise<void> {
  const entry = page.getByRole('listitem').filter({ hasText: words });
  await entry.waitFor();
  await page.reload();
  await entry.waitFor();
}

/** The server answers nothing but its own fault. */
async function failServer(): Promise<void> {
  await context.route('**/api/**', (route) =>
    route.fulfill({ status: 500, contentType: 'application/problem+json', body: '{"status":500}' }),
  );
}

describe('a device that never heard the record', () => {
  it('says so, and that it comes by itself', async () => {
    context = await world.browser.newContext({ viewport: SIZES.desk, baseURL: world.server.url });
    const page = await context.newPage();
    // signed in, and cut off before the first row came
    await context.route('**/api/sync', (route) => route.abort());
    await context.route('**/api/hails**', (route) => route.abort());
    await page.goto('/sign-in');
    await page.getByLabel('E-mail').fill(DEMO_PEOPLE.orrin.email);
    await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.waitForURL('**/day');
    for (const path of ['/day', '/week', '/order', '/plan', '/boats', '/people', '/devices']) {
      await page.goto(path);
      await page.getByText(/^This device has not heard the record yet/).waitFor();
    }
    await page.goto('/alongside');
    await page.getByRole('heading', { level: 1, name: 'No boat yet' }).waitFor();
    await page.getByText('not heard yet').first().waitFor();
    for (const path of ['/log', '/tasks', '/photos', '/found']) {
      await page.goto(path);
      await page.getByText('No boat is here yet').waitFor();
    }
    await page.goto('/search');
    await page.getByRole('heading', { level: 1 }).waitFor();
  });
});

describe('without signal', () => {
  it('an entry is held, said to be held, and sent when signal is back', async () => {
    const page = await rosaAlongside();
    await context.setOffline(true);
    await page.getByText('No signal, nothing held').waitFor();
    await log(page, 'Scraped the keelson clean');
    await page.getByText('1 held on this computer').waitFor();
    await keepsWords(page, 'Scraped the keelson clean');
    await context.setOffline(false);
    await page.getByText(/^All sent/).waitFor();
  });
});

describe('a server that fails', () => {
  it('is said to be out of reach; an entry is held and goes once it answers', async () => {
    const page = await rosaAlongside();
    await failServer();
    await log(page, 'Bored for the new limber holes');
    await page.getByText('1 held on this computer').waitFor();
    await page.goto('/held');
    await page.getByRole('heading', { name: 'Held, not sent yet (1)' }).waitFor();
    await page.getByText(/It is tried again by itself/).waitFor();
    await page.goto('/alongside');
    await keepsWords(page, 'Bored for the new limber holes');
    await context.unroute('**/api/**');
    await page.goto('/held');
    await page.getByText('Nothing is held. Everything said here is with the server.').waitFor();
  });

  it('is no lack of signal to the day sheet', async () => {
    const page = await world.signIn('orrin');
    context = page.context();
    await failServer();
    await page.goto('/day');
    await page.getByText(/^The server is not reached: this is as last heard/).waitFor();
  });
});

describe('a session that has ended', () => {
  it('asks for the password again, and what is held stays and goes after it', async () => {
    const page = await rosaAlongside();
    await context.route('**/api/**', (route) =>
      route.fulfill({ status: 401, contentType: 'application/problem+json', body: '{"status":401}' }),
    );
    await log(page, 'Oiled the bulkhead twice');
    await page.getByText('Sign in to send').waitFor();
    await keepsWords(page, 'Oiled the bulkhead twice');
    await page.getByRole('link', { name: /Sign in to send/ }).click();
    await page.getByRole('link', { name: 'Sign in again' }).click();
    await page.getByText(/the server asks for your password again/).waitFor();
    await context.unroute('**/api/**');
    await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByText(/^All sent/).waitFor();
    await page.getByRole('listitem').filter({ hasText: 'Oiled the bulkhead twice' }).waitFor();
  });
});

describe('a device without room', () => {
  it('says that it could not keep an entry, and leaves the words on the form', async () => {
    const page = await rosaAlongside();
    await page.getByRole('link', { name: 'Log it' }).click();
    await page.evaluate(refuseWrites);
    await page.getByLabel('What did you do?').fill('Cut the bungs flush');
    await page.getByText(/^This device has no room to keep what you write/).waitFor();
    await page.getByRole('textbox', { name: 'Your hours' }).fill('2');
    await page.getByRole('button', { name: 'Log it' }).click();
    await page.getByText(/^This device has no room left, so this could not be kept/).waitFor();
    expect(await page.getByLabel('What did you do?').inputValue()).toBe('Cut the bungs flush');
  });
});

/** The disk is full: every write is refused as browsers refuse it then. */
function refuseWrites(): void {
  IDBObjectStore.prototype.put = () => {
    throw new DOMException('full', 'QuotaExceededError');
  };
  IDBObjectStore.prototype.add = IDBObjectStore.prototype.put;
}
