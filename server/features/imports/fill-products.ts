import { PRODUCT_PLACES } from '#shared/domain/import-fields-of-lists';
import type { RowBody } from './row-body';

interface Line {
  product: string;
  ml: number;
}

/** A line as it will stand, with the columns it came from. */
interface DraftLine {
  line: { product?: string | undefined; ml?: number | undefined };
  codeFills?: string;
  mlFills?: string;
}

/**
 * Fills the products of a job: a column for each product says what was used of it, columns by number say all that was used.
 * Lines that add up to what a file says stay as they are, because a job may list a product twice.
 */
export function fillProducts(draft: RowBody, stored: readonly Line[]): void {
  const { row } = draft;
  const places = placesOf(draft);
  const columns = productColumns(draft);
  if (places.length === 0 && columns.length === 0) return;
  let lines: DraftLine[] = stored.map((line) => ({ line }));
  if (places.length > 0) lines = byNumber(draft, stored, places);
  for (const { code, fills } of columns) {
    const ml = row.number(fills);
    const own = lines.filter(({ line }) => line.product === code);
    const total = own.reduce((sum, { line }) => sum + (line.ml ?? 0), 0);
    if (total === (ml ?? 0)) continue;
    const at = own[0] ? lines.indexOf(own[0]) : lines.length;
    const kept = lines.filter((line) => !own.includes(line));
    const said = ml ? [{ line: { product: code, ml }, mlFills: fills }] : [];
    lines = [...kept.slice(0, at), ...said, ...kept.slice(at)];
  }
  draft.body['products'] = lines.map(({ line, codeFills, mlFills }, index) => {
    if (codeFills !== undefined) draft.places.set(`/products/${index}/product`, codeFills);
    if (mlFills !== undefined) draft.places.set(`/products/${index}/ml`, mlFills);
    return line;
  });
}

function placesOf({ row }: RowBody): number[] {
  return Array.from({ length: PRODUCT_PLACES }, (_, at) => at + 1).filter(
    (place) => row.has(`product.${place}`) || row.has(`ml.${place}`),
  );
}

/** The columns of single products that this file has. */
function productColumns({ row }: RowBody): { code: string; fills: string }[] {
  return row.fillsLike(/^product\.([A-Z0-9]{2,12})\.ml$/).map(([fills, code]) => ({ code, fills }));
}

function byNumber(draft: RowBody, stored: readonly Line[], places: readonly number[]): DraftLine[] {
  const { row } = draft;
  const said = places.flatMap((place): DraftLine[] => {
    const [codeFills, mlFills] = [`product.${place}`, `ml.${place}`];
    if (row.isEmpty(codeFills) && (row.number(mlFills) ?? 0) === 0) return [];
    const product = row.text(codeFills)?.toUpperCase();
    const ml = row.number(mlFills);
    return [
      {
        line: { ...(product !== undefined && { product }), ...(ml !== undefined && { ml }) },
        codeFills,
        mlFills,
      },
    ];
  });
  const own = stored.filter(({ product }) => !row.has(`product.${product}.ml`));
  if (own.length > places.length) {
    draft.problems.push({
      fills: null,
      message: `the stored job has ${own.length} lines of product, the file has columns for ${places.length}; add columns or leave those of products out`,
    });
  }
  return [...stored.filter((line) => !own.includes(line)).map((line) => ({ line })), ...said];
}
