import * as z from 'zod';
import type { SignalPlace } from '#db/queries/signals';
import { SIGNAL_KINDS } from '#shared/domain/vocabulary';

/** A place in the list of signals, as its cursor names it. */
export const signalPlace: z.ZodType<SignalPlace> = z.strictObject({
  kind: z
    .int()
    .min(0)
    .max(SIGNAL_KINDS.length - 1),
  branch: z.string().max(12),
  id: z.int().min(1),
});
