import type { SpanSums } from '#db/queries/margin';
import type { MarginWeek } from '#shared/contracts/margin';
import {
  costCents,
  expectedMarginCents,
  marginCents,
  type ActualMoney,
  type ExpectedMoney,
} from '#shared/domain/job-figures';

/** The sums of any set of jobs in cents. What is added once can be added again: margins and bridges are linear in them. */
export interface MoneyOfJobs {
  jobs: number;
  unbilled: number;
  withoutCost: number;
  wanting: number;
  /** What the unbilled jobs have cost so far. */
  unbilledCostCents: number;
  /** Over the billed jobs whose costs are known. */
  kept: ActualMoney;
  /** Over those of them that have an expectation as well (rule 2). */
  bridged: { cars: number; actual: ActualMoney; expected: ExpectedMoney };
}

/** The money of no job at all. */
export function noMoney(): MoneyOfJobs {
  return {
    jobs: 0,
    unbilled: 0,
    withoutCost: 0,
    wanting: 0,
    unbilledCostCents: 0,
    kept: { ...NOTHING_KEPT },
    bridged: { cars: 0, actual: { ...NOTHING_KEPT }, expected: { ...NOTHING_EXPECTED } },
  };
}

/** Adds the sums of alike jobs to those of a set they belong to. */
export function addSums(money: MoneyOfJobs, sums: SpanSums): void {
  const [billed, costed] = [sums.billed === 1, sums.costed === 1];
  money.jobs += sums.jobs;
  money.wanting += sums.wanting;
  if (!billed) money.unbilled += sums.jobs;
  if (!costed) money.withoutCost += sums.jobs;
  if (!costed) return;
  if (!billed) {
    money.unbilledCostCents += costCents(sums);
    return;
  }
  add(money.kept, sums);
  if (sums.expected !== 1) return;
  money.bridged.cars += sums.jobs;
  add(money.bridged.actual, sums);
  add(money.bridged.expected, {
    priceCents: sums.expPriceCents,
    labourCents: sums.expLabourCents,
    repairLabourCents: sums.expRepairLabourCents,
    productCents: sums.expProductCents,
    feeCents: sums.expFeeCents,
  });
}

/** A week as the answer lists it, not judged yet; its share is null when nothing was billed (rule 4). */
export function tellWeek(week: string, money: MoneyOfJobs, whole: boolean): MarginWeek {
  const { kept, bridged } = money;
  const margin = marginCents(kept);
  return {
    week,
    jobs: money.jobs,
    unbilled: money.unbilled,
    unbilledCostCents: money.unbilledCostCents,
    revenueCents: kept.revenueCents,
    labourCents: kept.labourCents + kept.repairLabourCents,
    productCents: kept.productCents,
    consumablesCents: kept.consumablesCents,
    boughtInCents: kept.boughtInCents,
    feeCents: kept.feeCents,
    marginCents: margin,
    marginShare: kept.revenueCents > 0 ? margin / kept.revenueCents : null,
    expectedMarginCents: expectedMarginCents(bridged.expected),
    signal: null,
    whole,
  };
}

const NOTHING_KEPT: Readonly<ActualMoney> = {
  revenueCents: 0,
  labourCents: 0,
  repairLabourCents: 0,
  productCents: 0,
  consumablesCents: 0,
  boughtInCents: 0,
  feeCents: 0,
};
const NOTHING_EXPECTED: Readonly<ExpectedMoney> = {
  priceCents: 0,
  labourCents: 0,
  repairLabourCents: 0,
  productCents: 0,
  feeCents: 0,
};

/** Adds every line of `sum` that `more` has too. */
function add<Line extends string>(
  sum: Record<Line, number>,
  more: NoInfer<Record<Line, number>>,
): void {
  for (const line of Object.keys(sum) as Line[]) sum[line] += more[line];
}
