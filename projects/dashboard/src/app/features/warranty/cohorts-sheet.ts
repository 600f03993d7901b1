import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { exportWarrantyCohorts, exportWarrantyTriangle } from '#shared/contracts/exports';
import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { PaidCell } from '../../charts/paid-and-to-come/paid-cell';
import { PaidKey } from '../../charts/paid-and-to-come/paid-key';
import { CsvLink } from '../../core/api/csv-link';
import { CellTemplate } from '../../ui/data-table/cell-template';
import { DataTable } from '../../ui/data-table/data-table';
import { DefinitionLink } from '../../ui/definition-link/definition-link';
import type { CohortTable } from './cohort-rows';
import { HowItCame } from './how-it-came';
import { triangleTable } from './triangle-rows';
import type { WarrantyLinks } from './warranty-links';

/** Paid and still to come by the half-year in which cars were finished, and the triangle that it is worked out from. */
@Component({
  selector: 'us-cohorts-sheet',
  imports: [
    CellTemplate,
    CsvLink,
    DataTable,
    DefinitionLink,
    HowItCame,
    PaidCell,
    PaidKey,
    RouterLink,
  ],
  templateUrl: './cohorts-sheet.html',
  styleUrl: './cohorts-sheet.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CohortsSheet {
  readonly table = input.required<CohortTable>();
  readonly answer = input.required<WarrantyAnswer>();
  readonly links = input.required<WarrantyLinks>();
  /** The page's own query, so that files hold exactly its rows. */
  readonly query = input.required<Readonly<Record<string, unknown>>>();

  protected readonly triangle = computed(() => triangleTable(this.answer()));
  protected readonly exports = { cohorts: exportWarrantyCohorts, triangle: exportWarrantyTriangle };

  protected claimsOf(cohort: string) {
    return this.links().claims({ cohort }).query;
  }
}
