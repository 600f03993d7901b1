import * as z from 'zod';

/** A place in the trail, as its cursor names it: the event told last. */
export const eventPlace = z.strictObject({ event: z.int().min(1) });
