import type { QuoteAnswer } from '#shared/contracts/quote';

/** A quote as rows of a table: labour by stage and in all, chances, product, and price by margin for who may see it. */
export function quoteRows(quote: QuoteAnswer): object[] {
  const { basis, labour, rot, openedUp, products, priceCents, cost } = quote;
  const all = { key: 'all', p50Minutes: labour.p50Minutes, p80Minutes: labour.p80Minutes };
  const rows = [
    ...labour.stages.map(({ stage, ...minutes }) => ({ part: 'labour', key: stage, ...minutes })),
    { part: 'labour', ...all },
    { part: 'chance', key: 'rot', ...intervalOf(rot) },
    { part: 'chance', key: 'openedUp', ...intervalOf(openedUp) },
    ...products.map(({ product, ml }) => ({ part: 'product', key: product, ml })),
    { part: 'price', key: 'asked', marginShare: cost?.marginShare ?? null, priceCents },
    ...(cost?.prices ?? []).map((price) => ({ part: 'price', key: 'step', ...price })),
  ];
  return rows.map((row) => ({ ...basis, ...row }));
}

function intervalOf({ share, lower, upper }: QuoteAnswer['rot'] | QuoteAnswer['openedUp']): object {
  return { share, lower, upper };
}
