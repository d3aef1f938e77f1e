import { isFollowerEntity, type Follower } from '../entry/follow.ts';
import type { SetAsideRow } from '../set-aside/set-aside.ts';
import { entitySchema, refKey, type Entity, type Ref } from './row.ts';
import type { Stamp } from './stamp.ts';
import type { Changes, LoggedOp, RecordStore } from './store.ts';

interface Kept {
  entity: Entity;
  id: string;
  seq: number;
  row: object | null;
}

/** A shop's record in memory, numbered as the feed is. Rows are kept as JSON text, so that nothing is shared by reference. */
export class MemoryStore implements RecordStore {
  readonly ops = new Map<string, LoggedOp>();
  readonly lastOrderedAt = new Map<string, Stamp>();
  private readonly kept = new Map<string, { entity: Entity; id: string; seq: number; json: string }>();
  seq = 0;

  async readOps(keys: string[]): Promise<Map<string, LoggedOp>> {
    const found = keys.flatMap((key) => this.ops.get(key) ?? []);
    return new Map(found.map((logged) => [logged.key, structuredClone(logged)]));
  }

  async readRows(refs: Ref[]): Promise<Map<string, object>> {
    const found = refs.flatMap((ref) => {
      const row = this.row(ref.entity, ref.id);
      return row ? [[refKey(ref), row] as const] : [];
    });
    return new Map(found);
  }

  async readAwaiting(refs: Ref[]): Promise<SetAsideRow[]> {
    const keys = new Set(refs.map(refKey));
    const kept = [...this.kept.values()].filter(({ entity }) => entity === 'setAside');
    const rows = kept.map(({ json }) => JSON.parse(json) as SetAsideRow);
    return rows.filter((row) => row.awaits && keys.has(refKey(row.awaits)));
  }

  async readFollowers(entryIds: string[]): Promise<Follower[]> {
    const followers = this.feed(0).filter(({ entity }) => isFollowerEntity(entity));
    return (followers as Follower[]).filter(({ row }) => row.entryId && entryIds.includes(row.entryId));
  }

  async write({ ops, rows, looseEnds, lastOrderedAt }: Changes): Promise<void> {
    for (const logged of ops) this.ops.set(logged.key, structuredClone(logged));
    for (const { entity, row } of rows) this.put(entity, row.id, row);
    for (const { id, end } of looseEnds) this.put('looseEnd', id, end);
    const deviceId = ops[0]?.deviceId;
    if (deviceId && lastOrderedAt) this.lastOrderedAt.set(deviceId, lastOrderedAt);
  }

  put(entity: Entity, id: string, row: object | null): void {
    this.seq += 1;
    this.kept.set(refKey({ entity, id }), { entity, id, seq: this.seq, json: JSON.stringify(row) });
  }

  row(entity: Entity, id: string): object | undefined {
    const kept = this.kept.get(refKey({ entity, id }));
    return kept ? ((JSON.parse(kept.json) as object | null) ?? undefined) : undefined;
  }

  /** What came or changed after number `seq`, in the order of its numbers. */
  feed(seq: number): Kept[] {
    return [...this.kept.values()]
      .filter((kept) => kept.seq > seq)
      .sort((a, b) => a.seq - b.seq)
      .map(({ json, ...kept }) => ({ ...kept, row: JSON.parse(json) as object | null }));
  }

  /** The rows of the record, by entity and id, without their numbers. */
  snapshot(): Record<string, object | null> {
    const order = entitySchema.options;
    const sorted = [...this.kept.values()].sort(
      (a, b) => order.indexOf(a.entity) - order.indexOf(b.entity) || (a.id < b.id ? -1 : 1),
    );
    return Object.fromEntries(sorted.map(({ entity, id, json }) => [refKey({ entity, id }), JSON.parse(json) as object | null]));
  }
}
