import { DestroyRef, DOCUMENT, inject, type Signal, signal } from '@angular/core';

/** Whether the window is as narrow as a phone's, kept up to date. Call it in an injection context. */
export function narrowWindow(): Signal<boolean> {
  return windowIs('screen and (max-width: 719.98px)');
}

/** Whether a media query holds, kept up to date. Call it in an injection context. */
export function windowIs(media: string): Signal<boolean> {
  const query = inject(DOCUMENT).defaultView?.matchMedia(media);
  const holds = signal(query?.matches ?? false);
  const follow = (event: MediaQueryListEvent): void => holds.set(event.matches);
  query?.addEventListener('change', follow);
  inject(DestroyRef).onDestroy(() => query?.removeEventListener('change', follow));
  return holds.asReadonly();
}
