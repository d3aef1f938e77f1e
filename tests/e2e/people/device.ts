import { mkdtemp, mkdir, readlink, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chromium, type BrowserContext, type BrowserContextOptions, type Page } from 'playwright-core';
import { DEMO_PASSWORD } from '#server/demo/demo-people.ts';
import { CHROMIUM_FLAGS, CHROMIUM_PATH } from '#tests/e2e/gallery/open-gallery.ts';
import { Line } from '#tests/e2e/people/line.ts';

const PICTURES = process.env['WALK_PICTURES'];
let pictureCount = 0;

/** Who signs in on a device, and what they call it. */
export interface Owner {
  name: string;
  email: string;
  label: string;
}

/** A person's phone or computer: a browser process and a profile folder of its own, behind a line of its own. */
export class Device {
  readonly owner: Owner;
  readonly line: Line;
  private readonly look: BrowserContextOptions;
  private readonly profile: string;
  private context: BrowserContext | null = null;
  private isOffline = false;
  private clockAheadMs = 0;

  private constructor(owner: Owner, look: BrowserContextOptions, line: Line, profile: string) {
    this.owner = owner;
    this.look = look;
    this.line = line;
    this.profile = profile;
  }

  static async unpack(owner: Owner, look: BrowserContextOptions, serverUrl: string): Promise<Device> {
    const line = await Line.open(serverUrl);
    const device = new Device(owner, look, line, await mkdtemp(join(tmpdir(), 'device-')));
    await device.start();
    return device;
  }

  get page(): Page {
    return this.context!.pages()[0]!;
  }

  /** Starts the browser on what its profile folder holds, at an address of the app if told. */
  async start(path?: string): Promise<void> {
    this.context = await chromium.launchPersistentContext(this.profile, {
      ...this.look,
      executablePath: CHROMIUM_PATH,
      args: CHROMIUM_FLAGS,
      baseURL: this.line.url,
    });
    this.page.setDefaultTimeout(STEP_MAX_MS);
    await this.context.setOffline(this.isOffline);
    if (this.clockAheadMs !== 0) await this.context.addInitScript(putClockAhead, this.clockAheadMs);
    if (path !== undefined) await this.page.goto(path);
  }

  /** Ends the browser as a flat battery does: nothing in it hears of it. */
  async dies(): Promise<void> {
    const context = this.context!;
    const isGone = new Promise((resolve) => context.once('close', resolve));
    // the browser leads a process group of its own, so that all its processes go at one blow
    process.kill(-(await this.browserPid()), 'SIGKILL');
    await isGone;
    this.context = null;
  }

  /**
   * Closes the browser and starts it again at an address of the app, with its clock `clockAheadMs` ahead of the world's.
   * Cookies are on the disk then, which Chromium otherwise writes half a minute after they came.
   */
  async startsAgain(path: string, clockAheadMs = 0): Promise<void> {
    await this.context!.close();
    this.clockAheadMs = clockAheadMs;
    await this.start(path);
  }

  /** Lets the newer version of the app be found as it is when a person comes back to the window. */
  async findsNewerApp(): Promise<void> {
    this.line.bringNewerApp();
    await this.page.evaluate(() => document.dispatchEvent(new Event('visibilitychange')));
    await this.page.getByText(/^A newer version of Ribband is on this device/).waitFor();
  }

  async changesToNewerApp(): Promise<void> {
    const isLoadedAgain = this.page.waitForEvent('load');
    await this.page.getByRole('button', { name: 'Change to it now' }).click();
    await isLoadedAgain;
  }

  async losesSignal(): Promise<void> {
    await this.setOffline(true);
  }

  async findsSignal(): Promise<void> {
    await this.setOffline(false);
  }

  /** Signs in for the first time on this device, which came in place of another if told. */
  async signsIn(inPlaceOf = 'None'): Promise<void> {
    const { page, owner } = this;
    await page.goto('/');
    await page.getByLabel('E-mail').fill(owner.email);
    await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
    await page.getByLabel(/^This .* is called$/).fill(owner.label);
    await this.picture('sign-in');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByRole('heading', { name: /in place of another/ }).waitFor();
    await page.getByRole('group', { name: 'It is in place of' }).getByText(inPlaceOf).click();
    await this.picture('in-place-of-another');
    await page.getByRole('button', { name: 'Go on' }).click();
    await page.waitForFunction(() => navigator.serviceWorker.controller?.state === 'activated');
  }

  /** A picture of the screen, where the environment names a folder for them. */
  async picture(name: string, isWhole = false): Promise<void> {
    if (!PICTURES) return;
    await mkdir(PICTURES, { recursive: true });
    pictureCount += 1;
    const file = `${String(pictureCount).padStart(2, '0')}-${this.owner.name.toLowerCase()}-${name}.png`;
    await this.page.screenshot({ path: join(PICTURES, file), fullPage: isWhole });
  }

  async putAway(): Promise<void> {
    await this.context?.close();
    await this.line.close();
    await rm(this.profile, { recursive: true, force: true });
  }

  private async setOffline(isOffline: boolean): Promise<void> {
    this.isOffline = isOffline;
    await this.context!.setOffline(isOffline);
  }

  // Chromium marks a profile that is in use with a link to `<host>-<pid>`
  private async browserPid(): Promise<number> {
    const mark = await readlink(join(this.profile, 'SingletonLock'));
    return Number(mark.split('-').at(-1));
  }
}

const STEP_MAX_MS = 20_000;

function putClockAhead(ms: number): void {
  const Real = Date;
  class Ahead extends Real {
    constructor(...parts: unknown[]) {
      // one of the many ways to make a date, whichever it is
      super(...((parts.length === 0 ? [Real.now() + ms] : parts) as [number]));
    }
    static override now = () => Real.now() + ms;
  }
  globalThis.Date = Ahead as DateConstructor;
}
