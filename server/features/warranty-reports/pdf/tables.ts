import type {
  ExpectedRate,
  WarrantyAnswer,
  WarrantyBranch,
  WarrantyCohort,
} from '#shared/contracts/warranty';
import type { WarrantyRiskRow } from '#shared/contracts/warranty-reports';
import { giveOrTake } from '#shared/domain/give-or-take';
import { between, decimals, exactMoney, halfYearWords, orDash, whole } from './format';
import { heading } from './headings';
import type { Paper } from './paper';
import { standsOutside, standing } from './say-report';
import { table } from './table';
import { CAUSE_WORDS, CHECK_WORDS } from './words';

/** What the tables are told with. */
export interface TableWords {
  branch: (code: string) => string;
  /** Sign of the currency, for heads. */
  sign: string;
}

/** Half-years with all that is said of them, and their sum. */
export function cohortTable(
  paper: Paper,
  { cohorts, total }: WarrantyAnswer,
  { sign }: TableWords,
): void {
  heading(
    paper,
    `Half-years of completion, ${sign}`,
    'Give or take is half of the 95 % interval. Claims against expected say whether cars of a half-year are unlike others.',
    Math.min(cohorts.length + 2, 40) * 12.5,
  );
  type Line = Partial<WarrantyCohort> & WarrantyAnswer['total'] & { name: string };
  const lines: Line[] = [
    ...cohorts.map((cohort) => ({ ...cohort, name: halfYearWords(cohort.cohort) })),
    {
      ...total,
      name: 'all',
      cars: sumOf(cohorts, ({ cars }) => cars),
      claims: sumOf(cohorts, ({ claims }) => claims),
    },
  ];
  const figure = (value: number | null | undefined, digits: number): string =>
    value === undefined ? '' : orDash(value, (known) => decimals(known, digits));
  table<Line>(
    paper,
    [
      { head: 'finished in', wide: 3, align: 'left', cell: ({ name }) => name },
      { head: 'cars', wide: 2.4, cell: ({ cars }) => whole(cars ?? 0) },
      { head: 'paid', wide: 4, cell: ({ latestCents }) => exactMoney(latestCents) },
      { head: 'in the end', wide: 4, cell: ({ ultimateCents }) => exactMoney(ultimateCents) },
      {
        head: 'still to come',
        wide: 4,
        cell: ({ outstandingCents }) => exactMoney(outstandingCents),
      },
      {
        head: 'give or take',
        wide: 4,
        cell: ({ standardErrorCents }) =>
          orDash(standardErrorCents, (error) => exactMoney(giveOrTake(error))),
      },
      { head: 'claims', wide: 2.2, cell: ({ claims }) => whole(claims ?? 0) },
      { head: 'expected', wide: 2.8, cell: ({ expected }) => figure(expected, 1) },
      { head: 'ratio', wide: 2, cell: ({ ratio }) => figure(ratio, 2) },
      {
        head: '95 % interval',
        wide: 4,
        cell: ({ lower, upper }) => (lower === undefined ? '' : between(lower, upper ?? null, 2)),
      },
    ],
    lines,
    { standsOut: ({ name }) => (name === 'all' ? 'total' : undefined), size: 7.5 },
  );
}

/** Branches with their claims against what was expected. */
export function branchTable(
  paper: Paper,
  branches: readonly WarrantyBranch[],
  { branch }: TableWords,
): void {
  heading(paper, 'Branches', 'In the order of their codes: a ratio is no rank.');
  table(
    paper,
    [
      { head: 'branch', wide: 6, align: 'left', cell: (row) => branch(row.branch) },
      { head: 'code', wide: 2, align: 'left', cell: (row) => row.branch },
      { head: 'cars', wide: 2.2, cell: (row) => whole(row.cars) },
      { head: 'car-years', wide: 3, cell: (row) => decimals(row.carYears, 1) },
      { head: 'claims', wide: 2.2, cell: (row) => whole(row.claims) },
      { head: 'expected', wide: 3, cell: (row) => decimals(row.expected, 2) },
      { head: 'ratio', wide: 2.2, cell: (row) => orDash(row.ratio, (ratio) => decimals(ratio, 2)) },
      { head: '95 % interval', wide: 4, cell: (row) => between(row.lower, row.upper, 2) },
      { head: 'stands', wide: 3.4, cell: (row) => standing(row) ?? '–' },
    ],
    branches,
    { standsOut: (row) => (standsOutside(row) ? 'noticed' : undefined) },
  );
}

/** The warranty-risk rows: one a branch and half-year of completion. */
export function riskTable(
  paper: Paper,
  rows: readonly WarrantyRiskRow[],
  { branch, sign }: TableWords,
): void {
  heading(
    paper,
    `Warranty risk by branch and half-year of completion, ${sign}`,
    'A branch’s part of what is still to come adds up to the network’s. Error is the standard error of one half-year.',
  );
  table(
    paper,
    [
      { head: 'branch', wide: 5.4, align: 'left', cell: (row) => branch(row.branch) },
      { head: 'finished in', wide: 2.6, align: 'left', cell: (row) => halfYearWords(row.cohort) },
      { head: 'cars', wide: 1.9, cell: (row) => whole(row.carsCovered) },
      { head: 'years run', wide: 2.7, cell: (row) => decimals(row.carYearsRun, 1) },
      { head: 'years left', wide: 2.7, cell: (row) => decimals(row.carYearsLeft, 1) },
      { head: 'claims', wide: 1.9, cell: (row) => whole(row.claims) },
      { head: 'open', wide: 1.6, cell: (row) => whole(row.claimsOpen) },
      {
        head: 'per 1,000',
        wide: 2.4,
        cell: (row) => orDash(row.per1000, (rate) => decimals(rate, 1)),
      },
      { head: '95 % interval', wide: 3.8, cell: (row) => between(row.lower, row.upper, 1) },
      { head: 'expected', wide: 2.3, cell: (row) => decimals(row.expected, 2) },
      { head: 'ratio', wide: 1.8, cell: (row) => orDash(row.ratio, (ratio) => decimals(ratio, 2)) },
      { head: 'paid', wide: 3.2, cell: (row) => exactMoney(row.paidCents) },
      { head: 'still to come', wide: 3.4, cell: (row) => orDash(row.outstandingCents, exactMoney) },
      { head: 'error', wide: 3, cell: (row) => orDash(row.standardErrorCents, exactMoney) },
    ],
    rows,
    { size: 7.5 },
  );
}

/** How much likelier a claim is where a check was missed. */
export function processTable(paper: Paper, { process, thinProduct }: WarrantyAnswer): void {
  heading(
    paper,
    'Process checks',
    'How many times as likely a claim within 24 months is where a check was missed, against where it was done.',
  );
  const pooled = [
    ...process.map((risk) => ({ ...risk, name: CHECK_WORDS[risk.check] })),
    { ...thinProduct, name: 'product 70 % of its norm or more' },
  ].map((risk) => ({
    ...risk,
    exposedCars: sumOf(risk.tables, (stratum) => stratum.exposedCars),
    exposedClaims: sumOf(risk.tables, (stratum) => stratum.exposedClaims),
    unexposedCars: sumOf(risk.tables, (stratum) => stratum.unexposedCars),
    unexposedClaims: sumOf(risk.tables, (stratum) => stratum.unexposedClaims),
  }));
  table(
    paper,
    [
      { head: 'check', wide: 9.5, align: 'left', cell: (row) => row.name },
      { head: 'missed: cars', wide: 3.9, cell: (row) => whole(row.exposedCars) },
      { head: 'claims', wide: 2.4, cell: (row) => whole(row.exposedClaims) },
      { head: 'done: cars', wide: 3.4, cell: (row) => whole(row.unexposedCars) },
      { head: 'claims', wide: 2.4, cell: (row) => whole(row.unexposedClaims) },
      { head: 'age bands', wide: 3.3, cell: (row) => whole(row.strata) },
      {
        head: 'times as likely',
        wide: 4.3,
        cell: (row) => orDash(row.riskRatio, (ratio) => decimals(ratio, 2)),
      },
      { head: '95 % interval', wide: 4.2, cell: (row) => between(row.lower, row.upper, 2) },
    ],
    pooled,
    { size: 8 },
  );
  const strata = pooled.flatMap(({ name, tables }) =>
    tables.map((stratum) => ({ ...stratum, name })),
  );
  if (strata.length === 0) return;
  heading(paper, 'Process checks by age of the car', 'What the pooled figures are made of.');
  table(
    paper,
    [
      { head: 'check', wide: 8, align: 'left', cell: (row) => row.name },
      { head: 'age, years', wide: 3, align: 'left', cell: (row) => row.ageBand.replace('-', '–') },
      { head: 'missed: cars', wide: 3, cell: (row) => whole(row.exposedCars) },
      { head: 'claims', wide: 3, cell: (row) => whole(row.exposedClaims) },
      { head: 'done: cars', wide: 3, cell: (row) => whole(row.unexposedCars) },
      { head: 'claims', wide: 3, cell: (row) => whole(row.unexposedClaims) },
    ],
    strata,
    { size: 8 },
  );
}

/** Where claims come from. */
export function causeTable(paper: Paper, { causes }: WarrantyAnswer, { sign }: TableWords): void {
  heading(paper, 'Causes', 'Of the claims that count.');
  table(
    paper,
    [
      { head: 'cause', wide: 4, align: 'left', cell: (row) => CAUSE_WORDS[row.cause] },
      { head: 'claims', wide: 2, cell: (row) => whole(row.claims) },
      { head: `cost, ${sign}`, wide: 2, cell: (row) => exactMoney(row.costCents) },
    ],
    causes,
    { width: paper.width * 0.6 },
  );
}

/** The rates that expectations are made of. */
export function ratesTable(
  paper: Paper,
  rates: readonly ExpectedRate[],
  packageOf: (code: string) => string,
): void {
  heading(
    paper,
    'Rates that expectations are made of',
    'The whole network’s claims per car-year by package, age of the car when finished and year in service.',
  );
  table(
    paper,
    [
      { head: 'package', wide: 5, align: 'left', cell: (row) => packageOf(row.package) },
      { head: 'age, years', wide: 3, align: 'left', cell: (row) => row.ageBand.replace('-', '–') },
      { head: 'year in service', wide: 3, cell: (row) => whole(row.yearInService) },
      { head: 'claims', wide: 3, cell: (row) => orDash(row.claims, whole) },
      {
        head: 'car-years',
        wide: 4,
        cell: (row) => orDash(row.carYears, (years) => decimals(years, 2)),
      },
      {
        head: 'per 1,000',
        wide: 3,
        cell: ({ claims, carYears }) =>
          claims === null || !carYears ? '–' : decimals((1000 * claims) / carYears, 2),
      },
    ],
    rates,
    { size: 8, width: paper.width * 0.8 },
  );
}

function sumOf<Row>(rows: readonly Row[], value: (row: Row) => number): number {
  return rows.reduce((sum, row) => sum + value(row), 0);
}
