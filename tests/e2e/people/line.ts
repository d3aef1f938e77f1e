import { once } from 'node:events';
import {
  createServer,
  request as ask,
  type IncomingHttpHeaders,
  type IncomingMessage,
  type Server,
  type ServerResponse,
} from 'node:http';
import type { AddressInfo } from 'node:net';
import { gunzipSync } from 'node:zlib';

/** Where in a sync the line breaks: the request is with the server, or the answer has come as far as the line. */
export type Moment = 'asked' | 'answered';

interface Break {
  moment: Moment;
  act: () => Promise<void>;
  done: () => void;
}

/**
 * The way between one device and the server: what passes it is passed on as it is. It can break in the middle of a sync
 * that carries ops, so that the device never hears the answer, and it can bring a newer version of the app.
 */
export class Line {
  private readonly server: Server;
  private readonly serverUrl: string;
  private broken: Break | null = null;
  private sent = () => {};
  private hasNewerApp = false;

  private constructor(serverUrl: string) {
    this.serverUrl = serverUrl;
    this.server = createServer((asked, answer) => void this.pass(asked, answer));
  }

  static async open(serverUrl: string): Promise<Line> {
    const line = new Line(serverUrl);
    line.server.listen(0, '127.0.0.1');
    await once(line.server, 'listening');
    return line;
  }

  get url(): string {
    return `http://127.0.0.1:${(this.server.address() as AddressInfo).port}`;
  }

  /** Resolves once the next sync that carries ops has broken off at `moment`, with `act` done in the middle of it. */
  breakNextSync(moment: Moment, act: () => Promise<void>): Promise<void> {
    return new Promise((done) => {
      this.broken = { moment, act, done };
    });
  }

  /** Resolves once the next answer to a sync that carries ops has been passed on, to the time by `performance.now()`. */
  nextSent(): Promise<number> {
    return new Promise((resolve) => {
      this.sent = () => resolve(performance.now());
    });
  }

  /** From now on the app's worker has other bytes, as after an update of the server. */
  bringNewerApp(): void {
    this.hasNewerApp = true;
  }

  async close(): Promise<void> {
    this.server.closeAllConnections();
    this.server.close();
    await once(this.server, 'close');
  }

  private async pass(asked: IncomingMessage, answer: ServerResponse): Promise<void> {
    const body = await readAll(asked).catch(() => null);
    if (!body) return void answer.destroy();
    const headers = this.isNewerWorker(asked) ? withoutCache(asked.headers) : asked.headers;
    const onward = ask(new URL(asked.url!, this.serverUrl), { method: asked.method, headers });
    const isAnswered = new Promise<IncomingMessage | null>((resolve) => {
      onward.on('response', resolve).on('error', () => resolve(null));
    });
    answer.on('close', () => onward.destroy());
    onward.end(body);
    const isSending = carriesOps(asked, body);
    if (isSending && this.broken?.moment === 'asked') {
      await once(onward, 'finish');
      return this.breakOff(answer);
    }
    const answered = await isAnswered;
    if (!answered) return void answer.destroy();
    if (isSending && this.broken) return this.breakOff(answer);
    await this.passBack(asked, answered, answer);
    if (isSending) this.sent();
  }

  private async breakOff(answer: ServerResponse): Promise<void> {
    const { act, done } = this.broken!;
    this.broken = null;
    await act();
    answer.destroy();
    done();
  }

  private async passBack(
    asked: IncomingMessage,
    answered: IncomingMessage,
    answer: ServerResponse,
  ): Promise<void> {
    answered.on('error', () => answer.destroy());
    if (this.isNewerWorker(asked)) {
      const { 'content-length': _length, ...headers } = answered.headers;
      answer.writeHead(answered.statusCode!, headers);
      answer.end(Buffer.concat([await readAll(answered), Buffer.from('\n// newer\n')]));
      return;
    }
    answer.writeHead(answered.statusCode!, answered.headers);
    answer.flushHeaders();
    answered.pipe(answer);
  }

  private isNewerWorker(asked: IncomingMessage): boolean {
    return this.hasNewerApp && asked.url === '/sw.js';
  }
}

async function readAll(message: IncomingMessage): Promise<Buffer> {
  const parts: Buffer[] = [];
  for await (const part of message) parts.push(part as Buffer);
  return Buffer.concat(parts);
}

// whole and as it is, so that bytes can be added to it
function withoutCache(headers: IncomingHttpHeaders): IncomingHttpHeaders {
  const { 'if-none-match': _tag, 'if-modified-since': _since, ...rest } = headers;
  return { ...rest, 'accept-encoding': 'identity' };
}

function carriesOps(asked: IncomingMessage, body: Buffer): boolean {
  if (asked.method !== 'POST' || asked.url !== '/api/sync') return false;
  const text = asked.headers['content-encoding'] === 'gzip' ? gunzipSync(body) : body;
  return (JSON.parse(text.toString()) as { ops: unknown[] }).ops.length > 0;
}
