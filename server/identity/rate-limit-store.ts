import type { ClientRateLimitInfo, Options, Store } from 'express-rate-limit';
import type { Database } from '#server/models/database.ts';

const ADD_ONE = `
INSERT INTO rate_limits AS kept (key, hits, resets_at) VALUES ($1, 1, now() + $2 * interval '1 millisecond')
ON CONFLICT (key) DO UPDATE SET
  hits = CASE WHEN kept.resets_at <= now() THEN 1 ELSE kept.hits + 1 END,
  resets_at = CASE WHEN kept.resets_at <= now() THEN excluded.resets_at ELSE kept.resets_at END
RETURNING hits, resets_at AS "resetsAt"`;

// those that another server is at work on are left to it
const SWEEP = `
DELETE FROM rate_limits WHERE key IN (
  SELECT key FROM rate_limits WHERE resets_at <= now() LIMIT 100 FOR UPDATE SKIP LOCKED
)`;

/** Counts in PostgreSQL and by its clock, so that all servers of one database count together. */
export class RateLimitStore implements Store {
  readonly localKeys = false;
  readonly prefix: string;
  readonly #database: Database;
  #windowMs = 0;

  constructor(database: Database, prefix: string) {
    this.#database = database;
    this.prefix = prefix;
  }

  init({ windowMs }: Options): void {
    this.#windowMs = windowMs;
  }

  async increment(key: string): Promise<ClientRateLimitInfo> {
    await this.#run(SWEEP, []);
    const [counted] = await this.#run(ADD_ONE, [this.prefix + key, this.#windowMs]);
    const { hits, resetsAt } = counted as { hits: number; resetsAt: Date };
    return { totalHits: hits, resetTime: resetsAt };
  }

  async decrement(key: string): Promise<void> {
    await this.#run('UPDATE rate_limits SET hits = greatest(hits - 1, 0) WHERE key = $1', [
      this.prefix + key,
    ]);
  }

  async resetKey(key: string): Promise<void> {
    await this.#run('DELETE FROM rate_limits WHERE key = $1', [this.prefix + key]);
  }

  async #run(sql: string, values: unknown[]): Promise<unknown[]> {
    const [rows] = await this.#database.sequelize.query(sql, { bind: values });
    return rows;
  }
}
