import type { World } from './world.ts';

export type Heard = 'ended' | 'refused' | 'unreachable';

/** Reads the server's event stream until it ends, calling `onHail` for each event. */
export async function hearHails(
  fetchAsMe: (path: string, init: RequestInit) => Promise<Response>,
  onHail: () => void,
  signal: AbortSignal,
): Promise<Heard> {
  try {
    const response = await fetchAsMe('/api/events', { headers: { Accept: 'text/event-stream' }, signal });
    if (!response.ok || !response.body) return 'refused';
    await readEvents(response.body, onHail);
    return 'ended';
  } catch {
    // a stream that breaks off is how lost signal shows itself
    return 'unreachable';
  }
}

// an event ends with an empty line; comment lines only keep the way open
async function readEvents(body: ReadableStream<Uint8Array>, onHail: () => void): Promise<void> {
  const decoder = new TextDecoder();
  let rest = '';
  for (const reader = body.getReader(); ;) {
    const { done, value } = await reader.read();
    if (done) return;
    const events = (rest + decoder.decode(value, { stream: true }).replaceAll('\r\n', '\n')).split('\n\n');
    rest = events.pop()!;
    if (events.some((event) => /^event: ?changed$/m.test(event))) onHail();
  }
}

const WAIT_MIN_MS = 1000;
const WAIT_MAX_MS = 5 * 60_000;

/** How long to wait before try number `tries` (from 1): doubled each time, and never the same on two devices. */
export function backOffMs(tries: number, { random }: Pick<World, 'random'>): number {
  const whole = Math.min(WAIT_MAX_MS, WAIT_MIN_MS * 2 ** Math.min(tries, 20));
  return whole / 2 + (whole / 2) * random();
}
