import type { ImportField } from '#shared/domain/import-field';
import { readCell, type Cell, type CellReading } from './read-cell';

/** A column that fills something. */
export interface FilledColumn {
  index: number;
  heading: string;
  field: ImportField;
}

/** What is wrong with a row, at what a column fills; `null`: at no one column. */
export interface RowProblem {
  fills: string | null;
  message: string;
}

/** The cells of a row as read, by what they fill. */
export class ReadRow {
  private readonly cells = new Map<string, Cell>();

  constructor(sent: readonly string[], columns: readonly FilledColumn[], reading: CellReading) {
    for (const { index, field } of columns) {
      this.cells.set(field.fills, readCell(sent[index] ?? '', field, reading));
    }
  }

  /** Whether the file has a column for it. */
  has(fills: string): boolean {
    return this.cells.has(fills);
  }

  /** Everything of a pattern that the file has a column for, with what the pattern's bracket matched. */
  fillsLike(pattern: RegExp): [fills: string, part: string][] {
    return [...this.cells.keys()].flatMap((fills): [string, string][] => {
      const part = pattern.exec(fills)?.[1];
      return part === undefined ? [] : [[fills, part]];
    });
  }

  /** What its cell says; `undefined` where it is empty, unreadable or not there. */
  value(fills: string): string | number | boolean | undefined {
    const cell = this.cells.get(fills);
    return cell && 'value' in cell ? cell.value : undefined;
  }

  text(fills: string): string | undefined {
    const value = this.value(fills);
    return typeof value === 'string' ? value : undefined;
  }

  number(fills: string): number | undefined {
    const value = this.value(fills);
    return typeof value === 'number' ? value : undefined;
  }

  /** Whether its cell is empty, or there is none. */
  isEmpty(fills: string): boolean {
    return this.cells.get(fills) === undefined;
  }

  /** Every cell that could not be read. */
  get problems(): RowProblem[] {
    return [...this.cells].flatMap(([fills, cell]) =>
      cell && 'problem' in cell ? [{ fills, message: cell.problem }] : [],
    );
  }
}
