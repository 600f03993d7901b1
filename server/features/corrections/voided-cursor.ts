import * as z from 'zod';
import type { VoidedPlace } from '#db/queries/corrections';
import { refuseInput } from '#shared/domain/refusal';

const place = z.strictObject({ voidedAt: z.string().max(64), id: z.int().min(1) });

/** A place in the list of voided jobs as the opaque text that a caller hands back. */
export function cursorOf({ voidedAt, id }: VoidedPlace): string {
  return Buffer.from(JSON.stringify({ voidedAt, id })).toString('base64url');
}

/** The place of a cursor; one that this list did not give out is refused (rule 67). */
export function placeOf(cursor: string | undefined): VoidedPlace | null {
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
