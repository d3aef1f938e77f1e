/** What came of one attempt to send and hear. */
export type SyncResult =
  | { outcome: 'done'; sent: number; rows: number }
  | { outcome: 'offline' }
  | { outcome: 'sign-in-needed' }
  | { outcome: 'failed'; words: string };

/** How this device stands with the server. Times are ISO 8601. */
export interface SyncState {
  phase: 'idle' | 'syncing' | 'offline' | 'sign-in-needed' | 'failed';
  heldOps: number;
  /** pictures of this person's that the server does not have whole */
  heldPhotos: number;
  isSendingPhotos: boolean;
  oldestHeldAt: string | null;
  lastHeardAt: string | null;
  /** how far the device's own clock is ahead (behind, where negative); null unless wrong by more than two minutes */
  clockAheadMs: number | null;
  /** whether the browser has promised to keep what is held */
  storage: 'persistent' | 'best-effort' | 'unknown';
  words?: string;
  /** the foreman has shut this device out: it hears nothing more, and what it sends is set aside */
  isShutOut?: true;
  /** the device in whose place this one came: what it held and never sent is missing */
  replacedDevice?: { label: string; lastHeardAt: string | null };
}
