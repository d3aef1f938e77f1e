import type { EntryRow } from '#shared/entry/entry.ts';
import { liveStatements } from '#shared/sync/fields.ts';
import { fieldsOfSet, overFor } from '#shared/sync/over.ts';
import type { MadeOp, Sender } from '#tests/worlds/sender.ts';
import { startServer } from '#tests/worlds/server.ts';
import { DEVICES, bodyOf, entryOps, latestCursor, makeCrew, postSync, type Crew } from './crew.ts';
import { median, timed } from './measuring.ts';
import { answerIn, type Came } from './wire.ts';

const ENTRIES = 200;
const WARM_UPS = 1;
const ROUNDS = 5;

export interface AmendFinding {
  /** amendments that were answered 'kept', whose value is live in its entry; of how many */
  kept: number;
  live: number;
  of: number;
  /** median time until the last of the devices was answered */
  ms: number;
}

/** Ten devices amend the same 200 entries at once, each another field of them. Counts are of the worst round. */
export async function benchAmend(): Promise<AmendFinding> {
  const server = await startServer();
  try {
    const crew = await makeCrew(server, ['foreman']);
    const rounds: AmendFinding[] = [];
    for (let round = 0; round < WARM_UPS + ROUNDS; round += 1) rounds.push(await amendAtOnce(crew));
    return {
      kept: Math.min(...rounds.map(({ kept }) => kept)),
      live: Math.min(...rounds.map(({ live }) => live)),
      of: DEVICES * ENTRIES,
      ms: median(rounds.slice(WARM_UPS).map(({ ms }) => ms)),
    };
  } finally {
    await server.close();
  }
}

async function amendAtOnce(crew: Crew): Promise<AmendFinding> {
  const before = await makeEntries(crew);
  const batches = crew.hands.map((hand, device) => before.map((row) => amendment(crew, hand, device, row)));
  const bodies: Buffer[] = [];
  for (const [device, hand] of crew.hands.entries()) {
    bodies.push(bodyOf(crew, hand, { ops: batches[device]!, cursor: await latestCursor(crew, hand) }));
  }
  let answers: Came[] = [];
  const ms = await timed(async () => {
    answers = await Promise.all(crew.hands.map((hand, device) => postSync(crew, hand, bodies[device]!)));
  });
  const outcomes = answers.flatMap((came) => answerIn(came).outcomes);
  const kept = outcomes.filter(({ outcome }) => outcome === 'kept').length;
  const rows = await readEntries(crew, before);
  return { kept, live: countLive(batches.flat(), rows), of: DEVICES * ENTRIES, ms };
}

async function makeEntries(crew: Crew): Promise<EntryRow[]> {
  const cursor = await latestCursor(crew, crew.foreman);
  const author = crew.hands[0]!;
  await author.send(...entryOps(author, crew, ENTRIES));
  const { rows } = await crew.foreman.pullAll(cursor);
  const entries = rows.filter(({ entity }) => entity === 'entry').map(({ row }) => row as unknown as EntryRow);
  if (entries.length !== ENTRIES) throw new Error(`${entries.length} of ${ENTRIES} entries were made.`);
  return entries;
}

/** What the device of that number sets: four fields of the entry, and the hours of six people. */
function setBy({ hands, yard }: Crew, device: number, row: EntryRow): Record<string, unknown> {
  const sets = [
    { text: `${row.text} Looked at again.` },
    { workDate: '2026-05-30' },
    { stageId: null, boatId: yard.boatId },
    { place: { side: 'port', number: 7 } },
  ];
  return sets[device] ?? { hours: [{ personId: hands[device]!.personId, minutes: 15 * device }] };
}

function amendment(crew: Crew, hand: Sender, device: number, row: EntryRow): MadeOp {
  const set = setBy(crew, device, row);
  return hand.op('entry.amend', { entryId: row.id, set, why: 'Looked at again.' }, { over: overFor(row, fieldsOfSet(set), []) });
}

async function readEntries(crew: Crew, before: EntryRow[]): Promise<Map<string, EntryRow>> {
  const { rows } = await crew.foreman.pullAll();
  const ids = new Set(before.map(({ id }) => id));
  return new Map(rows.filter(({ id }) => ids.has(id)).map(({ id, row }) => [id, row as unknown as EntryRow]));
}

function countLive(ops: MadeOp[], rows: Map<string, EntryRow>): number {
  return ops.filter((op) => {
    const row = rows.get(op.data.entryId as string);
    return fieldsOfSet(op.data.set as Record<string, unknown>).every(
      (field) => row !== undefined && liveStatements(row, field).some(({ opId }) => opId === op.id),
    );
  }).length;
}
