import type { WarrantyAnswer, WarrantyBranch } from '#shared/contracts/warranty';
import { roundedAmount } from '#shared/domain/give-or-take';
import { hardlyKnownWords } from '#shared/domain/hardly-known';
import type { AnswerPart } from '../../ui/answer/answer';
import type { CellLink } from '../../ui/data-table/column';
import {
  formatAmount,
  formatCars,
  formatCount,
  formatCounted,
  formatDate,
  formatMoney,
  formatNumber,
} from '../../ui/format';
import type { WarrantyLinks } from './warranty-links';
import {
  expectedText,
  ratioRange,
  standOf,
  standsAlone,
  type WarrantyWords,
} from './warranty-words';

/** The page's answer: what is still to come, and who stands beside what was expected. */
export interface WarrantySentences {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
}

/** Half-years from which a first sum can be said, and from which how far it may be off (rule 19). */
const LEAST_COHORTS = 2;
const COHORTS_FOR_INTERVAL = 4;
/** So many branches outside are told of at length; of more only those above. */
const MOST_AT_LENGTH = 3;

/** Says what the warranties already sold will cost; where that cannot be said, why, and what to do. */
export function answerWarranty(
  answer: WarrantyAnswer,
  words: WarrantyWords,
  links: WarrantyLinks,
): WarrantySentences {
  const { jobs, covered, rate, total, cohorts } = answer;
  if (jobs === 0) {
    return {
      sentence: ['No car was finished in this time.'],
      second: ['Choose more branches or packages, all cars, or a later day, in the line above.'],
    };
  }
  if (covered === 0) {
    return {
      sentence: ['No warranty was sold with ', { figure: `these ${formatCars(jobs)}` }, '.'],
      second: [
        'How long a package is under warranty is set by head office in Set-up, under packages; a car keeps the warranty that it was sold with.',
      ],
    };
  }
  if (rate.claims === 0 && total.latestCents === 0) {
    return {
      sentence: ['No claim was made on ', { figure: formatCars(covered) }, ' under warranty.'],
      second: [noClaimWords(answer)],
    };
  }
  const branches = branchWords(answer, words, links);
  if (cohorts.length < LEAST_COHORTS || total.latestCents === 0) {
    return {
      sentence: [
        'What the warranties of ',
        { figure: formatCars(covered) },
        ' will still cost cannot be said yet.',
      ],
      second: [notYetWords(answer), ' ', ...branches],
    };
  }
  const { cents, giveOrTakeCents } = roundedAmount(
    total.outstandingCents,
    total.standardErrorCents,
  );
  return {
    sentence: [
      'Warranties already sold will still cost about ',
      { figure: formatMoney(cents, words.currency) },
      ...(giveOrTakeCents === null ? [] : [`, give or take ${formatAmount(giveOrTakeCents)}`]),
      ' ',
      { quiet: `(${formatCars(covered)})` },
      '.',
    ],
    second: [...certaintyWords(answer, words), ...branches],
  };
}

function noClaimWords({ rate }: WarrantyAnswer): string {
  const years = formatCount(rate.carYears);
  const most =
    rate.upper === null
      ? ''
      : `, so hardly more than ${formatNumber(rate.upper, 1)} a year for every 1,000 cars are to be expected (95 %)`;
  return `${years} car-years of cover have run${most}. A claim is recorded on the job sheet of its car, or comes from the branch’s own system or a file.`;
}

function notYetWords({ cohorts, evaluatedOn, total }: WarrantyAnswer): string {
  if (cohorts.length < LEAST_COHORTS) {
    return `Claims are paid over years: a first sum needs cars of two half-years, how far it may be off four; there ${cohorts.length === 1 ? 'is one' : 'are none'} up to ${formatDate(evaluatedOn)}.`;
  }
  return total.latestCents === 0
    ? `Nothing was paid on a claim up to ${formatDate(evaluatedOn)}.`
    : '';
}

/** Why no interval can be said, or which half-year makes it as wide as it is; nothing where it is narrower than the sum. */
function certaintyWords(answer: WarrantyAnswer, words: WarrantyWords): string[] {
  const { cohorts, total } = answer;
  if (total.standardErrorCents === null) {
    return [
      cohorts.length < COHORTS_FOR_INTERVAL
        ? `How far that may be off cannot be said yet: it needs cars of four half-years, and there are ${formatCount(cohorts.length)}. `
        : 'How far that may be off cannot be said: too little was paid in some of the half-years. ',
    ];
  }
  const hardly = hardlyKnownWords(total, cohorts, (cents) => formatMoney(cents, words.currency));
  return hardly === undefined ? [] : [`${hardly} `];
}

/** Who stands above or below, by name; the others are counted. */
function branchWords(
  answer: WarrantyAnswer,
  words: WarrantyWords,
  links: WarrantyLinks,
): AnswerPart[] {
  const told = answer.branches.filter(({ ratio }) => ratio !== null);
  const [only] = told;
  if (!only) return [];
  if (standsAlone(answer)) {
    return [
      'Fewer than five other branches stand behind a network figure yet, so nothing says how many claims to expect here.',
    ];
  }
  if (answer.branches.length === 1) return ownWords(only, answer, words, links);
  const outside = told.filter((branch) => standOf(branch) !== 'as_expected');
  if (outside.length === 0) {
    return [`All ${formatCount(told.length)} branches have about as many claims as expected.`];
  }
  return [...outsideParts(outside, words, links), othersWords(told.length - outside.length)];
}

/** Who stands outside, by name: a few all alike, of many only those above at length. */
function outsideParts(
  outside: readonly WarrantyBranch[],
  words: WarrantyWords,
  links: WarrantyLinks,
): AnswerPart[] {
  if (outside.length <= MOST_AT_LENGTH) return atLength(outside, words, links);
  const above = outside.filter((branch) => standOf(branch) === 'above');
  const below = outside.filter((branch) => standOf(branch) === 'below');
  const long = atLength(above, words, links);
  return [
    ...long,
    ...(long.length > 0 && below.length > 0 ? ['; '] : []),
    ...inBrief(below, words, links),
  ];
}

function othersWords(others: number): string {
  if (others === 0) return '; none is as expected.';
  return others === 1
    ? '; the other branch is as expected.'
    : `; the other ${formatCount(others)} branches are as expected.`;
}

/** "Tangvarp has 66 claims where 40 were expected, Ulvmark 21 where 34 were". */
function atLength(
  branches: readonly WarrantyBranch[],
  words: WarrantyWords,
  links: WarrantyLinks,
): AnswerPart[] {
  return branches.flatMap(({ branch, claims, expected }, index) => {
    const first = index === 0;
    const figure = first ? formatCounted(claims, 'claim', 'claims') : formatCount(claims);
    return [
      `${between(index, branches.length)}${words.branchName(branch)}${first ? ' has' : ''} `,
      linked(figure, links.claims({ branch, region: undefined })),
      ` where ${expectedText(expected)} were${first ? ' expected' : ''}`,
    ];
  });
}

/** "Granholt (27 of 42) and Ulvmark (36 of 51) have fewer". */
function inBrief(
  branches: readonly WarrantyBranch[],
  words: WarrantyWords,
  links: WarrantyLinks,
): AnswerPart[] {
  if (branches.length === 0) return [];
  return [
    ...branches.flatMap(({ branch, claims, expected }, index) => [
      `${between(index, branches.length)}${words.branchName(branch)} (`,
      linked(formatCount(claims), links.claims({ branch, region: undefined })),
      ` of ${expectedText(expected)})`,
    ]),
    branches.length === 1 ? ' has fewer than expected' : ' have fewer than expected',
  ];
}

function between(index: number, count: number): string {
  if (index === 0) return '';
  return index === count - 1 && count > 2 ? ' and ' : ', ';
}

/** One branch against the rates of all: whose they are is not told. */
function ownWords(
  branch: WarrantyBranch,
  { reference }: WarrantyAnswer,
  words: WarrantyWords,
  links: WarrantyLinks,
): AnswerPart[] {
  const stand = standOf(branch);
  const whose =
    reference === 'network' ? 'the whole network’s rates' : 'the rates of these branches';
  const how =
    stand === 'as_expected'
      ? 'as expected'
      : stand === 'above'
        ? 'more than expected'
        : 'fewer than expected';
  return [
    `${words.branchName(branch.branch)} has `,
    linked(
      formatCounted(branch.claims, 'claim', 'claims'),
      links.claims({ branch: branch.branch }),
    ),
    ` where ${whose} lead one to expect ${expectedText(branch.expected)}: ${how} (${ratioRange(branch.lower, branch.upper)} times).`,
  ];
}

function linked(text: string, { commands, query }: CellLink): Exclude<AnswerPart, string> {
  return { text, link: String(commands[0]), ...(query ? { query } : {}) };
}
