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
