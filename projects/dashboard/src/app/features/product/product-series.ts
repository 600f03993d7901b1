import type { ProductBranch, ProductsAnswer, ProductUse } from '#shared/contracts/products';
import type { UseBoxInput } from '../../charts/use-box/use-box-input';
import type { CellLink, Column } from '../../ui/data-table/column';
import { currencySign, formatCounted } from '../../ui/format';
import { branchRatios, type BranchRatios } from './branch-ratios';
import { carsOfUse } from './cars-of-use';
import { answerProducts, type ProductSentences } from './product-answer';
import { chosenProduct, productsInUse } from './product-choice';
import type { ProductWords } from './product-words';
import { temperaturePicture, type TemperaturePicture } from './temperature-picture';
import { usePicture } from './use-picture';
import { jobsLink, normlessColumns, useColumns } from './use-table';

/** Everything the page shows of the chosen product. */
export interface ProductView {
  readonly product: string;
  readonly name: string;
  /** Null where no kind of car has a norm for it. */
  readonly picture: UseBoxInput | null;
  readonly columns: readonly Column<ProductUse>[];
  /** With a norm, most cars under first. */
  readonly rows: readonly ProductUse[];
  readonly normlessColumns: readonly Column<ProductUse>[];
  readonly normless: readonly ProductUse[];
  readonly temperature: TemperaturePicture;
}

/** Everything the page shows but the coming need. */
export interface ProductsView {
  readonly answer: ProductSentences;
  readonly offered: readonly { readonly code: string; readonly name: string }[];
  readonly chosen: ProductView | null;
  readonly branches: BranchRatios | null;
  /** "12 cars stand outside the costs", absent when none does. */
  readonly apart: string | null;
  readonly csv: string;
}

/** Where figures lead: the page's own filters, and where a branch's name goes. */
export interface ProductLinks {
  readonly filters: Readonly<Record<string, unknown>>;
  readonly branch: (branch: ProductBranch['branch']) => CellLink;
}

/** Turns the answer into the page. Pure. */
export function productsView(
  answer: ProductsAnswer,
  asked: string | undefined,
  words: ProductWords,
  links: ProductLinks,
): ProductsView {
  const offered = productsInUse(answer.use);
  const product = chosenProduct(asked, offered);
  return {
    answer: answerProducts(answer, words, links.filters),
    offered: offered.map((code) => ({ code, name: words.productName(code) })),
    chosen: product === undefined ? null : productView(answer, product, words, links),
    branches: branchRatios(answer.branches, words, links.branch),
    apart: apartWords(answer, words),
    csv: `CSV of all products, ${formatCounted(answer.use.length, 'row', 'rows')}`,
  };
}

function productView(
  { use, period, temperature }: ProductsAnswer,
  product: string,
  words: ProductWords,
  links: ProductLinks,
): ProductView {
  const own = use.filter((row) => row.product === product);
  const rows = own
    .filter(({ normMl }) => normMl !== null)
    .sort((a, b) => (b.under ?? 0) - (a.under ?? 0) || b.cars - a.cars);
  const sign = currencySign(words.currency);
  const linkOf = (row: ProductUse, cars: 'all' | 'under' | 'over'): CellLink =>
    jobsLink({ ...links.filters, ...carsOfUse(row, cars, period) });
  return {
    product,
    name: words.productName(product),
    picture: rows.length === 0 ? null : usePicture(product, rows, words),
    columns: useColumns(words, sign, linkOf),
    rows,
    normlessColumns: normlessColumns(words, sign, linkOf),
    normless: own.filter(({ normMl }) => normMl === null).sort((a, b) => b.cars - a.cars),
    temperature: temperaturePicture(
      product,
      temperature.find((one) => one.product === product),
      words,
    ),
  };
}

function apartWords(
  { withoutCost, missingCosts }: ProductsAnswer,
  words: ProductWords,
): string | null {
  if (withoutCost === 0) return null;
  const products = missingCosts
    .filter(({ kind }) => kind === 'product')
    .map(({ code }) => words.productName(code));
  const whose = products.length === 0 ? 'a product' : [...new Set(products)].join(', ');
  return `${formatCounted(withoutCost, 'car stands', 'cars stand')} outside the costs: no cost of ${whose} was known on ${withoutCost === 1 ? 'its day' : 'their days'}.`;
}
