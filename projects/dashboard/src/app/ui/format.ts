/**
 * Numbers, money and dates as they are read on screen. The words are English, so the formats are those of the English the browser
 * prefers (en-GB when it names none); the space before % and units is the narrow no-break one, the minus is the true one.
 */
const LOCALE = preferredEnglish(navigator.languages);
const NARROW = '\u202f';
const MINUS = '\u2212';

/** The first English of a list of languages, en-GB when there is none. */
export function preferredEnglish(languages: readonly string[]): string {
  return languages.find((language) => /^en(-|$)/i.test(language)) ?? 'en-GB';
}

/** A count or any other whole number: `1,120`. */
export function formatCount(value: number): string {
  return number(value, 0);
}

/** A number with a fixed count of decimals: `1.20`. */
export function formatNumber(value: number, decimals: number): string {
  return number(value, decimals);
}

/** `11 cars`, `1 car`. */
export function formatCars(cars: number): string {
  return formatCounted(cars, 'car', 'cars');
}

/** `19 days`, `1 day`. */
export function formatDays(days: number): string {
  return formatCounted(days, 'day', 'days');
}

/** A count with its noun in the right number. */
export function formatCounted(count: number, one: string, many: string): string {
  return `${formatCount(count)} ${count === 1 ? one : many}`;
}

/** A fraction as per cent: 0.364 → `36 %`. */
export function formatShare(share: number, decimals = 0): string {
  return `${number(share * 100, decimals)}${NARROW}%`;
}

/** Two fractions as a range of per cent: `31–46 %`. A negative bound takes the word "to" in place of the dash. */
export function formatShareRange(lower: number, upper: number, decimals = 0): string {
  const between = lower < 0 || upper < 0 ? ' to ' : '–';
  return `${number(lower * 100, decimals)}${between}${formatShare(upper, decimals)}`;
}

/** A fraction with its sign: 0.12 → `+12 %`. */
export function formatSignedShare(share: number, decimals = 0): string {
  return `${signed(share * 100, decimals)}${NARROW}%`;
}

/** Minor units as an amount without its currency, to whole units: 85012 → `850`. */
export function formatAmount(cents: number): string {
  return number(cents / 100, 0);
}

/** Minor units to the cent, without the currency: `4,218.34`. */
export function formatExactAmount(cents: number): string {
  return number(cents / 100, 2);
}

/** A change in whole units with its sign: `−296`, `+10`, `0`. */
export function formatSignedAmount(cents: number): string {
  return signed(cents / 100, 0);
}

/** A change to the cent with its sign: `−735.00`, `+375.00`. */
export function formatSignedExactAmount(cents: number): string {
  return signed(cents / 100, 2);
}

/** Money to whole units with its currency: `€1,796`. */
export function formatMoney(cents: number, currency: string): string {
  return money(cents, currency, 0);
}

/** Money to the cent with its currency: `€1,796.20`. */
export function formatExactMoney(cents: number, currency: string): string {
  return money(cents, currency, 2);
}

/** The sign of a currency, for the head of a column: `€`. */
export function currencySign(currency: string): string {
  const parts = currencyFormat(currency, 0).formatToParts(0);
  return parts.find((part) => part.type === 'currency')?.value ?? currency;
}

/** Minutes as hours and minutes: `1 h 45 min`, `45 min`, `2 h`. */
export function formatMinutes(minutes: number): string {
  const whole = Math.abs(Math.round(minutes));
  const hours = Math.floor(whole / 60);
  const rest = whole % 60;
  const parts = [
    ...(hours > 0 ? [`${formatCount(hours)}${NARROW}h`] : []),
    ...(rest > 0 || hours === 0 ? [`${rest}${NARROW}min`] : []),
  ];
  return `${Math.round(minutes) < 0 ? MINUS : ''}${parts.join(' ')}`;
}

/** A change in minutes with its sign: `+1 h 45 min`. */
export function formatSignedMinutes(minutes: number): string {
  return `${Math.round(minutes) > 0 ? '+' : ''}${formatMinutes(minutes)}`;
}

/** Millilitres as litres with one decimal, below a litre as they are: `4.2 L`, `850 ml`. */
export function formatVolume(ml: number): string {
  return Math.abs(ml) < 1000 ? `${number(ml, 0)}${NARROW}ml` : `${number(ml / 1000, 1)}${NARROW}L`;
}

/** An ISO week: `2026-W05` → `Week 5, 2026`. */
export function formatWeek(week: string): string {
  return `${formatWeekNumber(week)}, ${week.slice(0, 4)}`;
}

/** An ISO week without its year: `Week 5`. */
export function formatWeekNumber(week: string): string {
  return `Week ${Number(week.slice(6))}`;
}

/** A date spelled out: `28 January 2026`. */
export function formatDate(date: string): string {
  return dateFormat('long').format(noon(date));
}

/** A date short enough for a table: `28 Jan 2026`. */
export function formatShortDate(date: string): string {
  return dateFormat('medium').format(noon(date));
}

/** Two dates as a range, what they share said once: `23–29 Nov 2026`, `28 Sept – 4 Oct 2026`. */
export function formatDateRange(from: string, to: string): string {
  return dateFormat('medium').formatRange(noon(from), noon(to));
}

/** A month: `2026-01` → `January 2026`. */
export function formatMonth(month: string): string {
  return monthFormat.format(noon(`${month}-01`));
}

/** An instant in the reader's own time: `28 Jan 2026, 14:05`. */
export function formatInstant(instant: string): string {
  return instantFormat.format(new Date(instant));
}

/** An instant to the second, where order matters: `28 Jan 2026, 14:05:09`. */
export function formatExactInstant(instant: string): string {
  return exactInstantFormat.format(new Date(instant));
}

/** The day of an instant in the reader's own time: `28 Jan 2026`. */
export function formatInstantDay(instant: string): string {
  return instantDayFormat.format(new Date(instant));
}

/** The time of an instant in the reader's own time: `08:12`. */
export function formatTime(instant: Date): string {
  return timeFormat.format(instant);
}

/** Words in a list: `a, b and c`. */
export function formatList(words: readonly string[]): string {
  return listFormat.format(words);
}

function money(cents: number, currency: string, decimals: number): string {
  const text = currencyFormat(currency, decimals).format(Math.abs(cents) / 100);
  const zero = Math.round(Math.abs(cents) / 10 ** (2 - decimals)) === 0;
  return cents < 0 && !zero ? `${MINUS}${text}` : text;
}

function number(value: number, decimals: number): string {
  const text = decimalFormat(decimals).format(Math.abs(value));
  return value < 0 && /[1-9]/.test(text) ? `${MINUS}${text}` : text;
}

function signed(value: number, decimals: number): string {
  const text = number(value, decimals);
  return value > 0 && /[1-9]/.test(text) ? `+${text}` : text;
}

/** A civil date as an instant that no time zone moves to another day; formatted in UTC. */
function noon(date: string): Date {
  return new Date(`${date}T12:00:00Z`);
}

const monthFormat = new Intl.DateTimeFormat(LOCALE, {
  month: 'long',
  year: 'numeric',
  timeZone: 'UTC',
});
const instantFormat = new Intl.DateTimeFormat(LOCALE, { dateStyle: 'medium', timeStyle: 'short' });
const exactInstantFormat = new Intl.DateTimeFormat(LOCALE, {
  dateStyle: 'medium',
  timeStyle: 'medium',
});
const instantDayFormat = new Intl.DateTimeFormat(LOCALE, { dateStyle: 'medium' });
const timeFormat = new Intl.DateTimeFormat(LOCALE, { timeStyle: 'short' });
const listFormat = new Intl.ListFormat(LOCALE, { type: 'conjunction' });

const dateFormat = kept(
  (style: 'long' | 'medium') =>
    new Intl.DateTimeFormat(LOCALE, { dateStyle: style, timeZone: 'UTC' }),
);
const decimalFormat = kept(
  (decimals: number) =>
    new Intl.NumberFormat(LOCALE, {
      minimumFractionDigits: decimals,
      maximumFractionDigits: decimals,
    }),
);

const currencyFormats = kept((key: string) => {
  const [currency = '', decimals = '0'] = key.split(' ');
  return new Intl.NumberFormat(LOCALE, {
    style: 'currency',
    currency,
    currencyDisplay: 'narrowSymbol',
    minimumFractionDigits: Number(decimals),
    maximumFractionDigits: Number(decimals),
  });
});

function currencyFormat(currency: string, decimals: number): Intl.NumberFormat {
  return currencyFormats(`${currency} ${decimals}`);
}

/** Formats are slow to make and cheap to keep. */
function kept<Key, Made>(make: (key: Key) => Made): (key: Key) => Made {
  const made = new Map<Key, Made>();
  return (key) => {
    const known = made.get(key);
    if (known !== undefined) return known;
    const fresh = make(key);
    made.set(key, fresh);
    return fresh;
  };
}
