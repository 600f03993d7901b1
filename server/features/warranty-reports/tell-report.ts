import type { ReportRow } from '#db/queries/warranty-reports';
import type { IssuedReport } from '#shared/contracts/warranty-reports';

/** A kept report as lists and pages show it. */
export function tellReport({ summary, by, ...row }: ReportRow): IssuedReport {
  const { received: _received, ...told } = summary;
  return { ...row, ...told, by: by ?? 'schedule' };
}
