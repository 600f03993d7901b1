import { createHash } from 'node:crypto';
import { rmSync } from 'node:fs';
import { judgeClaim } from '#db/accept-claim';
import { judgeJob, type Sending } from '#db/accept-job';
import { MOST_ROWS, type PreviewRow } from '#shared/contracts/imports';
import { FileProblem } from './file-problem';
import { readRows, type FileRow } from './read-rows';
import { ReadRow } from './read-row';
import { keepRefused, type RefusedRow } from './refused-rows';
import type { FileQuestion, RowWorld } from './row-world';
import { takeRow, type RowTaker } from './take-row';
import { refField, tellOfReference, type ToldProblem } from './tell-problems';

/** How far a check has got; the last one has the previews. */
export interface CheckStep {
  done: number;
  of: number | null;
  counts: Counts;
  previews?: { preview: PreviewRow[]; refusedPreview: PreviewRow[] };
  /** Why the file cannot be read as a whole. */
  problem?: string;
}

export type Counts = Record<'rows' | 'new' | 'changed' | 'unchanged' | 'refused', number>;
type Status = PreviewRow['status'];

/** Rows shown at the beginning, and refused ones wherever they stand. */
const PREVIEWED = 20;
const REFUSED_PREVIEWED = 50;
const LONGEST_CELL = 100;
const STEP = 500;

/** Nobody has seen the stored job when a file is sent. */
export const UNCONDITIONAL: Sending['preconditions'] = {
  ifMatch: undefined,
  ifNoneMatch: undefined,
  lastChange: () => undefined,
};

/** What is stored of a branch, as a check reads it. */
export type StoredRows = Pick<RowTaker<Status>, 'jobs' | 'claims'>;

/**
 * Reads a file and says of every row what confirming would do; refused rows are kept beside it. Reads it twice: what stands
 * in it several times has to be known at its first row.
 */
export async function* checkFile(
  question: FileQuestion,
  refusedPath: string,
  world: RowWorld,
  stored: StoredRows,
): AsyncGenerator<CheckStep> {
  const counts: Counts = { rows: 0, new: 0, changed: 0, unchanged: 0, refused: 0 };
  try {
    const repeats = new RepeatedRows(world);
    for await (const row of rowsBelow(question)) {
      repeats.add(row);
      if (repeats.rows % 20_000 === 0) yield { done: 0, of: null, counts };
    }
    if (repeats.rows === 0) throw new FileProblem('The file has headings and no row below them.');
    const of = repeats.rows;
    const judge = judgeOf(world, stored);
    const previews = { preview: [] as PreviewRow[], refusedPreview: [] as PreviewRow[] };
    rmSync(refusedPath, { force: true });
    let refused: RefusedRow[] = [];
    for await (const row of rowsBelow(question)) {
      const told = judged(row, world, repeats, judge);
      counts.rows += 1;
      counts[told.status] += 1;
      if (previews.preview.length < PREVIEWED) previews.preview.push(told);
      if (told.status === 'refused') {
        refused.push({ ...row, problems: told.problems });
        if (previews.refusedPreview.length < REFUSED_PREVIEWED) previews.refusedPreview.push(told);
      }
      if (counts.rows % STEP !== 0) continue;
      keepRefused(refusedPath, refused);
      refused = [];
      yield { done: counts.rows, of, counts };
    }
    keepRefused(refusedPath, refused);
    yield { done: counts.rows, of, counts, previews };
  } catch (error) {
    if (!(error instanceof FileProblem)) throw error;
    yield { done: counts.rows, of: null, counts, problem: error.message };
  }
}

/** The rows below the headings. */
export async function* rowsBelow({ path, options }: FileQuestion): AsyncGenerator<FileRow> {
  let at = -1;
  for await (const row of readRows(path, options)) {
    at += 1;
    if (at === 0) continue;
    if (at > MOST_ROWS) {
      throw new FileProblem(
        `The file has more than ${MOST_ROWS.toLocaleString('en')} rows; split it and send the parts.`,
      );
    }
    yield row;
  }
}

function judgeOf(world: RowWorld, stored: StoredRows): RowTaker<Status> {
  const told = { created: 'new', replaced: 'changed', unchanged: 'unchanged' } as const;
  const sending = { money: 'seen', preconditions: UNCONDITIONAL } as const;
  return {
    ...stored,
    takeJob: (ref, content) => told[judgeJob(stored.jobs, ref, content, sending).status],
    takeClaim: (ref, content) => told[judgeClaim(stored.claims, ref, content, world.sender).status],
  };
}

function judged(
  { line, cells }: FileRow,
  world: RowWorld,
  repeats: RepeatedRows,
  judge: RowTaker<Status>,
): PreviewRow {
  const values = cells.map((cell) => cell.slice(0, LONGEST_CELL));
  const row = takeRow(cells, world, judge);
  const problems: ToldProblem[] = 'problems' in row ? [...row.problems] : [];
  const repeat = row.ref === null ? undefined : repeats.of(row.ref);
  if (repeat?.differing) problems.push(tellOfReference(repeats.tell(repeat.lines), world));
  const status: Status =
    problems.length > 0 || !('taken' in row)
      ? 'refused'
      : repeat && repeat.lines[0] !== line
        ? 'unchanged'
        : row.taken;
  return { line, ref: row.ref, status, values, problems };
}

/** A file says one thing of a job or claim: rows of one reference that say the same are one, rows that differ are refused. */
class RepeatedRows {
  rows = 0;
  private readonly first = new Map<string, { line: number; says: string }>();
  private readonly repeated = new Map<string, { lines: number[]; differing: boolean }>();

  constructor(private readonly world: RowWorld) {}

  add({ line, cells }: FileRow): void {
    this.rows += 1;
    const { columns, reading } = this.world;
    const own = columns.filter(({ field }) => field.field === refField(this.world));
    const ref = new ReadRow(cells, own, reading).text(refField(this.world))?.normalize('NFC');
    if (ref === undefined) return;
    const said = JSON.stringify(columns.map(({ index }) => cells[index] ?? ''));
    const says = createHash('sha256').update(said).digest('base64').slice(0, 22);
    const first = this.first.get(ref);
    if (!first) {
      this.first.set(ref, { line, says });
      return;
    }
    const repeat = this.repeated.get(ref) ?? { lines: [first.line], differing: false };
    repeat.lines.push(line);
    repeat.differing ||= says !== first.says;
    this.repeated.set(ref, repeat);
  }

  of(ref: string): { lines: readonly number[]; differing: boolean } | undefined {
    return this.repeated.get(ref);
  }

  tell(lines: readonly number[]): string {
    const few = lines.slice(0, 5).join(', ');
    const more = lines.length > 5 ? ` and ${lines.length - 5} more` : '';
    return `stands in lines ${few}${more} with different content; leave one of them`;
  }
}
