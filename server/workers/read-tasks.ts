import type { JobFilters } from '#db/queries/job-filters';
import type { PackedScope } from '#db/scope';
import type { Period } from '#shared/domain/period';
import type { OverrunGrouping } from '#shared/contracts/overrun';
import type { OverrunAnswer } from '#shared/contracts/overrun';
import type { MarginAnswer } from '#shared/contracts/margin';
import type { JobListQuestion, JobPage } from '../features/job-list/list-jobs';

/** What a worker can be asked, and what it answers. The scope goes along packed; everything else is plain data. */
export interface ReadTasks {
  margin: {
    input: MarginQuestion;
    output: MarginAnswer;
  };
  overrun: {
    input: { period: Period; filters: JobFilters; by: OverrunGrouping };
    output: OverrunAnswer;
  };
  jobs: { input: JobListQuestion; output: JobPage };
}

/** Exports by name, with the question each answers. */
export interface ExportTasks {
  margin: ReadTasks['margin']['input'];
  overrun: ReadTasks['overrun']['input'];
  jobs: Omit<JobListQuestion, 'after' | 'limit'>;
}

export type ReadName = keyof ReadTasks;
export type ExportName = keyof ExportTasks;

/** What crosses into the worker. */
export interface PackedRead {
  kind: 'answer';
  name: ReadName;
  scope: PackedScope;
  input: unknown;
}

export interface PackedExport {
  kind: 'export';
  name: ExportName;
  scope: PackedScope;
  input: unknown;
  port: MessagePort;
}
