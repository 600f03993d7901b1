import * as z from 'zod';
import type { ClaimPlace, ClaimSort } from '#db/queries/claim-list';
import { isDate } from '#shared/domain/calendar';

/** A place in the list of claims in one order, as its cursor names it: in another order its key would mean something else. */
export function claimPlace(sort: ClaimSort): z.ZodType<ClaimPlace & { sort: ClaimSort }> {
  return z.strictObject({
    sort: z.literal(sort),
    key: z.int(),
    completedOn: z.string().refine(isDate),
    branch: z.string().max(12),
    jobRef: z.string().max(200),
    claimRef: z.string().max(200),
  });
}
