import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import {
  getIssuedReport,
  getIssuedReportCsv,
  getIssuedReportPdf,
} from '#shared/contracts/warranty-reports';
import { Api } from '../../core/api/api';
import { FileLink } from '../../core/api/file-link';
import { Answer } from '../../ui/answer/answer';
import { currencySign, formatCounted } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { CompareCopy } from './compare-copy';
import { issuedSentence, unchangedSentence } from './issued-words';
import { laterRow } from './later-words';
import { PaperTable } from './paper/paper-table';
import { ReportPaper } from './paper/report-paper';
import { branchName } from './report-words';
import { thenAndNow } from './then-and-now';

/** Later arrivals shown before all are asked for. */
const FIRST = 8;

/** An issued report as it was; beside it what arrived later for its period and what the same day would say now. */
@Component({
  selector: 'us-issued-report-page',
  imports: [Answer, CompareCopy, FileLink, LoadState, PaperTable, ReportPaper, RouterLink],
  templateUrl: './issued-report-page.html',
  styleUrl: './issued-report-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class IssuedReportPage {
  private readonly window = inject(DOCUMENT).defaultView;

  /** From the path. */
  readonly id = input.required<string>();

  protected readonly told = inject(Api).read(getIssuedReport, () => ({
    params: { id: this.id() },
  }));
  protected readonly pdf = getIssuedReportPdf;
  protected readonly csv = getIssuedReportCsv;
  protected readonly all = linkedSignal({ source: this.id, computation: () => false });
  protected readonly view = computed(() => {
    const told = this.told.value();
    if (!told) return undefined;
    const { issued, report, later, laterCount } = told;
    const { currency } = report;
    const shown = this.all() ? later : later.slice(0, FIRST);
    return {
      issued,
      report,
      sentence: issuedSentence(issued, currency),
      second: [unchangedSentence(laterCount)],
      params: { id: this.id() },
      name: `underseam-warranty-report-${issued.id}`,
      now: thenAndNow(told, currencySign(currency)),
      later: shown.map((arrival) =>
        laterRow(arrival, { currency, branch: branchName(report, arrival.branch) }),
      ),
      more: later.length - shown.length,
      unlisted:
        laterCount > later.length
          ? `Of ${formatCounted(laterCount, 'arrival', 'arrivals')} the last ${later.length} are listed.`
          : '',
    };
  });

  protected print(): void {
    this.window?.print();
  }
}
