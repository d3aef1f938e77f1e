import type { TracedQuery } from './sql-trace.ts';

/** Where the time of one sync went, in milliseconds, by what it went into. */
export type Spending = Map<string, number>;

/** What the process does of itself is told apart by the statements between which it does it. */
const STAGES = [
  { name: 'request in, parsed, each op read', until: /FROM ops/ },
  { name: 'judged and reduced; text of ops', until: /INSERT INTO ops/ },
  { name: 'text of rows', until: /INSERT INTO entries/ },
  { name: 'between the statements after that', until: /FROM boats.*UNION ALL/s },
] as const;
const ANSWER = 'answer written, zipped, sent';

function kindOf(sql: string): string {
  if (/^\s*(INSERT|UPDATE)/.test(sql)) return 'SQL write';
  if (/^\s*COMMIT/.test(sql)) return 'SQL commit';
  return /set_config|^\s*(START|BEGIN|SET)/.test(sql) ? 'SQL begin' : 'SQL read';
}

/** Splits the time from `startMs` to `endMs` of one sync that was alone. */
export function spendingOf(queries: TracedQuery[], startMs: number, endMs: number): Spending {
  const spending: Spending = new Map();
  const spend = (name: string, ms: number) => spending.set(name, (spending.get(name) ?? 0) + ms);
  let atMs = startMs;
  let stage = 0;
  for (const query of queries) {
    spend(STAGES[stage]?.name ?? ANSWER, query.startMs - atMs);
    if (STAGES[stage]?.until.test(query.sql)) stage += 1;
    spend(kindOf(query.sql), query.endMs - query.startMs);
    atMs = query.endMs;
  }
  spend(ANSWER, endMs - atMs);
  return spending;
}

export function sumSpending(all: Spending[]): Spending {
  const sum: Spending = new Map();
  for (const one of all) for (const [name, ms] of one) sum.set(name, (sum.get(name) ?? 0) + ms);
  return sum;
}
