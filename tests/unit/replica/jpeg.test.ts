import fc from 'fast-check';
import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import { readJpegHead } from '#src/replica/photos/jpeg.ts';

// Goal: what a camera wrote is read aright from files of another program's making, and no file, however broken, throws or
// holds up the reader.

const TAKEN = { DateTimeOriginal: '2026:09:08 10:05:33', OffsetTimeOriginal: '+02:00' };

async function jpegOf(exif: Record<string, string>, orientation = 1): Promise<ArrayBuffer> {
  const bytes = await sharp({ create: { width: 64, height: 48, channels: 3, background: '#6B2A1A' } })
    .withExif({
      IFD0: { Make: 'Plover' },
      IFD2: exif,
      IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' },
    })
    .withMetadata({ orientation })
    .jpeg()
    .toBuffer();
  return new Uint8Array(bytes).buffer;
}

describe('what a JPEG says of itself', () => {
  test('is its size, how it is to be turned and when it was taken', async () => {
    expect(readJpegHead(await jpegOf(TAKEN, 6))).toEqual({
      size: { width: 64, height: 48 },
      orientation: 6,
      takenAt: '2026-09-08T08:05:33.000Z',
    });
  });

  test('is local time of this device where it names no offset', async () => {
    const { takenAt } = readJpegHead(await jpegOf({ DateTimeOriginal: TAKEN.DateTimeOriginal }))!;
    expect(takenAt).toBe(new Date('2026-09-08T10:05:33').toISOString());
  });

  test.each(['    :  :     :  :  ', '2026:13:08 10:05:33', 'yesterday'])(
    'is no time where it says %j',
    async (text) => {
      expect(readJpegHead(await jpegOf({ DateTimeOriginal: text }))).toMatchObject({
        takenAt: null,
        orientation: 1,
      });
    },
  );

  test('is nothing where it is no JPEG', async () => {
    const png = await sharp({ create: { width: 8, height: 8, channels: 3, background: 'red' } })
      .png()
      .toBuffer();
    expect(readJpegHead(new Uint8Array(png).buffer)).toBeNull();
    expect(readJpegHead(new TextEncoder().encode('a list of screws').buffer)).toBeNull();
    expect(readJpegHead(new ArrayBuffer(0))).toBeNull();
  });

  test('is read as far as it goes where it breaks off or is spoilt', async () => {
    const whole = new Uint8Array(await jpegOf(TAKEN, 8));
    fc.assert(
      fc.property(
        fc.nat(whole.length),
        fc.array(fc.tuple(fc.nat(400), fc.nat(255)), { maxLength: 8 }),
        (length, spoilt) => {
          const bytes = whole.slice(0, length);
          for (const [at, value] of spoilt) if (at < bytes.length) bytes[at] = value;
          const head = readJpegHead(bytes.buffer);
          if (head) expect([1, 2, 3, 4, 5, 6, 7, 8]).toContain(head.orientation);
        },
      ),
      { numRuns: 2000 },
    );
  });
});
