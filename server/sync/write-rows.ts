import type { Transaction } from 'sequelize';
import { query } from '#server/models/query.ts';
import type { RowTable } from './tables.ts';

/** A row with the number that it gets in the feed. */
export interface NumberedRow {
  id: string;
  seq: number;
  row: object;
}

/** Writes rows of one table in one statement. */
export async function writeRows(transaction: Transaction, shopId: string, into: RowTable, rows: NumberedRow[]): Promise<void> {
  if (rows.length === 0) return;
  const lines = rows.map(({ id, seq, row }) => ({
    id,
    seq,
    ...into.values(row as Record<string, unknown>),
    row: JSON.stringify(row),
  }));
  await query(transaction, upsertOf(into), [shopId, JSON.stringify(lines)]);
}

// the row travels as a string within the parameter, since a recordset function takes no \u0000 in a value of its own
function upsertOf({ table, columns }: RowTable): string {
  const names = Object.keys(columns);
  const list = ['seq', ...names, 'row'];
  const types = Object.entries(columns).map(([name, type]) => `${name} ${type}`);
  return `
    INSERT INTO ${table} (shop_id, id, ${list.join(', ')})
    SELECT $1, line.id, line.seq, ${names.map((name) => `line.${name}, `).join('')}line.row::json
    FROM jsonb_to_recordset($2::jsonb) AS line(id uuid, seq bigint, ${types.join(', ')}, row text)
    ON CONFLICT (shop_id, id) DO UPDATE SET ${list.map((name) => `${name} = excluded.${name}`).join(', ')}`;
}
