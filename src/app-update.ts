import type { Workbox } from 'workbox-window';

/** 'none': this is the newest known. 'waiting': a newer one is here. 'taken-over': another tab has let the newer one in. */
export type UpdateState = 'none' | 'waiting' | 'taken-over';

/** The app's own versions on this device. It never reloads by itself: the person chooses the moment. */
export interface AppUpdate {
  state: () => UpdateState;
  subscribe: (listener: () => void) => () => void;
  /** Lets the newer version in and loads the app again with it. What is held is untouched. */
  apply: () => void;
}

/** Registers the service worker and follows its versions; in development, or without service workers, it stays at 'none'. */
export function followAppUpdates(): AppUpdate {
  let state: UpdateState = 'none';
  let isAsked = false;
  const listeners = new Set<() => void>();
  let worker: Workbox | null = null;

  function become(next: UpdateState) {
    state = next;
    for (const listener of listeners) listener();
  }

  function follow(found: Workbox) {
    worker = found;
    found.addEventListener('waiting', () => become('waiting'));
    // the first worker of all takes over too, and replaces none
    let isControlled = navigator.serviceWorker.controller !== null;
    found.addEventListener('controlling', () => {
      if (isAsked) window.location.reload();
      // another window let it in, and the older files are gone: this one runs on with what it has loaded
      else if (isControlled) become('taken-over');
      isControlled = true;
    });
    keepFresh(found);
  }

  if (import.meta.env.PROD && 'serviceWorker' in navigator) void openWorker().then(follow, () => undefined);

  return {
    state: () => state,
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    apply() {
      if (state === 'taken-over' || !worker) return window.location.reload();
      isAsked = true;
      worker.messageSkipWaiting();
    },
  };
}

// after the first screen, which needs none of it
async function openWorker(): Promise<Workbox> {
  const { Workbox } = await import('workbox-window');
  return new Workbox('/sw.js');
}

// an installed app can stay open for weeks, and the browser itself looks only on a navigation
function keepFresh(worker: Workbox) {
  // a failure to register or to look (no signal, storage refused) leaves the app working from what it has
  const ignore = () => undefined;
  void worker.register().catch(ignore);
  document.addEventListener('visibilitychange', () => {
    if (document.visibilityState === 'visible') void worker.update().catch(ignore);
  });
}
