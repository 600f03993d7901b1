import { DestroyRef, inject } from '@angular/core';

/** Tells the product's other windows on this device that something kept here has changed. */
export interface Windows {
  tell(): void;
}

/** Listens to the other windows; where a browser has no such channel, they see changes when they are opened anew. */
export function otherWindows(hear: () => void): Windows {
  if (typeof BroadcastChannel === 'undefined') return { tell: () => undefined };
  const channel = new BroadcastChannel('underseam.drafts');
  channel.onmessage = () => hear();
  inject(DestroyRef).onDestroy(() => channel.close());
  return { tell: () => channel.postMessage('changed') };
}
