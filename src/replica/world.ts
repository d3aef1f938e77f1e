import type { PreparedPicture } from './photos/picture.ts';

/** What tells the tabs of one device of each other's doings. */
export interface Channel {
  post(message: string): void;
  listen(listener: (message: string) => void): () => void;
}

/** Lets one tab at a time do something; `work` runs once the name is free. */
export interface Locks {
  request<T>(name: string, work: () => Promise<T>): Promise<T>;
}

/** The browser's promise to keep what is stored, and how much room it gives, in bytes. */
export interface StorageKeeping {
  estimate(): Promise<{ quota?: number; usage?: number }>;
  persist(): Promise<boolean>;
  persisted(): Promise<boolean>;
}

/** All of the outside that the replica touches. `src/main.tsx` makes the real one. */
export interface World {
  indexedDB: IDBFactory;
  fetch: typeof globalThis.fetch;
  /** the device's own clock, in milliseconds since 1970 */
  now(): number;
  /** a number from 0 to below 1 */
  random(): number;
  randomBytes(count: number): Uint8Array;
  /** null where the browser has none: then each tab is on its own, and the record stays right, with more traffic */
  locks: Locks | null;
  channel: Channel;
  storage: StorageKeeping | null;
  /** calls `work` after `ms` unless cancelled by what it returns */
  after(ms: number, work: () => void): () => void;
  /** tells of regained signal, focus, and the page becoming visible */
  onWake(listener: () => void): () => void;
  /** the bytes of a text in gzip, or null where the browser cannot */
  gzip: ((text: string) => Promise<Blob>) | null;
  /** Makes a picture of a file ready to be sent. Rejects with a PictureError where it is none. */
  preparePicture(file: File): Promise<PreparedPicture>;
  timeZone: string;
  appVersion: string;
  /** told when another tab, on an older version, holds a database back */
  onBlocked(): void;
  /** told of what should not have happened */
  report(error: unknown): void;
}
