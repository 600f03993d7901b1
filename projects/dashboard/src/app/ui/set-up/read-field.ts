import { code, packageCode } from '#shared/contracts/fields';
import { isDate } from '#shared/domain/calendar';
import { parseAmount } from '../parse-amount';
import { type Field, textOf, type Typed } from './field';

/** An amount typed as money, in minor units. Call it on what `wrongIn` found right. */
export function centsOf(typed: Typed, key: string): number {
  return known(parseAmount(textOf(typed, key)), key);
}

/** An amount that may be left out. */
export function centsOrNull(typed: Typed, key: string): number | null {
  return textOf(typed, key) === '' ? null : centsOf(typed, key);
}

/** Per cent typed, as a share of at most six decimals. */
export function shareOf(typed: Typed, key: string): number {
  return known(parseShare(textOf(typed, key)), key);
}

/** A share that may be left out. */
export function shareOrNull(typed: Typed, key: string): number | null {
  return textOf(typed, key) === '' ? null : shareOf(typed, key);
}

/** A number typed with a point or a comma; nothing where it is none. */
export function numberOf(typed: Typed, key: string): number | undefined {
  return parseDecimal(textOf(typed, key));
}

/** A whole number that `wrongIn` found right. */
export function wholeOf(typed: Typed, key: string): number {
  return known(parseDecimal(textOf(typed, key)), key);
}

/** The codes chosen among several. */
export function codesOf(typed: Typed, key: string): string[] {
  return textOf(typed, key).split(' ').filter(Boolean);
}

/** A share as per cent to type: 0.085 → "8.5"; nothing where there is none. */
export function shareToType(share: number | null | undefined): string {
  return share === null || share === undefined ? '' : String(Number((share * 100).toFixed(4)));
}

/** What is wrong with what stands in a field, in a sentence that says how to write it; nothing where it is right. */
export function wrongIn(field: Field, typed: Typed): string | undefined {
  const text = textOf(typed, field.key);
  if (field.shownIf && !field.shownIf(typed)) return undefined;
  if (text === '') return field.need === 'optional' ? undefined : missing(field);
  if (field.taken?.includes(text)) return `${text} is taken already; change it on its own page.`;
  switch (field.kind) {
    case 'code':
      return told(code.safeParse(text));
    case 'packageCode':
      return told(packageCode.safeParse(text));
    case 'money':
      return parseAmount(text) === undefined ? 'Write the amount as 48 or 48.50.' : undefined;
    case 'percent':
      return parseShare(text) === undefined ? 'Write it as 8 or 8.5, 0 to 100.' : undefined;
    case 'decimal':
      return parseDecimal(text) === undefined ? 'Write a number as 9 or 9.5.' : undefined;
    case 'whole':
      return /^\d{1,7}$/.test(text) ? undefined : 'Write a whole number, as 4200.';
    case 'date':
      return isDate(text) ? undefined : 'Choose a day.';
    case 'newPassword':
      return text.length < 12 ? 'At least 12 characters.' : undefined;
    default:
      return undefined;
  }
}

function told(parsed: ReturnType<typeof code.safeParse>): string | undefined {
  const message = parsed.error?.issues[0]?.message;
  return message && `${message.charAt(0).toUpperCase()}${message.slice(1)}.`;
}

function missing({ kind, label }: Field): string {
  if (kind === 'choice' || kind === 'several') return 'Choose one.';
  return kind === 'date' ? 'Choose a day.' : `${label.split(',', 1)[0]} is needed.`;
}

function parseShare(text: string): number | undefined {
  const percent = parseDecimal(text.replace(/\s*%$/, ''));
  if (percent === undefined || percent < 0 || percent > 100) return undefined;
  return /[.,]\d{5,}/.test(text) ? undefined : Number((percent / 100).toFixed(6));
}

function parseDecimal(text: string): number | undefined {
  const match = /^([-\u2212]?)(\d{1,6})(?:[.,](\d{1,6}))?$/.exec(text.replace(/[\s\u202f]/g, ''));
  if (!match) return undefined;
  const [, minus = '', whole = '', part = '0'] = match;
  return (minus ? -1 : 1) * Number(`${whole}.${part}`);
}

function known<Value>(value: Value | undefined, key: string): Value {
  if (value === undefined) throw new Error(`${key} was not checked before it was read`);
  return value;
}
