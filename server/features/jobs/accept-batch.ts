import type * as z from 'zod';
import { BranchWriter } from '#db/branch-writer';
import type { ScopedBranch } from '#db/scope';
import type { Store } from '#db/store';
import { reference, type FieldProblem } from '#shared/contracts/fields';
import type { JobContent, putJobBatch } from '#shared/contracts/jobs';
import { joined, problemsOf } from '#shared/contracts/read-problems';
import type { JobWorld } from '#shared/domain/job-rules';
import { Refusal } from '#shared/domain/refusal';
import { acceptJob, type Sending } from '#db/accept-job';
import { breaksOfClaims } from '#db/breaks-of-claims';
import { readJob } from '#shared/contracts/check-job';

type BatchAnswer = z.input<typeof putJobBatch.out>;
type Result = BatchAnswer['results'][number];

/** Jobs that one commit takes: other requests wait for it some tens of milliseconds, and the disk is asked only once. */
const SLICE = 500;

/**
 * Takes a batch in the order sent: every good job is durable before this settles, every bad one is named with all its problems.
 */
export async function acceptBatch(
  store: Store,
  branch: ScopedBranch,
  items: readonly unknown[],
  world: JobWorld,
  sending: Sending,
): Promise<BatchAnswer> {
  const results: Result[] = [];
  for (let start = 0; start < items.length; start += SLICE) {
    const read = items.slice(start, start + SLICE).map((item) => readItem(item, world));
    const slice = await store.queue.write(() => {
      const writer = new BranchWriter(store, branch);
      return read.map((item) => acceptItem(writer, item, sending));
    }, sending.actor.personId);
    results.push(...slice);
  }
  const counts = { created: 0, replaced: 0, unchanged: 0, rejected: 0 };
  for (const result of results) counts[result.status] += 1;
  return { counts, results };
}

type ReadItem =
  | { jobRef: string; content: JobContent }
  | { jobRef: string | null; problems: readonly FieldProblem[]; raw: unknown };

function readItem(item: unknown, world: JobWorld): ReadItem {
  if (typeof item !== 'object' || item === null || Array.isArray(item)) {
    return { jobRef: null, problems: [{ path: '', message: 'must be an object' }], raw: item };
  }
  const { jobRef, ...content } = item as Record<string, unknown>;
  const ref = reference.safeParse(jobRef);
  const job = readJob(content, world);
  if (ref.success && 'content' in job) return { jobRef: ref.data, content: job.content };
  return {
    jobRef: ref.data ?? (typeof jobRef === 'string' ? jobRef : null),
    raw: content,
    problems: joined(
      ref.success ? [] : problemsOf(ref.error, '/jobRef'),
      'problems' in job ? job.problems : [],
    ),
  };
}

function acceptItem(writer: BranchWriter, item: ReadItem, sending: Sending): Result {
  if ('problems' in item) {
    const { jobRef, problems, raw } = item;
    const late = jobRef === null ? [] : breaksOfClaims(writer, jobRef, raw);
    return rejected(jobRef, joined(problems, late));
  }
  try {
    return acceptJob(writer, item.jobRef, item.content, sending);
  } catch (error) {
    // A refusal comes before anything of the job is written, so the other jobs of the commit are untouched.
    if (error instanceof Refusal && error.kind === 'bad-input') {
      return rejected(item.jobRef, error.problems);
    }
    throw error;
  }
}

function rejected(jobRef: string | null, problems: readonly FieldProblem[]): Result {
  return { jobRef, status: 'rejected', problems: [...problems] };
}
