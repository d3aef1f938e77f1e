import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Gallery, SCREENS, SETS, SIZES, openGallery } from '#tests/e2e/gallery/open-gallery.ts';

// Goal: the kit keeps its promises to the hand and the eye wherever it is used.
// Method: the gallery, built as the product is, in a real browser; measured, tabbed through and given to axe.

const TARGET_MIN_PX = 56;
const GAP_MIN_PX = 12;

let gallery: Gallery;
beforeAll(async () => {
  gallery = await openGallery();
});
afterAll(() => gallery.close());

/** axe with 7:1 for text, which it leaves out unless asked. */
function axe(page: Page): AxeBuilder {
  return new AxeBuilder({ page }).options({ rules: { 'color-contrast-enhanced': { enabled: true } } });
}

interface Box {
  name: string;
  left: number;
  top: number;
  right: number;
  bottom: number;
}

/** What a finger can aim at, outside running text: keys, fields, links that look like keys. */
function targets(page: Page): Promise<Box[]> {
  return page.evaluate(() => {
    const found = [
      ...document.querySelectorAll(
        'button, input:not([type=radio]), textarea, label:has(input), header a, [data-bar]:is(a)',
      ),
    ];
    return found
      .map((element) => ({ element, box: element.getBoundingClientRect() }))
      .filter(({ box }) => box.width > 0)
      .map(({ element, box }) => ({
        name: element.getAttribute('aria-label') ?? element.textContent ?? element.id,
        left: box.left,
        top: box.top + scrollY,
        right: box.right,
        bottom: box.bottom + scrollY,
      }));
  });
}

/** The clear distance of two boxes; negative where they overlap. */
function distance(a: Box, b: Box): number {
  const across = Math.max(a.left - b.right, b.left - a.right);
  const down = Math.max(a.top - b.bottom, b.top - a.bottom);
  return Math.max(across, down);
}

describe.each(SCREENS)('the %s screen', (screen) => {
  it.each(SETS)('has nothing for axe to find in the %s set', async (set) => {
    const page = await gallery.show(screen, set, 'phone');
    const { violations } = await axe(page).analyze();
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.html).join(' ')}`)).toEqual(
      [],
    );
    await page.context().close();
  });

  it.each(Object.keys(SIZES) as (keyof typeof SIZES)[])('fits the width of a %s', async (size) => {
    const page = await gallery.show(screen, 'light', size);
    const [scrollWidth, clientWidth] = await page.evaluate(() => [
      document.documentElement.scrollWidth,
      document.documentElement.clientWidth,
    ]);
    expect(scrollWidth).toBe(clientWidth);
    await page.context().close();
  });

  it('has targets of 56 px, 12 px apart', async () => {
    const page = await gallery.show(screen, 'light', 'phone');
    // the rack at the foot floats over the page, so its distance to what passes below it says nothing
    await page.addStyleTag({ content: '[data-keys] { position: static !important }' });
    const boxes = await targets(page);
    expect(boxes.length).toBeGreaterThan(0);
    const small = boxes.filter(
      (box) => box.bottom - box.top < TARGET_MIN_PX || box.right - box.left < TARGET_MIN_PX,
    );
    expect(small).toEqual([]);
    const near = boxes.flatMap((box, index) =>
      boxes
        .slice(index + 1)
        .flatMap((other) => (distance(box, other) < GAP_MIN_PX - 0.01 ? [[box.name, other.name]] : [])),
    );
    expect(near).toEqual([]);
    await page.context().close();
  });
});

describe('a sheet', () => {
  it('keeps the focus inside, closes on Esc and gives the focus back', async () => {
    const page = await gallery.show('form', 'light', 'phone');
    const opener = page.getByRole('button', { name: 'Strike' });
    await opener.press('Enter');
    const sheet = page.getByRole('dialog', { name: 'Strike this entry' });
    await sheet.waitFor();
    expect((await axe(page).analyze()).violations).toEqual([]);
    for (let press = 0; press < 8; press++) {
      await page.keyboard.press('Tab');
      expect(
        await page.evaluate(
          () => document.activeElement === document.body || !!document.activeElement?.closest('dialog'),
        ),
      ).toBe(true);
    }
    await page.keyboard.press('Escape');
    await sheet.waitFor({ state: 'detached' });
    expect(await opener.evaluate((element) => element === document.activeElement)).toBe(true);
    await page.context().close();
  });

  it('asks for a reason before it goes on', async () => {
    const page = await gallery.show('form', 'light', 'phone');
    await page.getByRole('button', { name: 'Strike' }).click();
    const sheet = page.getByRole('dialog');
    await sheet.getByRole('button', { name: 'Strike it' }).click();
    expect(await sheet.getByText('Write the reason in a few words.').isVisible()).toBe(true);
    await sheet.getByLabel('Why is it struck?').fill('It was the cabin sides.');
    await sheet.getByRole('button', { name: 'Strike it' }).click();
    await sheet.waitFor({ state: 'detached' });
    await page.context().close();
  });
});

describe('hours by quarter-hour keys', () => {
  it('go up and down by a quarter, and are read from a field', async () => {
    const page = await gallery.show('form', 'light', 'phone');
    const field = page.getByRole('textbox', { name: 'Your hours' });
    await page.getByRole('button', { name: 'A quarter hour more' }).click();
    expect(await field.inputValue()).toBe('2 3/4');
    await field.fill('1:50');
    await page.getByRole('button', { name: 'A quarter hour less' }).click();
    expect(await field.inputValue()).toBe('1 3/4');
    await page.getByRole('button', { name: '8 h' }).click();
    expect(await field.inputValue()).toBe('8');
    await field.fill('lots');
    expect(await page.getByText('That is no figure of hours.').isVisible()).toBe(true);
    await page.context().close();
  });
});

describe('the day of an entry', () => {
  it('is today, yesterday or another by the calendar, and none to come', async () => {
    const page = await gallery.show('form', 'light', 'phone');
    await page.getByText('Yesterday', { exact: true }).click();
    expect(await page.getByRole('radio', { name: /Yesterday/ }).isChecked()).toBe(true);
    await page.getByText('Other', { exact: true }).click();
    const calendar = page.getByLabel('Which day');
    await calendar.fill('2026-08-31');
    expect(await page.getByText('Mon 31 Aug').isVisible()).toBe(true);
    await calendar.fill('2026-10-01');
    expect(await calendar.inputValue()).toBe('2026-08-31');
    await page.context().close();
  });
});

describe('an undo', () => {
  it('stands eight seconds, and as long as a pointer is on it', async () => {
    const page = await gallery.show('line', 'light', 'phone', { isClockStopped: true });
    const bar = page.getByText('Struck: flatted the bloom');
    await bar.hover();
    await page.clock.runFor(60_000);
    expect(await bar.isVisible()).toBe(true);
    // the time begins anew when the pointer goes
    await page.mouse.move(5, 5);
    await page.clock.runFor(7900);
    expect(await bar.isVisible()).toBe(true);
    await page.clock.runFor(200);
    expect(await bar.isVisible()).toBe(false);
    await page.context().close();
  });
});
