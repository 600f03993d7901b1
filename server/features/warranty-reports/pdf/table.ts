import { COLOURS } from './colours';
import { quietly } from './headings';
import type { Lettering, Paper } from './paper';
import { shortened } from './shortened';

/** A column of a table: words stand left, numbers right. */
export interface Column<Row> {
  head: string;
  /** Share of the table's width that it takes, against those of the others. */
  wide: number;
  align?: 'left' | 'right';
  cell: (row: Row) => string;
}

/** How a table is set. */
export interface Setting<Row> {
  /** Rows that stand out: a total under a line of its own, or one that is to be noticed. */
  standsOut?: (row: Row) => 'total' | 'noticed' | undefined;
  size?: number;
  /** Narrower than the page where a few columns would stand far apart. */
  width?: number;
}

const ROW = 1.65;

/** A table over as many pages as it takes, its head on each. */
export function table<Row>(
  paper: Paper,
  columns: readonly Column<Row>[],
  rows: readonly Row[],
  { standsOut = () => undefined, size = 8.5, width = paper.width }: Setting<Row> = {},
): void {
  if (rows.length === 0) {
    quietly(paper, 'None.');
    return;
  }
  const places = placesOf(paper, columns, width);
  const height = size * ROW;
  const element = paper.part('Table');
  const line = (type: 'TH' | 'TD', texts: readonly string[], lettering: Lettering): void => {
    const row = paper.part('TR', element);
    texts.forEach((text, index) => {
      const place = places[index];
      if (!place) return;
      const fits = shortened(paper, text, place.to - place.from, lettering);
      const x = place.align === 'left' ? place.from : place.to;
      const draw = (): void =>
        paper.text(fits, x, paper.y + height * 0.68, { ...lettering, align: place.align });
      paper.tagged(type, draw, { parent: row });
    });
    row.end();
    paper.y += height;
  };
  const head = (): void => {
    line(
      'TH',
      columns.map((column) => column.head),
      { size, weight: 500, colour: COLOURS.quiet },
    );
    paper.artifact(() =>
      paper.rule(paper.left, paper.y, paper.left + width, paper.y, COLOURS.ink, 0.8),
    );
  };
  paper.room(height * Math.min(rows.length + 1, 4));
  head();
  for (const row of rows) {
    const stands = standsOut(row);
    if (paper.room(height)) head();
    const colour = stands === 'total' ? COLOURS.ink : COLOURS.hairline;
    paper.artifact(() => paper.rule(paper.left, paper.y, paper.left + width, paper.y, colour, 0.5));
    const texts = columns.map((column) => column.cell(row));
    line('TD', texts, { size, weight: stands ? 600 : 400 });
  }
  element.end();
  paper.y += 6;
}

interface Place {
  from: number;
  to: number;
  align: 'left' | 'right';
}

function placesOf<Row>(paper: Paper, columns: readonly Column<Row>[], width: number): Place[] {
  const whole = columns.reduce((sum, { wide }) => sum + wide, 0);
  let x = paper.left;
  return columns.map(({ wide, align = 'right' }, index) => {
    const from = x;
    x += (width * wide) / whole;
    return { from, to: index === columns.length - 1 ? x : x - 6, align };
  });
}
