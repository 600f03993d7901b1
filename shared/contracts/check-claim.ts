import { breaksOfClaim } from '#shared/domain/claim-rules';
import { claimContent, type ClaimContent } from './claims';
import type { FieldProblem } from './fields';
import { joined, problemsOf } from './read-problems';

/** Reads one claim of unknown shape: its content, or everything that is wrong with its own fields at once (rule 57). */
export function readClaim(
  raw: unknown,
  today: string,
): { content: ClaimContent } | { problems: readonly FieldProblem[] } {
  const parsed = claimContent.safeParse(raw);
  const broken = breaksOfClaim(raw, today);
  if (parsed.success && broken.length === 0) return { content: parsed.data };
  return { problems: joined(parsed.success ? [] : problemsOf(parsed.error), broken) };
}
