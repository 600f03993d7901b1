import { inject, Injectable } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NavigationEnd, type Params, Router } from '@angular/router';
import { filter, map, startWith } from 'rxjs';

/** What of the scope goes along; the week belongs to the one page that shows a week. */
const CARRIED = ['region', 'branch', 'package', 'bodyType', 'last', 'from', 'to'] as const;

/** The part of the scope that goes along when another page is opened. */
@Injectable({ providedIn: 'root' })
export class CarriedScope {
  private readonly router = inject(Router);

  readonly query = toSignal(
    this.router.events.pipe(
      filter((event) => event instanceof NavigationEnd),
      startWith(undefined),
      map(() => carried(this.router.parseUrl(this.router.url).queryParams)),
    ),
    { requireSync: true },
  );
}

function carried(query: Params): Params {
  return Object.fromEntries(
    CARRIED.filter((name) => name in query).map((name) => [name, query[name] as unknown]),
  );
}
