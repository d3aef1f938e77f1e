import { bent, behind, dust, gloss, lamp, plank } from './pieces.ts';
import { bung, clamp, squeezeOut } from './fastenings.ts';
import { along, between, type Point, type Sketch } from './sketch.ts';
import { strokesOf } from './strokes.ts';
import type { Scene } from './hull-scenes.ts';
import type { Grain } from './wood.ts';

/** A patch let into a plank or the stem: other wood, a thin line of glue about it. */
export function gravingPiece(grain: Grain, piece: Grain, isGlued: boolean): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    const [upper, lower] = [bent(h * 0.14, h * 0.1, w, 20), bent(h * 0.88, h * 0.92, w, -20)];
    behind(s, '#2b2622');
    plank(s, () => -60, upper, grain, { near: 1.2 });
    plank(s, lower, () => h + 60, grain, { near: 1.2 });
    s.fill(
      between(
        (x) => upper(x) - 12,
        (x) => upper(x) + 6,
        -30,
        w + 30,
      ),
      '#0c0705',
    );
    s.shade(lower, 50, 0.8);
    plank(s, upper, lower, grain, { round: 0.7, near: 1.5 });
    const [x, y] = [w * s.between(0.28, 0.34), h * s.between(0.36, 0.42)];
    const skew = s.between(90, 170);
    const shape: Point[] = [
      [x + skew, y],
      [x + 720 + skew * 0.4, y + 16],
      [x + 640, y + 226],
      [x - 40, y + 206],
    ];
    s.line([...shape, shape[0]!], '#140904', 10, 0.4);
    s.board(shape, piece, { turn: 2, near: 1.4 });
    s.fade(
      shape,
      [x, y],
      [x, y + 270],
      [
        [0, '#fff3d8', 0.16],
        [1, '#000000', 0.16],
      ],
    );
    s.line([...shape, shape[0]!], isGlued ? '#3d2415' : '#0a0503', isGlued ? 4 : 8, 0.9);
    if (isGlued) {
      squeezeOut(s, sampled(shape), '#8a5f2c');
      clamp(s, x + s.between(240, 460), y + 130);
    } else dust(s, 90, '#e7c79c');
    lamp(s, 0.35, 0.2);
  };
}

function sampled(shape: readonly Point[]): Point[] {
  return shape.flatMap(([x, y], index) => {
    const [nx, ny] = shape[(index + 1) % shape.length]!;
    return Array.from({ length: 8 }, (_one, step): Point => [
      x + ((nx - x) * step) / 8,
      y + ((ny - y) * step) / 8,
    ]);
  });
}

/** A broad stern of three planks, curved at its top, a shed behind it. */
export function transom(grain: Grain, isGlossy: boolean, ghost: boolean): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    behind(s, '#2e2c29');
    const crown = bent(h * 0.3, h * 0.3, w, -h * 0.2);
    const edges = [
      crown,
      bent(h * 0.42, h * 0.42, w, -h * 0.04),
      bent(h * 0.7, h * 0.7, w, 10),
      bent(h * 1.03, h * 1.03, w, 30),
    ];
    for (let index = 0; index < 3; index += 1)
      plank(s, edges[index]!, edges[index + 1]!, grain, {
        seam: { colour: '#1a0d07', thick: 5 },
        round: 0.35,
        near: 1.2,
      });
    s.line(
      along((x) => crown(x) + 10, -30, w + 30),
      '#ffe6c0',
      9,
      0.3,
      4,
    );
    for (let x = 130; x < w; x += 190) bung(s, [x, crown(x) + 62], 18, grain);
    if (ghost) ghostLetters(s, h * 0.54);
    if (isGlossy) gloss(s, 0.2);
    lamp(s, 0.4, 0.3);
  };
}

/** Where letters were painted the wood has kept its colour. */
function ghostLetters(s: Sketch, y: number): void {
  for (const stroke of strokesOf('DUNLIN', [s.width * 0.2, y], 118)) {
    for (const thick of [24, 20, 15]) s.line(stroke, '#f6dcb4', thick, 0.14);
  }
}

/** A long scarf with its joint across the picture, under clamps. */
export function scarf(old: Grain, fresh: Grain, isClamped: boolean): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    behind(s, '#2a2521');
    const [upper, lower] = [bent(h * 0.3, h * 0.26, w, 10), bent(h * 0.68, h * 0.64, w, 10)];
    s.shade((x) => lower(x) - 4, 140, 0.95);
    plank(s, upper, lower, old, { round: 0.8, near: 1.5 });
    const [from, to] = [w * 0.22, w * 0.8];
    const joint = (x: number) => upper(from) + ((x - from) / (to - from)) * (lower(to) - upper(from));
    s.board(
      [
        [from, upper(from)],
        ...along(upper, from, w + 30),
        ...along(lower, to, w + 30).toReversed(),
        [to, lower(to)],
      ],
      fresh,
      { turn: -2, near: 1.5 },
    );
    s.shade(upper, 60, 0.2, false, '#fff4e0');
    s.shade(lower, -120, 0.5);
    s.line(along(joint, from, to), '#1d0f07', 5, 0.95);
    if (isClamped) {
      squeezeOut(s, along(joint, from + 30, to - 30), '#8a5f2c');
      for (const x of [w * 0.3, w * 0.64]) clamp(s, x, joint(x) + s.between(-40, 40));
    }
    lamp(s, 0.5, 0.2);
  };
}
