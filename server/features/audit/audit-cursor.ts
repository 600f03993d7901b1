import { refuseInput } from '#shared/domain/refusal';

/** A place in the trail as the opaque text that a caller hands back: the event told last. */
export function cursorOf(id: number): string {
  return Buffer.from(`event ${id}`).toString('base64url');
}

/** The event of a cursor; one that this list did not give out is refused (rule 67). */
export function eventOf(cursor: string | undefined): number | null {
  if (cursor === undefined) return null;
  const id = /^event ([1-9]\d{0,14})$/.exec(Buffer.from(cursor, 'base64url').toString('utf8'))?.[1];
  if (id !== undefined) return Number(id);
  throw refuseInput([
    { path: '/query/cursor', message: 'is not a cursor of this list; start without one' },
  ]);
}
