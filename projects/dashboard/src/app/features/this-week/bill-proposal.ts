import type { JobSheet } from '#shared/contracts/jobs';
import { formatExactMoney, formatMinutes } from '../../ui/format';

/** What a bill would be by what was quoted and agreed. */
export interface BillProposal {
  /** Null when there is no quoted price to start from. */
  readonly totalCents: number | null;
  /** How it comes about, and what it does not cover. */
  readonly words: string;
}

/** Proposes the bill of a finished car: quoted price plus agreed extras. */
export function proposeBill(
  job: Pick<JobSheet, 'estimate' | 'agreedExtras'>,
  beyondChargedMinutes: number | null,
  currency: string,
): BillProposal {
  const extras = (job.agreedExtras ?? []).reduce(
    (sum, { priceCents }) => sum + (priceCents ?? 0),
    0,
  );
  const quoted = job.estimate?.priceCents ?? null;
  const beyond = beyondChargedMinutes ?? 0;
  const said: string[] = [];
  if (quoted === null) {
    said.push('No price was quoted.');
    if (extras > 0) said.push(`Agreed extras: ${formatExactMoney(extras, currency)}.`);
  } else {
    const quotedWords = `Quoted ${formatExactMoney(quoted, currency)}`;
    said.push(
      extras > 0
        ? `${quotedWords} and agreed extras ${formatExactMoney(extras, currency)}.`
        : `${quotedWords}.`,
    );
  }
  if (beyond > 0) said.push(`${formatMinutes(beyond)} were worked beyond what was charged.`);
  return { totalCents: quoted === null ? null : quoted + extras, words: said.join(' ') };
}
