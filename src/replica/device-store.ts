import { get, promisifyRequest, set } from 'idb-keyval';
import { idSchema } from '#shared/sync/ids.ts';
import type { Op } from '#shared/sync/op.ts';
import { formatStamp, parseStamp, tick, type Clock, type Stamp } from '#shared/sync/stamp.ts';
import { clockAfterAnswer } from './device-clock.ts';
import {
  NEW_DEVICE_STATE,
  NOBODY,
  deviceStateSchema,
  outboxRecordSchema,
  sentRecordSchema,
  sessionRecordSchema,
  type DeviceState,
  type OutboxRecord,
  type SentRecord,
  type SessionRecord,
} from './device-records.ts';
import { KeptDatabase } from './store.ts';
import { BROKEN_STORE, readRecords } from './stored-records.ts';
import { Turns } from './turns.ts';
import type { World } from './world.ts';

/** How long sent ops are kept while the server names no backup, in milliseconds. */
export const SENT_KEPT_MS = 30 * 86_400_000;

/** What a round with the server has brought, for the device. */
export interface Answered {
  /** whose token it was: their rows have what was sent and `heard` */
  personId: string;
  ops: { key: string; sent: Omit<SentRecord, 'inRowsOf'> }[];
  /** keys of sent ops that were the server's before the pull began */
  heard: string[];
  /** the latest stamp met */
  latest: Stamp | null;
  /** the server's time less the device's own, as measured; null where it was not */
  offsetMs: number | null;
  hasNewRows: boolean;
  /** how far the server is backed up, as an ISO time, where it says so */
  backedUpTo: string | null;
  serverTime: string;
}

type Keyed<T> = { key: string } & T;

/**
 * What belongs to the device, not to a person: its id, its clock, who is signed in, the outbox and the sent list.
 * The outbox is in the order of its keys. A key is an op's stamp, or, where it is sent again, its `orderedAt`.
 */
export class DeviceStore {
  readonly deviceId: string;
  outbox: Keyed<OutboxRecord>[] = [];
  sent: Keyed<SentRecord>[] = [];
  state: DeviceState = NEW_DEVICE_STATE;
  /** reads again the rows that another tab has pulled */
  onNewRows: () => Promise<void> = async () => {};
  private readonly database: KeptDatabase;
  private readonly world: World;
  private readonly turns = new Turns();

  private constructor(database: KeptDatabase, world: World, deviceId: string) {
    this.database = database;
    this.world = world;
    this.deviceId = deviceId;
  }

  static async open(world: World, newId: () => string): Promise<DeviceStore> {
    const database = new KeptDatabase({
      indexedDB: world.indexedDB,
      name: 'ribband-device',
      stores: ['about', 'outbox', 'sent', BROKEN_STORE],
      onBlocked: world.onBlocked,
    });
    const store = new DeviceStore(database, world, await deviceIdOf(database, newId));
    await store.catchUp();
    return store;
  }

  close(): void {
    this.database.close();
  }

  /** The device's own clock set right by the server's, in milliseconds since 1970. */
  nowMs(): number {
    return this.world.now() + this.state.offsetMs;
  }

  /** Reads again what another tab has changed. */
  catchUp(): Promise<void> {
    return this.turns.take(() => this.readAgain());
  }

  // the state is taken up last: with it, `hold` believes that the lists and the rows are as new as it says
  private async readAgain(): Promise<void> {
    const state = readState(await get('state', this.database.store('about')));
    const isFirst = this.state === NEW_DEVICE_STATE;
    if (isFirst || state.outboxVersion !== this.state.outboxVersion) await this.readLists();
    if (state.rowsVersion !== this.state.rowsVersion) await this.onNewRows();
    this.state = { ...state };
  }

  /**
   * Keeps what `compose` makes in the outbox, each under the stamp that it asked for, as one: two tabs never share a
   * stamp. Resolves once durable; null, with nothing kept, where another tab has changed something since, so that
   * `compose` would not have seen it.
   */
  hold(compose: (nextStamp: () => Stamp) => Op[]): Promise<Op[] | null> {
    return this.turns.take(() => this.stampAndKeep(compose));
  }

  private async stampAndKeep(compose: (nextStamp: () => Stamp) => Op[]): Promise<Op[] | null> {
    const held = await this.database.transact(['about', 'outbox'], 'readwrite', async (transaction) => {
      const about = transaction.objectStore('about');
      const state = readState(await promisifyRequest<unknown>(about.get('state')));
      if (state.outboxVersion !== this.state.outboxVersion || state.rowsVersion !== this.state.rowsVersion)
        return null;
      let clock = this.latestClock(state.clock);
      const ops = compose(() => formatStamp((clock = tick(clock, this.nowMs())), this.deviceId));
      const heldSince = new Date(this.nowMs()).toISOString();
      const outbox = transaction.objectStore('outbox');
      for (const op of ops) outbox.put({ op, heldSince } satisfies OutboxRecord, op.at);
      const next = { ...state, clock, outboxVersion: state.outboxVersion + 1 };
      about.put(next, 'state');
      return { items: ops.map((op) => ({ key: op.at, op, heldSince })), state: next };
    });
    if (!held) return null;
    this.outbox = [...this.outbox, ...held.items];
    this.state = held.state;
    return held.items.map(({ op }) => op);
  }

  /** Moves what was answered to the sent list, sets the clock, and forgets what the server has backed up, as one. */
  accept(answered: Answered): Promise<void> {
    return this.turns.take(async () => {
      await this.database.transact(['about', 'outbox', 'sent'], 'readwrite', (transaction) =>
        this.move(answered, transaction),
      );
      await this.readAgain();
    });
  }

  /** Puts all kept sent ops into the outbox again, in their old order. */
  sendAgain(): Promise<void> {
    return this.turns.take(async () => {
      await this.database.transact(['about', 'outbox', 'sent'], 'readwrite', async (transaction) => {
        const about = transaction.objectStore('about');
        const state = readState(await promisifyRequest<unknown>(about.get('state')));
        for (const { key, op, heldSince } of this.sent) {
          transaction.objectStore('outbox').put({ op, heldSince }, key);
          transaction.objectStore('sent').delete(key);
        }
        about.put({ ...state, outboxVersion: state.outboxVersion + 1 }, 'state');
      });
      await this.readAgain();
    });
  }

  private async move(answered: Answered, transaction: IDBTransaction): Promise<void> {
    const about = transaction.objectStore('about');
    const outbox = transaction.objectStore('outbox');
    const sent = transaction.objectStore('sent');
    const state = readState(await promisifyRequest<unknown>(about.get('state')));
    const hasChanged = this.changeSent(answered, sent);
    for (const { key, sent: record } of answered.ops) {
      outbox.delete(key);
      sent.put({ ...record, inRowsOf: [answered.personId] }, record.orderedAt);
    }
    const heldCount = await promisifyRequest(outbox.count());
    const offsetMs = answered.offsetMs ?? state.offsetMs;
    const clock = clockAfterAnswer(state.clock, answered.latest, this.world.now() + offsetMs, heldCount > 0);
    const outboxVersion = state.outboxVersion + (hasChanged || answered.ops.length > 0 ? 1 : 0);
    about.put(
      { clock, offsetMs, outboxVersion, rowsVersion: state.rowsVersion + (answered.hasNewRows ? 1 : 0) },
      'state',
    );
  }

  async readSession(): Promise<SessionRecord> {
    const read = sessionRecordSchema.safeParse(await get('session', this.database.store('about')));
    return read.success ? read.data : NOBODY;
  }

  async writeSession(session: SessionRecord): Promise<void> {
    await set('session', session, this.database.store('about'));
  }

  /** The keys of sent ops that a person's rows do not have yet. */
  unheardBy(personId: string): string[] {
    return this.sent.filter(({ inRowsOf }) => !inRowsOf.includes(personId)).map(({ key }) => key);
  }

  // what is on the sent list already: no longer needed, or heard by one more
  private changeSent(answered: Answered, sent: IDBObjectStore): boolean {
    const newlyHeard = new Set(answered.heard);
    const forgettable = this.sent.filter((record) => isForgettable(record, answered));
    const heard = this.sent.filter((record) => newlyHeard.has(record.key) && !forgettable.includes(record));
    for (const { key } of forgettable) sent.delete(key);
    for (const { key, ...record } of heard) {
      sent.put({ ...record, inRowsOf: [...record.inRowsOf, answered.personId] }, key);
    }
    return forgettable.length + heard.length > 0;
  }

  private async readLists(): Promise<void> {
    const outbox = await readRecords(this.database, 'outbox', outboxRecordSchema);
    const sent = await readRecords(this.database, 'sent', sentRecordSchema);
    this.outbox = outbox.records.map(([key, record]) => ({ key, ...record }));
    this.sent = sent.records.map(([key, record]) => ({ key, ...record }));
  }

  private latestClock(clock: Clock | null): Clock | null {
    const last = parseStamp(this.outbox.at(-1)?.key);
    if (!last) return clock;
    const isAfter = !clock || last.ms > clock.ms || (last.ms === clock.ms && last.counter > clock.counter);
    return isAfter ? { ms: last.ms, counter: last.counter } : clock;
  }
}

// what its author has not heard is kept for them to see, but not for ever
function isForgettable(
  { answeredAt, inRowsOf, op }: SentRecord,
  { backedUpTo, serverTime }: Answered,
): boolean {
  if (Date.parse(answeredAt) <= Date.parse(serverTime) - SENT_KEPT_MS)
    return backedUpTo === null || answeredAt <= backedUpTo;
  return backedUpTo !== null && answeredAt <= backedUpTo && inRowsOf.includes(op.personId);
}

function readState(stored: unknown): DeviceState {
  const read = deviceStateSchema.safeParse(stored);
  return read.success ? read.data : NEW_DEVICE_STATE;
}

async function deviceIdOf(database: KeptDatabase, newId: () => string): Promise<string> {
  return database.transact(['about'], 'readwrite', async (transaction) => {
    const about = transaction.objectStore('about');
    const known = idSchema.safeParse(await promisifyRequest<unknown>(about.get('deviceId')));
    if (known.success) return known.data;
    const deviceId = newId();
    about.put(deviceId, 'deviceId');
    return deviceId;
  });
}
