import { isAdmitted, withState, type SetAsideRow } from '../set-aside/set-aside.ts';
import { differingStatements, saidFields } from './fields.ts';
import { idFromSha256, isUuid } from './ids.ts';
import { judge, reduceOp, understand, type Judgement, type Understood } from './judge.ts';
import { readOp, type Reason } from './op.ts';
import { Reception, type Received } from './receive.ts';
import type { Ref, Row } from './row.ts';
import type { Stamp } from './stamp.ts';
import type { BatchFrom, LoggedOp, OutcomeName, RecordStore } from './store.ts';
import { Workspace } from './workspace.ts';

export interface Outcome {
  /** the op's id as it came, if it reads as a UUID */
  id: string | null;
  outcome: OutcomeName;
  reason?: Reason;
  orderedAt: Stamp;
}

/**
 * Merges a batch into the record: judges each op, changes the rows, sets aside what may not count, and writes it all
 * as one. Answers ops[i] by outcomes[i]; an op that came before gets its first outcome and changes nothing.
 * `faulty` names, by index, ops whose merging has failed: they are set aside as the server's fault.
 */
export async function mergeBatch(
  store: RecordStore,
  from: BatchFrom,
  ops: unknown[],
  faulty: ReadonlySet<number> = new Set(),
): Promise<Outcome[]> {
  const reception = new Reception(store, from);
  const received = await reception.receiveAll(ops, faulty);
  const fresh = [...new Set(received)].filter((one) => !one.isRepeat);
  const merge = new Merge(store, from.shop.id);
  await merge.takeIn(fresh);
  await merge.write(fresh, reception.lastOrderedAt);
  return received.map(({ logged }, index) => outcomeOf(ops[index], logged));
}

/** Judges set-aside ops again, as a newer server does with what an older one did not understand or failed at. */
export async function judgeSetAside(store: RecordStore, shopId: string, rows: SetAsideRow[]): Promise<void> {
  const merge = new Merge(store, shopId);
  await merge.judgeRows(rows);
  await merge.write([], null);
}

function outcomeOf(raw: unknown, { outcome, reason, orderedAt }: LoggedOp): Outcome {
  const id = (raw as { id?: unknown } | null)?.id;
  const echoed = typeof id === 'string' && isUuid(id.toLowerCase()) ? id : null;
  return { id: echoed, outcome, ...(reason ? { reason } : {}), orderedAt };
}

class Merge {
  private readonly space: Workspace;
  private readonly store: RecordStore;
  private readonly shopId: string;
  private readonly logged = new Map<string, LoggedOp>();
  private waiting: { received: Received; awaits: Ref }[] = [];

  constructor(store: RecordStore, shopId: string) {
    this.store = store;
    this.shopId = shopId;
    this.space = new Workspace(store);
  }

  async takeIn(fresh: Received[]): Promise<void> {
    for (const { logged } of fresh) this.logged.set(logged.key, logged);
    await this.space.load(fresh.flatMap(({ understood }) => (understood ? refsOf(understood) : [])));
    const made: Ref[] = [];
    for (const received of fresh) this.apply(received, made);
    this.retryWaiting(made);
    for (const { received, awaits } of this.waiting) this.setAside(received.logged, 'no-such-row', awaits);
    await this.judgeAwaiting(made);
    await this.judgeRows(this.admittedBy(fresh));
  }

  async write(fresh: Received[], lastOrderedAt: Stamp | null): Promise<void> {
    for (const received of fresh) this.fixOutcome(received);
    await this.store.write({
      ops: fresh.map((received) => received.logged),
      rows: this.space.rows(),
      looseEnds: this.space.looseEnds(this.shopId),
      lastOrderedAt,
    });
  }

  /** Judges the ops behind set-aside rows on the rows as they stand, and what waited for what comes of it. */
  async judgeRows(rows: SetAsideRow[]): Promise<void> {
    for (let again = rows; again.length > 0; ) {
      const understood = await this.recall(again);
      const made = this.reconsider(again, understood);
      again = made.length > 0 ? await this.awaiting(made) : [];
    }
  }

  private async judgeAwaiting(made: Ref[]): Promise<void> {
    if (made.length > 0) await this.judgeRows(await this.awaiting(made));
  }

  private async awaiting(made: Ref[]): Promise<SetAsideRow[]> {
    return [...(await this.store.readAwaiting(made)), ...this.space.awaiting(made)];
  }

  private keep({ kind, changes, op }: Understood, logged: LoggedOp, made: Ref[]): void {
    this.space.put(kind.entity, reduceOp({ kind, changes, op, names: [] }, logged, this.space.look));
    if (kind.makes) made.push(changes);
  }

  private apply(received: Received, made: Ref[]): void {
    const { logged, understood } = received;
    if (logged.reason || !understood) return this.setAside(logged, logged.reason ?? 'malformed');
    const judgement = judge(understood, logged, this.space.look);
    if (judgement.reason === null) this.keep(understood, logged, made);
    else if (judgement.awaits) this.waiting.push({ received, awaits: judgement.awaits });
    else this.setAside(logged, judgement.reason);
  }

  // an op that came before the row it needs, in the same batch, is no stray: it is taken as soon as the row is there
  private retryWaiting(made: Ref[]): void {
    for (let count = -1; made.length > 0 && count !== this.waiting.length; ) {
      count = this.waiting.length;
      const again = this.waiting;
      this.waiting = [];
      for (const { received } of again) this.apply(received, made);
    }
  }

  private setAside(logged: LoggedOp, reason: Reason, awaits: Ref | null = null): void {
    Object.assign(logged, { outcome: 'set-aside', reason });
    this.space.put('setAside', setAsideRow(logged, reason, awaits));
  }

  /** The set-aside rows that a batch's admissions are about. */
  private admittedBy(fresh: Received[]): SetAsideRow[] {
    return fresh
      .filter(({ understood, logged }) => understood?.kind.kind === 'setAside.admit' && logged.reason === null)
      .map(({ understood }) => this.space.look(understood!.changes) as SetAsideRow);
  }

  /** Brings the ops behind set-aside rows, and the rows that they need, into reach. */
  private async recall(rows: SetAsideRow[]): Promise<Map<string, Understood>> {
    const keys = rows.map((row) => row.opKey).filter((key) => !this.logged.has(key));
    for (const [key, logged] of await this.store.readOps(keys)) this.logged.set(key, logged);
    const recalled = new Map<string, Understood>();
    for (const { opKey } of rows) {
      const understood = understoodAgain(this.logged.get(opKey)!);
      if (understood) recalled.set(opKey, understood);
    }
    const ownRefs = rows.map((row): Ref => ({ entity: 'setAside', id: row.id }));
    await this.space.load([...ownRefs, ...[...recalled.values()].flatMap(refsOf)]);
    return recalled;
  }

  /** Puts the rows as they came of judging them again; answers what was made by it. */
  private reconsider(rows: SetAsideRow[], recalled: Map<string, Understood>): Ref[] {
    const made: Ref[] = [];
    for (const { id, opKey } of [...rows].sort(byOrder)) {
      const row = this.space.look({ entity: 'setAside', id }) as SetAsideRow;
      const understood = recalled.get(opKey);
      if (!understood || row.sinceKept) continue;
      const logged = this.logged.get(opKey)!;
      const judgement = judge(understood, logged, this.space.look, isAdmitted(row));
      if (judgement.reason === null) this.keep(understood, logged, made);
      this.space.put('setAside', reconsidered(row, judgement));
    }
    return made;
  }

  /** Judged on the rows as they stand after the whole batch: a loose end where a value it set lives beside another. */
  private fixOutcome({ understood, logged }: Received): void {
    if (logged.outcome === 'set-aside' || !understood) return;
    const row = this.space.look(understood.changes) as Row;
    const isLoose = saidFields(row).some((field) =>
      differingStatements(row, field).some((statement) => statement.opId === logged.key),
    );
    logged.outcome = isLoose ? 'loose-end' : 'kept';
  }
}

function refsOf({ changes, names }: Understood): Ref[] {
  return [changes, ...names];
}

// who wrote a set-aside op may be nobody here: before it counts, its author must be a person of the shop
function understoodAgain(logged: LoggedOp): Understood | null {
  const read = readOp(logged.op, logged.deviceId);
  const understood = read.op && understand(read.op);
  if (!understood || typeof understood === 'string') return null;
  return { ...understood, names: [...understood.names, { entity: 'person', id: understood.op.personId }] };
}

function byOrder(a: SetAsideRow, b: SetAsideRow): number {
  return a.stamps[a.madeBy]! < b.stamps[b.madeBy]! ? -1 : 1;
}

function setAsideRow(logged: LoggedOp, reason: Reason, awaits: Ref | null): SetAsideRow {
  const opId = isUuid(logged.key) ? logged.key : null;
  const id = opId ?? idFromSha256(logged.key);
  return {
    id,
    opId,
    opKey: logged.key,
    op: logged.op,
    authorId: logged.personId,
    reason,
    state: 'waiting',
    by: null,
    at: null,
    why: null,
    decisions: [],
    sinceKept: false,
    awaits,
    madeBy: id,
    makerId: logged.personId,
    heads: {},
    stamps: { [id]: logged.orderedAt },
    struck: null,
    statements: [],
  };
}

function reconsidered(row: SetAsideRow, judgement: Judgement): SetAsideRow {
  if (judgement.reason === null) return withState({ ...row, sinceKept: true, awaits: null });
  return withState({ ...row, reason: judgement.reason, awaits: judgement.awaits ?? null });
}
