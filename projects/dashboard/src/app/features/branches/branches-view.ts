import type { BranchesAnswer } from '#shared/contracts/branches';
import type { FunnelInput } from '../../charts/funnel/funnel-input';
import type { CellLink, Column } from '../../ui/data-table/column';
import { formatCars, formatCounted, formatDate } from '../../ui/format';
import { formatMeasure } from '../../ui/measure-words';
import { type BranchWords, placedOf, VALUE_UNITS } from './branch-words';
import { answerFunnel, type FunnelSentences, referenceWords } from './funnel-answer';
import { funnelPicture } from './funnel-picture';
import { standingColumns, type StandingRow, standingRows } from './standing-rows';

/** What the page shows of an answer. */
export interface BranchesView {
  readonly answer: FunnelSentences;
  /** Whether any branch has cars that count. */
  readonly placed: boolean;
  readonly heading: string;
  readonly note: string;
  /** Absent where no branch has a place in it. */
  readonly funnel: FunnelInput | undefined;
  readonly rows: readonly StandingRow[];
  readonly columns: readonly Column<StandingRow>[];
  /** Branches that can be laid side by side, by name. */
  readonly choices: readonly { readonly code: string; readonly name: string }[];
  readonly late: string;
  /** Cars left out of money because no cost was known. */
  readonly apart: string;
}

/** Puts an answer into sentence, picture and rows. */
export function branchesView(
  answer: BranchesAnswer,
  words: BranchWords,
  { today, linkOf }: { today: string | undefined; linkOf: (branch: string) => CellLink },
): BranchesView {
  const rows = standingRows(answer, words, today);
  const late = rows.filter((row) => row.late).length;
  return {
    answer: answerFunnel(answer, words),
    placed: answer.branches.length > 0,
    heading: `Apart from what their cars lead one to expect, ${VALUE_UNITS[answer.measure]}`,
    note: noteOf(answer),
    funnel: placedOf(answer).length > 0 ? funnelPicture(answer, words) : undefined,
    rows,
    columns: standingColumns(answer, linkOf),
    choices: rows.flatMap(({ branch, name, standing }) =>
      standing ? [{ code: branch, name }] : [],
    ),
    late:
      late > 0
        ? `${formatCounted(late, 'branch has', 'branches have')} been silent for over a week.`
        : '',
    apart:
      answer.withoutCost > 0
        ? `${formatCars(answer.withoutCost)} left out: a cost is not known for their day.`
        : '',
  };
}

function noteOf(answer: BranchesAnswer): string {
  const { measure, network, period } = answer;
  const reference =
    network === null
      ? ''
      : ` The zero line is each branch’s own; ${answer.reference === 'network' ? 'the network' : 'all of them'} as counted: ${formatMeasure(measure, network)}.`;
  const years =
    measure === 'claims'
      ? ` Claims need years: cars finished since ${formatDate(period.from)}, their claims up to today.`
      : '';
  return `Allowing for age and package; each branch within its own limits. Diamond: outside the 95 % limits. ${referenceWords(answer)}${reference}${years}`;
}
