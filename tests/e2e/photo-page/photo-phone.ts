import { mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { type BrowserContext, type Page, chromium } from 'playwright-core';
import { CHROMIUM_FLAGS, CHROMIUM_PATH } from '#tests/e2e/gallery/open-gallery.ts';
import { PASSWORD, type TestPerson } from '#tests/worlds/shop.ts';
// its `window.replica` is what the tests ask
import type {} from './page.tsx';

/** A phone with its storage on the disk, which can die and be started again. */
export class PhotoPhone {
  readonly url: string;
  /** every request of the page and its workers, `PUT http://…` */
  readonly asked: string[] = [];
  /** addresses of the workers that the page has started */
  readonly workers: string[] = [];
  context!: BrowserContext;
  page!: Page;
  private readonly folder: string;

  private constructor(url: string, folder: string) {
    this.url = url;
    this.folder = folder;
  }

  /** A phone that the app was never on; `roomBytes` is what its browser gives the app, the app's own files in it. */
  static async start(url: string, roomBytes?: number): Promise<PhotoPhone> {
    const phone = new PhotoPhone(url, await mkdtemp(join(tmpdir(), 'photo-phone-')));
    await phone.open({ isOnline: true, roomBytes });
    await phone.page.waitForFunction(() => navigator.serviceWorker.controller?.state === 'activated');
    return phone;
  }

  /** Opens the app, with signal or without. */
  async open({ isOnline, roomBytes }: { isOnline: boolean; roomBytes?: number | undefined }): Promise<void> {
    this.context = await chromium.launchPersistentContext(this.folder, {
      executablePath: CHROMIUM_PATH,
      args: CHROMIUM_FLAGS,
      viewport: { width: 390, height: 844 },
    });
    await this.context.setOffline(!isOnline);
    this.context.on('request', (request) => this.asked.push(`${request.method()} ${request.url()}`));
    this.page = this.context.pages()[0]!;
    this.page.on('worker', (worker) => this.workers.push(worker.url()));
    if (roomBytes) {
      const devtools = await this.context.newCDPSession(this.page);
      await devtools.send('Storage.overrideQuotaForOrigin', { origin: this.url, quotaSize: roomBytes });
    }
    await this.page.goto(this.url);
    await this.page.waitForFunction(() => 'replica' in window);
  }

  async signIn({ email, shopId }: TestPerson): Promise<void> {
    const who = { email, shopId, password: PASSWORD, label: 'phone' };
    const result = await this.page.evaluate((request) => window.replica.session.signIn(request), who);
    if (!('ok' in result)) throw new Error(`Sign-in: ${JSON.stringify(result)}`);
  }

  /** The battery falls out. */
  async die(): Promise<void> {
    process.kill(await browserOf(this.folder), 'SIGKILL');
    await this.context.close().catch(() => undefined);
  }

  async remove(): Promise<void> {
    await this.context.close();
    await rm(this.folder, { recursive: true, force: true });
  }

  /** Chooses pictures from the gallery, several at once. */
  async choose(...files: { name: string; buffer: Buffer }[]): Promise<void> {
    const picked = files.map((file) => ({ ...file, mimeType: 'image/jpeg' }));
    await this.page.getByLabel('Choose photos').setInputFiles(picked);
  }

  /** Puts of pictures, each as its path after /api/photos/. */
  puts(): string[] {
    return this.asked
      .filter((line) => line.startsWith('PUT '))
      .map((line) => new URL(line.slice(4)).pathname.replace('/api/photos/', ''));
  }

  /** The bytes of a picture as this device has them. */
  async bytesOf(sha256: string, size: 'thumb' | 'view' | 'full'): Promise<Buffer> {
    const base64 = await this.page.evaluate(
      async ([name, wanted]) => {
        const blob = await window.replica.picture(name, wanted);
        if (!blob) throw new Error('It is not here.');
        const reader = new FileReader();
        return new Promise<string>((resolve) => {
          reader.onload = () => resolve(String(reader.result).split(',')[1]!);
          reader.readAsDataURL(blob);
        });
      },
      [sha256, size] as const,
    );
    return Buffer.from(base64, 'base64');
  }

  photos() {
    return this.page.evaluate(() => window.replica.view().all('photo'));
  }
}

/** The process of the browser whose profile is in `folder`; its helpers name their kind. */
async function browserOf(folder: string): Promise<number> {
  for (const pid of (await readdir('/proc')).filter((name) => /^\d+$/.test(name))) {
    const words = (await readFile(`/proc/${pid}/cmdline`, 'utf8').catch(() => '')).split('\0');
    const isOurs = words.includes(`--user-data-dir=${folder}`);
    if (isOurs && !words.some((word) => word.startsWith('--type='))) return Number(pid);
  }
  throw new Error('The browser is not running.');
}
