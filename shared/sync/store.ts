import type { Follower } from '../entry/follow.ts';
import type { Role } from '../identity/role.ts';
import type { SetAsideRow } from '../set-aside/set-aside.ts';
import type { LooseEnd } from './loose-ends.ts';
import type { Reason } from './op.ts';
import type { Facts, RecordEntity, Ref, Row } from './row.ts';
import type { Stamp } from './stamp.ts';

export type OutcomeName = 'kept' | 'loose-end' | 'set-aside';

/** An op in the log: exactly as it came, with the facts fixed when it was first received. */
export interface LoggedOp extends Facts {
  /** its id, or the SHA-256 of its canonical JSON where it has no id of its own */
  key: string;
  op: unknown;
  deviceId: string;
  personId: string;
  kind: string | null;
  receivedAt: string;
  receivedOn: string;
  outcome: OutcomeName;
  reason: Reason | null;
}

/** What one batch changes, to be written as one. */
export interface Changes {
  ops: LoggedOp[];
  rows: { entity: RecordEntity; row: Row | SetAsideRow }[];
  /** `end` null: closed */
  looseEnds: { id: string; end: LooseEnd | null }[];
  /** the sending device's latest */
  lastOrderedAt: Stamp | null;
}

/** Where a shop's record is kept. Memory and PostgreSQL both implement it; whoever calls the merge holds the shop's lock. */
export interface RecordStore {
  /** of `keys`, the ops that were received before */
  readOps(keys: string[]): Promise<Map<string, LoggedOp>>;
  /** the rows that are there, by `refKey` */
  readRows(refs: Ref[]): Promise<Map<string, object>>;
  /** the set-aside rows that wait for one of `refs` */
  readAwaiting(refs: Ref[]): Promise<SetAsideRow[]>;
  /** the rows that belong to one of these entries */
  readFollowers(entryIds: string[]): Promise<Follower[]>;
  write(changes: Changes): Promise<void>;
}

/** The shop, device and people that a batch comes from, as they are when it is received. */
export interface BatchFrom {
  shop: { id: string; timeZone: string };
  device: { id: string; isRevoked: boolean; lastOrderedAt: Stamp | null };
  /** the token's person; who an unreadable op is put down to */
  personId: string;
  /** everybody enrolled on the device, the token's person among them */
  people: ReadonlyMap<string, Role[]>;
  nowMs: number;
}
