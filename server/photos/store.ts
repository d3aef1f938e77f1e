import type { Readable } from 'node:stream';

/** What a phone sends of a picture; kept as it was sent, but for place data. */
export type SentSize = 'thumb' | 'full';

/** What is made here of the whole picture for a screen, where it is first asked for. */
export type MadeSize = 'made-thumb' | 'view';

export type StoredSize = SentSize | MadeSize;

/** A picture is named by the SHA-256, in hex, of what the phone sent. */
export interface Picture {
  shopId: string;
  sha256: string;
}

export interface StoredBytes {
  bytes: number;
  stream: Readable;
}

/** Where the bytes of pictures are kept. A picture is there whole or not at all, whatever ends the server. */
export interface PictureStore {
  has(picture: Picture, size: StoredSize): Promise<boolean>;
  /** In place of what was there. Durable once it resolves. */
  put(picture: Picture, size: StoredSize, bytes: Uint8Array): Promise<void>;
  /** null where it is not there; whoever asks reads the stream or destroys it */
  read(picture: Picture, size: StoredSize): Promise<StoredBytes | null>;
  /** In all sizes, for ever. */
  remove(picture: Picture): Promise<void>;
}
