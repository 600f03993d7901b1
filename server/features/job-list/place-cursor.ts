import * as z from 'zod';
import type { JobSort, ListPlace } from '#db/queries/job-list';
import { isDate } from '#shared/domain/calendar';
import { refuseInput } from '#shared/domain/refusal';

const place = z.strictObject({
  sort: z.string(),
  key: z.int(),
  completedOn: z.string().refine(isDate),
  branch: z.string().max(12),
  jobRef: z.string().max(200),
});

/** A place in the list as the opaque text that a caller hands back; it names values, so it survives inserts. */
export function cursorOf(at: ListPlace, sort: JobSort): string {
  return Buffer.from(JSON.stringify({ sort, ...at })).toString('base64url');
}

/** The place of a cursor; one that was not given out for this sort is refused (rule 67). */
export function placeOf(cursor: string | undefined, sort: JobSort): ListPlace | null {
  if (cursor === undefined) return null;
  const parsed = place.safeParse(decoded(cursor));
  if (!parsed.success || parsed.data.sort !== sort) {
    throw refuseInput([
      { path: '/query/cursor', message: 'is not a cursor of this list; start without one' },
    ]);
  }
  const { sort: _sort, ...at } = parsed.data;
  return at;
}

function decoded(cursor: string): unknown {
  try {
    return JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8')) as unknown;
  } catch {
    // Not one of ours; the schema says so.
    return undefined;
  }
}
