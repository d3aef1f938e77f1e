import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, hexToBytes, utf8ToBytes } from '@noble/hashes/utils.js';
import { z } from 'zod';

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;
const UUID_V7 = /^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/;

export const idSchema = z.string().regex(UUID, 'a UUID in lower case');

/** The id of something made by a person: UUIDv7 (RFC 9562). */
export const newIdSchema = z.string().regex(UUID_V7, 'a UUIDv7 in lower case');

export function isUuid(text: unknown): text is string {
  return typeof text === 'string' && UUID.test(text);
}

export function isUuidV7(text: unknown): text is string {
  return typeof text === 'string' && UUID_V7.test(text);
}

export function sha256Hex(text: string): string {
  return bytesToHex(sha256(utf8ToBytes(text)));
}

/** UUIDv8 made of the first 128 bits of a SHA-256 (RFC 9562, appendix B.2), so that every device computes the same. */
export function idFromSha256(hex: string): string {
  const bytes = hexToBytes(hex.slice(0, 32));
  bytes[6] = (bytes[6]! & 0x0f) | 0x80;
  bytes[8] = (bytes[8]! & 0x3f) | 0x80;
  const text = bytesToHex(bytes);
  return [text.slice(0, 8), text.slice(8, 12), text.slice(12, 16), text.slice(16, 20), text.slice(20)].join('-');
}

/** A computed id for `name` within `namespace` (RFC 9562, appendix B.2). */
export function computedId(namespace: string, name: string): string {
  const space = hexToBytes(namespace.replaceAll('-', ''));
  const text = utf8ToBytes(name);
  const joined = new Uint8Array(space.length + text.length);
  joined.set(space);
  joined.set(text, space.length);
  return idFromSha256(bytesToHex(sha256(joined)));
}
