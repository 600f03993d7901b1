import { JOB_COLUMNS, MARGIN_COLUMNS, OVERRUN_COLUMNS } from '../features/exports/columns';
import { csvHeader, csvRows } from '../features/exports/csv-text';
import { tellJob } from '../features/job-list/tell-job';
import { answerMargin } from '../features/margin/answer-margin';
import { answerOverrun } from '../features/overrun/answer-overrun';
import { iterateJobRows } from '#db/queries/job-list';
import type { ScopedDb } from '#db/scoped-db';
import type { JobRow } from '#shared/contracts/jobs';
import type { ExportTasks, PackedExport } from './read-tasks';

/** Jobs of one chunk. */
const CHUNK = 500;

/** The text of an export in pieces: the header first, then rows as the same code that answers the screen gives them. */
export function* csvChunks(
  db: ScopedDb,
  task: Pick<PackedExport, 'name' | 'input'>,
): Generator<string> {
  switch (task.name) {
    case 'margin': {
      yield csvHeader(MARGIN_COLUMNS);
      const answer = answerMargin(db, task.input as ExportTasks['margin']);
      yield csvRows(MARGIN_COLUMNS, answer.weeks);
      return;
    }
    case 'overrun': {
      yield csvHeader(OVERRUN_COLUMNS);
      const answer = answerOverrun(db, task.input as ExportTasks['overrun']);
      yield csvRows(OVERRUN_COLUMNS, answer.groups);
      return;
    }
    case 'jobs': {
      yield csvHeader(JOB_COLUMNS);
      yield* jobChunks(db, task.input as ExportTasks['jobs']);
    }
  }
}

function* jobChunks(db: ScopedDb, question: ExportTasks['jobs']): Generator<string> {
  let rows: JobRow[] = [];
  for (const row of iterateJobRows(db, question.filters, question.sort)) {
    rows.push(tellJob(row, question.todayByBranch[row.branch] ?? row.completed_on, question.money));
    if (rows.length < CHUNK) continue;
    yield csvRows(JOB_COLUMNS, rows);
    rows = [];
  }
  if (rows.length > 0) yield csvRows(JOB_COLUMNS, rows);
}
