import type { AnswerPart } from '../../ui/answer/answer';
import { formatCount, formatCounted, formatMoney } from '../../ui/format';

/** What the answer is made from. */
export interface ClaimCounts {
  /** Whose claims: "Havnsund", "Whole network". */
  readonly places: string;
  /** All that match. */
  readonly claims: number;
  /** Absent where no money is shown. */
  readonly costCents: number | undefined;
  readonly currency: string;
  /** Of the scope, whatever the filters: still open, and of these waiting for head office. */
  readonly open: number;
  readonly waiting: number;
  /** The filters in force, in words. */
  readonly narrowed: readonly string[];
}

/** How many claims wait to be decided and for whom; with filters, how many fit them. */
export function answerClaims(counts: ClaimCounts): {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
} {
  return counts.narrowed.length > 0 ? narrowed(counts) : standing(counts);
}

function standing(counts: ClaimCounts) {
  const { places, claims, open, waiting } = counts;
  if (claims === 0) return { sentence: [`${places}: no claim is on record.`], second: [] };
  const sentence: AnswerPart[] =
    open === 0
      ? [`${places}: every claim is decided`, ...waitWords(waiting), '.']
      : [
          `${places}: `,
          { figure: formatCount(open) },
          open === 1 ? ' claim is open' : ' claims are open',
          ...waitWords(waiting),
          '.',
        ];
  return { sentence, second: [inAll(counts)] };
}

function narrowed(counts: ClaimCounts) {
  const { places, claims } = counts;
  const sentence: AnswerPart[] = [
    `${places}: `,
    { figure: formatCount(claims) },
    claims === 1 ? ' claim fits.' : ' claims fit.',
  ];
  const cost = costWords(counts);
  return {
    sentence,
    second: [`Only those ${counts.narrowed.join(', ')}${cost && `; together ${cost}`}.`],
  };
}

function waitWords(waiting: number): AnswerPart[] {
  if (waiting === 0) return [];
  const theirs: Exclude<AnswerPart, string> = {
    text: waitingOf(waiting),
    link: '/claims',
    query: { waiting: 'true' },
  };
  return ['; ', theirs];
}

function waitingOf(waiting: number): string {
  return `${formatCount(waiting)} ${waiting === 1 ? 'waits' : 'wait'} for head office`;
}

function inAll(counts: ClaimCounts): string {
  const cost = costWords(counts);
  const claims = formatCounted(counts.claims, 'claim is', 'claims are');
  return `In all ${claims} on record${cost && `, costing ${cost}`}.`;
}

function costWords({ costCents, currency }: ClaimCounts): string {
  return costCents === undefined ? '' : `${formatMoney(costCents, currency)} before tax`;
}
