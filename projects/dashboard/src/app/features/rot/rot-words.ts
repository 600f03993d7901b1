import type { AgeBand, BodyType, Side, Zone } from '#shared/domain/vocabulary';
import { formatCars, formatList, formatShare, formatShareRange } from '../../ui/format';
import { BODY_TYPE_PLURALS, SIDE_NAMES, ZONE_NAMES } from '../../ui/words';

/** What the page needs to turn codes into words. */
export interface RotWords {
  readonly regionName: (code: string) => string;
  /** Body types that the scope names; none: all. */
  readonly bodyTypes: readonly BodyType[];
}

/** A share with its interval as the contract has them; all null where too few cars stand behind. */
export interface SharedOf {
  readonly share: number | null;
  readonly lower: number | null;
  readonly upper: number | null;
}

/** Body types named in a sentence; more are cars. */
const MOST_TYPES = 2;

/** What the cars are called: "hatchbacks", "vans and pick-ups", else "cars". */
export function carsCalled(types: readonly BodyType[]): string {
  return types.length === 0 || types.length > MOST_TYPES
    ? 'cars'
    : formatList(types.map((type) => BODY_TYPE_PLURALS[type]));
}

/** An age as it stands in a row: "10–14", "20+". */
export function ageLabel(band: AgeBand): string {
  return band.replace('-', '–');
}

/** An age after "aged": "10–14", "20 and over". */
export function agedWords(band: AgeBand): string {
  return band === '20+' ? '20 and over' : ageLabel(band);
}

/** A zone inside a sentence: "outer sill, left", "tailgate". The middle of a zone that lies on the middle is not said. */
export function placeInSentence(zone: Zone, side: Side, sides: readonly Side[]): string {
  const [noun = '', kind] = ZONE_NAMES[zone].split(', ');
  const name = kind ? `${kind} ${noun}` : noun;
  return side === 'centre' && sides.length === 1 ? name : `${name}, ${SIDE_NAMES[side]}`;
}

/** The interval of a share, or nothing. */
export function rangeText({ lower, upper }: Omit<SharedOf, 'share'>): string {
  return lower === null || upper === null ? '' : formatShareRange(lower, upper);
}

/** The share, or the words for why there is none. */
export function shareText({ share }: Pick<SharedOf, 'share'>): string {
  return share === null ? 'too few' : formatShare(share);
}

/** A share with what is behind it: "58 % (47–69 %, 74 cars)". */
export function shareOfCars(of: SharedOf & { readonly cars: number }): string {
  if (of.share === null) return `too few cars yet (${formatCars(of.cars)})`;
  return `${formatShare(of.share)} (${behind(of)})`;
}

/** Interval and number of cars, as they stand in brackets. */
export function behind(of: Omit<SharedOf, 'share'> & { readonly cars: number }): string {
  return [rangeText(of), formatCars(of.cars)].filter(Boolean).join(', ');
}
