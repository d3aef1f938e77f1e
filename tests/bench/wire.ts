import http from 'node:http';
import { gzipSync, gunzipSync } from 'node:zlib';
import type { SyncAnswer, SyncRequest } from '#shared/sync/protocol.ts';

// the platform's fetch unzips what it gets and costs as much as some of what is measured; this takes the bytes and no more
const agent = new http.Agent({ keepAlive: true, maxSockets: 32 });
const ZIPPED_JSON = { 'Content-Type': 'application/json', 'Content-Encoding': 'gzip', 'Accept-Encoding': 'gzip' };
const BOUNDARY = 'ribband-bench-boundary';

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
  return send(url, token, { method: 'POST', status: 200, headers: ZIPPED_JSON, body });
}

/** Puts one file of a multipart body; rejects unless the answer is a 201. */
export function putFile(url: string, token: string, body: Buffer): Promise<Came> {
  return send(url, token, { method: 'PUT', status: 201, headers: { 'Content-Type': `multipart/form-data; boundary=${BOUNDARY}` }, body });
}

/** A multipart body with one file. */
export function fileBody(field: string, bytes: Buffer): Buffer {
  const head = `--${BOUNDARY}\r\nContent-Disposition: form-data; name="${field}"; filename="photo.jpg"\r\nContent-Type: image/jpeg\r\n\r\n`;
  return Buffer.concat([Buffer.from(head), bytes, Buffer.from(`\r\n--${BOUNDARY}--\r\n`)]);
}

interface Sending {
  method: string;
  /** of the answer */
  status: number;
  headers: Record<string, string>;
  body: Buffer;
}

function send(url: string, token: string, { method, status, headers, body }: Sending): Promise<Came> {
  const allHeaders = { Authorization: `Bearer ${token}`, 'Content-Length': body.length, ...headers };
  return new Promise((resolve, reject) => {
    const request = http.request(url, { method, agent, headers: allHeaders }, (response) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('error', reject);
      response.on('end', () => {
        const bytes = Buffer.concat(chunks);
        if (response.statusCode === status) resolve({ bytes, isZipped: response.headers['content-encoding'] === 'gzip' });
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
