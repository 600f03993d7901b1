import type { Params } from '@angular/router';
import type { AgeBand, Side, Zone } from '#shared/domain/vocabulary';

/** What narrows the cars with rot behind a figure. */
export interface RotNarrowing {
  readonly ageBand?: AgeBand | null;
  readonly region?: string;
  readonly zone?: Zone;
  readonly side?: Side;
  readonly make?: string;
  readonly model?: string;
}

/** Query parameters of Jobs that show the cars with rot behind a figure: the page's scope and dates, narrowed. */
export function carsWithRot(
  filters: Params,
  period: { readonly from: string; readonly to: string },
  narrowing: RotNarrowing,
): Params {
  const given = Object.entries(narrowing).filter(
    ([, value]) => value !== undefined && value !== null,
  );
  return { ...filters, ...period, hasRot: 'true', ...Object.fromEntries(given) };
}
