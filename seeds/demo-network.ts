import type { z } from 'zod';
import type { Mark } from '#db/come-back-writer';
import type { ClaimContent } from '#shared/contracts/claims';
import type { JobContent } from '#shared/contracts/jobs';
import type { bookingContent } from '#shared/contracts/bookings';
import type { climate } from '#shared/contracts/set-up';
import type { BodyType, ConsumableKind, ProductKind } from '#shared/domain/vocabulary';

/** The codes of the packages that the demo sells. */
export type PackageCode = 'full' | 'cavity' | 'underbody' | 'top_up';
/** The codes of the products that the demo sprays. */
export type ProductCode = 'CW1' | 'UW1' | 'SC1' | 'RC1' | 'ZP1' | 'SS1';
/** The codes of the demo's regions. */
export type RegionCode = 'BRINE' | 'SOUND' | 'PLAIN' | 'UPLND';

export interface DemoRegion {
  code: RegionCode;
  name: string;
  climate: z.output<typeof climate>;
}

export interface DemoBranch {
  code: string;
  name: string;
  region: RegionCode;
  timeZone: string;
  openedOn: string;
  targetMarginShare?: number;
}

/** Everything head office sets up before the first job. Costs are dated, in cents; fee rates fractions of revenue. */
export interface DemoSetUp {
  network: {
    name: string;
    currency: string;
    feeRate: number;
    targetMarginShare: number;
    claimLimitCents: number;
  };
  fees: { from: string; feeRate: number }[];
  regions: DemoRegion[];
  branches: DemoBranch[];
  rates: { branch: string; from: string; hourlyCostCents: number }[];
  products: { code: ProductCode; name: string; kind: ProductKind }[];
  productCosts: { product: ProductCode; from: string; costPerLitreCents: number }[];
  consumableCosts: { kind: ConsumableKind; from: string; unitCostCents: number }[];
  packages: { code: PackageCode; name: string; warrantyMonths: number }[];
  norms: {
    package: PackageCode;
    bodyType: BodyType;
    norms: { product: ProductCode; ml: number }[];
  }[];
}

/** One version of a job and the instant (ISO 8601 UTC) at which it reached the network. */
export interface DemoRevision {
  content: JobContent;
  receivedAt: string;
}

/** A job as first sent, then every later version of it, then the instant at which it was voided, if it was. */
export interface DemoJob extends DemoRevision {
  branchCode: string;
  jobRef: string;
  corrections?: DemoRevision[];
  voided?: { at: string };
}

export interface DemoClaim {
  branchCode: string;
  claimRef: string;
  content: ClaimContent;
  receivedAt: string;
}

export interface DemoBooking {
  branchCode: string;
  ref: string;
  content: z.output<typeof bookingContent>;
}

export interface DemoWeekNote {
  branchCode: string;
  /** ISO week, `2026-W05`. */
  week: string;
  text: string;
  changedAt: string;
}

/** A mark on a finding that was left on a car. */
export interface DemoComeBackMark {
  jobRef: string;
  ref: string;
  mark: Mark;
  changedAt: string;
}

/** Five years of one branch. Jobs stand in the order in which they first arrived. */
export interface BranchHistory {
  branchCode: string;
  jobs: DemoJob[];
  claims: DemoClaim[];
  bookings: DemoBooking[];
  weekNotes: DemoWeekNote[];
  comeBackMarks: DemoComeBackMark[];
}

/** The demo network: what is set up, and the branches' histories, made one at a time as they are asked for. */
export interface DemoNetwork {
  setUp: DemoSetUp;
  histories: () => Iterable<BranchHistory>;
}

/** The version of a job that counts: the last one sent. */
export function newestContent(job: DemoJob): JobContent {
  return job.corrections?.at(-1)?.content ?? job.content;
}
