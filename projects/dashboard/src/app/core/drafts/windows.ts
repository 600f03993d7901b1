import { DestroyRef, inject } from '@angular/core';

/** Tells the product's other windows on this device that something kept here has changed. */
export interface Windows {
  tell(): void;
}

/** Listens to the other windows; where a browser has no such channel, they see changes when they are opened anew. */
export function otherWindows(hear: () => void): Windows {
  if (typeof BroadcastChannel === 'undefined') return { tell: () => undefined };
  const channel = new BroadcastChannel('underseam.drafts');
  let isOpen = true;
  channel.onmessage = () => hear();
  inject(DestroyRef).onDestroy(() => {
    isOpen = false;
    channel.close();
  });
  return {
    // What was being written as the window went is kept all the same: a closed channel must not make that a failure.
    tell: () => {
      if (isOpen) channel.postMessage('changed');
    },
  };
}
