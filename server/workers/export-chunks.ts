import { JOB_COLUMNS, MARGIN_COLUMNS, OVERRUN_COLUMNS } from '../features/exports/columns';
import { csvHeader, csvRows } from '../features/exports/csv-text';
import { listJobs, type JobListQuestion } from '../features/job-list/list-jobs';
import { answerMargin } from '../features/margin/answer-margin';
import { answerOverrun } from '../features/overrun/answer-overrun';
import type { ScopedDb } from '#db/scoped-db';
import type { ExportTasks, PackedExport } from './read-tasks';

/** Jobs read for one chunk. */
const PAGE = 500;

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
      let question = { ...(task.input as JobListQuestion), limit: PAGE };
      for (;;) {
        const page = listJobs(db, question);
        if (page.items.length > 0) yield csvRows(JOB_COLUMNS, page.items);
        if (page.next === null) return;
        question = { ...question, after: page.next };
      }
    }
  }
}
