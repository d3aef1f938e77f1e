import { inTime, isUnreachable, wordsOf, NOT_OURS } from '../request.ts';
import type { SyncResult } from '../sync-state.ts';
import type { World } from '../world.ts';
import type { PictureStore, Queued } from './picture-store.ts';

/** How long the server may take to answer, in milliseconds; a whole picture goes over a thin line in that. */
const ANSWER_MAX_MS = { thumb: 60_000, full: 5 * 60_000, head: 20_000 };
/** The server wants none of it, now or later: bytes that it cannot take, or a person who may not send any. */
const REFUSALS = [403, 413, 415, 422];

/** What came of sending: null where all of it is sent, or refused. */
export type NotSent = Exclude<SyncResult, { outcome: 'done' }> | null;

export interface Sending {
  world: World;
  store: PictureStore;
  /** as the person whose pictures they are */
  fetch: (path: string, init: RequestInit) => Promise<Response>;
  /** called after each that the server has taken, or refused */
  onSent: () => void;
}

type Step = { sha256: string; queued: Queued; size: 'thumb' | 'full' };

/** How many pictures may fail in one go before the server is taken to be unwell. */
const FAILED_MAX = 3;

/**
 * Sends the pictures of the record that wait, one at a time: all thumbnails, then the whole ones. A kill anywhere leaves
 * no more than a repeat; one that the server fails at holds up none of the others. Whoever calls it sees to it that one
 * call runs at a time.
 */
export async function sendPictures(sending: Sending): Promise<NotSent> {
  const failed = new Set<string>();
  let last: NotSent = null;
  await sending.store.read();
  while (failed.size < FAILED_MAX) {
    const step = nextStep(sending.store, failed);
    if (!step) break;
    const notSent = await take(sending, step);
    if (notSent && notSent.outcome !== 'failed') return notSent;
    if (notSent) failed.add(step.sha256);
    else sending.onSent();
    last = notSent ?? last;
  }
  return last;
}

/** Whether anything waits to be sent, as far as this tab knows. */
export function hasWaiting(store: PictureStore): boolean {
  return nextStep(store, new Set()) !== null;
}

function nextStep({ queue }: PictureStore, without: ReadonlySet<string>): Step | null {
  const waiting = [...queue].filter(
    ([sha256, { attachedFor, refused }]) =>
      attachedFor.length > 0 && refused === null && !without.has(sha256),
  );
  for (const size of ['thumb', 'full'] as const) {
    const found = waiting.find(([, { arrived }]) => arrived === (size === 'thumb' ? null : 'thumb'));
    if (found) return { sha256: found[0], queued: found[1], size };
  }
  return null;
}

async function take(sending: Sending, step: Step): Promise<NotSent> {
  const { store } = sending;
  const { sha256, size, queued } = step;
  const bytes = await store.bytes(sha256, [size]);
  if (!bytes) {
    await store.note(sha256, { refused: 'This device can no longer read the picture. Take it again.' });
    return null;
  }
  try {
    if (size === 'full' && queued.isInDoubt && (await isThere(sending, sha256))) {
      await store.note(sha256, { arrived: 'full', isInDoubt: false });
      return null;
    }
    if (size === 'full') await store.note(sha256, { isInDoubt: true });
    return await put(sending, step, bytes);
  } catch (error) {
    if (!isUnreachable(error)) throw error;
    return { outcome: 'offline' };
  }
}

async function isThere({ world, fetch }: Sending, sha256: string): Promise<boolean> {
  const response = await inTime(world, ANSWER_MAX_MS.head, (signal) =>
    fetch(`/api/photos/${sha256}`, { method: 'HEAD', signal }),
  );
  return response.ok && isServers(response);
}

async function put({ world, store, fetch }: Sending, { sha256, size }: Step, bytes: Blob): Promise<NotSent> {
  const path = `/api/photos/${sha256}${size === 'thumb' ? '/thumb' : ''}`;
  const response = await inTime(world, ANSWER_MAX_MS[size], (signal) => {
    const body = new FormData();
    body.append('photo', bytes, `${sha256}.jpg`);
    return fetch(path, { method: 'PUT', body, signal });
  });
  if (response.status === 401) return { outcome: 'sign-in-needed' };
  if (REFUSALS.includes(response.status)) {
    await store.note(sha256, { refused: await wordsOf(response), isInDoubt: false });
    return null;
  }
  if (!response.ok) return { outcome: 'failed', words: await wordsOf(response) };
  if (!isServers(response)) return { outcome: 'failed', words: NOT_OURS };
  await store.note(sha256, size === 'full' ? { arrived: 'full', isInDoubt: false } : { arrived: 'thumb' });
  return null;
}

// a network that wants something first says 200 to everything, by a page of its own; bytes must not be let go of for that
function isServers(response: Response): boolean {
  return !response.redirected && !(response.headers.get('Content-Type') ?? '').startsWith('text/html');
}
