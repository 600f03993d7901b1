import type { ProblemDocument } from '#shared/contracts/fields';
import { Refusal, type RefusalKind } from '#shared/domain/refusal';

/** A refusal of the transport itself, before any use case is reached. */
export class HttpProblem extends Error {
  constructor(
    readonly status: number,
    readonly title: string,
    readonly detail: string,
  ) {
    super(detail);
  }
}

/** What is sent for an error: an RFC 9457 document and its headers. */
export interface ProblemReply {
  document: ProblemDocument;
  headers: Record<string, string>;
}

const STATUS: Record<RefusalKind, [number, string]> = {
  'bad-input': [422, 'The input needs correcting'],
  'not-found': [404, 'Not found'],
  forbidden: [403, 'Not allowed'],
  conflict: [409, 'Already there'],
  precondition: [412, 'Changed meanwhile'],
  unauthenticated: [401, 'Sign in first'],
  'too-many': [429, 'Too many attempts'],
};

/** The problem document of a refusal, or `undefined` for an error that is a defect of ours. */
export function problemOf(error: unknown): ProblemReply | undefined {
  if (error instanceof Refusal) {
    const [status, title] = STATUS[error.kind];
    return {
      document: {
        type: 'about:blank',
        title,
        status,
        detail: error.detail,
        ...(error.kind === 'bad-input' && { problems: [...error.problems] }),
      },
      headers: {
        ...(error.kind === 'unauthenticated' && { 'WWW-Authenticate': 'Bearer' }),
        ...(error.retryAfterSeconds !== undefined && {
          'Retry-After': String(error.retryAfterSeconds),
        }),
      },
    };
  }
  if (error instanceof HttpProblem) {
    const { status, title, detail } = error;
    return { document: { type: 'about:blank', title, status, detail }, headers: {} };
  }
  if (error instanceof URIError) return problemOf(UNREADABLE_ADDRESS);
  return undefined;
}

/** The router could not decode a part of the path. */
const UNREADABLE_ADDRESS = new HttpProblem(
  400,
  'Not readable',
  'The address is not percent-encoded UTF-8.',
);
