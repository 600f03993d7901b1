import type { ScopedDb } from '#db/scoped-db';
import { listLeftOfJob } from '#db/queries/come-back-of-job';
import { tellComeBack } from '#db/queries/come-back-row';
import { findSheet, listRevisions, toldRevision, type SheetRow } from '#db/queries/job-sheet';
import type { JobSheet } from '#shared/contracts/jobs';
import { bridgeOf } from '#shared/domain/bridge';
import type { CostBook } from '#shared/domain/cost-book';
import { costCents, deriveFigures, marginCents } from '#shared/domain/job-figures';
import { writtenOut } from '#shared/domain/normalise-job';
import { notFound } from '#shared/domain/refusal';
import { withoutMoney } from '#shared/domain/without-money';

/** Reads one job with its revisions and, for whoever may see money, its margin and bridge. */
export function readJobSheet(
  db: ScopedDb,
  branch: string,
  jobRef: string,
  costs: CostBook,
  money: 'seen' | 'unseen',
): JobSheet {
  const row = findSheet(db, branch, jobRef);
  if (!row) throw notFound();
  const revisions = listRevisions(db, row.jobId);
  const job = writtenOut(row.content);
  const sheet = {
    branch,
    jobRef,
    revision: row.revision,
    receivedAt: row.receivedAt,
    source: row.source,
    warrantyMonths: row.warrantyMonths,
    revisions: revisions.map(toldRevision),
    comeBacks: listLeftOfJob(db, row.jobId).map(tellComeBack),
  };
  return money === 'seen'
    ? { ...sheet, ...job, ...moneyOf(row, costs) }
    : { ...sheet, ...withoutMoney(job) };
}

function moneyOf(row: SheetRow, costs: CostBook): Pick<JobSheet, 'money' | 'missingCosts'> {
  const { money, expected, billed, missing } = deriveFigures(row.content, row.branch, costs);
  if (!money) return { money: null, missingCosts: missing };
  const margin = billed ? marginCents(money) : null;
  return {
    money: {
      revenueCents: billed ? money.revenueCents : null,
      labourCents: money.labourCents + money.repairLabourCents,
      productCents: money.productCents,
      consumablesCents: money.consumablesCents,
      boughtInCents: money.boughtInCents,
      feeCents: money.feeCents,
      costCents: costCents(money),
      marginCents: margin,
      marginShare: margin !== null && money.revenueCents > 0 ? margin / money.revenueCents : null,
      bridge: billed && expected ? bridgeOf(money, expected) : null,
    },
    missingCosts: missing,
  };
}
