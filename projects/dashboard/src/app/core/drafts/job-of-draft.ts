import type { FieldProblem } from '#shared/contracts/fields';
import { jobContent, type JobContent } from '#shared/contracts/jobs';
import { joined, problemsOf } from '#shared/contracts/read-problems';
import type { JobDraft } from '#shared/contracts/under-way';
import { withTimersStopped } from './timers';

/** The job that a draft amounts to, or all that is still missing in it, by JSON pointer into the draft. */
export type JobOfDraft =
  { readonly job: JobContent } | { readonly missing: readonly FieldProblem[] };

/**
 * Makes a job of a draft as it would be sent at `now`: running timers go into the minutes, what was opened and left empty is
 * left out. The rules that need the network's catalogue or the branch's day are the server's.
 */
export function jobOfDraft(draft: JobDraft, now: Date): JobOfDraft {
  const stopped = withTimersStopped(draft, now);
  const sent = {
    ...stopped,
    estimate: estimateOf(stopped.estimate),
    actual: stopped.actual ?? { stages: {} },
    agreedExtras: filled(stopped.agreedExtras),
    products: filled(stopped.products),
    consumables: filled(stopped.consumables),
    findings: filled(stopped.findings),
    checks: kept(stopped.checks),
    workshop: kept(stopped.workshop),
    invoice: kept(stopped.invoice),
    notes: stopped.notes?.trim() ? stopped.notes : undefined,
    vehicle: kept({ ...stopped.vehicle, key: stopped.vehicle?.key?.trim() || undefined }) ?? {},
  };
  const parsed = jobContent.safeParse(withoutUndefined(sent));
  const unworked = (stopped.findings ?? []).flatMap(({ action, workedAs }, index) =>
    (action === 'patched' || action === 'treated') && workedAs === undefined
      ? [
          {
            path: `/findings/${index}/workedAs`,
            message: `is needed when the finding was ${action}`,
          },
        ]
      : [],
  );
  if (parsed.success && unworked.length === 0) return { job: parsed.data };
  return { missing: joined(parsed.success ? [] : problemsOf(parsed.error), unworked) };
}

/** An estimate that was opened and left empty is none; minutes without a price still lack their price. */
function estimateOf(estimate: JobDraft['estimate']): object | undefined {
  const stages = kept(estimate?.stages);
  if (estimate?.priceCents === undefined && !stages) return undefined;
  return { ...estimate, stages: stages ?? {} };
}

function filled<Item>(list: readonly Item[] | undefined): readonly Item[] | undefined {
  return list && list.length > 0 ? list : undefined;
}

/** The group with what was filled in, or `undefined` when that is nothing. */
function kept<Group extends object>(group: Group | undefined): Partial<Group> | undefined {
  const entries = Object.entries(group ?? {}).filter(
    ([, value]) => value !== undefined && value !== '',
  );
  return entries.length > 0 ? (Object.fromEntries(entries) as Partial<Group>) : undefined;
}

/** As JSON carries it, so that what is checked is what is sent. */
function withoutUndefined(value: unknown): unknown {
  return JSON.parse(JSON.stringify(value));
}
