import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Router } from '@angular/router';
import { exportRot, exportRotModels, exportRotZones } from '#shared/contracts/exports';
import { getRot, type RotModel } from '#shared/contracts/rot';
import type { AgeBand } from '#shared/domain/vocabulary';
import { AgeRegionChart } from '../../charts/age-region/age-region-chart';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { Catalogue } from '../../core/catalogue/catalogue';
import { keepLive } from '../../core/live/keep-live';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Answer } from '../../ui/answer/answer';
import type { CellLink } from '../../ui/data-table/column';
import { DefinitionLink } from '../../ui/definition-link/definition-link';
import { EmptyNext } from '../../ui/empty-next/empty-next';
import { LoadState } from '../../ui/load-state/load-state';
import { TableTwin } from '../../ui/table-twin/table-twin';
import type { UndersideArea } from '../../underside-map/underside-input';
import { UndersideMap } from '../../underside-map/underside-map';
import { ageFrom } from './age-choice';
import { AgeControl } from './age-control';
import { carsWithRot, type RotNarrowing } from './cars-with-rot';
import { ModelsTable } from './models-table';
import { modelsView } from './rot-models';
import { regionColumns, regionRows } from './rot-region-table';
import { rotView } from './rot-series';
import type { RotWords } from './rot-words';

/** Where and on which cars rot is found: by place, age, region and model. */
@Component({
  selector: 'us-rot-page',
  imports: [
    AgeControl,
    AgeRegionChart,
    Answer,
    CsvLink,
    DefinitionLink,
    EmptyNext,
    LoadState,
    ModelsTable,
    ScopeLine,
    TableTwin,
    UndersideMap,
  ],
  templateUrl: './rot-page.html',
  styleUrl: './rot-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RotPage {
  /** Age of the cars that the page speaks of, from the URL. */
  readonly age = input<string>();

  private readonly router = inject(Router);
  private readonly catalogue = inject(Catalogue);
  protected readonly scope = inject(ScopeState);

  protected readonly rot = keepLive(
    inject(Api).read(getRot, () => {
      const query = this.scope.query();
      return query && { query };
    }),
    'jobs',
  );
  private readonly words = computed((): RotWords => ({
    regionName: (code) => this.catalogue.regionName(code),
    bodyTypes: this.scope.bodyType(),
  }));
  protected readonly band = computed(() => ageFrom(this.age(), this.rot.value()?.bands ?? []));
  protected readonly view = computed(() => {
    const answer = this.rot.value();
    return answer && rotView(answer, this.band(), this.words());
  });
  protected readonly regions = computed(() => {
    const answer = this.rot.value();
    return (
      answer && {
        rows: regionRows(answer),
        columns: regionColumns(answer, this.words(), ({ region, age }) =>
          this.cars({ region, ageBand: age }),
        ),
      }
    );
  });
  protected readonly models = computed(() => {
    const answer = this.rot.value();
    return answer && modelsView(answer, this.band(), (model) => this.carsOf(model));
  });

  protected readonly exports = { cells: exportRot, zones: exportRotZones, models: exportRotModels };
  protected readonly exportQuery = computed(() => this.scope.query() ?? {});

  protected pick(age: AgeBand): void {
    void this.router.navigate([], {
      queryParams: { age },
      queryParamsHandling: 'merge',
      scroll: 'manual',
    });
  }

  /** From a place on the map to the cars with rot there. */
  protected open({ zone, side }: UndersideArea): void {
    const link = this.cars({ ageBand: this.band(), zone, side });
    if (link) void this.router.navigate([...link.commands], { queryParams: link.query });
  }

  private carsOf({ make, model, ageBand }: RotModel): CellLink | undefined {
    return this.cars({ ageBand, make, model });
  }

  private cars(narrowing: RotNarrowing): CellLink | undefined {
    const answer = this.rot.value();
    return (
      answer && {
        commands: ['/jobs'],
        query: carsWithRot(this.scope.filters(), answer.period, narrowing),
      }
    );
  }
}
