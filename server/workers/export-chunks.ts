import type { ScopedDb } from '#db/scoped-db';
import { JOB_COLUMNS, MARGIN_COLUMNS, OVERRUN_COLUMNS } from '../features/exports/columns';
import { csvHeader, csvRows } from '../features/exports/csv-text';
import { everyJob, type JobsAsked } from '../features/job-list/list-jobs';
import { answerMargin, type MarginQuestion } from '../features/margin/answer-margin';
import { answerOverrun, type OverrunQuestion } from '../features/overrun/answer-overrun';
import type { ExportName } from './read-tasks';

/** The text of an export in pieces: the header first, then rows as the same code that answers the screen gives them. */
export function* csvChunks(db: ScopedDb, name: ExportName, input: unknown): Generator<string> {
  switch (name) {
    case 'margin': {
      const { weeks } = answerMargin(db, input as MarginQuestion);
      yield csvHeader(MARGIN_COLUMNS) + csvRows(MARGIN_COLUMNS, weeks);
      return;
    }
    case 'overrun': {
      const { groups } = answerOverrun(db, input as OverrunQuestion);
      yield csvHeader(OVERRUN_COLUMNS) + csvRows(OVERRUN_COLUMNS, groups);
      return;
    }
    case 'jobs': {
      yield csvHeader(JOB_COLUMNS);
      for (const page of everyJob(db, input as JobsAsked)) yield csvRows(JOB_COLUMNS, page);
    }
  }
}
