import { JOB_SORTS, PRODUCT_USES } from '#shared/contracts/job-list';
import {
  AGE_BANDS,
  type AgeBand,
  type Side,
  SIDES,
  type Zone,
  ZONES,
} from '#shared/domain/vocabulary';
import { SIDE_NAMES, ZONE_NAMES } from '../../ui/words';

export type JobSort = (typeof JOB_SORTS)[number];
export type ProductUse = (typeof PRODUCT_USES)[number];

/** What narrows the list beyond the scope, as the URL has it. */
export interface JobFilters {
  readonly q: string | undefined;
  readonly make: string | undefined;
  readonly model: string | undefined;
  readonly ageBand: AgeBand | undefined;
  readonly unbilled: boolean | undefined;
  readonly hasRot: boolean | undefined;
  readonly hasEstimate: boolean | undefined;
  /** Rot in this zone, with `side` on that side of it. */
  readonly zone: Zone | undefined;
  readonly side: Side | undefined;
  /** Cars on which this product went in, with `use` those far under or over its norm. */
  readonly product: string | undefined;
  readonly use: ProductUse | undefined;
}

/** A filter in force, in words, and the parameters whose removal lifts it. */
export interface FilterWords {
  readonly words: string;
  readonly without: Readonly<Record<string, null>>;
}

/** `true` and `false` as words of a URL; anything else is no filter. */
export function flagOf(value: string | undefined): boolean | undefined {
  return value === 'true' ? true : value === 'false' ? false : undefined;
}

/** A known age band or nothing. */
export function ageBandOf(value: string | undefined): AgeBand | undefined {
  return AGE_BANDS.find((band) => band === value);
}

/** A known zone or nothing. */
export function zoneOf(value: string | undefined): Zone | undefined {
  return ZONES.find((zone) => zone === value);
}

/** A known side or nothing. */
export function sideOf(value: string | undefined): Side | undefined {
  return SIDES.find((side) => side === value);
}

/** A known way of missing the norm or nothing. */
export function useOf(value: string | undefined): ProductUse | undefined {
  return PRODUCT_USES.find((use) => use === value);
}

/** A known order, the newest first otherwise. */
export function sortOf(value: string | undefined): JobSort {
  return JOB_SORTS.find((sort) => sort === value) ?? 'completed';
}

/** The filters in force, each in words. */
export function filterWords(
  filters: JobFilters,
  productName: (code: string) => string,
): readonly FilterWords[] {
  const words: FilterWords[] = [];
  if (filters.q) words.push({ words: `matching “${filters.q}”`, without: { q: null } });
  const car = [filters.make, filters.model].filter((part) => part).join(' ');
  if (car) words.push({ words: car, without: { make: null, model: null } });
  if (filters.ageBand) {
    const years = filters.ageBand === '20+' ? '20 years and over' : `${filters.ageBand} years`;
    words.push({ words: `aged ${years.replace('-', '–')}`, without: { ageBand: null } });
  }
  if (filters.unbilled !== undefined) {
    words.push({
      words: filters.unbilled ? 'not billed' : 'billed',
      without: { unbilled: null },
    });
  }
  if (filters.zone) {
    // That there was rot is said by the zone; lifting it lifts both.
    words.push({
      words: `with rot in ${placeWords(filters.zone, filters.side)}`,
      without: { zone: null, side: null, hasRot: null },
    });
  } else if (filters.hasRot !== undefined) {
    words.push({
      words: filters.hasRot ? 'rot found' : 'no rot found',
      without: { hasRot: null },
    });
  }
  if (filters.hasEstimate !== undefined) {
    words.push({
      words: filters.hasEstimate ? 'with an estimate' : 'without an estimate',
      without: { hasEstimate: null },
    });
  }
  if (filters.product) {
    words.push({
      words: productWords(productName(filters.product), filters.use),
      without: { product: null, use: null },
    });
  }
  return words;
}

function placeWords(zone: Zone, side: Side | undefined): string {
  const [noun = '', kind] = ZONE_NAMES[zone].split(', ');
  const name = kind ? `${kind} ${noun}` : noun;
  return side === undefined ? `the ${name}` : `the ${name} (${SIDE_NAMES[side]})`;
}

function productWords(name: string, use: ProductUse | undefined): string {
  switch (use) {
    case 'under':
      return `with under 70\u202f% of the norm of ${name}`;
    case 'over':
      return `with over 130\u202f% of the norm of ${name}`;
    case undefined:
      return `with ${name}`;
  }
}
