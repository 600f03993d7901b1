import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatMenuModule } from '@angular/material/menu';
import { Router, RouterLink } from '@angular/router';
import { type ClaimRow, listClaims } from '#shared/contracts/claim-list';
import { exportClaims } from '#shared/contracts/exports';
import { AGE_BANDS, CLAIM_CAUSES, CLAIM_DECISIONS, ZONES } from '#shared/domain/vocabulary';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { joinReadings } from '../../core/api/join-readings';
import { Catalogue } from '../../core/catalogue/catalogue';
import { keepLive } from '../../core/live/keep-live';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { placesWords } from '../../core/scope-line/scope-words';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { DecisionMark } from '../../ui/claims/decision-mark';
import { CellTemplate } from '../../ui/data-table/cell-template';
import { DataTable } from '../../ui/data-table/data-table';
import { EmptyNext } from '../../ui/empty-next/empty-next';
import { currencySign, formatCounted } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { narrowWindow } from '../../ui/narrow';
import { CLAIM_CAUSE_NAMES, CLAIM_DECISION_NAMES } from '../../ui/words';
import { claimColumns } from './claim-columns';
import {
  ageWords,
  filtersOf,
  filterWords,
  halfYearsTo,
  halfYearWords,
  sortOf,
  zoneWords,
} from './claim-filters';
import { ClaimList } from './claim-list';
import { answerClaims } from './claims-answer';
import { FilterMenu } from './filter-menu';
import { sortsFor } from './sort-words';

/** Claims shown at a time. */
const PAGE = 50;
/** Half-years of completion on offer: as far back as warranties reach, and a little. */
const HALF_YEARS = 12;

/** All claims one may see: filtered, searched and ordered by the URL, page by page. */
@Component({
  selector: 'us-claims-page',
  imports: [
    Answer,
    CellTemplate,
    ClaimList,
    CsvLink,
    DataTable,
    DecisionMark,
    EmptyNext,
    FilterMenu,
    LoadState,
    MatButton,
    MatMenuModule,
    RouterLink,
    ScopeLine,
  ],
  templateUrl: './claims-page.html',
  styleUrl: './claims-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClaimsPage {
  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly scope = inject(ScopeState);
  private readonly role = inject(Session).role;
  protected readonly catalogue = inject(Catalogue);

  // From the URL.
  readonly q = input<string>();
  readonly decision = input<string>();
  readonly waiting = input<string>();
  readonly cause = input<string>();
  readonly zone = input<string>();
  readonly ageBand = input<string>();
  readonly cohort = input<string>();
  readonly counted = input<string>();
  readonly jobRef = input<string>();
  readonly sort = input<string>();
  readonly cursor = input<string>();

  protected readonly narrow = narrowWindow();
  protected readonly money = computed(() => (this.role() === 'recorder' ? 'hidden' : 'shown'));
  protected readonly maySend = computed(() => this.role() !== 'regional_lead');
  protected readonly filters = computed(() =>
    filtersOf({
      q: this.q(),
      decision: this.decision(),
      waiting: this.waiting(),
      cause: this.cause(),
      zone: this.zone(),
      ageBand: this.ageBand(),
      cohort: this.cohort(),
      counted: this.counted(),
      jobRef: this.jobRef(),
    }),
  );
  protected readonly inForce = computed(() => filterWords(this.filters()));
  protected readonly sorts = computed(() => sortsFor(this.money()));
  protected readonly order = computed(() => {
    const wanted = sortOf(this.sort());
    return this.sorts().find((one) => one.sort === wanted) ?? this.sorts()[0];
  });

  protected readonly decisions = CLAIM_DECISIONS.map((value) => ({
    value,
    words: CLAIM_DECISION_NAMES[value],
  }));
  protected readonly causes = CLAIM_CAUSES.map((value) => ({
    value,
    words: CLAIM_CAUSE_NAMES[value],
  }));
  protected readonly zones = ZONES.map((value) => ({ value, words: zoneWords(value) }));
  protected readonly ages = AGE_BANDS.map((value) => ({ value, words: ageWords(value) }));
  protected readonly cohorts = computed(() => {
    const offered = halfYearsTo(this.catalogue.today() ?? '', HALF_YEARS);
    const chosen = this.filters().cohort;
    const all = chosen && !offered.includes(chosen) ? [...offered, chosen] : offered;
    return this.catalogue.today()
      ? all.map((value) => ({ value, words: halfYearWords(value) }))
      : [];
  });
  protected readonly standings = [
    { value: 'true', words: 'count' },
    { value: 'false', words: 'do not count' },
  ];

  /** The list has no default period: without one in the URL it holds the claims on all jobs. */
  private readonly asked = computed(() => {
    const dated = this.scope.choice().period !== undefined;
    return dated ? this.scope.query() : this.scope.filters();
  });
  protected readonly query = computed(() => {
    const scope = this.asked();
    return scope && { ...scope, ...this.filters(), sort: this.order()?.sort ?? 'made' };
  });
  protected readonly claims = this.api.read(listClaims, () => {
    const query = this.query();
    return query && { query: { ...query, limit: PAGE, cursor: this.cursor() || undefined } };
  });
  private readonly open = this.api.read(listClaims, () => {
    const scope = this.asked();
    return scope && { query: { ...scope, decision: 'open' as const, limit: 1 } };
  });
  private readonly forOffice = this.api.read(listClaims, () => {
    const scope = this.asked();
    return scope && { query: { ...scope, waiting: true, limit: 1 } };
  });
  protected readonly all = keepLive(
    joinReadings({
      claims: this.claims,
      open: this.open,
      waiting: this.forOffice,
    }),
    'claims',
    'jobs',
  );

  protected readonly rows = computed(() => this.claims.value()?.items ?? []);
  protected readonly columns = computed(() =>
    claimColumns({
      branchName: (code) => this.catalogue.branchName(code),
      branches: this.catalogue.branches().length > 1 ? 'several' : 'one',
      money: this.money(),
    }),
  );
  protected readonly answer = computed(() => {
    const counts = this.all.value();
    return (
      counts &&
      answerClaims({
        places: this.placesWords(),
        claims: counts.claims.claims,
        costCents: counts.claims.costCents,
        currency: this.catalogue.currency(),
        open: counts.open.claims,
        waiting: counts.waiting.claims,
        narrowed: this.inForce(),
      })
    );
  });
  protected readonly export = exportClaims;
  protected readonly csvWords = computed(
    () => `CSV of these ${formatCounted(this.claims.value()?.claims ?? 0, 'row', 'rows')}`,
  );
  protected readonly sign = computed(() => currencySign(this.catalogue.currency()));
  /** Query parameters that lift every filter but the scope. */
  protected readonly unwanted: Readonly<Record<string, null>> = Object.fromEntries(
    [...Object.keys(filtersOf({} as never)), 'cursor'].map((name) => [name, null]),
  );

  /** Puts something into the URL, where the list reads it; the first page of it. */
  protected set(change: Readonly<Record<string, string | null>>): void {
    void this.router.navigate([], {
      queryParams: { ...change, cursor: null },
      queryParamsHandling: 'merge',
      scroll: 'manual',
    });
  }

  protected search(event: Event, words: string): void {
    event.preventDefault();
    this.set({ q: words.trim() || null });
  }

  protected row(row: unknown): ClaimRow {
    return row as ClaimRow;
  }

  private placesWords(): string {
    const known = this.catalogue;
    const branches = known.branches();
    const regions = known
      .regions()
      .filter(({ code }) => branches.some(({ region }) => region === code));
    return placesWords(
      {
        regions: this.scope.regions().map((code) => known.regionName(code)),
        branches: this.scope.branches().map((code) => known.branchName(code)),
      },
      {
        regions: regions.map(({ name }) => name),
        branches: branches.map(({ name }) => name),
      },
      this.role(),
    );
  }
}
