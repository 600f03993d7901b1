import type { WarrantyAnswer, WarrantyBranch } from '#shared/contracts/warranty';
import type {
  IssuedReport,
  LaterArrival,
  WarrantyReport,
  WarrantyRiskRow,
  WarrantySchedule,
} from '#shared/contracts/warranty-reports';

/** A branch with 31 claims where 36 were expected, unless said. */
export function warrantyBranch(more: Partial<WarrantyBranch> = {}): WarrantyBranch {
  return {
    branch: 'HAV',
    cars: 1200,
    carYears: 2300.5,
    claims: 31,
    expected: 36.2,
    ratio: 0.856,
    lower: 0.58,
    upper: 1.22,
    ...more,
  };
}

/** One row of a branch's cars of one half-year, unless said. */
export function riskRow(more: Partial<WarrantyRiskRow> = {}): WarrantyRiskRow {
  return {
    branch: 'HAV',
    cohort: '2024-H1',
    carsCovered: 120,
    carYearsRun: 190.4,
    carYearsLeft: 170.1,
    claims: 3,
    paidCents: 61_250,
    per1000: 15.76,
    lower: 3.25,
    upper: 46.05,
    expected: 2.4,
    ratio: 1.25,
    outstandingCents: 40_400,
    standardErrorCents: 20_000,
    claimsOpen: 1,
    ...more,
  };
}

/** Two half-years of cars and three branches; Tangmoor stands above, as of 1 February 2026. */
export function warrantyAnswer(more: Partial<WarrantyAnswer> = {}): WarrantyAnswer {
  const pooled = {
    riskRatio: 1.62,
    lower: 1.1,
    upper: 2.39,
    strata: 2,
    tables: [
      {
        ageBand: '5-9' as const,
        exposedCars: 40,
        exposedClaims: 6,
        unexposedCars: 300,
        unexposedClaims: 27,
      },
    ],
  };
  return {
    period: { from: '2024-01-02', to: '2026-02-01' },
    scope: { branches: ['HAV', 'TAN', 'ULV'], regions: ['N'] },
    jobs: 2450,
    reference: 'network',
    asOf: '2026-02-01',
    evaluatedOn: '2025-12-31',
    covered: 2300,
    rate: { claims: 118, carYears: 6800.25, per1000: 17.352, lower: 14.36, upper: 20.78 },
    claimFree: [
      { month: 1, atRisk: 2300, claims: 1, share: 0.9996, lower: 0.997, upper: 0.9999 },
      { month: 12, atRisk: 1500, claims: 4, share: 0.988, lower: 0.982, upper: 0.992 },
      { month: 13, atRisk: 4, claims: 0, share: null, lower: null, upper: null },
    ],
    groupBy: 'package',
    groups: [
      {
        key: 'full',
        cars: 1700,
        claims: 70,
        months: [{ month: 12, atRisk: 1100, claims: 2, share: 0.99, lower: 0.984, upper: 0.994 }],
      },
      {
        key: 'underbody_only',
        cars: 600,
        claims: 48,
        months: [{ month: 12, atRisk: 400, claims: 2, share: 0.98, lower: 0.965, upper: 0.989 }],
      },
    ],
    everyGroup: [
      { key: 'full', cars: 1700 },
      { key: 'underbody_only', cars: 600 },
    ],
    logRank: {
      chiSquare: 14.25,
      degreesOfFreedom: 1,
      p: 0.00016,
      groups: [
        { key: 'full', observed: 70, expected: 87.4 },
        { key: 'underbody_only', observed: 48, expected: 30.6 },
      ],
    },
    cohorts: [
      {
        cohort: '2024-H1',
        cars: 1100,
        latestCents: 1_000_040,
        ultimateCents: 1_000_040,
        outstandingCents: 0,
        standardErrorCents: 0,
        claims: 70,
        expected: 66.1,
        ratio: 1.059,
        lower: 0.83,
        upper: 1.34,
      },
      {
        cohort: '2024-H2',
        cars: 1200,
        latestCents: 400_020,
        ultimateCents: 900_045,
        outstandingCents: 500_025,
        standardErrorCents: 70_700,
        claims: 48,
        expected: 51.9,
        ratio: 0.925,
        lower: 0.68,
        upper: 1.23,
      },
    ],
    total: {
      latestCents: 1_400_060,
      ultimateCents: 1_900_085,
      outstandingCents: 500_025,
      standardErrorCents: 70_700,
    },
    triangle: {
      rows: [
        { cohort: '2024-H1', cumulativeCents: [444_400, 1_000_040] },
        { cohort: '2024-H2', cumulativeCents: [400_020] },
      ],
      factors: [
        {
          development: 0,
          fromCents: 444_400,
          toCents: 1_000_040,
          factor: 2.2502925,
          sigmaSquared: null,
        },
      ],
    },
    branches: [
      warrantyBranch(),
      warrantyBranch({
        branch: 'TAN',
        claims: 66,
        expected: 40.1,
        ratio: 1.646,
        lower: 1.27,
        upper: 2.09,
      }),
      warrantyBranch({
        branch: 'ULV',
        claims: 21,
        expected: 24.8,
        ratio: 0.847,
        lower: 0.52,
        upper: 1.29,
      }),
    ],
    expectedRates: [],
    process: [
      { check: 'driedOut', ...pooled },
      {
        check: 'primerCured',
        riskRatio: null,
        lower: null,
        upper: null,
        strata: 0,
        tables: [],
      },
    ],
    thinProduct: { ...pooled, riskRatio: 2.04, lower: 1.31, upper: 3.18 },
    causes: [],
    zones: [],
    left: {
      carsWithoutWarranty: 150,
      claimsAfterEnd: 3,
      claimsRefused: 12,
      claimsWaiting: 1,
      paidAfterEvaluationCents: 43_050,
    },
    ...more,
  };
}

/** The report of that answer. */
export function warrantyReport(
  more: Partial<WarrantyReport> = {},
  answer: Partial<WarrantyAnswer> = {},
): WarrantyReport {
  return {
    network: 'The network',
    currency: 'EUR',
    asOf: '2026-02-01',
    branches: [
      { code: 'HAV', name: 'Havnsund', region: 'North' },
      { code: 'TAN', name: 'Tangmoor', region: 'North' },
      { code: 'ULV', name: 'Ulvmark', region: 'North' },
    ],
    answer: warrantyAnswer(answer),
    rows: [riskRow(), riskRow({ branch: 'TAN', standardErrorCents: null })],
    ...more,
  };
}

/** Report 3, issued from that answer by a person on the morning of 2 February 2026. */
export function issuedReport(more: Partial<IssuedReport> = {}): IssuedReport {
  return {
    id: 3,
    asOf: '2026-02-01',
    issuedAt: '2026-02-02T06:30:00.000Z',
    by: 'Runa Estvik',
    outstandingCents: 500_025,
    standardErrorCents: 70_700,
    covered: 2300,
    claims: 118,
    pdfBytes: 81_920,
    pdfSha256: 'a'.repeat(64),
    csvSha256: 'b'.repeat(64),
    ...more,
  };
}

/** A claim that was new, received after report 3 was issued. */
export function laterArrival(more: Partial<LaterArrival> = {}): LaterArrival {
  return {
    kind: 'claim',
    branch: 'TAN',
    ref: 'c-9',
    jobRef: '0417',
    what: 'new',
    on: '2026-01-20',
    at: '2026-02-03T10:00:00.000Z',
    by: 'Ilse Torven',
    costCents: 31_000,
    ...more,
  };
}

/** A schedule that is active, on the first, to one person, and has never run. */
export function warrantySchedule(more: Partial<WarrantySchedule> = {}): WarrantySchedule {
  return {
    active: true,
    dayOfMonth: 1,
    people: [4],
    nextOn: '2026-03-01',
    lastRun: null,
    mails: [],
    changedAt: null,
    changedBy: null,
    ...more,
  };
}
