import { CHECKS, STAGES } from '#shared/domain/vocabulary';
import type { DraftDocument } from './draft-document';
import type { SendStep } from './send-steps';

/** How far a step is filled in. `open`: nothing needed is missing, and nothing is written either. */
export type StepState = 'done' | 'begun' | 'empty' | 'open';

/** How far a step is filled in, to be seen in the list of steps. */
export function stepState(document: DraftDocument, step: SendStep): StepState {
  switch (step) {
    case 'car':
      return ofNeeded([
        document.jobRef?.trim(),
        document.vehicle?.make?.trim(),
        document.vehicle?.model?.trim(),
        document.vehicle?.bodyType,
        document.vehicle?.firstRegistered,
      ]);
    case 'package':
      return ofNeeded([document.package, document.completedOn]);
    case 'stages':
      return STAGES.some((stage) => document.actual?.stages[stage] !== undefined)
        ? 'done'
        : 'empty';
    case 'findings':
      return findingsState(document);
    case 'product':
      return productState(document);
    case 'invoice':
      return document.invoice || document.notes ? 'done' : 'open';
    default:
      return 'open';
  }
}

/** As a screen reader and the list say it. */
export const STATE_WORDS: Readonly<Record<StepState, string>> = {
  done: 'done',
  begun: 'begun',
  empty: 'still empty',
  open: 'nothing written',
};

function ofNeeded(values: readonly unknown[]): StepState {
  const there = values.filter((value) => value !== undefined && value !== '').length;
  if (there === values.length) return 'done';
  return there > 0 ? 'begun' : 'empty';
}

function findingsState({ findings }: DraftDocument): StepState {
  if (!findings || findings.length === 0) return 'open';
  const whole = findings.every(
    (one) => one.zone && one.side && one.seenAs && one.action && one.structural !== undefined,
  );
  return whole ? 'done' : 'begun';
}

function productState({ products, checks }: DraftDocument): StepState {
  const answered = CHECKS.filter((check) => checks?.[check] !== undefined).length;
  if (answered === CHECKS.length && products) return 'done';
  return answered > 0 || products ? 'begun' : 'empty';
}
