import type { Channel, Locks, World } from './world.ts';

/** The browser as the replica's world. `onBlocked` is called when another tab holds a newer version of a database back. */
export function browserWorld(appVersion: string, onBlocked: () => void): World {
  return {
    indexedDB: window.indexedDB,
    fetch: (...request) => window.fetch(...request),
    now: () => Date.now(),
    random: () => Math.random(),
    randomBytes: (count) => crypto.getRandomValues(new Uint8Array(count)),
    // missing on pages that came without TLS from elsewhere than this machine
    locks: 'locks' in navigator ? lockManager(navigator.locks) : null,
    channel: broadcastChannel(),
    storage: 'storage' in navigator ? navigator.storage : null,
    after(ms, work) {
      const timer = window.setTimeout(work, ms);
      return () => window.clearTimeout(timer);
    },
    onWake: listenForWaking,
    gzip: 'CompressionStream' in window ? gzip : null,
    // read when the first picture is taken: nobody else waits for it
    preparePicture: async (file) => (await import('./photos/prepare.ts')).preparePicture(file),
    timeZone: Intl.DateTimeFormat().resolvedOptions().timeZone,
    appVersion,
    onBlocked,
    report: (error) => window.reportError(error),
  };
}

function lockManager(locks: LockManager): Locks {
  return {
    request: async <T>(name: string, work: () => Promise<T>) => (await locks.request(name, work)) as T,
  };
}

function broadcastChannel(): Channel {
  const channel = 'BroadcastChannel' in window ? new BroadcastChannel('ribband') : null;
  return {
    post: (message) => channel?.postMessage(message),
    listen(listener) {
      const hear = (event: MessageEvent) => listener(String(event.data));
      channel?.addEventListener('message', hear);
      return () => channel?.removeEventListener('message', hear);
    },
  };
}

function listenForWaking(listener: () => void): () => void {
  const onVisible = () => document.visibilityState === 'visible' && listener();
  window.addEventListener('online', listener);
  // a round that fails at once has the screen say that there is no signal
  window.addEventListener('offline', listener);
  window.addEventListener('focus', listener);
  document.addEventListener('visibilitychange', onVisible);
  return () => {
    window.removeEventListener('online', listener);
    window.removeEventListener('offline', listener);
    window.removeEventListener('focus', listener);
    document.removeEventListener('visibilitychange', onVisible);
  };
}

async function gzip(text: string): Promise<Blob> {
  const zipped = new Blob([text]).stream().pipeThrough(new CompressionStream('gzip'));
  return new Response(zipped).blob();
}
