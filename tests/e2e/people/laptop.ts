import type { Locator } from 'playwright-core';
import { SIZES } from '#tests/e2e/gallery/open-gallery.ts';
import { Device, type Owner } from '#tests/e2e/people/device.ts';

/** The foreman at the laptop, with the Day sheet open. */
export class Laptop {
  readonly device: Device;

  private constructor(device: Device) {
    this.device = device;
  }

  static async unpack(owner: Owner, serverUrl: string): Promise<Laptop> {
    return new Laptop(await Device.unpack(owner, { viewport: SIZES.desk }, serverUrl));
  }

  get page() {
    return this.device.page;
  }

  /** What the sheet has under one person. */
  person(name: string): Locator {
    const heading = this.page.getByRole('heading', { name, exact: true });
    return this.page.getByRole('listitem').filter({ has: heading });
  }

  /** The loose ends about one field of one entry. */
  looseEnds(about: string, words: string): Locator {
    const heading = this.page.getByRole('heading', { name: about });
    return this.page
      .locator('#loose-ends')
      .getByRole('listitem')
      .filter({ has: heading })
      .filter({ hasText: words });
  }

  /** Takes one of the values of a loose end; done once it is gone. */
  async settles(end: Locator, value: string): Promise<void> {
    await end.getByRole('button', { name: `take ${value}` }).click();
    await end.waitFor({ state: 'detached' });
  }

  async shutsOut(label: string): Promise<void> {
    await this.page.getByRole('link', { name: 'Devices' }).click();
    await this.page.getByRole('button', { name: `Shut out ${label}` }).click();
    await this.page.getByRole('button', { name: 'Shut it out' }).click();
    await this.page.getByRole('dialog').waitFor({ state: 'detached' });
  }

  /** Lets what was set aside count. */
  async admits(words: string, why: string): Promise<void> {
    await this.page.getByRole('link', { name: 'Day sheet' }).click();
    const setAside = this.page.getByRole('region', { name: 'Set aside' }).getByRole('listitem');
    await setAside.filter({ hasText: words }).getByRole('button', { name: 'Admit' }).click();
    await this.page.getByLabel('Why does it count?').fill(why);
    await this.device.picture('admit');
    await this.page.getByRole('button', { name: 'Admit it' }).click();
  }
}
