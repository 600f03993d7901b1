import * as z from 'zod';

/** A place in the list of reports, as its cursor names it: the report told last. */
export const reportPlace = z.strictObject({ report: z.int().min(1) });
