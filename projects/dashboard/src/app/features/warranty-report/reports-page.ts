import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { Router, RouterLink } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import { exportWarrantyRisk } from '#shared/contracts/exports';
import {
  getWarrantyReport,
  getWarrantyReportPdf,
  getWarrantySchedule,
  type IssuedReport,
  listWarrantyReports,
} from '#shared/contracts/warranty-reports';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { FileLink } from '../../core/api/file-link';
import { Catalogue } from '../../core/catalogue/catalogue';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Answer } from '../../ui/answer/answer';
import { DataTable } from '../../ui/data-table/data-table';
import { LoadState } from '../../ui/load-state/load-state';
import { IssueDialog } from './issue-dialog';
import { issuedColumns } from './issued-columns';
import { ReportPaper } from './paper/report-paper';
import { reportSentence, secondSentence } from './report-answer';
import { lastRunSentence, scheduleSentence } from './schedule-words';

/** Issued reports listed at once. */
const LISTED = 12;

/** The warranty-risk report as of a day, those that were issued, and when one is issued by itself. */
@Component({
  selector: 'us-reports-page',
  imports: [
    Answer,
    CsvLink,
    DataTable,
    FileLink,
    LoadState,
    MatButton,
    ReportPaper,
    RouterLink,
    ScopeLine,
  ],
  templateUrl: './reports-page.html',
  styleUrl: './reports-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReportsPage {
  private readonly api = inject(Api);
  private readonly dialog = inject(MatDialog);
  private readonly router = inject(Router);
  private readonly scope = inject(ScopeState);
  private readonly catalogue = inject(Catalogue);

  /** Where the list of issued reports goes on, from the URL. */
  readonly cursor = input<string>();

  protected readonly report = this.api.read(getWarrantyReport, () => ({
    query: { asOf: this.scope.choice().asOf },
  }));
  protected readonly issued = this.api.read(listWarrantyReports, () => ({
    query: { cursor: this.cursor(), limit: LISTED },
  }));
  protected readonly schedule = this.api.read(getWarrantySchedule, () => ({}));

  protected readonly pdf = getWarrantyReportPdf;
  protected readonly csv = exportWarrantyRisk;
  protected readonly view = computed(() => {
    const report = this.report.value();
    if (!report) return undefined;
    const second = secondSentence(report);
    return {
      report,
      sentence: reportSentence(report),
      second: second ? [second] : [],
      query: { asOf: report.asOf },
      name: `underseam-warranty-report-${report.asOf}.pdf`,
      rows: report.rows.length,
    };
  });
  protected readonly columns = computed(() =>
    issuedColumns(this.report.value()?.currency ?? this.catalogue.currency()),
  );
  protected readonly scheduled = computed(() => {
    const schedule = this.schedule.value();
    return schedule && [scheduleSentence(schedule), lastRunSentence(schedule)];
  });

  /** Asks, issues, and leads to the report as issued. */
  protected async issue(asOf: string): Promise<void> {
    const asked = this.dialog.open<IssueDialog, string, IssuedReport>(IssueDialog, { data: asOf });
    const issued = await firstValueFrom(asked.afterClosed());
    if (issued) await this.router.navigate(['/warranty/reports', issued.id]);
  }
}
