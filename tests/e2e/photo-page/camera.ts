import sharp from 'sharp';

/** 12 megapixels, as a phone's camera makes them. */
const CODED = { width: 4032, height: 3024 };
const CHANNELS = 3;
const GRAIN = 100;

const SKY = [40, 110, 200];
const SHED = [150, 60, 30];

interface CameraPicture {
  /** how the camera was held: 1 as it is, 6 a quarter turn (Exif 2.32) */
  orientation: 1 | 6;
}

/** A camera's JPEG: sky above, shed below when it stands upright; with grain, its time, and the place it was taken at. */
export async function cameraPicture({ orientation }: CameraPicture): Promise<Buffer> {
  const { width, height } = orientation === 6 ? { width: CODED.height, height: CODED.width } : CODED;
  return (
    sharp(pixelsOf(width, height), { raw: { width, height, channels: CHANNELS } })
      // stored as the sensor saw it: a quarter turn back
      .rotate(orientation === 6 ? 270 : 0)
      .withExif({
        IFD0: { Make: 'Plover' },
        IFD2: { DateTimeOriginal: '2026:09:08 10:05:33', OffsetTimeOriginal: '+01:00' },
        IFD3: {
          GPSLatitudeRef: 'N',
          GPSLatitude: '51/1 30/1 0/1',
          GPSLongitudeRef: 'W',
          GPSLongitude: '9/1 15/1 0/1',
        },
      })
      .withMetadata({ orientation })
      .jpeg({ quality: 90 })
      .toBuffer()
  );
}

function pixelsOf(width: number, height: number): Buffer {
  const pixels = Buffer.alloc(width * height * CHANNELS);
  const half = pixels.length / 2;
  let lot = 1;
  for (let at = 0; at < pixels.length; at += 1) {
    lot = (Math.imul(lot, 1_664_525) + 1_013_904_223) >>> 0;
    const colour = at < half ? SKY : SHED;
    pixels[at] = colour[at % CHANNELS]! + ((lot >>> 24) % GRAIN);
  }
  return pixels;
}
