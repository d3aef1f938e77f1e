import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SETS, SIZES } from '#tests/e2e/gallery/open-gallery.ts';
import { SCREENS, SHEETS, type Screen } from '#tests/e2e/screens/list.ts';
import {
  CREW_LIMITS,
  DESK_LIMITS,
  doubleText,
  focusedStop,
  landKeys,
  markStops,
  overflow,
  smallWords,
  targetFaults,
} from '#tests/e2e/screens/measure.ts';
import { openScreensWorld, type ScreensWorld } from '#tests/e2e/screens/world.ts';

// Goal: every screen of the product keeps its promises to the eye, the hand and the keyboard.
// Method: every address in the built product, as the person who uses it. Each screen is measured at three sizes, each in
// another set of colours; from screen to screen the sets move on by one, so that every size meets every set.

const NARROW = { width: 320, height: 700 };
const SIZE_NAMES = Object.keys(SIZES) as (keyof typeof SIZES)[];

let world: ScreensWorld;
const pages = new Map<Screen['as'], Page>();
// what a page said amiss since it was last asked
let said: string[] = [];

beforeAll(async () => {
  world = await openScreensWorld();
});
afterAll(() => world.close());

async function pageOf(as: Screen['as']): Promise<Page> {
  const known = pages.get(as);
  if (known) return known;
  const page = as ? await world.signIn(as) : await (await newContext()).newPage();
  page.on('console', (message) => message.type() === 'error' && said.push(message.text()));
  page.on('pageerror', (error) => said.push(String(error)));
  page.on('request', (request) => {
    const { origin, protocol } = new URL(request.url());
    if (protocol.startsWith('http') && origin !== world.server.url) said.push(`asked ${request.url()}`);
  });
  pages.set(as, page);
  return page;
}

const newContext = () => world.browser.newContext({ baseURL: world.server.url });

async function open(screen: Screen): Promise<Page> {
  const page = await pageOf(screen.as);
  said = [];
  await page.setViewportSize(SIZES.phone);
  await page.goto(screen.path(world.known));
  await page.locator('h1').first().waitFor();
  await page.waitForFunction((title) => document.title === title, `${screen.title} · Ribband`);
  await page.evaluate(() => document.fonts.ready);
  return page;
}

/** axe, with 7:1 for text on crew screens, which it leaves out unless asked. */
async function axeFinds(page: Page, isCrew: boolean): Promise<string[]> {
  const rules = { 'color-contrast-enhanced': { enabled: isCrew } };
  const { violations } = await new AxeBuilder({ page }).options({ rules }).analyze();
  return violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`);
}

async function measure(page: Page, { isCrew }: Screen): Promise<string[]> {
  const limits = isCrew ? CREW_LIMITS : DESK_LIMITS;
  const faults = [
    ...(await axeFinds(page, isCrew)),
    ...(await page.evaluate(overflow)),
    ...(await page.evaluate(smallWords, limits.textMinPx)),
  ];
  await page.evaluate(landKeys);
  return [...faults, ...(await page.evaluate(targetFaults, limits))];
}

async function namelessThings(page: Page): Promise<string[]> {
  const tree = await page.locator('body').ariaSnapshot();
  return tree
    .split('\n')
    .filter((line) => /^\s*- (button|link|textbox|checkbox|radio|combobox|searchbox)(:|$| \[)/.test(line));
}

/** Tabs from the top to the end; answers what was left out, reached out of order, or not seen to have the focus. */
async function tabFaults(page: Page): Promise<string[]> {
  const stops = await page.evaluate(markStops);
  // from the document's beginning, wherever the app has put the focus
  await page.evaluate(() => {
    document.body.tabIndex = -1;
    document.body.focus();
    document.body.removeAttribute('tabindex');
  });
  const faults: string[] = [];
  for (let expected = 1; expected <= stops; expected += 1) {
    await page.keyboard.press('Tab');
    const { at, name, isSeen } = await page.evaluate(focusedStop);
    if (at !== expected) return [...faults, `stop ${expected} of ${stops} was ${at} (${name})`];
    if (!isSeen) faults.push(`${name} does not show that it has the focus`);
  }
  return faults;
}

describe.each(SCREENS.map((screen, index) => ({ ...screen, index })))('$name', ({ index, ...screen }) => {
  it('is fit for the eye, the hand and the keyboard', async () => {
    const page = await open(screen);
    const faults: Record<string, string[]> = {};
    for (const [turn, size] of SIZE_NAMES.entries()) {
      const set = SETS[(index + turn) % SETS.length]!;
      await page.setViewportSize(SIZES[size]);
      await page.evaluate((chosen) => void (document.documentElement.dataset['set'] = chosen), set);
      faults[`${size}, ${set}`] = await measure(page, screen);
    }
    expect(await page.locator('h1').count()).toBe(1);
    faults['without a name'] = await namelessThings(page);
    faults['by keyboard'] = await tabFaults(page);
    await page.setViewportSize(screen.isCrew ? NARROW : SIZES.phone);
    faults['narrow'] = await page.evaluate(overflow);
    await page.setViewportSize(SIZES.phone);
    await page.evaluate(doubleText);
    faults['with text twice as large'] = await page.evaluate(overflow);
    faults['said'] = said;
    const found = Object.fromEntries(Object.entries(faults).filter(([, each]) => each.length > 0));
    expect(found).toEqual({});
  });
});

describe.each(SHEETS.map((sheet, index) => ({ ...sheet, index })))(
  'the sheet of $screen by $key',
  ({ screen: name, key, index }) => {
    it('is fit for the eye and the hand, and closes by Esc', async () => {
      const screen = SCREENS.find((each) => each.name === name)!;
      const page = await open(screen);
      await page.evaluate(
        (set) => void (document.documentElement.dataset['set'] = set),
        SETS[index % SETS.length]!,
      );
      const opener = page.getByRole('button', { name: key }).first();
      await opener.press('Enter');
      const sheet = page.getByRole('dialog');
      await sheet.waitFor();
      expect([...(await measure(page, screen)), ...said]).toEqual([]);
      await page.keyboard.press('Escape');
      await sheet.waitFor({ state: 'detached' });
      expect(await opener.evaluate((element) => element === document.activeElement)).toBe(true);
    });
  },
);
