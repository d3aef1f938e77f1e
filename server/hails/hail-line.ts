import { setTimeout as delay } from 'node:timers/promises';
import pg from 'pg';
import type { Logger } from 'pino';
import { z } from 'zod';

const CHANNEL = 'ribband_hails';
const RETRY_MIN_MS = 100;
const RETRY_MAX_MS = 5000;

const CONNECT_MAX_MS = 5000;

/** `<shop's uuid> <number>` */
const hailSchema = z.tuple([z.uuid(), z.coerce.number().int()]);

interface HailLineParts {
  url: string;
  log: Logger;
  /** told what any server of this database has announced, this one too */
  heard: (shopId: string, seq: number) => void;
  /** told once it listens, anew after each break: what was announced meanwhile was missed */
  opened: () => void;
}

/**
 * A connection of its own to PostgreSQL, on which servers tell one another how far a shop's feed has come (LISTEN and
 * NOTIFY). It comes back by itself, waiting longer each time it fails.
 */
export class HailLine {
  private client: pg.Client | null = null;
  private isSending = false;
  private readonly unsent = new Map<string, number>();
  private readonly closing = new AbortController();
  private readonly parts: HailLineParts;
  private readonly ended: Promise<void>;

  constructor(parts: HailLineParts) {
    this.parts = parts;
    this.ended = this.keepOpen();
  }

  /** Tells all servers, soon: while one message is under way, only the latest number of each shop is kept for the next. */
  send(shopId: string, seq: number): void {
    this.unsent.set(shopId, Math.max(seq, this.unsent.get(shopId) ?? 0));
    void this.sendUnsent();
  }

  async close(): Promise<void> {
    this.closing.abort();
    await this.client?.end();
    await this.ended;
  }

  private async keepOpen(): Promise<void> {
    for (let retryMs = RETRY_MIN_MS; !this.closing.signal.aborted; retryMs = Math.min(retryMs * 2, RETRY_MAX_MS)) {
      const wasOpen = await this.openOnce();
      if (wasOpen) retryMs = RETRY_MIN_MS;
      await delay(retryMs, null, { signal: this.closing.signal }).catch(() => {});
    }
  }

  /** Resolves when the connection has ended: to whether it ever listened. */
  private async openOnce(): Promise<boolean> {
    const client = new pg.Client({ connectionString: this.parts.url, connectionTimeoutMillis: CONNECT_MAX_MS });
    const ended = new Promise((resolve) => client.once('end', resolve));
    // without a listener the end of a connection would end the process
    client.on('error', (error) => this.parts.log.warn({ err: error }, 'the line for hails broke'));
    client.on('notification', ({ payload }) => this.hear(payload));
    try {
      await client.connect();
      await client.query('SET ROLE ribband_app');
      await client.query(`LISTEN ${CHANNEL}`);
    } catch (error) {
      this.parts.log.warn({ err: error }, 'the line for hails cannot be opened');
      await client.end().catch(() => {});
      return false;
    }
    if (this.closing.signal.aborted) {
      await client.end();
      return true;
    }
    this.client = client;
    this.parts.opened();
    void this.sendUnsent();
    await ended;
    this.client = null;
    return true;
  }

  private hear(payload: string | undefined): void {
    const hail = hailSchema.safeParse(payload?.split(' '));
    if (hail.success) this.parts.heard(...hail.data);
  }

  private async sendUnsent(): Promise<void> {
    const { client } = this;
    if (!client || this.isSending || this.unsent.size === 0) return;
    const hails = [...this.unsent];
    this.unsent.clear();
    this.isSending = true;
    try {
      await client.query('SELECT pg_notify($1, hail) FROM unnest($2::text[]) hail', [CHANNEL, hails.map((hail) => hail.join(' '))]);
    } catch (error) {
      this.parts.log.warn({ err: error }, 'hails could not be sent; they go out when the line is back');
      for (const [shopId, seq] of hails) this.unsent.set(shopId, Math.max(seq, this.unsent.get(shopId) ?? 0));
      return;
    } finally {
      this.isSending = false;
    }
    void this.sendUnsent();
  }
}
