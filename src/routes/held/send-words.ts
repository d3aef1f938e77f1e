import type { SyncState } from '#src/replica/sync-state.ts';
import { momentWords } from '#src/words/day-words.ts';

/** How sending stands, in one or two sentences: what is wrong, and what happens next. */
export function sendWords(sync: SyncState, timeZone: string, today: string): string {
  const heard = sync.lastHeardAt
    ? `Last heard ${momentWords(sync.lastHeardAt, timeZone, today)}.`
    : 'The server was not heard yet.';
  if (sync.phase === 'sign-in-needed') {
    return `The server asks for your password again. What is held stays here until then. ${heard}`;
  }
  if (sync.phase === 'offline') return `No way to the server just now. It is tried again by itself. ${heard}`;
  if (sync.phase === 'failed')
    return `${sync.words ?? 'The server could not take it.'} It is tried again by itself. ${heard}`;
  return sync.heldOps + sync.heldPhotos > 0 ? `It goes by itself. ${heard}` : `All sent. ${heard}`;
}
