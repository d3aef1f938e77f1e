import http from 'node:http';
import { gzipSync, gunzipSync } from 'node:zlib';
import type { SyncAnswer, SyncRequest } from '#shared/sync/protocol.ts';

// the platform's fetch unzips what it gets and costs as much as some of what is measured; this takes the bytes and no more
const agent = new http.Agent({ keepAlive: true, maxSockets: 32 });

/** A request body as a phone sends it. */
export function syncBody(request: SyncRequest): Buffer {
  return gzipSync(JSON.stringify(request));
}

/** Posts a gzipped JSON body and resolves with the answer's bytes, gzipped as they came; rejects unless it is a 200. */
export function post(url: string, token: string, body: Buffer): Promise<Buffer> {
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
        if (response.statusCode === 200) resolve(bytes);
        else reject(new Error(`${url} answered ${response.statusCode}: ${bytes.toString().slice(0, 300)}`));
      });
    });
    request.on('error', reject);
    request.end(body);
  });
}

export function answerIn(bytes: Buffer): SyncAnswer {
  return JSON.parse(gunzipSync(bytes).toString()) as SyncAnswer;
}

export function hangUp(): void {
  agent.destroy();
}
