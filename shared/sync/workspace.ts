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
