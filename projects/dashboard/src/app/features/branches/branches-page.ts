import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatChipsModule } from '@angular/material/chips';
import { type Params, Router, RouterLink } from '@angular/router';
import { getBranches, getBranchWeeks, getSideBySide } from '#shared/contracts/branches';
import { exportBranches } from '#shared/contracts/exports';
import { BRANCH_MEASURES, type BranchMeasure } from '#shared/domain/vocabulary';
import { FunnelChart } from '../../charts/funnel/funnel-chart';
import { WeekStripChart } from '../../charts/week-strip/week-strip-chart';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { Catalogue } from '../../core/catalogue/catalogue';
import { keepLive } from '../../core/live/keep-live';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { CellTemplate } from '../../ui/data-table/cell-template';
import { DataTable } from '../../ui/data-table/data-table';
import { DefinitionLink } from '../../ui/definition-link/definition-link';
import { EmptyNext } from '../../ui/empty-next/empty-next';
import { formatCounted } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { TableTwin } from '../../ui/table-twin/table-twin';
import { branchLink } from './branch-links';
import { type BranchWords, MEASURE_CHIPS } from './branch-words';
import { branchesView } from './branches-view';
import { FlagMark } from './flag-mark';
import { chosenBeside, MOST_BESIDE, sideBySide } from './side-by-side';
import { StepTable } from './step-table';
import { weekPictures } from './week-pictures';

/** Branches compared allowing for their cars, their weeks beside each other, and what sets two to four of them apart. */
@Component({
  selector: 'us-branches-page',
  imports: [
    Answer,
    CellTemplate,
    CsvLink,
    DataTable,
    DefinitionLink,
    EmptyNext,
    FlagMark,
    FunnelChart,
    LoadState,
    MatChipsModule,
    RouterLink,
    ScopeLine,
    StepTable,
    TableTwin,
    WeekStripChart,
  ],
  templateUrl: './branches-page.html',
  styleUrl: './branches-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BranchesPage {
  /** What branches are compared by, from the URL. */
  readonly measure = input<string>();
  /** The branches laid side by side, from the URL: `HAV,SKU`. */
  readonly with = input<string | readonly string[]>();

  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly catalogue = inject(Catalogue);
  private readonly role = inject(Session).role;
  protected readonly scope = inject(ScopeState);

  protected readonly by = computed<BranchMeasure>(
    () => BRANCH_MEASURES.find((one) => one === this.measure()) ?? 'overrun',
  );
  protected readonly query = computed(() => {
    const measure = this.by();
    if (measure !== 'claims') {
      const scope = this.scope.query();
      return scope && { ...scope, measure };
    }
    // Claims need years: all cars since the first branch opened, unless days are chosen.
    const from = this.chosenDays()?.from ?? this.firstDay();
    return from ? { ...this.scope.filters(), from, to: this.chosenDays()?.to, measure } : undefined;
  });
  protected readonly branches = keepLive(
    this.api.read(getBranches, () => asked(this.query())),
    'jobs',
    'claims',
  );
  protected readonly weeks = keepLive(
    this.api.read(getBranchWeeks, () => {
      if (!this.view()?.placed) return undefined;
      const measure = this.by();
      return asked(
        measure === 'claims'
          ? { ...this.scope.filters(), ...this.chosenDays(), measure }
          : this.query(),
      );
    }),
    'jobs',
    'claims',
  );
  protected readonly words = computed((): BranchWords => ({
    branchName: (code) => this.catalogue.branchName(code),
    productName: (code) => this.catalogue.productName(code),
  }));
  protected readonly view = computed(() => {
    const answer = this.branches.value();
    return (
      answer &&
      branchesView(answer, this.words(), {
        today: this.catalogue.today(),
        linkOf: (branch) => branchLink(answer.measure, branch, this.kept()),
      })
    );
  });
  protected readonly strips = computed(() => {
    const answer = this.weeks.value();
    return answer && weekPictures(answer, this.words());
  });
  /** Those chosen that are there to be compared; a branch that is alone is compared with the reference. */
  protected readonly beside = computed(() =>
    chosenBeside(this.with(), this.branches.value()?.branches.map(({ branch }) => branch) ?? []),
  );
  protected readonly comparing = keepLive(
    this.api.read(getSideBySide, () => {
      const branch = this.beside();
      const query = this.query();
      const enough = branch.length >= (this.view()?.choices.length === 1 ? 1 : 2);
      return query && enough ? { query: { ...query, branch: [...branch] } } : undefined;
    }),
    'jobs',
    'claims',
  );
  protected readonly comparison = computed(() => {
    const answer = this.comparing.value();
    return answer && sideBySide(answer, this.words());
  });
  protected readonly maySetTargets = computed(
    () => this.role() === 'regional_lead' || this.role() === 'head_office',
  );
  protected readonly places = computed((): Params => {
    const { region, branch } = this.scope.filters();
    return { region, branch };
  });
  protected readonly measures = BRANCH_MEASURES;
  protected readonly chips = MEASURE_CHIPS;
  protected readonly most = MOST_BESIDE;
  protected readonly export = exportBranches;
  protected readonly counted = formatCounted;

  protected show(measure: BranchMeasure | undefined): void {
    // A press on the chosen one would choose nothing.
    if (measure) this.navigate({ measure: measure === 'overrun' ? null : measure });
  }

  protected lay(codes: readonly string[]): void {
    this.navigate({ with: codes.length > 0 ? [...codes].sort().join(',') : null });
  }

  protected open(branch: string): void {
    const { commands, query } = branchLink(this.by(), branch, this.kept());
    void this.router.navigate([...commands], { queryParams: query });
  }

  private navigate(queryParams: Params): void {
    void this.router.navigate([], {
      queryParams,
      queryParamsHandling: 'merge',
      scroll: 'manual',
    });
  }

  /** Kinds and dates that go along to a branch's own page; Warranty speaks of all cars unless days are chosen. */
  private kept(): Params {
    const claims = this.by() === 'claims';
    return claims ? { ...this.scope.filters(), ...this.chosenDays() } : (this.scope.query() ?? {});
  }

  private chosenDays(): { readonly from: string; readonly to: string } | undefined {
    if (!this.scope.choice().period) return undefined;
    const [from, to] = [this.scope.from(), this.scope.to()];
    return from && to ? { from, to } : undefined;
  }

  private firstDay(): string | undefined {
    const days = this.catalogue.branches().map(({ openedOn }) => openedOn);
    // Without a branch there is nothing to be found from any day on.
    return this.catalogue.value() ? (days.sort()[0] ?? this.catalogue.today()) : undefined;
  }
}

function asked<Query>(query: Query | undefined): { query: Query } | undefined {
  return query && { query };
}
