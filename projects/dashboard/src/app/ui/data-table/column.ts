import type { Params } from '@angular/router';

/** Where a cell leads. */
export interface CellLink {
  readonly commands: readonly unknown[];
  readonly query?: Params;
}

/** One column of a table: what it says of a row. */
export interface Column<Row> {
  /** Unique in its table; also the name under which a template for its cells is looked up. */
  readonly key: string;
  readonly label: string;
  /** Numbers stand right in tabular figures, words left. Words by default. */
  readonly kind?: 'words' | 'number';
  readonly text: (row: Row) => string;
  /** Quiet words after the text. */
  readonly quiet?: (row: Row) => string | undefined;
  /** What the column is sorted by; left out: it is not sortable. `null` stands last either way. */
  readonly sortBy?: (row: Row) => number | string | null;
  /** Which way the first press sorts; numbers largest first unless said. */
  readonly firstSort?: 'asc' | 'desc';
  readonly link?: (row: Row) => CellLink | undefined;
  readonly strong?: boolean | ((row: Row) => boolean);
  /** The whole cell in quiet ink. */
  readonly muted?: (row: Row) => boolean;
  /** A signed number drawn as a small bar after the text; all bars of the column share one scale. Say the number in words too. */
  readonly bar?: (row: Row) => number | null;
  /** The column's cell in the total row. */
  readonly total?: string;
  /** Only heard, not seen, for example over bars. */
  readonly unseenLabel?: boolean;
  /** Seen in place of the label over a column of small pictures: what stands at the left and right end of their axis. */
  readonly ends?: readonly [string, string];
}
