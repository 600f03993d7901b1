import type { Action } from '#shared/contracts/actions';
import { isDate } from '#shared/domain/calendar';
import { BRANCH_MEASURES, type BranchMeasure } from '#shared/domain/vocabulary';

/** What stands in the form of an action. */
export interface TypedAction {
  readonly branch: string;
  readonly what: string;
  readonly who: string;
  readonly until: string;
  readonly measure: BranchMeasure;
}

/** An action as its form shows it. */
export function typedOf({ branch, what, who, until, measure }: Action): TypedAction {
  return { branch, what, who, until, measure };
}

/** A draft kept as text; one of an older release or of another hand may hold anything. */
export function parseTyped(text: string | undefined): Partial<TypedAction> {
  try {
    const found = JSON.parse(text ?? '{}') as Partial<Record<keyof TypedAction, unknown>> | null;
    const string = (name: 'branch' | 'what' | 'who'): Partial<TypedAction> => {
      const value = found?.[name];
      return typeof value === 'string' ? { [name]: value } : {};
    };
    const measure = BRANCH_MEASURES.find((one) => one === found?.measure);
    const until = found?.until;
    return {
      ...string('branch'),
      ...string('what'),
      ...string('who'),
      ...(typeof until === 'string' && isDate(until) ? { until } : {}),
      ...(measure ? { measure } : {}),
    };
  } catch {
    return {};
  }
}
