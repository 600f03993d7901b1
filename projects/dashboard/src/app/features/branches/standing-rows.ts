import type { BranchesAnswer, BranchStanding } from '#shared/contracts/branches';
import { addDays } from '#shared/domain/calendar';
import type { CellLink, Column } from '../../ui/data-table/column';
import { formatCount, formatDate, formatShortDate } from '../../ui/format';
import { formatMeasure, formatTarget, MEASURE_NAMES } from '../../ui/measure-words';
import { type BranchWords, FLAG_WORDS, signedChange, valueText } from './branch-words';

/** A branch of the scope as a row, whether it has cars or not. */
export interface StandingRow {
  readonly branch: string;
  readonly name: string;
  readonly standing: BranchStanding | undefined;
  readonly receivedThrough: string | null;
  readonly late: boolean;
}

/** Days without a job from which a branch's silence is said: a week and a weekend (common practice, no source). */
const QUIET_DAYS = 9;

/** All branches of the answer's scope by name: no order of merit. */
export function standingRows(
  answer: BranchesAnswer,
  words: BranchWords,
  today: string | undefined,
): StandingRow[] {
  const known = new Map(answer.branches.map((one) => [one.branch, one]));
  const since = today && addDays(today, -QUIET_DAYS);
  return answer.received
    .map(({ branch, receivedThrough }) => ({
      branch,
      name: words.branchName(branch),
      standing: known.get(branch),
      receivedThrough,
      late: since !== undefined && (receivedThrough === null || receivedThrough < since),
    }))
    .sort((a, b) => a.name.localeCompare(b.name, 'en'));
}

/** How far a branch's record reaches, and since when nothing came. */
export function receivedText({ receivedThrough, late }: StandingRow): string {
  if (receivedThrough === null) return 'nothing received yet';
  return late ? `nothing since ${formatDate(receivedThrough)}` : formatShortDate(receivedThrough);
}

/** The columns of the rows; `linkOf` leads to a branch's own page in the measure. */
export function standingColumns(
  { measure, branches }: BranchesAnswer,
  linkOf: (branch: string) => CellLink,
): readonly Column<StandingRow>[] {
  const name = MEASURE_NAMES[measure];
  const number = (
    key: string,
    label: string,
    text: (row: BranchStanding) => string,
    sortBy: (row: BranchStanding) => number | null,
  ): Column<StandingRow> => ({
    key,
    label,
    kind: 'number',
    text: ({ standing }) => (standing ? text(standing) : ''),
    sortBy: ({ standing }) => (standing ? sortBy(standing) : null),
  });
  const range = (lower: number | null, upper: number | null): string =>
    lower === null || upper === null
      ? ''
      : `${formatMeasure(measure, lower)} to ${formatMeasure(measure, upper)}`;
  const claims: readonly Column<StandingRow>[] =
    measure === 'claims'
      ? [
          number(
            'claims',
            'Claims',
            ({ claims }) => (claims === null ? '' : formatCount(claims)),
            (row) => row.claims,
          ),
        ]
      : [];
  return [
    {
      key: 'branch',
      label: 'Branch',
      text: (row) => row.name,
      sortBy: (row) => row.name,
      link: ({ branch }) => linkOf(branch),
    },
    {
      key: 'cars',
      label: 'Cars',
      kind: 'number',
      text: ({ standing }) => formatCount(standing?.cars ?? 0),
      sortBy: ({ standing }) => standing?.cars ?? 0,
    },
    ...claims,
    {
      ...number(
        'value',
        measure === 'claims'
          ? 'Per 1,000 car-years'
          : `${name.charAt(0).toUpperCase()}${name.slice(1)}`,
        (row) => valueText(measure, row.value),
        (row) => row.value,
      ),
      strong: true,
    },
    number(
      'expected',
      'Expected',
      (row) => valueText(measure, row.expected),
      (row) => row.expected,
    ),
    number(
      'apart',
      'Apart',
      ({ value, expected }) =>
        value === null || expected === null ? '' : signedChange(measure, value - expected),
      ({ value, expected }) => (value === null || expected === null ? null : value - expected),
    ),
    {
      ...number(
        'limits95',
        '95 % limits',
        (row) => range(row.lower95, row.upper95),
        () => null,
      ),
      sortBy: undefined,
    },
    {
      ...number(
        'limits998',
        '99.8 % limits',
        (row) => range(row.lower998, row.upper998),
        () => null,
      ),
      sortBy: undefined,
    },
    {
      key: 'flag',
      label: 'Stands',
      text: ({ standing }) => (standing ? FLAG_WORDS[standing.flag] : 'no cars in this time'),
    },
    ...(branches.every(({ target }) => target === null)
      ? []
      : [
          number(
            'target',
            'Target',
            ({ target }) => (target === null ? '' : formatTarget(measure, target)),
            (row) => row.target,
          ),
        ]),
    {
      key: 'received',
      label: 'Received through',
      text: receivedText,
      sortBy: (row) => row.receivedThrough,
    },
  ];
}
