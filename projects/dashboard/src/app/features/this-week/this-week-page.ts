import { ChangeDetectionStrategy, Component, computed, inject, linkedSignal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { exportJobs } from '#shared/contracts/exports';
import { listJobs } from '#shared/contracts/job-list';
import { getMargin } from '#shared/contracts/margin';
import { listSignals } from '#shared/contracts/signals';
import { BridgeChart } from '../../charts/bridge/bridge-chart';
import { WeeklyMarginChart } from '../../charts/weekly-margin/weekly-margin-chart';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { joinReadings } from '../../core/api/join-readings';
import { Catalogue } from '../../core/catalogue/catalogue';
import { keepLive } from '../../core/live/keep-live';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { DataTable } from '../../ui/data-table/data-table';
import { EmptyNext } from '../../ui/empty-next/empty-next';
import { LoadState } from '../../ui/load-state/load-state';
import { narrowWindow } from '../../ui/narrow';
import { TableTwin } from '../../ui/table-twin/table-twin';
import { openSignals } from './open-signals';
import { thisWeekView } from './this-week-series';
import { UnbilledCars } from './unbilled-cars';
import { tellingFirst } from './week-cars';
import { datesOfChart, datesOfWeek } from './week-dates';
import { WeekNote } from './week-note';
import { whoseUsual, type WeekWords } from './week-words';

/** Rows that one page of the list of jobs can hold (rule 67). */
const LIMIT = 200;

/** What the chosen week kept, why, which cars made it, and what is still to be billed. */
@Component({
  selector: 'us-this-week-page',
  imports: [
    Answer,
    BridgeChart,
    CsvLink,
    DataTable,
    EmptyNext,
    LoadState,
    RouterLink,
    ScopeLine,
    TableTwin,
    UnbilledCars,
    WeekNote,
    WeeklyMarginChart,
  ],
  templateUrl: './this-week-page.html',
  styleUrl: './this-week-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ThisWeekPage {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  private readonly catalogue = inject(Catalogue);
  private readonly scope = inject(ScopeState);

  private readonly chart = this.api.read(getMargin, () => this.asked(datesOfChart));
  private readonly week = this.api.read(getMargin, () => this.asked(datesOfWeek));
  private readonly billed = this.api.read(listJobs, () => this.asked(datesOfWeek, billedCars));
  private readonly unbilled = this.api.read(listJobs, () =>
    this.asked((week) => ({ to: datesOfWeek(week).to }), unbilledCars),
  );
  protected readonly answers = keepLive(
    joinReadings({
      chart: this.chart,
      week: this.week,
      billed: this.billed,
      unbilled: this.unbilled,
    }),
    'jobs',
  );
  /** Beside the answers, not among them: neither its wait nor its trouble is the page's. */
  private readonly openOnes = keepLive(
    this.api.read(listSignals, () => {
      const { region, branch } = this.scope.filters();
      const role = this.session.role();
      if (role === undefined || role === 'recorder') return undefined;
      return { query: { region, branch, state: ['open' as const], limit: LIMIT } };
    }),
    'signals',
  );

  protected readonly words = computed((): WeekWords => {
    const scope = this.answers.value()?.chart.scope ?? { regions: [], branches: [] };
    return {
      currency: this.catalogue.currency(),
      today: this.catalogue.today() ?? '',
      branchName: (code) => this.catalogue.branchName(code),
      packageName: (code) => this.catalogue.packageName(code),
      productName: (code) => this.catalogue.productName(code),
      whose: whoseUsual(scope, {
        role: this.session.role(),
        choseBranches: this.scope.branches().length > 0,
        choseRegions: this.scope.regions().length > 0,
      }),
    };
  });
  protected readonly view = computed(() => {
    const answers = this.answers.value();
    return answers && thisWeekView(answers, this.words());
  });
  protected readonly signals = computed(() => {
    const list = this.openOnes.value();
    const codes = this.answers.value()?.chart.scope.branches;
    if (!list || !codes) return undefined;
    const { region, branch } = this.scope.filters();
    return openSignals(list, { region, branch, codes, branchName: this.words().branchName });
  });
  /** Managers and head office bill cars and write notes. */
  protected readonly mayWrite = computed(
    () => this.session.role() === 'site_manager' || this.session.role() === 'head_office',
  );
  protected readonly allCars = linkedSignal({
    // A newer answer to the same question folds nothing up.
    source: () => JSON.stringify([this.scope.week(), this.scope.filters()]),
    computation: () => false,
  });
  protected readonly cars = computed(() => {
    const cars = this.view()?.cars;
    return cars?.rows.slice(0, this.allCars() ? undefined : cars.atFirst) ?? [];
  });
  private readonly narrow = narrowWindow();
  protected readonly carColumns = computed(() => {
    const columns = this.view()?.cars.columns ?? [];
    return this.narrow() ? tellingFirst(columns) : columns;
  });
  protected readonly export = exportJobs;
  protected readonly exportQuery = computed(() => {
    const week = this.view()?.standing.week;
    return week
      ? { ...this.scope.filters(), ...datesOfWeek(week), unbilled: false, sort: billedCars.sort }
      : undefined;
  });

  protected open(week: string): void {
    void this.scope.change({ week });
  }

  /** The scope's query for dates that follow from the week; none until the week is known. */
  private asked<Dates extends object, More extends object>(
    datesOf: (week: string) => Dates,
    more?: More,
  ) {
    const week = this.scope.week();
    return week ? { query: { ...this.scope.filters(), ...datesOf(week), ...more } } : undefined;
  }
}

const billedCars = { unbilled: false, sort: 'difference', limit: LIMIT } as const;
const unbilledCars = { unbilled: true, sort: 'waiting', limit: LIMIT } as const;
