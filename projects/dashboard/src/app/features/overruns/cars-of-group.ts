import type { Params } from '@angular/router';
import { addDays, addMonths } from '#shared/domain/calendar';
import type { Grouping } from './overrun-words';

/** Query parameters of Jobs that show the cars behind a group: the page's scope and dates, narrowed to the group. */
export function carsOfGroup(
  by: Grouping,
  key: string,
  period: { readonly from: string; readonly to: string },
): Params {
  return { ...period, hasEstimate: 'true', sort: 'overrun', ...narrowed(by, key, period) };
}

function narrowed(by: Grouping, key: string, period: { from: string; to: string }): Params {
  switch (by) {
    case 'rotFound':
      return { hasRot: String(key === 'found') };
    case 'month': {
      const first = `${key}-01`;
      const last = addDays(addMonths(first, 1), -1);
      // A month cut by the period shows the cars that were counted.
      return {
        from: first > period.from ? first : period.from,
        to: last < period.to ? last : period.to,
      };
    }
    default:
      return { [by]: key };
  }
}
