import { bent, behind, dust, lamp, plank, rot } from './pieces.ts';
import { hole, head, clamp, squeezeOut, rule } from './fastenings.ts';
import { along, between, patch, rectangle, standing, type Edge, type Point, type Sketch } from './sketch.ts';
import type { Scene } from './hull-scenes.ts';
import type { Grain } from './wood.ts';

interface Inside {
  planks: Grain;
  ribs: Grain;
  /** a second rib beside the middle one */
  sister?: Grain;
  floor?: Grain;
  isBroken?: boolean;
  isRotten?: boolean;
  isClamped?: boolean;
}

/** Planks from within, running across, a little darker towards the bilge. */
export function inner(s: Sketch, grain: Grain, count: number): void {
  const [tilt, bend] = [s.between(-50, 50), s.between(-60, 20)];
  for (let index = 0; index < count; index += 1) {
    const [top, bottom] = [index / count, (index + 1) / count].map((t) => -40 + (s.height + 80) * t) as [
      number,
      number,
    ];
    plank(
      s,
      bent(top - tilt, top + tilt, s.width, bend),
      bent(bottom - tilt, bottom + tilt, s.width, bend),
      grain,
      { seam: { colour: '#130c08', thick: 4 }, round: 0.35 },
    );
  }
  s.fade(
    rectangle(0, 0, s.width, s.height),
    [0, 0],
    [0, s.height],
    [
      [0, '#000000', 0],
      [0.5, '#000000', 0.12],
      [1, '#000000', 0.5],
    ],
  );
}

/** A rib standing over the planks and the shadow it throws; returns its edges. */
function rib(s: Sketch, x: number, wide: number, grain: Grain): [Edge, Edge] {
  const bend = s.between(10, 50);
  const [left, right] = [bent(x, x + 60, s.height, bend), bent(x + wide, x + wide + 60, s.height, bend)];
  s.shade((y) => right(y) - 4, wide * 0.7, 0.95, true);
  s.shade(left, -22, 0.6, true);
  plank(s, left, right, grain, { isStanding: true, round: 0.8, near: 1.2 });
  return [left, right];
}

function rivetsDown(s: Sketch, [left, right]: [Edge, Edge], metal: string, gap: number): void {
  for (let y = s.between(40, gap); y < s.height; y += gap)
    head(s, [(left(y) + right(y)) / 2 + s.between(-9, 9), y], 14, metal);
}

/** Ribs over planking; one may be sistered, broken, rotten at its foot or clamped. */
export function ribs(look: Inside): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    inner(s, look.planks, 5);
    const wide = w * 0.085;
    const places = [w * 0.1, w * 0.43, w * 0.78];
    for (const [index, x] of places.entries()) {
      const edges = rib(s, x, wide, look.ribs);
      rivetsDown(s, edges, '#8c5234', 190);
      if (index !== 1) continue;
      if (look.sister) rivetsDown(s, rib(s, x + wide + 3, wide * 0.9, look.sister), '#b87448', 150);
      if (look.isBroken) broken(s, edges);
    }
    if (look.floor) floorTimber(s, look.floor, look.isRotten ?? false);
    if (look.isClamped) {
      clamp(s, w * 0.52, h * 0.34);
      squeezeOut(
        s,
        along((y) => bent(w * 0.43 + wide, w * 0.49 + wide, h, 25)(y), h * 0.1, h * 0.9).map(
          ([a, b]): Point => [b, a],
        ),
        '#8a5f2c',
      );
    }
    lamp(s, 0.3, 0.15);
  };
}

/** An old crack right across, running out along the grain, with splinters. */
function broken(s: Sketch, [left, right]: [Edge, Edge]): void {
  const y = s.height * s.between(0.46, 0.54);
  const steps = Array.from({ length: 15 }, (_one, step): Point => {
    const x = left(y) + ((right(y) - left(y)) * step) / 14;
    return [x, y + (step - 7) * 11 + (s.draw() < 0.3 ? s.between(-55, 55) : s.between(-9, 9))];
  });
  s.line(steps, '#000000', 22, 0.25);
  s.line(steps, '#000000', 12, 0.4);
  s.line(steps, '#080402', 5, 0.95);
  s.line(
    steps.map(([a, b]): Point => [a + 1, b + 5]),
    '#d8b684',
    2,
    0.35,
  );
  for (let splinter = 0; splinter < 16; splinter += 1) {
    const [x, from] = [s.between(left(y) + 12, right(y) - 12), y + s.between(-60, 60)];
    s.line(
      [
        [x, from],
        [x + s.between(-8, 8), from + s.between(-150, 150)],
      ],
      '#0c0603',
      s.between(1.5, 3.5),
      0.75,
    );
  }
}

/** A floor timber lying across the picture's foot, bolted; soft at its end where it is rotten. */
function floorTimber(s: Sketch, grain: Grain, isRotten: boolean): void {
  const { width: w, height: h } = s;
  const [upper, lower] = [bent(h * 0.66, h * 0.62, w, 26), bent(h * 0.9, h * 0.87, w, 10)];
  s.shade((x) => lower(x) - 6, 120, 0.95);
  s.shade(upper, -40, 0.7);
  plank(s, upper, lower, grain, { round: 0.9, near: 1.4 });
  for (const x of [w * 0.2, w * 0.83]) head(s, [x, (upper(x) + lower(x)) / 2], 34, '#6f5a3a');
  if (isRotten) rot(s, [w * 0.5, h * 0.75], 190, 0.5);
}

/** A floor timber from near by: eaten away at its end, or spliced with a long joint. */
export function floorEnd(grain: Grain, state: 'rotten' | 'cut out' | 'spliced', isMeasured = false): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    inner(s, 'aged', 3);
    const [upper, lower] = [bent(h * 0.24, h * 0.2, w, 20), bent(h * 0.72, h * 0.7, w, -10)];
    s.shade((x) => lower(x) - 4, 170, 0.95);
    s.shade(upper, -60, 0.8);
    plank(s, upper, lower, grain, { round: 0.85, near: 1.7 });
    if (state === 'rotten') {
      rot(s, [w * 0.66, h * 0.44], 260, 0.52);
      s.soft(patch(s.draw, [w * 0.9, h * 0.46], 220, 0.8, 0.4), '#160c07', 0.5, 40);
    } else splice(s, upper, lower, state === 'spliced');
    if (isMeasured) rule(s, [w * 0.32, h * 0.74], 760, s.between(-3, 3));
    lamp(s, 0.4, 0.15);
  };
}

function splice(s: Sketch, upper: Edge, lower: Edge, isFilled: boolean): void {
  const { width: w } = s;
  const [top, foot] = [w * 0.44, w * 0.62];
  const end: Point[] = [
    [top, upper(top)],
    ...along(upper, top, w + 30),
    ...along(lower, foot, w + 30).toReversed(),
    [foot, lower(foot)],
  ];
  if (isFilled) {
    s.board(end, 'oak', { turn: -1, near: 1.7 });
    s.line(
      [
        [top, upper(top)],
        [foot, lower(foot)],
      ],
      '#2b170b',
      5,
      0.95,
    );
    squeezeOut(
      s,
      along((x) => upper(top) + ((x - top) / (foot - top)) * (lower(foot) - upper(top)), top, foot),
      '#8a5f2c',
    );
    for (const x of [w * 0.66, w * 0.82]) head(s, [x, (upper(x) + lower(x)) / 2], 30, '#a5803f');
    return;
  }
  s.fill(end, '#0d0805');
  s.fade(
    end,
    [top, 0],
    [w, 0],
    [
      [0, '#3b2a1c', 0.9],
      [0.5, '#000000', 0.2],
      [1, '#000000', 0.6],
    ],
  );
  s.board(
    [
      [top, upper(top)],
      [top + 46, upper(top) + 4],
      [foot + 46, lower(foot)],
      [foot, lower(foot)],
    ],
    'oak',
    { turn: 62 },
  );
  dust(s, 60, '#caa06a');
}

/** Beams and carlins with the deck off, light falling between them. */
export function deckBeams(grain: Grain): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    behind(s, '#1d1a18');
    for (const y of [0.06, 0.36, 0.7]) {
      const [upper, lower] = [
        bent(h * y, h * (y + 0.03), w, -24),
        bent(h * (y + 0.16), h * (y + 0.19), w, -24),
      ];
      s.shade((x) => lower(x) - 4, 120, 0.95);
      plank(s, upper, lower, grain, { round: 0.85, near: 1.3 });
      for (const x of [w * 0.12, w * 0.5, w * 0.88]) hole(s, [x + s.between(-20, 20), upper(x) + 50], 9);
    }
    for (const x of [0.27, 0.7]) {
      const edges: [Edge, Edge] = [
        bent(w * x, w * (x + 0.02), h, 0),
        bent(w * (x + 0.06), w * (x + 0.08), h, 0),
      ];
      s.shade(edges[1], 60, 0.9, true);
      s.board(standing(between(edges[0], edges[1], -30, h + 30)), 'fir', { turn: 90 });
      s.shade(edges[1], -50, 0.6, true);
    }
    lamp(s, 0.6, 0.2);
  };
}
