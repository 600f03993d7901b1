import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import { roundedAmount } from '#shared/domain/give-or-take';
import { hardlyKnownWords } from '#shared/domain/hardly-known';
import type { AnswerPart } from '../../ui/answer/answer';
import {
  formatAmount,
  formatCars,
  formatCount,
  formatCounted,
  formatDate,
  formatMoney,
  formatNumber,
} from '../../ui/format';
import { branchName, expectedWords, standing } from './report-words';

/** Branches of a side that are named in a sentence; more are counted. */
const NAMED = 4;

/** What the report says: what the warranties sold by its day will still cost, give or take, and of how many cars. */
export function reportSentence(report: WarrantyReport): readonly AnswerPart[] {
  const { covered, total, evaluatedOn } = report.answer;
  const day = formatDate(report.asOf);
  if (covered === 0) return [`No car had been finished with a warranty by ${day}.`];
  const cars = { quiet: `(${formatCars(covered)})` };
  if (total.latestCents === 0) {
    return [
      `What warranties sold by ${day} will still cost cannot be said: no claim was paid by ${formatDate(evaluatedOn)} `,
      cars,
      '.',
    ];
  }
  const { cents, giveOrTakeCents } = roundedAmount(
    total.outstandingCents,
    total.standardErrorCents,
  );
  return [
    `Warranties sold by ${day} will still cost about `,
    { figure: formatMoney(cents, report.currency) },
    giveOrTakeCents === null
      ? '; how sure that is cannot be said yet '
      : `, give or take ${formatAmount(giveOrTakeCents)} `,
    cars,
    '.',
  ];
}

/** How little is known of the figure where that is the case, and which branches have more or fewer claims than expected. */
export function secondSentence(report: WarrantyReport): string {
  const { total, cohorts } = report.answer;
  const hardly = hardlyKnownWords(total, cohorts, (cents) => formatMoney(cents, report.currency));
  return [hardly, branchesSentence(report)].filter(Boolean).join(' ');
}

/** Which branches have more or fewer claims than expected. */
export function branchesSentence(report: WarrantyReport): string {
  const { branches } = report.answer;
  const above = branches.filter((branch) => standing(branch) === 'above');
  const below = branches.filter((branch) => standing(branch) === 'below');
  const expected = branches.filter((branch) => standing(branch) === 'as expected').length;
  if (above.length + below.length + expected === 0) return '';
  if (above.length + below.length === 0) {
    return expected === 1
      ? 'The one branch is as expected.'
      : `All ${expected} branches are as expected.`;
  }
  const rest = expected === 0 ? '' : `; ${others(expected)} as expected`;
  const named = [...above.slice(0, NAMED), ...below.slice(0, NAMED)].map((branch, at) => {
    const claims =
      at === 0
        ? ` has ${formatCounted(branch.claims, 'claim', 'claims')}`
        : ` ${formatCount(branch.claims)}`;
    return `${branchName(report, branch.branch)}${claims} where ${expectedWords(branch.expected)} were${at === 0 ? ' expected' : ''}`;
  });
  return `${[...named, ...moreWords(above, 'above'), ...moreWords(below, 'below')].join(', ')}${rest}.`;
}

/** The rate of claims and what was paid, as a sentence of the report. */
export function rateSentence({ answer, currency }: WarrantyReport): string {
  const { rate, total, evaluatedOn } = answer;
  const paid = `${formatMoney(total.latestCents, currency)} was paid by ${formatDate(evaluatedOn)}.`;
  if (rate.per1000 === null || rate.lower === null || rate.upper === null) return paid;
  return `${formatCounted(rate.claims, 'claim', 'claims')} in ${formatCount(Math.round(rate.carYears))} car-years of cover: ${formatNumber(rate.per1000, 1)} per 1,000 (95 % interval ${formatNumber(rate.lower, 1)}–${formatNumber(rate.upper, 1)}). ${paid}`;
}

/** The words of a sentence without its emphasis. */
export function plainWords(parts: readonly AnswerPart[]): string {
  return parts
    .map((part) => {
      if (typeof part === 'string') return part;
      if ('figure' in part) return part.figure;
      return 'quiet' in part ? part.quiet : part.text;
    })
    .join('');
}

/** Those of a side that are not named. */
function moreWords(side: readonly unknown[], word: 'above' | 'below'): string[] {
  const more = side.length - NAMED;
  if (more <= 0) return [];
  return [more === 1 ? `1 more stands ${word}` : `${formatCount(more)} more stand ${word}`];
}

function others(count: number): string {
  return count === 1 ? 'the other branch is' : `the other ${formatCount(count)} branches are`;
}
