import { CLAIM_SORTS } from '#shared/contracts/claim-list';
import {
  AGE_BANDS,
  type AgeBand,
  CLAIM_CAUSES,
  CLAIM_DECISIONS,
  type ClaimCause,
  type ClaimDecision,
  type Zone,
  ZONES,
} from '#shared/domain/vocabulary';
import { CLAIM_CAUSE_NAMES, CLAIM_DECISION_NAMES, ZONE_NAMES } from '../../ui/words';

export type ClaimSort = (typeof CLAIM_SORTS)[number];

/** What narrows the list beyond the scope, as the URL has it. */
export interface ClaimFilters {
  readonly q: string | undefined;
  readonly decision: ClaimDecision | undefined;
  /** Those that wait for head office. */
  readonly waiting: boolean | undefined;
  readonly cause: ClaimCause | undefined;
  readonly zone: Zone | undefined;
  readonly ageBand: AgeBand | undefined;
  /** Half-year of completion. */
  readonly cohort: string | undefined;
  readonly counted: boolean | undefined;
  readonly jobRef: string | undefined;
}

/** The filters as the URL writes them; anything it should not hold is no filter. */
export type WrittenFilters = Readonly<Record<keyof ClaimFilters, string | undefined>>;

/** Filters in force from the URL. */
export function filtersOf(written: WrittenFilters): ClaimFilters {
  return {
    q: written.q || undefined,
    decision: CLAIM_DECISIONS.find((one) => one === written.decision),
    waiting: flagOf(written.waiting),
    cause: CLAIM_CAUSES.find((one) => one === written.cause),
    zone: ZONES.find((one) => one === written.zone),
    ageBand: AGE_BANDS.find((one) => one === written.ageBand),
    cohort: /^\d{4}-H[12]$/.test(written.cohort ?? '') ? written.cohort : undefined,
    counted: flagOf(written.counted),
    jobRef: written.jobRef || undefined,
  };
}

/** A known order, the last made first otherwise. */
export function sortOf(value: string | undefined): ClaimSort {
  return CLAIM_SORTS.find((sort) => sort === value) ?? 'made';
}

/** The filters in force, each in words that go on from "claims". */
export function filterWords(filters: ClaimFilters): readonly string[] {
  const { q, decision, waiting, cause, zone, ageBand, cohort, counted, jobRef } = filters;
  return [
    ...(jobRef ? [`on job ${jobRef}`] : []),
    ...(q ? [`matching “${q}”`] : []),
    ...(waiting === undefined
      ? []
      : [waiting ? 'waiting for head office' : 'not waiting for head office']),
    ...(decision ? [decisionWords(decision)] : []),
    ...(cause ? [`for “${CLAIM_CAUSE_NAMES[cause]}”`] : []),
    ...(zone ? [`at the ${zoneWords(zone)}`] : []),
    ...(ageBand ? [`on cars ${ageWords(ageBand)} old`] : []),
    ...(cohort ? [`on cars finished in the ${halfYearWords(cohort)}`] : []),
    ...(counted === undefined ? [] : [counted ? 'that count' : 'that do not count']),
  ];
}

/** `sill, outer` in a sentence: outer sill. */
export function zoneWords(zone: Zone): string {
  const [noun = '', kind] = ZONE_NAMES[zone].split(', ');
  return kind ? `${kind} ${noun}` : noun;
}

/** `5–9 years`. */
export function ageWords(band: AgeBand): string {
  return band === '20+' ? '20 years and more' : `${band.replace('-', '–')} years`;
}

/** `2024-H1` → `first half of 2024`. */
export function halfYearWords(cohort: string): string {
  return `${cohort.endsWith('H1') ? 'first' : 'second'} half of ${cohort.slice(0, 4)}`;
}

/** So many half-years back from today's, the newest first. */
export function halfYearsTo(today: string, count: number): readonly string[] {
  const newest = Number(today.slice(0, 4)) * 2 + (today.slice(5, 7) > '06' ? 1 : 0);
  return Array.from({ length: count }, (_, back) => {
    const half = newest - back;
    return `${Math.floor(half / 2)}-H${(half % 2) + 1}`;
  });
}

function decisionWords(decision: ClaimDecision): string {
  if (decision === 'open') return 'still open';
  return decision === 'goodwill' ? 'met as goodwill' : CLAIM_DECISION_NAMES[decision];
}

function flagOf(value: string | undefined): boolean | undefined {
  return value === 'true' ? true : value === 'false' ? false : undefined;
}
