import { expect, test } from 'vitest';
import { runHistories, seedsOf } from './histories.ts';

// The real phone code on IndexedDB against the real merge, through seeded histories of everything that can go wrong:
// lost and repeated requests, lost answers, power cut anywhere, wrong clocks, tabs, restores. The odd seeds.
const seeds = seedsOf(1, 2);

test.runIf(seeds.length > 0)(
  `nothing is lost, doubled or shown otherwise in ${seeds.length} histories`,
  async () => {
    const total = await runHistories(seeds);
    console.info(`${seeds.length} histories: ${JSON.stringify(total)}`);
    expect(total.logged).toBeGreaterThan(seeds.length);
  },
);
