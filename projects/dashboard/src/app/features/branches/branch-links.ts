import type { Params } from '@angular/router';
import type { BranchMeasure } from '#shared/domain/vocabulary';
import type { CellLink } from '../../ui/data-table/column';

const PAGE_OF: Readonly<Record<BranchMeasure, string>> = {
  overrun: '/overruns',
  rot: '/rot',
  claims: '/warranty',
  product: '/product',
  margin: '/this-week',
};

/** Leads to a branch's own page in a measure, with the kinds and dates that are looked at. */
export function branchLink(measure: BranchMeasure, branch: string, filters: Params): CellLink {
  const { region: _region, ...kept } = filters;
  return { commands: [PAGE_OF[measure]], query: { ...kept, branch } };
}
