import { bent, behind, lamp, plank, rot } from './pieces.ts';
import { bung, hole, head, rove, rule } from './fastenings.ts';
import { along, between, patch, rectangle, type Point, type Sketch } from './sketch.ts';
import type { Grain } from './wood.ts';

/** Draws one picture. */
export type Scene = (s: Sketch) => void;

interface Planking {
  grain: Grain;
  seam: string;
  count: number;
  bungs?: Grain | 'holes' | 'heads';
  isProud?: boolean;
}

/** The outside of a carvel hull, planks running a little downhill. */
function planked(
  s: Sketch,
  { grain, seam, count, bungs, isProud = false }: Planking,
): ((x: number) => number)[] {
  const tilt = s.between(-70, 70);
  const bend = s.between(-50, 50);
  const edges = Array.from({ length: count + 1 }, (_one, index) => {
    const y = -60 + ((s.height + 120) * index) / count;
    return bent(y - tilt, y + tilt + index * 9, s.width, bend);
  });
  for (let index = 0; index < count; index += 1)
    plank(s, edges[index]!, edges[index + 1]!, grain, { seam: { colour: seam, thick: s.between(4, 8) } });
  if (bungs) fasten(s, edges, bungs, isProud);
  return edges;
}

function fasten(
  s: Sketch,
  edges: ((x: number) => number)[],
  with_: Grain | 'holes' | 'heads',
  isProud: boolean,
): void {
  for (let x = s.between(120, 300); x < s.width; x += 470) {
    for (let index = 0; index + 1 < edges.length; index += 1) {
      const [upper, lower] = [edges[index]!(x), edges[index + 1]!(x)];
      for (const part of [0.24, 0.76]) {
        const at: Point = [x + s.between(-14, 14), upper + (lower - upper) * part];
        if (with_ === 'holes') hole(s, at, 13);
        else if (with_ === 'heads') head(s, at, 17, '#8a6a35', true);
        else bung(s, at, 21, with_, isProud);
      }
    }
  }
}

export function sidePlanking(look: Planking): Scene {
  return (s) => {
    planked(s, look);
    lamp(s, s.between(0.2, 0.5), s.between(0.05, 0.3));
  };
}

export function rotInPlank(look: Planking, size: number, isMeasured: boolean): Scene {
  return (s) => {
    const edges = planked(s, look);
    const x = s.width * s.between(0.42, 0.6);
    const middle = Math.floor(edges.length / 2);
    const y = edges[middle]!(x) - 20;
    rot(s, [x, y], size, 0.45);
    if (isMeasured) rule(s, [x - size * 1.7, y + size * 0.8], size * 3.2, s.between(-4, 4));
    lamp(s, 0.45, 0.3);
  };
}

/** Paint come away from planks, bare wood under it. */
export function peeling(paint: Grain, wood: Grain): Scene {
  return (s) => {
    planked(s, { grain: paint, seam: '#3c3a36', count: 4 });
    for (let flake = 0; flake < 15; flake += 1) {
      const at: Point = [s.between(0, s.width), s.between(0, s.height)];
      const radius = s.between(20, 130);
      const outline = patch(s.draw, at, radius, s.between(0.25, 0.6), 0.9);
      s.board(outline, wood, { near: 0.9 });
      s.line([...outline, outline[0]!], '#000000', 6, 0.35);
      s.line(outline.slice(12, 26), '#ffffff', 3, 0.7);
    }
    for (let crack = 0; crack < 22; crack += 1) {
      const [x, y] = [s.between(0, s.width), s.between(0, s.height)];
      s.line(
        [
          [x, y],
          [x + s.between(20, 60), y + s.between(-9, 9)],
          [x + s.between(70, 190), y + s.between(-18, 18)],
        ],
        '#2c2925',
        2,
        0.5,
      );
    }
    lamp(s, 0.3, 0.2);
  };
}

/** Laps of a clinker hull, each throwing its shadow on the next, with a row of rivets. */
export function laps(grain: Grain, count: number, missing = 0): Scene {
  return (s) => {
    const [tilt, bend] = [s.between(-60, 60), s.between(-70, 70)];
    const edge = (index: number) => {
      const y = -70 + ((s.height + 140) * index) / count;
      return bent(y - tilt, y + tilt, s.width, bend);
    };
    for (let index = count - 1; index >= 0; index -= 1) {
      const [upper, lower] = [edge(index), edge(index + 1)];
      plank(s, upper, (x) => lower(x) + 6, grain, { round: 0.75, near: 1.1 });
      s.shade((x) => lower(x) + 3, 62, 0.95);
      s.line(along(lower, -30, s.width + 30), '#ffeed2', 4, 0.35);
      let gap = 0;
      for (let x = s.between(10, 90); x < s.width; x += 118) {
        gap += 1;
        const at: Point = [x, lower(x) - 44];
        if (missing > 0 && index === 1 && (gap === 6 || gap === 7)) hole(s, at, 9);
        else head(s, at, 12, '#8c5234');
      }
    }
    lamp(s, 0.4, 0.1);
  };
}

/** Roves over the rivets along a rib, from within. */
export function rovesOnRib(wood: Grain, rib: Grain): Scene {
  return (s) => {
    planked(s, { grain: wood, seam: '#20140d', count: 4 });
    const x = s.width * 0.46;
    const [left, right] = [bent(x - 120, x - 90, s.height, 30), bent(x + 120, x + 150, s.height, 30)];
    s.shade((y) => right(y) - 6, 90, 0.95, true);
    plank(s, left, right, rib, { isStanding: true, round: 0.9, near: 1.3 });
    for (let y = s.between(60, 140); y < s.height; y += 150)
      rove(s, [left(y) + 120 + s.between(-8, 8), y], 30);
    lamp(s, 0.25, 0.3);
  };
}

/** The keel of a boat turned over, garboards coming down on either side. */
export function keel(grain: Grain, garboard: Grain, bolts: 'in' | 'out'): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    const [upper, lower] = [bent(h * 0.4, h * 0.36, w, 14), bent(h * 0.62, h * 0.66, w, -8)];
    plank(s, bent(-40, -80, w, 0), bent(h * 0.17, h * 0.12, w, 8), garboard, {
      seam: { colour: '#140d09', thick: 6 },
    });
    plank(s, bent(h * 0.17, h * 0.12, w, 8), upper, garboard, { round: 0.8 });
    plank(s, lower, bent(h * 0.86, h * 0.94, w, 0), garboard, { seam: { colour: '#140d09', thick: 6 } });
    plank(s, bent(h * 0.86, h * 0.94, w, 0), bent(h * 1.1, h * 1.2, w, 0), garboard);
    s.shade(lower, 100, 0.95);
    s.shade(upper, -40, 0.7);
    plank(s, upper, lower, grain, { round: 1, near: 1.4 });
    for (let x = s.between(120, 240); x < w; x += 420) {
      const at: Point = [x, (upper(x) + lower(x)) / 2 + s.between(-12, 12)];
      if (bolts === 'in') head(s, at, 46, '#4f4a41');
      else hole(s, at, 30);
      s.spot(at[0], at[1] + 34, 120, '#2c1308', 0.5, 0.7);
    }
    lamp(s, 0.5, 0.2);
  };
}

/** A long seam dug out, the old compound beside it. */
export function dugSeam(grain: Grain): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    const seam = bent(h * 0.5, h * 0.42, w, 20);
    plank(
      s,
      () => -40,
      (x) => seam(x) - 15,
      grain,
      { near: 1.3 },
    );
    plank(
      s,
      (x) => seam(x) + 15,
      () => h + 40,
      grain,
      { near: 1.3 },
    );
    s.fill(
      between(
        (x) => seam(x) - 16,
        (x) => seam(x) + 16,
        -30,
        w + 30,
      ),
      '#0b0604',
    );
    s.line(
      along((x) => seam(x) + 15, -30, w + 30),
      '#f3cf9f',
      4,
      0.45,
    );
    for (let crumb = 0; crumb < 90; crumb += 1) {
      const x = s.between(0, w);
      s.fill(
        patch(s.draw, [x, seam(x) + s.between(18, 150)], s.between(4, 17), 0.6, 1),
        s.draw() < 0.6 ? '#3c3b39' : '#7b7468',
        0.95,
      );
    }
    lamp(s, 0.6, 0.2);
  };
}

/** Along a hull from near by: planks run together towards her far end, shed or yard above and floor below. */
export function alongHull(
  side: Grain,
  bottom: Grain,
  look: 'carvel' | 'lapped' | 'turned over',
  wall: string,
): Scene {
  return (s) => {
    const { width: w, height: h } = s;
    behind(s, wall);
    s.soft(rectangle(w * 0.66, h * 0.02, w * 0.2, h * 0.2), '#e8edee', 0.7, 26);
    s.fill(rectangle(0, h * 0.7, w, h * 0.4), '#6a6257');
    s.fade(
      rectangle(0, h * 0.7, w, h * 0.3),
      [0, h * 0.7],
      [0, h],
      [
        [0, '#15120f', 0.85],
        [1, '#15120f', 0.2],
      ],
    );
    const count = 7;
    const far = h * s.between(0.4, 0.46);
    const edge = (index: number) => {
      const t = index / count;
      return bent(h * (0.02 + 0.98 * t), far + h * (0.02 + 0.2 * t), w, h * (0.1 - 0.16 * t));
    };
    s.shade(edge(count), 150, 0.95);
    const isLapped = look !== 'carvel';
    for (let index = count - 1; index >= 0; index -= 1) {
      const [upper, lower] = [edge(index), edge(index + 1)];
      plank(s, upper, lower, index > 4 ? bottom : side, {
        round: isLapped ? 0.7 : 0.3,
        near: 1.05,
        ...(isLapped ? {} : { seam: { colour: '#120b07', thick: 4 } }),
      });
      if (isLapped) s.shade((x) => lower(x) - 2, 34, 0.9);
      s.fill(
        between(upper, lower, -30, w + 30),
        '#05070a',
        0.05 + (look === 'turned over' ? 0.075 : 0.06) * index,
      );
    }
    const top = edge(0);
    s.board(
      between((x) => top(x) - 44 + x * 0.016, top, -30, w + 30),
      look === 'turned over' ? 'oldOak' : 'mahogany',
      { turn: 20 },
    );
    s.line(
      along((x) => top(x) - 42 + x * 0.016, -30, w + 30),
      '#fff0d6',
      5,
      0.5,
    );
    s.shade(top, 26, 0.7);
    lamp(s, 0.3, 0.2);
  };
}
