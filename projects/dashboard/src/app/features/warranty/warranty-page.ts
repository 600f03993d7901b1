import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { type Params, Router, RouterLink } from '@angular/router';
import {
  exportWarrantyBranches,
  exportWarrantyClaimFree,
  exportWarrantyProcess,
} from '#shared/contracts/exports';
import { CURVE_GROUPS, type CurveGroup, getWarranty } from '#shared/contracts/warranty';
import { ClaimFreeChart } from '../../charts/claim-free-curves/claim-free-chart';
import { DotIntervalChart } from '../../charts/dot-interval/dot-interval-chart';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { Catalogue } from '../../core/catalogue/catalogue';
import { keepLive } from '../../core/live/keep-live';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { DataTable } from '../../ui/data-table/data-table';
import { DefinitionLink } from '../../ui/definition-link/definition-link';
import { EmptyNext } from '../../ui/empty-next/empty-next';
import { formatCounted } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { TableTwin } from '../../ui/table-twin/table-twin';
import { CohortsSheet } from './cohorts-sheet';
import { CurveChoice } from './curve-choice';
import { expectedTable } from './expected-rows';
import { HowItCame } from './how-it-came';
import { STRATA_COLUMNS, strataRows } from './strata-rows';
import { warrantyLinks } from './warranty-links';
import { warrantyView } from './warranty-view';
import type { WarrantyWords } from './warranty-words';

/** What the warranties already sold will still cost, where risk gathers and why. */
@Component({
  selector: 'us-warranty-page',
  imports: [
    Answer,
    ClaimFreeChart,
    CohortsSheet,
    CsvLink,
    CurveChoice,
    DataTable,
    DefinitionLink,
    DotIntervalChart,
    EmptyNext,
    HowItCame,
    LoadState,
    RouterLink,
    ScopeLine,
    TableTwin,
  ],
  templateUrl: './warranty-page.html',
  styleUrl: './warranty-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WarrantyPage {
  /** What the curves are told apart by, from the URL. */
  readonly groupBy = input<string>();
  /** The groups that have a curve, from the URL. */
  readonly group = input<string | readonly string[]>();

  private readonly router = inject(Router);
  private readonly catalogue = inject(Catalogue);
  private readonly role = inject(Session).role;
  protected readonly scope = inject(ScopeState);

  protected readonly query = computed(() => {
    const scope = this.scope.completedQuery();
    return scope && { ...scope, groupBy: this.by(), group: many(this.group()) };
  });
  protected readonly warranty = keepLive(
    inject(Api).read(getWarranty, () => {
      const query = this.query();
      return query && { query };
    }),
    'jobs',
    'claims',
  );
  protected readonly words = computed((): WarrantyWords => ({
    currency: this.catalogue.currency(),
    branchName: (code) => this.catalogue.branchName(code),
    regionName: (code) => this.catalogue.regionName(code),
    packageWord: (code) => this.catalogue.packageWord(code),
  }));
  protected readonly links = computed(() =>
    warrantyLinks(this.scope.completedQuery() ?? {}, this.warranty.value()?.period ?? NO_DAYS),
  );
  protected readonly view = computed(() => {
    const answer = this.warranty.value();
    return answer && warrantyView(answer, this.words(), this.links());
  });
  /** The first day of all cars, once known; with days chosen the line says those. */
  protected readonly since = computed(() => {
    const answer = this.warranty.value();
    return answer && answer.jobs > 0 ? answer.period.from : undefined;
  });
  protected readonly isOffice = computed(() => this.role() === 'head_office');
  protected readonly claimsQuery = computed((): Params => this.scope.completedQuery() ?? {});
  protected readonly counted = computed(() => {
    const claims = this.warranty.value()?.rate.claims ?? 0;
    return formatCounted(claims, 'claim', 'claims');
  });
  protected readonly expected = computed(() => {
    const answer = this.warranty.value();
    return answer && expectedTable(answer, this.words());
  });
  protected readonly strata = computed(() => strataRows(this.view()?.pictures?.process.rows ?? []));
  protected readonly strataColumns = STRATA_COLUMNS;
  protected readonly exports = {
    curves: exportWarrantyClaimFree,
    branches: exportWarrantyBranches,
    process: exportWarrantyProcess,
  };

  /** Other groups begin with those of most cars. */
  protected showBy(groupBy: CurveGroup): void {
    this.show({ groupBy, group: null });
  }

  protected show(queryParams: Params): void {
    void this.router.navigate([], {
      queryParams,
      queryParamsHandling: 'merge',
      scroll: 'manual',
    });
  }

  private by(): CurveGroup | undefined {
    return CURVE_GROUPS.find((by) => by === this.groupBy());
  }
}

const NO_DAYS = { from: '', to: '' };

function many(value: string | readonly string[] | undefined): string[] | undefined {
  if (value === undefined || value === '') return undefined;
  return typeof value === 'string' ? [value] : [...value];
}
