import type { ClaimFreeGroup, CurveGroup, WarrantyAnswer } from '#shared/contracts/warranty';
import type { ClaimFreeInput } from '../../charts/claim-free-curves/claim-free-input';
import { shareAxis } from '../../charts/claim-free-curves/share-axis';
import type { Column } from '../../ui/data-table/column';
import { formatCount, formatList, formatNumber, formatShareRange } from '../../ui/format';
import type { WarrantyLinks } from './warranty-links';
import { freeShare, groupName, pText, type WarrantyWords } from './warranty-words';

/** One line of the picture's table: a group at a mark of its axis. */
export interface CurveRow {
  readonly group: string;
  readonly month: number;
  readonly atRisk: number;
  readonly claims: number;
  readonly share: number | null;
  readonly lower: number | null;
  readonly upper: number | null;
}

/** The curves as picture, note and table. */
export interface CurvesPicture {
  readonly chart: ClaimFreeInput;
  readonly note: string;
  readonly columns: readonly Column<CurveRow>[];
  readonly rows: readonly CurveRow[];
  /** The log-rank test's sums, group by group, for whoever redoes it. */
  readonly sums: string;
}

/** Months between two rows of the table. */
const TABLE_STEP = 6;

/** Turns the groups into curves. Pure. */
export function curvesPicture(answer: WarrantyAnswer, words: WarrantyWords): CurvesPicture {
  const { groups, groupBy } = answer;
  const name = (key: string): string => groupName(groupBy, key, words);
  const curves = groups.map(({ key, cars, months }) => ({ key, cars, months, label: name(key) }));
  const { low, decimals } = shareAxis(curves);
  return {
    chart: {
      curves,
      summary: summaryOf(groups, name),
      shareText: freeShare,
      countText: formatCount,
    },
    note: `By months since completion, with 95 % bands. Axis starts at ${formatNumber(low * 100, decimals)}.${testWords(answer)}`,
    columns: COLUMNS,
    rows: groups.flatMap((group) => rowsOf(group, name(group.key))),
    sums: sumsOf(answer, name),
  };
}

/** Names of what curves can be told apart by, as they are read after "by". */
export const GROUP_WORDS: Readonly<Record<CurveGroup, string>> = {
  package: 'package',
  region: 'region',
  branch: 'branch',
  ageBand: 'age of the car',
  cohort: 'half-year finished',
};

/** Groupings that tell anything apart in this scope. */
export function usefulGroupings({ scope }: Pick<WarrantyAnswer, 'scope'>): CurveGroup[] {
  return [
    'package',
    ...(scope.regions.length > 1 ? (['region'] as const) : []),
    ...(scope.branches.length > 1 ? (['branch'] as const) : []),
    'ageBand',
    'cohort',
  ];
}

/** Claims a year for every 1,000 cars under warranty, with where they are listed. */
export function rateWords({ rate }: WarrantyAnswer): string {
  const { carYears, per1000, lower, upper } = rate;
  if (per1000 === null) return '';
  const range =
    lower === null || upper === null
      ? ''
      : ` (${formatNumber(lower, 1)}–${formatNumber(upper, 1)})`;
  return ` in ${formatCount(carYears)} car-years of cover: ${formatNumber(per1000, 1)} a year for every 1,000 cars${range}.`;
}

/** Where a group's claims are listed. */
export function claimsOfGroup(by: CurveGroup, key: string, links: WarrantyLinks) {
  return links.claims({ [by]: key });
}

function testWords({ logRank }: WarrantyAnswer): string {
  if (!logRank) return '';
  const how =
    logRank.p < 0.05 ? 'They differ by more than chance' : 'They differ no more than by chance';
  return ` ${how}: log-rank ${pText(logRank.p)}.`;
}

function sumsOf({ logRank }: WarrantyAnswer, name: (key: string) => string): string {
  if (!logRank) return '';
  const groups = logRank.groups.map(
    ({ key, observed, expected }) =>
      `${name(key)} ${formatCount(observed)} first claims where ${formatNumber(expected, 2)} were expected`,
  );
  return `Log-rank test: ${formatList(groups)} if all groups were alike; chi-square ${formatNumber(logRank.chiSquare, 2)} with ${formatCount(logRank.degreesOfFreedom)} degrees of freedom, ${pText(logRank.p)}.`;
}

function summaryOf(groups: readonly ClaimFreeGroup[], name: (key: string) => string): string {
  if (groups.length === 0) return 'No group has cars under warranty.';
  const told = groups.map(({ key, months, cars }) => {
    const last = months.filter(({ share }) => share !== null).at(-1);
    return last?.share == null
      ? `${name(key)}: too few cars yet (${formatCount(cars)})`
      : `${name(key)}: ${freeShare(last.share)} without a claim after ${formatCount(last.month)} months`;
  });
  return `${told.join('; ')}.`;
}

function rowsOf({ months }: ClaimFreeGroup, group: string): CurveRow[] {
  const last = months.at(-1)?.month;
  return months
    .filter(({ month }) => month % TABLE_STEP === 0 || month === last)
    .map((month) => ({
      group,
      ...month,
      // Claims of all months since the row before, so that rows add up.
      claims: months
        .filter((one) => one.month <= month.month && one.month > rowBefore(month.month))
        .reduce((sum, { claims }) => sum + claims, 0),
    }));
}

function rowBefore(month: number): number {
  return Math.floor((month - 1) / TABLE_STEP) * TABLE_STEP;
}

const COLUMNS: readonly Column<CurveRow>[] = [
  { key: 'group', label: 'Cars', text: ({ group }) => group, sortBy: ({ group }) => group },
  {
    key: 'month',
    label: 'Up to month',
    kind: 'number',
    text: ({ month }) => formatCount(month),
    sortBy: ({ month }) => month,
  },
  {
    key: 'atRisk',
    label: 'At risk',
    kind: 'number',
    text: ({ atRisk }) => formatCount(atRisk),
  },
  {
    key: 'claims',
    label: 'First claims',
    kind: 'number',
    text: ({ claims }) => formatCount(claims),
  },
  {
    key: 'share',
    label: 'Without a claim',
    kind: 'number',
    strong: ({ share }) => share !== null,
    muted: ({ share }) => share === null,
    text: ({ share }) => (share === null ? 'too few cars' : freeShare(share)),
  },
  {
    key: 'interval',
    label: '95 %',
    kind: 'number',
    text: ({ lower, upper }) =>
      lower === null || upper === null ? '' : formatShareRange(lower, upper, 1),
  },
];
