import type { MemoryStore } from '#shared/sync/memory-store.ts';
import { refKey } from '#shared/sync/row.ts';
import { makeView, type HeldItem, type Me, type Rows, type View } from '#src/replica/view.ts';

interface Seeing {
  me: Me;
  nowMs: number;
  held?: HeldItem[];
}

/** What a person's device shows of a record that it has heard the whole of. */
export function viewOf(store: MemoryStore, { me, nowMs, held = [] }: Seeing): View {
  const kept = store.feed(0).filter((one) => one.row !== null && one.entity !== 'looseEnd');
  const rows: Rows = new Map(
    kept.map(({ entity, id, row }) => [refKey({ entity, id }), { entity, row: row! }]),
  );
  return makeView({ me, rows, held, unheard: [], rolesOnDevice: new Map(), nowMs, deviceTimeZone: 'UTC' });
}
