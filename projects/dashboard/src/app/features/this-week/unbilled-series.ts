import type { OutOf } from '#shared/contracts/endpoint';
import type { JobRow, listJobs } from '#shared/contracts/job-list';
import { formatCount, formatDays, formatMinutes, formatMoney } from '../../ui/format';
import type { WeekWords } from './week-words';

/** The quiet line under an unbilled car: its branch where there are several, agreed extras, and work beyond what was charged. */
export function beyondWords(row: JobRow, words: WeekWords, severalBranches: boolean): string {
  const parts: string[] = [];
  if (severalBranches) parts.push(words.branchName(row.branch));
  const extras = row.agreedExtraCents ?? 0;
  if (extras > 0 || row.agreedExtraMinutes > 0) {
    const minutes =
      row.agreedExtraMinutes > 0 ? ` for ${formatMinutes(row.agreedExtraMinutes)}` : '';
    parts.push(`agreed extras ${formatMoney(extras, words.currency)}${minutes}`);
  }
  if ((row.beyondChargedMinutes ?? 0) > 0) {
    parts.push(`${formatMinutes(row.beyondChargedMinutes!)} beyond what was charged`);
  }
  return parts.join(' · ');
}

/** What the unbilled cars have cost: the sum, and the sentence around it. */
export function spentParts(
  list: OutOf<typeof listJobs>,
  currency: string,
): { readonly sum: string; readonly words: string } {
  const spent = list.items.reduce((sum, { costCents }) => sum + (costCents ?? 0), 0);
  const oldest = Math.max(0, ...list.items.map(({ daysWaiting }) => daysWaiting ?? 0));
  const whole = list.nextCursor === null;
  const missing = list.items.filter(({ costCents }) => (costCents ?? null) === null).length;
  const said = [
    whole
      ? 'spent and outside every margin here until billed.'
      : `spent on the ${formatCount(list.items.length)} that have waited longest, outside every margin until billed.`,
    list.items.length === 1
      ? `It has waited ${formatDays(oldest)}.`
      : `The oldest has waited ${formatDays(oldest)}.`,
  ];
  if (missing > 0) {
    said.push(
      missing === 1
        ? 'The cost of one is not known.'
        : `The cost of ${formatCount(missing)} is not known.`,
    );
  }
  return { sum: formatMoney(spent, currency), words: said.join(' ') };
}
