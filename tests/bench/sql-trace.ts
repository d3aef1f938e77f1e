import type { Database } from '#server/models/database.ts';

export interface TracedQuery {
  sql: string;
  startMs: number;
  endMs: number;
}

type Query = (this: unknown, sql: unknown, ...rest: unknown[]) => Promise<unknown>;

/** Writes down when each statement of a database's pool was sent and answered. */
export class SqlTrace {
  queries: TracedQuery[] = [];

  constructor({ sequelize }: Database) {
    const open = sequelize as unknown as { query: Query };
    const query = open.query.bind(sequelize);
    open.query = async (sql, ...rest) => {
      const startMs = performance.now();
      try {
        return await query(sql, ...rest);
      } finally {
        this.queries.push({ sql: String(sql), startMs, endMs: performance.now() });
      }
    };
  }

  clear(): void {
    this.queries = [];
  }
}
