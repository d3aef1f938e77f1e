import type { Logger } from 'pino';
import type { Database } from '#server/models/database.ts';
import { feedSeq } from '#server/sync/feed.ts';
import { HailLine } from './hail-line.ts';

/** Somebody who wants to hear how far a shop's feed has come. */
export interface Listener {
  changed(seq: number): void;
  /** nothing more will come */
  ended(): void;
}

interface HailsParts {
  /** of the database, for a connection of its own */
  url: string;
  database: Database;
  log: Logger;
}

/** Carries word of a changed feed to whoever listens, on whichever server of the database they are. */
export class Hails {
  private readonly listeners = new Map<string, Set<Listener>>();
  private readonly line: HailLine;
  private readonly parts: HailsParts;

  constructor(parts: HailsParts) {
    this.parts = parts;
    this.line = new HailLine({
      url: parts.url,
      log: parts.log,
      heard: (shopId, seq) => this.tell(shopId, seq),
      opened: () => this.tellAll(),
    });
  }

  /** To be called after the commit: a NOTIFY within a transaction has the commits of all shops wait for one another. */
  announce(shopId: string, seq: number): void {
    this.line.send(shopId, seq);
  }

  /** Tells `listener` where the feed stands now, and from then on each time it moves. Call what is returned to stop. */
  listen(shopId: string, listener: Listener): () => void {
    const those = this.listeners.get(shopId) ?? new Set();
    this.listeners.set(shopId, those.add(listener));
    void this.tellLatest(shopId, [listener]);
    return () => {
      those.delete(listener);
      if (those.size === 0 && this.listeners.get(shopId) === those) this.listeners.delete(shopId);
    };
  }

  async close(): Promise<void> {
    for (const those of this.listeners.values()) for (const listener of those) listener.ended();
    this.listeners.clear();
    await this.line.close();
  }

  private tell(shopId: string, seq: number, listeners: Iterable<Listener> = this.listeners.get(shopId) ?? []): void {
    for (const listener of listeners) listener.changed(seq);
  }

  private tellAll(): void {
    for (const [shopId, those] of this.listeners) void this.tellLatest(shopId, [...those]);
  }

  // where this cannot be read the line is down as well, and tells all once it is back
  private async tellLatest(shopId: string, listeners: Listener[]): Promise<void> {
    try {
      const seq = await this.parts.database.inShop(shopId, (transaction) => feedSeq(transaction, shopId));
      this.tell(shopId, seq, listeners);
    } catch (error) {
      this.parts.log.warn({ err: error }, 'the feed could not be looked at for a hail');
    }
  }
}
