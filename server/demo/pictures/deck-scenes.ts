import { bent, behind, dust, gloss, lamp, plank } from './pieces.ts';
import { bung, hole } from './fastenings.ts';
import { along, between, patch, type Point, type Sketch } from './sketch.ts';
import type { Scene } from './hull-scenes.ts';
import type { Grain } from './wood.ts';

interface Deck {
  grain: Grain;
  /** of the seams */
  seam: string;
  count: number;
  isGlossy?: boolean;
  isTaped?: boolean;
  isMilky?: boolean;
  bungs?: boolean;
}

/** Deck planks running away from the eye and closing together. */
export function deck(look: Deck): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    const edge = (index: number) => {
      const t = index / look.count;
      return (y: number) => w * (0.5 + (t - 0.5) * (0.52 + (1.35 * y) / h)) + 30 * Math.sin(y / 700);
    };
    for (let index = 0; index < look.count; index += 1) {
      plank(s, edge(index), edge(index + 1), look.grain, { isStanding: true, round: 0.12 });
      if (look.bungs)
        for (const y of [0.2, 0.52, 0.9])
          bung(
            s,
            [(edge(index)(h * y) + edge(index + 1)(h * y)) / 2, h * y + s.between(-14, 14)],
            8 + y * 11,
            look.grain,
          );
    }
    for (let index = 0; index <= look.count; index += 1) deckSeam(s, edge(index), look);
    if (edge(0)(0) > 0) coveringBoards(s, edge(0), edge(look.count), look.grain);
    if (look.isMilky) milk(s);
    if (look.isGlossy) gloss(s, 0.3);
    lamp(s, 0.5, 0.05);
  };
}

function deckSeam(s: Sketch, edge: (y: number) => number, { seam, isTaped = false }: Deck): void {
  const { height: h } = s;
  const wide = (y: number) => 4 + (y / h) * 8;
  const strip = (from: number, to: number): Point[] => {
    const ys = Array.from({ length: 17 }, (_one, step) => -30 + ((h + 60) * step) / 16);
    return [
      ...ys.map((y): Point => [edge(y) + from * wide(y), y]),
      ...ys.toReversed().map((y): Point => [edge(y) + to * wide(y), y]),
    ];
  };
  if (isTaped)
    for (const side of [-1, 1]) {
      s.fill(strip(side * 0.8 + side * 0.2, side * 4.6), '#6f93a8', 0.92);
      s.fill(strip(side * 4.2, side * 4.6), '#dfeaf0', 0.4);
    }
  s.fill(strip(-1.3, 1.3), '#000000', 0.3);
  s.fill(strip(-0.8, 0.8), seam);
  s.fill(strip(0.55, 0.85), '#ffeacb', 0.3);
}

function coveringBoards(
  s: Sketch,
  left: (y: number) => number,
  right: (y: number) => number,
  grain: Grain,
): void {
  const { height: h } = s;
  plank(s, (y) => left(y) - 420 + y * 0.1, left, grain, { isStanding: true, round: 0.3, near: 1.3 });
  plank(s, right, (y) => right(y) + 420 - y * 0.1, grain, { isStanding: true, round: 0.3, near: 1.3 });
  for (const y of [0.12, 0.4, 0.75])
    for (const x of [left(h * y) - 90, right(h * y) + 90]) bung(s, [x, h * y], 17, grain);
}

/** Bloom in the varnish: a milky veil with no edge. */
function milk(s: Sketch): void {
  for (let veil = 0; veil < 26; veil += 1)
    s.spot(
      s.width * s.between(0.2, 0.8),
      s.height * s.between(0.25, 0.85),
      s.between(120, 330),
      '#e9e4dc',
      s.between(0.08, 0.2),
      s.between(0.4, 0.9),
    );
}

/** The edge of the deck, its covering board off, black wood under it. */
export function underCoveringBoard(deckWood: Grain, isBlack: boolean): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    behind(s, '#3a352f');
    const [upper, lower] = [bent(h * 0.34, h * 0.28, w, 40), bent(h * 0.66, h * 0.6, w, 40)];
    plank(s, bent(h * -0.06, h * -0.1, w, 30), bent(h * 0.14, h * 0.09, w, 36), deckWood, {
      seam: { colour: '#120b07', thick: 8 },
    });
    plank(s, bent(h * 0.14, h * 0.09, w, 36), upper, deckWood);
    s.shade(upper, 80, 0.95);
    plank(s, upper, lower, 'oldOak', { round: 0.5, near: 1.3 });
    s.shade(upper, 90, 0.9);
    if (isBlack)
      for (let stain = 0; stain < 30; stain += 1)
        s.spot(
          w * s.between(0.25, 1),
          h * s.between(0.36, 0.6),
          s.between(50, 170),
          '#0c0806',
          s.between(0.25, 0.6),
          0.5,
        );
    for (let x = 120; x < w; x += 240) hole(s, [x, (upper(x) + lower(x)) / 2 - 20 + s.between(-30, 30)], 12);
    s.shade(lower, 40, 0.9);
    plank(s, lower, () => h * 1.1, 'aged', { round: 0.5, near: 1.3 });
    dust(s, 70, '#a88a66');
    lamp(s, 0.4, 0.2);
  };
}

/** Seams raked clean in a deck, near by; a hook's scratch here and there. */
export function rakedSeams(grain: Grain): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    const edges = [-0.1, 0.26, 0.62, 1.05].map((t) => bent(h * t, h * (t - 0.05), w, 14));
    for (let index = 0; index + 1 < edges.length; index += 1)
      plank(s, edges[index]!, edges[index + 1]!, grain, { near: 1.5, round: 0.25 });
    for (const edge of edges.slice(1, -1)) {
      s.fill(
        between(
          (x) => edge(x) - 17,
          (x) => edge(x) + 17,
          -30,
          w + 30,
        ),
        '#0d0705',
      );
      s.shade((x) => edge(x) - 17, 30, 0.8);
      s.line(
        along((x) => edge(x) + 17, -30, w + 30),
        '#f5d3a4',
        4,
        0.5,
      );
      for (let crumb = 0; crumb < 46; crumb += 1) {
        const x = s.between(0, w);
        s.fill(
          patch(s.draw, [x, edge(x) + s.between(24, 120)], s.between(2, 10), 0.6, 1),
          s.draw() < 0.6 ? '#242321' : '#8b7f6d',
          0.9,
        );
      }
    }
    lamp(s, 0.6, 0.1);
  };
}
