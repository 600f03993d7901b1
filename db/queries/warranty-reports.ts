import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';

/** How far what was received had come when a report was begun: all that has a higher number came later. */
export interface ReceivedMarks {
  jobRevision: number;
  claimRevision: number;
  event: number;
}

/** What a list says of a report without reading it. */
export interface ReportSummary {
  outstandingCents: number;
  standardErrorCents: number | null;
  covered: number;
  claims: number;
  pdfBytes: number;
  received: ReceivedMarks;
}

/** A report as it is kept, without its bytes. */
export interface ReportRow {
  id: number;
  asOf: string;
  issuedAt: string;
  /** Name of the person who issued it; null for the schedule. */
  by: string | null;
  summary: ReportSummary;
  pdfSha256: string;
  csvSha256: string;
}

/** A report about to be kept. */
export interface NewReport {
  asOf: string;
  issuedAt: string;
  personId: number | null;
  summary: ReportSummary;
  /** JSON. */
  report: string;
  csv: string;
  csvSha256: string;
  pdf: Buffer;
  pdfSha256: string;
}

/** The highest numbers received so far. */
export function receivedMarks(db: UnscopedDb): ReceivedMarks {
  const highest = (table: string): number =>
    db.first<{ id: number | null }>(sql(table).max({ id: 'id' }))?.id ?? 0;
  return {
    jobRevision: highest('job_revisions'),
    claimRevision: highest('claim_revisions'),
    event: highest('audit_events'),
  };
}

/** Keeps a report and returns its number; inside a write. */
export function insertReport(db: UnscopedDb, report: NewReport): number {
  const { id } = db.run(
    sql('warranty_reports').insert({
      as_of: report.asOf,
      issued_at: report.issuedAt,
      person_id: report.personId,
      summary: JSON.stringify(report.summary),
      report: report.report,
      csv: report.csv,
      csv_sha256: report.csvSha256,
      pdf: report.pdf,
      pdf_sha256: report.pdfSha256,
    }),
  );
  return id;
}

/** Reports from below a number on, the newest first. */
export function listReports(db: UnscopedDb, below: number | null, limit: number): ReportRow[] {
  const query = reports().orderBy('warranty_reports.id', 'desc').limit(limit);
  if (below !== null) query.where('warranty_reports.id', '<', below);
  return db.all<StoredRow>(query).map(rowOf);
}

/** A report of a number. */
export function findReport(db: UnscopedDb, id: number): ReportRow | undefined {
  const row = db.first<StoredRow>(reports().where({ 'warranty_reports.id': id }));
  return row && rowOf(row);
}

/** What was kept of a report, as it was kept: its JSON text, its CSV text or the bytes of its PDF. */
export function readReportPart<Part extends 'report' | 'csv' | 'pdf'>(
  db: UnscopedDb,
  id: number,
  part: Part,
): (Part extends 'pdf' ? Buffer : string) | undefined {
  return db.first<Record<Part, Part extends 'pdf' ? Buffer : string>>(
    sql('warranty_reports').where({ id }).select(part),
  )?.[part];
}

type StoredRow = Omit<ReportRow, 'summary'> & { summary: string };

function reports() {
  return sql('warranty_reports')
    .leftJoin('people', 'people.id', 'warranty_reports.person_id')
    .select('warranty_reports.id', 'summary', {
      asOf: 'as_of',
      issuedAt: 'issued_at',
      by: 'people.name',
      pdfSha256: 'pdf_sha256',
      csvSha256: 'csv_sha256',
    });
}

function rowOf(row: StoredRow): ReportRow {
  return { ...row, summary: JSON.parse(row.summary) as ReportSummary };
}
