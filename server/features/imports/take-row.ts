import type { ClaimRecord } from '#db/accept-claim';
import type { JobRecord } from '#db/accept-job';
import { breaksAgainstJob } from '#db/breaks-against-job';
import { breaksOfClaims } from '#db/breaks-of-claims';
import { readClaim } from '#shared/contracts/check-claim';
import { readJob } from '#shared/contracts/check-job';
import type { ClaimContent } from '#shared/contracts/claims';
import { reference, type FieldProblem } from '#shared/contracts/fields';
import type { JobContent } from '#shared/contracts/jobs';
import { problemsOf } from '#shared/contracts/read-problems';
import { Refusal } from '#shared/domain/refusal';
import { bodyOfClaim } from './body-of-claim';
import { bodyOfJob } from './body-of-job';
import { ReadRow } from './read-row';
import type { RowBody } from './row-body';
import type { RowWorld } from './row-world';
import { refField, tellProblems, type ToldProblem } from './tell-problems';

/** What is stored of a branch, and what is to be done with a row that has passed: judged for a preview, or written. */
export interface RowTaker<T> {
  jobs: JobRecord;
  claims: ClaimRecord;
  takeJob: (jobRef: string, content: JobContent) => T;
  takeClaim: (claimRef: string, content: ClaimContent) => T;
}

export type TakenRow<T> =
  { ref: string; taken: T } | { ref: string | null; problems: readonly ToldProblem[] };

/** Reads a row, holds it to the rules that the API holds jobs and claims to, and takes it; everything wrong is told at once. */
export function takeRow<T>(
  cells: readonly string[],
  world: RowWorld,
  taker: RowTaker<T>,
): TakenRow<T> {
  const row = new ReadRow(cells, world.columns, world.reading);
  const ragged = raggedness(cells, world);
  const field = refField(world);
  const ref = reference.safeParse(row.text(field));
  if (!ref.success) {
    const problems = problemsOf(ref.error, `/${field}`);
    return refused(row.text(field) ?? null, row, undefined, [...ragged, ...problems], world);
  }
  const read =
    world.kind === 'jobs'
      ? readJobRow(row, ref.data, world, taker)
      : readClaimRow(row, ref.data, world, taker);
  const unread = row.problems.length > 0 || read.draft.problems.length > 0 || ragged.length > 0;
  if (unread || 'problems' in read) {
    const problems = 'problems' in read ? read.problems : [];
    return refused(ref.data, row, read.draft, [...ragged, ...problems], world);
  }
  try {
    return { ref: ref.data, taken: read.take() };
  } catch (error) {
    // Refused before anything of the row is written, so the other rows of the commit are untouched.
    if (error instanceof Refusal && error.kind === 'bad-input') {
      return refused(ref.data, row, read.draft, error.problems, world);
    }
    throw error;
  }
}

type Read<T> = { draft: RowBody } & ({ problems: readonly FieldProblem[] } | { take: () => T });

function readJobRow<T>(row: ReadRow, ref: string, world: RowWorld, taker: RowTaker<T>): Read<T> {
  const draft = bodyOfJob(row, taker.jobs.findJob(ref)?.content);
  const read = readJob(draft.body, world.job);
  if ('content' in read) return { draft, take: () => taker.takeJob(ref, read.content) };
  const late = breaksOfClaims(taker.jobs, ref, draft.body);
  return { draft, problems: [...read.problems, ...late] };
}

function readClaimRow<T>(row: ReadRow, ref: string, world: RowWorld, taker: RowTaker<T>): Read<T> {
  const draft = bodyOfClaim(row, taker.claims.findClaim(ref)?.content);
  const read = readClaim(draft.body, world.job.today);
  if ('content' in read) return { draft, take: () => taker.takeClaim(ref, read.content) };
  const against = breaksAgainstJob(taker.claims, draft.body);
  return { draft, problems: [...read.problems, ...against] };
}

/** A row with more cells than there are headings: what stands where cannot be known. */
function raggedness(cells: readonly string[], { width }: RowWorld): FieldProblem[] {
  if (!cells.slice(width).some((cell) => cell.trim() !== '')) return [];
  const message = `the row has ${cells.length} cells, the file ${width} headings: put text that holds the delimiter in quotes`;
  return [{ path: '', message }];
}

function refused(
  ref: string | null,
  row: ReadRow,
  draft: RowBody | undefined,
  problems: readonly FieldProblem[],
  world: RowWorld,
): { ref: string | null; problems: ToldProblem[] } {
  return { ref, problems: tellProblems(row, draft, problems, world) };
}
