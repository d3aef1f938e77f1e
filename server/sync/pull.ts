import { Transaction } from 'sequelize';
import { couldSee, seen, seesNone, seesWhole, type Viewer } from '#shared/sync/audience.ts';
import { entitySchema, type Entity } from '#shared/sync/row.ts';
import type { Database } from '#server/models/database.ts';
import { query } from '#server/models/query.ts';
import { readCursor, writeCursor } from './cursor.ts';
import { LOOSE_END_TABLE, ROW_TABLES } from './tables.ts';
import { readStanding, type Standing } from './viewer.ts';

export interface Page {
  /** each a row of the answer as JSON text */
  rows: string[];
  cursor: string;
  more: boolean;
  reset: boolean;
  replayFrom: string | null;
}

interface FeedLine {
  entity: Entity;
  id: string;
  seq: number;
  /** JSON text as it is kept; null where the row is no more */
  row: string | null;
}

const TABLES: Record<Entity, { table: string; id: string; seq: string }> = {
  shop: { table: 'shops', id: 'shop_id', seq: 'row_seq' },
  person: { table: 'people', id: 'id', seq: 'seq' },
  device: { table: 'devices', id: 'id', seq: 'seq' },
  boat: { table: ROW_TABLES.boat.table, id: 'id', seq: 'seq' },
  stage: { table: ROW_TABLES.stage.table, id: 'id', seq: 'seq' },
  task: { table: ROW_TABLES.task.table, id: 'id', seq: 'seq' },
  entry: { table: ROW_TABLES.entry.table, id: 'id', seq: 'seq' },
  finding: { table: ROW_TABLES.finding.table, id: 'id', seq: 'seq' },
  sound: { table: ROW_TABLES.sound.table, id: 'id', seq: 'seq' },
  photo: { table: ROW_TABLES.photo.table, id: 'id', seq: 'seq' },
  setAside: { table: ROW_TABLES.setAside.table, id: 'id', seq: 'seq' },
  looseEnd: { table: LOOSE_END_TABLE.table, id: 'id', seq: 'seq' },
};

/**
 * What came or changed in the shop since `cursor`, as the person may see it: at most `limit` numbers of the feed, all
 * read in one snapshot.
 */
export function pull(database: Database, shopId: string, personId: string, cursor: string | null, limit: number): Promise<Page> {
  const work = async (transaction: Transaction): Promise<Page> => {
    const standing = await readStanding(transaction, shopId, personId);
    const start = startOf(cursor, standing);
    const lines = await readFeed(transaction, shopId, standing.viewer, start.seq, limit + 1);
    const more = lines.length > limit;
    const page = lines.slice(0, limit);
    const seq = more ? page.at(-1)!.seq : standing.shop.seq;
    const { incarnation } = standing.shop;
    return {
      rows: page.flatMap((line) => shown(line, standing.viewer) ?? []),
      cursor: writeCursor({ incarnation, personId, epoch: standing.epoch, seq }),
      more,
      reset: start.isReset,
      replayFrom: start.isOtherLife ? await lastReceipt(transaction, shopId) : null,
    };
  };
  return database.inShop(shopId, work, { isolationLevel: Transaction.ISOLATION_LEVELS.REPEATABLE_READ });
}

/** From which number on. A cursor that does not fit begins anew; one of another life of the database says so. */
function startOf(text: string | null, { viewer, epoch, shop }: Standing): { seq: number; isReset: boolean; isOtherLife: boolean } {
  if (text === null) return { seq: 0, isReset: false, isOtherLife: false };
  const cursor = readCursor(text);
  if (!cursor) return { seq: 0, isReset: true, isOtherLife: false };
  const isOtherLife = cursor.incarnation !== shop.incarnation || cursor.seq > shop.seq;
  const isReset = isOtherLife || cursor.personId !== viewer.personId || cursor.epoch !== epoch;
  return { seq: isReset ? 0 : cursor.seq, isReset, isOtherLife };
}

function readFeed(transaction: Transaction, shopId: string, viewer: Viewer, seq: number, linesMax: number): Promise<FeedLine[]> {
  const entities = entitySchema.options.filter((entity) => !seesNone(entity, viewer));
  const parts = entities.map((entity) => {
    const from = TABLES[entity];
    return `(SELECT '${entity}' AS entity, ${from.id} AS id, ${from.seq} AS seq, row::text AS row FROM ${from.table}
      WHERE shop_id = $1 AND ${from.seq} > $2 ORDER BY ${from.seq} LIMIT $3)`;
  });
  return query<FeedLine>(transaction, `${parts.join(' UNION ALL ')} ORDER BY seq LIMIT $3`, [shopId, seq, linesMax]);
}

/** A row of the answer, or null where it is nothing to this person. */
function shown({ entity, id, seq, row }: FeedLine, viewer: Viewer): string | null {
  const text = row === null ? null : seesWhole(entity, viewer) ? row : cut(entity, row, viewer);
  const isGone = text === null;
  if (isGone && !couldSee(entity, row === null ? null : (JSON.parse(row) as object), viewer)) return null;
  return `{"entity":"${entity}","id":"${id}","seq":${seq},"row":${text},"gone":${isGone}}`;
}

function cut(entity: Entity, row: string, viewer: Viewer): string | null {
  const visible = seen(entity, JSON.parse(row) as object, viewer);
  return visible === null ? null : JSON.stringify(visible);
}

/** When the last op came that this life of the database knows of. */
async function lastReceipt(transaction: Transaction, shopId: string): Promise<string> {
  const [found] = await query<{ at: Date | null }>(transaction, 'SELECT max(received_at) AS at FROM ops WHERE shop_id = $1', [shopId]);
  return (found?.at ?? new Date(0)).toISOString();
}
