import type { Params } from '@angular/router';
import type { CellLink } from '../../ui/data-table/column';

/** What narrows the page's claims to those behind a figure. */
export interface ClaimNarrowing {
  readonly branch?: string;
  readonly region?: string;
  readonly package?: string;
  readonly ageBand?: string;
  readonly cohort?: string;
  readonly zone?: string;
  readonly cause?: string;
  readonly decision?: string;
  readonly counted?: 'true' | 'false';
  readonly waiting?: 'true';
}

/** Where figures lead: to claims and to cars, both within the page's own scope. */
export interface WarrantyLinks {
  readonly claims: (narrowing?: ClaimNarrowing) => CellLink;
  readonly cars: (narrowing?: Params) => CellLink;
}

/**
 * Leads from the page's scope: `asked` is what the page asked for, `period` the days its cars were finished on. Unless told otherwise
 * only claims that count are meant.
 */
export function warrantyLinks(
  asked: Params,
  period: { readonly from: string; readonly to: string },
): WarrantyLinks {
  // Jobs are listed as they stand today.
  const jobs = Object.fromEntries(Object.entries(asked).filter(([name]) => name !== 'asOf'));
  return {
    claims: (narrowing = {}) => ({
      commands: ['/claims'],
      query: { ...asked, counted: 'true', ...narrowing },
    }),
    cars: (narrowing = {}) => ({
      commands: ['/jobs'],
      query: { ...jobs, ...period, ...narrowing },
    }),
  };
}
