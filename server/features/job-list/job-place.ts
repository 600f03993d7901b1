import * as z from 'zod';
import type { JobSort, ListPlace } from '#db/queries/job-list';
import { isDate } from '#shared/domain/calendar';

/** A place in the list of jobs in one order, as its cursor names it: in another order its key would mean something else. */
export function jobPlace(sort: JobSort): z.ZodType<ListPlace & { sort: JobSort }> {
  return z.strictObject({
    sort: z.literal(sort),
    key: z.int(),
    completedOn: z.string().refine(isDate),
    branch: z.string().max(12),
    jobRef: z.string().max(200),
  });
}
