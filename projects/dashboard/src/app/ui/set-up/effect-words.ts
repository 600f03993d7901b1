import type { Effect, PlannedChange } from '#shared/contracts/set-up-help';
import { formatCars, formatCounted, formatList, formatMoney, formatShortDate } from '../format';

type Figure = Effect['figures'][number];

/** Figures that a change can move, as people call them. */
const FIGURE_NAMES: Readonly<Record<Figure, string>> = {
  margin: 'margin',
  expected_margin: 'expected margin',
  bridge: 'the bridge',
  product_against_norm: 'product against its norm',
  quote_price: 'prices quoted from now on',
  product_need: 'product still needed',
  region_comparison: 'how regions compare',
  corrosivity: 'the corrosivity shown with the region',
  new_warranties: 'warranty of cars finished from now on',
};

/** What saving a change would move, said before it is saved. */
export function effectSentences(
  effect: Effect,
  change: PlannedChange,
  currency: string,
): readonly string[] {
  return [
    carsSentence(effect, change),
    ...moneySentence(effect, currency),
    figuresSentence(effect.figures),
  ].filter((sentence) => sentence !== '');
}

function carsSentence({ jobs, branches, from }: Effect, { kind }: PlannedChange): string {
  if (kind === 'warranty') return 'Cars already sold keep the warranty they were sold with.';
  if (kind === 'climate') return '';
  if (jobs === 0) return 'No finished car is touched.';
  const cars = formatCars(jobs);
  const where = formatCounted(branches, 'branch', 'branches');
  if (kind === 'branchRegion')
    return `${cars} of the branch count in the new region, back to the first.`;
  const since = from ? ` from ${formatShortDate(from)}` : '';
  return `${cars} of ${where}${since} ${jobs === 1 ? 'is' : 'are'} computed anew.`;
}

function moneySentence({ marginCents, jobs }: Effect, currency: string): string[] {
  if (!marginCents || jobs === 0) return [];
  const { before, after } = marginCents;
  const was = formatMoney(before, currency);
  if (before === after) return [`What they kept stays ${was}.`];
  return [`What they kept goes from ${was} to ${formatMoney(after, currency)}.`];
}

function figuresSentence(figures: readonly Figure[]): string {
  if (figures.length === 0) return '';
  return `It moves ${formatList(figures.map((figure) => FIGURE_NAMES[figure]))}.`;
}

/** What was done, after the figures switched. */
export function restatedWords(restatedJobs: number): string {
  return restatedJobs === 0 ? 'Saved.' : `Saved. ${formatCars(restatedJobs)} computed anew.`;
}
