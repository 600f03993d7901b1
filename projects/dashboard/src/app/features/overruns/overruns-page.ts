import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatChipsModule } from '@angular/material/chips';
import { Router, RouterLink } from '@angular/router';
import { exportOverrun } from '#shared/contracts/exports';
import { getOverrun } from '#shared/contracts/overrun';
import { BridgeChart } from '../../charts/bridge/bridge-chart';
import { DotIntervalChart } from '../../charts/dot-interval/dot-interval-chart';
import { QuantileStripChart } from '../../charts/quantile-strip/quantile-strip-chart';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { Catalogue } from '../../core/catalogue/catalogue';
import { keepLive } from '../../core/live/keep-live';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Answer } from '../../ui/answer/answer';
import { DataTable } from '../../ui/data-table/data-table';
import { EmptyNext } from '../../ui/empty-next/empty-next';
import { LoadState } from '../../ui/load-state/load-state';
import { TableTwin } from '../../ui/table-twin/table-twin';
import { carsOfGroup } from './cars-of-group';
import { groupPictures } from './overrun-groups';
import { type Grouping, GROUPING_LABELS, type OverrunWords } from './overrun-words';
import { groupingFrom, overrunsView } from './overruns-series';

/** How much longer cars took than estimated, in which stage, and for which cars. */
@Component({
  selector: 'us-overruns-page',
  imports: [
    Answer,
    BridgeChart,
    CsvLink,
    DataTable,
    DotIntervalChart,
    EmptyNext,
    LoadState,
    MatChipsModule,
    QuantileStripChart,
    RouterLink,
    ScopeLine,
    TableTwin,
  ],
  templateUrl: './overruns-page.html',
  styleUrl: './overruns-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OverrunsPage {
  /** Grouping below the stages, from the URL. */
  readonly by = input<string>();

  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly catalogue = inject(Catalogue);
  protected readonly scope = inject(ScopeState);

  protected readonly stages = keepLive(
    this.api.read(getOverrun, () => this.asked('stage')),
    'jobs',
  );
  private readonly words = computed((): OverrunWords => ({
    branchName: (code) => this.catalogue.branchName(code),
    regionName: (code) => this.catalogue.regionName(code),
    packageName: (code) => this.catalogue.packageName(code),
  }));
  protected readonly view = computed(() => {
    const answer = this.stages.value();
    return answer && overrunsView(answer, this.words());
  });
  protected readonly grouping = computed(() =>
    groupingFrom(this.by(), this.view()?.groupings ?? []),
  );
  protected readonly groups = keepLive(
    this.api.read(getOverrun, () => (this.view() ? this.asked(this.grouping()) : undefined)),
    'jobs',
  );
  protected readonly pictures = computed(() => {
    const answer = this.groups.value();
    if (!answer || answer.by === 'stage') return undefined;
    const by = answer.by;
    return groupPictures(answer, by, this.words(), ({ key }) => ({
      commands: ['/jobs'],
      query: { ...this.scope.filters(), ...carsOfGroup(by, key, answer.period) },
    }));
  });
  protected readonly withoutEstimate = computed(() => ({
    ...this.scope.filters(),
    ...this.stages.value()?.period,
    hasEstimate: 'false',
  }));
  protected readonly labels = GROUPING_LABELS;
  protected readonly export = exportOverrun;

  protected exportQuery(by: 'stage' | Grouping): Readonly<Record<string, unknown>> {
    return { ...this.scope.query(), by };
  }

  protected group(by: Grouping | undefined): void {
    // A press on the chosen one would choose nothing.
    if (!by) return;
    void this.router.navigate([], { queryParams: { by }, queryParamsHandling: 'merge' });
  }

  private asked(by: 'stage' | Grouping) {
    const scope = this.scope.query();
    return scope && { query: { ...scope, by } };
  }
}
