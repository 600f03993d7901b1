import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';
import { actionEffect } from '../features/actions/action-effect';
import { checkAuditChain, readAuditNames, readAuditPage } from '../features/audit/read-audit';
import { answerBranches } from '../features/branches/answer-branches';
import { answerBranchWeeks } from '../features/branches/answer-branch-weeks';
import { answerSideBySide } from '../features/branches/answer-side-by-side';
import { listComeBacks } from '../features/come-back/list-come-backs';
import { listClaims } from '../features/claims/list-claims';
import { listJobs } from '../features/job-list/list-jobs';
import { answerMargin } from '../features/margin/answer-margin';
import { answerOverrun } from '../features/overrun/answer-overrun';
import { answerProductNeed } from '../features/products/answer-product-need';
import { answerProducts } from '../features/products/answer-products';
import { answerQuote } from '../features/quote/answer-quote';
import { answerUsual } from '../features/quote/answer-usual';
import { answerRot } from '../features/rot/answer-rot';
import { effectOfChange } from '../features/set-up-help/effect-of-change';
import { normMedians } from '../features/set-up-help/norm-medians';
import { answerWarranty } from '../features/warranty/answer-warranty';
import { laterArrivals } from '#db/queries/later-arrivals';
import { countReferrers } from '#db/queries/referrers';
import type { ReadName, ReadTasks } from './read-tasks';
import { changesOf, monthFigures, weekFigures } from './digest-figures';
import { signalLook } from './signal-look';
import { warrantyReport, warrantyReportParts, warrantyReportPdf } from './warranty-report';

/** Every answer a worker knows, by name; only those with a network figure take the reference. */
const ANSWERS: {
  [Name in ReadName]: (
    db: ScopedDb,
    input: ReadTasks[Name]['input'],
    reference: NetworkReference,
  ) => ReadTasks[Name]['output'];
} = {
  margin: answerMargin,
  overrun: answerOverrun,
  jobs: listJobs,
  claims: listClaims,
  rot: answerRot,
  products: answerProducts,
  branches: answerBranches,
  branchWeeks: answerBranchWeeks,
  sideBySide: answerSideBySide,
  actionEffect,
  productNeed: answerProductNeed,
  comeBack: listComeBacks,
  quote: answerQuote,
  usual: answerUsual,
  warranty: answerWarranty,
  warrantyReport,
  warrantyReportPdf,
  warrantyReportParts,
  laterArrivals: (db, { limit, ...question }) => laterArrivals(db, question, limit),
  digestWeek: weekFigures,
  digestChanges: changesOf,
  digestMonth: monthFigures,
  audit: readAuditPage,
  auditNames: readAuditNames,
  auditCheck: checkAuditChain,
  effect: effectOfChange,
  normMedians,
  referrers: countReferrers,
  signalLook,
};

/** Answers a question from one reader's rows. */
export function answer<Name extends ReadName>(
  name: Name,
  db: ScopedDb,
  input: ReadTasks[Name]['input'],
  reference: NetworkReference,
): ReadTasks[Name]['output'] {
  return ANSWERS[name](db, input, reference);
}
