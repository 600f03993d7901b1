/** A number as a cell writes it, digit by digit: no amount ever passes through a fraction in binary. */
export interface WrittenNumber {
  negative: boolean;
  whole: string;
  fraction: string;
}

const GROUPED = {
  '.': /^([-+\u2212]?)(\d+|\d{1,3}(?:([,\s'’])\d{3})(?:\3\d{3})*)(?:\.(\d+))?$/,
  ',': /^([-+\u2212]?)(\d+|\d{1,3}(?:([.\s'’])\d{3})(?:\3\d{3})*)(?:,(\d+))?$/,
} as const;

/** Digits that a number of ours may have: more would pass the whole numbers that are exact. */
const MOST_DIGITS = 13;

/** Reads a number with the given decimal sign; thousands may be grouped. `undefined`: it is none. */
export function writtenNumber(text: string, decimal: '.' | ','): WrittenNumber | undefined {
  const match = GROUPED[decimal].exec(text);
  if (!match) return undefined;
  const [, sign = '', grouped = '', , fraction = ''] = match;
  const whole = grouped.replace(/\D/g, '').replace(/^0+(?=\d)/, '');
  return { negative: sign === '-' || sign === '\u2212', whole, fraction };
}

/** A whole number, `.00` behind it allowed; `undefined` when it is none. */
export function wholeOf(number: WrittenNumber): number | undefined {
  return scaled(number, 0);
}

/** Minor units of an amount with up to two decimals, exactly; `undefined` when it has more. */
export function centsOf(number: WrittenNumber): number | undefined {
  return scaled(number, 2);
}

/** A measured number. */
export function decimalOf({ negative, whole, fraction }: WrittenNumber): number {
  return Number(`${negative ? '-' : ''}${whole}.${fraction || '0'}`);
}

/** The number × 10^places, where it is whole. Digits are moved, nothing is multiplied. */
function scaled({ negative, whole, fraction }: WrittenNumber, places: number): number | undefined {
  if (whole.length > MOST_DIGITS || !/^0*$/.test(fraction.slice(places))) return undefined;
  const digits = Number(whole + fraction.slice(0, places).padEnd(places, '0'));
  return negative && digits > 0 ? -digits : digits;
}
