import type { KeyObject } from 'node:crypto';
import jwt from 'jsonwebtoken';

/** How long an access token is good for. What it allows is read anew for each request, so this is only how long it lives. */
export const ACCESS_TOKEN_SECONDS = 600;

/** The only algorithm that is made or accepted. */
export const TOKEN_ALGORITHM = 'HS256';

/** What an access token says: a person and the sign-in it came from. */
export interface TokenClaims {
  personId: number;
  signInId: number;
}

/** Makes an access token (RFC 7519) with `sub` the person and `sid` the sign-in. */
export function issueAccessToken(key: KeyObject, claims: TokenClaims, now: Date): string {
  const issuedAt = Math.floor(now.getTime() / 1000);
  return jwt.sign({ sid: claims.signInId, iat: issuedAt }, key, {
    subject: String(claims.personId),
    algorithm: TOKEN_ALGORITHM,
    expiresIn: ACCESS_TOKEN_SECONDS,
  });
}

/** Reads what a verified payload says, or `undefined` when it is not one of ours. */
export function claimsOf(payload: unknown): TokenClaims | undefined {
  if (typeof payload !== 'object' || payload === null) return undefined;
  const { sub, sid } = payload as { sub?: unknown; sid?: unknown };
  const personId = typeof sub === 'string' ? Number(sub) : Number.NaN;
  if (!Number.isSafeInteger(personId) || !Number.isSafeInteger(sid)) return undefined;
  return { personId, signInId: sid as number };
}

/** When a verified payload is over (`exp`, seconds); at once where it does not say. */
export function endOf(payload: unknown): Date {
  const exp = (payload as { exp?: unknown } | null)?.exp;
  return new Date(typeof exp === 'number' ? exp * 1000 : 0);
}
