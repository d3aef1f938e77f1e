import type { Page } from 'playwright-core';
import { CPU_SLOWED, type BenchPhone } from './bench-phone.ts';
import type { Figure } from './measuring.ts';

const WARM_UPS = 1;
const ROUNDS = 7;
const GOAL_MS = 1500;

declare global {
  interface Window {
    /** when Alongside's first entry was shown, in milliseconds since the navigation began */
    shownMs?: number;
  }
}

/**
 * Opening the app cold and without signal, in milliseconds: a browser that was just started, from the navigation to the
 * frame in which the first entry stands on Alongside.
 */
export async function benchOpen(phone: BenchPhone): Promise<Figure> {
  const opens: number[] = [];
  for (let round = 0; round < WARM_UPS + ROUNDS; round += 1) opens.push(await phone.withPage(openCold));
  const what = `cold offline open of ${phone.entries} entries, ${CPU_SLOWED} times slower, to the first entry`;
  return { what, unit: 'ms', values: opens.slice(WARM_UPS), goal: GOAL_MS };
}

async function openCold(page: Page): Promise<number> {
  await page.addInitScript(watchForEntry);
  await page.goto('/alongside');
  const shown = await page.waitForFunction(() => window.shownMs);
  return (await shown.jsonValue())!;
}

function watchForEntry(): void {
  const observer = new MutationObserver(() => {
    if (!document.querySelector('a[href^="/entry/"]')) return;
    observer.disconnect();
    // the frame after the one that is made of it now
    requestAnimationFrame(() => requestAnimationFrame(() => (window.shownMs = performance.now())));
  });
  observer.observe(document, { childList: true, subtree: true });
}
