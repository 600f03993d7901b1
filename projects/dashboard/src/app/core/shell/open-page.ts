import { computed, inject, Injectable } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router } from '@angular/router';
import { filter, map, startWith } from 'rxjs';
import { PAGES, PAGES_BEHIND } from './pages';

/** Which page of the header, or behind one of them, is open. */
@Injectable({ providedIn: 'root' })
export class OpenPage {
  private readonly router = inject(Router);
  private readonly url = toSignal(
    this.router.events.pipe(
      filter((event) => event instanceof NavigationEnd),
      map((event) => event.urlAfterRedirects),
      startWith(this.router.url),
    ),
    { requireSync: true },
  );

  /** Its name, or `undefined` on a page that neither names. */
  readonly name = computed(() => {
    const path = this.url().split(/[?#]/, 1)[0] ?? '';
    return [...PAGES, ...PAGES_BEHIND].find(
      (page) => path === page.path || path.startsWith(`${page.path}/`),
    )?.name;
  });
}
