import { reconsidered, setAsideRow } from '../set-aside/aside-row.ts';
import { isAdmissible, isAdmitted, type SetAsideRow } from '../set-aside/set-aside.ts';
import { differingStatements } from './fields.ts';
import { judge, reduceOp, understand, type Judgement, type Understood } from './judge.ts';
import { readOp, type Reason } from './op.ts';
import type { Received } from './receive.ts';
import { refKey, type Ref, type Row, type Statement } from './row.ts';
import type { Stamp } from './stamp.ts';
import type { LoggedOp, RecordStore } from './store.ts';
import { Workspace } from './workspace.ts';

/** One piece of merging: ops are taken in or judged again in memory, then written at once. */
export class Merging {
  private readonly space: Workspace;
  private readonly store: RecordStore;
  private readonly shopId: string;
  private readonly verdictsHeld: boolean;
  private readonly logged = new Map<string, LoggedOp>();
  /** taken in here, but a row that they need has not come */
  private waiting: { received: Received; awaits: Ref }[] = [];
  /** rows that have come to be here, or to be admissible, and for which others may have waited */
  private came: Ref[] = [];
  /** set-aside rows that somebody has admitted here */
  private admitted: SetAsideRow[] = [];

  /** `verdictsHeld`: who was entitled has been judged before and is not asked again. */
  constructor(store: RecordStore, shopId: string, { verdictsHeld = false } = {}) {
    this.store = store;
    this.shopId = shopId;
    this.space = new Workspace(store);
    this.verdictsHeld = verdictsHeld;
  }

  async takeIn(fresh: Received[]): Promise<void> {
    for (const { logged } of fresh) this.logged.set(logged.key, logged);
    await this.space.load(fresh.flatMap(({ understood }) => (understood ? refsOf(understood) : [])));
    for (const received of fresh) this.apply(received);
    await this.settle();
    for (const { received, awaits } of this.waiting.splice(0))
      this.setAside(received.logged, 'no-such-row', awaits);
    await this.settle();
  }

  /** Judges the ops behind set-aside rows on the rows as they stand, and whatever waited for what comes of it. */
  async judgeAgain(rows: SetAsideRow[]): Promise<void> {
    await this.reconsider(rows);
    await this.settle();
  }

  async write(fresh: Received[], lastOrderedAt: Stamp | null): Promise<void> {
    for (const received of fresh) this.fixOutcome(received);
    await this.space.moveFollowers();
    await this.store.write({
      ops: fresh.map((received) => received.logged),
      rows: this.space.rows(),
      looseEnds: this.space.looseEnds(this.shopId),
      lastOrderedAt,
    });
  }

  private apply(received: Received): void {
    const { logged, understood } = received;
    if (logged.reason || !understood) return this.setAside(logged, logged.reason ?? 'not-understood');
    const judgement = judge(understood, logged, this.space.look, this.verdictsHeld);
    if (judgement.reason === null) this.keep(understood, logged);
    else if (judgement.awaits) this.waiting.push({ received, awaits: judgement.awaits });
    else this.setAside(logged, judgement.reason);
  }

  private keep(understood: Understood, logged: LoggedOp, isAdmitted = false): void {
    const { kind, changes } = understood;
    const row = reduceOp(understood, isAdmitted ? { ...logged, isAdmitted } : logged, this.space.look);
    this.space.put(kind.entity, row);
    if (kind.makes) this.came.push(changes);
    if (kind.kind === 'setAside.admit') this.admitted.push(row as SetAsideRow);
  }

  private setAside(logged: LoggedOp, reason: Reason, awaits: Ref | null = null): void {
    Object.assign(logged, { outcome: 'set-aside', reason });
    const row = setAsideRow(logged, reason, awaits);
    this.space.put('setAside', row);
    this.came.push({ entity: 'setAside', id: row.id });
  }

  /** Judges again what waited for rows that have come, or was admitted, until nothing more comes of it. */
  private async settle(): Promise<void> {
    while (this.came.length > 0 || this.admitted.length > 0) {
      const came = this.came.splice(0);
      this.retryWaiting(new Set(came.map(refKey)));
      await this.reconsider([...(await this.awaiting(came)), ...this.admitted.splice(0)]);
    }
  }

  // an op that came before the row it needs, in the same batch, is no stray: it is taken as soon as the row is there
  private retryWaiting(came: ReadonlySet<string>): void {
    const [again, still] = partition(this.waiting, ({ awaits }) => came.has(refKey(awaits)));
    this.waiting = still;
    for (const { received } of again) this.apply(received);
  }

  private async awaiting(came: Ref[]): Promise<SetAsideRow[]> {
    return came.length > 0 ? [...(await this.store.readAwaiting(came)), ...this.space.awaiting(came)] : [];
  }

  private async reconsider(rows: SetAsideRow[]): Promise<void> {
    const recalled = await this.recall(rows);
    for (const { id, opKey } of [...rows].sort(byOrder)) {
      const row = this.space.look({ entity: 'setAside', id }) as SetAsideRow;
      if (row.sinceKept) continue;
      const next = reconsidered(row, this.judgeRecalled(row, recalled.get(opKey)!));
      this.space.put('setAside', next);
      if (isAdmissible(next) && !isAdmissible(row)) this.came.push({ entity: 'setAside', id });
    }
  }

  /** Brings the ops behind set-aside rows, and the rows that they need, into reach. */
  private async recall(rows: SetAsideRow[]): Promise<Map<string, Understood | Reason>> {
    const keys = rows.map((row) => row.opKey).filter((key) => !this.logged.has(key));
    if (keys.length > 0)
      for (const [key, logged] of await this.store.readOps(keys)) this.logged.set(key, logged);
    const recalled = new Map<string, Understood | Reason>();
    for (const { opKey } of rows) {
      const understood = understandLogged(this.logged.get(opKey)!);
      recalled.set(opKey, typeof understood === 'string' ? understood : withAuthor(understood));
    }
    const ownRefs = rows.map((row): Ref => ({ entity: 'setAside', id: row.id }));
    const neededRefs = [...recalled.values()].flatMap((one) => (typeof one === 'string' ? [] : refsOf(one)));
    await this.space.load([...ownRefs, ...neededRefs]);
    return recalled;
  }

  private judgeRecalled(row: SetAsideRow, understood: Understood | Reason): Judgement {
    if (typeof understood === 'string') return { reason: understood };
    const logged = this.logged.get(row.opKey)!;
    const judgement = judge(understood, logged, this.space.look, this.verdictsHeld || isAdmitted(row));
    if (judgement.reason === null) this.keep(understood, logged, isAdmitted(row));
    return judgement;
  }

  /** Judged on the rows as they stand after the whole batch: a loose end where a value it set lives beside another. */
  private fixOutcome({ understood, logged }: Received): void {
    if (logged.outcome === 'set-aside' || !understood) return;
    const row = this.space.look(understood.changes) as Row;
    const isItsOwn = (statement: Statement) => statement.opId === logged.key;
    const isLoose = row.statements
      .filter(isItsOwn)
      .some(({ field }) => differingStatements(row, field).some(isItsOwn));
    logged.outcome = isLoose ? 'loose-end' : 'kept';
  }
}

/** An op of the log as this version understands it, or the reason why it does not. */
export function understandLogged(logged: LoggedOp): Understood | Reason {
  const { op } = readOp(logged.op, logged.deviceId);
  return op ? understand(op) : 'malformed';
}

// who wrote a set-aside op may be nobody here: before it counts, its author must be a person of the shop
function withAuthor(understood: Understood): Understood {
  return { ...understood, names: [...understood.names, { entity: 'person', id: understood.op.personId }] };
}

function refsOf({ changes, names }: Understood): Ref[] {
  return [changes, ...names];
}

function byOrder(a: SetAsideRow, b: SetAsideRow): number {
  return a.stamps[a.madeBy]! < b.stamps[b.madeBy]! ? -1 : 1;
}

function partition<T>(all: T[], isFirst: (one: T) => boolean): [T[], T[]] {
  return [all.filter(isFirst), all.filter((one) => !isFirst(one))];
}
