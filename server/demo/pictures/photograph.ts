import sharp from 'sharp';
import { drawFrom, Noise } from './noise.ts';
import type { Sketch } from './sketch.ts';
import type { Grain } from './wood.ts';

/** How the camera stood to what it saw. */
export interface Shot {
  /** how high in the picture it is sharp, 0 at the top, and how quickly it is not */
  sharpAt: number;
  blur: number;
  /** above 1 is the yellow of lamps, below 1 the blue of a door left open */
  warmth: number;
  exposure: number;
  /** degrees; at most two, or corners stay empty */
  tilt: number;
  /** the other side of the boat: what ran to the right runs to the left */
  isMirrored: boolean;
}

const QUALITY = 74;
const GRAIN_TILE_PX = 512;
const GRAIN_STRENGTH = 11;

/** A drawing as a phone would have taken it: JPEG of the drawing's size. */
export async function photograph(
  sketch: Sketch,
  shot: Shot,
  boards: ReadonlyMap<Grain, string>,
): Promise<Buffer> {
  const { width, height } = sketch;
  const svg = Buffer.from(sketch.svg((grain) => boards.get(grain)!, shot.tilt));
  const sharpOne = await sharp(svg, { unlimited: true }).flop(shot.isMirrored).removeAlpha().raw().toBuffer();
  const raw = { width, height, channels: 3 as const };
  const blurred = await sharp(sharpOne, { raw })
    .resize(Math.round(width / 4))
    .blur(2.4)
    .resize(width, height, { fit: 'fill' })
    .raw()
    .toBuffer();
  develop(sharpOne, blurred, raw, shot);
  return sharp(sharpOne, { raw }).blur(0.55).jpeg({ quality: QUALITY }).toBuffer();
}

/** Lens and sensor: what is out of focus, darker corners, the light's colour, noise. Changes `pixels`. */
function develop(
  pixels: Buffer,
  blurred: Buffer,
  { width, height }: { width: number; height: number },
  { sharpAt, blur, warmth, exposure }: Shot,
): void {
  const gains = [exposure * Math.sqrt(warmth), exposure, exposure / warmth];
  for (let y = 0; y < height; y += 1) {
    const off = Math.min(1, Math.max(0, Math.abs(y / height - sharpAt) - 0.12) * blur);
    const down = (y / height - 0.5) ** 2;
    for (let x = 0; x < width; x += 1) {
      const at = (y * width + x) * 3;
      const corner = 1 - 0.75 * (down + (x / width - 0.5) ** 2);
      const noise = SENSOR[(y % GRAIN_TILE_PX) * GRAIN_TILE_PX + (x % GRAIN_TILE_PX)]!;
      for (let channel = 0; channel < 3; channel += 1) {
        const seen = pixels[at + channel]! * (1 - off) + blurred[at + channel]! * off;
        const lit = seen * corner * gains[channel]!;
        pixels[at + channel] = TONES[Math.max(0, Math.min(1023, Math.round((lit + noise) * 2)))]!;
      }
    }
  }
}

/** A print's curve: darks a little lifted, lights rolled off. Index is twice the value. */
const TONES = Uint8Array.from({ length: 1024 }, (_one, index) => {
  const value = index / 2 / 255;
  const rolled = value < 0.7 ? value : 0.7 + 0.3 * (1 - Math.exp(-(value - 0.7) / 0.3));
  return Math.min(255, 9 + 243 * rolled);
});

const SENSOR = sensorNoise();

function sensorNoise(): Float32Array {
  const draw = drawFrom('sensor');
  const clumps = new Noise(draw);
  return Float32Array.from({ length: GRAIN_TILE_PX ** 2 }, (_one, at) => {
    const [x, y] = [at % GRAIN_TILE_PX, Math.floor(at / GRAIN_TILE_PX)];
    return (draw() + draw() - 1) * GRAIN_STRENGTH + (clumps.at(x / 2, y / 2) - 0.5) * GRAIN_STRENGTH * 0.8;
  });
}
