import type { ComparedBranch, SideBySideAnswer } from '#shared/contracts/branches';
import { formatList } from '../../ui/format';
import { formatMeasure, formatMeasureChange } from '../../ui/measure-words';
import { apartWords, type BranchWords, signedChange, stepName } from './branch-words';

/** A row of the comparison: the reference, a step, or where a branch ends; values in the order of the branches. */
export interface StepRow {
  readonly key: string;
  readonly label: string;
  readonly kind: 'start' | 'step' | 'sum';
  readonly values: readonly (number | null)[];
  readonly texts: readonly string[];
}

/** Branches side by side, in steps that add up to each one's value. */
export interface SideBySide {
  readonly sentence: string;
  readonly branches: readonly { readonly code: string; readonly name: string }[];
  readonly rows: readonly StepRow[];
  /** The largest step, whatever its sign: one scale for all bars. */
  readonly reach: number;
}

/** How many branches are laid side by side. */
export const MOST_BESIDE = 4;

/** The branches that the URL lays side by side, as far as they are there; one that is alone stands by itself. */
export function chosenBeside(
  asked: string | readonly string[] | undefined,
  there: readonly string[],
): string[] {
  if (there.length === 1) return [...there];
  const codes = [asked ?? []].flat().flatMap((one) => one.split(','));
  return there.filter((code) => codes.includes(code)).slice(0, MOST_BESIDE);
}

type Told = ComparedBranch & { steps: NonNullable<ComparedBranch['steps']>; value: number };

/** Lays the branches of an answer side by side, by name; those without a value have empty cells. */
export function sideBySide(answer: SideBySideAnswer, words: BranchWords): SideBySide {
  const { measure, network } = answer;
  const branches = answer.branches
    .map((one) => ({ ...one, name: words.branchName(one.branch) }))
    .sort((a, b) => a.name.localeCompare(b.name, 'en'));
  const keys = [...new Set(branches.flatMap(({ steps }) => steps?.map(({ key }) => key) ?? []))];
  const stepRows = keys
    .map((key): StepRow => {
      const values = branches.map(
        ({ steps }) => steps?.find((step) => step.key === key)?.value ?? null,
      );
      return {
        key,
        label: stepName(measure, key, words),
        kind: 'step',
        values,
        texts: values.map((value) => (value === null ? '' : signedChange(measure, value))),
      };
    })
    // A step that is nothing anywhere says nothing; the mix is told even then.
    .filter(({ key, values }) => key === 'mix' || values.some((value) => (value ?? 0) !== 0));
  const total = (key: string, label: string, kind: 'start' | 'sum', values: (number | null)[]) => ({
    key,
    label,
    kind,
    values,
    texts: values.map((value) =>
      value === null ? 'too few cars yet' : formatMeasure(measure, value),
    ),
  });
  return {
    sentence: sentenceOf(answer, words),
    branches: branches.map(({ branch, name }) => ({ code: branch, name })),
    rows: [
      total(
        'network',
        answer.reference === 'network' ? 'the whole network' : 'all branches shown here',
        'start',
        branches.map(() => network),
      ),
      ...stepRows,
      total(
        'value',
        'the branch',
        'sum',
        branches.map(({ value }) => value),
      ),
    ],
    reach: Math.max(
      0,
      ...stepRows.flatMap(({ values }) => values.map((value) => Math.abs(value ?? 0))),
    ),
  };
}

/** The largest difference among the branches and the steps that make most of it. */
function sentenceOf({ branches, measure, network }: SideBySideAnswer, words: BranchWords): string {
  const told = branches.filter((one): one is Told => one.steps !== null && one.value !== null);
  if (told.length === 0) return 'Too few cars yet to say what sets them apart.';
  const high = told.reduce((most, one) => (one.value > most.value ? one : most));
  const low = told.reduce((least, one) => (one.value < least.value ? one : least));
  const name = words.branchName(high.branch);
  if (told.length === 1) {
    if (network === null) return '';
    return `${name} lies ${apartWords(measure, high.value - network)} the reference; ${most(
      high.steps,
      Math.sign(high.value - network),
    )}.`;
  }
  const steps = high.steps.map(({ key, value }) => ({
    key,
    value: value - (low.steps.find((step) => step.key === key)?.value ?? 0),
  }));
  if (high.value === low.value) return `${name} and the others lie at the same.`;
  return `${name} lies ${apartWords(measure, high.value - low.value)} ${words.branchName(low.branch)}; ${most(steps, 1)}.`;

  function most(all: readonly { key: string; value: number }[], sign: number): string {
    const largest = all
      .filter(({ value }) => value * sign > 0)
      .sort((a, b) => Math.abs(b.value) - Math.abs(a.value))
      .slice(0, 2);
    const [first, ...rest] = largest;
    if (!first) return 'no single step makes it';
    return formatList([
      `${stepName(measure, first.key, words)} gives ${formatMeasureChange(measure, first.value)}`,
      ...rest.map(
        ({ key, value }) =>
          `${stepName(measure, key, words)} ${formatMeasureChange(measure, value)}`,
      ),
    ]);
  }
}
