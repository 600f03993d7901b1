import { DestroyRef, ElementRef, inject, signal, type Signal } from '@angular/core';

/**
 * Width of the host element in whole CSS px, 0 until it is first measured. A chart lays itself out again for a new width instead
 * of being scaled, so that its text stays 14 px.
 */
export function measuredWidth(): Signal<number> {
  const host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  const width = signal(Math.floor(host.getBoundingClientRect().width));
  const observer = new ResizeObserver((entries) => {
    const entry = entries.at(-1);
    if (entry) width.set(Math.floor(entry.contentRect.width));
  });
  observer.observe(host);
  inject(DestroyRef).onDestroy(() => observer.disconnect());
  return width.asReadonly();
}
