import { randomUUID } from 'node:crypto';
import { mkdtemp, open, rm } from 'node:fs/promises';
import { createServer, type IncomingMessage } from 'node:http';
import type { AddressInfo } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import type { Request, Response } from 'express';
import multer from 'multer';

export interface BareUpload {
  url: string;
  close: () => Promise<void>;
}

/** A plain HTTP server that parses a multipart body, writes its file to the disk with fsync, and answers 201: no more. */
export async function serveBareUpload(field: string): Promise<BareUpload> {
  const folder = await mkdtemp(path.join(os.tmpdir(), 'bare-upload-'));
  const read = multer().single(field);
  const fileOf = (request: IncomingMessage) =>
    new Promise<Buffer>((resolve, reject) => {
      const asked = request as Request;
      read(asked, {} as Response, (error?: unknown) => (error ? reject(error as Error) : resolve(asked.file!.buffer)));
    });
  const server = createServer((request, response) => {
    void fileOf(request)
      .then((bytes) => writeSynced(path.join(folder, randomUUID()), bytes))
      .then(
        () => response.writeHead(201).end(),
        (error: unknown) => response.writeHead(500).end(String(error)),
      );
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const close = async () => {
    server.closeAllConnections();
    await new Promise((resolve) => server.close(resolve));
    await rm(folder, { recursive: true });
  };
  return { url: `http://127.0.0.1:${(server.address() as AddressInfo).port}/`, close };
}

async function writeSynced(file: string, bytes: Buffer): Promise<void> {
  const handle = await open(file, 'wx');
  await handle.writeFile(bytes);
  await handle.sync();
  await handle.close();
}
