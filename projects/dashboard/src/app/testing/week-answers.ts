import type { JobRow } from '#shared/contracts/job-list';
import type { MarginAnswer, MarginWeek } from '#shared/contracts/margin';
import { addDays, isoWeek, mondayOfWeek } from '#shared/domain/calendar';

/** A billed, whole week with 11 cars unless said. */
export function marginWeek(week: string, more: Partial<MarginWeek> = {}): MarginWeek {
  return {
    week,
    jobs: 11,
    unbilled: 0,
    unbilledCostCents: 0,
    revenueCents: 892_500,
    labourCents: 0,
    productCents: 0,
    consumablesCents: 0,
    boughtInCents: 0,
    feeCents: 0,
    marginCents: 323_725,
    marginShare: 0.3627,
    expectedMarginCents: 421_834,
    signal: null,
    whole: true,
    ...more,
  };
}

/** A margin answer over the given weeks, oldest first, with limits 30.9–46.4 % about 38.7 % unless said. */
export function marginAnswer(
  weeks: readonly MarginWeek[],
  more: Partial<MarginAnswer> = {},
): MarginAnswer {
  const first = weeks[0]?.week ?? '2026-W05';
  const last = weeks.at(-1)?.week ?? '2026-W05';
  return {
    period: { from: mondayOfWeek(first), to: addDays(mondayOfWeek(last), 6) },
    scope: { regions: ['OC'], branches: ['HAV'] },
    jobs: weeks.reduce((sum, { jobs }) => sum + jobs, 0),
    withoutCost: 0,
    missingCosts: [],
    weeks: [...weeks],
    limits: { centre: 0.387, lower: 0.309, upper: 0.464, baselineWeeks: 26 },
    trend: { slopePerWeek: 0, p: 0.7 },
    bridge: {
      cars: 11,
      expectedMarginCents: 421_834,
      priceCents: 37_500,
      plannedLabourCents: -30_900,
      rotLabourCents: -73_500,
      productCents: -3_359,
      consumablesCents: -25_600,
      feeCents: -2_250,
      marginCents: 323_725,
    },
    targetMarginShare: null,
    ...more,
  };
}

/** The weeks from one to another, both included, each by the same recipe. */
export function weeksFromTo(
  first: string,
  last: string,
  recipe: (week: string, index: number) => MarginWeek = (week) => marginWeek(week),
): MarginWeek[] {
  const weeks: MarginWeek[] = [];
  for (let day = mondayOfWeek(first); day <= mondayOfWeek(last); day = addDays(day, 7)) {
    weeks.push(recipe(isoWeek(day), weeks.length));
  }
  return weeks;
}

/** A billed car that kept 83 of 379 expected, unless said. */
export function jobRow(jobRef: string, more: Partial<JobRow> = {}): JobRow {
  return {
    branch: 'HAV',
    jobRef,
    revision: 1,
    vehicle: {
      make: 'Velder',
      model: 'Tessock',
      bodyType: 'hatchback',
      firstRegistered: '2009-05',
    },
    package: 'full',
    completedOn: '2026-01-28',
    hasRot: true,
    unbilled: false,
    daysWaiting: null,
    estimatedMinutes: 405,
    actualMinutes: 735,
    overrunMinutes: 330,
    beyondChargedMinutes: null,
    agreedExtraMinutes: 0,
    agreedExtraCents: 0,
    revenueCents: 85_000,
    costCents: 76_700,
    marginCents: 8_300,
    marginShare: 0.0976,
    expectedMarginCents: 37_900,
    largestStep: { step: 'rotLabour', cents: -18_600 },
    ...more,
  };
}

/** A finished car that waits for its bill. */
export function unbilledRow(
  jobRef: string,
  daysWaiting: number,
  more: Partial<JobRow> = {},
): JobRow {
  return jobRow(jobRef, {
    unbilled: true,
    daysWaiting,
    revenueCents: null,
    marginCents: null,
    marginShare: null,
    largestStep: null,
    beyondChargedMinutes: 0,
    costCents: 61_200,
    ...more,
  });
}

/** A whole list of jobs as the API answers it. */
export function jobsAnswer(items: readonly JobRow[]) {
  return { items: [...items], nextCursor: null as string | null, jobs: items.length };
}
