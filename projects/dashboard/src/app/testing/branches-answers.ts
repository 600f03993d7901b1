import type {
  BranchesAnswer,
  BranchStanding,
  BranchWeeks,
  BranchWeeksAnswer,
  ComparedBranch,
  SideBySideAnswer,
} from '#shared/contracts/branches';

const PERIOD = { from: '2025-08-11', to: '2026-02-02' };

/** A branch of 200 cars that overran by 20 %, as its cars lead one to expect, unless said. */
export function branchStanding(branch: string, more: Partial<BranchStanding> = {}): BranchStanding {
  return {
    branch,
    region: 'SOUND',
    cars: 200,
    value: 1.2,
    expected: 1.2,
    lower95: 1.17,
    upper95: 1.23,
    lower998: 1.15,
    upper998: 1.25,
    flag: 'as_expected',
    denominator: 80_000,
    claims: null,
    expectedClaims: null,
    target: null,
    ...more,
  };
}

/** A branch with less than five cars. */
export function fewCars(branch: string, cars = 3): BranchStanding {
  return branchStanding(branch, {
    cars,
    value: null,
    expected: null,
    lower95: null,
    upper95: null,
    lower998: null,
    upper998: null,
    flag: 'too_few',
  });
}

/** An answer about overrun over these branches, all heard of up to last Friday, unless said. */
export function branchesAnswer(
  branches: readonly BranchStanding[],
  more: Partial<BranchesAnswer> = {},
): BranchesAnswer {
  const codes = branches.map(({ branch }) => branch);
  const cars = branches.reduce((sum, one) => sum + one.cars, 0);
  return {
    period: PERIOD,
    scope: { regions: ['SOUND'], branches: codes },
    jobs: cars,
    measure: 'overrun',
    reference: 'network',
    network: 1.21,
    referenceCars: 10_400,
    withoutCost: 0,
    missingCosts: [],
    branches: [...branches],
    received: codes.map((branch) => ({
      branch,
      region: 'SOUND',
      receivedThrough: '2026-01-30',
      lastReceivedAt: '2026-01-30T16:00:00.000Z',
    })),
    ...more,
  };
}

/** Weeks 3 to 5 of a branch, the last one above its own usual range, unless said. */
export function branchWeeks(branch: string, more: Partial<BranchWeeks> = {}): BranchWeeks {
  return {
    branch,
    weeks: [
      { week: '2026-W03', cars: 9, value: 1.18, signal: null },
      { week: '2026-W04', cars: 3, value: null, signal: null },
      { week: '2026-W05', cars: 8, value: 1.5, signal: 'outside_high' },
    ],
    limits: { centre: 1.2, lower: 1.05, upper: 1.35, baselineWeeks: 26 },
    target: 1.1,
    ...more,
  };
}

/** The weeks of these branches. */
export function branchWeeksAnswer(
  branches: readonly BranchWeeks[],
  more: Partial<BranchWeeksAnswer> = {},
): BranchWeeksAnswer {
  return {
    period: PERIOD,
    scope: { regions: ['SOUND'], branches: branches.map(({ branch }) => branch) },
    jobs: 400,
    measure: 'overrun',
    branches: [...branches],
    ...more,
  };
}

/** A branch as it is compared: its steps lead from the network's 1.21 to its value. */
export function comparedBranch(
  branch: string,
  steps: Readonly<Record<string, number>>,
  more: Partial<ComparedBranch> = {},
): ComparedBranch {
  const value = 1.21 + Object.values(steps).reduce((sum, step) => sum + step, 0);
  return {
    branch,
    region: 'SOUND',
    cars: 200,
    value,
    expected: 1.21 + (steps['mix'] ?? 0),
    flag: 'as_expected',
    steps: Object.entries(steps).map(([key, step]) => ({ key, value: step })),
    ...more,
  };
}

/** Two branches side by side: Skuld 12 points over Havnsund, by refit and its cars, unless said. */
export function sideBySideAnswer(more: Partial<SideBySideAnswer> = {}): SideBySideAnswer {
  return {
    period: PERIOD,
    scope: { regions: ['SOUND'], branches: ['HAV', 'SKU'] },
    jobs: 400,
    measure: 'overrun',
    reference: 'network',
    network: 1.21,
    withoutCost: 0,
    missingCosts: [],
    branches: [
      comparedBranch('HAV', { mix: 0.01, repair: 0, refit: -0.01 }),
      comparedBranch('SKU', { mix: 0.03, repair: 0.01, refit: 0.08 }),
    ],
    ...more,
  };
}
