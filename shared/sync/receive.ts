import { canonicalJson, isSameJson } from './canonical.ts';
import { dayAt, type Day } from './day.ts';
import { sha256Hex } from './ids.ts';
import { understand, type Understood } from './judge.ts';
import { readOp, type Op, type ReadOp, type Reason } from './op.ts';
import { orderAt, stampMs, type Stamp } from './stamp.ts';
import type { BatchFrom, LoggedOp, RecordStore } from './store.ts';

/** An op of a batch: logged for the first time, or known from before. */
export interface Received {
  logged: LoggedOp;
  isRepeat: boolean;
  understood: Understood | null;
}

/** `key`: its id, or the SHA-256 of its content where it has none */
type Came = ReadOp & { raw: unknown; key: string };

/** Takes ops in as they come: tells repeats from new ones and fixes the facts of the new. */
export class Reception {
  private readonly known = new Map<string, Received>();
  private readonly store: RecordStore;
  private readonly from: BatchFrom;
  private readonly receipt: { receivedAt: string; receivedOn: Day };
  lastOrderedAt: Stamp | null;

  constructor(store: RecordStore, from: BatchFrom) {
    this.store = store;
    this.from = from;
    this.receipt = {
      receivedAt: new Date(from.nowMs).toISOString(),
      receivedOn: dayAt(from.nowMs, from.shop.timeZone),
    };
    this.lastOrderedAt = from.device.lastOrderedAt;
  }

  /** `faulty` names, by index, the ops that the server has failed at. The same op twice is the same object twice. */
  async receiveAll(raws: unknown[], faulty: ReadonlySet<number>): Promise<Received[]> {
    const came = raws.map((raw) => cameAs(raw, readOp(raw, this.from.device.id)));
    await this.learn(came.map(({ key }) => key));
    const received: Received[] = [];
    for (const [index, one] of came.entries()) received.push(await this.receive(one, faulty.has(index)));
    return received;
  }

  private async learn(keys: string[]): Promise<void> {
    for (const [key, logged] of await this.store.readOps(keys)) {
      this.known.set(key, { logged, isRepeat: true, understood: null });
    }
  }

  // what came under an id that is taken by something else is known by its content
  private async receive(came: Came, isFaulty: boolean): Promise<Received> {
    const known = this.known.get(came.key);
    if (!known) return this.log(came.key, came, this.reasonAtSight(came, isFaulty));
    if (isSameJson(known.logged.op, came.raw)) return known;
    const key = contentKey(came.raw);
    if (!this.known.has(key)) await this.learn([key]);
    return this.known.get(key) ?? this.log(key, came, 'id-reused');
  }

  private log(key: string, came: Came, known: Reason | null): Received {
    const { op, raw } = came;
    const understood = op && !known ? understand(op) : null;
    const reason = known ?? this.reasonBefore(op, understood);
    const personId = op && this.from.people.has(op.personId) ? op.personId : this.from.personId;
    const logged: LoggedOp = {
      key,
      op: raw,
      deviceId: this.from.device.id,
      personId,
      kind: op?.kind ?? null,
      roles: op ? (this.from.people.get(op.personId) ?? []) : [],
      ...this.times(op ? op.at : came.op === null ? came.at : null),
      outcome: reason ? 'set-aside' : 'kept',
      reason,
    };
    const received = {
      logged,
      isRepeat: false,
      understood: typeof understood === 'string' ? null : understood,
    };
    this.known.set(key, received);
    return received;
  }

  // an op without a readable stamp gets the server's time, and does not push what its device made earlier past that
  private times(at: Stamp | null): Pick<LoggedOp, 'orderedAt' | 'orderedOn' | 'receivedAt' | 'receivedOn'> {
    const { device, nowMs, shop } = this.from;
    const orderedAt = orderAt(at, device.id, at && this.lastOrderedAt, nowMs);
    if (at) this.lastOrderedAt = orderedAt;
    return { orderedAt, orderedOn: dayAt(stampMs(orderedAt), shop.timeZone), ...this.receipt };
  }

  // a revoked device's op waits for the foreman whatever it says, lest a newer server takes in what an older did not know
  private reasonAtSight({ op }: Came, isFaulty: boolean): Reason | null {
    if (op && this.from.device.isRevoked) return 'device-revoked';
    return isFaulty ? 'server-fault' : null;
  }

  /** Why an op may not count whatever the rows are, if so. */
  private reasonBefore(op: Op | null, understood: Understood | Reason | null): Reason | null {
    if (!op) return 'malformed';
    if (typeof understood === 'string') return understood;
    return this.from.people.has(op.personId) ? null : 'not-entitled';
  }
}

function cameAs(raw: unknown, read: ReadOp): Came {
  const id = read.op ? read.op.id : read.id;
  return { raw, key: id ?? contentKey(raw), ...read };
}

function contentKey(raw: unknown): string {
  return sha256Hex(canonicalJson(raw));
}
