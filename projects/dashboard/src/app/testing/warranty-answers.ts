import type {
  ClaimFreeGroup,
  ProcessRisk,
  WarrantyAnswer,
  WarrantyBranch,
  WarrantyCohort,
} from '#shared/contracts/warranty';
import { CHECKS } from '#shared/domain/vocabulary';

/** 3,040 cars finished in the first half of 2023: 25,290.00 paid, 1,972.00 to come, as many claims as expected, unless said. */
export function warrantyCohort(more: Partial<WarrantyCohort> = {}): WarrantyCohort {
  return {
    cohort: '2023-H1',
    cars: 3040,
    latestCents: 2_529_000,
    ultimateCents: 2_726_200,
    outstandingCents: 197_200,
    standardErrorCents: 25_357,
    claims: 60,
    expected: 58.2,
    ratio: 1.03,
    lower: 0.79,
    upper: 1.33,
    ...more,
  };
}

/** A branch with 49 claims where 46 were expected, unless said. */
export function warrantyBranch(branch: string, more: Partial<WarrantyBranch> = {}): WarrantyBranch {
  return {
    branch,
    cars: 1440,
    carYears: 2912.4,
    claims: 49,
    expected: 46.2,
    ratio: 1.06,
    lower: 0.78,
    upper: 1.4,
    ...more,
  };
}

/** A group that loses a tenth of a per cent a month over three years, unless said. */
export function claimFreeGroup(key: string, more: Partial<ClaimFreeGroup> = {}): ClaimFreeGroup {
  return {
    key,
    cars: 1440,
    claims: 46,
    months: Array.from({ length: 36 }, (_, index) => {
      const share = 1 - (index + 1) / 1000;
      return {
        month: index + 1,
        atRisk: 1440 - 30 * (index + 1),
        claims: 1,
        share,
        lower: share - 0.01,
        upper: Math.min(1, share + 0.005),
      };
    }),
    ...more,
  };
}

/** A check that was missed on 20 of 420 cars, with no ratio unless said. */
export function processRisk(
  check: ProcessRisk['check'],
  more: Partial<ProcessRisk> = {},
): ProcessRisk {
  return {
    check,
    riskRatio: null,
    lower: null,
    upper: null,
    strata: 1,
    tables: [
      {
        ageBand: '10-14',
        exposedCars: 20,
        exposedClaims: 2,
        unexposedCars: 400,
        unexposedClaims: 12,
      },
    ],
    ...more,
  };
}

/** An answer of three branches up to 2 February 2026, four half-years old, unless said. */
export function warrantyAnswer(more: Partial<WarrantyAnswer> = {}): WarrantyAnswer {
  const cohorts = [
    warrantyCohort({
      cohort: '2024-H1',
      outstandingCents: 0,
      ultimateCents: 2_529_000,
      standardErrorCents: 0,
    }),
    warrantyCohort({ cohort: '2024-H2', latestCents: 1_100_050 }),
    warrantyCohort({
      cohort: '2025-H1',
      latestCents: 600_049,
      claims: 40,
      expected: 22.1,
      ratio: 1.81,
      lower: 1.29,
      upper: 2.47,
    }),
    warrantyCohort({
      cohort: '2025-H2',
      latestCents: 100_000,
      outstandingCents: 2_504_800,
      standardErrorCents: 425_000,
    }),
  ];
  return {
    period: { from: '2024-01-08', to: '2026-02-02' },
    scope: { regions: ['OC', 'IN'], branches: ['HAV', 'TAN', 'ULV'] },
    jobs: 4400,
    reference: 'network',
    asOf: '2026-02-02',
    evaluatedOn: '2025-12-31',
    covered: 4320,
    rate: { claims: 136, carYears: 8737.2, per1000: 15.57, lower: 13.06, upper: 18.41 },
    claimFree: claimFreeGroup('all').months,
    groupBy: 'package',
    groups: [claimFreeGroup('cavity'), claimFreeGroup('full')],
    everyGroup: [
      { key: 'cavity', cars: 1440 },
      { key: 'full', cars: 1440 },
    ],
    logRank: {
      chiSquare: 14.2,
      degreesOfFreedom: 1,
      p: 0.00016,
      groups: [
        { key: 'cavity', observed: 46, expected: 30.5 },
        { key: 'full', observed: 46, expected: 61.5 },
      ],
    },
    cohorts,
    total: {
      latestCents: 4_329_099,
      ultimateCents: 11_985_199,
      outstandingCents: 7_656_100,
      standardErrorCents: 707_300,
    },
    triangle: {
      rows: [
        { cohort: '2024-H1', cumulativeCents: [100_000, 900_000, 2_000_000, 2_529_000] },
        { cohort: '2024-H2', cumulativeCents: [90_000, 800_000, 1_100_050] },
        { cohort: '2025-H1', cumulativeCents: [80_000, 600_049] },
        { cohort: '2025-H2', cumulativeCents: [100_000] },
      ],
      factors: [
        {
          development: 0,
          fromCents: 270_000,
          toCents: 2_300_049,
          factor: 8.5187,
          sigmaSquared: 812.5,
        },
        {
          development: 1,
          fromCents: 1_700_000,
          toCents: 3_100_050,
          factor: 1.82356,
          sigmaSquared: 90.25,
        },
        {
          development: 2,
          fromCents: 2_000_000,
          toCents: 2_529_000,
          factor: 1.2645,
          sigmaSquared: null,
        },
      ],
    },
    branches: [
      warrantyBranch('HAV'),
      warrantyBranch('TAN', { claims: 66, expected: 40.1, ratio: 1.65, lower: 1.27, upper: 2.09 }),
      warrantyBranch('ULV', { claims: 21, expected: 34.4, ratio: 0.61, lower: 0.38, upper: 0.93 }),
    ],
    expectedRates: [
      {
        package: 'full',
        ageBand: '10-14',
        yearInService: 1,
        claims: 80,
        carYears: 6400,
        ownCarYears: 1200,
      },
    ],
    process: CHECKS.map((check) =>
      check === 'drainsClear'
        ? processRisk(check, { riskRatio: 2.4, lower: 1.6, upper: 3.5 })
        : processRisk(check),
    ),
    thinProduct: {
      riskRatio: 1.7,
      lower: 1.2,
      upper: 2.4,
      strata: 1,
      tables: processRisk('linersOff').tables,
    },
    causes: [
      { cause: 'missed_area', claims: 90, costCents: 4_000_000 },
      { cause: 'drain_blocked', claims: 46, costCents: 2_100_000 },
      { cause: 'damage', claims: 0, costCents: 0 },
    ],
    zones: [
      { zone: 'sill_inner', claims: 50, costCents: 2_500_000 },
      { zone: 'bulkhead_drain', claims: 86, costCents: 3_600_000 },
    ],
    left: {
      carsWithoutWarranty: 80,
      claimsAfterEnd: 3,
      claimsRefused: 12,
      claimsWaiting: 1,
      paidAfterEvaluationCents: 120_450,
    },
    ...more,
  };
}

/** The same of one branch. */
export function branchWarrantyAnswer(more: Partial<WarrantyAnswer> = {}): WarrantyAnswer {
  return warrantyAnswer({
    scope: { regions: ['OC'], branches: ['HAV'] },
    branches: [warrantyBranch('HAV')],
    ...more,
  });
}

/** No car at all. */
export function noWarranty(more: Partial<WarrantyAnswer> = {}): WarrantyAnswer {
  return warrantyAnswer({
    period: { from: '2026-02-02', to: '2026-02-02' },
    jobs: 0,
    covered: 0,
    rate: { claims: 0, carYears: 0, per1000: null, lower: null, upper: null },
    claimFree: [],
    groups: [],
    everyGroup: [],
    logRank: null,
    cohorts: [],
    total: { latestCents: 0, ultimateCents: 0, outstandingCents: 0, standardErrorCents: null },
    triangle: { rows: [], factors: [] },
    branches: [],
    expectedRates: [],
    process: CHECKS.map((check) => processRisk(check, { strata: 0, tables: [] })),
    thinProduct: { riskRatio: null, lower: null, upper: null, strata: 0, tables: [] },
    causes: [],
    zones: [],
    left: {
      carsWithoutWarranty: 0,
      claimsAfterEnd: 0,
      claimsRefused: 0,
      claimsWaiting: 0,
      paidAfterEvaluationCents: 0,
    },
    ...more,
  });
}
