import sharp from 'sharp';
import { drawFrom, Noise } from './noise.ts';

export type Colour = readonly [red: number, green: number, blue: number];

interface Wood {
  dark: Colour;
  light: Colour;
  /** how much of the tone is rings, fibres, pores, stains */
  rings: number;
  fibres: number;
  pores: number;
  stains: number;
  /** rings across the width */
  count: number;
}

/** What pictures are made of: kinds of wood as they are seen in a shop, and coats of paint. */
const WOODS = {
  mahogany: {
    dark: [88, 40, 23],
    light: [170, 98, 62],
    rings: 0.22,
    fibres: 0.4,
    pores: 0.5,
    stains: 0.35,
    count: 7,
  },
  aged: {
    dark: [58, 29, 19],
    light: [124, 70, 44],
    rings: 0.2,
    fibres: 0.42,
    pores: 0.55,
    stains: 0.6,
    count: 6,
  },
  bleached: {
    dark: [168, 118, 82],
    light: [222, 181, 140],
    rings: 0.2,
    fibres: 0.4,
    pores: 0.45,
    stains: 0.25,
    count: 7,
  },
  stained: {
    dark: [64, 20, 12],
    light: [128, 52, 30],
    rings: 0.2,
    fibres: 0.4,
    pores: 0.5,
    stains: 0.25,
    count: 7,
  },
  varnished: {
    dark: [92, 34, 10],
    light: [196, 98, 38],
    rings: 0.26,
    fibres: 0.34,
    pores: 0.35,
    stains: 0.3,
    count: 6,
  },
  oak: {
    dark: [122, 88, 54],
    light: [196, 160, 112],
    rings: 0.34,
    fibres: 0.5,
    pores: 0.85,
    stains: 0.3,
    count: 11,
  },
  oldOak: {
    dark: [58, 45, 34],
    light: [126, 104, 80],
    rings: 0.3,
    fibres: 0.5,
    pores: 0.8,
    stains: 0.7,
    count: 10,
  },
  fir: {
    dark: [156, 94, 48],
    light: [220, 172, 112],
    rings: 0.8,
    fibres: 0.25,
    pores: 0.1,
    stains: 0.2,
    count: 20,
  },
  cedar: {
    dark: [120, 74, 48],
    light: [188, 134, 92],
    rings: 0.5,
    fibres: 0.35,
    pores: 0.15,
    stains: 0.35,
    count: 15,
  },
  grey: {
    dark: [84, 80, 72],
    light: [160, 154, 142],
    rings: 0.55,
    fibres: 0.6,
    pores: 0.5,
    stains: 0.45,
    count: 14,
  },
  white: {
    dark: [186, 182, 168],
    light: [226, 223, 212],
    rings: 0.05,
    fibres: 0.25,
    pores: 0.05,
    stains: 0.75,
    count: 6,
  },
  greyPrimer: {
    dark: [126, 130, 130],
    light: [166, 169, 166],
    rings: 0.06,
    fibres: 0.3,
    pores: 0.1,
    stains: 0.5,
    count: 6,
  },
  redPrimer: {
    dark: [110, 46, 34],
    light: [158, 72, 52],
    rings: 0.06,
    fibres: 0.3,
    pores: 0.1,
    stains: 0.55,
    count: 6,
  },
  greenPaint: {
    dark: [46, 66, 58],
    light: [82, 106, 94],
    rings: 0.05,
    fibres: 0.25,
    pores: 0.1,
    stains: 0.7,
    count: 6,
  },
} satisfies Record<string, Wood>;

export type Grain = keyof typeof WOODS;
export const GRAINS = Object.keys(WOODS) as Grain[];

export const GRAIN_WIDTH_PX = 1680;
export const GRAIN_HEIGHT_PX = 470;
const QUALITY = 84;

/** A board of one kind of wood, sawn flat, its grain along the width. The same pixels for the same kind. */
export function grainPixels(grain: Grain): Buffer {
  const wood: Wood = WOODS[grain];
  const noise = new Noise(drawFrom(`board of ${grain}`));
  const pixels = Buffer.allocUnsafe(GRAIN_WIDTH_PX * GRAIN_HEIGHT_PX * 3);
  let at = 0;
  for (let y = 0; y < GRAIN_HEIGHT_PX; y += 1) {
    for (let x = 0; x < GRAIN_WIDTH_PX; x += 1) {
      const tone = toneAt(wood, noise, x, y);
      for (let channel = 0; channel < 3; channel += 1) {
        const [dark, light] = [wood.dark[channel]!, wood.light[channel]!];
        pixels[at] = Math.max(0, Math.min(255, dark + (light - dark) * tone));
        at += 1;
      }
    }
  }
  return pixels;
}

/** 0 is the wood's dark colour, 1 its light one. */
function toneAt(wood: Wood, noise: Noise, x: number, y: number): number {
  const drift = 90 * noise.rough(x / 620, y / 210) + 5 * noise.at(x / 70, y / 18);
  const across = (y + drift) / GRAIN_HEIGHT_PX;
  // rings lie apart at the edges of a board sawn flat and close in arches towards its middle
  const arch = Math.hypot((across - 0.55) * 2.4, x / 5200 + 0.05);
  const ring = (arch * wood.count) % 1;
  const late = ring * ring * ring * (ring > 0.93 ? (1 - ring) / 0.07 : 1);
  const fibre = noise.at(x / 74, y / 1.7) * 0.6 + noise.at(x / 23 + 91, y / 1.1 + 17) * 0.4 - 0.5;
  const pore = noise.at(x / 19 + 7, y / 1.25 + 133);
  const stain = noise.rough(x / 240 + 19, y / 90 + 5) - 0.5;
  return (
    0.66 -
    late * wood.rings * 0.9 +
    fibre * wood.fibres * 0.75 -
    (pore > 0.76 ? (pore - 0.76) * 4 * wood.pores : 0) +
    stain * wood.stains * 1.3
  );
}

/** The board as a JPEG in a data address, as an SVG takes it in. */
export async function grainAddress(grain: Grain): Promise<string> {
  const raw = { width: GRAIN_WIDTH_PX, height: GRAIN_HEIGHT_PX, channels: 3 as const };
  const jpeg = await sharp(grainPixels(grain), { raw }).jpeg({ quality: QUALITY }).toBuffer();
  return `data:image/jpeg;base64,${jpeg.toString('base64')}`;
}
