import pg from 'pg';
import { DEVICES } from './crew.ts';

type Line = unknown[];

const TABLES = {
  ops: columns('shop_id op_key op sha256 device_id person_id kind received_at received_on ordered_at ordered_on roles outcome reason'),
  entries: columns('shop_id id seq boat_id stage_id work_date author_id row'),
};

/** The rows of one device's sync as they were kept, ready to be inserted anew. */
export type KeptBatch = { sql: string; values: unknown[] }[];

interface BareOptions {
  /** begins the names of the tables */
  prefix: string;
  /** with the foreign keys of `ops` and `entries` */
  hasForeignKeys: boolean;
}

/**
 * Multi-row INSERTs into tables with the columns and indexes of `ops` and `entries`, without triggers and row security:
 * the least that durable keeping costs.
 */
export class BareInsert {
  private readonly pool: pg.Pool;
  private readonly prefix: string;

  private constructor(url: string, prefix: string) {
    this.pool = new pg.Pool({ connectionString: url, max: DEVICES });
    this.prefix = prefix;
  }

  static async open(url: string, { prefix, hasForeignKeys }: BareOptions): Promise<BareInsert> {
    const bare = new BareInsert(url, prefix);
    for (const table of Object.keys(TABLES)) {
      await bare.pool.query(`CREATE TABLE ${prefix}_${table} (LIKE ${table} INCLUDING ALL)`);
      if (hasForeignKeys) await bare.copyForeignKeys(table);
    }
    return bare;
  }

  /** Reads back what a sync has kept. */
  async readKept(shopId: string, opIds: string[], entryIds: string[]): Promise<KeptBatch> {
    const ops = `SELECT ${asText('ops')} FROM ops WHERE shop_id = $1 AND op_key = ANY($2)`;
    const entries = `SELECT ${asText('entries')} FROM entries WHERE shop_id = $1 AND id = ANY($2) ORDER BY seq`;
    return [
      this.insertOf('ops', await this.read(ops, [shopId, opIds])),
      this.insertOf('entries', await this.read(entries, [shopId, entryIds])),
    ];
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

  private async copyForeignKeys(table: string): Promise<void> {
    const keys = `SELECT pg_get_constraintdef(oid) AS key FROM pg_constraint WHERE conrelid = $1::regclass AND contype = 'f'`;
    const { rows } = await this.pool.query<{ key: string }>(keys, [table]);
    if (rows.length === 0) throw new Error(`${table} has no foreign keys.`);
    for (const { key } of rows) await this.pool.query(`ALTER TABLE ${this.prefix}_${table} ADD ${key}`);
  }

  private async read(sql: string, values: unknown[]): Promise<Line[]> {
    return (await this.pool.query({ text: sql, values, rowMode: 'array' })).rows as Line[];
  }

  private insertOf(table: keyof typeof TABLES, lines: Line[]): { sql: string; values: unknown[] } {
    const names = TABLES[table];
    const tuple = (_: Line, row: number) => `(${names.map((_name, column) => `$${row * names.length + column + 1}`).join(',')})`;
    return { sql: `INSERT INTO ${this.prefix}_${table} (${names.join(',')}) VALUES ${lines.map(tuple).join(',')}`, values: lines.flat() };
  }
}

function columns(names: string): string[] {
  return names.split(' ');
}

function asText(table: keyof typeof TABLES): string {
  return TABLES[table].map((column) => `${column}::text`).join(', ');
}
