import { patch, rectangle, type Point, type Sketch } from './sketch.ts';
import type { Grain } from './wood.ts';

/** A plug of wood over a fastening. */
export function bung(s: Sketch, [x, y]: Point, radius: number, grain: Grain, isProud = false): void {
  const outline = patch(s.draw, [x, y], radius, 1, 0);
  if (isProud) s.spot(x + 7, y + 10, radius * 1.4, '#000000', 0.7);
  s.board(outline, grain, { turn: s.between(-14, 14), near: 0.7 });
  s.fill(outline, s.draw() < 0.5 ? '#2b1408' : '#ffe3bd', s.between(0.05, 0.2));
  s.line([...outline, outline[0]!], '#190b05', 2, 0.7);
  if (isProud)
    s.fade(
      outline,
      [x - radius, y - radius],
      [x + radius, y + radius],
      [
        [0, '#fff3dc', 0.5],
        [0.6, '#000000', 0],
        [1, '#000000', 0.5],
      ],
    );
}

/** The empty hole of a screw. */
export function hole(s: Sketch, [x, y]: Point, radius: number): void {
  s.spot(x, y, radius * 1.9, '#120a06', 0.7);
  s.disc(x, y, radius, '#0c0705', 0.96);
  s.line(arc([x, y], radius, 0.2, 1.4), '#e6c59c', 2, 0.4);
}

/** A fastening's round metal head: copper rivet, bronze screw or bolt. */
export function head(s: Sketch, [x, y]: Point, radius: number, metal: string, isSlotted = false): void {
  s.spot(x + radius * 0.35, y + radius * 0.5, radius * 1.4, '#000000', 0.8);
  s.disc(x, y, radius, metal);
  const outline = patch(s.draw, [x, y], radius, 1, 0);
  s.fade(
    outline,
    [x - radius, y - radius],
    [x + radius, y + radius],
    [
      [0, '#fff6e6', 0.6],
      [0.45, metal, 0],
      [1, '#120804', 0.75],
    ],
  );
  s.spot(x - radius * 0.32, y - radius * 0.36, radius * 0.42, '#ffffff', 0.8);
  if (!isSlotted) return;
  const turn = s.between(0, 3.1);
  const reach = radius * 0.8;
  s.line(
    [
      [x - Math.cos(turn) * reach, y - Math.sin(turn) * reach],
      [x + Math.cos(turn) * reach, y + Math.sin(turn) * reach],
    ],
    '#140b06',
    radius * 0.22,
    0.9,
  );
}

/** The copper ring under a rivet's clenched end. */
export function rove(s: Sketch, at: Point, radius: number): void {
  head(s, at, radius, '#9a5a38');
  s.line(arc(at, radius * 0.7, 0, 6.3), '#4a2415', 2, 0.6);
  head(s, at, radius * 0.42, '#c07a50');
}

function arc([x, y]: Point, radius: number, from: number, to: number): Point[] {
  return Array.from({ length: 15 }, (_one, step): Point => {
    const angle = from + ((to - from) * step) / 14;
    return [x + Math.cos(angle) * radius, y + Math.sin(angle) * radius];
  });
}

/** A bar clamp standing across the work, its jaw on a scrap of wood. `x` is its middle, `jaw` the height of the jaw. */
export function clamp(s: Sketch, x: number, jaw: number): void {
  const lean = s.between(-26, 26);
  const bar: Point[] = [
    [x - 24, -40],
    [x + 24, -40],
    [x + 24 + lean, s.height + 40],
    [x - 24 + lean, s.height + 40],
  ];
  const [jx, scrap] = [
    x + (lean * jaw) / s.height,
    rectangle(x + (lean * jaw) / s.height - 170, jaw - 76, 340, 152),
  ];
  const casting: Point[] = [
    [jx - 64, jaw - 40],
    [jx + 64, jaw - 40],
    [jx + 78, jaw + 6],
    [jx + 58, jaw + 44],
    [jx - 58, jaw + 44],
    [jx - 78, jaw + 6],
  ];
  cast(s, scrap, 22);
  s.board(scrap, 'fir', { turn: s.between(-6, 6) });
  s.fade(
    scrap,
    [jx, jaw - 58],
    [jx, jaw + 58],
    [
      [0, '#ffffff', 0.16],
      [1, '#000000', 0.4],
    ],
  );
  cast(s, bar, 34);
  s.fill(bar, '#77797a');
  s.fade(bar, bar[0]!, bar[1]!, [
    [0, '#1c1d1e', 0.8],
    [0.16, '#eef0ee', 0.75],
    [0.4, '#8b8d8c', 0.1],
    [0.75, '#2a2b2c', 0.35],
    [1, '#0c0c0d', 0.85],
  ]);
  for (let y = 20; y < s.height; y += 17)
    s.line(
      [
        [x - 18 + (lean * y) / s.height, y],
        [x + 18 + (lean * y) / s.height, y + 4],
      ],
      '#1a1b1c',
      2,
      0.35,
    );
  cast(s, casting, 18);
  s.fill(casting, '#33261f');
  s.fade(
    casting,
    [jx - 70, jaw - 40],
    [jx + 60, jaw + 46],
    [
      [0, '#e6d8c6', 0.5],
      [0.3, '#6b4a38', 0.2],
      [1, '#000000', 0.65],
    ],
  );
  head(s, [jx, jaw], 25, '#8d8a82');
}

/** The shadow of something that stands over the work. */
function cast(s: Sketch, outline: readonly Point[], away: number): void {
  s.soft(
    outline.map(([x, y]): Point => [x + away, y + away * 0.8]),
    '#000000',
    0.55,
    12,
  );
}

/** Glue pressed out along a joint: a thin wet line, here and there a bead. */
export function squeezeOut(s: Sketch, line: readonly Point[], colour: string): void {
  s.line(
    line.map(([x, y]): Point => [x + s.between(-2, 2), y + s.between(-1, 4)]),
    colour,
    6,
    0.7,
  );
  for (const [x, y] of line) {
    if (s.draw() < 0.55) continue;
    const [at, size]: [Point, number] = [[x + s.between(-9, 9), y + s.between(0, 9)], s.between(3, 9)];
    s.spot(at[0] + 2, at[1] + 4, size * 1.5, '#000000', 0.5);
    s.fill(patch(s.draw, at, size, s.between(0.8, 1.8), 0.3), colour, 0.9);
    s.disc(at[0] - size * 0.3, at[1] - size * 0.4, size * 0.24, '#ffffff', 0.7);
  }
}

/** A steel rule laid along the work, marked in sixteenths. */
export function rule(s: Sketch, [x, y]: Point, length: number, turn: number): void {
  const [cos, sin] = [Math.cos((turn * Math.PI) / 180), Math.sin((turn * Math.PI) / 180)];
  const at = (along_: number, across: number): Point => [
    x + along_ * cos - across * sin,
    y + along_ * sin + across * cos,
  ];
  const body = [at(0, 0), at(length, 0), at(length, 62), at(0, 62)];
  s.soft(
    body.map(([px, py]): Point => [px + 8, py + 12]),
    '#000000',
    0.6,
    8,
  );
  s.fill(body, '#a9a79f');
  s.fade(body, at(0, 0), at(length, 20), [
    [0, '#f7f5ea', 0.7],
    [0.4, '#6d6a62', 0.4],
    [0.65, '#ffffff', 0.65],
    [1, '#55524b', 0.5],
  ]);
  for (let mark = 0; mark * 9 < length; mark += 1) {
    const tall = mark % 16 === 0 ? 34 : mark % 8 === 0 ? 26 : mark % 4 === 0 ? 19 : 11;
    s.line([at(mark * 9, 0), at(mark * 9, tall)], '#1b1a18', mark % 16 === 0 ? 3 : 2, 0.85);
  }
}
