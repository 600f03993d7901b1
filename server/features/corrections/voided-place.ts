import * as z from 'zod';
import type { VoidedPlace } from '#db/queries/corrections';

/** A place in the list of voided jobs, as its cursor names it. */
export const voidedPlace: z.ZodType<VoidedPlace> = z.strictObject({
  voidedAt: z.string().max(64),
  id: z.int().min(1),
});
