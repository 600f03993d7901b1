import type { ProcessRisk, WarrantyAnswer } from '#shared/contracts/warranty';
import type { Check } from '#shared/domain/vocabulary';
import type { DotIntervalInput, IntervalRow } from '../../charts/dot-interval/dot-interval-input';
import type { Column } from '../../ui/data-table/column';
import { formatCount, formatShare } from '../../ui/format';
import { ratioRange, ratioText, standingText, standOf } from './warranty-words';

/** A way of working, with what it does to the risk of a claim. */
export interface ProcessRow extends Omit<ProcessRisk, 'check'> {
  readonly key: Check | 'thin_product';
  /** What was missed: "liners left on". */
  readonly missed: string;
  readonly missedCars: number;
  readonly missedClaims: number;
  readonly doneCars: number;
  readonly doneClaims: number;
}

/** Checks and product against claims, as picture and table. */
export interface ProcessRows {
  readonly chart: DotIntervalInput;
  readonly columns: readonly Column<ProcessRow>[];
  readonly rows: readonly ProcessRow[];
}

/** What a check answered with no means for the car. */
const MISSED_WORDS: Readonly<Record<Check, string>> = {
  linersOff: 'arch liners left on',
  bothDirections: 'voids sprayed from one end',
  brakesCovered: 'brakes not covered',
  driedOut: 'cavities not dried out',
  drainsClear: 'drain holes left closed',
  primerCured: 'primer not cured',
};

const MARKS = [
  { value: 0.5, text: 'half' },
  { value: 1, text: 'as likely' },
  { value: 2, text: 'twice' },
  { value: 4, text: 'four times' },
];
/** Room for what clearly matters; a check missed on few cars is cut. */
const REACH = 5;

/** Turns the checks, and product that went on thin, into one picture. Pure. */
export function processRows(answer: WarrantyAnswer): ProcessRows {
  const rows = [
    ...answer.process.map((risk) => rowOf(risk.check, MISSED_WORDS[risk.check], risk)),
    rowOf('thin_product', 'under 70 % of the norm', answer.thinProduct),
  ];
  return {
    rows,
    columns: COLUMNS,
    chart: {
      summary: summaryOf(rows),
      rows: rows.map(intervalRow),
      scale: 'log',
      reference: 1,
      reach: REACH,
      marks: MARKS,
      look: 'ledger',
    },
  };
}

function rowOf(
  key: ProcessRow['key'],
  missed: string,
  { tables, riskRatio, lower, upper, strata }: Omit<ProcessRisk, 'check'>,
): ProcessRow {
  const sum = (of: 'exposedCars' | 'exposedClaims' | 'unexposedCars' | 'unexposedClaims') =>
    tables.reduce((total, table) => total + table[of], 0);
  return {
    ...{ key, missed, tables, riskRatio, lower, upper, strata },
    missedCars: sum('exposedCars'),
    missedClaims: sum('exposedClaims'),
    doneCars: sum('unexposedCars'),
    doneClaims: sum('unexposedClaims'),
  };
}

function intervalRow(row: ProcessRow): IntervalRow {
  const stand = standOf(row);
  return {
    key: row.key,
    label: row.missed,
    count: `${formatCount(row.missedCars)} of ${formatCount(row.missedCars + row.doneCars)}`,
    value: row.riskRatio,
    lower: row.lower,
    upper: row.upper,
    text: row.riskRatio === null ? whyNot(row) : ratioText(row.riskRatio),
    stand,
    word: stand === 'as_expected' ? '' : stand,
    chosen: false,
  };
}

/** Why there is no ratio. */
function whyNot({ missedCars, doneCars, missedClaims, doneClaims, strata }: ProcessRow): string {
  if (missedCars + doneCars === 0) return 'too few cars yet';
  if (missedCars === 0) return 'never missed';
  if (doneCars === 0) return 'never done';
  return strata > 0 && missedClaims + doneClaims === 0 ? 'no claim yet' : 'too few cars yet';
}

const claimShare = (claims: number, cars: number): string =>
  cars === 0
    ? ''
    : `${formatCount(claims)} of ${formatCount(cars)}${cars < 5 ? '' : `, ${formatShare(claims / cars, 1)}`}`;

const COLUMNS: readonly Column<ProcessRow>[] = [
  { key: 'missed', label: 'What was missed', text: ({ missed }) => missed },
  {
    key: 'exposed',
    label: 'Claims where missed',
    kind: 'number',
    text: ({ missedClaims, missedCars }) => claimShare(missedClaims, missedCars),
    sortBy: ({ missedCars }) => missedCars,
  },
  {
    key: 'unexposed',
    label: 'Where done',
    kind: 'number',
    text: ({ doneClaims, doneCars }) => claimShare(doneClaims, doneCars),
  },
  {
    key: 'ratio',
    label: 'Times as likely',
    kind: 'number',
    strong: ({ riskRatio }) => riskRatio !== null,
    muted: ({ riskRatio }) => riskRatio === null,
    text: (row) => (row.riskRatio === null ? whyNot(row) : standingText(row.riskRatio, row)),
    sortBy: ({ riskRatio }) => riskRatio,
  },
  {
    key: 'interval',
    label: '95 %',
    kind: 'number',
    text: ({ lower, upper }) => ratioRange(lower, upper),
  },
];

function summaryOf(rows: readonly ProcessRow[]): string {
  const outside = rows.filter((row) => standOf(row) !== 'as_expected');
  if (outside.length === 0) return 'No way of working stands clearly apart in claims.';
  return `Claims within 24 months: ${outside
    .map(
      (row) =>
        `${row.missed} ${ratioText(row.riskRatio)} times as likely (${ratioRange(row.lower, row.upper)})`,
    )
    .join('; ')}.`;
}
