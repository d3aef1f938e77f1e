import { appendFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { BrowserContext, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Gallery, openGallery } from '#tests/e2e/gallery/open-gallery.ts';

// Goal: a newer version is offered, never forced; no window loses what is being typed.
// Method: the product's worker and its follower on a page of the gallery; a newer version is the same worker with other bytes.

const OFFER = 'A newer version of Ribband is on this device.';
const TAKEN_OVER = 'A newer version of Ribband was started in another window.';

let gallery: Gallery;
beforeAll(async () => {
  gallery = await openGallery();
});
afterAll(() => gallery.close());

/** A window with its worker in force and words half typed. */
async function openWindow(context: BrowserContext): Promise<Page> {
  const page = await context.newPage();
  await page.goto(`${gallery.url}#/update`);
  await page.waitForFunction(() => navigator.serviceWorker.controller?.state === 'activated');
  await page.getByLabel('What you did').fill('half a sentence');
  return page;
}

/** Lets a newer version be found as it is when a person comes back to the window. */
async function bringNewerVersion(page: Page): Promise<void> {
  await appendFile(join(gallery.outDir, 'sw.js'), '\n// newer\n');
  await page.evaluate(() => document.dispatchEvent(new Event('visibilitychange')));
}

describe('a newer version', () => {
  it('is offered in words, and comes in when the person says so', async () => {
    const context = await gallery.browser.newContext();
    const page = await openWindow(context);
    await bringNewerVersion(page);
    await page.getByText(OFFER).waitFor();
    expect(await page.getByLabel('What you did').inputValue()).toBe('half a sentence');
    const isLoadedAgain = page.waitForEvent('load');
    await page.getByRole('button', { name: 'Change to it now' }).click();
    await isLoadedAgain;
    await page.getByLabel('What you did').waitFor();
    expect(await page.getByText(OFFER).isVisible()).toBe(false);
    expect(await page.evaluate(async () => (await navigator.serviceWorker.ready).waiting)).toBeNull();
    await context.close();
  });

  it('let in by another window leaves this one as it is, and says so', async () => {
    const context = await gallery.browser.newContext();
    const page = await openWindow(context);
    const other = await openWindow(context);
    await bringNewerVersion(other);
    await other.getByText(OFFER).waitFor();
    await other.getByRole('button', { name: 'Change to it now' }).click();
    await page.getByText(TAKEN_OVER).waitFor();
    expect(await page.getByLabel('What you did').inputValue()).toBe('half a sentence');
    await context.close();
  });
});
