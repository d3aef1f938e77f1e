/** What one bench found: the same work by the bare means and by ours, in milliseconds. */
export interface Finding {
  what: string;
  bareMs: number;
  oursMs: number;
  /** at most how many times the bare one ours is to take; null where no goal was set */
  goal: number | null;
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
