import type { IssuedReport } from '#shared/contracts/warranty-reports';
import { type RoundedAmount, roundedAmount } from '#shared/domain/give-or-take';
import type { AnswerPart } from '../../ui/answer/answer';
import {
  formatAmount,
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

/** The figure of an issued report with its give or take: `€77,000, give or take 14,000`. */
export function figureOf(issued: IssuedReport, currency: string): string {
  const { cents, giveOrTakeCents } = rounded(issued);
  return `${formatMoney(cents, currency)}${giveOrTakeClause(giveOrTakeCents)}`;
}

/** What an issued report is and says, in words that hold before an auditor. */
export function issuedSentence(issued: IssuedReport, currency: string): readonly AnswerPart[] {
  const { cents, giveOrTakeCents } = rounded(issued);
  return [
    `Report ${issued.id} as issued on ${formatInstantDay(issued.issuedAt)}: warranties sold by ${formatDate(issued.asOf)} will still cost about `,
    { figure: formatMoney(cents, currency) },
    `${giveOrTakeClause(giveOrTakeCents)} `,
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

function rounded({ outstandingCents, standardErrorCents }: IssuedReport): RoundedAmount {
  return roundedAmount(outstandingCents, standardErrorCents);
}

function giveOrTakeClause(cents: number | null): string {
  return cents === null ? '' : `, give or take ${formatAmount(cents)}`;
}
