import { CHECKS, CONSUMABLE_KINDS, SIDES, STAGES, ZONES } from '#shared/domain/vocabulary';
import { formatCount } from '../format';
import { CHECK_NAMES, CONSUMABLE_NAMES, SIDE_NAMES, STAGE_NAMES, ZONE_NAMES } from '../words';
import { plainName } from './field-names';
import type { KnownNames } from './known-names';
import { pointerNames } from './pointer';

/** What a changed field is, in the trade's words: `/findings/a/workedAs` → `sill, inner, left: worked as`. */
export function fieldWords(path: string, known: KnownNames): string {
  const names = pointerNames(path);
  const [first = '', second = '', ...rest] = names;
  const last = names.at(-1) ?? '';
  switch (first) {
    case 'findings':
      return named(findingPlace(second, known), rest);
    case 'products':
    case 'norms':
      return named(
        lineName(second, (code) => known.productName(code)),
        rest,
      );
    case 'consumables':
      return named(lineName(second, consumableName), rest);
    case 'agreedExtras':
      return named(nth('agreed extra', second), rest);
    case 'estimate':
    case 'actual':
      return labourWords(first, names);
    case 'checks':
      return checkWords(last);
    case 'workshop':
      return named('workshop', names.slice(1));
    case 'climate':
      return named('climate', names.slice(1));
    case 'invoice':
      return INVOICE[last] ?? 'invoice';
    case 'vehicle':
      return plainName(last);
    default:
      return names.length === 0 ? 'text' : names.map(plainName).join(': ');
  }
}

/** Zone and side in words: `sill, inner, left`. */
export function placeWords(zone: unknown, side: unknown): string | undefined {
  const knownZone = ZONES.find((one) => one === zone);
  const knownSide = SIDES.find((one) => one === side);
  return knownZone && knownSide && `${ZONE_NAMES[knownZone]}, ${SIDE_NAMES[knownSide]}`;
}

const INVOICE: Readonly<Record<string, string>> = {
  number: 'invoice number',
  issuedOn: 'invoiced on',
  totalCents: 'invoice total before tax',
};

/** A finding sent without a reference is known by where it is and its number there: `sill_inner/left/1`. */
function findingPlace(ref: string, known: KnownNames): string {
  const place = known.placeOf(ref);
  if (place) return place;
  const [zone, side, number] = ref.split('/');
  const words = placeWords(zone, side);
  if (!words) return `finding ${ref}`;
  return number === undefined || number === '1' ? words : `${words}, finding ${number}`;
}

function labourWords(of: 'estimate' | 'actual', names: readonly string[]): string {
  const last = names.at(-1);
  if (last === 'priceCents') return 'quoted price';
  const stage = STAGES.find((one) => one === last);
  if (!stage) return of === 'estimate' ? 'estimate' : 'minutes worked';
  return `${STAGE_NAMES[stage]}: ${of === 'estimate' ? 'estimated' : 'worked'}`;
}

function checkWords(name: string): string {
  const check = CHECKS.find((one) => one === name);
  return check ? CHECK_NAMES[check] : plainName(name);
}

/** A line of products or consumables by its key; the second of one code is `CW1:2`. */
function lineName(key: string, nameOf: (code: string) => string): string {
  if (isPlace(key)) return `line ${formatCount(Number(key) + 1)}`;
  const [, code = key, number] = /^(.*?)(?::(\d+))?$/.exec(key) ?? [];
  return number === undefined ? nameOf(code) : `${nameOf(code)}, line ${number}`;
}

function consumableName(code: string): string {
  const kind = CONSUMABLE_KINDS.find((one) => one === code);
  if (!kind) return plainName(code);
  return kind === 'other' ? 'other consumables' : CONSUMABLE_NAMES[kind];
}

function named(thing: string, names: readonly string[]): string {
  // A number among the names tells lines of one thing apart, and is counted from 1 as people do.
  const words = names.map((name) => (isPlace(name) ? formatCount(Number(name) + 1) : name));
  return [thing, ...words.map(plainName)].join(': ');
}

function nth(thing: string, place: string): string {
  return isPlace(place) ? `${thing} ${formatCount(Number(place) + 1)}` : `${thing} ${place}`;
}

function isPlace(name: string): boolean {
  return /^\d{1,4}$/.test(name);
}
