import { clientsClaim } from 'workbox-core';
import {
  addRoute,
  cleanupOutdatedCaches,
  precache,
  PrecacheFallbackPlugin,
  type PrecacheEntry,
} from 'workbox-precaching';
import { NavigationRoute, registerRoute } from 'workbox-routing';
import { NetworkOnly } from 'workbox-strategies';

declare const self: ServiceWorkerGlobalScope;
/** Every file of this build and the page itself, put in by `server/commands/build-pages.mjs`. */
declare const PRECACHE: PrecacheEntry[];

/** After this the page of this build is opened instead of the one that the line is slow to bring, s. */
const PATIENCE = 3;

/**
 * Opens the product without a line: the page and its files as they were built together. The page is kept as the one response
 * it came as, so that its nonce and its policy's agree. Nothing under /api is ever kept or answered here.
 */
precache(PRECACHE);
cleanupOutdatedCaches();

// Before the route of the files, which knows the page by its address too: with a line the page is always the server's.
registerRoute(
  new NavigationRoute(
    new NetworkOnly({
      networkTimeoutSeconds: PATIENCE,
      plugins: [
        {
          // A proxy's word that the server is away is no page.
          fetchDidSucceed: ({ response }) => {
            if (response.status >= 500) throw new Error(`answered with ${response.status}`);
            return Promise.resolve(response);
          },
        },
        new PrecacheFallbackPlugin({ fallbackURL: '/' }),
      ],
    }),
    { denylist: [/^\/api\//] },
  ),
);
addRoute({ directoryIndex: '', cleanURLs: false });

// The first worker serves the page that is open; a newer one waits until the old pages are closed or a person asks for it.
self.addEventListener('message', (event) => {
  if (event.data === 'take over') void self.skipWaiting();
});
clientsClaim();
