import {
  countJobs,
  iterateJobRows,
  listJobRows,
  type JobSort,
  type ListedJob,
  type ListFilters,
  type ListPlace,
} from '#db/queries/job-list';
import type { ScopedDb } from '#db/scoped-db';
import type { JobRow } from '#shared/contracts/job-list';
import { addDays } from '#shared/domain/calendar';
import { tellJob } from './tell-job';

/** Which jobs, in which order, for whose eyes. */
export interface JobsAsked {
  filters: ListFilters;
  sort: JobSort;
  /** Today by branch code, for the days a car has waited. */
  todayByBranch: Record<string, string>;
  money: 'seen' | 'unseen';
}

export interface JobListQuestion extends JobsAsked {
  after: ListPlace | null;
  limit: number;
}

export interface JobPage {
  items: JobRow[];
  next: ListPlace | null;
  /** All jobs that match. */
  jobs: number;
}

/** Jobs told at once in an export. */
const EXPORT_PIECE = 500;
/** How far back the newest jobs are looked for before the whole of history is sorted, in days. */
const NEAR_DAYS = [14, 98, 686];

/** One page of the jobs in scope. */
export function listJobs(db: ScopedDb, question: JobListQuestion): JobPage {
  return db.snapshot(() => {
    const { filters, limit } = question;
    // One more than asked for tells whether there is a next page.
    const rows = readRows(db, question, limit + 1);
    const shown = rows.slice(0, limit);
    const last = rows.length > limit ? shown.at(-1) : undefined;
    return {
      items: shown.map((row) => tell(row, question)),
      next: last
        ? {
            key: last.sortKey,
            completedOn: last.completed_on,
            branch: last.branch,
            jobRef: last.job_ref,
          }
        : null,
      jobs: countJobs(db, filters),
    };
  });
}

/** Every job in scope in its order, by pieces; the caller keeps the database from changing between them. */
export function* everyJob(db: ScopedDb, asked: JobsAsked): Generator<JobRow[]> {
  let piece: JobRow[] = [];
  for (const row of iterateJobRows(db, asked.filters, asked.sort)) {
    piece.push(tell(row, asked));
    if (piece.length === EXPORT_PIECE) {
      yield piece;
      piece = [];
    }
  }
  if (piece.length > 0) yield piece;
}

/** The rows of a page. The newest jobs are nearly always found in the last weeks, which spares sorting years of them. */
function readRows(db: ScopedDb, question: JobListQuestion, wanted: number): ListedJob[] {
  const { filters, sort, after } = question;
  const place = after ?? undefined;
  const newest = after?.completedOn ?? filters.to ?? latest(Object.values(question.todayByBranch));
  if (sort === 'completed' && newest !== undefined) {
    for (const days of NEAR_DAYS) {
      const from = addDays(newest, -days);
      if (filters.from !== undefined && from <= filters.from) break;
      const rows = listJobRows(db, { ...filters, from }, sort, place, wanted);
      if (rows.length >= wanted) return rows;
    }
  }
  return listJobRows(db, filters, sort, place, wanted);
}

function tell(row: ListedJob, { todayByBranch, money }: JobsAsked): JobRow {
  return tellJob(row, todayByBranch[row.branch] ?? row.completed_on, money);
}

function latest(dates: readonly string[]): string | undefined {
  return [...dates].sort().at(-1);
}
