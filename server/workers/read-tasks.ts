import type { MessagePort } from 'node:worker_threads';
import type { PackedScope } from '#db/scope';
import type { MarginAnswer } from '#shared/contracts/margin';
import type { OverrunAnswer } from '#shared/contracts/overrun';
import type { JobListQuestion, JobPage, JobsAsked } from '../features/job-list/list-jobs';
import type { MarginQuestion } from '../features/margin/answer-margin';
import type { OverrunQuestion } from '../features/overrun/answer-overrun';

/** What a worker can be asked, and what it answers. The scope goes along packed; everything else is plain data. */
export interface ReadTasks {
  margin: { input: MarginQuestion; output: MarginAnswer };
  overrun: { input: OverrunQuestion; output: OverrunAnswer };
  jobs: { input: JobListQuestion; output: JobPage };
}

/** Exports by name, with the question each answers. */
export interface ExportTasks {
  margin: MarginQuestion;
  overrun: OverrunQuestion;
  jobs: JobsAsked;
}

export type ReadName = keyof ReadTasks;
export type ExportName = keyof ExportTasks;

/** A question as it crosses into the worker. */
export interface PackedRead {
  kind: 'answer';
  name: ReadName;
  scope: PackedScope;
  input: unknown;
}

/** An export as it crosses; its chunks come back through the port, one for each message sent into it, then null. */
export interface PackedExport {
  kind: 'export';
  name: ExportName;
  scope: PackedScope;
  input: unknown;
  port: MessagePort;
}
