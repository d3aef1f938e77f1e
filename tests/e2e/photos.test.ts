import { createHash } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { AxeBuilder } from '@axe-core/playwright';
import exifr from 'exifr';
import sharp from 'sharp';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { buildSite } from '#tests/e2e/build-site.ts';
import { cameraPicture } from '#tests/e2e/photo-page/camera.ts';
import { PhotoPhone } from '#tests/e2e/photo-page/photo-phone.ts';
import { Line } from '#tests/worlds/line.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, type TestPerson } from '#tests/worlds/shop.ts';

// Goal: pictures of a camera are taken in upright, small and without the place they were taken at; they outlive the phone's
// death and reach the server once each, whatever becomes of the signal.
// Method: a real browser with its profile on the disk over the real server; files as cameras write them, read again with
// programs of other people's.

const CONFIG = join(import.meta.dirname, 'photo-page/vite.config.ts');

let outDir: string;
let server: TestServer;
let line: Line;
let phone: PhotoPhone;
let foreman: TestPerson;
let upright: Buffer;
let turned: Buffer;

beforeAll(async () => {
  outDir = await mkdtemp(join(tmpdir(), 'photo-page-'));
  await buildSite(outDir, CONFIG);
  server = await startServer({ distDir: outDir, clock: { now: Date.now, set: () => {}, advance: () => {} } });
  line = await Line.to(server.url);
  [upright, turned] = [await cameraPicture({ orientation: 1 }), await cameraPicture({ orientation: 6 })];
});

afterAll(async () => {
  await line?.close();
  await server?.close();
  await rm(outDir, { recursive: true });
});

beforeEach(async () => {
  foreman = (await makeShop(server.database)).people.foreman;
  line.mend();
  await startPhone();
});

afterEach(() => phone?.remove());

/** A foreman's phone with a boat on it. */
async function startPhone(roomBytes?: number): Promise<void> {
  phone = await PhotoPhone.start(line.url, roomBytes);
  await phone.signIn(foreman);
  await phone.page.evaluate(async () => {
    await window.replica.syncNow();
    if (window.replica.view().all('boat').length > 0) return;
    await window.replica.hold('boat.add', { boatId: window.replica.newId(), name: 'Sedge Warbler' });
    await window.replica.syncNow();
  });
  await phone.page.getByRole('heading', { name: 'Sedge Warbler' }).waitFor();
}

async function colourAt(picture: Buffer, side: 'top' | 'bottom') {
  const { width, height } = await sharp(picture).metadata();
  const top = side === 'top' ? 0 : Math.floor(height * 0.75);
  const part = await sharp(picture)
    .extract({ left: 0, top, width, height: Math.floor(height / 4) })
    .png({ compressionLevel: 0 })
    .toBuffer();
  const { channels } = await sharp(part).stats();
  const [red, , blue] = channels.map(({ mean }) => mean);
  return red! > blue! + 20 ? 'shed' : blue! > red! + 20 ? 'sky' : 'neither';
}

describe('pictures of a camera', () => {
  it('are taken in upright, 2560 px long, without place data, in a worker, with nothing asked of anybody else', async () => {
    expect(await exifr.gps(turned)).toMatchObject({ latitude: 51.5 });
    await phone.context.setOffline(true);
    await phone.choose({ name: 'upright.jpg', buffer: upright }, { name: 'turned.jpg', buffer: turned });
    await phone.page.getByText('2 held').waitFor();
    const photos = await phone.photos();
    expect(photos.map(({ width, height }) => [width, height])).toEqual([
      [2560, 1920],
      [1920, 2560],
    ]);
    for (const { sha256, takenAt, bytes, width, height } of photos) {
      const full = await phone.bytesOf(sha256, 'full');
      const thumb = await phone.bytesOf(sha256, 'thumb');
      expect(createHash('sha256').update(full).digest('hex')).toBe(sha256);
      expect(full.length).toBe(bytes);
      expect(takenAt).toBe('2026-09-08T09:05:33.000Z');
      for (const picture of [full, thumb]) {
        const { exif, xmp, iptc, orientation, format } = await sharp(picture).metadata();
        expect({ exif, xmp, iptc, orientation, format }).toEqual({ format: 'jpeg' });
        expect(await exifr.parse(picture, true)).not.toHaveProperty('latitude');
        expect([await colourAt(picture, 'top'), await colourAt(picture, 'bottom')]).toEqual(['sky', 'shed']);
      }
      const small = await sharp(thumb).metadata();
      expect(Math.max(small.width, small.height)).toBe(480);
      expect(small.width / small.height).toBeCloseTo(width / height, 2);
      expect(thumb.length).toBeLessThanOrEqual(100 * 1024);
    }
    expect(phone.workers.filter((url) => url.startsWith('blob:')).length).toBeGreaterThan(0);
    const elsewhere = phone.asked.filter(
      (asked) => !/^[A-Z]+ (blob|data):/.test(asked) && !asked.includes(` ${line.url}/`),
    );
    expect(elsewhere).toEqual([]);
  });

  it('taken without signal outlive the death of the phone, and then go once each, thumbnails first', async () => {
    await phone.context.setOffline(true);
    await phone.choose({ name: 'a.jpg', buffer: upright }, { name: 'b.jpg', buffer: turned });
    await phone.page.getByText('2 held').waitFor();
    await phone.die();
    await phone.open({ isOnline: false });
    await phone.page.getByText('2 held').waitFor();
    expect(await phone.page.getByText('On this computer').count()).toBe(2);
    await expect
      .poll(() => phone.page.getByRole('img', { name: /^Photo/ }).count(), { timeout: 20_000 })
      .toBe(2);
    expect(phone.puts()).toEqual([]);

    await phone.context.setOffline(false);
    // a browser that dies soon after a sign-in has not written its cookie down
    await phone.signIn(foreman);
    await phone.page.getByText('0 held').waitFor({ timeout: 30_000 });
    const photos = await phone.photos();
    const [a, b] = photos.map(({ sha256 }) => sha256);
    expect(phone.puts()).toEqual([`${a}/thumb`, `${b}/thumb`, a, b]);
    await phone.page.evaluate(() => window.replica.syncNow());
    expect((await phone.photos()).map(({ arrived }) => arrived)).toEqual(['full', 'full']);
    expect(await phone.page.getByText('On this computer').count()).toBe(0);
  });

  it('cut off in mid-upload go again whole, and no more than that', async () => {
    await phone.page.context().setOffline(true);
    await phone.choose({ name: 'a.jpg', buffer: upright });
    await phone.page.getByText('1 held').waitFor();
    const [photo] = await phone.photos();
    const { sha256, bytes } = photo!;
    const { shopId } = await phone.page.evaluate(() => window.replica.view().me);
    // beyond the thumbnail and the op, within the whole picture
    expect(bytes).toBeGreaterThan(400_000);
    line.cutAfter(300_000);
    await phone.page.context().setOffline(false);
    await expect.poll(() => phone.puts(), { timeout: 20_000 }).toEqual([`${sha256}/thumb`, sha256]);
    await expect
      .poll(() => phone.page.evaluate(() => window.replica.syncState().isSendingPhotos))
      .toBe(false);
    expect(await server.pictures.has({ shopId, sha256 }, 'full')).toBe(false);
    line.mend();
    await phone.page.evaluate(() => window.replica.sendNow());
    await phone.page.getByText('0 held').waitFor();
    expect(await server.pictures.has({ shopId, sha256 }, 'full')).toBe(true);
    expect(phone.puts()).toEqual([`${sha256}/thumb`, sha256, sha256]);
    // asked before the bytes went again; how often, while the line was down, is the sync loop's own affair
    expect(phone.asked.some((asked) => asked.startsWith('HEAD '))).toBe(true);
  });

  it('that are none are refused in words, and the others of the pick are taken', async () => {
    const note = Buffer.from('a list of screws');
    await phone.choose({ name: 'note.jpg', buffer: note }, { name: 'a.jpg', buffer: upright });
    const words = '‘note.jpg’ is no picture that this device can read. Choose a JPEG or PNG.';
    await phone.page.getByText(words).waitFor();
    expect(await phone.photos()).toHaveLength(1);
  });

  it('that do not fit are refused in words, with nothing half there', async () => {
    // what a browser says of its room is rounded beyond use, so that writing has to tell
    const { usage } = await phone.page.evaluate(() => navigator.storage.estimate());
    await phone.remove();
    await startPhone(usage! + 400_000);
    await phone.context.setOffline(true);
    await phone.choose({ name: 'a.jpg', buffer: upright });
    await phone.page
      .getByText('This device has no room for this picture. Free some room, or take fewer.')
      .waitFor();
    const left = await phone.page.evaluate(() => ({
      photos: window.replica.view().all('photo').length,
      held: window.replica.syncState(),
    }));
    expect(left).toMatchObject({ photos: 0, held: { heldOps: 0, heldPhotos: 0 } });
  });
});

describe('a picture over the whole screen', () => {
  it('is made larger and smaller, passed on and closed by keys and by the keyboard; axe finds nothing', async () => {
    await phone.choose({ name: 'a.jpg', buffer: upright }, { name: 'b.jpg', buffer: turned });
    const thumb = phone.page.getByRole('button', { name: 'Photo 1' });
    await expect
      .poll(() => phone.page.getByRole('img', { name: /^Photo/ }).count(), { timeout: 20_000 })
      .toBe(2);
    expect((await new AxeBuilder({ page: phone.page }).analyze()).violations).toEqual([]);
    await thumb.click();
    const viewer = phone.page.getByRole('dialog');
    const shown = viewer.getByRole('img').first();
    await shown.waitFor();
    const fits = (await shown.boundingBox())!;
    expect(fits.width).toBeLessThanOrEqual(390);
    expect(fits.width / fits.height).toBeCloseTo(4 / 3, 1);
    expect((await new AxeBuilder({ page: phone.page }).analyze()).violations).toEqual([]);

    await viewer.getByRole('button', { name: 'Larger' }).click();
    await expect.poll(async () => (await shown.boundingBox())!.width).toBeCloseTo(fits.width * 1.5, 0);
    await phone.page.keyboard.press('+');
    await expect.poll(async () => (await shown.boundingBox())!.width).toBeCloseTo(fits.width * 2, 0);
    await phone.page.keyboard.press('0');
    await expect.poll(async () => (await shown.boundingBox())!.width).toBeCloseTo(fits.width, 0);
    // a tap at the right edge brings that place to the middle, larger
    await phone.page.mouse.click(fits.x + fits.width - 4, fits.y + 4);
    await expect.poll(async () => (await shown.boundingBox())!.x).toBeLessThan(-fits.width + 4);

    await viewer.getByRole('button', { name: 'Next' }).click();
    await viewer.getByText('2 of 2').waitFor();
    await phone.page.keyboard.press('ArrowLeft');
    await viewer.getByText('1 of 2').waitFor();
    await phone.page.keyboard.press('Escape');
    await viewer.waitFor({ state: 'detached' });
    expect(await thumb.evaluate((element) => element === document.activeElement)).toBe(true);
  });
});
