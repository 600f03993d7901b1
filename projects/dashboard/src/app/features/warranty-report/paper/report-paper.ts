import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { IssuedReport, WarrantyReport } from '#shared/contracts/warranty-reports';
import { WARRANTY_METHODS } from '#shared/domain/warranty-methods';
import { ClaimFreeChart } from '../../../charts/claim-free-curves/claim-free-chart';
import { DotIntervalChart } from '../../../charts/dot-interval/dot-interval-chart';
import { PaidKey } from '../../../charts/paid-and-to-come/paid-key';
import { currencySign, formatDate } from '../../../ui/format';
import { Mark } from '../../../ui/mark/mark';
import { plainWords, rateSentence, reportSentence, secondSentence } from '../report-answer';
import { branchRows } from './branch-rows';
import { claimFreeRows } from './claim-free-rows';
import { CohortBars } from './cohort-bars';
import { cohortRows } from './cohort-rows';
import { curvesPicture } from './curves-picture';
import { expectedPicture } from './expected-picture';
import { leftOut } from './left-out';
import { logRankWords } from './log-rank-words';
import { PaperTable } from './paper-table';
import { processRows, stratumRows } from './process-rows';
import { riskRows } from './risk-rows';
import { standingWords } from './standing-words';
import { factorRows, triangleRows } from './triangle-rows';

/** The warranty-risk report as it is read and printed: a draft of today, or one that was issued. Everything on it is of the report. */
@Component({
  selector: 'us-report-paper',
  imports: [ClaimFreeChart, CohortBars, DotIntervalChart, Mark, PaidKey, PaperTable],
  templateUrl: './report-paper.html',
  styleUrl: './report-paper.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReportPaper {
  readonly report = input.required<WarrantyReport>();
  /** Left out: a draft. */
  readonly issued = input<IssuedReport>();

  protected readonly methods = WARRANTY_METHODS;
  protected readonly paper = computed(() => {
    const report = this.report();
    const { answer } = report;
    return {
      network: report.network,
      asOf: formatDate(report.asOf),
      evaluatedOn: formatDate(answer.evaluatedOn),
      standing: standingWords(this.issued()),
      sign: currencySign(report.currency),
      answer: plainWords(reportSentence(report)),
      branchWords: secondSentence(report),
      rate: rateSentence(report),
      curves: curvesPicture(answer),
      expected: expectedPicture(report),
      claimFree: claimFreeRows(answer),
      logRank: logRankWords(answer),
      cohorts: cohortRows(answer),
      branches: branchRows(report),
      triangle: triangleRows(answer),
      factors: factorRows(answer),
      process: processRows(answer),
      strata: stratumRows(answer),
      risk: riskRows(report),
      left: leftOut(report),
    };
  });
}
