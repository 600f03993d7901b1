import type { JobSheet } from '#shared/contracts/jobs';
import { formatExactAmount, formatShare, formatSignedExactAmount } from '../../ui/format';

/** A line of the job's account: a word, an amount to the cent. */
export interface MoneyLine {
  readonly name: string;
  readonly amount: string;
  readonly total: boolean;
}

/** Revenue, what went off it, and what was kept; without an invoice, the cost so far. */
export function moneyLines(money: NonNullable<JobSheet['money']>): readonly MoneyLine[] {
  const costs: MoneyLine[] = [
    ['Labour', money.labourCents],
    ['Product', money.productCents],
    ['Consumables', money.consumablesCents],
    ['Bought-in', money.boughtInCents],
  ].map(([name, cents]) => ({
    name: String(name),
    amount: formatSignedExactAmount(-Number(cents)),
    total: false,
  }));
  if (money.revenueCents === null || money.marginCents === null) {
    return [
      ...costs,
      { name: 'Cost so far', amount: formatExactAmount(money.costCents), total: true },
    ];
  }
  const share =
    money.marginShare === null ? '' : `, ${formatShare(money.marginShare, 1)} of revenue`;
  return [
    { name: 'Billed before tax', amount: formatExactAmount(money.revenueCents), total: false },
    ...costs,
    { name: 'Network fee', amount: formatSignedExactAmount(-money.feeCents), total: false },
    { name: `Kept${share}`, amount: formatExactAmount(money.marginCents), total: true },
  ];
}
