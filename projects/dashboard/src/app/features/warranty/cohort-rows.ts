import type { WarrantyAnswer, WarrantyCohort } from '#shared/contracts/warranty';
import type { PaidCellInput } from '../../charts/paid-and-to-come/paid-cell-input';
import { paidReach } from '../../charts/paid-and-to-come/paid-cell-layout';
import type { Column } from '../../ui/data-table/column';
import {
  currencySign,
  formatAmount,
  formatCount,
  formatCounted,
  formatDate,
} from '../../ui/format';
import type { WarrantyLinks } from './warranty-links';
import {
  expectedText,
  giveOrTake,
  halfYearDays,
  halfYearWords,
  ratioRange,
  ratioText,
  standOf,
  type WarrantyWords,
} from './warranty-words';

/** A cohort as its row shows it. */
export interface CohortRow extends WarrantyCohort {
  readonly name: string;
  readonly bar: PaidCellInput;
  readonly stand: 'as_expected' | 'below' | 'above';
}

/** Paid and still to come, half-year by half-year. */
export interface CohortTable {
  readonly heading: string;
  readonly evaluated: string;
  readonly columns: readonly Column<CohortRow>[];
  readonly rows: readonly CohortRow[];
  /** The most that a bar reaches. */
  readonly reach: number;
  readonly csv: string;
  /** Half-years whose cars themselves are unlike others. */
  readonly unlike: readonly CohortNote[];
}

/** A cohort unlike others, in words, and where its claims are. */
export interface CohortNote {
  readonly cohort: string;
  readonly before: string;
  readonly claims: string;
  readonly after: string;
}

/** Turns cohorts into rows; sums come from the cents, not from the rounded rows. Pure. */
export function cohortTable(
  answer: WarrantyAnswer,
  words: WarrantyWords,
  links: WarrantyLinks,
): CohortTable {
  const rows = answer.cohorts.map((cohort): CohortRow => ({
    ...cohort,
    name: halfYearWords(cohort.cohort),
    stand: standOf(cohort),
    bar: {
      paid: cohort.latestCents,
      toCome: cohort.outstandingCents,
      giveOrTake: giveOrTake(cohort.standardErrorCents),
    },
  }));
  return {
    heading: `Paid, and still to come, ${currencySign(words.currency)}`,
    evaluated: `Evaluated on ${formatDate(answer.evaluatedOn)}.`,
    columns: columnsOf(answer, links),
    rows,
    reach: paidReach(rows.map(({ bar }) => bar)),
    csv: rows.length === 1 ? 'CSV of this row' : `CSV of these ${formatCount(rows.length)} rows`,
    unlike: rows.filter(({ stand }) => stand !== 'as_expected').map(noteOf),
  };
}

function columnsOf(
  { cohorts, total }: WarrantyAnswer,
  links: WarrantyLinks,
): readonly Column<CohortRow>[] {
  const off = (cents: number | null): string => {
    const half = giveOrTake(cents);
    return half === null ? '' : formatAmount(half);
  };
  const known = cohorts.some(({ standardErrorCents }) => standardErrorCents !== null);
  return [
    { key: 'cohort', label: 'finished in', text: ({ name }) => name, total: 'all' },
    {
      key: 'cars',
      label: 'cars',
      kind: 'number',
      text: ({ cars }) => formatCount(cars),
      link: ({ cohort, cars }) => (cars === 0 ? undefined : links.cars(halfYearDays(cohort))),
      total: formatCount(cohorts.reduce((sum, { cars }) => sum + cars, 0)),
    },
    {
      key: 'paid',
      label: 'paid',
      kind: 'number',
      text: ({ latestCents }) => formatAmount(latestCents),
      link: ({ cohort, latestCents }) =>
        // Paid counts whatever was decided and whenever it was made (rule 18).
        latestCents === 0 ? undefined : links.claims({ cohort, counted: undefined }),
      total: formatAmount(total.latestCents),
    },
    {
      key: 'bar',
      label: 'paid and still to come, drawn',
      unseenLabel: true,
      text: () => '',
      total: '',
    },
    {
      key: 'toCome',
      label: 'still to come',
      kind: 'number',
      strong: true,
      text: ({ outstandingCents }) => formatAmount(outstandingCents),
      total: formatAmount(total.outstandingCents),
    },
    {
      key: 'off',
      label: 'give or take',
      kind: 'number',
      text: ({ standardErrorCents, outstandingCents }) =>
        standardErrorCents === null
          ? known || outstandingCents === 0
            ? ''
            : 'not known yet'
          : outstandingCents === 0 && standardErrorCents === 0
            ? ''
            : off(standardErrorCents),
      muted: () => true,
      total: off(total.standardErrorCents),
    },
  ];
}

function noteOf({
  cohort,
  name,
  claims,
  expected,
  ratio,
  lower,
  upper,
  stand,
}: CohortRow): CohortNote {
  return {
    cohort,
    before: `${name} stands ${stand}: `,
    claims: formatCounted(claims, 'claim', 'claims'),
    after: ` where ${expectedText(expected)} were expected of such cars (${ratioText(ratio)} times, ${ratioRange(lower, upper)}).`,
  };
}
