import type { Sender } from '#tests/worlds/sender.ts';
import { startServer } from '#tests/worlds/server.ts';
import { BareInsert } from './bare-insert.ts';
import { DEVICES, bodyOf, entryOps, latestCursor, makeCrew, postSync, type Crew } from './crew.ts';
import { timed, type Finding, type Pair } from './measuring.ts';
import { SqlTrace } from './sql-trace.ts';
import { spendingOf, sumSpending, type Spending } from './sync-spending.ts';
import { answerIn, type Came } from './wire.ts';

const OPS_A_DEVICE = 400;
const WARM_UPS = 2;
const ROUNDS = 6;
const ROUND_GAP_MS = 1000;
const GOAL = 2;

/** What a phone sends in a round. */
interface Batch {
  opIds: string[];
  entryIds: string[];
  /** gets the request ready, then sends it */
  ready: () => Promise<() => Promise<Came>>;
}

export interface MergeFindings {
  findings: Finding[];
  /** where the time of one device's sync goes, one device after another: the mean of all rounds */
  spending: Spending;
}

/** What the merge is measured against, each by what it is called. */
type Bares = Map<string, BareInsert>;

/** One way of sending a round: how long ours took, and each bare one with the same rows. */
interface Round {
  oursMs: number;
  bareMs: Map<string, number>;
}

/**
 * Ten devices with 400 entries each through POST /api/sync, against the same op and entry rows inserted bare: into
 * tables without foreign keys, and into tables with the product's own.
 */
export async function benchMerge(): Promise<MergeFindings> {
  const server = await startServer();
  const crew = await makeCrew(server, ['crew']);
  const bares: Bares = new Map([
    ['bare rows', await BareInsert.open(server.databaseUrl, { prefix: 'bare', hasForeignKeys: false })],
    ['bare rows with foreign keys', await BareInsert.open(server.databaseUrl, { prefix: 'linked', hasForeignKeys: true })],
  ]);
  const trace = new SqlTrace(server.database);
  const apart: Round[] = [];
  const together: Round[] = [];
  let spendings: Spending[] = [];
  try {
    for (let round = 0; round < WARM_UPS + ROUNDS; round += 1) {
      if (round === WARM_UPS) spendings = [];
      apart.push(await oneByOne(crew, bares, trace, spendings));
      together.push(await allAtOnce(crew, bares));
    }
  } finally {
    for (const bare of bares.values()) await bare.close();
    await server.close();
  }
  const name = `${DEVICES} x ${OPS_A_DEVICE} entry ops`;
  return {
    findings: [...bares.keys()].flatMap((bare) => [
      { what: `${name}, one device after another / ${bare}`, pairs: pairsOf(apart, bare), goal: GOAL },
      { what: `${name}, all at once / ${bare}`, pairs: pairsOf(together, bare), goal: GOAL },
    ]),
    spending: new Map([...sumSpending(spendings)].map(([part, ms]) => [part, ms / spendings.length])),
  };
}

function makeBatches(crew: Crew): Batch[] {
  crew.server.clock.advance(ROUND_GAP_MS);
  return crew.hands.map((hand) => makeBatch(crew, hand));
}

function makeBatch(crew: Crew, hand: Sender): Batch {
  const ops = entryOps(hand, crew, OPS_A_DEVICE);
  return {
    opIds: ops.map(({ id }) => id),
    entryIds: ops.map(({ data }) => data.entryId as string),
    // the phone was in signal until a moment ago: the answer brings its own entries back, and what others sent meanwhile
    ready: async () => {
      const body = bodyOf(crew, hand, { ops, cursor: await latestCursor(crew, hand) });
      return () => postSync(crew, hand, body);
    },
  };
}

function pairsOf(rounds: Round[], bare: string): Pair[] {
  return rounds.slice(WARM_UPS).map(({ oursMs, bareMs }) => ({ oursMs, bareMs: bareMs.get(bare)! }));
}

async function oneByOne(crew: Crew, bares: Bares, trace: SqlTrace, spendings: Spending[]): Promise<Round> {
  const sum: Round = { oursMs: 0, bareMs: new Map() };
  for (const batch of makeBatches(crew)) {
    const send = await batch.ready();
    trace.clear();
    const startMs = performance.now();
    const came = await send();
    const endMs = performance.now();
    sum.oursMs += endMs - startMs;
    spendings.push(spendingOf(trace.queries, startMs, endMs));
    assertKept(came);
    for (const [name, bareMs] of await timeBares(crew, bares, [batch])) {
      sum.bareMs.set(name, (sum.bareMs.get(name) ?? 0) + bareMs);
    }
  }
  return sum;
}

async function allAtOnce(crew: Crew, bares: Bares): Promise<Round> {
  const batches = makeBatches(crew);
  const sends = await Promise.all(batches.map(({ ready }) => ready()));
  let came: Came[] = [];
  const oursMs = await timed(async () => (came = await Promise.all(sends.map((send) => send()))));
  came.forEach(assertKept);
  return { oursMs, bareMs: await timeBares(crew, bares, batches) };
}

async function timeBares({ shop }: Crew, bares: Bares, batches: Batch[]): Promise<Map<string, number>> {
  const times = new Map<string, number>();
  for (const [name, bare] of bares) {
    const kept = await Promise.all(batches.map(({ opIds, entryIds }) => bare.readKept(shop.shopId, opIds, entryIds)));
    times.set(name, await timed(() => Promise.all(kept.map((batch) => bare.keep(batch)))));
  }
  return times;
}

function assertKept(came: Came): void {
  const kept = answerIn(came).outcomes.filter(({ outcome }) => outcome === 'kept');
  if (kept.length !== OPS_A_DEVICE) throw new Error(`${kept.length} of ${OPS_A_DEVICE} ops were kept.`);
}
