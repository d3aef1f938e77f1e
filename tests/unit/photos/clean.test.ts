import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import { cleanJpeg } from '#server/photos/clean-jpeg.ts';
import { cleanPng } from '#server/photos/clean-png.ts';
import { cleanWebp } from '#server/photos/clean-webp.ts';
import { pictureOf, pngChunk } from '#tests/worlds/pictures.ts';

const HIDDEN = 'in Hickory Cove';

function segment(marker: number, text: string): Buffer {
  const body = Buffer.from(text, 'latin1');
  const head = Buffer.from([0xff, marker, 0, 0]);
  head.writeUInt16BE(body.length + 2, 2);
  return Buffer.concat([head, body]);
}

function riffChunk(name: string, text: string): Buffer {
  const head = Buffer.alloc(8);
  head.write(name, 'latin1');
  head.writeUInt32LE(text.length, 4);
  return Buffer.concat([head, Buffer.from(text, 'latin1'), Buffer.alloc(text.length % 2)]);
}

async function pixelsOf(picture: Buffer): Promise<string> {
  return (await sharp(picture).raw().toBuffer()).toString('base64');
}

describe('a JPEG', () => {
  /** One with something put in behind its first marker. */
  function withFirst(picture: Buffer, ...parts: Buffer[]): Buffer {
    return Buffer.concat([picture.subarray(0, 2), ...parts, picture.subarray(2)]);
  }

  test.each([
    ['Exif', 0xe1, 'Exif\0\0'],
    ['XMP', 0xe1, 'http://ns.adobe.com/xap/1.0/\0'],
    ['several pictures in one', 0xe2, 'MPF\0'],
    ['a box of boxes', 0xeb, 'JP'],
    ['IPTC', 0xed, 'Photoshop 3.0\x008BIM'],
    ['a small picture in the first segment', 0xe0, 'JFXX\0'],
    ["a maker's own", 0xe5, 'RMETA\0'],
    ['a comment', 0xfe, ''],
  ])('loses %s', async (_what, marker, begins) => {
    const picture = await pictureOf();
    const cleaned = cleanJpeg(withFirst(picture, segment(marker, begins + HIDDEN)), 1)!;
    expect(cleaned.includes(HIDDEN)).toBe(false);
    expect(await pixelsOf(cleaned)).toBe(await pixelsOf(picture));
  });

  test('keeps how its colours are coded', async () => {
    const adobe = segment(0xee, 'Adobe\0\x64\0\0\0\0\x01');
    const picture = withFirst(await pictureOf(), adobe, segment(0xe2, `ICC_PROFILE\0${HIDDEN}`));
    const cleaned = cleanJpeg(picture, 1)!;
    expect([cleaned.includes(adobe), cleaned.includes(HIDDEN)]).toEqual([true, true]);
  });

  test('of several scans keeps them all, and loses what stands between them or behind its end', async () => {
    const picture = await sharp(await pictureOf({ width: 300, height: 200 }))
      .jpeg({ progressive: true })
      .toBuffer();
    const scans = [...picture.toString('latin1').matchAll(/\xff\xda/g)].map(({ index }) => index);
    expect(scans.length).toBeGreaterThan(3);
    const [, second] = scans as [number, number];
    const comment = segment(0xfe, HIDDEN);
    const hiding = Buffer.concat([
      picture.subarray(0, second),
      comment,
      picture.subarray(second),
      Buffer.from(`ftyp ${HIDDEN}`),
    ]);
    const cleaned = cleanJpeg(hiding, 1)!;
    expect(cleaned.includes(HIDDEN)).toBe(false);
    expect(cleaned.equals(cleanJpeg(picture, 1)!)).toBe(true);
    expect(await pixelsOf(cleaned)).toBe(await pixelsOf(picture));
  });

  test('that was cleaned stays as it is', async () => {
    const cleaned = cleanJpeg(await pictureOf(), 1)!;
    expect(cleanJpeg(cleaned, 1)!.equals(cleaned)).toBe(true);
  });

  test('cut off anywhere is either none or ends where it was cut', async () => {
    const picture = cleanJpeg(await pictureOf({ width: 24, height: 16 }), 1)!;
    const firstScan = picture.indexOf(Buffer.of(0xff, 0xda));
    for (let end = 0; end < picture.length; end += 1) {
      const cleaned = cleanJpeg(picture.subarray(0, end), 1);
      if (cleaned) expect([end > firstScan, cleaned.length <= end]).toEqual([true, true]);
      else expect(end).toBeLessThan(firstScan + 14);
    }
  });
});

describe('a PNG', () => {
  test.each(['eXIf', 'tEXt', 'iTXt', 'zTXt', 'tIME', 'caBX', 'maKr'])('loses the chunk %s', async (type) => {
    const picture = cleanPng(await pictureOf({ format: 'png' }), 1)!;
    const afterHeader = 33;
    const hiding = Buffer.concat([
      picture.subarray(0, afterHeader),
      pngChunk(type, Buffer.from(HIDDEN)),
      picture.subarray(afterHeader),
      Buffer.from(HIDDEN),
    ]);
    expect(cleanPng(hiding, 1)!.equals(picture)).toBe(true);
  });
});

describe('a WebP', () => {
  test.each(['EXIF', 'XMP ', 'abcd'])('loses the chunk %s and what stands behind its end', async (name) => {
    const picture = cleanWebp(await pictureOf({ format: 'webp' }), 1)!;
    const hiding = Buffer.concat([picture, riffChunk(name, HIDDEN), Buffer.from(HIDDEN)]);
    hiding.writeUInt32LE(hiding.length - 8 - HIDDEN.length, 4);
    expect(cleanWebp(hiding, 1)!.equals(picture)).toBe(true);
  });

  test('without anything but pixels stays as it is', async () => {
    const picture = await sharp(await pictureOf())
      .webp()
      .toBuffer();
    expect(picture.toString('latin1', 12, 16)).toBe('VP8 ');
    expect(cleanWebp(picture, 1)!.equals(picture)).toBe(true);
  });
});

test.each([cleanJpeg, cleanPng, cleanWebp])('what is none is told apart: %o', (clean) => {
  for (const text of ['', 'RIFF', 'RIFF....WEBP', '\xff\xd8', '\x89PNG\r\n\x1a\n', 'words']) {
    expect(clean(Buffer.from(text, 'latin1'), 1)).toBeNull();
  }
});
