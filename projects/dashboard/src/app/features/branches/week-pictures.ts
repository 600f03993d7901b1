import { scaleLinear } from 'd3-scale';
import type { BranchWeeks, BranchWeeksAnswer } from '#shared/contracts/branches';
import type { BranchMeasure } from '#shared/domain/vocabulary';
import type { StripMark, WeekStripInput } from '../../charts/week-strip/week-strip-input';
import type { Column } from '../../ui/data-table/column';
import { formatCount, formatCounted, formatWeek, formatWeekNumber } from '../../ui/format';
import { formatMeasure, formatTarget } from '../../ui/measure-words';
import { type BranchWords, valueText } from './branch-words';

/** One branch's small picture with its name and last value. */
export interface WeekPicture {
  readonly branch: string;
  readonly name: string;
  /** "+24 % in week 5"; claims: how many in all. */
  readonly last: string;
  readonly chart: WeekStripInput;
  readonly of: BranchWeeks;
}

/** All small pictures on one scale, the same figures as rows. */
export interface WeekPictures {
  readonly note: string;
  readonly finding: string;
  readonly pictures: readonly WeekPicture[];
  readonly columns: readonly Column<WeekPicture>[];
}

/** The weeks of an answer as small pictures, branches by name. */
export function weekPictures(answer: BranchWeeksAnswer, words: BranchWords): WeekPictures {
  const { measure } = answer;
  const scale = commonScale(answer);
  const ticks = tickValues(measure, scale);
  const pictures = answer.branches
    .map((of): WeekPicture => {
      const name = words.branchName(of.branch);
      const last = lastWords(measure, of);
      return {
        branch: of.branch,
        name,
        last,
        of,
        chart: {
          summary: [
            `${name}: ${last}${measure === 'claims' ? spreadWords(of) : ''}`,
            usualWords(measure, of),
            signalWords(of),
            targetWords(measure, of),
          ]
            .filter(Boolean)
            .join(', '),
          weeks: of.weeks.map(({ week, value, signal }) => ({ week, value, mark: markOf(signal) })),
          look: measure === 'claims' ? 'bars' : 'line',
          usual: of.limits,
          target: measure === 'claims' ? null : of.target,
          scale,
          ticks,
        },
      };
    })
    .sort((a, b) => a.name.localeCompare(b.name, 'en'));
  return {
    note: noteOf(answer, pictures),
    finding: findingOf(measure, pictures),
    pictures,
    columns: columnsOf(measure),
  };
}

function columnsOf(measure: BranchMeasure): readonly Column<WeekPicture>[] {
  const isClaims = measure === 'claims';
  return [
    { key: 'branch', label: 'Branch', text: ({ name }) => name, sortBy: ({ name }) => name },
    {
      key: 'last',
      label: isClaims ? 'Claims' : 'Last week with a value',
      text: ({ last }) => last,
    },
    ...(isClaims
      ? []
      : ([
          { key: 'usual', label: 'Its usual range', text: ({ of }) => rangeText(measure, of) },
          { key: 'signals', label: 'Outside, or in a run', text: ({ of }) => signalWords(of) },
          {
            key: 'target',
            label: 'Target',
            kind: 'number',
            text: ({ of }) => (of.target === null ? '' : formatTarget(measure, of.target)),
          },
        ] satisfies readonly Column<WeekPicture>[])),
  ];
}

function noteOf(
  { measure, period, branches }: BranchWeeksAnswer,
  pictures: readonly WeekPicture[],
): string {
  const weeks = branches[0]?.weeks ?? [];
  const [first, last] = [weeks[0], weeks.at(-1)];
  const span =
    first && last ? `${formatWeek(first.week)} to ${formatWeek(last.week)}` : period.from;
  if (measure === 'claims') {
    return `${span}, claims by the week in which they were made, whenever the car was finished.`;
  }
  const target = pictures.some(({ of }) => of.target !== null)
    ? ' The dotted line is the target, set by people and no limit.'
    : '';
  return `${span}, all on one scale. The band is each branch’s own usual range, from its weeks before. Diamond: a week outside it; triangle: eight or more on one side.${target}`;
}

function findingOf(measure: BranchMeasure, pictures: readonly WeekPicture[]): string {
  if (measure === 'claims') {
    const all = pictures.reduce((sum, { of }) => sum + claimsOf(of), 0);
    return `${formatCounted(all, 'claim', 'claims')} at ${formatCounted(pictures.length, 'branch', 'branches')}.`;
  }
  const marked = pictures.filter(({ of }) => of.weeks.some(({ signal }) => signal !== null));
  if (marked.length === 0) return 'No week lay outside its branch’s own usual range.';
  return `${formatCounted(marked.length, 'branch', 'branches')} of ${formatCount(pictures.length)} had weeks outside their own usual range or in a run: ${marked
    .map(({ name, of }) => `${name} ${signalWords(of)}`)
    .join('; ')}.`;
}

/** How claims lie over the weeks. */
function spreadWords({ weeks }: BranchWeeks): string {
  const most = Math.max(0, ...weeks.map(({ value }) => value ?? 0));
  return ` in ${formatCounted(weeks.length, 'week', 'weeks')}, at most ${formatCount(most)} in one`;
}

function lastWords(measure: BranchMeasure, of: BranchWeeks): string {
  if (measure === 'claims') return formatCounted(claimsOf(of), 'claim', 'claims');
  const last = [...of.weeks].reverse().find(({ value }) => value !== null);
  return last
    ? `${valueText(measure, last.value)} in ${formatWeekNumber(last.week).toLowerCase()}`
    : 'too few cars in any week';
}

function claimsOf({ weeks }: BranchWeeks): number {
  return weeks.reduce((sum, { value }) => sum + (value ?? 0), 0);
}

function rangeText(measure: BranchMeasure, { limits }: BranchWeeks): string {
  return limits
    ? `${formatMeasure(measure, limits.lower)} to ${formatMeasure(measure, limits.upper)}, centre ${formatMeasure(measure, limits.centre)}`
    : 'not known before 8 weeks';
}

function usualWords(measure: BranchMeasure, of: BranchWeeks): string {
  return of.limits ? `usual range ${rangeText(measure, of)}` : '';
}

function targetWords(measure: BranchMeasure, { target }: BranchWeeks): string {
  return target === null || measure === 'claims' ? '' : `target ${formatTarget(measure, target)}`;
}

/** "2 weeks outside, 3 in a run"; empty where there is none. */
function signalWords({ weeks }: BranchWeeks): string {
  const outside = weeks.filter(({ signal }) => signal?.startsWith('outside')).length;
  const runs = weeks.filter(({ signal }) => signal?.startsWith('run')).length;
  return [
    outside > 0 ? `${formatCounted(outside, 'week', 'weeks')} outside` : '',
    runs > 0 ? `${formatCounted(runs, 'week', 'weeks')} in a run` : '',
  ]
    .filter(Boolean)
    .join(', ');
}

function markOf(signal: BranchWeeks['weeks'][number]['signal']): StripMark {
  if (signal === null) return 'plain';
  return signal === 'run_low' || signal === 'run_high' ? signal : 'outside';
}

/** One scale for all: from the least to the greatest of values, usual ranges and targets; counts begin at none. */
function commonScale({ measure, branches }: BranchWeeksAnswer): [number, number] {
  const all = branches.flatMap(({ weeks, limits, target }) => [
    ...weeks.flatMap(({ value }) => value ?? []),
    ...(limits ? [limits.lower, limits.upper] : []),
    ...(target === null || measure === 'claims' ? [] : [target]),
  ]);
  if (measure === 'claims') return [0, Math.max(1, ...all)];
  const low = Math.min(...all, Infinity);
  const high = Math.max(...all, -Infinity);
  return low < high
    ? [low, high]
    : [low === Infinity ? 0 : low - 0.1, high === -Infinity ? 1 : high + 0.1];
}

function tickValues(
  measure: BranchMeasure,
  scale: [number, number],
): { value: number; text: string }[] {
  const ticks = scaleLinear(scale, [0, 1]).ticks(3);
  return ticks
    .filter((tick) => measure !== 'claims' || Number.isInteger(tick))
    .map((value) => ({
      value,
      text: measure === 'claims' ? formatCount(value) : formatMeasure(measure, value),
    }));
}
