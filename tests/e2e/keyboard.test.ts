import type { Locator, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openScreensWorld, type ScreensWorld } from '#tests/e2e/screens/world.ts';

// Goal: the day's work is done by keyboard alone.
// Method: no pointer. What is wanted is reached by Tab, in the order in which it stands, and then pressed or typed into.

const TABS_MAX = 150;

let world: ScreensWorld;
let rosa: Page;
let orrin: Page;

beforeAll(async () => {
  world = await openScreensWorld();
  rosa = await world.signIn('rosa');
  orrin = await world.signIn('orrin');
});
afterAll(() => world.close());

/** Tabs on from where the focus is until it is on `wanted`, or a key of the same group of radio keys. */
async function tabTo(page: Page, wanted: Locator): Promise<void> {
  await wanted.waitFor();
  for (let count = 0; count < TABS_MAX; count += 1) {
    if (await wanted.evaluate((element) => element === document.activeElement)) return;
    await page.keyboard.press('Tab');
  }
  throw new Error(`${String(wanted)} is not reached in ${TABS_MAX} tabs`);
}

async function press(page: Page, wanted: Locator, key = 'Enter'): Promise<void> {
  await tabTo(page, wanted);
  await page.keyboard.press(key);
}

async function type(page: Page, wanted: Locator, text: string): Promise<void> {
  await tabTo(page, wanted);
  await page.keyboard.type(text);
}

const button = (page: Page, name: string | RegExp) => page.getByRole('button', { name });

describe('by keyboard alone', () => {
  it('an entry is logged', async () => {
    await rosa.goto('/alongside');
    await press(rosa, rosa.getByRole('link', { name: 'Log it' }));
    await type(rosa, rosa.getByLabel('What did you do?'), 'Faired the sheer by eye');
    await press(rosa, button(rosa, '2 h'), 'Space');
    await press(rosa, rosa.getByRole('checkbox', { name: 'Wes', exact: true }), 'Space');
    await press(rosa, button(rosa, 'Log it'));
    await rosa.getByText(/^Logged on /).waitFor();
    await rosa.getByRole('listitem').filter({ hasText: 'Faired the sheer by eye' }).waitFor();
  });

  it('a task is ticked off', async () => {
    await rosa.goto('/alongside');
    await press(rosa, rosa.getByRole('link', { name: 'Tick off' }));
    const key = button(rosa, /^Tick off: /).first();
    await key.waitFor();
    await press(rosa, key);
    await rosa.getByText(/^Ticked off: /).waitFor();
  });

  it('a finding is noted', async () => {
    await rosa.goto('/alongside');
    await press(rosa, rosa.getByRole('link', { name: 'Found' }));
    await press(rosa, button(rosa, 'Split'), 'Space');
    await press(rosa, button(rosa, /^Which part/));
    const sheet = rosa.getByRole('dialog');
    await sheet.waitFor();
    await press(rosa, sheet.getByRole('button', { name: /^floor/i }).first());
    await sheet.waitFor({ state: 'detached' });
    await press(rosa, button(rosa, 'Port'), 'Space');
    await type(rosa, rosa.getByLabel('Number', { exact: true }), '9');
    await type(rosa, rosa.getByLabel('In your own words'), 'Along the grain');
    await press(rosa, button(rosa, 'Log the finding'));
    const finding = rosa.getByRole('listitem').filter({ hasText: 'Along the grain' });
    await finding.getByRole('link', { name: /^Split, floor.* 9 port$/ }).waitFor();
  });

  it('a sheet closes by Esc, and the focus is back where it was', async () => {
    await rosa.goto('/alongside');
    const hours = button(rosa, 'Hours');
    await press(rosa, hours);
    await rosa.getByRole('dialog').waitFor();
    await rosa.keyboard.press('Escape');
    await rosa.getByRole('dialog').waitFor({ state: 'detached' });
    expect(await hours.evaluate((element) => element === document.activeElement)).toBe(true);
  });

  it('the kind of hours is set', async () => {
    await orrin.goto('/day');
    const kind = orrin.getByRole('combobox', { name: "Kind of Tamsin's hours" }).first();
    await tabTo(orrin, kind);
    await orrin.keyboard.type('yard');
    await expect.poll(() => kind.inputValue()).toBe('yard');
    await orrin.reload();
    await expect.poll(() => kind.inputValue()).toBe('yard');
  });

  it('a loose end is settled', async () => {
    const ends = orrin.locator('#loose-ends');
    await press(orrin, ends.getByRole('button', { name: /^take 3 1\/2 h/ }));
    await ends.getByText('None.').waitFor();
  });
});
