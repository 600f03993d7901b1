import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';
import type { AuditFilters } from '#db/queries/audit-list';
import { everyEvent } from '../features/audit/read-audit';
import { everyClaim, type ClaimsAsked } from '../features/claims/list-claims';
import { answerBranches } from '../features/branches/answer-branches';
import type { BranchesQuestion } from '../features/branches/place-branches';
import { everyComeBack, type ComeBacksAsked } from '../features/come-back/list-come-backs';
import {
  AUDIT_COLUMNS,
  BRANCH_COLUMNS,
  CLAIM_COLUMNS,
  COME_BACK_COLUMNS,
  JOB_COLUMNS,
  MARGIN_COLUMNS,
  OVERRUN_COLUMNS,
  PRODUCT_BRANCH_COLUMNS,
  PRODUCT_COLUMNS,
  PRODUCT_NEED_COLUMNS,
  PRODUCT_TEMPERATURE_COLUMNS,
  QUOTE_COLUMNS,
  ROT_COLUMNS,
  ROT_MODEL_COLUMNS,
  ROT_ZONE_COLUMNS,
  WARRANTY_BRANCH_COLUMNS,
  WARRANTY_CLAIM_FREE_COLUMNS,
  WARRANTY_COHORT_COLUMNS,
  WARRANTY_PROCESS_COLUMNS,
  WARRANTY_RISK_COLUMNS,
  WARRANTY_TRIANGLE_COLUMNS,
} from '../features/exports/columns';
import { csvHeader, csvRows } from '../features/exports/csv-text';
import { everyJob, type JobsAsked } from '../features/job-list/list-jobs';
import { answerMargin, type MarginQuestion } from '../features/margin/answer-margin';
import { answerOverrun, type OverrunQuestion } from '../features/overrun/answer-overrun';
import { answerProductNeed, type NeedQuestion } from '../features/products/answer-product-need';
import { answerProducts, type ProductsQuestion } from '../features/products/answer-products';
import { answerQuote, type QuoteQuestion } from '../features/quote/answer-quote';
import { quoteRows } from '../features/quote/quote-rows';
import { answerRot, type RotQuestion } from '../features/rot/answer-rot';
import { answerWarranty } from '../features/warranty/answer-warranty';
import { warrantyRiskRows } from '../features/warranty/risk-rows';
import type { RiskQuestion, WarrantyQuestion } from '../features/warranty/warranty-question';
import type { RotZone } from '#shared/contracts/rot';
import type { WarrantyAnswer } from '#shared/contracts/warranty';
import type { ExportName } from './read-tasks';

/** The text of an export in pieces: the header first, then rows as the same code that answers the screen gives them. */
export function* csvChunks(
  db: ScopedDb,
  name: ExportName,
  input: unknown,
  reference: NetworkReference,
): Generator<string> {
  switch (name) {
    case 'margin': {
      const { weeks } = answerMargin(db, input as MarginQuestion);
      yield csvHeader(MARGIN_COLUMNS) + csvRows(MARGIN_COLUMNS, weeks);
      return;
    }
    case 'overrun': {
      const { groups } = answerOverrun(db, input as OverrunQuestion);
      yield csvHeader(OVERRUN_COLUMNS) + csvRows(OVERRUN_COLUMNS, groups);
      return;
    }
    case 'jobs': {
      yield csvHeader(JOB_COLUMNS);
      for (const page of everyJob(db, input as JobsAsked)) yield csvRows(JOB_COLUMNS, page);
      return;
    }
    case 'claims': {
      yield csvHeader(CLAIM_COLUMNS);
      for (const page of everyClaim(db, input as ClaimsAsked)) yield csvRows(CLAIM_COLUMNS, page);
      return;
    }
    case 'rot': {
      const { cells } = answerRot(db, input as RotQuestion, reference);
      yield csvHeader(ROT_COLUMNS) + csvRows(ROT_COLUMNS, cells);
      return;
    }
    case 'rot-models': {
      const { models } = answerRot(db, input as RotQuestion, reference);
      yield csvHeader(ROT_MODEL_COLUMNS) + csvRows(ROT_MODEL_COLUMNS, models);
      return;
    }
    case 'rot-zones': {
      const { zones } = answerRot(db, input as RotQuestion, reference);
      yield csvHeader(ROT_ZONE_COLUMNS) + csvRows(ROT_ZONE_COLUMNS, bySide(zones));
      return;
    }
    case 'products': {
      const { use } = answerProducts(db, input as ProductsQuestion);
      yield csvHeader(PRODUCT_COLUMNS) + csvRows(PRODUCT_COLUMNS, use);
      return;
    }
    case 'product-branches': {
      const { branches } = answerProducts(db, input as ProductsQuestion);
      yield csvHeader(PRODUCT_BRANCH_COLUMNS) + csvRows(PRODUCT_BRANCH_COLUMNS, branches);
      return;
    }
    case 'product-temperature': {
      const { temperature } = answerProducts(db, input as ProductsQuestion);
      const rows = temperature.flatMap(({ classes, ...trend }) =>
        classes.map((one) => ({ ...trend, ...one })),
      );
      yield csvHeader(PRODUCT_TEMPERATURE_COLUMNS) + csvRows(PRODUCT_TEMPERATURE_COLUMNS, rows);
      return;
    }
    case 'branches': {
      const { branches } = answerBranches(db, input as BranchesQuestion, reference);
      yield csvHeader(BRANCH_COLUMNS) + csvRows(BRANCH_COLUMNS, branches);
      return;
    }
    case 'quote': {
      const rows = quoteRows(answerQuote(db, input as QuoteQuestion, reference));
      yield csvHeader(QUOTE_COLUMNS) + csvRows(QUOTE_COLUMNS, rows);
      return;
    }
    case 'product-need': {
      const { needs } = answerProductNeed(db, input as NeedQuestion);
      yield csvHeader(PRODUCT_NEED_COLUMNS) + csvRows(PRODUCT_NEED_COLUMNS, needs);
      return;
    }
    case 'warranty-risk': {
      const rows = warrantyRiskRows(db, input as RiskQuestion, reference);
      yield csvHeader(WARRANTY_RISK_COLUMNS) + csvRows(WARRANTY_RISK_COLUMNS, rows);
      return;
    }
    case 'warranty-claim-free': {
      const rows = byCurve(answerWarranty(db, input as WarrantyQuestion, reference));
      yield csvHeader(WARRANTY_CLAIM_FREE_COLUMNS) + csvRows(WARRANTY_CLAIM_FREE_COLUMNS, rows);
      return;
    }
    case 'warranty-cohorts': {
      const { cohorts } = answerWarranty(db, input as WarrantyQuestion, reference);
      yield csvHeader(WARRANTY_COHORT_COLUMNS) + csvRows(WARRANTY_COHORT_COLUMNS, cohorts);
      return;
    }
    case 'warranty-triangle': {
      const rows = byDevelopment(answerWarranty(db, input as WarrantyQuestion, reference));
      yield csvHeader(WARRANTY_TRIANGLE_COLUMNS) + csvRows(WARRANTY_TRIANGLE_COLUMNS, rows);
      return;
    }
    case 'warranty-branches': {
      const { branches } = answerWarranty(db, input as WarrantyQuestion, reference);
      yield csvHeader(WARRANTY_BRANCH_COLUMNS) + csvRows(WARRANTY_BRANCH_COLUMNS, branches);
      return;
    }
    case 'warranty-process': {
      const { process } = answerWarranty(db, input as WarrantyQuestion, reference);
      yield csvHeader(WARRANTY_PROCESS_COLUMNS) + csvRows(WARRANTY_PROCESS_COLUMNS, process);
      return;
    }
    case 'come-back': {
      yield csvHeader(COME_BACK_COLUMNS);
      for (const page of everyComeBack(db, input as ComeBacksAsked)) {
        yield csvRows(COME_BACK_COLUMNS, page);
      }
      return;
    }
    case 'audit': {
      yield csvHeader(AUDIT_COLUMNS);
      for (const page of everyEvent(db, input as AuditFilters)) yield csvRows(AUDIT_COLUMNS, page);
    }
  }
}

/** A row a zone (`side` empty: any side) and one each of its sides. */
function bySide(zones: readonly RotZone[]): object[] {
  return zones.flatMap(({ sides, ...zone }) => [
    { ...zone, side: null },
    ...sides.map((side) => ({ ...zone, ...side })),
  ]);
}

/** A row a month of all cars (`group` empty) and of each group shown. */
function byCurve({ claimFree, groups }: WarrantyAnswer): object[] {
  return [{ key: null, months: claimFree }, ...groups].flatMap(({ key, months }) =>
    months.map((month) => ({ group: key, ...month })),
  );
}

/** A row a cohort and development half-year. */
function byDevelopment({ triangle }: WarrantyAnswer): object[] {
  return triangle.rows.flatMap(({ cohort, cumulativeCents }) =>
    cumulativeCents.map((cents, development) => ({ cohort, development, cumulativeCents: cents })),
  );
}
