import { AGE_BANDS, type AgeBand } from '#shared/domain/vocabulary';
import { JOB_SORTS } from '#shared/contracts/job-list';

export type JobSort = (typeof JOB_SORTS)[number];

/** What narrows the list beyond the scope, as the URL has it. */
export interface JobFilters {
  readonly q: string | undefined;
  readonly make: string | undefined;
  readonly model: string | undefined;
  readonly ageBand: AgeBand | undefined;
  readonly unbilled: boolean | undefined;
  readonly hasRot: boolean | undefined;
  readonly hasEstimate: boolean | undefined;
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

/** A known order, the newest first otherwise. */
export function sortOf(value: string | undefined): JobSort {
  return JOB_SORTS.find((sort) => sort === value) ?? 'completed';
}

/** The filters in force, each in words. */
export function filterWords(filters: JobFilters): readonly FilterWords[] {
  const words: FilterWords[] = [];
  if (filters.q) words.push({ words: `matching “${filters.q}”`, without: { q: null } });
  const car = [filters.make, filters.model].filter((part) => part).join(' ');
  if (car) words.push({ words: car, without: { make: null, model: null } });
  if (filters.ageBand) {
    words.push({ words: `aged ${filters.ageBand} years`, without: { ageBand: null } });
  }
  if (filters.unbilled !== undefined) {
    words.push({
      words: filters.unbilled ? 'not billed' : 'billed',
      without: { unbilled: null },
    });
  }
  if (filters.hasRot !== undefined) {
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
  return words;
}
