import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { type Browser, type Page, chromium } from 'playwright-core';
import { preview } from 'vite';
import { buildSite } from '#tests/e2e/build-site.ts';

const CONFIG = join(import.meta.dirname, 'vite.config.ts');
export const CHROMIUM_PATH = process.env['CHROME_PATH'] ?? '/usr/bin/chromium';
export const CHROMIUM_FLAGS = [
  '--no-sandbox',
  '--disable-quic',
  '--disable-background-networking',
  '--disable-component-update',
  '--no-first-run',
];

export const SCREENS = ['line', 'form', 'desk', 'error'] as const;
export const SETS = ['light', 'dark', 'sunlight'] as const;
export const SIZES = {
  phone: { width: 390, height: 844 },
  tablet: { width: 820, height: 1180 },
  desk: { width: 1280, height: 860 },
} as const;

export interface ShowOptions {
  /** The page's timers run only as the test lets them (`page.clock`). */
  isClockStopped?: boolean;
}

export interface Gallery {
  url: string;
  /** Where the built files lie. */
  outDir: string;
  browser: Browser;
  /** One screen of the gallery in one set and size, its type loaded. */
  show: (
    screen: string,
    set: (typeof SETS)[number],
    size: keyof typeof SIZES,
    options?: ShowOptions,
  ) => Promise<Page>;
  close: () => Promise<void>;
}

/** Builds the gallery into a folder of its own, serves it on loopback and opens a browser on it. */
export async function openGallery(): Promise<Gallery> {
  const outDir = await mkdtemp(join(tmpdir(), 'gallery-'));
  await buildSite(outDir, CONFIG);
  const server = await preview({
    configFile: CONFIG,
    logLevel: 'error',
    build: { outDir },
    preview: { host: '127.0.0.1', port: 0 },
  });
  const url = server.resolvedUrls?.local[0];
  if (!url) throw new Error('the gallery is not served');
  const browser = await chromium.launch({
    executablePath: CHROMIUM_PATH,
    args: CHROMIUM_FLAGS,
  });
  return {
    url,
    outDir,
    browser,
    show: (screen, set, size, options = {}) => show(browser, `${url}#/${screen}`, set, size, options),
    async close() {
      await browser.close();
      await server.close();
      await rm(outDir, { recursive: true });
    },
  };
}

async function show(
  browser: Browser,
  url: string,
  set: string,
  size: keyof typeof SIZES,
  { isClockStopped = false }: ShowOptions,
): Promise<Page> {
  const context = await browser.newContext({ viewport: SIZES[size] });
  const page = await context.newPage();
  if (isClockStopped) await page.clock.install();
  await page.goto(url);
  await page.locator('h1, h2').first().waitFor();
  await page.evaluate(async (chosen) => {
    document.documentElement.dataset['set'] = chosen;
    await document.fonts.ready;
  }, set);
  if (isClockStopped) await page.clock.pauseAt(Date.now() + 1000);
  return page;
}
