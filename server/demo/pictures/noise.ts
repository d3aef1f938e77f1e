const SIZE = 256;

/** Draws numbers from 0 to 1 that are the same for the same seed. */
export type Draw = () => number;

/** Mulberry32, begun by a hash (FNV-1a) of the seed's words. */
export function drawFrom(seed: string): Draw {
  let state = 0x811c9dc5;
  for (let at = 0; at < seed.length; at += 1) state = Math.imul(state ^ seed.charCodeAt(at), 0x01000193);
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

/** Smooth noise over a plane, 0 to 1, with one hill or hollow a unit; it repeats after 256. */
export class Noise {
  private readonly heights = new Float32Array(SIZE * SIZE);

  constructor(draw: Draw) {
    for (let at = 0; at < this.heights.length; at += 1) this.heights[at] = draw();
  }

  at(x: number, y: number): number {
    const [left, top] = [Math.floor(x), Math.floor(y)];
    const [across, down] = [ease(x - left), ease(y - top)];
    const [column, row] = [left & (SIZE - 1), (top & (SIZE - 1)) * SIZE];
    const [next, below] = [(column + 1) & (SIZE - 1), ((top + 1) & (SIZE - 1)) * SIZE];
    const { heights } = this;
    const upper = heights[row + column]! * (1 - across) + heights[row + next]! * across;
    const lower = heights[below + column]! * (1 - across) + heights[below + next]! * across;
    return upper * (1 - down) + lower * down;
  }

  /** Three sizes of hills over one another. */
  rough(x: number, y: number): number {
    return (
      (this.at(x, y) * 4 + this.at(x * 2.1 + 37, y * 2.1 + 11) * 2 + this.at(x * 4.3 + 71, y * 4.3 + 53)) / 7
    );
  }
}

function ease(t: number): number {
  return t * t * (3 - 2 * t);
}
