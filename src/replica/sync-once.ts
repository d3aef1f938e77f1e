import {
  ROWS_PER_ANSWER_MAX,
  syncAnswerSchema,
  type SyncAnswer,
  type SyncRequest,
} from '#shared/sync/protocol.ts';
import { takeBatch } from './batch.ts';
import { latestBelieved, measureOffset } from './device-clock.ts';
import type { Answered, DeviceStore } from './device-store.ts';
import { Gathering } from './gathering.ts';
import type { PersonStore } from './person-store.ts';
import { heldPictures } from './photos/picture-store.ts';
import { NOT_OURS, TimedOut, inTime, isUnreachable, readJson, wordsOf } from './request.ts';
import { oldestOf } from './standing.ts';
import type { SyncResult } from './sync-state.ts';
import type { World } from './world.ts';

/** How long an answer may take, in milliseconds. */
const ANSWER_MAX_MS = 20_000;
/** From this length on a request is zipped, in UTF-16 units. */
const GZIP_FROM_UNITS = 4096;
const SHARE_MIN = 1 / 32;

export interface Syncing {
  world: World;
  device: DeviceStore;
  fetchAs: (personId: string, path: string, init: RequestInit) => Promise<Response>;
}

interface Heard {
  answer: SyncAnswer;
  /** ISO, as this device writes it */
  serverTime: string;
  offsetMs: number;
  roundTripMs: number;
}

type Asked = { heard: Heard } | { heard: null; result: SyncResult };
type Batch = DeviceStore['outbox'];

/** Sends and hears for one device. Whoever calls it sees to it that one call runs at a time. */
export class Syncer {
  private readonly syncing: Syncing;
  // on a line so thin that an answer does not come in time, less is asked for at once
  private share = 1;

  constructor(syncing: Syncing) {
    this.syncing = syncing;
  }

  /** Sends all that is held and hears all that is new, batch by batch. */
  async sync(person: PersonStore): Promise<SyncResult> {
    const total = { outcome: 'done' as const, sent: 0, rows: 0 };
    do {
      const result = await this.once(person);
      if (result.outcome !== 'done') return result;
      total.sent += result.sent;
      total.rows += result.rows;
    } while (this.syncing.device.outbox.length > 0);
    return total;
  }

  /**
   * One batch there, all the pages back. Rows are kept before the ops move to the sent list: whatever falls between
   * the two, an op is in one of them, and sending it again changes nothing.
   */
  private async once(person: PersonStore): Promise<SyncResult> {
    const { device } = this.syncing;
    await device.catchUp();
    await person.catchUp();
    const before = { pulls: person.pulls, heard: device.unheardBy(person.personId) };
    const batch = takeBatch(device.outbox, this.share);
    const gathering = new Gathering(person.cursor);
    const first = await this.ask(person.personId, this.firstRequest(batch, person));
    if (!first.heard) return first.result;
    let last = first.heard;
    if (last.answer.outcomes.length !== batch.length)
      return { outcome: 'failed', words: 'The server did not answer for everything that was sent.' };
    gathering.add(last.answer);
    while (last.answer.more) {
      const next = await this.ask(person.personId, {
        deviceId: device.deviceId,
        ops: [],
        cursor: gathering.cursor,
      });
      if (!next.heard) return next.result;
      last = { ...next.heard, ...quicker(last, next.heard) };
      gathering.add(last.answer);
    }
    // A restored server has lost ops. All that are kept go again, not only those since the time it names: other devices
    // may have sent since the restore, and a repeat changes nothing. This comes before the rows are kept, else a kill
    // between the two would leave the server without them for ever.
    if (gathering.isReplayAsked) {
      await person.pictures.offerAgain();
      await device.sendAgain();
    }
    const isKept = await person.apply(gathering.pulled(last.serverTime, before.pulls));
    // another tab was faster: what it pulled is read, and the batch goes again
    if (!isKept) return { outcome: 'done', sent: 0, rows: 0 };
    await device.accept(this.answered(person.personId, batch, first.heard, last, gathering, before.heard));
    return { outcome: 'done', sent: batch.length, rows: gathering.rows.size };
  }

  private firstRequest(batch: Batch, { cursor, pictures }: PersonStore): SyncRequest {
    const { device, world } = this.syncing;
    const left = device.outbox.slice(batch.length);
    const photos = heldPictures(pictures.queue);
    const oldest = oldestOf(left[0]?.heldSince, photos[0]?.since);
    return {
      deviceId: device.deviceId,
      cursor,
      ops: batch.map(({ op }) => op),
      held: { ops: left.length, photos: photos.length, ...(oldest ? { oldest } : {}) },
      appVersion: world.appVersion,
      sentAt: new Date(device.nowMs()).toISOString(),
    };
  }

  private answered(
    personId: string,
    batch: Batch,
    first: Heard,
    last: Heard,
    gathering: Gathering,
    heard: string[],
  ): Answered {
    const { outcomes } = first.answer;
    const stamps = [...gathering.stamps, ...outcomes.map(({ orderedAt }) => orderedAt)];
    return {
      personId,
      ops: batch.map(({ key, op, heldSince }, index) => {
        const { outcome, reason, orderedAt } = outcomes[index]!;
        const answeredAt = first.serverTime;
        return {
          key,
          sent: { op, heldSince, outcome, ...(reason ? { reason } : {}), orderedAt, answeredAt },
        };
      }),
      heard,
      hasNewRows: gathering.isAll || gathering.rows.size > 0,
      latest: latestBelieved(stamps, this.syncing.world.now() + last.offsetMs),
      offsetMs: last.offsetMs,
      serverTime: last.serverTime,
      backedUpTo: isoOrNull(last.answer.backedUpTo),
    };
  }

  private async ask(personId: string, request: SyncRequest): Promise<Asked> {
    const { world, fetchAs } = this.syncing;
    const limit = Math.floor(ROWS_PER_ANSWER_MAX * this.share);
    try {
      const body = await zipped(world, JSON.stringify({ ...request, limit }));
      const askedAtMs = world.now();
      return await inTime(world, ANSWER_MAX_MS, async (signal) => {
        const response = await fetchAs(personId, '/api/sync', { method: 'POST', ...body, signal });
        return this.read(response, askedAtMs);
      });
    } catch (error) {
      if (!isUnreachable(error)) throw error;
      if (!(error instanceof TimedOut)) return { heard: null, result: { outcome: 'offline' } };
      this.share = Math.max(SHARE_MIN, this.share / 2);
      return { heard: null, result: { outcome: 'failed', words: error.message } };
    }
  }

  private async read(response: Response, askedAtMs: number): Promise<Asked> {
    if (response.status === 401) return { heard: null, result: { outcome: 'sign-in-needed' } };
    if (!response.ok) return { heard: null, result: { outcome: 'failed', words: await wordsOf(response) } };
    const answer = syncAnswerSchema.safeParse(await readJson(response)).data;
    const answeredAtMs = this.syncing.world.now();
    const offsetMs = answer && measureOffset(answer.serverTime, askedAtMs, answeredAtMs);
    if (!answer || typeof offsetMs !== 'number')
      return { heard: null, result: { outcome: 'failed', words: NOT_OURS } };
    this.share = Math.min(1, this.share * 2);
    const serverTime = new Date(answer.serverTime).toISOString();
    return { heard: { answer, serverTime, offsetMs, roundTripMs: answeredAtMs - askedAtMs } };
  }
}

// the shorter the way, the less the error of a measured clock
function quicker(a: Heard, b: Heard): Pick<Heard, 'offsetMs' | 'roundTripMs'> {
  const { offsetMs, roundTripMs } = a.roundTripMs < b.roundTripMs ? a : b;
  return { offsetMs, roundTripMs };
}

function isoOrNull(time: string | null): string | null {
  const ms = time === null ? NaN : Date.parse(time);
  return Number.isNaN(ms) ? null : new Date(ms).toISOString();
}

async function zipped(
  { gzip }: World,
  text: string,
): Promise<{ headers: Record<string, string>; body: BodyInit }> {
  const headers = { 'Content-Type': 'application/json' };
  if (!gzip || text.length < GZIP_FROM_UNITS) return { headers, body: text };
  return { headers: { ...headers, 'Content-Encoding': 'gzip' }, body: await gzip(text) };
}
