import type { Sender } from '#tests/worlds/sender.ts';
import { startServer } from '#tests/worlds/server.ts';
import { BareInsert, type KeptBatch } from './bare-insert.ts';
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

/** Ten devices with 400 entries each through POST /api/sync, against the same op and entry rows inserted bare. */
export async function benchMerge(): Promise<MergeFindings> {
  const server = await startServer();
  const crew = await makeCrew(server, ['crew']);
  const bare = await BareInsert.open(server.databaseUrl);
  const trace = new SqlTrace(server.database);
  const apart: Pair[] = [];
  const together: Pair[] = [];
  let spendings: Spending[] = [];
  try {
    for (let round = 0; round < WARM_UPS + ROUNDS; round += 1) {
      if (round === WARM_UPS) spendings = [];
      apart.push(await oneByOne(crew, bare, trace, spendings));
      together.push(await allAtOnce(crew, bare));
    }
  } finally {
    await bare.close();
    await server.close();
  }
  const name = `${DEVICES} x ${OPS_A_DEVICE} entry ops`;
  return {
    findings: [
      { what: `${name}, one device after another`, pairs: apart.slice(WARM_UPS), goal: GOAL },
      { what: `${name}, all at once`, pairs: together.slice(WARM_UPS), goal: GOAL },
    ],
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

function readKept(crew: Crew, bare: BareInsert, { opIds, entryIds }: Batch): Promise<KeptBatch> {
  return bare.readKept(crew.shop.shopId, opIds, entryIds);
}

async function oneByOne(crew: Crew, bare: BareInsert, trace: SqlTrace, spendings: Spending[]): Promise<Pair> {
  const sum: Pair = { bareMs: 0, oursMs: 0 };
  for (const batch of makeBatches(crew)) {
    const send = await batch.ready();
    trace.clear();
    const startMs = performance.now();
    const came = await send();
    const endMs = performance.now();
    sum.oursMs += endMs - startMs;
    spendings.push(spendingOf(trace.queries, startMs, endMs));
    assertKept(came);
    const kept = await readKept(crew, bare, batch);
    sum.bareMs += await timed(() => bare.keep(kept));
  }
  return sum;
}

async function allAtOnce(crew: Crew, bare: BareInsert): Promise<Pair> {
  const batches = makeBatches(crew);
  const sends = await Promise.all(batches.map(({ ready }) => ready()));
  let came: Came[] = [];
  const oursMs = await timed(async () => (came = await Promise.all(sends.map((send) => send()))));
  came.forEach(assertKept);
  const kept = await Promise.all(batches.map((batch) => readKept(crew, bare, batch)));
  return { oursMs, bareMs: await timed(() => Promise.all(kept.map((batch) => bare.keep(batch)))) };
}

function assertKept(came: Came): void {
  const kept = answerIn(came).outcomes.filter(({ outcome }) => outcome === 'kept');
  if (kept.length !== OPS_A_DEVICE) throw new Error(`${kept.length} of ${OPS_A_DEVICE} ops were kept.`);
}
