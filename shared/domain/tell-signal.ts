import { MEASURE_WORDS, type FactsByKind, type FactsOf, type SignalFacts } from './signal-facts';
import type { BranchMeasure, SignalKind } from './vocabulary';

/** What of a signal its words are made from. */
export interface ToldSignal {
  kind: SignalKind;
  measure: BranchMeasure | null;
  since: string;
  strength: number;
  facts: SignalFacts;
  cars: number;
}

/** A signal in words, the same on the page and in a mail. */
export interface SignalWords {
  /** What it is, in a few words, without the branch. */
  title: string;
  /** What, since when, how strong, behind how many cars. */
  sentence: string;
}

/** Says a signal in a title and a plain sentence or two. */
export function tellSignal(signal: ToldSignal, branchName: string): SignalWords {
  // Kept as flat names and values; each kind's own are in `FactsByKind`.
  const told = { kind: signal.kind, facts: signal.facts } as unknown as FactsOf;
  switch (told.kind) {
    case 'come_backs_due':
      return tellDue(told.facts, signal, branchName);
    case 'silence':
      return tellSilence(told.facts, branchName);
    case 'odd_values':
      return tellOdd(told.facts, signal, branchName);
    case 'unbilled':
      return tellUnbilled(told.facts, signal, branchName);
    case 'week_outside':
      return tellWeek(told.facts, signal, branchName);
    case 'run_of_eight':
      return tellRun(told.facts, signal, branchName);
    case 'left_funnel':
      return tellFunnel(told.facts, signal, branchName);
    case 'drift_overrun':
      return tellOverrun(told.facts, signal, branchName);
    case 'drift_claims':
      return tellClaims(told.facts, signal, branchName);
  }
}

type Told = Pick<ToldSignal, 'measure' | 'since' | 'cars'>;

function tellDue(
  { findings, oldestDueOn, notTold }: FactsByKind['come_backs_due'],
  { cars }: Told,
  branch: string,
): SignalWords {
  const none = notTold === findings ? 'none' : `${findings - notTold}`;
  const noted = notTold > 0 ? ` That is noted for ${none} of them.` : '';
  return {
    title: 'Dangerous rot left on cars is past its day',
    sentence:
      `${branch} has ${count(findings, 'finding')} of rot where the car bears load, on ${count(cars, 'car')}, ` +
      `whose day has passed, the earliest ${longDate(oldestDueOn)}. Such a car may not be fit for the road: ` +
      `the owner must be told in writing.${noted}`,
  };
}

function tellSilence(
  { lastReceivedOn, quietDays, usualDays }: FactsByKind['silence'],
  branch: string,
): SignalWords {
  return {
    title: 'No jobs are arriving',
    sentence:
      `${branch} has sent no job since ${longDate(lastReceivedOn)}: ${count(quietDays, 'day')} on which it ` +
      `usually sends, where ${count(usualDays, 'day')} ${usualDays === 1 ? 'is' : 'are'} the most that is usual there.`,
  };
}

function tellOdd(
  { longStages, muchProduct, zeroPrices, copiedMinutes }: FactsByKind['odd_values'],
  { cars }: Told,
  branch: string,
): SignalWords {
  const found = [
    longStages > 0 && `${count(longStages, 'car')} with a stage of 20 hours or more`,
    muchProduct > 0 && `${count(muchProduct, 'car')} with 40 litres or more of one product`,
    zeroPrices > 0 && `${count(zeroPrices, 'car')} with a price or bill of nothing`,
    copiedMinutes > 0 &&
      `${copiedMinutes} cars in a row whose every stage took exactly its estimate`,
  ].filter((part): part is string => part !== false);
  return {
    title: 'Values look wrong',
    sentence: `${branch} has ${inWords(found)}: ${count(cars, 'car')} to look at and correct where they are wrong.`,
  };
}

function tellUnbilled(
  { oldestOn, oldestDays, costCents, withoutCost, currency }: FactsByKind['unbilled'],
  { cars }: Told,
  branch: string,
): SignalWords {
  const apart = withoutCost > 0 ? ` (${withoutCost} of them without known costs)` : '';
  return {
    title: 'Cars wait for their bill',
    sentence:
      `${branch} has ${count(cars, 'finished car')} without a bill after more than two weeks, the oldest since ` +
      `${longDate(oldestOn)} (${oldestDays} days). ${cars === 1 ? 'It has' : 'They have'} cost ${money(costCents, currency)} so far${apart}.`,
  };
}

function tellWeek(
  { week, side, marginShare, lower, upper }: FactsByKind['week_outside'],
  { since, cars }: Told,
  branch: string,
): SignalWords {
  return {
    title: `A week's margin ${side === 'low' ? 'below' : 'above'} the usual range`,
    sentence:
      `${branch} kept ${percent(marginShare)} of its billing in the week of ${longDate(since)} (${week}, ` +
      `${count(cars, 'billed car')}); this branch's own usual range is ${percent(lower)} to ${percent(upper)}.`,
  };
}

function tellRun(
  { side, weeks, centre }: FactsByKind['run_of_eight'],
  { since, cars }: Told,
  branch: string,
): SignalWords {
  const where = side === 'low' ? 'below' : 'above';
  return {
    title: `Margin ${where} its usual middle, week after week`,
    sentence:
      `${branch} has been ${where} this branch's own usual middle of ${percent(centre)} for ${weeks} billed weeks ` +
      `running, since the week of ${longDate(since)} (${count(cars, 'billed car')}).`,
  };
}

function tellFunnel(
  facts: FactsByKind['left_funnel'],
  { measure, since, cars }: Told,
  branch: string,
): SignalWords {
  const { side, value, expected, lower998, upper998 } = facts;
  const kind = measure ?? 'overrun';
  const say = (figure: number): string => figureOf(kind, figure);
  return {
    title: `${sentenceCase(MEASURE_WORDS[kind])} ${side === 'low' ? 'below' : 'above'} what chance explains`,
    sentence:
      `${branch} stands at ${say(value)} for ${MEASURE_WORDS[kind]} over the last 52 weeks (${count(cars, 'car')}); ` +
      `for its own mix of ages and packages ${say(expected)} is expected, and chance alone gives ${say(lower998)} to ` +
      `${say(upper998)}. First seen outside on ${longDate(since)}.`,
  };
}

function tellOverrun(
  { ratio, usualRatio, weeks }: FactsByKind['drift_overrun'],
  { since, cars }: Told,
  branch: string,
): SignalWords {
  return {
    title: 'Labour is drifting up',
    sentence:
      `Since the week of ${longDate(since)} (${count(weeks, 'week')}, ${count(cars, 'car')}) work at ${branch} takes ` +
      `${percent(ratio)} of its estimates; such cars took ${percent(usualRatio)} there before.`,
  };
}

function tellClaims(
  { claims, expected, weeks }: FactsByKind['drift_claims'],
  { since, cars }: Told,
  branch: string,
): SignalWords {
  return {
    title: 'Claims come faster than before',
    sentence:
      `Since the week of ${longDate(since)} (${count(weeks, 'week')}) ${branch} had ${count(claims, 'claim')} on ` +
      `${count(cars, 'car')}, where ${expected.toFixed(1)} would be expected of its cars under warranty.`,
  };
}

/** A figure of a measure as a sentence says it: claims per 1,000 car-years, everything else as a share. */
function figureOf(measure: BranchMeasure, value: number): string {
  return measure === 'claims' ? `${value.toFixed(1)} per 1,000 car-years` : percent(value);
}

/** One decimal, because limits of a whole percent would often read as the figure itself; none where it is 0. */
function percent(share: number): string {
  return `${(100 * share).toFixed(1).replace(/\.0$/, '')}\u2009%`;
}

function count(number: number, thing: string): string {
  return `${number} ${thing}${number === 1 ? '' : 's'}`;
}

function money(cents: number, currency: string): string {
  return new Intl.NumberFormat('en-GB', {
    style: 'currency',
    currency,
    maximumFractionDigits: 0,
  }).format(cents / 100);
}

function longDate(date: string): string {
  return new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone: 'UTC' }).format(
    new Date(`${date}T00:00:00Z`),
  );
}

function inWords(parts: readonly string[]): string {
  if (parts.length < 2) return parts.join('');
  return `${parts.slice(0, -1).join(', ')} and ${parts.at(-1)}`;
}

function sentenceCase(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
