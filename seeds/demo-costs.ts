import { CostBook, FROM_THE_START } from '#shared/domain/cost-book';
import type { DemoSetUp } from './demo-network';

/** The cost book that the demo's set-up amounts to: for recounting its figures from the raw jobs without a database. */
export function costBookOf(setUp: DemoSetUp): CostBook {
  return CostBook.of([
    { kind: 'fee', from: FROM_THE_START, value: micros(setUp.network.feeRate) },
    ...setUp.fees.map((fee) => ({
      kind: 'fee' as const,
      from: fee.from,
      value: micros(fee.feeRate),
    })),
    ...setUp.rates.map((rate) => ({
      kind: 'hourlyCost' as const,
      code: rate.branch,
      from: rate.from,
      value: rate.hourlyCostCents,
    })),
    ...setUp.productCosts.map((cost) => ({
      kind: 'product' as const,
      code: cost.product,
      from: cost.from,
      value: cost.costPerLitreCents,
    })),
    ...setUp.consumableCosts.map((cost) => ({
      kind: 'consumable' as const,
      code: cost.kind,
      from: cost.from,
      value: cost.unitCostCents,
    })),
    ...setUp.norms.map((norm) => ({
      kind: 'norm' as const,
      package: norm.package,
      bodyType: norm.bodyType,
      lines: norm.norms,
    })),
  ]);
}

function micros(feeRate: number): number {
  return Math.round(feeRate * 1e6);
}
