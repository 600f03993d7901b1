import type { JobSheet } from '#shared/contracts/jobs';
import { STAGES } from '#shared/domain/vocabulary';
import type { JobDraft } from '#shared/contracts/under-way';

/** What a job as recorded is as a draft, to be corrected: what was sent of it, without what was worked out since. */
export function draftOfJob(job: JobSheet): JobDraft {
  const { vehicle, package: sold, bookedOn, startedOn, completedOn, estimate, agreedExtras } = job;
  const { actual, products, consumables, boughtInCents, findings, checks, workshop } = job;
  const { invoice, notes } = job;
  const draft = {
    ...{ vehicle, package: sold, bookedOn, startedOn, completedOn, estimate, agreedExtras },
    ...{ actual, products, consumables, boughtInCents, findings, checks, workshop },
    ...{ invoice: invoice ?? undefined, notes },
  };
  // What is absent in the answer stays absent in the draft, and what only stands for nothing is absent too (rule 25).
  return JSON.parse(JSON.stringify(draft, withoutDefaults)) as JobDraft;
}

const NOTHING_AT_ZERO = new Set<string>([
  ...STAGES,
  'repairMinutes',
  'chargedCents',
  'boughtInCents',
]);

function withoutDefaults(key: string, value: unknown): unknown {
  if (value === '' || (value === 0 && NOTHING_AT_ZERO.has(key))) return undefined;
  return Array.isArray(value) && value.length === 0 ? undefined : value;
}
