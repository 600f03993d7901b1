import type { IncomingMessage } from 'node:http';

/** Longer than any token made here; what exceeds it is not looked at. */
const LONGEST = 2000;

/** The token of `Authorization: Bearer …` (RFC 6750), or null. Anchored, so that a hostile header costs one pass at most. */
export function bearerToken(request: Pick<IncomingMessage, 'headers'>): string | null {
  const header = request.headers.authorization;
  if (header === undefined || header.length > LONGEST) return null;
  return /^bearer +([^\s]+)$/i.exec(header)?.[1] ?? null;
}
