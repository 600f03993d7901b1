import { isDate, isWeek } from '#shared/domain/calendar';
import { BODY_TYPES, type BodyType } from '#shared/domain/vocabulary';

/** The dates of a scope: the last so many ISO weeks up to today, or two dates, both included. */
export type Period =
  | { readonly kind: 'last'; readonly weeks: number }
  | { readonly kind: 'dates'; readonly from: string; readonly to: string };

/** What the scope line says, as kept in the URL. Empty lists and absent parts mean "all" or the page's own default. */
export interface ScopeChoice {
  readonly regions: readonly string[];
  readonly branches: readonly string[];
  readonly packages: readonly string[];
  readonly bodyTypes: readonly BodyType[];
  readonly week: string | undefined;
  /** The day as of which warranty is told; today when absent. */
  readonly asOf: string | undefined;
  readonly period: Period | undefined;
}

/** Query parameters as the router gives and takes them; `null` takes one out. */
export type UrlQuery = Readonly<Record<string, string | readonly string[] | null | undefined>>;

const MOST_WEEKS = 260;

/** Reads a scope from query parameters; what makes no sense there is left out, so that a mistyped link still opens. */
export function scopeFromUrl(query: UrlQuery): ScopeChoice {
  return {
    regions: many(query['region']),
    branches: many(query['branch']),
    packages: many(query['package']),
    bodyTypes: many(query['bodyType']).filter(isBodyType),
    week: many(query['week']).find(isWeek),
    asOf: many(query['asOf']).find(isDate),
    period: periodFromUrl(query),
  };
}

/** Writes the given parts of a scope as query parameters; parts not given are not mentioned. */
export function scopeToUrl(change: Partial<ScopeChoice>): Record<string, string | string[] | null> {
  const query: Record<string, string | string[] | null> = {};
  if (change.regions) query['region'] = orNull(change.regions);
  if (change.branches) query['branch'] = orNull(change.branches);
  if (change.packages) query['package'] = orNull(change.packages);
  if (change.bodyTypes) query['bodyType'] = orNull(change.bodyTypes);
  if ('week' in change) query['week'] = change.week ?? null;
  if ('asOf' in change) query['asOf'] = change.asOf ?? null;
  if ('period' in change) {
    const period = change.period;
    query['last'] = period?.kind === 'last' ? String(period.weeks) : null;
    query['from'] = period?.kind === 'dates' ? period.from : null;
    query['to'] = period?.kind === 'dates' ? period.to : null;
  }
  return query;
}

function periodFromUrl(query: UrlQuery): Period | undefined {
  const from = many(query['from']).find(isDate);
  const to = many(query['to']).find(isDate);
  if (from && to && from <= to) return { kind: 'dates', from, to };
  const weeks = Number(many(query['last'])[0] ?? '');
  return Number.isInteger(weeks) && weeks >= 1 && weeks <= MOST_WEEKS
    ? { kind: 'last', weeks }
    : undefined;
}

function many(value: string | readonly string[] | null | undefined): readonly string[] {
  if (value === null || value === undefined || value === '') return [];
  return typeof value === 'string' ? [value] : [...new Set(value)];
}

function orNull(values: readonly string[]): string[] | null {
  return values.length > 0 ? [...values] : null;
}

function isBodyType(word: string): word is BodyType {
  return BODY_TYPES.some((type) => type === word);
}
