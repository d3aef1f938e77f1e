import type { Transaction } from 'sequelize';
import { FOLLOWER_ENTITIES, type Follower } from '#shared/entry/follow.ts';
import type { PhotoRow } from '#shared/photo/photo.ts';
import type { SetAsideRow } from '#shared/set-aside/set-aside.ts';
import { recordEntitySchema, refKey, type Entity, type Ref } from '#shared/sync/row.ts';
import type { Changes, LoggedOp, RecordStore } from '#shared/sync/store.ts';
import { query } from '#server/models/query.ts';
import { withArrived } from '#server/photos/arrivals.ts';
import { numberRows } from './feed.ts';
import { appendOps, readOps } from './op-log.ts';
import { LOOSE_END_TABLE, ROW_TABLES } from './tables.ts';
import { writeRows, type NumberedRow } from './write-rows.ts';

/** The tables of the rows that an op can change or name. */
const READ_TABLES: Partial<Record<Entity, string>> = {
  person: 'people',
  ...Object.fromEntries(recordEntitySchema.options.map((entity) => [entity, ROW_TABLES[entity].table])),
};

type Placed = NumberedRow | { id: string; seq: number; row: null };

/** A shop's record in PostgreSQL, within one transaction that holds the shop's lock. */
export class PostgresStore implements RecordStore {
  /** the last number that was given here */
  seq: number | null = null;
  private readonly transaction: Transaction;
  private readonly shopId: string;

  constructor(transaction: Transaction, shopId: string) {
    this.transaction = transaction;
    this.shopId = shopId;
  }

  readOps(keys: string[]): Promise<Map<string, LoggedOp>> {
    return readOps(this.transaction, this.shopId, keys);
  }

  async readRows(refs: Ref[]): Promise<Map<string, object>> {
    const wanted = [...idsByEntity(refs)];
    if (wanted.length === 0) return new Map();
    const parts = wanted.map(([entity], index) => readPart(entity, index + 2));
    const values = [this.shopId, ...wanted.map(([, ids]) => ids)];
    const found = await query<Ref & { row: object }>(this.transaction, parts.join(' UNION ALL '), values);
    return new Map(found.map((one) => [refKey(one), one.row]));
  }

  async readAwaiting(refs: Ref[]): Promise<SetAsideRow[]> {
    if (refs.length === 0) return [];
    const found = await query<{ row: SetAsideRow }>(
      this.transaction,
      `SELECT row FROM set_asides WHERE shop_id = $1 AND awaits_id = ANY($2::uuid[])`,
      [this.shopId, refs.map((ref) => ref.id)],
    );
    const keys = new Set(refs.map(refKey));
    return found.map(({ row }) => row).filter((row) => row.awaits && keys.has(refKey(row.awaits)));
  }

  async readFollowers(entryIds: string[]): Promise<Follower[]> {
    const parts = FOLLOWER_ENTITIES.map(
      (entity) =>
        `SELECT '${entity}' AS entity, row FROM ${ROW_TABLES[entity].table} WHERE shop_id = $1 AND entry_id = ANY($2::uuid[])`,
    );
    return query<Follower>(this.transaction, parts.join(' UNION ALL '), [this.shopId, entryIds]);
  }

  async write({ ops, rows, looseEnds, lastOrderedAt }: Changes): Promise<void> {
    await appendOps(this.transaction, this.shopId, ops);
    const deviceId = ops[0]?.deviceId;
    if (deviceId && lastOrderedAt) await this.keepLastOrderedAt(deviceId, lastOrderedAt);
    const count = rows.length + looseEnds.length;
    if (count === 0) return;
    const { first, last } = await numberRows(this.transaction, this.shopId, count);
    this.seq = last;
    let next = first;
    for (const entity of recordEntitySchema.options) {
      const made = rows.filter((one) => one.entity === entity).map(({ row }) => row);
      const told = entity === 'photo' ? await withArrived(this.transaction, this.shopId, made as PhotoRow[]) : made;
      const numbered = told.map((row) => ({ id: row.id, seq: next++, row }));
      await writeRows(this.transaction, this.shopId, ROW_TABLES[entity], numbered);
    }
    await this.writeLooseEnds(looseEnds.map(({ id, end }): Placed => ({ id, seq: next++, row: end })));
  }

  private async keepLastOrderedAt(deviceId: string, lastOrderedAt: string): Promise<void> {
    const sql = 'UPDATE devices SET last_ordered_at = $3 WHERE shop_id = $1 AND id = $2';
    await query(this.transaction, sql, [this.shopId, deviceId, lastOrderedAt]);
  }

  private async writeLooseEnds(placed: Placed[]): Promise<void> {
    const open = placed.filter((one): one is NumberedRow => one.row !== null);
    await writeRows(this.transaction, this.shopId, LOOSE_END_TABLE, open);
    const closed = placed.filter((one) => one.row === null);
    if (closed.length === 0) return;
    await query(
      this.transaction,
      `UPDATE loose_ends SET seq = line.seq, row = NULL FROM jsonb_to_recordset($2::jsonb) AS line(id uuid, seq bigint)
       WHERE loose_ends.shop_id = $1 AND loose_ends.id = line.id`,
      [this.shopId, JSON.stringify(closed)],
    );
  }
}

// one look into the key for each id, whatever is known of the table: while it has no statistics, `id = ANY` has the whole
// shop read
function readPart(entity: Entity, parameter: number): string {
  return `SELECT '${entity}' AS entity, found.id, found.row FROM unnest($${parameter}::uuid[]) wanted(id)
    CROSS JOIN LATERAL (SELECT id, row FROM ${READ_TABLES[entity]} WHERE shop_id = $1 AND id = wanted.id LIMIT 1) found`;
}

function idsByEntity(refs: Ref[]): Map<Entity, string[]> {
  const ids = new Map<Entity, string[]>();
  for (const { entity, id } of refs) {
    const known = ids.get(entity);
    if (known) known.push(id);
    else ids.set(entity, [id]);
  }
  return ids;
}
