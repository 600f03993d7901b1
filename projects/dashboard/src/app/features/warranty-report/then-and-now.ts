import type { OutOf } from '#shared/contracts/endpoint';
import type { getIssuedReport } from '#shared/contracts/warranty-reports';
import { giveOrTake } from '#shared/domain/give-or-take';
import { formatAmount, formatCount, formatSignedAmount } from '../../ui/format';
import { NO_FIGURE } from './report-words';
import { number, type PaperRows, words } from './paper/paper-rows';

type Told = OutOf<typeof getIssuedReport>;

/** What an issued report says and what the same day would say now, side by side, with the difference. */
export function thenAndNow({ issued, now }: Pick<Told, 'issued' | 'now'>, sign: string): PaperRows {
  return {
    columns: [words('The same day'), number('As issued'), number('Now'), number('Difference')],
    rows: [
      ['Cars with a warranty', ...counts(issued.covered, now.covered)],
      ['Claims counted', ...counts(issued.claims, now.claims)],
      [`Still to come, ${sign}`, ...amounts(issued.outstandingCents, now.outstandingCents)],
      [
        `Give or take, ${sign}`,
        ...amounts(reach(issued.standardErrorCents), reach(now.standardErrorCents)),
      ],
    ],
  };
}

function reach(standardErrorCents: number | null): number | null {
  return standardErrorCents === null ? null : giveOrTake(standardErrorCents);
}

function counts(then: number, now: number): string[] {
  const difference = formatCount(now - then);
  return [formatCount(then), formatCount(now), now > then ? `+${difference}` : difference];
}

/** To whole units; the difference is that of the exact amounts. */
function amounts(then: number | null, now: number | null): string[] {
  return [
    then === null ? NO_FIGURE : formatAmount(then),
    now === null ? NO_FIGURE : formatAmount(now),
    then === null || now === null ? NO_FIGURE : formatSignedAmount(now - then),
  ];
}
