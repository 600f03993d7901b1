import type { OverrunAnswer, OverrunGroup, OverrunGrouping } from '#shared/contracts/overrun';
import { STAGES } from '#shared/domain/vocabulary';

/** A group of 100 cars worked 20 % longer than estimated, give or take 4, unless said. */
export function overrunGroup(key: string, more: Partial<OverrunGroup> = {}): OverrunGroup {
  return {
    key,
    cars: 100,
    estimatedMinutes: 40_000,
    actualMinutes: 48_000,
    ratio: 1.2,
    ratioStandardError: 0.02,
    median: 1.1,
    p80: 1.35,
    p95: 1.9,
    allowance: 0.35,
    ...more,
  };
}

/** A group with too few cars for any figure but its counts. */
export function smallGroup(key: string, cars = 3): OverrunGroup {
  return overrunGroup(key, {
    cars,
    estimatedMinutes: 1_200,
    actualMinutes: 1_500,
    ratio: null,
    ratioStandardError: null,
    median: null,
    p80: null,
    p95: null,
    allowance: null,
  });
}

/** The seven stages: 300 cars, 120,000 minutes estimated, 24,000 over, two thirds of it in the repair that no estimate names. */
export function stageGroups(): OverrunGroup[] {
  const over = {
    strip: 3_000,
    clean: 5_000,
    dry: 0,
    repair: 16_000,
    mask: -500,
    apply: 200,
    refit: 300,
  };
  return STAGES.map((stage) => {
    const estimatedMinutes = stage === 'repair' ? 0 : 20_000;
    const named = estimatedMinutes > 0;
    return overrunGroup(stage, {
      cars: 300,
      estimatedMinutes,
      actualMinutes: estimatedMinutes + over[stage],
      ratio: named ? 1 + over[stage] / 20_000 : null,
      ...(named
        ? {}
        : { ratioStandardError: null, median: null, p80: null, p95: null, allowance: null }),
    });
  });
}

/** An overrun answer of 300 cars at +20 %, 16–24 %, unless said. */
export function overrunAnswer(
  by: OverrunGrouping,
  groups: readonly OverrunGroup[],
  more: Partial<OverrunAnswer> = {},
): OverrunAnswer {
  const { key: _, ...overall } = overrunGroup('all', {
    cars: 300,
    estimatedMinutes: 120_000,
    actualMinutes: 144_000,
  });
  return {
    period: { from: '2025-08-04', to: '2026-02-01' },
    scope: { regions: ['OC'], branches: ['HAV'] },
    jobs: 300,
    by,
    overall,
    groups: [...groups],
    withoutEstimate: 0,
    ...more,
  };
}
