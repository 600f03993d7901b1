import { HttpErrorResponse } from '@angular/common/http';
import type { FieldProblem } from '#shared/contracts/fields';

/** What went wrong with a call, in words for a person. */
export interface Problem {
  /** HTTP status; 0 when no answer came. */
  readonly status: number;
  /** One or two sentences: what happened, what is kept, what to do. */
  readonly sentence: string;
  /** Bad fields by JSON pointer, empty when the body was not the trouble. */
  readonly fields: readonly FieldProblem[];
}

/** A problem that is thrown, for a caller that catches it instead of reading it from a signal. */
export class ProblemError extends Error implements Problem {
  readonly status: number;
  readonly sentence: string;
  readonly fields: readonly FieldProblem[];

  constructor({ status, sentence, fields }: Problem) {
    super(sentence);
    this.status = status;
    this.sentence = sentence;
    this.fields = fields;
  }
}

/** Turns whatever a call threw (usually an RFC 9457 document) into sentences. */
export function describeProblem(error: unknown): Problem {
  const cause = error instanceof Error && error.cause !== undefined ? error.cause : error;
  if (cause instanceof ProblemError) {
    const { status, sentence, fields } = cause;
    return { status, sentence, fields };
  }
  if (!(cause instanceof HttpErrorResponse)) {
    return { status: 0, sentence: 'Something went wrong on this page. Try again.', fields: [] };
  }
  const document = problemDocument(cause.error);
  return {
    status: cause.status,
    sentence: sentence(cause, document.detail),
    fields: document.problems,
  };
}

/** The message for one field of a form, looked up by JSON pointer (`/newPassword`). */
export function fieldMessage(problem: Problem | undefined, pointer: string): string | undefined {
  return problem?.fields.find((field) => field.path === pointer)?.message;
}

function sentence(response: HttpErrorResponse, detail: string | undefined): string {
  switch (response.status) {
    case 0:
      return 'No answer from the server. Nothing typed here is lost; try again when the line is back.';
    case 401:
      return detail ?? 'This sign-in has ended. Sign in again to go on.';
    case 403:
      return detail ?? 'Your role does not include this.';
    case 404:
      return 'Not found, or not among the branches you see.';
    case 412:
      return `${stop(detail ?? 'Somebody changed this in the meantime')} Nothing was written; load it again to see the change.`;
    case 422:
      return stop(detail ?? 'Some of this cannot be taken as it is');
    case 429:
      return `Too many attempts. Wait ${waiting(response.headers.get('Retry-After'))} and try again.`;
    default:
      return response.status >= 500
        ? 'The server could not do this just now. Try again in a minute.'
        : stop(detail ?? 'The server did not accept this');
  }
}

function stop(text: string): string {
  return /[.!?]$/.test(text) ? text : `${text}.`;
}

function waiting(header: string | null): string {
  const seconds = Number(header);
  if (!Number.isFinite(seconds) || seconds <= 0) return 'a while';
  if (seconds <= 90) return `${Math.ceil(seconds)} seconds`;
  return `${Math.ceil(seconds / 60)} minutes`;
}

function problemDocument(body: unknown): { detail?: string; problems: readonly FieldProblem[] } {
  const parsed = typeof body === 'string' ? parseJson(body) : body;
  if (typeof parsed !== 'object' || parsed === null) return { problems: [] };
  const detail =
    'detail' in parsed && typeof parsed.detail === 'string' ? parsed.detail : undefined;
  const problems = 'problems' in parsed && Array.isArray(parsed.problems) ? parsed.problems : [];
  return { detail: detail || undefined, problems: problems.filter(isFieldProblem) };
}

function isFieldProblem(value: unknown): value is FieldProblem {
  return (
    typeof value === 'object' &&
    value !== null &&
    'path' in value &&
    typeof value.path === 'string' &&
    'message' in value &&
    typeof value.message === 'string'
  );
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    // A proxy's page of HTML is no problem document.
    return undefined;
  }
}
