/** A body that went out and whose answer did not come: the server may have it. */
export interface PerhapsThere {
  readonly branch: string;
  readonly jobRef: string;
  readonly body: string;
}

/** A job handed over to be sent, kept on the device as it will go out: the same bytes at every try. */
export interface QueuedJob {
  /** Id of its draft. */
  readonly draft: string;
  readonly personId: number;
  readonly branch: string;
  readonly jobRef: string;
  /** The job as JSON. */
  readonly body: string;
  /** ETag that it corrects; a new job is sent with If-None-Match. */
  readonly corrects: string | undefined;
  /** ISO instant; the queue's order. */
  readonly queuedAt: string;
  readonly perhapsThere: readonly PerhapsThere[];
}

/** The queue entry with what is about to go out noted as perhaps there, each body once. */
export function noted(job: QueuedJob): QueuedJob {
  const { branch, jobRef, body } = job;
  const others = job.perhapsThere.filter(
    (one) => one.branch !== branch || one.jobRef !== jobRef || one.body !== body,
  );
  return { ...job, perhapsThere: [...others, { branch, jobRef, body }] };
}
