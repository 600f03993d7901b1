import type { IssuedReport } from '#shared/contracts/warranty-reports';
import { aboutAmount } from '../../ui/about-amount';
import type { AnswerPart } from '../../ui/answer/answer';
import {
  formatCars,
  formatCounted,
  formatDate,
  formatInstantDay,
  formatMoney,
} from '../../ui/format';

/** Who issued a report. */
export function issuerWords(by: string): string {
  return by === 'schedule' ? 'the schedule' : by;
}

/** The figure of an issued report with its give or take: `€77,000, give or take €14,000`. */
export function figureOf(issued: IssuedReport, currency: string): string {
  const about = aboutAmount(issued.outstandingCents, issued.standardErrorCents);
  const figure = formatMoney(about.cents, currency);
  return about.reachCents === null
    ? figure
    : `${figure}, give or take ${formatMoney(about.reachCents, currency)}`;
}

/** What an issued report is and says, in words that hold before an auditor. */
export function issuedSentence(issued: IssuedReport, currency: string): readonly AnswerPart[] {
  const about = aboutAmount(issued.outstandingCents, issued.standardErrorCents);
  return [
    `Report ${issued.id} as issued on ${formatInstantDay(issued.issuedAt)}: as of ${formatDate(issued.asOf)}, the warranties sold will still cost about `,
    { figure: formatMoney(about.cents, currency) },
    about.reachCents === null ? ' ' : `, give or take ${formatMoney(about.reachCents, currency)} `,
    { quiet: `(${formatCars(issued.covered)})` },
    '.',
  ];
}

/** That it is unchanged, and how much arrived later for its period. */
export function unchangedSentence(laterCount: number): string {
  const later =
    laterCount === 0
      ? 'Nothing has arrived later for its period.'
      : `${formatCounted(laterCount, 'thing has', 'things have')} arrived later for its period, listed below and not in it.`;
  return `Nothing in it has changed since. ${later}`;
}
