import { computed, inject, Injectable } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router } from '@angular/router';
import { filter, map, startWith } from 'rxjs';
import type { ScopeQuery } from '#shared/contracts/fields';
import { addDays, isoWeek, mondayOf } from '#shared/domain/calendar';
import { Catalogue } from '../catalogue/catalogue';
import { type Period, type ScopeChoice, scopeFromUrl, scopeToUrl } from './scope-url';

/** The period of a page that is opened without one. */
export const DEFAULT_WEEKS = 26;

/** What the page is about: whose jobs, of which time, of which kind. The URL is its only memory. */
@Injectable({ providedIn: 'root' })
export class ScopeState {
  private readonly router = inject(Router);
  private readonly catalogue = inject(Catalogue);

  /** As the URL says it. */
  readonly choice = toSignal(
    this.router.events.pipe(
      filter((event) => event instanceof NavigationEnd),
      startWith(undefined),
      map(() => scopeFromUrl(this.router.parseUrl(this.router.url).queryParams)),
    ),
    { requireSync: true },
  );

  readonly regions = computed(() => this.choice().regions);
  readonly branches = computed(() => this.choice().branches);
  readonly package = computed(() => this.choice().packages);
  readonly bodyType = computed(() => this.choice().bodyTypes);
  /** The chosen period, or the last 26 weeks. */
  readonly period = computed<Period>(
    () => this.choice().period ?? { kind: 'last', weeks: DEFAULT_WEEKS },
  );
  /** First day of the period; `undefined` until today is known. */
  readonly from = computed(() => this.dates()?.from);
  /** Last day of the period. */
  readonly to = computed(() => this.dates()?.to);
  /** The last ISO week that is over; `undefined` until today is known. */
  readonly lastWholeWeek = computed(() => {
    const today = this.catalogue.today();
    return today && isoWeek(addDays(mondayOf(today), -7));
  });
  /** The chosen week, or the last that is over. */
  readonly week = computed(() => this.choice().week ?? this.lastWholeWeek());

  /** Everything but the dates, as query parameters of a call. */
  readonly filters = computed<ScopeQuery>(() => ({
    region: some(this.regions()),
    branch: some(this.branches()),
    package: some(this.package()),
    bodyType: some(this.bodyType()),
  }));
  /** The whole scope as query parameters of a call; `undefined` until today is known. */
  readonly query = computed<ScopeQuery | undefined>(() => {
    const dates = this.dates();
    return dates && { ...this.filters(), ...dates };
  });

  /**
   * The scope of pages that speak of all cars unless dates of completion are chosen, with the day as of which they do; `undefined`
   * while chosen weeks wait for today.
   */
  readonly completedQuery = computed<(ScopeQuery & { readonly asOf?: string }) | undefined>(() => {
    const { period, asOf } = this.choice();
    const dates = period ? this.dates() : {};
    return dates && { ...this.filters(), ...dates, asOf };
  });

  private readonly dates = computed(() => datesOf(this.period(), this.catalogue.today()));

  /** Changes parts of the scope: a new entry in the browser's history, so that one can go back. */
  change(change: Partial<ScopeChoice>): Promise<boolean> {
    return this.router.navigate([], {
      // A page of a list makes no sense in another scope.
      queryParams: { ...scopeToUrl(change), cursor: null },
      queryParamsHandling: 'merge',
    });
  }
}

/** The dates of a period, both included; weeks end today and begin on a Monday, as the API's own default does. */
export function datesOf(
  period: Period,
  today: string | undefined,
): { readonly from: string; readonly to: string } | undefined {
  if (period.kind === 'dates') return { from: period.from, to: period.to };
  return today ? { from: addDays(mondayOf(today), -7 * (period.weeks - 1)), to: today } : undefined;
}

function some<T>(values: readonly T[]): T[] | undefined {
  return values.length > 0 ? [...values] : undefined;
}
