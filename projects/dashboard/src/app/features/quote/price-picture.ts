import type { QuoteAnswer } from '#shared/contracts/quote';
import type { ValueCurveInput } from '../../charts/value-curve/value-curve-input';
import type { Column } from '../../ui/data-table/column';
import { formatExactAmount, formatExactMoney, formatMoney } from '../../ui/format';
import { shareWords } from './quote-sentences';

type Cost = NonNullable<QuoteAnswer['cost']>;
type Price = Cost['prices'][number];

/** A line of what the price is made of. */
export interface PriceLine {
  readonly name: string;
  readonly text: string;
  readonly total: boolean;
}

/** How the price moves with the margin. */
export interface PricePicture {
  readonly data: ValueCurveInput;
  readonly rows: readonly Price[];
  readonly columns: readonly Column<Price>[];
}

/** Margins beyond this one make the curve so steep that nothing else is seen; the one asked for is always reached. */
const FAR = 0.5;

/** The curve of prices; nothing where a cost is missing. */
export function pricePicture(
  { cost, priceCents }: Pick<QuoteAnswer, 'cost' | 'priceCents'>,
  currency: string,
): PricePicture | undefined {
  if (!cost || cost.prices.length < 2) return undefined;
  const wanted = cost.marginShare;
  const far = Math.max(FAR, (wanted ?? 0) + 0.05);
  const rows = cost.prices.filter(({ marginShare }) => marginShare <= far + 1e-9);
  const money = (cents: number): string => formatMoney(cents, currency);
  const first = rows[0]!;
  const last = rows.at(-1)!;
  const chosen =
    wanted === null || priceCents === null
      ? null
      : { x: wanted, y: priceCents, text: `${money(priceCents)} keeps ${shareWords(wanted)}` };
  return {
    rows,
    columns: [
      {
        key: 'margin',
        label: 'Margin kept',
        text: ({ marginShare }) => shareWords(marginShare),
        strong: ({ marginShare }) => marginShare === wanted,
      },
      {
        key: 'price',
        label: 'Price before tax',
        kind: 'number',
        text: (row) => formatExactMoney(row.priceCents, currency),
        strong: ({ marginShare }) => marginShare === wanted,
      },
    ],
    data: {
      summary: `From ${money(first.priceCents)} for a margin of ${shareWords(first.marginShare)} to ${money(last.priceCents)} for ${shareWords(last.marginShare)}${chosen ? `; ${chosen.text}` : ''}.`,
      points: rows.map(({ marginShare, priceCents: y }) => ({ x: marginShare, y })),
      chosen,
      xText: shareWords,
      yText: money,
    },
  };
}

/** What the price is made of, adding up to it to the cent; nothing without a price or for recorders. */
export function priceLines({
  cost,
  priceCents,
}: Pick<QuoteAnswer, 'cost' | 'priceCents'>): readonly PriceLine[] {
  if (!cost || priceCents === null) return [];
  const { labourCents, productCents, consumablesAndBoughtInCents, feeRate } = cost;
  if (labourCents === null || productCents === null || consumablesAndBoughtInCents === null) {
    return [];
  }
  const fee = Math.round(priceCents * (feeRate ?? 0));
  const kept = priceCents - labourCents - productCents - consumablesAndBoughtInCents - fee;
  const line = (name: string, cents: number, total = false): PriceLine => ({
    name,
    text: formatExactAmount(cents),
    total,
  });
  return [
    line('Labour that 4 of 5 cars stayed within', labourCents),
    line('Product, mean', productCents),
    line('Consumables and bought-in, mean', consumablesAndBoughtInCents),
    line(`Network fee${feeRate === null ? '' : `, ${shareWords(feeRate)}`}`, fee),
    line('Kept', kept),
    line('Price before tax', priceCents, true),
  ];
}
