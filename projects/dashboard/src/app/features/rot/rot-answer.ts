import type { RotAnswer, RotBand, RotCell } from '#shared/contracts/rot';
import type { AgeBand } from '#shared/domain/vocabulary';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatCars, formatCount, formatShare } from '../../ui/format';
import { bandOf } from './age-choice';
import { areasOf, mostRot } from './rot-areas';
import {
  agedWords,
  behind,
  carsCalled,
  placeInSentence,
  type RotWords,
  shareOfCars,
} from './rot-words';

/** The page's answer: how many cars of an age had rot, where it sat, and in which regions most and least. */
export interface RotSentences {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
}

/** Says the rot of one age; where nothing can be said, why, and what to do. */
export function answerRot(answer: RotAnswer, age: AgeBand, words: RotWords): RotSentences {
  if (answer.jobs === 0) {
    return {
      sentence: ['No car was finished in this time.'],
      second: [
        'Choose a longer time, or more branches, packages or body types, in the line above.',
      ],
    };
  }
  const band = bandOf(answer, age);
  const called = carsCalled(words.bodyTypes);
  if (band.cars === 0) {
    return {
      sentence: [`No ${called} aged ${agedWords(age)} in this time.`],
      second: ['Choose another age below, or a longer time in the line above.'],
    };
  }
  if (band.share === null) {
    const rotten = band.withRot === 0 ? 'none with rot' : `${formatCount(band.withRot)} with rot`;
    return {
      sentence: [
        `Too few ${called} aged ${agedWords(age)} yet: `,
        { figure: formatCount(band.cars) },
        { quiet: `, ${rotten}` },
        '.',
      ],
      second: [
        'A share is shown from 5 cars on. Choose another age below, or a longer time in the line above.',
      ],
    };
  }
  return {
    sentence: [
      { figure: formatShare(band.share) },
      ` of ${called} aged ${agedWords(age)} had rot `,
      { quiet: `(${behind(band)})` },
      '.',
    ],
    second: [[placeSentence(answer, band), ...regionSentence(answer, band, words)].join(' ')],
  };
}

function placeSentence(answer: RotAnswer, { ageBand, cars }: RotBand): string {
  const areas = areasOf(answer, ageBand);
  const [most] = mostRot(areas);
  if (!most) return `No rot was found anywhere on these ${formatCars(cars)}.`;
  const sides = areas.filter(({ zone }) => zone === most.zone).map(({ side }) => side);
  const share = most.share === null ? '' : `: ${formatShare(most.share)}`;
  return `Most often in the ${placeInSentence(most.zone, most.side, sides)}${share}.`;
}

/** Several regions: the one with most and the one with least. One: how it stands against the network. */
function regionSentence(answer: RotAnswer, band: RotBand, words: RotWords): string[] {
  const regions = answer.cells
    .filter(({ ageBand, share }) => ageBand === band.ageBand && share !== null)
    .sort((a, b) => (b.share ?? 0) - (a.share ?? 0));
  const [highest, lowest] = [regions[0], regions.at(-1)];
  if (highest && lowest && highest !== lowest) {
    return [`${regionText(highest, words)}, ${regionText(lowest, words)}.`];
  }
  return answer.reference === 'network' &&
    band.referenceShare !== null &&
    answer.scope.regions.length === 1
    ? [`The whole network: ${formatShare(band.referenceShare)}.`]
    : [];
}

function regionText(cell: RotCell, { regionName }: RotWords): string {
  return `${regionName(cell.region)} ${shareOfCars(cell)}`;
}
