import { once, EventEmitter } from 'node:events';

/** Somebody at the other end of `GET /api/events`. */
export class HailEar {
  readonly seqs: number[] = [];
  text = '';
  isEnded = false;
  private readonly heard = new EventEmitter();
  private readonly leaving = new AbortController();

  static async open(url: string, accessToken: string): Promise<HailEar> {
    const ear = new HailEar();
    const response = await fetch(`${url}/api/events`, {
      headers: { Authorization: `Bearer ${accessToken}`, 'Accept-Encoding': 'gzip' },
      signal: ear.leaving.signal,
    });
    if (response.status !== 200) throw new Error(`Events answered ${response.status}: ${await response.text()}`);
    void ear.read(response.body!);
    return ear;
  }

  /** Resolves once a hail came that says at least `seq`. */
  async hears(seq: number): Promise<void> {
    while (!this.seqs.some((heard) => heard >= seq)) await this.next();
  }

  /** Resolves at the next hail, or the end. */
  async next(): Promise<void> {
    await once(this.heard, 'heard');
  }

  async end(): Promise<void> {
    while (!this.isEnded) await this.next();
  }

  /** Calls `act` at each hail from now on. */
  onHail(act: (seq: number) => void): void {
    this.heard.on('heard', () => {
      if (!this.isEnded) act(this.seqs.at(-1)!);
    });
  }

  leave(): void {
    this.leaving.abort();
  }

  private async read(body: ReadableStream<Uint8Array>): Promise<void> {
    const decoder = new TextDecoder();
    try {
      for await (const part of body) this.take(decoder.decode(part, { stream: true }));
    } catch (error) {
      if (!this.leaving.signal.aborted) throw error;
    }
    this.isEnded = true;
    this.heard.emit('heard');
  }

  private take(part: string): void {
    this.text += part;
    const seqs = [...this.text.matchAll(/^event: changed\ndata: \{"seq":(\d+)\}\n\n/gm)].map(([, seq]) => Number(seq));
    for (const seq of seqs.slice(this.seqs.length)) {
      this.seqs.push(seq);
      this.heard.emit('heard');
    }
  }
}
