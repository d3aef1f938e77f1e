import type { Sender } from '#tests/worlds/sender.ts';
import { startServer } from '#tests/worlds/server.ts';
import { BareInsert, type KeptBatch } from './bare-insert.ts';
import { DEVICES, bodyOf, entryOps, latestCursor, makeCrew, postSync, type Crew } from './crew.ts';
import { median, timed, type Finding } from './measuring.ts';
import { SqlTrace } from './sql-trace.ts';
import { spendingOf, sumSpending, type Spending } from './sync-spending.ts';
import { answerIn, type Came } from './wire.ts';

const OPS_A_DEVICE = 400;
const WARM_UPS = 2;
const ROUNDS = 5;
const ROUND_GAP_MS = 1000;
const GOAL = 2;

interface Round {
  oursMs: number;
  bareMs: number;
  spending: Spending;
}

interface Posted {
  oursMs: number;
  spending: Spending;
}

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
  const trace = new SqlTrace(server.database);
  const bare = await BareInsert.open(server.databaseUrl);
  const apart: Round[] = [];
  const together: Round[] = [];
  try {
    for (let round = 0; round < WARM_UPS + ROUNDS; round += 1) {
      apart.push(await runRound(crew, bare, (batches) => oneByOne(batches, trace), keepOneByOne));
      together.push(await runRound(crew, bare, allAtOnce, keepAllAtOnce));
    }
  } finally {
    await bare.close();
    await server.close();
  }
  const rounds = apart.slice(WARM_UPS);
  const name = `${DEVICES} x ${OPS_A_DEVICE} entry ops`;
  return {
    findings: [finding(`${name}, one device after another`, rounds), finding(`${name}, all at once`, together.slice(WARM_UPS))],
    spending: new Map([...sumSpending(rounds.map(({ spending }) => spending))].map(([part, ms]) => [part, ms / rounds.length / DEVICES])),
  };
}

function finding(what: string, rounds: Round[]): Finding {
  return { what, bareMs: median(rounds.map(({ bareMs }) => bareMs)), oursMs: median(rounds.map(({ oursMs }) => oursMs)), goal: GOAL };
}

async function runRound(
  crew: Crew,
  bare: BareInsert,
  ours: (batches: Batch[]) => Promise<Posted>,
  theirs: (bare: BareInsert, kept: KeptBatch[]) => Promise<void>,
): Promise<Round> {
  crew.server.clock.advance(ROUND_GAP_MS);
  const batches = crew.hands.map((hand) => makeBatch(crew, hand));
  const { oursMs, spending } = await ours(batches);
  const kept = await Promise.all(batches.map(({ opIds, entryIds }) => bare.readKept(crew.shop.shopId, opIds, entryIds)));
  return { oursMs, spending, bareMs: await timed(() => theirs(bare, kept)) };
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

async function oneByOne(batches: Batch[], trace: SqlTrace): Promise<Posted> {
  const spendings: Spending[] = [];
  let oursMs = 0;
  for (const { ready } of batches) {
    const send = await ready();
    trace.clear();
    const startMs = performance.now();
    const answer = await send();
    const endMs = performance.now();
    oursMs += endMs - startMs;
    spendings.push(spendingOf(trace.queries, startMs, endMs));
    assertKept(answer);
  }
  return { oursMs, spending: sumSpending(spendings) };
}

async function allAtOnce(batches: Batch[]): Promise<Posted> {
  const sends = await Promise.all(batches.map(({ ready }) => ready()));
  let answers: Came[] = [];
  const oursMs = await timed(async () => (answers = await Promise.all(sends.map((send) => send()))));
  answers.forEach(assertKept);
  return { oursMs, spending: new Map() };
}

async function keepOneByOne(bare: BareInsert, kept: KeptBatch[]): Promise<void> {
  for (const batch of kept) await bare.keep(batch);
}

async function keepAllAtOnce(bare: BareInsert, kept: KeptBatch[]): Promise<void> {
  await Promise.all(kept.map((batch) => bare.keep(batch)));
}

function assertKept(came: Came): void {
  const kept = answerIn(came).outcomes.filter(({ outcome }) => outcome === 'kept');
  if (kept.length !== OPS_A_DEVICE) throw new Error(`${kept.length} of ${OPS_A_DEVICE} ops were kept.`);
}
