/** The same work done by the bare means and by ours, one right after the other, in milliseconds. */
export interface Pair {
  bareMs: number;
  oursMs: number;
}

export interface Finding {
  what: string;
  pairs: Pair[];
  /** at most how many times the bare one ours is to take */
  goal: number;
}

/** What is measured by itself, in a unit of its own; met where the median is at most the goal. */
export interface Figure {
  what: string;
  unit: string;
  values: number[];
  goal: number;
}

export function median(values: number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
}

/** How long `work` takes, in milliseconds. */
export async function timed(work: () => unknown): Promise<number> {
  const startedMs = performance.now();
  await work();
  return performance.now() - startedMs;
}
