import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openScreensWorld, type ScreensWorld } from '#tests/e2e/screens/world.ts';

// Goal: a day and a week can be pinned to the wall: the words on paper, without what is there to be pressed.
// Method: the screens as the browser prints them. The environment may name a folder that the papers are left in.

const PAPERS = process.env['PRINT_PAPERS'];

let world: ScreensWorld;
let page: Page;

beforeAll(async () => {
  world = await openScreensWorld();
  page = await world.signIn('orrin');
  await page.emulateMedia({ media: 'print' });
});
afterAll(() => world.close());

describe.each([
  ['day', '/day', ['Starboard sole panels up', 'floor 7 starboard', 'Hours of Wes', 'Loose ends']],
  ['week', '/week', ['By person', 'By boat', 'Widdershins', 'Hours missing']],
])('the %s on paper', (name, path, words) => {
  it('has the words and nothing to press', async () => {
    await page.goto(path);
    await page.locator('h1').waitFor();
    for (const each of words) await page.getByText(each).first().waitFor();
    // what is set in a link stays to be read; a key or a bar does not
    // a picture is a key on a screen, and stays a picture
    expect(
      await page.locator('button:not([data-print]):visible, [data-bar]:visible, [data-keys]:visible').count(),
    ).toBe(0);
    const colours = await page.evaluate(() => [
      getComputedStyle(document.body).color,
      getComputedStyle(document.documentElement).backgroundColor,
    ]);
    expect(colours[0]).not.toBe(colours[1]);
    const paper = await page.pdf({ format: 'A4' });
    expect(paper.subarray(0, 5).toString()).toBe('%PDF-');
    if (PAPERS) {
      await mkdir(PAPERS, { recursive: true });
      await page.setViewportSize({ width: 794 - 120, height: 1000 });
      await page.screenshot({ path: join(PAPERS, `${name}.png`), fullPage: true });
    }
  });
});
