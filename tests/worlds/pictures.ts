import { createHash } from 'node:crypto';
import { crc32, deflateSync } from 'node:zlib';
import sharp from 'sharp';
import type { TestServer } from './server.ts';
import type { SignedIn } from './shop.ts';

/** The name of bytes: their SHA-256 in hex. */
export function nameOf(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex');
}

interface PictureOptions {
  width?: number;
  height?: number;
  format?: 'jpeg' | 'png' | 'webp';
  orientation?: number;
}

/** Where `pictureOf` says that it was taken. */
export const TAKEN_AT = { latitude: 51.5, longitude: -9.25 };

let picturesMade = 0;

/** A picture that is like no other, with all that a camera writes into one: where it was taken, by what, a colour profile. */
export async function pictureOf({
  width = 64,
  height = 48,
  format = 'jpeg',
  orientation = 1,
}: PictureOptions = {}): Promise<Buffer> {
  picturesMade += 1;
  const red = picturesMade % 256;
  const pixels = Buffer.alloc(width * height * 3, red);
  for (let at = 0; at < pixels.length; at += 7) pixels[at] = (at * 31 + picturesMade) % 256;
  return sharp(pixels, { raw: { width, height, channels: 3 } })
    .withIccProfile('p3')
    .withExif({
      IFD0: { Make: 'Plover', Software: `roll ${picturesMade}`, Orientation: String(orientation) },
      IFD3: {
        GPSLatitudeRef: 'N',
        GPSLatitude: '51/1 30/1 0/1',
        GPSLongitudeRef: 'W',
        GPSLongitude: '9/1 15/1 0/1',
      },
    })
    .withXmp(
      `<x:xmpmeta xmlns:x="adobe:ns:meta/"><rdf:RDF xmlns:rdf="http://www.w3.org/1999/02/22-rdf-syntax-ns#"><rdf:Description
      xmlns:exif="http://ns.adobe.com/exif/1.0/" exif:GPSLatitude="51,30.0N" exif:GPSLongitude="9,15.0W"/></rdf:RDF></x:xmpmeta>`,
    )
    .withMetadata({ orientation })
    .toFormat(format)
    .toBuffer();
}

/** A PNG that says it is so many px wide and high, and is all of one colour: few bytes, many pixels. */
export function flatPng(width: number, height: number): Buffer {
  const header = Buffer.alloc(13);
  header.writeUInt32BE(width, 0);
  header.writeUInt32BE(height, 4);
  header[8] = 1; // one bit a pixel, grey
  const rows = Buffer.alloc(height * (1 + Math.ceil(width / 8)));
  return Buffer.concat([
    Buffer.from('\x89PNG\r\n\x1a\n', 'latin1'),
    pngChunk('IHDR', header),
    pngChunk('IDAT', deflateSync(rows)),
    pngChunk('IEND'),
  ]);
}

export function pngChunk(type: string, data: Uint8Array = Buffer.alloc(0)): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  const frame = Buffer.alloc(8);
  frame.writeUInt32BE(data.length, 0);
  frame.writeUInt32BE(crc32(body), 4);
  return Buffer.concat([frame.subarray(0, 4), body, frame.subarray(4)]);
}

/** Somebody signed in on a device, who sends and asks for photos. */
export class PhotoHand {
  private readonly server: TestServer;
  private readonly session: SignedIn;

  constructor(server: TestServer, session: SignedIn) {
    this.server = server;
    this.session = session;
  }

  /** Sends bytes under a name, by default their own. */
  put(bytes: Uint8Array, sha256 = nameOf(bytes), part = ''): Promise<Response> {
    return this.ask('PUT', `${sha256}${part}`, formOf(bytes));
  }

  putThumb(bytes: Uint8Array, sha256: string): Promise<Response> {
    return this.put(bytes, sha256, '/thumb');
  }

  get(sha256: string, size: 'thumb' | 'view' | 'full' = 'full'): Promise<Response> {
    return this.ask('GET', `${sha256}?size=${size}`);
  }

  head(sha256: string): Promise<Response> {
    return this.ask('HEAD', sha256);
  }

  private ask(method: string, rest: string, body?: FormData): Promise<Response> {
    const headers = { Authorization: `Bearer ${this.session.accessToken}` };
    return fetch(`${this.server.url}/api/photos/${rest}`, { method, headers, ...(body ? { body } : {}) });
  }
}

/** A multipart body as a phone sends it; the file name and type in it say nothing that is relied on. */
export function formOf(bytes: Uint8Array, field = 'photo', fileName = 'photo.jpg'): FormData {
  const form = new FormData();
  form.set(field, new Blob([new Uint8Array(bytes)], { type: 'image/jpeg' }), fileName);
  return form;
}

export async function bytesOf(response: Response): Promise<Buffer> {
  return Buffer.from(await response.arrayBuffer());
}
