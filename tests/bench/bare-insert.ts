import pg from 'pg';
import { DEVICES } from './crew.ts';

type Line = unknown[];

// ours are copied without what has no place in a bare insert: foreign keys, triggers, row security
const TABLES = {
  ops: columns('shop_id op_key op sha256 device_id person_id kind received_at received_on ordered_at ordered_on roles outcome reason'),
  entries: columns('shop_id id seq boat_id stage_id work_date author_id row'),
};

/** The rows of one device's sync as they were kept, ready to be inserted anew. */
export type KeptBatch = { sql: string; values: unknown[] }[];

/** Multi-row INSERTs into tables with the columns and indexes of `ops` and `entries`: the least that durable keeping costs. */
export class BareInsert {
  private readonly pool: pg.Pool;

  private constructor(url: string) {
    this.pool = new pg.Pool({ connectionString: url, max: DEVICES });
  }

  static async open(url: string): Promise<BareInsert> {
    const bare = new BareInsert(url);
    for (const table of Object.keys(TABLES)) await bare.pool.query(`CREATE TABLE bare_${table} (LIKE ${table} INCLUDING ALL)`);
    return bare;
  }

  /** Reads back what a sync has kept. */
  async readKept(shopId: string, opIds: string[], entryIds: string[]): Promise<KeptBatch> {
    const ops = `SELECT ${asText('ops')} FROM ops WHERE shop_id = $1 AND op_key = ANY($2)`;
    const entries = `SELECT ${asText('entries')} FROM entries WHERE shop_id = $1 AND id = ANY($2) ORDER BY seq`;
    return [insertOf('ops', await this.read(ops, [shopId, opIds])), insertOf('entries', await this.read(entries, [shopId, entryIds]))];
  }

  /** One transaction; resolves once it is committed. */
  async keep(batch: KeptBatch): Promise<void> {
    const client = await this.pool.connect();
    await client.query('BEGIN');
    for (const { sql, values } of batch) await client.query(sql, values);
    await client.query('COMMIT');
    client.release();
  }

  async close(): Promise<void> {
    await this.pool.end();
  }

  private async read(sql: string, values: unknown[]): Promise<Line[]> {
    return (await this.pool.query({ text: sql, values, rowMode: 'array' })).rows as Line[];
  }
}

function columns(names: string): string[] {
  return names.split(' ');
}

function asText(table: keyof typeof TABLES): string {
  return TABLES[table].map((column) => `${column}::text`).join(', ');
}

function insertOf(table: keyof typeof TABLES, lines: Line[]): { sql: string; values: unknown[] } {
  const names = TABLES[table];
  const tuple = (_: Line, row: number) => `(${names.map((_name, column) => `$${row * names.length + column + 1}`).join(',')})`;
  return { sql: `INSERT INTO bare_${table} (${names.join(',')}) VALUES ${lines.map(tuple).join(',')}`, values: lines.flat() };
}
