import type { NetworkReference } from '#db/network-reference';
import { readNetwork } from '#db/queries/network';
import type { ScopedDb } from '#db/scoped-db';
import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import { WARRANTY_RISK_COLUMNS } from '../features/exports/columns';
import { csvHeader, csvRows } from '../features/exports/csv-text';
import { answerWarranty } from '../features/warranty/answer-warranty';
import { warrantyRiskRows } from '../features/warranty/risk-rows';
import { printReport } from '../features/warranty-reports/pdf/print-report';

/** Of which day a report is asked; its scope is the whole network. */
export interface ReportQuestion {
  asOf: string;
}

/** Everything that is kept of a report, made from one state of the database. */
export interface ReportParts {
  report: WarrantyReport;
  csv: string;
  pdf: Uint8Array;
}

/** The warranty-risk report as of a day: from the first job, over every branch. */
export function warrantyReport(
  db: ScopedDb,
  { asOf }: ReportQuestion,
  reference: NetworkReference,
): WarrantyReport {
  const asked = { asOf, filters: {} };
  return db.snapshot(() => {
    const { name, currency } = readNetwork(db);
    return {
      network: name,
      currency,
      asOf,
      branches: db.scope.branches.map(({ code, name: told, region }) => ({
        code,
        name: told,
        region,
      })),
      answer: answerWarranty(db, { ...asked, groupBy: 'package' }, reference),
      rows: warrantyRiskRows(db, asked, reference),
    };
  });
}

/** The same as a PDF. */
export function warrantyReportPdf(
  db: ScopedDb,
  question: ReportQuestion,
  reference: NetworkReference,
): Uint8Array {
  return printReport(warrantyReport(db, question, reference));
}

/** The report, its rows as the export of warranty risk writes them, and its PDF. */
export function warrantyReportParts(
  db: ScopedDb,
  question: ReportQuestion,
  reference: NetworkReference,
): ReportParts {
  const report = warrantyReport(db, question, reference);
  const csv = csvHeader(WARRANTY_RISK_COLUMNS) + csvRows(WARRANTY_RISK_COLUMNS, report.rows);
  return { report, csv, pdf: printReport(report) };
}
