import { appendFile, mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { type Browser, type Page, chromium } from 'playwright-core';
import { type PreviewServer, preview } from 'vite';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { buildSite } from '#tests/e2e/build-site.ts';
import { CHROMIUM_FLAGS, CHROMIUM_PATH } from '#tests/e2e/gallery/open-gallery.ts';

// Goal: the app's shell opens without signal, and no update is let in but by the person.
// Method: the product's own build in a folder of its own, served on loopback; a newer version is the same worker with other bytes.

const ROOT = resolve(import.meta.dirname, '../..');

let outDir: string;
let server: PreviewServer;
let browser: Browser;
let url: string;

beforeAll(async () => {
  outDir = await mkdtemp(join(tmpdir(), 'shell-'));
  await buildSite(outDir);
  server = await preview({
    root: ROOT,
    logLevel: 'error',
    build: { outDir },
    preview: { host: '127.0.0.1', port: 0, proxy: {} },
  });
  url = server.resolvedUrls?.local[0] ?? '';
  browser = await chromium.launch({ executablePath: CHROMIUM_PATH, args: CHROMIUM_FLAGS });
});

afterAll(async () => {
  await browser?.close();
  await server?.close();
  await rm(outDir, { recursive: true });
});

/** The app's first page, once its worker answers for it. */
async function openInstalled(): Promise<Page> {
  const context = await browser.newContext();
  const page = await context.newPage();
  await page.goto(url);
  await page.waitForFunction(() => navigator.serviceWorker.controller?.state === 'activated');
  return page;
}

describe('the shell', () => {
  it('opens without signal at any address, its type with it', async () => {
    const page = await openInstalled();
    await page.context().setOffline(true);
    await page.goto(`${url}a/place/deep/inside`);
    await page.locator('#root > *').first().waitFor();
    const loaded = await page.evaluate(async () =>
      (await document.fonts.load('700 18px "Source Sans 3"')).map((font) => font.status),
    );
    expect(loaded).toEqual(['loaded']);
    await page.context().close();
  });

  it('never answers for the server', async () => {
    const page = await openInstalled();
    await page.context().setOffline(true);
    expect(
      await page.evaluate(() =>
        fetch('/api/health').then(
          () => 'answered',
          () => 'no signal',
        ),
      ),
    ).toBe('no signal');
    await expect(page.goto(`${url}api/health`)).rejects.toThrow('ERR_INTERNET_DISCONNECTED');
    await page.context().close();
  });

  it('carries the three Latin weights of its type and no other', async () => {
    const fonts = (await readdir(join(outDir, 'assets'))).filter((name) => /\.(woff2?|ttf|otf)$/.test(name));
    expect(fonts.map((name) => name.replace(/-[\w-]{8}\.woff2$/, '')).sort()).toEqual(
      [400, 600, 700].map((weight) => `source-sans-3-latin-${weight}-normal`),
    );
  });

  it('names icons in its manifest that are there, at the sizes that it says', async () => {
    const page = await openInstalled();
    const manifest = await page.evaluate(async () => {
      const link = document.querySelector<HTMLLinkElement>('link[rel=manifest]');
      return (await fetch(link?.href ?? '')).json() as Promise<{
        name: string;
        icons: { src: string; sizes: string; purpose: string }[];
      }>;
    });
    expect(manifest.name).toBe('Ribband');
    expect(manifest.icons.map(({ purpose }) => purpose)).toContain('maskable');
    for (const icon of manifest.icons) {
      const size = await page.evaluate(async (source) => {
        const image = new Image();
        image.src = source;
        await image.decode();
        return `${image.naturalWidth}x${image.naturalHeight}`;
      }, icon.src);
      expect(size).toBe(icon.sizes);
    }
    await page.context().close();
  });
});

describe('a newer version', () => {
  it('waits, whatever is opened meanwhile', async () => {
    const page = await openInstalled();
    await appendFile(join(outDir, 'sw.js'), '\n// newer\n');
    await page.evaluate(async () => {
      const registration = await navigator.serviceWorker.ready;
      const isInstalled = new Promise<void>((done) => {
        registration.addEventListener('updatefound', () => {
          const worker = registration.installing;
          worker?.addEventListener('statechange', () => worker.state === 'installed' && done());
        });
      });
      await registration.update();
      await isInstalled;
    });
    const second = await page.context().newPage();
    await second.goto(url);
    const state = await second.evaluate(async () => (await navigator.serviceWorker.ready).waiting?.state);
    expect(state).toBe('installed');
    await page.context().close();
  });
});
