import http from 'node:http';
import { gzipSync, gunzipSync } from 'node:zlib';
import type { SyncAnswer, SyncRequest } from '#shared/sync/protocol.ts';

// the platform's fetch unzips what it gets and costs as much as some of what is measured; this takes the bytes and no more
const agent = new http.Agent({ keepAlive: true, maxSockets: 32 });

/** A request body as a phone sends it. */
export function syncBody(request: SyncRequest): Buffer {
  return gzipSync(JSON.stringify(request));
}

/** An answer's bytes as they came; a short one comes as it is. */
export interface Came {
  bytes: Buffer;
  isZipped: boolean;
}

/** Posts a gzipped JSON body; rejects unless the answer is a 200. */
export function post(url: string, token: string, body: Buffer): Promise<Came> {
  const headers = {
    Authorization: `Bearer ${token}`,
    'Content-Type': 'application/json',
    'Content-Encoding': 'gzip',
    'Content-Length': body.length,
    'Accept-Encoding': 'gzip',
  };
  return new Promise((resolve, reject) => {
    const request = http.request(url, { method: 'POST', agent, headers }, (response) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('error', reject);
      response.on('end', () => {
        const bytes = Buffer.concat(chunks);
        if (response.statusCode === 200) resolve({ bytes, isZipped: response.headers['content-encoding'] === 'gzip' });
        else reject(new Error(`${url} answered ${response.statusCode}: ${bytes.toString().slice(0, 300)}`));
      });
    });
    request.on('error', reject);
    request.end(body);
  });
}

export function answerIn({ bytes, isZipped }: Came): SyncAnswer {
  return JSON.parse((isZipped ? gunzipSync(bytes) : bytes).toString()) as SyncAnswer;
}

export function hangUp(): void {
  agent.destroy();
}
