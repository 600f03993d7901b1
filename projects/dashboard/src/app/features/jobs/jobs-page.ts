import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatMenuModule } from '@angular/material/menu';
import { Router, RouterLink } from '@angular/router';
import { exportJobs } from '#shared/contracts/exports';
import { listJobs } from '#shared/contracts/job-list';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { Catalogue } from '../../core/catalogue/catalogue';
import { keepLive } from '../../core/live/keep-live';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { DataTable } from '../../ui/data-table/data-table';
import { EmptyNext } from '../../ui/empty-next/empty-next';
import { currencySign, formatCounted } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { narrowWindow } from '../../ui/narrow';
import { jobColumns } from './job-columns';
import {
  ageBandOf,
  filterWords,
  flagOf,
  type JobFilters,
  sideOf,
  sortOf,
  useOf,
  zoneOf,
} from './job-filters';
import { JobList } from './job-list';
import { jobsSentence } from './jobs-sentence';
import { sortsFor } from './sort-words';

/** Cars shown at a time. */
const PAGE = 50;

/** All jobs one may see: filtered, searched and ordered by the URL, page by page. */
@Component({
  selector: 'us-jobs-page',
  imports: [
    Answer,
    CsvLink,
    DataTable,
    EmptyNext,
    JobList,
    LoadState,
    MatButton,
    MatMenuModule,
    RouterLink,
    ScopeLine,
  ],
  templateUrl: './jobs-page.html',
  styleUrl: './jobs-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobsPage {
  private readonly router = inject(Router);
  private readonly scope = inject(ScopeState);
  private readonly session = inject(Session);
  protected readonly catalogue = inject(Catalogue);

  // From the URL.
  readonly q = input<string>();
  readonly make = input<string>();
  readonly model = input<string>();
  readonly ageBand = input<string>();
  readonly unbilled = input<string>();
  readonly hasRot = input<string>();
  readonly hasEstimate = input<string>();
  readonly zone = input<string>();
  readonly side = input<string>();
  readonly product = input<string>();
  readonly use = input<string>();
  readonly sort = input<string>();
  readonly cursor = input<string>();

  protected readonly narrow = narrowWindow();
  protected readonly recorder = computed(() => this.session.role() === 'recorder');
  protected readonly mayImport = computed(
    () => this.session.role() === 'site_manager' || this.session.role() === 'head_office',
  );
  /** Whose jobs, as the URL of another page has it. */
  protected readonly places = computed(() => ({
    region: this.scope.regions(),
    branch: this.scope.branches(),
  }));
  protected readonly forImport = computed(() => {
    const [branch, ...others] = this.scope.branches();
    return branch && others.length === 0 ? { branch } : {};
  });
  protected readonly filters = computed<JobFilters>(() => ({
    q: this.q() || undefined,
    make: this.make() || undefined,
    model: this.model() || undefined,
    ageBand: ageBandOf(this.ageBand()),
    unbilled: flagOf(this.unbilled()),
    hasRot: flagOf(this.hasRot()),
    hasEstimate: flagOf(this.hasEstimate()),
    zone: zoneOf(this.zone()),
    // A side narrows a zone, a use a product: neither means anything alone.
    side: zoneOf(this.zone()) && sideOf(this.side()),
    product: this.product() || undefined,
    use: this.product() ? useOf(this.use()) : undefined,
  }));
  protected readonly inForce = computed(() =>
    filterWords(this.filters(), (code) => this.catalogue.productName(code)),
  );
  protected readonly sorts = computed(() => sortsFor(this.recorder() ? 'hidden' : 'shown'));
  protected readonly order = computed(() => {
    const wanted = sortOf(this.sort());
    return this.sorts().find((one) => one.sort === wanted) ?? this.sorts()[0];
  });

  /** The list has no default period: without one in the URL it holds all dates. */
  protected readonly query = computed(() => {
    const dated = this.scope.choice().period !== undefined;
    const scope = dated ? this.scope.query() : this.scope.filters();
    return scope && { ...scope, ...this.filters(), sort: this.order()?.sort ?? 'completed' };
  });
  protected readonly jobs = keepLive(
    inject(Api).read(listJobs, () => {
      const query = this.query();
      return query && { query: { ...query, limit: PAGE, cursor: this.cursor() || undefined } };
    }),
    'jobs',
  );

  protected readonly rows = computed(() => this.jobs.value()?.items ?? []);
  protected readonly columns = computed(() =>
    jobColumns({
      branchName: (code) => this.catalogue.branchName(code),
      packageWord: (code) => this.catalogue.packageWord(code),
      branches: this.catalogue.branches().length > 1 ? 'several' : 'one',
      money: this.recorder() ? 'hidden' : 'shown',
    }),
  );
  protected readonly answer = computed(() =>
    jobsSentence(this.jobs.value()?.jobs ?? 0, this.inForce()),
  );
  protected readonly export = exportJobs;
  protected readonly csvWords = computed(
    () => `CSV of these ${formatCounted(this.jobs.value()?.jobs ?? 0, 'row', 'rows')}`,
  );
  protected readonly sign = computed(() => currencySign(this.catalogue.currency()));
  /** Query parameters that lift every filter but the scope. */
  protected readonly unwanted = computed<Readonly<Record<string, null>>>(() =>
    this.inForce().reduce((all, filter) => ({ ...all, ...filter.without }), { cursor: null }),
  );

  /** Puts something into the URL, where the list reads it; the first page of it. */
  protected set(change: Readonly<Record<string, string | null>>): void {
    void this.router.navigate([], {
      queryParams: { ...change, cursor: null },
      queryParamsHandling: 'merge',
      scroll: 'manual',
    });
  }

  protected toggle(name: 'unbilled' | 'hasRot'): void {
    this.set({ [name]: this.filters()[name] ? null : 'true' });
  }

  protected search(event: Event, words: string): void {
    event.preventDefault();
    this.set({ q: words.trim() || null });
  }
}
