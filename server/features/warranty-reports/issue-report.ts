import { createHash } from 'node:crypto';
import { recordAudit, type Actor } from '#db/queries/audit';
import { insertReport, receivedMarks, type ReceivedMarks } from '#db/queries/warranty-reports';
import type { Store } from '#db/store';
import type { WarrantyReport } from '#shared/contracts/warranty-reports';

/** A report ready to be kept. */
export interface MadeReport {
  report: WarrantyReport;
  csv: string;
  pdf: Uint8Array;
  /** When its making began, and how far what was received had come then. */
  begun: BegunReport;
}

export interface BegunReport {
  at: string;
  received: ReceivedMarks;
}

/**
 * Notes how far what was received has come, before a report is begun: nothing that comes meanwhile is missed among what came
 * later, though it may be in the report already.
 */
export function beginReport(store: Store, at: string): BegunReport {
  return { at, received: receivedMarks(store.unscoped) };
}

/** Keeps a report and says so in the trail; inside a write. Returns its number. */
export function keepReport(store: Store, made: MadeReport, actor: Actor): number {
  const { report, csv, begun } = made;
  const { answer, asOf } = report;
  const pdf = Buffer.from(made.pdf);
  const pdfSha256 = sha256(pdf);
  const csvSha256 = sha256(csv);
  const id = insertReport(store.unscoped, {
    asOf,
    issuedAt: begun.at,
    personId: actor.personId,
    summary: {
      outstandingCents: answer.total.outstandingCents,
      standardErrorCents: answer.total.standardErrorCents,
      covered: answer.covered,
      claims: answer.rate.claims,
      pdfBytes: pdf.length,
      received: begun.received,
    },
    report: JSON.stringify(report),
    csv,
    csvSha256,
    pdf,
    pdfSha256,
  });
  recordAudit(store.unscoped, {
    at: begun.at,
    actor,
    action: 'warranty-report.issue',
    subject: `/warranty-reports/${id}`,
    branchId: null,
    detail: { asOf, pdfSha256, csvSha256 },
  });
  return id;
}

function sha256(bytes: Buffer | string): string {
  return createHash('sha256').update(bytes).digest('hex');
}
