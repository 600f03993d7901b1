import { CostBook, FROM_THE_START, type CostChange } from '#shared/domain/cost-book';
import { feeRateMicros } from '#shared/domain/money';
import type { DemoSetUp } from './demo-network';

/** Every dated cost, fee and norm of the demo's set-up, as changes of a cost book. */
export function costChangesOf(setUp: DemoSetUp): CostChange[] {
  const fee = (from: string, feeRate: number): CostChange => ({
    kind: 'fee',
    from,
    value: feeRateMicros(feeRate),
  });
  return [
    fee(FROM_THE_START, setUp.network.feeRate),
    ...setUp.fees.map(({ from, feeRate }) => fee(from, feeRate)),
    ...setUp.rates.map(({ branch, from, hourlyCostCents }) => ({
      kind: 'hourlyCost' as const,
      code: branch,
      from,
      value: hourlyCostCents,
    })),
    ...setUp.productCosts.map(({ product, from, costPerLitreCents }) => ({
      kind: 'product' as const,
      code: product,
      from,
      value: costPerLitreCents,
    })),
    ...setUp.consumableCosts.map(({ kind, from, unitCostCents }) => ({
      kind: 'consumable' as const,
      code: kind,
      from,
      value: unitCostCents,
    })),
    ...setUp.norms.map((norm) => ({
      kind: 'norm' as const,
      package: norm.package,
      bodyType: norm.bodyType,
      lines: norm.norms,
    })),
  ];
}

/** The cost book that the demo's set-up amounts to: for recounting its figures from the raw jobs without a database. */
export function costBookOf(setUp: DemoSetUp): CostBook {
  return CostBook.of(costChangesOf(setUp));
}
