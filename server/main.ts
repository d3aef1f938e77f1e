import type { AddressInfo } from 'node:net';
import { createServer } from 'node:http';
import type { Express } from 'express';

const CLOSE_GRACE_MS = 2000;

export type Listening = { url: string; close: () => Promise<void> };

/** Serves `app`; rejects when the address cannot be had. Port 0 takes a free one. */
export function listen(app: Express, port: number, host: string): Promise<Listening> {
  const server = createServer(app);
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => {
      const bound = server.address() as AddressInfo;
      const name = bound.family === 'IPv6' ? `[${bound.address}]` : bound.address;
      resolve({ url: `http://${name}:${bound.port}`, close });
    });
  });

  /** Answers what is under way, then ends what would stay open by itself (event streams). */
  function close(): Promise<void> {
    return new Promise((resolve) => {
      const cut = setTimeout(() => server.closeAllConnections(), CLOSE_GRACE_MS);
      server.close(() => {
        clearTimeout(cut);
        resolve();
      });
    });
  }
}
