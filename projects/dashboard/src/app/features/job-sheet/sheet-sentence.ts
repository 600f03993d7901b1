import type { JobSheet } from '#shared/contracts/jobs';
import { STAGES } from '#shared/domain/vocabulary';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatDate, formatMinutes, formatMoney, formatShare } from '../../ui/format';

/** What the sheet's sentence needs beside the job. */
export interface SheetKnown {
  readonly currency: string;
  readonly packageName: string;
  readonly branchName: string;
}

/** Minutes of a job, all stages together; the estimate is `undefined` when there was none. */
export function totalMinutes(job: JobSheet): { actual: number; estimate: number | undefined } {
  const sum = (stages: JobSheet['actual']['stages']): number =>
    STAGES.reduce((total, stage) => total + (stages[stage] ?? 0), 0);
  const estimate = job.estimate ? sum(job.estimate.stages) : 0;
  return { actual: sum(job.actual.stages), estimate: estimate > 0 ? estimate : undefined };
}

/** The job in a sentence: what it kept, or what it has cost, or (for those who see no money) how long it took. */
export function sheetSentence(
  job: JobSheet,
  known: SheetKnown,
): { readonly sentence: readonly AnswerPart[]; readonly second: readonly AnswerPart[] } {
  return { sentence: first(job, known), second: [second(job, known)] };
}

function first(job: JobSheet, known: SheetKnown): readonly AnswerPart[] {
  const name = `Job ${job.jobRef}`;
  const money = job.money;
  if (!money) {
    const words = `${name} took `;
    const figure = { figure: formatMinutes(totalMinutes(job).actual) };
    return money === null
      ? [words, figure, ' of labour; its margin waits for a cost that is missing.']
      : [words, figure, ' of labour', ...estimateWords(job), '.'];
  }
  if (money.revenueCents === null || money.marginCents === null) {
    return [
      `${name} is not billed and has cost `,
      { figure: formatMoney(money.costCents, known.currency) },
      ' so far.',
    ];
  }
  const kept = formatMoney(money.marginCents, known.currency);
  const billed = formatMoney(money.revenueCents, known.currency);
  return money.marginShare === null
    ? [`${name} kept `, { figure: kept }, ` of ${billed} billed.`]
    : [
        `${name} kept `,
        { figure: formatShare(money.marginShare) },
        ' of what it billed ',
        { quiet: `(${kept} of ${billed})` },
        '.',
      ];
}

function estimateWords(job: JobSheet): readonly AnswerPart[] {
  const { estimate } = totalMinutes(job);
  return estimate === undefined ? [] : [{ quiet: ` (${formatMinutes(estimate)} estimated)` }];
}

function second(job: JobSheet, known: SheetKnown): string {
  const { make, model, firstRegistered } = job.vehicle;
  return (
    `${make} ${model} ${firstRegistered.slice(0, 4)}, ${known.packageName}, ` +
    `finished ${formatDate(job.completedOn)} at ${known.branchName}.`
  );
}
