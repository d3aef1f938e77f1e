/** Lots that come out alike for the same seed (the mulberry32 generator, in the public domain). */
export class Seeded {
  private state: number;

  constructor(seed: number) {
    this.state = seed >>> 0;
  }

  /** From 0 to below 1. */
  readonly next = (): number => {
    this.state = (this.state + 0x6d2b79f5) >>> 0;
    let mixed = this.state;
    mixed = Math.imul(mixed ^ (mixed >>> 15), mixed | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };

  /** A whole number from 0 to below `end`. */
  below(end: number): number {
    return Math.floor(this.next() * end);
  }

  chance(share: number): boolean {
    return this.next() < share;
  }

  pick<T>(list: readonly T[]): T {
    if (list.length === 0) throw new Error('There is nothing to pick from.');
    return list[this.below(list.length)]!;
  }

  /** One of the names, as often as their weights say. */
  weighted<Name extends string>(weights: Record<Name, number>): Name {
    const entries = Object.entries(weights) as [Name, number][];
    let left = this.next() * entries.reduce((sum, [, weight]) => sum + weight, 0);
    for (const [name, weight] of entries) if ((left -= weight) < 0) return name;
    return entries.at(-1)![0];
  }

  readonly bytes = (count: number): Uint8Array => Uint8Array.from({ length: count }, () => this.below(256));
}
