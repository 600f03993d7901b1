import type { BranchesAnswer } from '#shared/contracts/branches';
import type { FunnelInput } from '../../charts/funnel/funnel-input';
import { formatCars, formatList } from '../../ui/format';
import { formatMeasure } from '../../ui/measure-words';
import {
  apartWords,
  type BranchWords,
  FLAG_WORDS,
  MEASURE_ON,
  placedOf,
  signedChange,
  standOf,
} from './branch-words';

/** The funnel of an answer: every branch apart from what its own cars lead one to expect, its own limits too. */
export function funnelPicture(answer: BranchesAnswer, words: BranchWords): FunnelInput {
  const { measure } = answer;
  const points = placedOf(answer).map((one) => ({
    key: one.branch,
    name: words.branchName(one.branch),
    cars: one.cars,
    apart: one.value - one.expected,
    lower95: one.lower95 - one.expected,
    upper95: one.upper95 - one.expected,
    lower998: one.lower998 - one.expected,
    upper998: one.upper998 - one.expected,
    stand: standOf(one.flag),
    lines: [
      `${words.branchName(one.branch)}, ${formatCars(one.cars)}`,
      `${formatMeasure(measure, one.value)}, expected ${formatMeasure(measure, one.expected)}`,
      FLAG_WORDS[one.flag],
    ],
  }));
  const outside = points
    .filter(({ stand }) => stand !== 'inside')
    .sort((a, b) => (a.name < b.name ? -1 : 1));
  const finding =
    outside.length === 0
      ? 'All lie within their limits.'
      : `Outside their limits: ${formatList(
          outside.map(({ name, apart }) => `${name} ${apartWords(measure, apart)}`),
        )}.`;
  return {
    summary: `${points.length} branches by their number of cars, each apart from what its own cars lead one to expect on ${MEASURE_ON[measure]}. ${finding}`,
    points,
    // A round number of claims needs no decimals.
    tick: (apart) => signedChange(measure, apart).replace(/\.0$/, ''),
  };
}
