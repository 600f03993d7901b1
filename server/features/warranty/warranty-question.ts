import type { JobFilters } from '#db/queries/job-filters';
import type { CurveGroup } from '#shared/contracts/warranty';

/** Which jobs warranty figures are about, and as of which day; the first job … asOf where no days are given (rule 15). */
export interface CoverQuestion {
  asOf: string;
  from?: string | undefined;
  to?: string | undefined;
  filters: Pick<JobFilters, 'packageIds' | 'bodyTypes'>;
}

/** What is asked of warranty, with what its claim-free curves are told apart by. */
export interface WarrantyQuestion extends CoverQuestion {
  groupBy: CurveGroup;
  /** The curves asked for; without them those with the most cars. */
  groups?: readonly string[] | undefined;
}

/** What is asked of the warranty-risk rows. Codes of branches choose rows, not what the rows are worked out from. */
export interface RiskQuestion extends CoverQuestion {
  branches?: readonly string[] | undefined;
}
