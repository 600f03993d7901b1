/** How the report writes numbers, money and days: as British English does, whatever machine it is made on. */
const WHOLE = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 0 });
const MONTHS = [
  ...['January', 'February', 'March', 'April', 'May', 'June', 'July', 'August', 'September'],
  ...['October', 'November', 'December'],
];

/** A count or a figure without decimals: `23,050`. */
export function whole(value: number): string {
  return trueMinus(WHOLE.format(value));
}

/** A figure with a fixed number of decimals: `1,234.50`. */
export function decimals(value: number, digits: number): string {
  const format = { minimumFractionDigits: digits, maximumFractionDigits: digits };
  return trueMinus(new Intl.NumberFormat('en-GB', format).format(value));
}

/** The same, or a dash where there is no figure. */
export function orDash(value: number | null, write: (value: number) => string): string {
  return value === null ? '–' : write(value);
}

/** Cents as whole money without its sign: `76,561`. */
export function wholeMoney(cents: number): string {
  return whole(cents / 100);
}

/** Cents to the cent without their sign, to be added up again: `76,561.20`. */
export function exactMoney(cents: number): string {
  return decimals(cents / 100, 2);
}

/** Cents as whole money with the sign of its currency: `€76,561`. */
export function signedMoney(cents: number, currency: string): string {
  const format = { style: 'currency', currency, maximumFractionDigits: 0 } as const;
  return trueMinus(new Intl.NumberFormat('en-GB', format).format(cents / 100)).replace(
    /[\u00a0\u202f]/g,
    ' ',
  );
}

/** The sign of a currency as it stands before an amount: `€`. */
export function currencySign(currency: string): string {
  return signedMoney(0, currency).replace('0', '').trim();
}

/** A share to the digits asked for: `97.4 %`, with a thin space. */
export function percent(share: number, digits = 0): string {
  return `${decimals(share * 100, digits)}\u2009%`;
}

/** An interval: `0.8 to 1.3`. */
export function between(lower: number | null, upper: number | null, digits: number): string {
  if (lower === null || upper === null) return '–';
  return `${decimals(lower, digits)} to ${decimals(upper, digits)}`;
}

/** A calendar day in words: `1 February 2026`. */
export function day(date: string): string {
  const [year = '', month = '', dayOfMonth = ''] = date.split('-');
  return `${Number(dayOfMonth)} ${MONTHS[Number(month) - 1] ?? month} ${year}`;
}

/** A half-year as it is read: `2024 H1`. */
export function halfYearWords(cohort: string): string {
  return cohort.replace('-', ' ');
}

function trueMinus(text: string): string {
  return text.replace(/^-(?=.*[1-9])/, '−').replace(/^-/, '');
}
