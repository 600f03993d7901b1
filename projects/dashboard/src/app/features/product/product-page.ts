import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatChipsModule } from '@angular/material/chips';
import { Router } from '@angular/router';
import {
  exportProductBranches,
  exportProducts,
  exportProductTemperature,
} from '#shared/contracts/exports';
import { getProducts } from '#shared/contracts/products';
import { DotIntervalChart } from '../../charts/dot-interval/dot-interval-chart';
import { UseBoxChart } from '../../charts/use-box/use-box-chart';
import { UseByTemperatureChart } from '../../charts/use-by-temperature/use-by-temperature-chart';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { Catalogue } from '../../core/catalogue/catalogue';
import { keepLive } from '../../core/live/keep-live';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Answer } from '../../ui/answer/answer';
import { Caution } from '../../ui/caution/caution';
import { DataTable } from '../../ui/data-table/data-table';
import { EmptyNext } from '../../ui/empty-next/empty-next';
import { LoadState } from '../../ui/load-state/load-state';
import { TableTwin } from '../../ui/table-twin/table-twin';
import { ComingNeed } from './coming-need';
import { productsView } from './product-series';
import type { ProductWords } from './product-words';
import { SOLVENT_MIST } from './solvent-mist';

/** Rows shown before "Show all". */
const FIRST_ROWS = 10;

/** How much product went in against the norm, where too little did, and what the coming weeks need. */
@Component({
  selector: 'us-product-page',
  imports: [
    Answer,
    Caution,
    ComingNeed,
    CsvLink,
    DataTable,
    DotIntervalChart,
    EmptyNext,
    LoadState,
    MatChipsModule,
    NgTemplateOutlet,
    ScopeLine,
    TableTwin,
    UseBoxChart,
    UseByTemperatureChart,
  ],
  templateUrl: './product-page.html',
  styleUrl: './product-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProductPage {
  /** The product shown in the pictures, from the URL. */
  readonly product = input<string>();

  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly catalogue = inject(Catalogue);
  protected readonly scope = inject(ScopeState);

  protected readonly use = keepLive(
    this.api.read(getProducts, () => {
      const query = this.scope.query();
      return query && { query };
    }),
    'jobs',
  );
  protected readonly words = computed((): ProductWords => {
    const kinds = new Map(this.catalogue.value()?.products.map(({ code, kind }) => [code, kind]));
    return {
      currency: this.catalogue.currency(),
      branchName: (code) => this.catalogue.branchName(code),
      packageWord: (code) => this.catalogue.packageWord(code),
      productName: (code) => this.catalogue.productName(code),
      isWax: (code) => kinds.get(code)?.endsWith('_wax') ?? false,
    };
  });
  protected readonly view = computed(() => {
    const answer = this.use.value();
    return (
      answer &&
      productsView(answer, this.product(), this.words(), {
        filters: this.scope.filters(),
        branch: (branch) => ({
          commands: ['/product'],
          query: { ...this.scope.query(), region: undefined, branch, product: this.product() },
        }),
      })
    );
  });
  protected readonly caution = SOLVENT_MIST;
  protected readonly export = exportProducts;
  protected readonly exports = {
    branches: exportProductBranches,
    temperature: exportProductTemperature,
  };
  protected readonly onPaper = signal<'page' | 'list'>('page');
  protected readonly allRows = signal(false);
  protected readonly firstRows = FIRST_ROWS;

  protected choose(product: string | undefined): void {
    // A press on the chosen one would choose nothing.
    if (!product) return;
    void this.router.navigate([], { queryParams: { product }, queryParamsHandling: 'merge' });
  }
}
