import * as z from 'zod';
import type { ComeBackPlace } from '#db/queries/come-back';
import { isDate } from '#shared/domain/calendar';

/** A place in the list of what was left on cars, as its cursor names it. */
export const leftPlace: z.ZodType<ComeBackPlace> = z.strictObject({
  danger: z.int().min(0).max(3),
  completedOn: z.string().refine(isDate),
  branch: z.string().max(12),
  jobRef: z.string().max(200),
  place: z.int().min(0).max(999),
  ref: z.string().max(200),
});
