import type { WarrantyAnswer, WarrantyCohort } from '#shared/contracts/warranty';
import { giveOrTake } from '#shared/domain/give-or-take';
import { COLOURS } from './colours';
import { day, halfYearWords, whole, wholeMoney } from './format';
import { hatched } from './hatching';
import { heading, quietly } from './headings';
import type { Paper } from './paper';
import { rowsByPage } from './rows-by-page';

const ROW = 13;
const BAR = 8;
const LETTERING = { size: 8.5 } as const;
const HEAD = { size: 8.5, colour: COLOURS.quiet } as const;

/** What cars of each half-year have cost and will still cost, with its interval. */
export function cohortsPicture(paper: Paper, answer: WarrantyAnswer, sign: string): void {
  const { cohorts, evaluatedOn, total } = answer;
  heading(
    paper,
    `Paid, and still to come, ${sign}`,
    `By the half-year in which cars were finished; payments up to ${day(evaluatedOn)}. Solid is paid, hatched is still to come, with its 95 % interval.`,
    ROW * Math.min(cohorts.length + 2, 36),
  );
  if (cohorts.length === 0) {
    quietly(paper, 'No half-year had ended since the first car was finished.');
    return;
  }
  const most = Math.max(1, ...cohorts.map(reach));
  const places = placesOf(paper);
  const bar = (cents: number): number => places.bar + ((places.barEnd - places.bar) * cents) / most;
  rowsByPage(paper, cohorts, ROW, (rows) =>
    paper.tagged(
      'Figure',
      () => {
        header(paper, places);
        for (const cohort of rows) cohortRow(paper, cohort, places, bar);
        if (rows.at(-1) === cohorts.at(-1)) totalRow(paper, cohorts, total, places);
      },
      {
        alt: `Bars of what was paid and what is still to come by half-year; in all ${wholeMoney(total.latestCents)} paid and ${wholeMoney(total.outstandingCents)} still to come.`,
      },
    ),
  );
  paper.y += 6;
}

interface Places {
  cars: number;
  paid: number;
  bar: number;
  barEnd: number;
  toCome: number;
  giveOrTake: number;
}

function placesOf({ left, right }: Paper): Places {
  return {
    cars: left + 96,
    paid: left + 152,
    bar: left + 162,
    barEnd: right - 138,
    toCome: right - 68,
    giveOrTake: right,
  };
}

/** How far to the right a half-year reaches: to the end of its whisker. */
function reach({ latestCents, outstandingCents, standardErrorCents }: WarrantyCohort): number {
  return latestCents + outstandingCents + giveOrTake(standardErrorCents ?? 0);
}

function header(paper: Paper, places: Places): void {
  const base = paper.y + 9;
  paper.text('finished in', paper.left, base, HEAD);
  for (const [text, x] of [
    ['cars', places.cars],
    ['paid', places.paid],
    ['still to come', places.toCome],
    ['give or take', places.giveOrTake],
  ] as const) {
    paper.text(text, x, base, { ...HEAD, align: 'right' });
  }
  paper.y += ROW;
  paper.rule(paper.left, paper.y, paper.right, paper.y, COLOURS.ink, 0.8);
}

function cohortRow(
  paper: Paper,
  cohort: WarrantyCohort,
  places: Places,
  bar: (cents: number) => number,
): void {
  const { latestCents, outstandingCents, standardErrorCents } = cohort;
  const base = paper.y + 9.5;
  const top = paper.y + (ROW - BAR) / 2;
  const paid = bar(Math.max(latestCents, 0));
  const end = bar(Math.max(latestCents + outstandingCents, 0));
  paper.text(halfYearWords(cohort.cohort), paper.left, base, LETTERING);
  const right = { ...LETTERING, align: 'right' } as const;
  paper.text(whole(cohort.cars), places.cars, base, { ...right, colour: COLOURS.quiet });
  paper.text(wholeMoney(latestCents), places.paid, base, right);
  paper.text(wholeMoney(outstandingCents), places.toCome, base, { ...right, weight: 600 });
  if (paid > places.bar) paper.doc.rect(places.bar, top, paid - places.bar, BAR).fill(COLOURS.tide);
  hatched(paper.doc, [paid, top, end - paid, BAR], COLOURS.oxide);
  if (standardErrorCents === null) {
    paper.text(outstandingCents === 0 ? '' : '–', places.giveOrTake, base, right);
  } else if (standardErrorCents > 0) {
    const half = giveOrTake(standardErrorCents);
    const from = bar(Math.max(latestCents + outstandingCents - half, 0));
    const to = bar(latestCents + outstandingCents + half);
    const middle = paper.y + ROW / 2;
    paper.rule(from, middle, to, middle, COLOURS.ink, 1);
    for (const x of [from, to]) paper.rule(x, middle - 3, x, middle + 3, COLOURS.ink, 1);
    paper.text(wholeMoney(half), places.giveOrTake, base, { ...right, colour: COLOURS.quiet });
  }
  paper.y += ROW;
  paper.rule(paper.left, paper.y, paper.right, paper.y, COLOURS.hairline);
}

function totalRow(
  paper: Paper,
  cohorts: readonly WarrantyCohort[],
  total: WarrantyAnswer['total'],
  places: Places,
): void {
  paper.rule(paper.left, paper.y, paper.right, paper.y, COLOURS.ink, 0.8);
  const base = paper.y + 9.5;
  const strong = { ...LETTERING, weight: 600, align: 'right' } as const;
  const { standardErrorCents } = total;
  paper.text('all', paper.left, base, { ...LETTERING, weight: 600 });
  paper.text(whole(cohorts.reduce((sum, { cars }) => sum + cars, 0)), places.cars, base, strong);
  paper.text(wholeMoney(total.latestCents), places.paid, base, strong);
  paper.text(wholeMoney(total.outstandingCents), places.toCome, base, strong);
  const half = standardErrorCents === null ? '–' : wholeMoney(giveOrTake(standardErrorCents));
  paper.text(half, places.giveOrTake, base, strong);
  paper.y += ROW;
}
