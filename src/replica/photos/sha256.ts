/** The SHA-256 of bytes, in lower-case hex. */
export async function sha256Of(bytes: ArrayBuffer): Promise<string> {
  const hash = new Uint8Array(await digest(bytes));
  return Array.from(hash, (byte) => byte.toString(16).padStart(2, '0')).join('');
}

// missing on pages that came without TLS from elsewhere than this machine
async function digest(bytes: ArrayBuffer): Promise<ArrayBufferLike> {
  if (globalThis.crypto?.subtle) return crypto.subtle.digest('SHA-256', bytes);
  const { sha256 } = await import('@noble/hashes/sha2.js');
  return sha256(new Uint8Array(bytes)).buffer;
}
