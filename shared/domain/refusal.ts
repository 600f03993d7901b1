import type { RuleBreak } from './job-rules';

/** Why a use case refuses: what a caller may be told, without any word of HTTP. */
export type RefusalKind =
  | 'bad-input'
  | 'not-found'
  | 'forbidden'
  | 'conflict'
  | 'precondition'
  | 'unauthenticated'
  | 'too-many';

/** Thrown by a use case; answered by the one error handler. */
export class Refusal extends Error {
  constructor(
    readonly kind: RefusalKind,
    readonly detail: string,
    readonly problems: readonly RuleBreak[] = [],
    /** Seconds to wait before trying again, with `too-many`. */
    readonly retryAfterSeconds?: number,
  ) {
    super(detail);
  }
}

/** The input cannot be taken; every problem is named. */
export function refuseInput(problems: readonly RuleBreak[]): Refusal {
  const count = problems.length === 1 ? 'One field needs' : `${problems.length} fields need`;
  return new Refusal('bad-input', `${count} attention; nothing was stored.`, problems);
}

/** There is no such thing in the caller's scope. */
export function notFound(): Refusal {
  return new Refusal('not-found', 'There is nothing under this address.');
}
