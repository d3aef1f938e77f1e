/// <reference lib="webworker" />
import { clientsClaim } from 'workbox-core';
import { cleanupOutdatedCaches, createHandlerBoundToURL, precacheAndRoute } from 'workbox-precaching';
import { NavigationRoute, registerRoute } from 'workbox-routing';

declare const self: ServiceWorkerGlobalScope;

// The worker keeps the app's own files and nothing else: the record is the replica's, in IndexedDB, which no update may touch.
precacheAndRoute(self.__WB_MANIFEST);
cleanupOutdatedCaches();
clientsClaim();

registerRoute(new NavigationRoute(createHandlerBoundToURL('/index.html'), { denylist: [/^\/api(\/|$)/] }));

self.addEventListener('message', (event) => {
  // a newer version waits until the person says so
  if (event.data?.type === 'SKIP_WAITING') void self.skipWaiting();
});
