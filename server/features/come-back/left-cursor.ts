import * as z from 'zod';
import type { ComeBackPlace } from '#db/queries/come-back';
import { isDate } from '#shared/domain/calendar';
import { refuseInput } from '#shared/domain/refusal';

const place = z.strictObject({
  danger: z.int().min(0).max(3),
  completedOn: z.string().refine(isDate),
  branch: z.string().max(12),
  jobRef: z.string().max(200),
  place: z.int().min(0).max(999),
  ref: z.string().max(200),
});

/** A place in the list as the opaque text that a caller hands back; it names values, so it survives inserts. */
export function cursorOf(at: ComeBackPlace): string {
  return Buffer.from(JSON.stringify(at)).toString('base64url');
}

/** The place of a cursor; one that this list did not give out is refused (rule 67). */
export function placeOf(cursor: string | undefined): ComeBackPlace | null {
  if (cursor === undefined) return null;
  const parsed = place.safeParse(decoded(cursor));
  if (parsed.success) return parsed.data;
  throw refuseInput([
    { path: '/query/cursor', message: 'is not a cursor of this list; start without one' },
  ]);
}

function decoded(cursor: string): unknown {
  try {
    return JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8')) as unknown;
  } catch {
    // Not one of ours; the schema says so.
    return undefined;
  }
}
