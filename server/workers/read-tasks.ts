import type { MessagePort } from 'node:worker_threads';
import type { PackedScope } from '#db/scope';
import type { ActionEffect } from '#shared/contracts/actions';
import type {
  BranchesAnswer,
  BranchWeeksAnswer,
  SideBySideAnswer,
} from '#shared/contracts/branches';
import type { MarginAnswer } from '#shared/contracts/margin';
import type { OverrunAnswer } from '#shared/contracts/overrun';
import type { ProductNeedAnswer, ProductsAnswer } from '#shared/contracts/products';
import type { QuoteAnswer } from '#shared/contracts/quote';
import type { RotAnswer } from '#shared/contracts/rot';
import type { UsualCar } from '#shared/contracts/usual';
import type { WarrantyAnswer } from '#shared/contracts/warranty';
import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import type { LaterAnswer, LaterQuestion } from '#db/queries/later-arrivals';
import type { Changes } from '../features/digests/changes';
import type { MonthFigures } from '../features/digests/month-digest';
import type { WeekFigures } from '../features/digests/week-digest';
import type { ChangesAsked, WeekAsked } from './digest-figures';
import type { FoundSignal } from '../features/signals/found-signal';
import type { LookQuestion } from './signal-look';
import type { ReportParts, ReportQuestion } from './warranty-report';
import type { CatalogueRow, Referrers } from '#db/queries/referrers';
import type { OutOf } from '#shared/contracts/endpoint';
import type { Effect, getNormMedians } from '#shared/contracts/set-up-help';
import type { EffectQuestion } from '../features/set-up-help/effect-of-change';
import type { MediansQuestion } from '../features/set-up-help/norm-medians';
import type { AuditFilters } from '#db/queries/audit-list';
import type { AuditChain, AuditPage, AuditQuestion } from '../features/audit/read-audit';
import type { EffectAsked } from '../features/actions/action-effect';
import type { BranchesQuestion } from '../features/branches/place-branches';
import type { ClaimListQuestion, ClaimPage, ClaimsAsked } from '../features/claims/list-claims';
import type { JobListQuestion, JobPage, JobsAsked } from '../features/job-list/list-jobs';
import type { MarginQuestion } from '../features/margin/answer-margin';
import type { OverrunQuestion } from '../features/overrun/answer-overrun';
import type {
  ComeBackPage,
  ComeBackQuestion,
  ComeBacksAsked,
} from '../features/come-back/list-come-backs';
import type { NeedQuestion } from '../features/products/answer-product-need';
import type { ProductsQuestion } from '../features/products/answer-products';
import type { QuoteQuestion } from '../features/quote/answer-quote';
import type { AskedCar } from '../features/quote/quoted-car';
import type { RotQuestion } from '../features/rot/answer-rot';
import type { RiskQuestion, WarrantyQuestion } from '../features/warranty/warranty-question';

/** What a worker can be asked, and what it answers. The scope goes along packed; everything else is plain data. */
export interface ReadTasks {
  margin: { input: MarginQuestion; output: MarginAnswer };
  overrun: { input: OverrunQuestion; output: OverrunAnswer };
  jobs: { input: JobListQuestion; output: JobPage };
  claims: { input: ClaimListQuestion; output: ClaimPage };
  rot: { input: RotQuestion; output: RotAnswer };
  products: { input: ProductsQuestion; output: ProductsAnswer };
  branches: { input: BranchesQuestion; output: BranchesAnswer };
  branchWeeks: { input: BranchesQuestion; output: BranchWeeksAnswer };
  sideBySide: { input: BranchesQuestion; output: SideBySideAnswer };
  actionEffect: { input: EffectAsked; output: ActionEffect };
  productNeed: { input: NeedQuestion; output: ProductNeedAnswer };
  comeBack: { input: ComeBackQuestion; output: ComeBackPage };
  quote: { input: QuoteQuestion; output: QuoteAnswer };
  usual: { input: AskedCar; output: UsualCar };
  warranty: { input: WarrantyQuestion; output: WarrantyAnswer };
  warrantyReport: { input: ReportQuestion; output: WarrantyReport };
  warrantyReportPdf: { input: ReportQuestion; output: Uint8Array };
  warrantyReportParts: { input: ReportQuestion; output: ReportParts };
  laterArrivals: { input: LaterQuestion & { limit: number }; output: LaterAnswer };
  digestWeek: { input: WeekAsked; output: WeekFigures };
  digestChanges: { input: ChangesAsked; output: Changes };
  digestMonth: { input: ChangesAsked; output: MonthFigures };
  audit: { input: AuditQuestion; output: AuditPage };
  auditNames: { input: null; output: { actors: string[]; actions: string[] } };
  effect: { input: EffectQuestion; output: Effect };
  normMedians: { input: MediansQuestion; output: OutOf<typeof getNormMedians> };
  referrers: { input: CatalogueRow; output: Referrers };
  signalLook: { input: LookQuestion; output: FoundSignal[] };
  auditCheck: { input: null; output: AuditChain };
}

/** Exports by name, with the question each answers. */
export interface ExportTasks {
  margin: MarginQuestion;
  overrun: OverrunQuestion;
  jobs: JobsAsked;
  claims: ClaimsAsked;
  rot: RotQuestion;
  'rot-models': RotQuestion;
  'rot-zones': RotQuestion;
  products: ProductsQuestion;
  'product-branches': ProductsQuestion;
  'product-temperature': ProductsQuestion;
  'product-need': NeedQuestion;
  branches: BranchesQuestion;
  quote: QuoteQuestion;
  'come-back': ComeBacksAsked;
  'warranty-risk': RiskQuestion;
  'warranty-claim-free': WarrantyQuestion;
  'warranty-cohorts': WarrantyQuestion;
  'warranty-triangle': WarrantyQuestion;
  'warranty-branches': WarrantyQuestion;
  'warranty-process': WarrantyQuestion;
  audit: AuditFilters;
}

export type ReadName = keyof ReadTasks;
export type ExportName = keyof ExportTasks;

/** A question as it crosses into the worker. */
export interface PackedRead {
  kind: 'answer';
  name: ReadName;
  scope: PackedScope;
  input: unknown;
}

/** An export as it crosses; its chunks come back through the port, one for each message sent into it, then null. */
export interface PackedExport {
  kind: 'export';
  name: ExportName;
  scope: PackedScope;
  input: unknown;
  port: MessagePort;
}
