import { hardlyKnownWords } from '#shared/domain/hardly-known';
import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import { cohortsPicture } from './cohorts-picture';
import { COLOURS } from './colours';
import { curvesPicture } from './curves-picture';
import { expectedPicture } from './expected-picture';
import { currencySign, day, decimals, signedMoney, whole } from './format';
import { namesOf } from './names';
import { leftOut, methodNotes } from './notes';
import { Paper } from './paper';
import { paragraph } from './paragraph';
import { count, sayAnswer, sayBranches, type Voice } from './say-report';
import {
  branchTable,
  causeTable,
  cohortTable,
  processTable,
  ratesTable,
  riskTable,
} from './tables';
import { triangleTables } from './triangle-tables';

const TITLE = 'Warranty-risk report';

/**
 * The report on paper, as a PDF. It is made of the report alone: no clock, no chance and no setting of the machine goes into
 * it, so that the same report is the same bytes.
 */
export function printReport(report: WarrantyReport): Buffer {
  const { answer, asOf, rows, currency } = report;
  const paper = new Paper({ title: `${TITLE}, ${day(asOf)}`, day: asOf });
  const names = namesOf(report, paper.fonts);
  paper.foot = `${TITLE} · ${names.network} · as of ${day(asOf)}`;
  const drawable = paper.fonts.canDraw(currencySign(currency));
  const sign = drawable ? currencySign(currency) : currency;
  const money = (cents: number): string =>
    drawable ? signedMoney(cents, currency) : `${currency} ${whole(cents / 100)}`;
  const voice: Voice = { branch: names.branch, money };
  const words = { branch: names.branch, sign };
  const plain = (key: string): string =>
    paper.fonts.canDraw(key) ? key.replaceAll('_', ' ') : '(not named)';

  head(paper, report, names.network, voice);
  curvesPicture(paper, answer, answer.groupBy === 'branch' ? names.branch : plain);
  cohortsPicture(paper, answer, sign);
  expectedPicture(paper, answer.branches, names.branch);
  leftOut(paper, answer, money);
  cohortTable(paper, answer, words);
  branchTable(paper, answer.branches, words);
  processTable(paper, answer);
  causeTable(paper, answer, words);
  paper.turn('landscape');
  triangleTables(paper, answer.triangle, sign);
  paper.turn('landscape');
  riskTable(paper, rows, words);
  paper.turn('portrait');
  ratesTable(paper, answer.expectedRates, plain);
  methodNotes(paper);
  return paper.finish();
}

function head(paper: Paper, report: WarrantyReport, network: string, voice: Voice): void {
  const { answer, asOf } = report;
  paragraph(paper, [{ text: TITLE, size: 20, weight: 600 }], 'H1', 1.2);
  paragraph(paper, [{ text: `${network}, as of ${day(asOf)}`, size: 11, colour: COLOURS.quiet }]);
  paper.y += 10;
  const { before, figure, after, cars } = sayAnswer(answer, voice);
  const said = { size: 15 } as const;
  paragraph(
    paper,
    [
      { ...said, text: before },
      { size: 26, weight: 600, text: figure },
      { ...said, text: after },
      { ...said, text: cars, colour: COLOURS.quiet },
    ].filter(({ text }) => text !== '') as Parameters<typeof paragraph>[1],
    'P',
    1.3,
  );
  paper.y += 2;
  const hardly = hardlyKnownWords(answer.total, answer.cohorts, voice.money);
  if (hardly !== undefined) paragraph(paper, [{ text: hardly, size: 11 }]);
  paragraph(paper, [{ text: sayBranches(answer.branches, voice), size: 11 }]);
  const { claims, carYears, per1000, lower, upper } = answer.rate;
  if (per1000 !== null && lower !== null && upper !== null) {
    const rate = `${count(claims, 'claim')} in ${whole(carYears)} car-years of cover: ${decimals(per1000, 1)} per 1,000 car-years, 95 % interval ${decimals(lower, 1)} to ${decimals(upper, 1)}.`;
    paragraph(paper, [{ text: rate, size: 9, colour: COLOURS.quiet }]);
  }
}
