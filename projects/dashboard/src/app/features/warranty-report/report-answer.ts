import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import { roundedAmount } from '#shared/domain/give-or-take';
import type { AnswerPart } from '../../ui/answer/answer';
import {
  formatAmount,
  formatCars,
  formatCount,
  formatCounted,
  formatDate,
  formatList,
  formatMoney,
  formatNumber,
} from '../../ui/format';
import { branchName, expectedWords, standing } from './report-words';

/** More branches than this outside expectation are counted, not named, in a sentence. */
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
  if (above.length + below.length > NAMED) {
    const sides = [
      ...(above.length > 0 ? [`${countBranches(above.length)} above expectation`] : []),
      ...(below.length > 0 ? [`${formatCount(below.length)} below`] : []),
    ];
    return `${formatList(sides)}${rest}.`;
  }
  const named = [...above, ...below].map(
    (branch) =>
      `${branchName(report, branch.branch)} has ${formatCounted(branch.claims, 'claim', 'claims')} where ${expectedWords(branch.expected)} were expected`,
  );
  return `${formatList(named)}${rest}.`;
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

function countBranches(count: number): string {
  return count === 1 ? '1 branch stands' : `${formatCount(count)} branches stand`;
}

function others(count: number): string {
  return count === 1 ? 'the other branch is' : `the other ${formatCount(count)} branches are`;
}
