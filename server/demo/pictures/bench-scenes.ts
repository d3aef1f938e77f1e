import { bent, behind, lamp, plank } from './pieces.ts';
import { head, rule } from './fastenings.ts';
import { between, patch, rectangle, type Point, type Sketch } from './sketch.ts';
import { strokesOf } from './strokes.ts';
import type { Scene } from './hull-scenes.ts';
import type { Grain } from './wood.ts';

/** Pieces of one plank under two stains, side by side. */
export function testPieces(base: Grain, one: Grain, other: Grain): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    plank(
      s,
      () => -40,
      () => h + 40,
      'fir',
      { round: 0, near: 1.6 },
    );
    for (const [index, grain] of [base, one, other].entries()) {
      const [left, top] = [w * (0.08 + index * 0.29), h * (0.16 + s.between(-0.02, 0.03))];
      const piece: Point[] = [
        [left, top],
        [left + w * 0.25, top + s.between(-12, 12)],
        [left + w * 0.25 + 8, top + h * 0.66],
        [left + 6, top + h * 0.66 + s.between(-8, 8)],
      ];
      s.soft(
        piece.map(([x, y]): Point => [x + 16, y + 22]),
        '#000000',
        0.65,
        12,
      );
      s.board(piece, grain, { turn: 90, near: 1.1 });
      s.line([piece[3]!, piece[0]!, piece[1]!], '#fff0d6', 5, 0.35);
      s.line([piece[1]!, piece[2]!, piece[3]!], '#000000', 6, 0.5);
    }
    lamp(s, 0.4, 0.2);
  };
}

/** Fastenings drawn and laid out in a row on a board, some of them wasted. */
export function samples(count: number, failed: number): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    plank(
      s,
      () => -40,
      () => h + 40,
      'fir',
      { round: 0, near: 1.8 },
    );
    for (let index = 0; index < count; index += 1) {
      const x = w * (0.12 + (0.78 * index) / (count - 1));
      screw(s, [x, h * 0.24 + s.between(-14, 14)], h * s.between(0.34, 0.38), index >= count - failed);
      s.fill(rectangle(x - 42, h * 0.72, 84, 54), '#e8ddb8', 0.92);
      s.line(
        [
          [x - 26, h * 0.745],
          [x - 8, h * 0.74],
          [x + 10, h * 0.75],
          [x + 24, h * 0.742],
        ],
        '#2a2a33',
        4,
        0.75,
      );
      s.line(
        [
          [x - 22, h * 0.76],
          [x + 14, h * 0.757],
        ],
        '#2a2a33',
        3,
        0.6,
      );
    }
    lamp(s, 0.4, 0.2);
  };
}

function screw(s: Sketch, [x, y]: Point, length: number, isWasted: boolean): void {
  const metal = isWasted ? '#b06a55' : '#8f7440';
  const half = (t: number) =>
    (t < 0.45 ? 15 : 15 * (1 - (t - 0.45) * 1.3)) * (isWasted ? 0.55 + 0.45 * Math.abs(t - 0.5) * 1.8 : 1);
  const end = isWasted ? 0.72 : 1;
  const ts = Array.from({ length: 17 }, (_one, step) => (end * step) / 16);
  const outline: Point[] = [
    ...ts.map((t): Point => [x - half(t) - s.between(0, isWasted ? 3 : 0), y + t * length]),
    ...ts.toReversed().map((t): Point => [x + half(t), y + t * length]),
  ];
  s.soft(
    outline.map(([a, b]): Point => [a + 14, b + 10]),
    '#000000',
    0.6,
    8,
  );
  s.fill(outline, metal);
  s.fade(
    outline,
    [x - 16, y],
    [x + 16, y],
    [
      [0, '#fff1d0', 0.35],
      [0.35, '#fff1d0', 0.15],
      [0.6, '#000000', 0.15],
      [1, '#000000', 0.7],
    ],
  );
  for (let t = 0.4; t < end; t += 0.035)
    s.line(
      [
        [x - half(t) - 3, y + t * length],
        [x + half(t) + 3, y + t * length + 7],
      ],
      '#2a1c10',
      3,
      0.7,
    );
  head(s, [x, y], 34, metal, true);
}

/** A bolt drawn from a keel, thin where the water stood. */
export function wastedBolt(): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    plank(
      s,
      () => -40,
      () => h + 40,
      'grey',
      { round: 0, near: 1.6 },
    );
    for (const [row, waist] of [
      [0.34, 0.42],
      [0.64, 0.62],
    ] as const) {
      const [y, from, to] = [h * row, w * 0.16, w * 0.86];
      const half = (x: number) => 44 * (1 - waist * Math.exp(-(((x - w * 0.5) / 190) ** 2)));
      const outline = between(
        (x) => y - half(x) + s.between(-3, 3),
        (x) => y + half(x) + s.between(-3, 3),
        from,
        to,
      );
      s.soft(
        outline.map(([a, b]): Point => [a + 16, b + 30]),
        '#000000',
        0.7,
        12,
      );
      s.fill(outline, '#5d4130');
      s.fade(
        outline,
        [0, y - 46],
        [0, y + 46],
        [
          [0, '#f0cfa6', 0.45],
          [0.3, '#8a5a3c', 0.2],
          [0.65, '#000000', 0.3],
          [1, '#000000', 0.8],
        ],
      );
      for (let pit = 0; pit < 90; pit += 1) {
        const x = w * s.between(0.2, 0.84);
        s.spot(
          x,
          y + s.between(-0.9, 0.9) * half(x),
          s.between(3, 13),
          s.draw() < 0.5 ? '#1c0f08' : '#a4623a',
          0.6,
          0.7,
        );
      }
      head(s, [from, y], 72, '#4c382b');
    }
    rule(s, [w * 0.2, h * 0.82], 900, -1);
    lamp(s, 0.4, 0.2);
  };
}

/** A number cut into wood long ago. */
export function mark(text: string, grain: Grain): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    plank(s, bent(h * -0.1, h * -0.06, w, 0), bent(h * 0.88, h * 0.92, w, 0), grain, {
      near: 2,
      round: 0.4,
      seam: { colour: '#120b07', thick: 9 },
    });
    plank(s, bent(h * 0.88, h * 0.92, w, 0), () => h * 1.2, grain, { near: 2 });
    const tall = (w * 0.78) / text.length;
    for (const stroke of strokesOf(text, [w * 0.13, h * 0.36], tall)) {
      const worn = stroke.map(([x, y]): Point => [x + s.between(-3, 3), y + s.between(-3, 3)]);
      s.line(
        worn.map(([x, y]): Point => [x + 4, y + 6]),
        '#ffe2b6',
        15,
        0.32,
      );
      s.line(worn, '#000000', 19, 0.28);
      s.line(worn, '#120805', 12, 0.86);
    }
    s.soft(patch(s.draw, [w * 0.74, h * 0.62], 190, 0.6, 0.5), '#e9d9bb', 0.1, 40);
    lamp(s, 0.2, 0.2);
  };
}

/** Hatches laid on trestles to be varnished. */
export function hatches(grain: Grain): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    behind(s, '#57524a');
    for (const beam of [0.2, 0.36, 0.7, 0.84]) {
      s.shade((y) => w * beam + 74 + y * 0.02, 60, 0.8, true);
      plank(
        s,
        (y) => w * beam + y * 0.02,
        (y) => w * beam + 78 + y * 0.02,
        'fir',
        { isStanding: true, round: 0.7 },
      );
    }
    for (const [x, y] of [
      [0.06, 0.08],
      [0.54, 0.16],
      [0.2, 0.58],
    ] as const) {
      const [left, top, wide, tall] = [w * x, h * y, w * 0.42, h * 0.36];
      s.soft(rectangle(left + 30, top + 50, wide, tall), '#000000', 0.7, 26);
      for (let board = 0; board < 4; board += 1) {
        const piece = rectangle(left, top + (tall * board) / 4, wide, tall / 4);
        s.board(piece, grain, { turn: 0 });
        s.fade(
          piece,
          [0, top + (tall * board) / 4],
          [0, top + (tall * (board + 1)) / 4],
          [
            [0, '#fff2da', 0.14],
            [0.9, '#000000', 0.05],
            [1, '#000000', 0.6],
          ],
        );
      }
      for (const end of [left, left + wide - 64]) {
        s.board(rectangle(end, top, 64, tall), grain, { turn: 90 });
        s.line(
          [
            [end, top],
            [end, top + tall],
          ],
          '#170a04',
          3,
          0.7,
        );
        s.line(
          [
            [end + 64, top],
            [end + 64, top + tall],
          ],
          '#170a04',
          3,
          0.7,
        );
      }
      s.soft(
        [
          [left + wide * 0.3, top],
          [left + wide * 0.5, top],
          [left + wide * 0.36, top + tall],
          [left + wide * 0.12, top + tall],
        ],
        '#ffffff',
        0.2,
        12,
      );
    }
    lamp(s, 0.5, 0.1);
  };
}
