import * as z from 'zod';
import type { ActionPlace } from '#db/queries/actions';

/** A place in the list of actions, as its cursor names it. */
export const actionPlace: z.ZodType<ActionPlace> = z.strictObject({
  ended: z.int().min(0).max(1),
  key: z.string().max(20),
  id: z.int(),
});
