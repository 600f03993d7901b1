import type { OverrunAnswer, OverrunGroup, OverrunGrouping } from '#shared/contracts/overrun';
import type { CellLink, Column } from '../../ui/data-table/column';
import { formatCount } from '../../ui/format';
import {
  GROUPING_COLUMN,
  groupName,
  intervalText,
  noFigureText,
  type OverrunWords,
  ratioText,
} from './overrun-words';

/** Leads to the cars of a group; none for stages, which every car has. */
export type GroupLink = (group: OverrunGroup) => CellLink | undefined;

/** Columns of a table of groups, its total row taken from the overall figures. */
export function groupColumns(
  by: OverrunGrouping,
  { overall }: OverrunAnswer,
  words: OverrunWords,
  linkOf?: GroupLink,
): readonly Column<OverrunGroup>[] {
  return [
    {
      key: 'group',
      label: GROUPING_COLUMN[by],
      text: ({ key }) => groupName(by, key, words),
      link: linkOf,
      total: 'all',
    },
    whole('cars', 'Cars', ({ cars }) => cars, formatCount(overall.cars)),
    whole(
      'estimated',
      'Estimated, h',
      (group) => group.estimatedMinutes / 60,
      formatCount(overall.estimatedMinutes / 60),
    ),
    whole(
      'worked',
      'Worked, h',
      (group) => group.actualMinutes / 60,
      formatCount(overall.actualMinutes / 60),
    ),
    {
      key: 'over',
      label: 'Over',
      kind: 'number',
      strong: ({ ratio }) => ratio !== null,
      text: (group) =>
        group.ratio === null
          ? noFigureText(group.estimatedMinutes, group.cars)
          : ratioText(group.ratio),
      muted: ({ ratio }) => ratio === null,
      sortBy: ({ ratio }) => ratio,
      total: overall.ratio === null ? '' : ratioText(overall.ratio),
    },
    {
      key: 'interval',
      label: '95 %',
      kind: 'number',
      text: interval,
      total: interval(overall),
    },
    share('median', 'Half within', ({ median }) => median, overall.median),
    share('allowance', 'Allowance, 8 of 10 within', ({ p80 }) => p80, overall.p80),
    share('p95', '19 of 20 within', ({ p95 }) => p95, overall.p95),
  ];
}

function interval({
  ratio,
  ratioStandardError,
}: Pick<OverrunGroup, 'ratio' | 'ratioStandardError'>): string {
  return ratio === null || ratioStandardError === null
    ? ''
    : intervalText(ratio, ratioStandardError);
}

function whole(
  key: string,
  label: string,
  value: (group: OverrunGroup) => number,
  total: string,
): Column<OverrunGroup> {
  return {
    key,
    label,
    kind: 'number',
    text: (group) => formatCount(value(group)),
    sortBy: value,
    total,
  };
}

function share(
  key: string,
  label: string,
  value: (group: OverrunGroup) => number | null,
  total: number | null,
): Column<OverrunGroup> {
  const text = (ratio: number | null): string => (ratio === null ? '' : ratioText(ratio));
  return {
    key,
    label,
    kind: 'number',
    text: (group) => text(value(group)),
    sortBy: value,
    total: text(total),
  };
}
