import type { OverrunAnswer, OverrunGroup } from '#shared/contracts/overrun';
import type { AnswerPart } from '../../ui/answer/answer';
import {
  formatCars,
  formatCount,
  formatMinutes,
  formatShare,
  formatSignedShare,
} from '../../ui/format';
import { groupName, intervalText, type OverrunWords, Z95 } from './overrun-words';

/** The page's answer: how much longer cars took, what made most of it, and what allowance would have covered it. */
export interface OverrunSentences {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
}

/** Says the overrun of all cars from the answer by stage. */
export function answerOverrun(answer: OverrunAnswer, words: OverrunWords): OverrunSentences {
  const { overall } = answer;
  if (overall.cars === 0) {
    return {
      sentence: ['No car with an estimate was finished in this time.'],
      second: [
        'Choose a longer time, or more branches, packages or body types, in the line above.',
      ],
    };
  }
  if (overall.ratio === null) {
    return {
      sentence: ['Too few cars yet: ', { figure: formatCars(overall.cars) }, ' with an estimate.'],
      second: ['A share is shown from 5 cars on. Choose a longer time in the line above.'],
    };
  }
  return {
    sentence: firstSentence(overall.ratio, overall.ratioStandardError, overall.cars),
    second: [[...stageSentence(answer, words), ...allowanceSentence(answer)].join(' ')].filter(
      Boolean,
    ),
  };
}

function firstSentence(ratio: number, standardError: number | null, cars: number): AnswerPart[] {
  const over = ratio - 1;
  const reach = Z95 * (standardError ?? 0);
  const behind =
    standardError === null
      ? formatCars(cars)
      : `${intervalText(ratio, standardError)}, ${formatCars(cars)}`;
  if (standardError !== null && Math.abs(over) < reach) {
    return [
      'Cars took about as long as estimated: ',
      { figure: formatSignedShare(over) },
      { quiet: ` (${behind})` },
      '.',
    ];
  }
  if (over < 0) {
    const less =
      standardError === null
        ? behind
        : `${intervalText(2 - ratio, standardError)}, ${formatCars(cars)}`;
    return [
      'Cars took ',
      { figure: formatShare(-over) },
      ' less time than estimated ',
      { quiet: `(${less})` },
      '.',
    ];
  }
  return [
    'Cars took ',
    { figure: formatShare(over) },
    ' longer than estimated ',
    { quiet: `(${behind})` },
    '.',
  ];
}

/** The stage that made most of what was worked beyond the estimates. */
function stageSentence(answer: OverrunAnswer, words: OverrunWords): string[] {
  const total = answer.overall.actualMinutes - answer.overall.estimatedMinutes;
  const most = answer.groups.reduce<OverrunGroup | null>(
    (largest, stage) => (largest === null || overOf(stage) > overOf(largest) ? stage : largest),
    null,
  );
  if (!most || total <= 0 || overOf(most) <= 0) return [];
  const name = groupName('stage', most.key, words);
  const stage = name.charAt(0).toUpperCase() + name.slice(1);
  return [
    overOf(most) > total
      ? `${stage} ran ${hours(overOf(most))} over; other stages won some of it back.`
      : `${stage} made ${formatShare(overOf(most) / total)} of the ${hours(total)} over.`,
  ];
}

function allowanceSentence({ overall: { allowance } }: OverrunAnswer): string[] {
  if (allowance === null) return [];
  if (Math.round(allowance * 100) <= 0) {
    return [`8 of 10 cars finished within ${formatShare(1 + allowance)} of their estimate.`];
  }
  return [
    `With ${formatShare(allowance)} added to each estimate, 8 of 10 cars would have finished within it.`,
  ];
}

/** Minutes worked beyond the estimate. */
export function overOf({
  actualMinutes,
  estimatedMinutes,
}: Pick<OverrunGroup, 'actualMinutes' | 'estimatedMinutes'>): number {
  return actualMinutes - estimatedMinutes;
}

/** Hours from ten on, hours and minutes below. */
function hours(minutes: number): string {
  return minutes < 600 ? formatMinutes(minutes) : `${formatCount(minutes / 60)} hours`;
}
