import type { BranchesAnswer } from '#shared/contracts/branches';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatCars, formatCount, formatCounted, formatList } from '../../ui/format';
import {
  apartWords,
  type BranchWords,
  COUNTED_CARS,
  MEASURE_ON,
  type Placed,
  placedOf,
  standOf,
} from './branch-words';

/** The page's answer. */
export interface FunnelSentences {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
}

const MOST_NAMES = 4;

/** Says how many branches stand outside, who, by how much and in which direction: never an order of all of them. */
export function answerFunnel(answer: BranchesAnswer, words: BranchWords): FunnelSentences {
  const placed = placedOf(answer);
  const tooFew = answer.branches.length - placed.length;
  if (answer.branches.length === 0) {
    return {
      sentence: ['No car to compare branches by was finished in this time.'],
      second: [
        'Choose a longer time, or more branches, packages or body types, in the line above.',
      ],
    };
  }
  if (placed.length === 0) return noneOf(answer);
  const outside = placed.filter(({ flag }) => standOf(flag) !== 'inside');
  const [only] = placed;
  if (placed.length === 1 && only && tooFew === 0) return oneOf(answer, only, words);
  return {
    sentence:
      outside.length === 0
        ? [
            'All ',
            { figure: formatCounted(placed.length, 'branch', 'branches') },
            ` ${placed.length === 1 ? 'is' : 'are'} as expected on ${MEASURE_ON[answer.measure]}, whatever their order.`,
          ]
        : [
            { figure: `${formatCount(outside.length)} of ${formatCount(placed.length)}` },
            ` branches ${outside.length === 1 ? 'stands' : 'stand'} outside the funnel on ${MEASURE_ON[answer.measure]}`,
            { quiet: ` (${formatCars(placed.reduce((sum, { cars }) => sum + cars, 0))})` },
            '.',
          ],
    second: [[...who(answer, outside, words), ...left(tooFew)].join(' ')].filter(Boolean),
  };
}

function noneOf({ branches, measure }: BranchesAnswer): FunnelSentences {
  const cars = branches.reduce((sum, branch) => sum + branch.cars, 0);
  return {
    sentence: ['Too few cars yet: ', { figure: formatCount(cars) }, ` ${COUNTED_CARS[measure]}.`],
    second: ['A branch is compared from 5 cars on. Choose a longer time in the line above.'],
  };
}

function oneOf(answer: BranchesAnswer, branch: Placed, words: BranchWords): FunnelSentences {
  const { measure } = answer;
  const name = words.branchName(branch.branch);
  const apart = branch.value - branch.expected;
  const inside = standOf(branch.flag) === 'inside';
  const cars = { quiet: ` (${formatCars(branch.cars)})` };
  return {
    sentence: inside
      ? [`${name} is `, { figure: 'as expected' }, ` on ${MEASURE_ON[measure]}`, cars, '.']
      : [
          `${name} stands `,
          { figure: apartWords(measure, apart) },
          ` what its cars lead one to expect on ${MEASURE_ON[measure]}`,
          cars,
          '.',
        ],
    second: [
      `${referenceWords(answer)} ${inside ? 'The difference is within what chance brings.' : `It lies outside the ${limitOf(branch)} limits.`}`,
    ],
  };
}

/** Whom a branch is compared with, said in words (rule 21). */
export function referenceWords({ reference, measure, referenceCars }: BranchesAnswer): string {
  const cars = `${formatCount(referenceCars)} ${COUNTED_CARS[measure]}`;
  return reference === 'network'
    ? `Compared with the whole network: ${cars}.`
    : `Compared among the branches shown here only: ${cars}. Too few others are there to compare with.`;
}

function who(
  { measure }: BranchesAnswer,
  outside: readonly Placed[],
  words: BranchWords,
): string[] {
  if (outside.length === 0) return [];
  const far = [...outside]
    .sort((a, b) => distance(b) - distance(a))
    .slice(0, MOST_NAMES)
    .sort((a, b) => (words.branchName(a.branch) < words.branchName(b.branch) ? -1 : 1));
  const named = formatList(
    far.map(
      (one) => `${words.branchName(one.branch)} ${apartWords(measure, one.value - one.expected)}`,
    ),
  );
  const others = outside.length - far.length;
  const rest =
    others === 0 ? '' : `; ${formatCounted(others, 'other stands', 'others stand')} nearer by`;
  return [`Allowing for their cars: ${named}${rest}.`];
}

/** How far beyond its own limits, in half-widths of them. */
function distance({ value, expected, lower95, upper95 }: Placed): number {
  const half = value < expected ? expected - lower95 : upper95 - expected;
  return half > 0 ? Math.abs(value - expected) / half : 0;
}

function left(tooFew: number): string[] {
  if (tooFew === 0) return [];
  return [`${formatCounted(tooFew, 'branch has', 'branches have')} too few cars yet.`];
}

function limitOf({ flag }: Placed): string {
  return flag.endsWith('998') ? '99.8 %' : '95 %';
}
