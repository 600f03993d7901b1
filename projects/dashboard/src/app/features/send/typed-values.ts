import { isDate, isMonth } from '#shared/domain/calendar';
import { amountToType, parseAmount } from '../../ui/parse-amount';

/** How a field reads what is typed into it, and shows what it holds. */
export interface TypedValue {
  /** `undefined` where it cannot be read. */
  readonly read: (text: string) => string | number | undefined;
  readonly show: (value: string | number) => string;
  /** What to do about a text that cannot be read. */
  readonly wrong: string;
  /** The keyboard a phone offers. */
  readonly keyboard: 'text' | 'numeric' | 'decimal';
}

export type TypedKind =
  'line' | 'date' | 'month' | 'whole' | 'minutes' | 'amount' | 'litres' | 'degrees' | 'percent';

/** Every way of reading there is. */
export const TYPED: Readonly<Record<TypedKind, TypedValue>> = {
  line: { read: (text) => text, show: String, wrong: '', keyboard: 'text' },
  date: {
    read: (text) => (isDate(text) ? text : undefined),
    show: String,
    wrong: 'Write the day as 2026-02-02.',
    keyboard: 'text',
  },
  month: {
    read: (text) => (isMonth(text.trim()) ? text.trim() : undefined),
    show: String,
    wrong: 'Write year and month as 2009-05.',
    keyboard: 'text',
  },
  whole: {
    read: (text) => whole(text),
    show: String,
    wrong: 'Write a whole number.',
    keyboard: 'numeric',
  },
  minutes: {
    read: minutesTyped,
    show: String,
    wrong: 'Write minutes as 90, or hours and minutes as 1:30.',
    keyboard: 'numeric',
  },
  amount: {
    read: parseAmount,
    show: (value) => amountToType(Number(value)),
    wrong: 'Write the amount as 870 or 870.50.',
    keyboard: 'decimal',
  },
  litres: {
    read: (text) => millilitresTyped(text),
    show: (value) => String(Number(value) / 1000),
    wrong: 'Write litres as 4.2.',
    keyboard: 'decimal',
  },
  degrees: {
    read: (text) => decimal(text, /^[-−]?\d{1,2}(?:[.,]\d)?$/),
    show: String,
    wrong: 'Write degrees as 18 or 18.5.',
    keyboard: 'text',
  },
  percent: {
    read: (text) => decimal(text, /^\d{1,3}(?:[.,]\d)?$/),
    show: String,
    wrong: 'Write per cent as 55.',
    keyboard: 'decimal',
  },
};

/** Minutes as "90", "1:30", "1 h 30" or "1 h 30 min". */
export function minutesTyped(text: string): number | undefined {
  const plain = text.replace(/[\s\u00a0\u202f]/g, '').toLowerCase();
  const parts = /^(\d{1,4})(?:h|:)(\d{1,2})?(?:min)?$/.exec(plain);
  if (parts) {
    const minutes = Number(parts[2] ?? '0');
    return minutes < 60 ? Number(parts[1]) * 60 + minutes : undefined;
  }
  return whole(plain.replace(/min$/, ''));
}

function millilitresTyped(text: string): number | undefined {
  const match = /^(\d{1,4})(?:[.,](\d{1,3}))?$/.exec(text.trim().replace(/\s*l$/i, ''));
  return match ? Number(match[1]) * 1000 + Number((match[2] ?? '').padEnd(3, '0')) : undefined;
}

function whole(text: string): number | undefined {
  const plain = text.replace(/[\s\u00a0\u202f]/g, '');
  return /^\d{1,7}$/.test(plain) ? Number(plain) : undefined;
}

function decimal(text: string, shape: RegExp): number | undefined {
  const plain = text.trim();
  return shape.test(plain) ? Number(plain.replace('−', '-').replace(',', '.')) : undefined;
}
