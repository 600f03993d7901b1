import type { JobSheet } from '#shared/contracts/jobs';
import type { Column } from '../../ui/data-table/column';
import { formatShare, formatVolume } from '../../ui/format';

/** Product used on the job beside its norm; `null` where there is no norm. */
export interface ProductRow {
  readonly product: string;
  readonly ml: number;
  readonly normMl: number | null;
}

/** One row a product: those used, and those the norm names though none was used, which is the worst under-use. */
export function productRows(
  used: JobSheet['products'],
  norms: readonly { readonly product: string; readonly ml: number }[],
): readonly ProductRow[] {
  const byProduct = new Map<string, number>();
  for (const { product, ml } of used ?? []) {
    byProduct.set(product, (byProduct.get(product) ?? 0) + ml);
  }
  const normed = norms.map(({ product, ml }) => ({
    product,
    ml: byProduct.get(product) ?? 0,
    normMl: ml,
  }));
  const others = [...byProduct]
    .filter(([product]) => !norms.some((norm) => norm.product === product))
    .map(([product, ml]) => ({ product, ml, normMl: null }));
  return [...normed, ...others];
}

/** The columns of the product table. */
export function productColumns(
  productName: (code: string) => string,
): readonly Column<ProductRow>[] {
  return [
    { key: 'product', label: 'Product', text: (row) => productName(row.product) },
    {
      key: 'used',
      label: 'Used',
      kind: 'number',
      strong: true,
      text: (row) => formatVolume(row.ml),
    },
    {
      key: 'norm',
      label: 'Norm',
      kind: 'number',
      text: (row) => (row.normMl === null ? 'none' : formatVolume(row.normMl)),
      muted: (row) => row.normMl === null,
    },
    {
      key: 'ratio',
      label: 'Of norm',
      kind: 'number',
      text: (row) => (row.normMl ? formatShare(row.ml / row.normMl) : ''),
    },
  ];
}
