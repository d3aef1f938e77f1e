import type { EntryRow } from '../entry/entry.ts';
import { isFollowerEntity, onEntry, type Follower, type FollowerRow } from '../entry/follow.ts';
import type { SetAsideRow } from '../set-aside/set-aside.ts';
import { isSameJson } from './canonical.ts';
import { looseEndsOf } from './loose-ends.ts';
import type { RowLookup } from './op-kind.ts';
import { refKey, type RecordEntity, type Ref, type Row } from './row.ts';
import type { Changes, RecordStore } from './store.ts';

/** The rows that a batch works on: read from the store once, changed in memory, and compared at the end. */
export class Workspace {
  private readonly read = new Map<string, object>();
  private readonly asked = new Set<string>();
  private readonly changed = new Map<string, { entity: RecordEntity; row: Row | SetAsideRow }>();
  private readonly store: RecordStore;

  constructor(store: RecordStore) {
    this.store = store;
  }

  /** Makes sure that rows, where they are there, can be looked at. */
  async load(refs: Ref[]): Promise<void> {
    const fresh = new Map(refs.map((ref) => [refKey(ref), ref]).filter(([key]) => !this.asked.has(key as string)) as [string, Ref][]);
    if (fresh.size === 0) return;
    for (const key of fresh.keys()) this.asked.add(key);
    for (const [key, row] of await this.store.readRows([...fresh.values()])) this.read.set(key, row);
  }

  readonly look: RowLookup = (ref) => {
    const key = refKey(ref);
    return this.changed.get(key)?.row ?? this.read.get(key);
  };

  put(entity: RecordEntity, row: Row | SetAsideRow): void {
    this.changed.set(refKey({ entity, id: row.id }), { entity, row });
  }

  /** The rows set aside here that wait for one of `refs`. */
  awaiting(refs: Ref[]): SetAsideRow[] {
    const keys = new Set(refs.map(refKey));
    return this.rows()
      .filter(({ entity }) => entity === 'setAside')
      .map(({ row }) => row as SetAsideRow)
      .filter((row) => row.awaits !== null && keys.has(refKey(row.awaits)));
  }

  /** The entries that now lie on another boat or stage than they did. */
  movedEntries(): EntryRow[] {
    const entries = this.rows().filter(({ entity }) => entity === 'entry').map(({ row }) => row as EntryRow);
    return entries.filter((entry) => {
      const earlier = this.read.get(refKey({ entity: 'entry', id: entry.id })) as EntryRow | undefined;
      return entry.statements.length > 0 && (earlier?.boatId !== entry.boatId || earlier?.stageId !== entry.stageId);
    });
  }

  /** What belongs to an entry follows it to the boat and stage that it lies on. */
  async moveFollowers(): Promise<void> {
    const moved = new Map(this.movedEntries().map((entry) => [entry.id, entry]));
    if (moved.size === 0) return;
    const stored = await this.store.readFollowers([...moved.keys()]);
    for (const { entity, row } of stored) this.remember({ entity, id: row.id }, row);
    const here = this.rows().filter(({ entity }) => isFollowerEntity(entity)) as Follower[];
    for (const { entity, row } of [...stored, ...here]) {
      const current = this.look({ entity, id: row.id }) as FollowerRow;
      const entry = current.entryId ? moved.get(current.entryId) : undefined;
      if (entry) this.put(entity, onEntry(current, entry));
    }
  }

  private remember(ref: Ref, row: object): void {
    const key = refKey(ref);
    if (this.asked.has(key)) return;
    this.asked.add(key);
    this.read.set(key, row);
  }

  rows(): Changes['rows'] {
    return [...this.changed.values()];
  }

  /** The loose ends that came, changed or closed by what was changed here. */
  looseEnds(shopId: string): Changes['looseEnds'] {
    return this.rows().flatMap(({ entity, row }) => {
      if (entity === 'setAside') return [];
      const earlier = this.read.get(refKey({ entity, id: row.id })) as Row | undefined;
      const before = new Map((earlier ? looseEndsOf(shopId, entity, earlier) : []).map((end) => [end.id, end]));
      const now = new Map(looseEndsOf(shopId, entity, row).map((end) => [end.id, end]));
      const changed = [...now].filter(([id, end]) => !isSameJson(before.get(id), end));
      const closed = [...before.keys()].filter((id) => !now.has(id));
      return [...changed.map(([id, end]) => ({ id, end })), ...closed.map((id) => ({ id, end: null }))];
    });
  }
}
