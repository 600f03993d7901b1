import { largestOf, type CountedWeek } from './recount-week';
import { STEPS, type Step } from './recount';

/** What *This week* must show of a week, to the last character. */
export interface SaidWeek {
  sentence: string;
  second: string;
  /** The bridge's words and amounts, from top to bottom. */
  bridge: string[];
}

const NARROW = '\u202f';
const MINUS = '\u2212';
const STEP_NAMES: Record<Step, string> = {
  price: 'Price',
  plannedLabour: 'Planned labour',
  rotLabour: 'Rot labour',
  product: 'Product',
  consumables: 'Consumables, bought-in',
  fee: 'Fee',
};
const SPELT = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine'];
const SPELT_ON = ['Ten', 'Eleven', 'Twelve'];

/** Words a counted week as the page does. `whose` is whose usual range it is: "this branch’s". */
export function sayWeek(week: CountedWeek, whose: string): SaidWeek {
  return {
    sentence: `Week ${week.number} kept ${keptAndUsual(week, whose)}.`,
    second: [sayStep(week), ...sayUnbilled(week)].join(' '),
    bridge: [
      ...['Expected', exact(week.bridge.expected)],
      ...STEPS.flatMap((step) => [STEP_NAMES[step], signed(week.bridge.steps[step])]),
      ...['Kept', exact(week.bridge.kept)],
    ],
  };
}

function keptAndUsual(
  { kept, revenue, billed, limits, running }: CountedWeek,
  whose: string,
): string {
  const share = Number(kept) / Number(revenue);
  const cars = `(${billed} ${billed === 1 ? 'car' : 'cars'})`;
  if (!limits) return `${percent(share, 0)} of what it billed ${cars}`;
  const { lower, centre, upper } = limits;
  const outside = share < lower || share > upper;
  const alike = [lower, upper].some((limit) => percent(limit, 0) === percent(share, 0));
  const decimals = outside && alike ? 1 : 0;
  const dash = lower < 0 || upper < 0 ? ' to ' : '–';
  const range = `${whose} usual ${percent(lower, decimals).replace(`${NARROW}%`, '')}${dash}${percent(upper, decimals)}`;
  const said = `${percent(share, decimals)} of what it billed ${cars}`;
  if (share < lower) return `${said}, below ${range}`;
  if (share > upper) return `${said}, above ${range}`;
  if (running < 8) return `${said}, inside ${range}`;
  const side = share < centre ? 'below' : 'above';
  return `${said}, inside ${range}, but the ${nth(running)} week running ${side} the centre of ${percent(centre, 0)}`;
}

function sayStep({ bridge, revenue }: CountedWeek): string {
  if (bridge.cars === 0) {
    return 'None of these cars has both an estimate and a norm, so there is no bridge to explain it.';
  }
  const { step, cents } = largestOf(bridge.steps);
  const name = step === 'consumables' ? 'Consumables and bought-in' : STEP_NAMES[step];
  const size = cents < 0n ? -cents : cents;
  const points = Math.round((Number(size) / Number(revenue)) * 100);
  if (points === 0) return 'No step moved it by as much as a point.';
  return `${name} ${cents < 0n ? 'took' : 'added'} ${points} ${points === 1 ? 'point' : 'points'} (€${whole(size)}).`;
}

function sayUnbilled({ unbilled, billed }: CountedWeek): string[] {
  if (unbilled === 0) return [];
  const count = [...SPELT, ...SPELT_ON][unbilled] ?? grouped(String(unbilled));
  const more = billed > 0 ? ' more' : '';
  return [`${count}${more} ${unbilled === 1 ? 'car is' : 'cars are'} finished and not yet billed.`];
}

/** A fraction as per cent: `36 %`. */
export function percent(share: number, decimals: number): string {
  const text = Math.abs(share * 100).toFixed(decimals);
  return `${share < 0 && Number(text) !== 0 ? MINUS : ''}${text}${NARROW}%`;
}

/** Cents as whole units, rounded half away from zero: `1,120`. */
export function whole(cents: bigint): string {
  const size = cents < 0n ? -cents : cents;
  const units = (size + 50n) / 100n;
  return `${cents < 0n && units > 0n ? MINUS : ''}${grouped(String(units))}`;
}

/** Cents to the cent: `4,218.34`. */
export function exact(cents: bigint): string {
  const size = cents < 0n ? -cents : cents;
  const rest = String(size % 100n).padStart(2, '0');
  return `${cents < 0n ? MINUS : ''}${grouped(String(size / 100n))}.${rest}`;
}

function signed(cents: bigint): string {
  return cents > 0n ? `+${exact(cents)}` : exact(cents);
}

function grouped(digits: string): string {
  return digits.replace(/\B(?=(\d{3})+$)/g, ',');
}

function nth(count: number): string {
  const ending = { one: 'st', two: 'nd', few: 'rd', other: 'th', zero: 'th', many: 'th' };
  return `${count}${ending[new Intl.PluralRules('en', { type: 'ordinal' }).select(count)]}`;
}
