import type { Locator } from 'playwright-core';
import { SIZES } from '#tests/e2e/gallery/open-gallery.ts';
import { Device, type Owner } from '#tests/e2e/people/device.ts';

const PHONE = { viewport: SIZES.phone, isMobile: true, hasTouch: true, deviceScaleFactor: 2 };

export interface Place {
  boat: string;
  stage: string;
}

export interface DayWords {
  words: string;
  hours: string;
  along?: string[];
}

/** A crew member with their phone, and what they do on it. */
export class Phone {
  readonly device: Device;

  private constructor(device: Device) {
    this.device = device;
  }

  static async unpack(owner: Owner, serverUrl: string): Promise<Phone> {
    return new Phone(await Device.unpack(owner, PHONE, serverUrl));
  }

  get page() {
    return this.device.page;
  }

  /** Waits until words stand on the screen. */
  async says(words: string | RegExp, options: { timeout?: number } = {}): Promise<void> {
    await this.page.getByText(words).first().waitFor(options);
  }

  async goesAlongside({ boat, stage }: Place): Promise<void> {
    await this.page.goto('/alongside');
    await this.page.getByRole('button', { name: /, other boat$/ }).click();
    await this.page.getByRole('group', { name: 'Boats' }).getByRole('button', { name: boat }).click();
    await this.page
      .getByRole('group', { name: `Stages of ${boat}` })
      .getByRole('button', { name: stage })
      .click();
    await this.page.getByRole('heading', { level: 1, name: boat }).waitFor();
  }

  /** Fills the form and logs it, on the boat and stage where the phone is; done once the phone says so. */
  async logs({ words, hours, along = [] }: DayWords): Promise<void> {
    await this.page.getByRole('link', { name: 'Log it' }).click();
    await this.page.getByLabel('What did you do?').fill(words);
    await this.hoursOf('Your hours').fill(hours);
    for (const name of along) await this.page.getByText(name, { exact: true }).click();
    await this.device.picture('log-form', true);
    await this.page.getByRole('button', { name: 'Log it' }).click();
    await this.page.getByText(/^Logged on /).waitFor();
  }

  async ticks(task: string): Promise<void> {
    await this.page.goto('/tasks');
    await this.page.getByRole('button', { name: `Tick off: ${task}` }).click();
    await this.page.getByText(`Ticked off: ${task}`).waitFor();
  }

  /** Says other hours for a person in an entry that is on the line; done once they stand on its page. */
  async changesHours(words: string, person: string, hours: string, why: string): Promise<void> {
    await this.opensEntry(words);
    await this.page.getByRole('button', { name: 'Change the hours' }).click();
    const sheet = this.page.getByRole('dialog');
    await sheet.getByRole('textbox', { name: person }).fill(hours);
    await sheet.getByLabel('Why do they change?').fill(why);
    await this.device.picture('change-hours');
    await sheet.getByRole('button', { name: 'Change it' }).click();
    await sheet.waitFor({ state: 'detached' });
    await this.page.getByText(`Why: ${why}`).waitFor();
  }

  async opensEntry(words: string): Promise<void> {
    await this.page.goto('/alongside');
    await this.entry(words).getByRole('link').click();
    await this.page.getByRole('heading', { name: 'History' }).waitFor();
  }

  /** An entry on the ribband line. */
  entry(words: string): Locator {
    return this.page.getByRole('listitem').filter({ hasText: words });
  }

  private hoursOf(label: string): Locator {
    return this.page.getByRole('textbox', { name: label });
  }
}
