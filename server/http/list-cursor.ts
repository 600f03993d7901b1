import type * as z from 'zod';
import { refuseInput } from '#shared/domain/refusal';

/** A place in a list as the opaque text that a caller hands back; it names values, so it survives inserts. */
export function cursorOf(place: object): string {
  return Buffer.from(JSON.stringify(place)).toString('base64url');
}

/** The place that a cursor names in the list whose places are of that shape; any other is refused (rule 67). */
export function placeOf<Place>(cursor: string | undefined, list: z.ZodType<Place>): Place | null {
  if (cursor === undefined) return null;
  const parsed = list.safeParse(decoded(cursor));
  if (parsed.success) return parsed.data;
  throw refuseInput([
    { path: '/query/cursor', message: 'is not a cursor of this list; start without one' },
  ]);
}

function decoded(cursor: string): unknown {
  try {
    return JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8')) as unknown;
  } catch {
    // Not one of ours; the shape of the list's places says so.
    return undefined;
  }
}
