import { largestStep } from '#shared/domain/bridge';
import type { AnswerPart } from '../../ui/answer/answer';
import {
  formatCars,
  formatMoney,
  formatShare,
  formatShareRange,
  formatWeek,
  formatWeekNumber,
} from '../../ui/format';
import type { Standing, WeekAnswers } from './week-standing';
import {
  countAtStart,
  missingCostWords,
  ordinal,
  points,
  STEP_WORDS,
  type WeekWords,
} from './week-words';

/** The page's answer: what the week kept, and why or what to do. */
export interface WeekAnswer {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
}

/** Says the week in one sentence with its figure, and in a second one what moved it and what is still unbilled. */
export function answerWeek(answers: WeekAnswers, standing: Standing, words: WeekWords): WeekAnswer {
  const why = whyParts(answers, standing, words);
  const second = [...why, ...unbilledSentence(answers.unbilled.jobs, standing)].join(' ');
  return { sentence: firstSentence(answers, standing, words), second: second ? [second] : [] };
}

function firstSentence(answers: WeekAnswers, standing: Standing, words: WeekWords): AnswerPart[] {
  const { figures, week } = standing;
  switch (standing.kind) {
    case 'to_come':
      return [`${formatWeek(week)} is still to come.`];
    case 'no_cars':
      return [`No car was finished in ${lowerFirst(formatWeek(week))}.`];
    case 'unbilled_only':
      return [
        `${formatWeekNumber(week)} finished `,
        { figure: formatCars(figures.unbilled) },
        figures.unbilled === 1
          ? ' and has not billed it yet.'
          : ' and has billed none of them yet.',
      ];
    case 'uncosted':
      return [`What ${lowerFirst(formatWeekNumber(week))} kept cannot be said: a cost is missing.`];
    case 'billed_nothing':
      return [
        `${formatWeekNumber(week)} billed `,
        { figure: formatMoney(0, words.currency) },
        { quiet: ` (${formatCars(standing.cars)})` },
        ', so no share of it can be kept.',
      ];
    default:
      return [...keptParts(answers, standing), ...rangeParts(answers, standing, words)];
  }
}

function keptParts(answers: WeekAnswers, { kind, week, figures, cars }: Standing): AnswerPart[] {
  const share = figures.marginShare ?? 0;
  const decimals = decimalsFor(answers, share);
  return [
    `${formatWeekNumber(week)} ${kind === 'so_far' ? 'has kept ' : 'kept '}`,
    { figure: formatShare(share, decimals) },
    ' of what it billed ',
    { quiet: `(${formatCars(cars)})` },
  ];
}

function rangeParts(answers: WeekAnswers, standing: Standing, words: WeekWords): string[] {
  const { limits } = answers.chart;
  if (standing.kind === 'so_far') return [' so far.'];
  if (!limits) return ['.'];
  const decimals = decimalsFor(answers, standing.figures.marginShare ?? 0);
  const range = `${words.whose} usual ${formatShareRange(limits.lower, limits.upper, decimals)}`;
  const side = standing.kind === 'run_low' ? 'below' : 'above';
  switch (standing.kind) {
    case 'below':
      return [`, below ${range}.`];
    case 'above':
      return [`, above ${range}.`];
    case 'run_low':
    case 'run_high':
      return [
        `, inside ${range}, but the ${ordinal(standing.running)} week running ${side} the centre of ${formatShare(limits.centre)}.`,
      ];
    default:
      return [`, inside ${range}.`];
  }
}

/** One decimal where whole per cent would read as a contradiction: 46 % "above 31–46 %". */
function decimalsFor({ chart }: WeekAnswers, share: number): number {
  if (!chart.limits) return 0;
  const { lower, upper } = chart.limits;
  const outside = share < lower || share > upper;
  const reads = formatShare(share);
  return outside && (reads === formatShare(lower) || reads === formatShare(upper)) ? 1 : 0;
}

function whyParts(answers: WeekAnswers, standing: Standing, words: WeekWords): string[] {
  const missing = answers.week.missingCosts;
  switch (standing.kind) {
    case 'to_come':
      return ['Choose an earlier week in the line above.'];
    case 'no_cars':
      return answers.chart.weeks.some(({ jobs }) => jobs > 0)
        ? ['Choose another week, or more branches, packages or body types, in the line above.']
        : ['Nor in the weeks before it, in what is chosen in the line above.'];
    case 'unbilled_only':
      return ['Bill them below, and the week has its margin.'];
    case 'uncosted':
      return [
        `Head office has to set ${missingCostWords(missing, words)}; then every figure here is counted anew.`,
      ];
    case 'billed_nothing':
      return [];
    default:
      return [...stepSentence(answers, standing, words), ...cautions(answers, standing, words)];
  }
}

function stepSentence({ week }: WeekAnswers, standing: Standing, words: WeekWords): string[] {
  const { bridge } = week;
  if (bridge.cars === 0) {
    return [
      'None of these cars has both an estimate and a norm, so there is no bridge to explain it.',
    ];
  }
  const largest = largestStep(bridge);
  const share = largest ? largest.cents / standing.figures.revenueCents : 0;
  if (!largest || Math.round(Math.abs(share) * 100) === 0) {
    return ['No step moved it by as much as a point.'];
  }
  const step = upperFirst(STEP_WORDS[largest.step]);
  const money = formatMoney(Math.abs(largest.cents), words.currency);
  return [`${step} ${largest.cents < 0 ? 'took' : 'added'} ${points(share)} (${money}).`];
}

function cautions(answers: WeekAnswers, standing: Standing, words: WeekWords): string[] {
  const said: string[] = [];
  if (standing.kind === 'so_far') said.push('The week is not over, so it is not judged yet.');
  if (standing.kind === 'no_limits') {
    said.push('What is usual here can be said once 8 earlier weeks are billed.');
  }
  if (standing.leftOut > 0) {
    const cars = `${countAtStart(standing.leftOut)} billed ${standing.leftOut === 1 ? 'car is' : 'cars are'}`;
    said.push(
      `${cars} left out until head office sets ${missingCostWords(answers.week.missingCosts, words)}.`,
    );
  }
  return said;
}

function unbilledSentence(cars: number, { kind, cars: billed, figures }: Standing): string[] {
  if (kind === 'unbilled_only') {
    // The first sentence has said those of the week.
    const earlier = cars - figures.unbilled;
    return earlier > 0 ? [`${waiting(earlier, 'from earlier')} finished and not yet billed.`] : [];
  }
  return cars > 0
    ? [`${waiting(cars, billed > 0 ? 'more' : '')} finished and not yet billed.`]
    : [];
}

function waiting(cars: number, which: '' | 'more' | 'from earlier'): string {
  const count = countAtStart(cars);
  const noun = cars === 1 ? 'car' : 'cars';
  const are = cars === 1 ? 'is' : 'are';
  if (which === 'more') return `${count} more ${noun} ${are}`;
  return [count, noun, which, are].filter(Boolean).join(' ');
}

function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}

function upperFirst(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
