import type { QuoteAnswer } from '#shared/contracts/quote';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatCount, formatExactMoney, formatMinutes, formatShare } from '../../ui/format';
import { carsBehind, evidenceReason, evidenceWords } from './quote-evidence';
import type { QuoteQuestion } from './quote-question';

/** What the next car is likely to take and cost, in two lines. */
export interface QuoteSentences {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
}

/** Says a quote from its answer. */
export function quoteSentences(
  answer: QuoteAnswer,
  question: QuoteQuestion,
  currency: string,
): QuoteSentences {
  const { p50Minutes, p80Minutes } = answer.labour;
  if (answer.basis.kind === 'none' || p50Minutes === null || p80Minutes === null) {
    return {
      sentence: ['There are too few cars yet to quote from.'],
      second: [
        'Nowhere in the network have 30 cars with this package been worked in three years. Quote by hand from what is seen; every job sent brings the first set nearer.',
      ],
    };
  }
  const cars = `${formatCount(answer.basis.cars)} ${evidenceWords(answer, question)}`;
  const query = carsBehind(answer, question);
  const reason = evidenceReason(answer);
  return {
    sentence: [
      { figure: formatMinutes(p50Minutes) },
      ' to ',
      { figure: formatMinutes(p80Minutes) },
      ' of labour ',
      { quiet: '(half, and four of five, of such cars were done by then)' },
      ', from ',
      ...(query ? [{ text: cars, link: '/jobs', query }] : [cars]),
      '.',
    ],
    second: [[priceWords(answer, currency), reason].filter(Boolean).join(' ')],
  };
}

/** The price, what it keeps and why, or that there is none. */
function priceWords({ priceCents, cost }: QuoteAnswer, currency: string): string {
  if (priceCents === null) return 'There is no price; see below why.';
  const price = formatExactMoney(priceCents, currency);
  if (!cost || cost.marginShare === null) return `Price before tax: ${price}.`;
  const whose = {
    asked: 'as asked',
    branch: 'the branch’s target',
    network: 'the network’s target',
  };
  const from = cost.marginFrom ? `, ${whose[cost.marginFrom]}` : '';
  const fee = cost.feeRate ? `, after the network fee of ${shareWords(cost.feeRate)}` : '';
  return `${price} before tax would keep ${shareWords(cost.marginShare)}${from}${fee}.`;
}

/** A share that a person has set, with the digits they gave it. */
export function shareWords(share: number): string {
  const perCent = share * 100;
  const decimals = [0, 1, 2].find(
    (digits) => Math.abs(perCent - Number(perCent.toFixed(digits))) < 1e-9,
  );
  return formatShare(share, decimals ?? 2);
}
