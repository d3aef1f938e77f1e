import exifr from 'exifr';
import sharp from 'sharp';
import { expect, test } from 'vitest';
import { drawPicture, PICTURE_NAMES } from '#server/demo/pictures/album.ts';
import { developPictures } from '#server/demo/pictures/develop.ts';
import { grainPixels, GRAINS } from '#server/demo/pictures/wood.ts';

// What is compared is the drawing: the bytes of a JPEG are another version of sharp's to choose.

const KIB = 1024;
const svgOf = (name: (typeof PICTURE_NAMES)[number]) => drawPicture(name).sketch.svg((grain) => `#${grain}`);

test('there are some sixty, no two alike', () => {
  const drawings = new Set(PICTURE_NAMES.map(svgOf));
  expect(PICTURE_NAMES.length).toBeGreaterThanOrEqual(60);
  expect(drawings.size).toBe(PICTURE_NAMES.length);
});

test('each is drawn the same every time, of numbers alone', () => {
  for (const name of PICTURE_NAMES) {
    const svg = svgOf(name);
    expect(svgOf(name) === svg, name).toBe(true);
    expect(svg, name).not.toMatch(/NaN|Infinity|undefined/);
    expect(drawPicture(name).shot).toEqual(drawPicture(name).shot);
  }
});

test('a board has the same grain every time, and another wood another', () => {
  const [mahogany, fir] = [grainPixels('mahogany'), grainPixels('fir')];
  expect(grainPixels('mahogany').equals(mahogany)).toBe(true);
  expect(fir.equals(mahogany)).toBe(false);
  expect(GRAINS.length).toBeGreaterThan(10);
});

test('one is a photograph: a JPEG of its size with much in it, named by its hash, that tells no place', async () => {
  const pictures = await developPictures(['floorOpen', 'ribNine']);
  const upright = pictures.get('ribNine')!;
  expect([upright.width, upright.height]).toEqual([1200, 1600]);
  for (const { jpeg, thumb, width, height, sha256 } of pictures.values()) {
    const told = await sharp(jpeg).metadata();
    expect(told).toMatchObject({ format: 'jpeg', width, height });
    expect(sha256).toMatch(/^[0-9a-f]{64}$/);
    expect(jpeg.length).toBeGreaterThan(100 * KIB);
    expect(jpeg.length).toBeLessThan(400 * KIB);
    expect(thumb.length).toBeLessThan(100 * KIB);
    expect(await exifr.parse(jpeg)).toBeUndefined();
    // light and dark are there, and neither is all of it
    const { channels } = await sharp(jpeg).greyscale().stats();
    expect(channels[0]!.stdev).toBeGreaterThan(12);
    expect(channels[0]!.mean).toBeGreaterThan(30);
    expect(channels[0]!.mean).toBeLessThan(200);
  }
}, 30_000);
