import { jobContent, type JobContent, type JobSheet } from '#shared/contracts/jobs';
import { normaliseJob } from '#shared/domain/normalise-job';
import type { RecordedJob } from '#shared/domain/recorded-job';

/**
 * Whether the job that the server holds is the one that was sent: then an answer was lost on the way, and nobody else was
 * first. Compared as the server keeps it; an invoice that was not sent leaves the stored one, and amounts that the sender may
 * not see are left aside.
 */
export function isSameJob(sent: JobContent, held: JobSheet): boolean {
  const read = jobContent.safeParse(contentOf(held));
  if (!read.success) return false;
  const money = 'money' in held ? 'seen' : 'unseen';
  const invoice = sent.invoice === undefined ? read.data.invoice : sent.invoice;
  return textOf({ ...sent, invoice }, money) === textOf(read.data, money);
}

/** The part of a job's sheet that was sent. */
function contentOf(sheet: JobSheet): object {
  const names = Object.keys(jobContent.shape) as (keyof JobContent)[];
  return Object.fromEntries(names.map((name) => [name, sheet[name]]));
}

function textOf(job: JobContent, money: 'seen' | 'unseen'): string {
  const { invoice, agreedExtras, ...rest } = job;
  const normal = normaliseJob({
    ...rest,
    agreedExtras:
      money === 'seen' ? agreedExtras : agreedExtras?.map(({ priceCents: _, ...extra }) => extra),
    invoice: (invoice ?? undefined) as RecordedJob['invoice'],
  });
  return JSON.stringify(normal, (key, value: unknown) =>
    money === 'unseen' && UNSEEN.has(key) ? undefined : value,
  );
}

/** Amounts that a recorder sends but does not read back: all but the price quoted, which they do. */
const UNSEEN: ReadonlySet<string> = new Set([
  'totalCents',
  'unitCostCents',
  'chargedCents',
  'boughtInCents',
]);
