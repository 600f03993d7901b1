import type { Waiting } from '#db/queries/digests';
import type { MarginAnswer, MarginWeek } from '#shared/contracts/margin';
import type { Stage } from '#shared/domain/vocabulary';
import type { Digest, DigestBlock, DigestPicture } from './digest';
import { counted, day, daysApart, inList, percent, weekWords } from './in-words';
import { sayKept } from './say-kept';
import { sayLabour } from './say-labour';

/** What is known of a branch's last whole week. */
export interface WeekFigures {
  /** `2026-W05` */
  week: string;
  today: string;
  branch: string;
  branchName: string;
  /** The week and those before it, oldest first. */
  weeks: readonly MarginWeek[];
  limits: MarginAnswer['limits'];
  targetMarginShare: number | null;
  /** Billed cars of the week with all their costs. */
  costed: number;
  labour: WeekLabour;
  waiting: Waiting;
}

/** Labour of the week's cars that have an estimate. */
export interface WeekLabour {
  cars: number;
  estimatedMinutes: number;
  actualMinutes: number;
  stages: readonly { stage: Stage; overMinutes: number }[];
}

/** The Monday mail of a site manager; nothing where none of their branches has anything to say. */
export function weekDigest(branches: readonly WeekFigures[]): Digest | undefined {
  const told = branches.filter(hasSomething);
  const [first] = told;
  if (!first) return undefined;
  const week = weekWords(first.week);
  const names = told.length > 3 ? `${told.length} branches` : inList(told.map(nameOf));
  return {
    subject: `${week}: ${names}`,
    opening: `Your week in three sentences, as it stood on ${day(first.today)}.`,
    blocks: told.map(blockOf),
  };
}

/** Whether a car was finished in the week or anything waits. */
function hasSomething({ weeks, waiting }: WeekFigures): boolean {
  const { unbilled, dangerousDue, signals } = waiting;
  return (weeks.at(-1)?.jobs ?? 0) + unbilled + dangerousDue + signals > 0;
}

function blockOf(figures: WeekFigures): DigestBlock {
  const { branch, branchName, week, waiting } = figures;
  return {
    heading: `${branchName}, ${weekWords(week)}`,
    sentences: [sayKept(figures), sayLabour(figures.labour), sayWaiting(waiting, figures.today)],
    lists: [],
    picture: pictureOf(figures),
    caution:
      waiting.dangerousDue > 0
        ? 'A car with rot left where it bears load may not be fit for the road: its owner has to be told in writing. What must be repaired, and by whom, your local inspection rules decide.'
        : null,
    path: `/this-week?week=${week}&branch=${encodeURIComponent(branch)}`,
    pathWords: 'See the week and its cars',
  };
}

function sayWaiting({ unbilled, oldestUnbilledOn, dangerousDue, signals }: Waiting, today: string) {
  const oldest =
    oldestUnbilledOn === null ? '' : ` (the oldest for ${daysApart(oldestUnbilledOn, today)})`;
  const parts = [
    ...(dangerousDue > 0
      ? [counted(dangerousDue, 'dangerous come-back due', 'dangerous come-backs due')]
      : []),
    ...(unbilled > 0
      ? [`${counted(unbilled, 'car', 'cars')} finished and not yet billed${oldest}`]
      : []),
    ...(signals > 0 ? [counted(signals, 'open signal', 'open signals')] : []),
  ];
  if (parts.length === 0) {
    return 'Nothing waits: every car is billed, no dangerous come-back is due and no signal is open.';
  }
  return `Waiting for you: ${inList(parts)}.`;
}

/** The last weeks, each with its margin as a bar and a number, and in words where it stood outside its usual range. */
function pictureOf({ weeks, limits }: WeekFigures): DigestPicture {
  const longest = Math.max(0.01, ...weeks.map((week) => week.marginShare ?? 0));
  return {
    caption: limits
      ? `Margin of the last ${weeks.length} weeks; usual is ${percent(limits.lower)} to ${percent(limits.upper)}`
      : `Margin of the last ${weeks.length} weeks`,
    columns: ['Week', 'Margin', 'Cars', ''],
    rows: weeks.map(({ week, marginShare, jobs, signal }) => ({
      cells: [
        weekWords(week),
        marginShare === null ? '–' : percent(marginShare),
        counted(jobs, 'car', 'cars'),
        signal === null ? '' : STANDING[signal],
      ],
      bar: marginShare === null || marginShare <= 0 ? null : marginShare / longest,
    })),
  };
}

const STANDING: Readonly<Record<NonNullable<MarginWeek['signal']>, string>> = {
  outside_low: 'below usual',
  outside_high: 'above usual',
  run_low: 'eight or more below the middle',
  run_high: 'eight or more above the middle',
};

function nameOf({ branchName }: WeekFigures): string {
  return branchName;
}
