import { History, type Tally } from './history.ts';

// SIM_SEED=n runs one history again; SIM_HISTORIES=n sets how many there are.
const HISTORIES = Number(process.env.SIM_HISTORIES || 1000);
const STEPS = 40;
/** What is never answered is a fault too. */
const STUCK_AFTER_MS = 30_000;

/** This part's seeds of all that are to be run. */
export function seedsOf(part: number, parts: number): number[] {
  const one = process.env.SIM_SEED;
  const all = one ? [Number(one)] : Array.from({ length: HISTORIES }, (_, index) => index + 1);
  return all.filter((seed) => seed % parts === part);
}

/** Runs histories one after another; rejects with the seed and the last steps of the first that breaks. */
export async function runHistories(seeds: number[]): Promise<Tally> {
  const total: Tally = { held: 0, logged: 0, setAside: 0, looseEnds: 0, cuts: 0, restores: 0 };
  for (const seed of seeds) {
    const tally = await runHistory(seed);
    for (const name of Object.keys(total) as (keyof Tally)[]) total[name] += tally[name];
  }
  return total;
}

export async function runHistory(seed: number): Promise<Tally> {
  const history = new History(seed);
  let timer: NodeJS.Timeout | undefined;
  const stuck = new Promise<never>((_resolve, reject) => {
    timer = setTimeout(() => reject(new Error('nothing moves any more')), STUCK_AFTER_MS);
  });
  try {
    return await Promise.race([history.run(STEPS), stuck]);
  } catch (error) {
    const { steps } = history;
    const words = error instanceof Error ? error.message : String(error);
    const told = `SIM_SEED=${seed}: ${words} (step ${steps.length}, after ${steps.slice(-4).join(', ')})`;
    throw new Error(told, { cause: error });
  } finally {
    clearTimeout(timer);
  }
}
