import { once } from 'node:events';
import net from 'node:net';

/** A line to a server that can be cut after so many bytes have gone up it. */
export class Line {
  readonly url: string;
  private upLeft = Infinity;
  private readonly proxy: net.Server;
  private readonly sockets = new Set<net.Socket>();

  private constructor(proxy: net.Server, port: number) {
    this.proxy = proxy;
    this.url = `http://127.0.0.1:${port}`;
  }

  static async to(url: string): Promise<Line> {
    const proxy = net.createServer({ pauseOnConnect: true });
    proxy.listen(0, '127.0.0.1');
    await once(proxy, 'listening');
    const line = new Line(proxy, (proxy.address() as net.AddressInfo).port);
    proxy.on('connection', (near) => line.join(near, net.connect(Number(new URL(url).port), '127.0.0.1')));
    return line;
  }

  /** Once that many bytes more have gone up, every connection ends, and there is no other until the line is mended. */
  cutAfter(bytes: number): void {
    this.upLeft = bytes;
  }

  mend(): void {
    this.upLeft = Infinity;
  }

  async close(): Promise<void> {
    this.cut();
    this.proxy.close();
    await once(this.proxy, 'close');
  }

  private join(near: net.Socket, far: net.Socket): void {
    if (this.upLeft <= 0) {
      near.destroy();
      far.destroy();
      return;
    }
    for (const [socket, other] of [
      [near, far],
      [far, near],
    ] as const) {
      this.sockets.add(socket);
      socket.on('error', () => socket.destroy());
      socket.on('close', () => {
        this.sockets.delete(socket);
        other.destroy();
      });
    }
    near.on('data', (part) => this.passUp(part, far));
    far.pipe(near);
    near.resume();
  }

  private passUp(part: Buffer, far: net.Socket): void {
    this.upLeft -= part.length;
    if (this.upLeft > 0) far.write(part);
    else this.cut();
  }

  private cut(): void {
    for (const socket of this.sockets) socket.destroy();
  }
}
