import { drawFrom, type Draw } from './noise.ts';
import { GRAIN_HEIGHT_PX, GRAIN_WIDTH_PX, type Grain } from './wood.ts';

export type Point = readonly [x: number, y: number];

/** A place's height at a distance along: the edge of a plank. */
export type Edge = (x: number) => number;

interface BoardLook {
  /** degrees that the grain runs down to the right */
  turn?: number;
  /** 1: a board is as wide as its picture; more is closer */
  near?: number;
}

const STEPS = 16;
const SHADE_BANDS = 9;

/** A drawing in the making: shapes filled with wood and paint, light and shadow over them. In px, y downwards. */
export class Sketch {
  readonly draw: Draw;
  readonly width: number;
  readonly height: number;
  readonly grains = new Set<Grain>();
  private readonly defs: string[] = [];
  private readonly shapes: string[] = [];
  private readonly blurs = new Set<number>();
  private readonly spots = new Set<string>();
  private count = 0;

  constructor(seed: string, width: number, height: number) {
    this.draw = drawFrom(seed);
    this.width = width;
    this.height = height;
  }

  between(low: number, high: number): number {
    return low + (high - low) * this.draw();
  }

  /** A shape cut out of a board of this wood. */
  board(outline: readonly Point[], grain: Grain, { turn = 0, near = 1 }: BoardLook = {}): void {
    this.grains.add(grain);
    const clip = this.define((id) => `<clipPath id="${id}"><path d="${pathOf(outline)}"/></clipPath>`);
    const { x, y, length, breadth } = extentAlong(outline, turn);
    const scale = Math.max(near, (length + 4) / GRAIN_WIDTH_PX, (breadth + 4) / GRAIN_HEIGHT_PX);
    const slackAlong = GRAIN_WIDTH_PX * scale - length;
    const slackAcross = GRAIN_HEIGHT_PX * scale - breadth;
    const [left, top] = [-length / 2 - slackAlong * this.draw(), -breadth / 2 - slackAcross * this.draw()];
    const at = `translate(${round(x)} ${round(y)}) rotate(${round(turn)}) translate(${round(left)} ${round(top)}) scale(${scale.toFixed(3)})`;
    this.shapes.push(`<g clip-path="url(#${clip})"><use href="#${grain}" transform="${at}"/></g>`);
  }

  fill(outline: readonly Point[], colour: string, opacity = 1): void {
    this.shapes.push(`<path d="${pathOf(outline)}" fill="${colour}" fill-opacity="${opacity.toFixed(3)}"/>`);
  }

  /** A shape without a sharp edge: shadow, stain, gleam. `soft` is how far it fades, in px. */
  soft(outline: readonly Point[], colour: string, opacity: number, soft: number): void {
    this.softAll([outline], colour, opacity, soft);
  }

  /** Several at once: what fades costs more time than all else. */
  softAll(outlines: readonly (readonly Point[])[], colour: string, opacity: number, soft: number): void {
    const filter = this.blur(soft);
    const paths = outlines.map((outline) => pathOf(outline)).join('');
    this.shapes.push(
      `<path filter="${filter}" d="${paths}" fill="${colour}" fill-opacity="${opacity.toFixed(3)}"/>`,
    );
  }

  /** Shadow that an edge throws, fading over `depth` px below it (or above, where that is negative). */
  shade(edge: Edge, depth: number | Edge, strength: number, isStanding = false, colour = '#060302'): void {
    const end = (isStanding ? this.height : this.width) + 30;
    const depthAt = typeof depth === 'number' ? () => depth : depth;
    for (let band = SHADE_BANDS; band > 0; band -= 1) {
      const part = (band / SHADE_BANDS) ** 1.6;
      const outline = between(edge, (x) => edge(x) + depthAt(x) * part, -30, end);
      this.fill(isStanding ? standing(outline) : outline, colour, strength / SHADE_BANDS);
    }
  }

  /** A round spot that fades to nothing at its edge. */
  spot(x: number, y: number, radius: number, colour: string, opacity: number, flat = 1): void {
    const id = `spot${colour.slice(1)}`;
    if (!this.spots.has(id)) {
      this.spots.add(id);
      const stops = (
        [
          [0, colour, 1],
          [0.5, colour, 0.72],
          [0.78, colour, 0.25],
          [1, colour, 0],
        ] as const
      )
        .map(stopText)
        .join('');
      this.defs.push(`<radialGradient id="${id}">${stops}</radialGradient>`);
    }
    this.shapes.push(
      `<ellipse cx="${round(x)}" cy="${round(y)}" rx="${round(radius)}" ry="${round(radius * flat)}" fill="url(#${id})" fill-opacity="${opacity.toFixed(3)}"/>`,
    );
  }

  line(points: readonly Point[], colour: string, thick: number, opacity = 1, soft = 0): void {
    const filter = soft > 0 ? ` filter="${this.blur(soft)}"` : '';
    this.shapes.push(
      `<path${filter} d="${pathOf(points, false)}" fill="none" stroke="${colour}" stroke-width="${round(thick)}" stroke-linecap="round" stroke-linejoin="round" stroke-opacity="${opacity.toFixed(3)}"/>`,
    );
  }

  disc(x: number, y: number, radius: number, colour: string, opacity = 1, flat = 1): void {
    this.shapes.push(
      `<ellipse cx="${round(x)}" cy="${round(y)}" rx="${round(radius)}" ry="${round(radius * flat)}" fill="${colour}" fill-opacity="${opacity.toFixed(3)}"/>`,
    );
  }

  /** Fades over a shape from one point to another, by stops of colour and opacity. */
  fade(
    outline: readonly Point[],
    from: Point,
    to: Point,
    stops: readonly (readonly [at: number, colour: string, opacity: number])[],
  ): void {
    const [[x1, y1], [x2, y2]] = [from, to];
    const inner = stops.map(stopText).join('');
    const id = this.define(
      (name) =>
        `<linearGradient id="${name}" gradientUnits="userSpaceOnUse" x1="${round(x1)}" y1="${round(y1)}" x2="${round(x2)}" y2="${round(y2)}">${inner}</linearGradient>`,
    );
    this.shapes.push(`<path d="${pathOf(outline)}" fill="url(#${id})"/>`);
  }

  /** A round light or dark that fades to its edge, over the whole picture. */
  glow(x: number, y: number, radius: number, stops: readonly (readonly [number, string, number])[]): void {
    const inner = stops.map(stopText).join('');
    const id = this.define(
      (name) =>
        `<radialGradient id="${name}" gradientUnits="userSpaceOnUse" cx="${round(x)}" cy="${round(y)}" r="${round(radius)}">${inner}</radialGradient>`,
    );
    this.shapes.push(`<rect width="${this.width}" height="${this.height}" fill="url(#${id})"/>`);
  }

  /** The drawing, held `tilt` degrees askew; `addressOf` says where the picture of a board is found. */
  svg(addressOf: (grain: Grain) => string, tilt = 0): string {
    const boards = [...this.grains].map(
      (grain) =>
        `<image id="${grain}" width="${GRAIN_WIDTH_PX}" height="${GRAIN_HEIGHT_PX}" preserveAspectRatio="none" href="${addressOf(grain)}"/>`,
    );
    const [x, y] = [this.width / 2, this.height / 2];
    // a little nearer, so that no corner stays empty
    const held = `translate(${x} ${y}) rotate(${round(tilt)}) scale(1.07) translate(${-x} ${-y})`;
    const size = `width="${this.width}" height="${this.height}"`;
    return `<svg xmlns="http://www.w3.org/2000/svg" ${size}><defs>${boards.join('')}${this.defs.join('')}</defs><g transform="${held}">${this.shapes.join('')}</g></svg>`;
  }

  private define(text: (id: string) => string): string {
    this.count += 1;
    const id = `d${this.count}`;
    this.defs.push(text(id));
    return id;
  }

  private blur(soft: number): string {
    const name = `blur${soft}`;
    if (!this.blurs.has(soft)) {
      this.blurs.add(soft);
      this.defs.push(
        `<filter id="${name}" x="-30%" y="-60%" width="160%" height="220%" color-interpolation-filters="sRGB"><feGaussianBlur stdDeviation="${soft}"/></filter>`,
      );
    }
    return `url(#${name})`;
  }
}

/** What lies between two edges. */
export function between(upper: Edge, lower: Edge, from: number, to: number): Point[] {
  const steps = Array.from({ length: STEPS + 1 }, (_one, step) => from + ((to - from) * step) / STEPS);
  return [...steps.map((x): Point => [x, upper(x)]), ...steps.toReversed().map((x): Point => [x, lower(x)])];
}

export function along(edge: Edge, from: number, to: number): Point[] {
  return Array.from({ length: STEPS + 1 }, (_one, step): Point => {
    const x = from + ((to - from) * step) / STEPS;
    return [x, edge(x)];
  });
}

/** The same shape with x and y changed over: what lay stands. */
export function standing(points: readonly Point[]): Point[] {
  return points.map(([x, y]): Point => [y, x]);
}

export function rectangle(x: number, y: number, width: number, height: number): Point[] {
  return [
    [x, y],
    [x + width, y],
    [x + width, y + height],
    [x, y + height],
  ];
}

/** Points round a middle, with an outline as uneven as `rough` says (0 none, 1 much). */
export function patch(draw: Draw, [x, y]: Point, radius: number, flat: number, rough: number): Point[] {
  const corners = 26;
  const lobes = [draw() * 6.3, draw() * 6.3, draw() * 6.3];
  return Array.from({ length: corners }, (_one, corner): Point => {
    const angle = (corner / corners) * 2 * Math.PI;
    const waves =
      Math.sin(angle * 2 + lobes[0]!) * 0.5 +
      Math.sin(angle * 3 + lobes[1]!) * 0.4 +
      Math.sin(angle * 7 + lobes[2]!) * 0.2;
    const reach = radius * (1 + rough * (waves * 0.5 + (draw() - 0.5) * 0.35));
    return [x + Math.cos(angle) * reach, y + Math.sin(angle) * reach * flat];
  });
}

function pathOf(points: readonly Point[], isClosed = true): string {
  const text = points.map(([x, y]) => `${round(x)} ${round(y)}`).join('L');
  return `M${text}${isClosed ? 'Z' : ''}`;
}

function stopText([at, colour, opacity]: readonly [number, string, number]): string {
  return `<stop offset="${at}" stop-color="${colour}" stop-opacity="${opacity.toFixed(3)}"/>`;
}

/** Length and breadth of a shape measured along a direction, and its middle. */
function extentAlong(points: readonly Point[], turn: number) {
  const [cos, sin] = [Math.cos((turn * Math.PI) / 180), Math.sin((turn * Math.PI) / 180)];
  const lengths = points.map(([x, y]) => x * cos + y * sin);
  const breadths = points.map(([x, y]) => y * cos - x * sin);
  const [l0, l1] = [Math.min(...lengths), Math.max(...lengths)];
  const [b0, b1] = [Math.min(...breadths), Math.max(...breadths)];
  const [middleAlong, middleAcross] = [(l0 + l1) / 2, (b0 + b1) / 2];
  return {
    x: middleAlong * cos - middleAcross * sin,
    y: middleAlong * sin + middleAcross * cos,
    length: l1 - l0,
    breadth: b1 - b0,
  };
}

function round(value: number): number {
  return Math.round(value * 10) / 10;
}
