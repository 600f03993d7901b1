import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { WARRANTY_METHODS } from '#shared/domain/warranty-methods';
import { COLOURS } from './colours';
import { day } from './format';
import { heading } from './headings';
import type { Paper } from './paper';
import { paragraph } from './paragraph';
import { count } from './say-report';

const TEXT = { size: 9 } as const;

/** What stands outside the figures, counted. */
export function leftOut(
  paper: Paper,
  answer: WarrantyAnswer,
  money: (cents: number) => string,
): void {
  const { left, evaluatedOn } = answer;
  heading(paper, 'What is not included');
  for (const text of [
    'What comes later than the oldest half-year of age in the triangle has seen: no tail is added beyond it.',
    'The cost of claims that are open or waiting: no cost is known before they are decided and paid.',
    `${count(left.claimsWaiting, 'proposal')} waiting for head office: the claims count, their decisions and payments do not yet.`,
    `${count(left.claimsAfterEnd, 'claim')} made after the warranty had ended.`,
    `${count(left.claimsRefused, 'claim')} that had been refused.`,
    `${count(left.carsWithoutWarranty, 'car')} sold without a warranty.`,
    `${money(left.paidAfterEvaluationCents)} paid after ${day(evaluatedOn)}, the last half-year’s end that the as-of day reaches.`,
  ]) {
    paragraph(paper, [{ ...TEXT, text: `– ${text}` }]);
  }
}

/** How each figure comes about, with what was published of its method. */
export function methodNotes(paper: Paper): void {
  heading(paper, 'How each figure comes about');
  for (const { name, words, sources } of WARRANTY_METHODS) {
    paper.room(48);
    paper.y += 5;
    paragraph(paper, [{ ...TEXT, text: name, weight: 600 }], 'H3');
    paragraph(paper, [{ ...TEXT, text: words }]);
    for (const source of sources) {
      paragraph(paper, [{ size: 8, text: `${source}.`, colour: COLOURS.quiet }]);
    }
  }
}
