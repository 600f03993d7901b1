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

/** Marks offered to the axis, in the unit of the measure. */
const MARKS: Readonly<Record<BranchMeasure, readonly number[]>> = {
  overrun: [0.8, 0.9, 1, 1.1, 1.2, 1.3, 1.4, 1.6, 2],
  rot: [0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.8, 1],
  claims: [0, 5, 10, 20, 30, 40, 60, 80, 120],
  product: [0.6, 0.7, 0.8, 0.9, 1, 1.1, 1.2, 1.3, 1.5],
  margin: [0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.8],
};

/** Turns an effect into its picture; nothing to draw where neither side has enough cars. */
export function effectPicture(effect: ActionEffect): EffectPicture | undefined {
  const { measure, before, after, reference } = effect;
  if (before.value === null && after.value === null) return undefined;
  const unit = MEASURE_UNITS[measure];
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
      marks: thinned(
        MARKS[measure],
        [before, after].flatMap(({ value, lower, upper, expected }) => [
          value,
          lower,
          upper,
          expected,
        ]),
      ).map((value) => ({ value, text: formatMeasure(measure, value) })),
    },
    columns: columnsOf(measure),
    rows: [
      { side: 'before', ...before },
      { side: 'since', ...after },
    ],
  };
}

/** At most five marks, those that lie where something is drawn. */
function thinned(marks: readonly number[], drawn: readonly (number | null)[]): readonly number[] {
  const values = drawn.filter((one) => one !== null);
  const inside = marks.filter((one) => one >= Math.min(...values) && one <= Math.max(...values));
  const step = Math.ceil(inside.length / 5);
  return inside.filter((_one, index) => index % Math.max(1, step) === 0);
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
