/** Columns of each export, named as the JSON fields; nested ones with a dot (rule 62). */

export const MARGIN_COLUMNS = [
  ...['week', 'jobs', 'unbilled', 'unbilledCostCents', 'revenueCents', 'labourCents'],
  ...['productCents', 'consumablesCents', 'boughtInCents', 'feeCents', 'marginCents'],
  ...['marginShare', 'expectedMarginCents', 'signal', 'whole'],
];

export const OVERRUN_COLUMNS = [
  ...['key', 'cars', 'estimatedMinutes', 'actualMinutes', 'ratio', 'ratioStandardError'],
  ...['median', 'p80', 'p95', 'allowance'],
];

export const JOB_COLUMNS = [
  ...['branch', 'jobRef', 'revision', 'vehicle.key', 'vehicle.make', 'vehicle.model'],
  ...['vehicle.bodyType', 'vehicle.firstRegistered', 'package', 'completedOn', 'hasRot'],
  ...['unbilled', 'daysWaiting', 'estimatedMinutes', 'actualMinutes', 'overrunMinutes'],
  ...['beyondChargedMinutes', 'agreedExtraMinutes', 'agreedExtraCents', 'revenueCents'],
  ...['costCents', 'marginCents', 'marginShare', 'expectedMarginCents', 'largestStep.step'],
  ...['largestStep.cents'],
];

export const CLAIM_COLUMNS = [
  ...['branch', 'claimRef', 'revision', 'jobRef', 'vehicle.make', 'vehicle.model'],
  ...['vehicle.bodyType', 'vehicle.firstRegistered', 'package', 'completedOn', 'madeOn', 'month'],
  ...['inWarranty', 'counted', 'zone', 'side', 'cause', 'decision', 'proposedDecision'],
  ...['decidedOn', 'paidOn', 'labourMinutes', 'productMl', 'costCents'],
];

export const ROT_COLUMNS = ['ageBand', 'region', 'cars', 'withRot', 'share', 'lower', 'upper'];

export const ROT_MODEL_COLUMNS = [
  ...['make', 'model', 'ageBand', 'cars', 'withRot', 'share', 'shrunkShare', 'lower', 'upper'],
  'pooled',
];

export const ROT_ZONE_COLUMNS = [
  ...['zone', 'side', 'ageBand', 'cars', 'withRot', 'share', 'lower', 'upper'],
];

export const PRODUCT_COLUMNS = [
  ...['product', 'package', 'bodyType', 'cars', 'carsListing', 'meanMl', 'p10Ml', 'p25Ml'],
  ...['medianMl', 'p75Ml', 'p90Ml', 'normMl', 'costPerCarCents', 'under', 'over'],
  ...['underShare', 'overShare'],
];

export const PRODUCT_BRANCH_COLUMNS = ['branch', 'cars', 'ratioToNorm', 'lower', 'upper'];

/** The slope and its limits stand in every row of their product. */
export const PRODUCT_TEMPERATURE_COLUMNS = [
  ...['product', 'fromC', 'cars', 'p25Ml', 'medianMl', 'p75Ml'],
  ...['slopeMlPerDegree', 'lower', 'upper'],
];

/** What stands behind a quote is said in every row; `part` tells which of the others are filled. */
export const QUOTE_COLUMNS = [
  ...['kind', 'source', 'cars', 'part', 'key', 'p50Minutes', 'p80Minutes', 'share', 'lower'],
  ...['upper', 'ml', 'marginShare', 'priceCents'],
];

export const PRODUCT_NEED_COLUMNS = ['product', 'ml', 'lowerMl', 'upperMl', 'costCents'];

export const COME_BACK_COLUMNS = [
  ...['branch', 'jobRef', 'ref', 'vehicle.key', 'vehicle.make', 'vehicle.model'],
  ...['vehicle.bodyType', 'vehicle.firstRegistered', 'zone', 'side', 'seenAs', 'workedAs'],
  ...['structural', 'action', 'completedOn', 'dueOn', 'status', 'note', 'ownerToldOn'],
  ...['changedBy', 'changedAt', 'closedByJobRef'],
];

/** As rule 51 fixes them; the interval is that of the rate. */
export const WARRANTY_RISK_COLUMNS = [
  ...['branch', 'cohort', 'carsCovered', 'carYearsRun', 'carYearsLeft', 'claims', 'paidCents'],
  ...['per1000', 'lower', 'upper', 'expected', 'ratio', 'outstandingCents'],
  ...['standardErrorCents', 'claimsOpen'],
];

export const WARRANTY_CLAIM_FREE_COLUMNS = [
  ...['group', 'month', 'atRisk', 'claims', 'share', 'lower', 'upper'],
];

export const WARRANTY_COHORT_COLUMNS = [
  ...['cohort', 'cars', 'latestCents', 'ultimateCents', 'outstandingCents'],
  ...['standardErrorCents', 'claims', 'expected', 'ratio', 'lower', 'upper'],
];

export const WARRANTY_TRIANGLE_COLUMNS = ['cohort', 'development', 'cumulativeCents'];

export const WARRANTY_BRANCH_COLUMNS = [
  ...['branch', 'cars', 'carYears', 'claims', 'expected', 'ratio', 'lower', 'upper'],
];

export const WARRANTY_PROCESS_COLUMNS = ['check', 'riskRatio', 'lower', 'upper', 'strata'];

/** The detail is JSON in its cell. */
export const AUDIT_COLUMNS = [
  ...['id', 'at', 'actor', 'address', 'action', 'subject', 'branch', 'detail', 'hash'],
  'previousHash',
];

export const BRANCH_COLUMNS = [
  ...['branch', 'region', 'cars', 'value', 'expected', 'lower95', 'upper95', 'lower998'],
  ...['upper998', 'flag', 'denominator', 'claims', 'expectedClaims', 'target'],
];
