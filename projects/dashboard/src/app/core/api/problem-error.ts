import type { FieldProblem } from '#shared/contracts/fields';
import { describeProblem, type Problem } from './problem';

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

/** Whatever was thrown, as a problem; one that is told already stays as it is. */
export function problemFrom(error: unknown): Problem {
  if (!(error instanceof ProblemError)) return describeProblem(error);
  const { status, sentence, fields } = error;
  return { status, sentence, fields };
}
