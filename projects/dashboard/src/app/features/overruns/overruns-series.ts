import type { OverrunAnswer } from '#shared/contracts/overrun';
import { formatCounted } from '../../ui/format';
import { answerOverrun, type OverrunSentences } from './overrun-answer';
import { type StagePictures, stagePictures } from './overrun-stages';
import { type Grouping, GROUPINGS, type OverrunWords } from './overrun-words';

/** Everything the page shows above its groups. */
export interface OverrunsView {
  readonly answer: OverrunSentences;
  /** Absent below 5 cars with an estimate. */
  readonly stages: StagePictures | null;
  /** "14 more cars had no estimate", absent when all had one. */
  readonly apart: string | null;
  readonly groupings: readonly Grouping[];
}

/** Turns the answer by stage into the page's answer and first picture. Pure. */
export function overrunsView(answer: OverrunAnswer, words: OverrunWords): OverrunsView {
  const { overall, scope, withoutEstimate } = answer;
  return {
    answer: answerOverrun(answer, words),
    stages: overall.ratio === null ? null : stagePictures(answer, words),
    apart:
      withoutEstimate === 0
        ? null
        : `${formatCounted(withoutEstimate, 'more car', 'more cars')} had no estimate and ${withoutEstimate === 1 ? 'is' : 'are'} counted apart.`,
    groupings: GROUPINGS.filter(
      (by) =>
        (by !== 'branch' || scope.branches.length > 1) &&
        (by !== 'region' || scope.regions.length > 1),
    ),
  };
}

/** The grouping asked for in the URL, or the first that is offered. */
export function groupingFrom(text: string | undefined, offered: readonly Grouping[]): Grouping {
  return offered.find((by) => by === text) ?? 'ageBand';
}
