import type { ServerResponse } from 'node:http';
import type { Listener } from './hails.ts';

export const KEEP_ALIVE_MS = 25_000;

/** Writes hails to an answer as server-sent events (HTML Living Standard, 9.2) until it ends after `endsInMs`. */
export class HailStream implements Listener {
  private readonly response: ServerResponse;
  private seq = -1;

  constructor(response: ServerResponse, endsInMs: number, keepAliveMs = KEEP_ALIVE_MS) {
    this.response = response;
    response.writeHead(200, { 'Content-Type': 'text/event-stream', 'Cache-Control': 'no-store' });
    this.keepAlive();
    const beat = setInterval(() => this.keepAlive(), keepAliveMs);
    const end = setTimeout(() => this.ended(), endsInMs);
    response.once('close', () => {
      clearInterval(beat);
      clearTimeout(end);
    });
  }

  changed(seq: number): void {
    if (seq <= this.seq || this.response.writableEnded) return;
    this.seq = seq;
    this.response.write(`event: changed\ndata: {"seq":${seq}}\n\n`);
  }

  ended(): void {
    this.response.end();
  }

  // a comment, by which both ends learn that the other is there
  private keepAlive(): void {
    this.response.write(':\n\n');
  }
}
