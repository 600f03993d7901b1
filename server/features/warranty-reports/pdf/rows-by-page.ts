import type { Paper } from './paper';

/** Rows of a picture in parts that fit on a page each, under a head of their own: a picture may not lie across two pages. */
export function rowsByPage<Row>(
  paper: Paper,
  rows: readonly Row[],
  rowHeight: number,
  draw: (rows: readonly Row[]) => void,
): void {
  let from = 0;
  while (from < rows.length) {
    const fit = Math.floor((paper.bottom - paper.y) / rowHeight) - HEAD_ROWS;
    if (fit < 1) {
      paper.turn();
      continue;
    }
    draw(rows.slice(from, from + fit));
    from += fit;
    if (from < rows.length) paper.turn();
  }
}

/** The head and what may follow the last row. */
const HEAD_ROWS = 2;
