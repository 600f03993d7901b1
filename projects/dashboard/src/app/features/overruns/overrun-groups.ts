import type { OverrunAnswer, OverrunGroup } from '#shared/contracts/overrun';
import type { DotIntervalInput } from '../../charts/dot-interval/dot-interval-input';
import type { QuantileStripInput } from '../../charts/quantile-strip/quantile-strip-input';
import type { Column } from '../../ui/data-table/column';
import { formatCount } from '../../ui/format';
import { intervalRow, RATIO_MARKS } from './interval-rows';
import { type GroupLink, groupColumns } from './overrun-table';
import {
  type Grouping,
  GROUPING_TITLES,
  groupName,
  noFigureText,
  type OverrunWords,
  ratioText,
} from './overrun-words';

/** One grouping: ratios against all cars, spread of single cars, and the table behind both. */
export interface GroupPictures {
  readonly heading: string;
  readonly ratios: DotIntervalInput;
  readonly ratiosNote: string;
  readonly spread: QuantileStripInput;
  readonly spreadNote: string;
  readonly columns: readonly Column<OverrunGroup>[];
  readonly rows: readonly OverrunGroup[];
  readonly csv: string;
}

/** Turns the answer by one grouping into its pictures and rows. `linkOf` leads to the cars of a group. */
export function groupPictures(
  answer: OverrunAnswer,
  by: Grouping,
  words: OverrunWords,
  linkOf: GroupLink,
): GroupPictures {
  const { overall, groups } = answer;
  const reference = overall.ratio ?? 1;
  const nameOf = (group: OverrunGroup): string => groupName(by, group.key, words);
  return {
    heading: GROUPING_TITLES[by],
    ratios: {
      summary: summarise(answer, nameOf, reference),
      rows: groups.map((group) => intervalRow(group, nameOf(group), { reference, chosen: false })),
      scale: 'log',
      reference,
      marks: marksAround(reference),
    },
    ratiosNote: `Over the estimate, dot and 95 % interval; the line is all cars, ${ratioText(reference)}`,
    spread: {
      summary: summariseSpread(groups, nameOf),
      rows: groups.map((group) => ({
        key: group.key,
        label: nameOf(group),
        count: formatCount(group.cars),
        median: group.median,
        p80: group.p80,
        p95: group.p95,
        text:
          group.allowance === null
            ? noFigureText(group.estimatedMinutes, group.cars)
            : ratioText(group.allowance + 1),
        chosen: false,
      })),
      scale: 'log',
      reference: 1,
      marks: RATIO_MARKS,
    },
    spreadNote: 'Half of the cars by the dot, 8 of 10 by the bar’s end, 19 of 20 by the line’s',
    columns: groupColumns(by, answer, words, linkOf),
    rows: groups,
    csv:
      groups.length === 1 ? 'CSV of this row' : `CSV of these ${formatCount(groups.length)} rows`,
  };
}

function marksAround(reference: number): { value: number; text: string }[] {
  return [
    { value: reference, text: `all ${ratioText(reference)}` },
    ...RATIO_MARKS.filter(({ value }) => value !== reference),
  ];
}

function summarise(
  { groups }: OverrunAnswer,
  nameOf: (group: OverrunGroup) => string,
  reference: number,
): string {
  const said = groups.map((group) => {
    const { text, word } = intervalRow(group, '', { reference, chosen: false });
    return `${nameOf(group)} ${[text, word].filter(Boolean).join(' ')}`;
  });
  return `Time over the estimate, all cars ${ratioText(reference)}: ${said.join('; ')}.`;
}

function summariseSpread(
  groups: readonly OverrunGroup[],
  nameOf: (group: OverrunGroup) => string,
): string {
  const said = groups.map((group) =>
    group.allowance === null
      ? `${nameOf(group)} ${noFigureText(group.estimatedMinutes, group.cars)}`
      : `${nameOf(group)} ${ratioText(group.allowance + 1)}`,
  );
  return `Allowance that 8 of 10 cars would have finished within: ${said.join('; ')}.`;
}
