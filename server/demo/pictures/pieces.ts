import { along, between, patch, rectangle, standing, type Edge, type Point, type Sketch } from './sketch.ts';
import type { Grain } from './wood.ts';

export interface PlankLook {
  /** the seam's colour below it and its width in px; none for planks close together */
  seam?: { colour: string; thick: number };
  /** how round its edges are, 0 to 1 */
  round?: number;
  /** whether it stands rather than lies */
  isStanding?: boolean;
  near?: number;
}

/** One plank between two edges, lit from above or, where it stands, from the left. */
export function plank(s: Sketch, upper: Edge, lower: Edge, grain: Grain, look: PlankLook = {}): void {
  const { seam, round = 0.5, isStanding = false, near = 1 } = look;
  const end = (isStanding ? s.height : s.width) + 30;
  const way = (points: Point[]) => (isStanding ? standing(points) : points);
  const slope = (Math.atan2(upper(end) - upper(-30), end + 30) * 180) / Math.PI;
  const outline = way(between(upper, lower, -30, end));
  s.board(outline, grain, { turn: isStanding ? 90 - slope : slope, near });
  s.fill(outline, s.draw() < 0.5 ? '#1c0f08' : '#ffe9c8', s.between(0, 0.13));
  const part = (share: number) => (x: number) => (lower(x) - upper(x)) * share;
  s.shade(upper, part(0.3), 0.3 * round, isStanding, '#fff4e0');
  s.shade(lower, part(-0.6), 0.62 * round, isStanding);
  if (!seam) return;
  const line = way(along(lower, -30, end));
  s.line(line, '#000000', seam.thick * 3.2, 0.14);
  s.line(line, '#000000', seam.thick * 2, 0.18);
  s.line(line, seam.colour, seam.thick, 0.95);
  s.line(
    line.map(([x, y]): Point => (isStanding ? [x + seam.thick * 0.6, y] : [x, y + seam.thick * 0.6])),
    '#ffe8cc',
    1.4,
    0.28,
  );
}

/** An edge that runs from one height to another with a bend in its middle. */
export function bent(from: number, to: number, length: number, bend: number): Edge {
  return (x) => {
    const t = x / length;
    return from + (to - from) * t + bend * 4 * t * (1 - t);
  };
}

/** Wood that has gone: dark, cracked along and across the grain into cubes, some of them fallen out. */
export function rot(s: Sketch, [x, y]: Point, radius: number, flat: number): void {
  s.soft(patch(s.draw, [x, y], radius * 1.6, flat, 0.5), '#170c07', 0.5, 26);
  for (let streak = 0; streak < 14; streak += 1) {
    const [from, at] = [x + radius * s.between(-1.2, 0.9), y + radius * flat * s.between(-0.9, 0.9)];
    s.line(
      [
        [from, at],
        [from + s.between(80, 260), at + s.between(-9, 9)],
      ],
      '#120805',
      s.between(3, 12),
      0.3,
    );
  }
  s.soft(patch(s.draw, [x, y], radius * 1.05, flat, 0.6), '#1d0f08', 0.92, 8);
  cubes(s, [x, y], radius, flat);
  for (let hollow = 0; hollow < 5; hollow += 1)
    s.spot(
      x + radius * s.between(-0.4, 0.3),
      y + radius * flat * s.between(-0.3, 0.35),
      radius * s.between(0.2, 0.42),
      '#050302',
      0.9,
      flat,
    );
  for (let crumb = 0; crumb < 60; crumb += 1) {
    const [angle, reach] = [s.between(0, 6.3), radius * s.between(0.6, 1.5)];
    const at: Point = [x + Math.cos(angle) * reach, y + Math.sin(angle) * reach * flat + 9];
    s.fill(patch(s.draw, at, s.between(1.5, 5), 0.7, 1), s.draw() < 0.5 ? '#4e2f1b' : '#2a170d', 0.85);
  }
}

/** Cracks along the grain that wander, and short ones across from each to the next. */
function cubes(s: Sketch, [x, y]: Point, radius: number, flat: number): void {
  const rows = 8;
  const wander = Array.from({ length: 6 }, () => s.between(-0.07, 0.07));
  const heightAt = (row: number, across: number) =>
    y + radius * flat * ((row / rows) * 2 - 1 + wander[(row * 5 + Math.round((across + 1) * 3)) % 6]!);
  for (let row = 0; row <= rows; row += 1) {
    const reach = Math.sqrt(Math.max(0, 1 - ((row / rows) * 2 - 1) ** 2)) * s.between(0.85, 1.25);
    const crack = Array.from({ length: 13 }, (_one, step): Point => {
      const across = -reach + (2 * reach * step) / 12;
      return [x + across * radius, heightAt(row, across) + s.between(-4, 4)];
    });
    s.line(
      crack.map(([a, b]): Point => [a, b + 4]),
      '#8d6242',
      2,
      0.3,
    );
    s.line(crack, '#060302', s.between(3, 7), 0.85);
    for (let across = -reach; across < reach && row < rows; across += s.between(0.08, 0.24)) {
      const [top, bottom] = [heightAt(row, across), heightAt(row + 1, across)];
      const block: Point[] = [
        [x + across * radius, top],
        [x + (across + 0.16) * radius, top],
        [x + (across + 0.15) * radius, bottom],
        [x + across * radius, bottom],
      ];
      s.fill(
        block,
        ['#45291a', '#2a170d', '#5a3822', '#1b0f09'][Math.floor(s.draw() * 4)]!,
        s.between(0.15, 0.6),
      );
      s.line(
        [
          [x + across * radius, top],
          [x + (across + s.between(-0.04, 0.04)) * radius, (top + bottom) / 2],
          [x + (across + s.between(-0.03, 0.03)) * radius, bottom],
        ],
        '#060302',
        s.between(2, 5),
        0.8,
      );
    }
  }
}

/** A window mirrored in a coat of varnish, two panes by three, drawn out towards the eye. */
export function gloss(s: Sketch, strength: number): void {
  const { width: w, height: h } = s;
  const [x, lean] = [w * s.between(0.3, 0.55), s.between(-180, 180)];
  s.spot(x + lean / 2, h * 0.4, w * 0.42, '#fdf6e6', strength * 0.55, 0.9);
  for (let row = 0; row < 3; row += 1) {
    const panes = [0, 1].map((column) => {
      const at = (across: number, down: number): Point => {
        const wide = w * (0.1 + 0.05 * down);
        return [
          x + across * wide + lean * down * 0.5 + s.between(-7, 7),
          h * (0.04 + 0.3 * down) + s.between(-6, 6),
        ];
      };
      const [left, right] = [column - 1 + 0.06, column - 0.06];
      const [top, bottom] = [row * 0.8 + 0.06, row * 0.8 + 0.72];
      return [at(left, top), at(right, top), at(right, bottom), at(left, bottom)];
    });
    s.softAll(panes, '#ffffff', strength * (1.15 - row * 0.3), 8);
  }
}

/** Dust, shavings, specks of old paint. */
export function dust(s: Sketch, count: number, colour: string): void {
  for (let one = 0; one < count; one += 1) {
    const at: Point = [s.between(0, s.width), s.between(0, s.height)];
    s.fill(patch(s.draw, at, s.between(1, 4.5), s.between(0.4, 1), 0.8), colour, s.between(0.3, 0.8));
  }
}

/** A lamp's light from one corner, and the dark of a shed in the other. */
export function lamp(s: Sketch, fromLeft: number, fromTop: number): void {
  const { width: w, height: h } = s;
  s.glow(w * fromLeft, h * fromTop, w * 0.95, [
    [0, '#ffe7bd', 0.26],
    [0.4, '#ffdca0', 0.05],
    [0.75, '#0a0a10', 0.16],
    [1, '#07080d', 0.5],
  ]);
}

/** A wall or floor far behind, out of focus. */
export function behind(s: Sketch, colour: string): void {
  s.fill(rectangle(0, 0, s.width, s.height), colour);
  for (let shape = 0; shape < 9; shape += 1) {
    const at: Point = [s.between(0, s.width), s.between(0, s.height)];
    const radius = s.between(90, 320);
    const colour = s.draw() < 0.5 ? '#0a0c0e' : '#8d7f6a';
    s.glow(at[0], at[1], radius, [
      [0, colour, s.between(0.15, 0.4)],
      [0.6, colour, 0.12],
      [1, colour, 0],
    ]);
  }
}
