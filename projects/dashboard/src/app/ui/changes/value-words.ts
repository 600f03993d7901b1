import { isDate, isMonth } from '#shared/domain/calendar';
import {
  formatCount,
  formatDate,
  formatExactInstant,
  formatExactMoney,
  formatList,
  formatMinutes,
  formatMonth,
  formatNumber,
} from '../format';
import { enumWords } from './enum-words';
import { plainName } from './field-names';
import type { KnownNames } from './known-names';
import { pointerNames } from './pointer';

/** How a field that holds nothing is said. */
export const NOTHING = 'nothing';

const INSTANT = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}(:\d{2}(\.\d+)?)?(Z|[+-]\d{2}:\d{2})$/;

/** What stood in a field, exactly enough that two different values never read the same. */
export function valueWords(path: string, value: unknown, known: KnownNames): string {
  if (value === null || value === undefined || value === '') return NOTHING;
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'number') return numberWords(path, value, known);
  if (typeof value === 'string') return textWords(path, value, known);
  if (Array.isArray(value)) return listWords(path, value as unknown[], known);
  return Object.entries(value as Readonly<Record<string, unknown>>)
    .map(([name, held]) => `${plainName(name)} ${valueWords(`${path}/${name}`, held, known)}`)
    .join(', ');
}

function numberWords(path: string, value: number, known: KnownNames): string {
  const names = pointerNames(path);
  const name = names.at(-1) ?? '';
  if (name.endsWith('Cents')) return formatExactMoney(value, known.currency);
  if (names.includes('stages') || /minutes$/i.test(name)) return formatMinutes(value);
  if (/share$|rate$/i.test(name)) return `${exact(value * 100)}\u202f%`;
  const unit = names[0] === 'norms' ? 'ml' : UNITS[name];
  return unit ? `${exact(value)}\u202f${unit}` : exact(value);
}

const UNITS: Readonly<Record<string, string>> = {
  ml: 'ml',
  productMl: 'ml',
  odometerKm: 'km',
  temperatureC: '°C',
  humidityPct: '%',
  so2Deposition: 'mg/(m²·d)',
  chlorideDeposition: 'mg/(m²·d)',
  warrantyMonths: 'months',
};

/** A number with as many decimals as it has, six at most. */
function exact(value: number): string {
  if (Number.isInteger(value)) return formatCount(value);
  const decimals = Number(value.toFixed(6)).toString().split('.')[1]?.length ?? 0;
  return formatNumber(value, decimals);
}

function textWords(path: string, value: string, known: KnownNames): string {
  const names = pointerNames(path);
  const word = enumWords(names, value, known);
  if (word !== undefined) return word;
  if (isDate(value)) return formatDate(value);
  if (INSTANT.test(value)) return formatExactInstant(value);
  return names.at(-1) === 'firstRegistered' && isMonth(value) ? formatMonth(value) : value;
}

function listWords(path: string, values: readonly unknown[], known: KnownNames): string {
  if (values.length === 0) return 'none';
  return formatList(values.map((one) => valueWords(path, one, known)));
}
