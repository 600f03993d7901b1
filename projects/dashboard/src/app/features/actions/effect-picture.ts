import type { ActionEffect, WatchedSide } from '#shared/contracts/actions';
import type { BranchMeasure } from '#shared/domain/vocabulary';
import type { DotIntervalInput, IntervalRow } from '../../charts/dot-interval/dot-interval-input';
import type { Column } from '../../ui/data-table/column';
import { formatCars, formatCount, formatDateRange } from '../../ui/format';
import { formatMeasure, MEASURE_UNITS } from '../../ui/measure-words';

/** One side as the table has it. */
export interface EffectRow extends WatchedSide {
  readonly side: string;
}

/** Before and after in a picture, and as a table. */
export interface EffectPicture {
  readonly heading: string;
  readonly note: string;
  readonly input: DotIntervalInput;
  readonly columns: readonly Column<EffectRow>[];
  readonly rows: readonly EffectRow[];
}

/** Turns an effect into its picture; nothing to draw where neither side has enough cars. */
export function effectPicture(effect: ActionEffect): EffectPicture | undefined {
  const { measure, before, after, reference } = effect;
  if (before.value === null && after.value === null) return undefined;
  const unit = MEASURE_UNITS[measure];
  const drawn = [before, after]
    .flatMap(({ value, lower, upper, expected }) => [value, lower, upper, expected])
    .filter((one) => one !== null);
  return {
    heading: `${unit.charAt(0).toUpperCase()}${unit.slice(1)}: before and after`,
    note: `Dot and 95 % interval as counted; tick: what ${reference === 'network' ? 'the network’s' : 'your branches’'} rates by age and package give for those cars.`,
    input: {
      summary: `${sideSentence('Before', measure, before)} ${sideSentence('After', measure, after)}`,
      rows: [
        intervalRow('before', 'Before', measure, before, false),
        intervalRow('after', 'Since', measure, after, true),
      ],
      scale: 'linear',
      reference: null,
      marks: marksBetween(measure, drawn).map((value) => ({
        value,
        text: formatMeasure(measure, value),
      })),
    },
    columns: columnsOf(measure),
    rows: [
      { side: 'before', ...before },
      { side: 'since', ...after },
    ],
  };
}

/** Distances between marks: of shares and ratios, and of claims per 1,000 car-years. */
const SHARE_STEPS = [0.02, 0.05, 0.1, 0.2, 0.5, 1, 2] as const;
const CLAIM_STEPS = [1, 2, 5, 10, 20, 50, 100, 200] as const;
const MOST_MARKS = 5;

/** Round marks where something is drawn, at most five. */
function marksBetween(measure: BranchMeasure, drawn: readonly number[]): number[] {
  const low = Math.min(...drawn);
  const high = Math.max(...drawn);
  for (const step of measure === 'claims' ? CLAIM_STEPS : SHARE_STEPS) {
    const first = Math.ceil(low / step);
    const last = Math.floor(high / step);
    if (last - first < MOST_MARKS) {
      const count = Math.max(0, last - first + 1);
      return Array.from({ length: count }, (_, at) => Number(((first + at) * step).toFixed(4)));
    }
  }
  return [];
}

function intervalRow(
  key: string,
  label: string,
  measure: BranchMeasure,
  { value, lower, upper, expected, cars }: WatchedSide,
  chosen: boolean,
): IntervalRow {
  return {
    key,
    label,
    count: formatCars(cars),
    ...{ value, lower, upper, chosen },
    tick: value === null ? null : expected,
    text: value === null ? 'too few cars yet' : formatMeasure(measure, value),
    stand: 'as_expected',
    word: '',
  };
}

function sideSentence(
  name: string,
  measure: BranchMeasure,
  { value, lower, upper, expected, cars, from, to }: WatchedSide,
): string {
  const when = `${name}, ${formatDateRange(from, to)}, ${formatCars(cars)}`;
  if (value === null) return `${when}: too few cars yet.`;
  const between =
    lower === null || upper === null
      ? ''
      : `, 95 % interval ${formatMeasure(measure, lower)} to ${formatMeasure(measure, upper)}`;
  const given = expected === null ? '' : `, where ${formatMeasure(measure, expected)} is expected`;
  return `${when}: ${formatMeasure(measure, value)}${between}${given}.`;
}

function columnsOf(measure: BranchMeasure): Column<EffectRow>[] {
  const figure = (
    key: string,
    label: string,
    of: (row: EffectRow) => number | null,
  ): Column<EffectRow> => ({
    key,
    label,
    kind: 'number',
    text: (row) => {
      const value = of(row);
      return value === null ? '' : formatMeasure(measure, value);
    },
  });
  return [
    {
      key: 'side',
      label: 'Time',
      text: ({ side }) => side,
      quiet: ({ from, to }) => formatDateRange(from, to),
    },
    { key: 'cars', label: 'Cars', kind: 'number', text: ({ cars }) => formatCount(cars) },
    figure('value', 'As counted', ({ value }) => value),
    figure('lower', 'From', ({ lower }) => lower),
    figure('upper', 'To', ({ upper }) => upper),
    figure('expected', 'Expected', ({ expected }) => expected),
  ];
}
