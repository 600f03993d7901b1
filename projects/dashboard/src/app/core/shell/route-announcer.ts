import { LiveAnnouncer } from '@angular/cdk/a11y';
import { Directive, inject, input } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { Title } from '@angular/platform-browser';
import { NavigationEnd, Router } from '@angular/router';
import { filter, map, pairwise, startWith } from 'rxjs';

/** Says aloud which page has opened and puts the focus at its beginning, so that a reader need not search for it. */
@Directive({ selector: '[usRouteAnnouncer]' })
export class RouteAnnouncer {
  /** The element that receives the focus. */
  readonly usRouteAnnouncer = input.required<HTMLElement>();

  constructor() {
    const router = inject(Router);
    const announcer = inject(LiveAnnouncer);
    const title = inject(Title);
    router.events
      .pipe(
        filter((event) => event instanceof NavigationEnd),
        map((event) => pathOf(event.urlAfterRedirects)),
        startWith(pathOf(router.url)),
        pairwise(),
        filter(([before, now]) => before !== now),
        takeUntilDestroyed(),
      )
      .subscribe(() => {
        this.usRouteAnnouncer().focus({ preventScroll: true });
        void announcer.announce(title.getTitle().replace(' · Underseam', ''));
      });
  }
}

/** A changed filter or anchor is the same page. */
function pathOf(url: string): string {
  return url.split(/[?#]/, 1)[0] ?? '';
}
