import type { Params } from '@angular/router';
import type { ProductBranch, ProductsAnswer } from '#shared/contracts/products';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatCars, formatCount, formatExactMoney, formatShare } from '../../ui/format';
import { carsUnderQuery } from './cars-of-use';
import { carsOfKind, intervalText, presentShare, type ProductWords } from './product-words';
import { type WorstUse, worstUse } from './worst-use';

/** The page's answer: how much of the norm went in, and where cars got far too little. */
export interface ProductSentences {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
}

/** Says product use against the norm, over all products; `filters` are the page's own, for the link to the cars. */
export function answerProducts(
  answer: ProductsAnswer,
  words: ProductWords,
  filters: Params = {},
): ProductSentences {
  const { jobs, overall } = answer;
  if (jobs === 0) {
    return {
      sentence: ['No car was finished in this time.'],
      second: [
        'Choose a longer time, or more branches, packages or body types, in the line above.',
      ],
    };
  }
  if (overall.cars === 0) {
    return {
      sentence: ['No norm is set for ', { figure: formatCars(jobs) }, ' of this time.'],
      second: [
        'Until head office sets what a package should take on a body type, use is shown in millilitres alone.',
      ],
    };
  }
  if (overall.ratioToNorm === null) {
    return {
      sentence: ['Too few cars yet: ', { figure: formatCars(overall.cars) }, ' with a norm.'],
      second: ['A share is shown from 5 cars on. Choose a longer time in the line above.'],
    };
  }
  return {
    sentence: firstSentence(overall, words),
    second: secondSentence(answer, words, filters),
  };
}

function firstSentence(
  { ratioToNorm, lower, upper, cars, costedCars, costPerCarCents }: ProductsAnswer['overall'],
  words: ProductWords,
): AnswerPart[] {
  const behind = [intervalText(lower, upper), formatCars(cars)].filter(Boolean).join(', ');
  const cost =
    costPerCarCents === null
      ? ''
      : `, ${formatExactMoney(costPerCarCents, words.currency)} of product a car`;
  // Cars without a norm cost something too, and some cost is not known: then it is of other cars than the ratio.
  const costed =
    cost !== '' && costedCars !== cars ? [{ quiet: ` (${formatCars(costedCars)})` }] : [];
  return [
    { figure: formatShare(ratioToNorm ?? 0) },
    ' of the norm went in ',
    { quiet: `(${behind})` },
    cost,
    ...costed,
    '.',
  ];
}

function secondSentence(
  answer: ProductsAnswer,
  words: ProductWords,
  filters: Params,
): AnswerPart[] {
  const branches = branchSentence(answer.branches, words);
  return [...worstSentence(answer, words, filters), ...(branches ? [` ${branches}`] : [])];
}

function worstSentence(
  { use, period }: ProductsAnswer,
  words: ProductWords,
  filters: Params,
): AnswerPart[] {
  const worst = worstUse(use);
  if (!worst) return ['No car got less than 70 % of the norm of any product.'];
  const where = worst.kind ? ` in ${carsOfKind(worst.kind, words)}` : '';
  return [
    `${words.productName(worst.product)}${where}: `,
    carsUnder(worst, { ...filters, ...carsUnderQuery(worst, period) }),
    underWords(worst),
  ];
}

function carsUnder({ under, cars }: WorstUse, query: Params): Exclude<AnswerPart, string> {
  const text = `${presentShare(under / cars)} of ${formatCars(cars)}`;
  return { text, link: '/jobs', query };
}

/** How little they got; that some got none is the gravest part of it. */
function underWords({ cars, carsListing, under }: WorstUse): string {
  const none = cars - carsListing;
  if (none >= under) return ' got none at all.';
  const some = none > 0 ? `, ${formatCount(none)} of them none at all` : '';
  return ` got less than 70 % of the norm${some}.`;
}

/** Of several branches, who lies furthest from the norm either way: by name, and only where the interval misses it. */
function branchSentence(branches: readonly ProductBranch[], words: ProductWords): string {
  if (branches.length < 2) return '';
  const said = (branch: ProductBranch | undefined, how: string): string =>
    branch
      ? `${words.branchName(branch.branch)} put in clearly ${how} than its norm, ${formatShare(branch.ratioToNorm ?? 0)} (${intervalText(branch.lower, branch.upper)})`
      : '';
  const low = said(
    furthest(branches, ({ upper }) => upper !== null && upper < 1, 'least'),
    'less',
  );
  const high = said(
    furthest(branches, ({ lower }) => lower !== null && lower > 1, 'most'),
    'more',
  );
  if (low || high) return `${[low, high].filter(Boolean).join('; ')}.`;
  return 'No branch lies clearly beside its norm.';
}

function furthest(
  branches: readonly ProductBranch[],
  misses: (branch: ProductBranch) => boolean,
  end: 'least' | 'most',
): ProductBranch | undefined {
  const sign = end === 'least' ? 1 : -1;
  return branches
    .filter(misses)
    .sort((a, b) => sign * ((a.ratioToNorm ?? 1) - (b.ratioToNorm ?? 1)))[0];
}
