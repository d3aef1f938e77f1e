import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { SETS, SIZES } from '#tests/e2e/gallery/open-gallery.ts';
import { SCREENS } from '#tests/e2e/screens/list.ts';
import { openScreensWorld } from '#tests/e2e/screens/world.ts';

// `LOOK_INTO=FOLDER node --import tsx tests/worlds/with-postgres.ts tests/e2e/screens/look.ts` leaves a picture there of
// every screen at every size in the light set, and at the phone's size in the others
const folder = process.env['LOOK_INTO'];
if (!folder) throw new Error('LOOK_INTO says which folder the pictures go to');
await mkdir(folder, { recursive: true });
const world = await openScreensWorld();
const pages = new Map<string | null, Page>();

for (const screen of SCREENS) {
  const page = pages.get(screen.as) ?? (await openPage(screen.as));
  pages.set(screen.as, page);
  await page.goto(screen.path(world.known));
  await page.locator('h1').first().waitFor();
  await page.evaluate(() => document.fonts.ready);
  for (const set of SETS) {
    for (const size of set === 'light'
      ? (Object.keys(SIZES) as (keyof typeof SIZES)[])
      : ['phone' as const]) {
      await page.setViewportSize(SIZES[size]);
      await page.evaluate((chosen) => void (document.documentElement.dataset['set'] = chosen), set);
      const path = join(folder, `${screen.name.replaceAll(' ', '-')}-${set}-${size}.png`);
      await page.screenshot({ path, fullPage: true });
    }
  }
}
await world.close();

async function openPage(as: (typeof SCREENS)[number]['as']): Promise<Page> {
  if (as !== null) return world.signIn(as);
  const context = await world.browser.newContext({ baseURL: world.server.url });
  return context.newPage();
}
