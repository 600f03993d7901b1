import { DestroyRef, effect, inject, signal, type Signal } from '@angular/core';

/** What became of a picture that is being fetched. */
export type Fetched =
  | { readonly kind: 'coming' }
  | { readonly kind: 'there'; readonly url: string }
  | { readonly kind: 'missing' };

/** The address of bytes for as long as their picture is on the page; given back afterwards. Call it in an injection context. */
export function objectUrl(load: () => Promise<Blob | undefined>): Signal<Fetched> {
  const fetched = signal<Fetched>({ kind: 'coming' });
  let url: string | undefined;
  let last = 0;
  const giveBack = (): void => {
    if (url !== undefined) URL.revokeObjectURL(url);
    url = undefined;
  };
  effect(() => {
    const turn = (last += 1);
    load().then(
      (blob) => {
        if (turn !== last) return;
        giveBack();
        url = blob && URL.createObjectURL(blob);
        fetched.set(url === undefined ? { kind: 'missing' } : { kind: 'there', url });
      },
      () => {
        if (turn === last) fetched.set({ kind: 'missing' });
      },
    );
  });
  inject(DestroyRef).onDestroy(() => {
    last += 1;
    giveBack();
  });
  return fetched.asReadonly();
}
