import { bent, dust, lamp, plank } from './pieces.ts';
import { hole, head } from './fastenings.ts';
import { patch, rectangle, type Edge, type Point, type Sketch } from './sketch.ts';
import { inner } from './frame-scenes.ts';
import type { Scene } from './hull-scenes.ts';
import type { Grain } from './wood.ts';

/** Down into the bilge: planks to either side of the keelson, floors across, muck or paint. */
export function bilge(planks: Grain, timbers: Grain, state: 'mucky' | 'clean' | 'painted'): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    const far = h * 0.16;
    for (let index = 0; index < 6; index += 1) {
      const edge = (t: number) => bent(w * t, w * (0.36 + 0.28 * t), h, 0);
      plank(
        s,
        (y) => edge(index / 6)(h - y),
        (y) => edge((index + 1) / 6)(h - y),
        planks,
        { isStanding: true, seam: { colour: '#130c08', thick: 4 }, round: 0.4 },
      );
    }
    s.glow(w * 0.5, h * 0.62, w * 0.7, [
      [0, '#000000', 0.5],
      [0.35, '#000000', 0.3],
      [1, '#000000', 0],
    ]);
    if (state === 'mucky') muck(s);
    const keelson: [Edge, Edge] = [(y) => w * 0.47 - (y - far) * 0.05, (y) => w * 0.53 + (y - far) * 0.05];
    s.shade(keelson[1], 70, 0.9, true);
    plank(s, keelson[0], keelson[1], timbers, { isStanding: true, round: 0.8 });
    for (const t of [0.22, 0.45, 0.8]) {
      const [y, thick] = [h * t, h * (0.05 + t * 0.1)];
      const [upper, lower] = [bent(y, y + 8, w, h * 0.06), bent(y + thick, y + thick + 8, w, h * 0.06)];
      s.shade((x) => lower(x) - 4, thick * 0.9, 0.95);
      plank(s, upper, lower, timbers, { round: 0.85 });
      for (const x of [w * 0.3, w * 0.7])
        head(s, [x, (upper(x) + lower(x)) / 2], 13 + t * 18, state === 'painted' ? '#7a3d2c' : '#6f5a3a');
    }
    lamp(s, 0.5, 0.05);
  };
}

function muck(s: Sketch): void {
  const { width: w, height: h } = s;
  for (let lump = 0; lump < 60; lump += 1) {
    const at: Point = [w * s.between(0.2, 0.8), h * s.between(0.3, 1)];
    s.spot(
      at[0],
      at[1],
      s.between(30, 120),
      s.draw() < 0.6 ? '#15110c' : '#2e2416',
      s.between(0.4, 0.85),
      s.between(0.3, 0.7),
    );
  }
  s.soft(patch(s.draw, [w * 0.62, h * 0.66], 190, 0.35, 0.4), '#9fb0b4', 0.28, 12);
  dust(s, 160, '#8c7a5a');
}

/** Two bearers for an engine, bolt holes and oil in the wood. */
export function engineBed(grain: Grain): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    inner(s, 'aged', 4);
    s.glow(w * 0.5, h * 0.9, w * 0.6, [
      [0, '#050302', 0.7],
      [1, '#050302', 0],
    ]);
    for (const top of [0.2, 0.6]) {
      const [upper, lower] = [
        bent(h * top, h * (top - 0.05), w, 6),
        bent(h * (top + 0.2), h * (top + 0.17), w, 6),
      ];
      s.shade((x) => lower(x) - 4, 130, 0.95);
      plank(s, upper, lower, grain, { round: 0.9, near: 1.5 });
      for (const x of [w * 0.18, w * 0.44, w * 0.74]) {
        const y = (upper(x) + lower(x)) / 2;
        s.spot(x + 20, y + 20, s.between(90, 190), '#0d0805', 0.75, 0.7);
        hole(s, [x, y], 24);
      }
    }
    lamp(s, 0.4, 0.1);
  };
}

/** Sole panels lifted: what lies under them seen through the openings. */
export function soleLifted(panel: Grain, under: Grain): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    for (let index = 0; index < 4; index += 1)
      plank(
        s,
        bent((h * index) / 4 - 30, (h * index) / 4 - 10, w, 0),
        bent((h * (index + 1)) / 4 - 30, (h * (index + 1)) / 4 - 10, w, 0),
        panel,
        { seam: { colour: '#0e0906', thick: 8 }, round: 0.3 },
      );
    const open = rectangle(w * 0.2, h * 0.2, w * 0.62, h * 0.62);
    s.fill(open, '#080504');
    for (let plankAt = 0; plankAt < 4; plankAt += 1) {
      const part = rectangle(w * 0.2, h * (0.25 + 0.15 * plankAt), w * 0.62, h * 0.13);
      s.board(part, under, { turn: 0 });
      s.fade(
        part,
        [0, h * (0.25 + 0.15 * plankAt)],
        [0, h * (0.38 + 0.15 * plankAt)],
        [
          [0, '#000000', 0.35],
          [1, '#000000', 0.7],
        ],
      );
    }
    for (const x of [0.34, 0.62]) {
      const bearer = rectangle(w * x, h * 0.2, w * 0.075, h * 0.62);
      s.soft(
        bearer.map(([a, b]): Point => [a + 60, b]),
        '#000000',
        0.7,
        26,
      );
      s.board(bearer, 'oldOak', { turn: 90 });
      s.fade(
        bearer,
        [w * x, 0],
        [w * (x + 0.075), 0],
        [
          [0, '#fff0d8', 0.16],
          [0.5, '#000000', 0],
          [1, '#000000', 0.55],
        ],
      );
    }
    s.fade(
      open,
      [0, h * 0.2],
      [0, h * 0.36],
      [
        [0, '#000000', 0.92],
        [1, '#000000', 0],
      ],
    );
    s.fade(
      open,
      [w * 0.2, 0],
      [w * 0.28, 0],
      [
        [0, '#000000', 0.8],
        [1, '#000000', 0],
      ],
    );
    s.line([...open, open[0]!], '#e8c79a', 4, 0.5);
    dust(s, 80, '#c9b18a');
    lamp(s, 0.3, 0.15);
  };
}
