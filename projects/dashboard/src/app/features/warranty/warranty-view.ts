import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { branchRows, type BranchRows } from './branch-rows';
import { cohortTable, type CohortTable } from './cohort-rows';
import { curvesPicture, type CurvesPicture, rateWords } from './curves-picture';
import { leftOut, type LeftOut, waitingClaims } from './left-out';
import { causeTable, type PlacedTable, zoneTable } from './placed-rows';
import { processRows, type ProcessRows } from './process-rows';
import { answerWarranty, type WarrantySentences } from './warranty-answer';
import type { WarrantyLinks } from './warranty-links';
import type { WarrantyWords } from './warranty-words';

/** Pictures and rows below the answer. */
export interface WarrantyPictures {
  readonly curves: CurvesPicture;
  /** What follows the number of claims: how many that is a year. */
  readonly rate: string;
  readonly cohorts: CohortTable;
  readonly branches: BranchRows | null;
  readonly process: ProcessRows;
  readonly zones: PlacedTable;
  readonly causes: PlacedTable;
}

/** Everything the page shows. */
export interface WarrantyView {
  readonly answer: WarrantySentences;
  /** Null where there is no car, no warranty or no claim to draw. */
  readonly pictures: WarrantyPictures | null;
  readonly left: readonly LeftOut[];
  readonly waiting: LeftOut | null;
}

/** Turns the answer into the page. Pure. */
export function warrantyView(
  answer: WarrantyAnswer,
  words: WarrantyWords,
  links: WarrantyLinks,
): WarrantyView {
  const drawn = answer.covered > 0 && (answer.rate.claims > 0 || answer.total.latestCents > 0);
  return {
    answer: answerWarranty(answer, words, links),
    left: leftOut(answer, words, links),
    waiting: waitingClaims(answer, links),
    pictures: drawn
      ? {
          curves: curvesPicture(answer, words),
          rate: rateWords(answer),
          cohorts: cohortTable(answer, words, links),
          branches: branchRows(answer, words, links),
          process: processRows(answer),
          zones: zoneTable(answer, words, links),
          causes: causeTable(answer, words, links),
        }
      : null,
  };
}
