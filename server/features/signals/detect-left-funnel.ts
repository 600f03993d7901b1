import type { FactsByKind, Side } from '#shared/domain/signal-facts';
import type { BranchMeasure, FunnelFlag } from '#shared/domain/vocabulary';
import type { FoundSignal } from './found-signal';

/** Where a branch stands in the funnel of a measure over a period. */
export interface Placement {
  branchId: number;
  measure: BranchMeasure;
  cars: number;
  value: number | null;
  expected: number | null;
  lower998: number | null;
  upper998: number | null;
  flag: FunnelFlag;
  from: string;
  to: string;
}

/**
 * A branch outside the 99.8 % limits of a measure. It ends when the branch is back within the 95 % limits: in between the
 * figure of 52 weeks hovers, and would leave and return from night to night. `since` is the look that first saw it outside.
 */
export function detectLeftFunnel(
  placement: Placement,
  behind: readonly number[],
  today: string,
): FoundSignal[] {
  const { branchId, measure, cars, value, expected, lower998, upper998, flag } = placement;
  if (value === null || expected === null || lower998 === null || upper998 === null) return [];
  const side = SIDES[flag];
  if (!side) return [];
  const reach = side === 'low' ? expected - lower998 : upper998 - expected;
  const { from, to } = placement;
  const facts: FactsByKind['left_funnel'] = {
    side,
    value,
    expected,
    lower998,
    upper998,
    from,
    to,
  };
  return [
    {
      branchId,
      kind: 'left_funnel',
      key: `${measure} ${side}`,
      measure,
      since: today,
      strength: reach > 0 ? Math.abs(value - expected) / reach : 1,
      facts: { ...facts },
      cars,
      listed: [],
      behind: [...behind],
      weight: flag.endsWith('998') ? 'open' : 'keep',
    },
  ];
}

const SIDES: Readonly<Partial<Record<FunnelFlag, Side>>> = {
  below_998: 'low',
  below_95: 'low',
  above_95: 'high',
  above_998: 'high',
};
