import type { ClaimFreeGroup } from '#shared/contracts/warranty';
import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import { AGE_BANDS, CHECKS, CLAIM_CAUSES, ZONES } from '#shared/domain/vocabulary';

/** How large a made-up report is. */
export interface SampleSize {
  branches?: number;
  /** Half-years. */
  cohorts?: number;
  groups?: number;
  /** Name of the first branch. */
  firstName?: string;
  network?: string;
  currency?: string;
}

const pooled = { riskRatio: null, lower: null, upper: null, strata: 0, tables: [] };

/** A made-up report of any size with figures that look like some, for what is printed and kept of one. */
export function sampleReport({
  branches = 8,
  cohorts = 5,
  groups = 3,
  firstName = 'Havnsund',
  network = 'Demo network',
  currency = 'EUR',
}: SampleSize = {}): WarrantyReport {
  const codes = Array.from(
    { length: branches },
    (_, index) => `B${String(index).padStart(2, '0')}`,
  );
  const halves = Array.from(
    { length: cohorts },
    (_, index) =>
      `${2025 - Math.floor((cohorts - 1 - index) / 2)}-H${(cohorts - 1 - index) % 2 === 0 ? 2 : 1}`,
  );
  const waves = (index: number): number => 1 + 0.35 * Math.sin(index * 2.3);
  const made = codes.map((branch, index) => {
    const expected = 20 + 7 * waves(index + 3);
    const ratio = index === 1 ? 1.7 : index === 2 ? 0.6 : waves(index) * 0.97;
    const half = ratio * 0.24;
    return {
      branch,
      cars: 300 + index * 17,
      carYears: 812.4 + index * 31.77,
      claims: Math.round(expected * ratio),
      expected,
      ratio,
      lower: ratio - half,
      upper: ratio + half,
    };
  });
  const paid = halves.map((_, row) =>
    Array.from({ length: cohorts - row }, (_age, age) =>
      Math.round(48_000_37 * (1 - 0.62 ** (age + 1)) * waves(row)),
    ),
  );
  const factors = Array.from({ length: Math.max(cohorts - 1, 0) }, (_, development) => {
    const rows = paid.filter((row) => row.length > development + 1);
    const sum = (age: number): number => rows.reduce((all, row) => all + (row[age] ?? 0), 0);
    const [fromCents, toCents] = [sum(development), sum(development + 1)];
    const sigmaSquared = development === cohorts - 2 ? null : 8_213.1237 / (development + 1);
    return { development, fromCents, toCents, factor: toCents / fromCents, sigmaSquared };
  });
  const ends = paid.map((row) => {
    const latestCents = row.at(-1) ?? 0;
    const ultimateCents = Math.round(
      factors.slice(row.length - 1).reduce((cents, { factor }) => cents * factor, latestCents),
    );
    return { latestCents, ultimateCents, outstandingCents: ultimateCents - latestCents };
  });
  const cohortRows = halves.map((cohort, index) => ({
    cohort,
    cars: 2_710 + 130 * index,
    ...ends[index]!,
    standardErrorCents: index === 0 ? 0 : Math.round(ends[index]!.outstandingCents * 0.17),
    claims: 40,
    expected: 41.2,
    ratio: 0.97,
    lower: 0.7,
    upper: 1.32,
  }));
  const sum = (key: 'latestCents' | 'ultimateCents' | 'outstandingCents'): number =>
    ends.reduce((all, end) => all + end[key], 0);
  const covered = cohortRows.reduce((all, { cars }) => all + cars, 0);
  const names = ['full', 'underbody', 'cavity', 'a package with quite a long name'];
  const claimFree = names.slice(0, groups).map((key, index): ClaimFreeGroup => {
    const months = Array.from({ length: 36 }, (_, at) => {
      const share = 1 - (0.03 + index * 0.014) * (1 - Math.exp(-(((at + 1) / 20) ** 2)));
      return {
        month: at + 1,
        atRisk: Math.max(0, Math.round((14_260 - at * 260) / (index + 1))),
        claims: 3,
        share: at > 33 && index === 2 ? null : share,
        lower: share - 0.0005 * (at + 1) * (index + 0.5),
        upper: Math.min(1, share + 0.0004 * (at + 1) * (index + 0.5)),
      };
    });
    return { key, cars: 4_380, claims: 120, months };
  });
  return {
    network,
    currency,
    asOf: '2026-02-01',
    branches: codes.map((code, index) => ({
      code,
      name: index === 0 ? firstName : `Branch of ${code}`,
      region: 'COAST',
    })),
    answer: {
      period: { from: '2019-01-07', to: '2026-02-01' },
      scope: { regions: ['COAST'], branches: codes },
      jobs: covered + 812,
      reference: 'network',
      asOf: '2026-02-01',
      evaluatedOn: '2025-12-31',
      covered,
      rate:
        covered === 0
          ? { claims: 0, carYears: 0, per1000: null, lower: null, upper: null }
          : { claims: 613, carYears: 41_233.4, per1000: 14.867, lower: 13.71, upper: 16.09 },
      claimFree: claimFree[0]?.months ?? [],
      groupBy: 'package',
      groups: claimFree,
      everyGroup: claimFree.map(({ key, cars }) => ({ key, cars })),
      logRank:
        groups < 2
          ? null
          : { chiSquare: 21.3, degreesOfFreedom: groups - 1, p: 0.00002, groups: [] },
      cohorts: cohortRows,
      total: {
        latestCents: sum('latestCents'),
        ultimateCents: sum('ultimateCents'),
        outstandingCents: sum('outstandingCents'),
        standardErrorCents: cohorts < 3 ? null : Math.round(sum('outstandingCents') * 0.0924),
      },
      triangle: {
        rows: halves.map((cohort, index) => ({ cohort, cumulativeCents: paid[index]! })),
        factors,
      },
      branches: made,
      expectedRates:
        covered === 0
          ? []
          : names.slice(0, groups).flatMap((name) =>
              AGE_BANDS.flatMap((ageBand) =>
                [1, 2, 3].map((yearInService) => ({
                  package: name,
                  ageBand,
                  yearInService,
                  claims: 12,
                  carYears: 812.25,
                  ownCarYears: 812.25,
                })),
              ),
            ),
      process: CHECKS.map((check, index) => ({
        check,
        ...(index > 0
          ? pooled
          : {
              riskRatio: 2.13,
              lower: 1.52,
              upper: 2.98,
              strata: 2,
              tables: AGE_BANDS.slice(0, 2).map((ageBand) => ({
                ageBand,
                exposedCars: 300,
                exposedClaims: 21,
                unexposedCars: 4_100,
                unexposedClaims: 133,
              })),
            }),
      })),
      thinProduct: pooled,
      causes: CLAIM_CAUSES.map((cause, index) => ({
        cause,
        claims: 100 - 20 * index,
        costCents: 812_345,
      })),
      zones: ZONES.map((zone) => ({ zone, claims: 12, costCents: 81_234 })),
      left: {
        carsWithoutWarranty: 812,
        claimsAfterEnd: 4,
        claimsRefused: 21,
        claimsWaiting: 1,
        paidAfterEvaluationCents: 41_207,
      },
    },
    rows: codes.flatMap((branch, at) =>
      halves.map((cohort, index) => ({
        branch,
        cohort,
        carsCovered: 120 + at,
        carYearsRun: 212.31 + index,
        carYearsLeft: 88.2,
        claims: 3,
        paidCents: 123_456,
        per1000: 14.13,
        lower: 2.91,
        upper: 41.29,
        expected: 3.217,
        ratio: 0.9325,
        outstandingCents: 45_678,
        standardErrorCents: index === 0 ? null : 12_346,
        claimsOpen: 1,
      })),
    ),
  };
}
