import { dayNumber } from '#shared/domain/calendar';

/** How a mail writes numbers and days: as the pages do in British English, whatever machine it is made on. */
const NARROW = '\u202f';
const MINUS = '\u2212';
const MONTHS = [
  ...['January', 'February', 'March', 'April', 'May', 'June', 'July', 'August', 'September'],
  ...['October', 'November', 'December'],
];
const WHOLE = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 0 });

/** A count: `1,120`. */
export function whole(value: number): string {
  const text = WHOLE.format(Math.abs(value));
  return value < 0 && text !== '0' ? `${MINUS}${text}` : text;
}

/** A count with its noun: `1 car`, `11 cars`. */
export function counted(count: number, one: string, many: string): string {
  return `${whole(count)} ${count === 1 ? one : many}`;
}

/** The same at the start of a sentence, where nothing is `No`. */
export function countedFirst(count: number, one: string, many: string): string {
  return count === 0 ? `No ${one}` : counted(count, one, many);
}

/** The same further on in a sentence, where nothing is `none`: `none is over`. */
export function countedThen(count: number, one: string, many: string): string {
  return count === 0 ? `none ${one}` : counted(count, one, many);
}

/** A share to whole per cent: `38 %`, with the narrow space of the pages. */
export function percent(share: number, digits = 0): string {
  return `${figure(share * 100, digits)}${NARROW}%`;
}

/** A change of a share with its sign: `+12 %`. */
export function signedPercent(share: number): string {
  const text = percent(share);
  return share > 0 && /[1-9]/.test(text) ? `+${text}` : text;
}

/** Two shares as a range: `31–46 %`; a negative end takes the word "to". */
export function percentRange(lower: number, upper: number, digits = 0): string {
  const between = lower < 0 || upper < 0 ? ' to ' : '–';
  return `${figure(lower * 100, digits)}${between}${percent(upper, digits)}`;
}

/** Minutes as hours and minutes, without a sign: `1 h 45 min`. */
export function minutes(value: number): string {
  const total = Math.abs(Math.round(value));
  const [hours, rest] = [Math.floor(total / 60), total % 60];
  const parts = [
    ...(hours > 0 ? [`${whole(hours)}${NARROW}h`] : []),
    ...(rest > 0 || hours === 0 ? [`${rest}${NARROW}min`] : []),
  ];
  return parts.join(' ');
}

/** An ISO week: `Week 5, 2026`. */
export function weekWords(week: string): string {
  return `${weekNumber(week)}, ${week.slice(0, 4)}`;
}

/** An ISO week without its year: `Week 5`. */
export function weekNumber(week: string): string {
  return `Week ${Number(week.slice(6))}`;
}

/** A day: `28 January 2026`. */
export function day(date: string): string {
  return `${Number(date.slice(8))} ${monthWords(date.slice(0, 7))}`;
}

/** A month: `2026-01` as `January 2026`. */
export function monthWords(month: string): string {
  return `${MONTHS[Number(month.slice(5, 7)) - 1] ?? month} ${month.slice(0, 4)}`;
}

/** Days from one to another in words: `23 days`. */
export function daysApart(from: string, to: string): string {
  return counted(dayNumber(to) - dayNumber(from), 'day', 'days');
}

/** `a, b and c`. */
export function inList(words: readonly string[]): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}

function figure(value: number, digits: number): string {
  const text = new Intl.NumberFormat('en-GB', {
    minimumFractionDigits: digits,
    maximumFractionDigits: digits,
  }).format(Math.abs(value));
  return value < 0 && /[1-9]/.test(text) ? `${MINUS}${text}` : text;
}
