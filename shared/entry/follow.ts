import type { Moved } from '../stage/moved.ts';
import { movedRefs } from '../stage/moved.ts';
import type { RowLookup } from '../sync/op-kind.ts';
import type { RecordEntity, Ref, Row } from '../sync/row.ts';
import type { EntryRow } from './entry.ts';

/** The entities whose rows, where they belong to an entry, lie on the boat and stage that the entry lies on. */
export const FOLLOWER_ENTITIES = ['finding', 'sound', 'photo'] as const satisfies RecordEntity[];

export interface Follower {
  entity: (typeof FOLLOWER_ENTITIES)[number];
  row: FollowerRow;
}

export type FollowerRow = Row & { boatId: string; stageId: string | null; entryId?: string };

/** The rows that a thing which may belong to an entry names. */
export function placedRefs(
  data: Moved & { entryId?: string; findingId?: string | null; taskId?: string },
): Ref[] {
  const entry: Ref[] = data.entryId ? [{ entity: 'entry', id: data.entryId }] : [];
  const finding: Ref[] = data.findingId ? [{ entity: 'finding', id: data.findingId }] : [];
  const task: Ref[] = data.taskId ? [{ entity: 'task', id: data.taskId }] : [];
  return [...movedRefs(data), ...entry, ...finding, ...task];
}

/** A row on the boat and stage of its entry, where it has one; the row itself where it lies there already. */
export function onEntry<R extends FollowerRow>(row: R, entry: EntryRow): R {
  const { boatId, stageId } = entry;
  return row.boatId === boatId && row.stageId === stageId ? row : { ...row, boatId, stageId };
}

export function isFollowerEntity(entity: string): entity is Follower['entity'] {
  return (FOLLOWER_ENTITIES as readonly string[]).includes(entity);
}

export function withEntry<R extends FollowerRow>(row: R, look: RowLookup): R {
  return row.entryId ? onEntry(row, look({ entity: 'entry', id: row.entryId }) as EntryRow) : row;
}
