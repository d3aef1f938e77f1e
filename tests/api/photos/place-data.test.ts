import exifr from 'exifr';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { bytesOf, nameOf, PhotoHand, pictureOf, TAKEN_AT } from '#tests/worlds/pictures.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, signIn } from '#tests/worlds/shop.ts';

let server: TestServer;
let hand: PhotoHand;

beforeAll(async () => {
  server = await startServer();
  const shop = await makeShop(server.database);
  hand = new PhotoHand(server, await signIn(server, shop.people.crew));
});
afterAll(() => server.close());

function pixelsOf(picture: Buffer): Promise<Buffer> {
  return sharp(picture).raw().toBuffer();
}

async function stored(picture: Buffer): Promise<Buffer> {
  expect((await hand.put(picture)).ok).toBe(true);
  return bytesOf(await hand.get(nameOf(picture), 'full'));
}

// exifr reads no Exif in a WebP; sharp reads it in all three
async function placeIn(picture: Buffer): Promise<{ exif: boolean; xmp: boolean }> {
  const { exif, xmp } = await sharp(picture).metadata();
  return { exif: exif?.includes('Plover') ?? false, xmp: xmp?.includes('GPSLatitude') ?? false };
}

describe.each(['jpeg', 'png', 'webp'] as const)('a %s', (format) => {
  test('is stored without a word of where and with what it was taken', async () => {
    const picture = await pictureOf({ format });
    expect(await placeIn(picture)).toEqual({ exif: true, xmp: true });
    const kept = await stored(picture);
    const { exif, xmp, iptc, comments } = await sharp(kept).metadata();
    expect([exif, xmp, iptc, comments]).toEqual([undefined, undefined, undefined, undefined]);
    expect(kept.includes('GPS') || kept.includes('Plover')).toBe(false);
  });

  test.each([1, 3, 6, 8])(
    'keeps its pixels as they came, its colours, and that it is turned (%i)',
    async (orientation) => {
      const picture = await pictureOf({ format, orientation });
      const [before, kept] = [await sharp(picture).metadata(), await stored(picture)];
      const after = await sharp(kept).metadata();
      expect((await pixelsOf(kept)).equals(await pixelsOf(picture))).toBe(true);
      expect(after.orientation ?? 1).toBe(orientation);
      expect(before.icc!.length).toBeGreaterThan(100);
      expect(after.icc!.equals(before.icc!)).toBe(true);
    },
  );

  test('sent as a thumbnail is stored so too', async () => {
    const [picture, thumb] = [await pictureOf(), await pictureOf({ format })];
    await hand.putThumb(thumb, nameOf(picture));
    expect(await placeIn(await bytesOf(await hand.get(nameOf(picture), 'thumb')))).toEqual({
      exif: false,
      xmp: false,
    });
  });

  test('is shown without it', async () => {
    const picture = await pictureOf({ format });
    await hand.put(picture);
    const view = await bytesOf(await hand.get(nameOf(picture), 'view'));
    expect((await sharp(view).metadata()).exif).toBeUndefined();
  });
});

test('a reader of places finds one in what was sent, and none in what is given', async () => {
  const picture = await pictureOf({ orientation: 6 });
  expect(await exifr.gps(picture)).toEqual(TAKEN_AT);
  const kept = await stored(picture);
  expect(await exifr.gps(kept)).toBeUndefined();
  expect(await exifr.parse(kept, { xmp: true, iptc: true, icc: false, translateValues: false })).toEqual({
    Orientation: 6,
  });
});
