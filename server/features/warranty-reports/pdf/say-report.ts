import type { WarrantyAnswer, WarrantyBranch } from '#shared/contracts/warranty';
import { roundedAmount } from '#shared/domain/give-or-take';
import { whole } from './format';

/** How a report's words are made: branches by name, money with its sign. */
export interface Voice {
  branch: (code: string) => string;
  money: (cents: number) => string;
}

/** The answer cut where its figure stands large. */
export interface Answer {
  before: string;
  figure: string;
  after: string;
  cars: string;
}

/** Branches named in a sentence; more are counted. */
const MOST_NAMED = 4;

/** What the warranties sold will still cost, in one sentence. */
export function sayAnswer(
  { covered, total, triangle }: Pick<WarrantyAnswer, 'covered' | 'total' | 'triangle'>,
  { money }: Voice,
): Answer {
  if (covered === 0) {
    const before = 'No car had been sold with a warranty by this day, so nothing is still to come.';
    return { before, figure: '', after: '', cars: '' };
  }
  const cars = ` (${count(covered, 'car')}).`;
  if (triangle.factors.length === 0) {
    const before =
      'What warranties already sold will still cost cannot be said: too few half-years stand behind it';
    return { before, figure: '', after: '', cars };
  }
  const { cents, giveOrTakeCents } = roundedAmount(
    total.outstandingCents,
    total.standardErrorCents,
  );
  const after =
    giveOrTakeCents === null
      ? '; too few half-years stand behind it to say give or take'
      : `, give or take ${whole(giveOrTakeCents / 100)}`;
  return {
    before: 'Warranties already sold will still cost about ',
    figure: money(cents),
    after,
    cars,
  };
}

/** Whether a branch stands outside what was expected of it: its whole interval misses 1. */
export function standing({
  ratio,
  lower,
  upper,
}: StandingFigures): 'above' | 'below' | 'as expected' | null {
  if (ratio === null || lower === null || upper === null) return null;
  if (lower > 1) return 'above';
  return upper < 1 ? 'below' : 'as expected';
}

type StandingFigures = Pick<WarrantyBranch, 'ratio' | 'lower' | 'upper'>;

/** Whether a branch stands above or below what was expected. */
export function standsOutside(branch: StandingFigures): boolean {
  const stands = standing(branch);
  return stands === 'above' || stands === 'below';
}

/** Which branches stand above or below what was expected of them, in one sentence. */
export function sayBranches(branches: readonly WarrantyBranch[], { branch }: Voice): string {
  const judged = branches.filter((one) => standing(one) !== null);
  if (judged.length === 0) return 'There are no claims yet to hold a branch against others by.';
  const rest = judged.filter((one) => !standsOutside(one)).length;
  if (rest === judged.length) {
    return rest === 1
      ? 'The one branch with claims expected is as expected.'
      : `All ${rest} branches are as expected.`;
  }
  const named: string[] = [];
  for (const side of ['above', 'below'] as const) {
    const found = judged.filter((one) => standing(one) === side);
    for (const one of found.slice(0, MOST_NAMED)) {
      const expected = whole(one.expected);
      const were = `where ${expected} ${expected === '1' ? 'was' : 'were'}`;
      const told = named.length === 0;
      const claims = told ? `has ${count(one.claims, 'claim')}` : whole(one.claims);
      named.push(`${branch(one.branch)} ${claims} ${were}${told ? ' expected' : ''}`);
    }
    const more = found.length - MOST_NAMED;
    if (more > 0) named.push(`${more} more ${more === 1 ? 'stands' : 'stand'} ${side}`);
  }
  return `${named.join(', ')}${sayRest(rest)}.`;
}

function sayRest(rest: number): string {
  if (rest === 0) return '';
  return rest === 1
    ? '; the other branch is as expected'
    : `; the other ${rest} branches are as expected`;
}

/** A number of things: `1 claim`, `23 claims`. */
export function count(number: number, thing: string): string {
  return `${whole(number)} ${thing}${number === 1 ? '' : 's'}`;
}
