import { DOCUMENT, inject, Injectable, signal } from '@angular/core';

/** Sees to the worker that opens the product without a line, and tells when a newer version of both lies ready. */
@Injectable({ providedIn: 'root' })
export class NewerVersion {
  private readonly document = inject(DOCUMENT);
  private readonly waiting = signal<ServiceWorker | undefined>(undefined);

  /** A newer version, fetched whole, waits for this page to be opened anew. */
  readonly ready = this.waiting.asReadonly();

  constructor() {
    const address = this.document.querySelector<HTMLMetaElement>('meta[name="service-worker"]');
    // The page names a worker only where it was built with one, and a browser has workers only where it was served over TLS.
    if (!address || !('serviceWorker' in navigator)) return;
    // Fetching every page for later must not slow down the one that is being opened.
    setTimeout(() => void this.register(address.content), 3_000);
  }

  /** Goes over to the newer version: opens this page anew, because a person asked for it. */
  takeOver(): void {
    const reload = (): void => this.document.location.reload();
    navigator.serviceWorker.addEventListener('controllerchange', reload, { once: true });
    this.waiting()?.postMessage('take over');
  }

  private async register(address: string): Promise<void> {
    try {
      const registered = await navigator.serviceWorker.register(scriptUrl(address));
      if (navigator.serviceWorker.controller) this.waiting.set(registered.waiting ?? undefined);
      registered.addEventListener('updatefound', () => {
        const coming = registered.installing;
        coming?.addEventListener('statechange', () => {
          // The first worker ever is no newer version of anything.
          const newer = coming.state === 'installed' && navigator.serviceWorker.controller;
          if (newer) this.waiting.set(coming);
        });
      });
    } catch {
      // No line just now, or the browser does not want one: the product works without it, with a line.
    }
  }
}

/** The page's policy takes the address of a script only from a named maker; this one makes no other than the worker's. */
function scriptUrl(address: string): string {
  if (address !== '/service-worker.js') throw new Error(`${address} is not the worker's address`);
  const factory = (globalThis as { trustedTypes?: TrustedTypes }).trustedTypes;
  if (!factory) return address;
  return factory
    .createPolicy('underseam', { createScriptURL: (text) => text })
    .createScriptURL(address) as string;
}

/** What is used of Trusted Types (W3C), which the compiler does not know yet. */
interface TrustedTypes {
  createPolicy(
    name: string,
    rules: { createScriptURL: (text: string) => string },
  ): { createScriptURL(text: string): unknown };
}
