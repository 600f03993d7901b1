import type { Params } from '@angular/router';
import type { OutOf } from '#shared/contracts/endpoint';
import type { listSignals, Signal } from '#shared/contracts/signals';
import { tellSignal } from '#shared/domain/tell-signal';
import { formatCount, formatCounted, formatList } from '../../ui/format';

/** The most that are said in words; the others are counted. */
const TOLD = 3;
/** Above so many branches they are counted, not named. */
const MOST_NAMED = 2;

/** What stands open beside the week: one line, and where it leads. */
export interface OpenSignals {
  /** "3 open signals". */
  readonly count: string;
  /** The weightiest in words, read after the count. */
  readonly words: string;
  /** Query of *Signals* that lists exactly these. */
  readonly query: Params;
}

/** Where the page looks, as it asked and as it was answered. */
interface Looked {
  readonly region: readonly string[] | undefined;
  readonly branch: readonly string[] | undefined;
  /** Every branch of the answer. */
  readonly codes: readonly string[];
  readonly branchName: (code: string) => string;
}

/** Says the open signals, the weightiest first as the list has them; `undefined` when there is none. */
export function openSignals(
  { items, counts, nextCursor }: OutOf<typeof listSignals>,
  { region, branch, codes, branchName }: Looked,
): OpenSignals | undefined {
  if (counts.open === 0 || items.length === 0) return undefined;
  const groups = alike(items, branchName);
  const told = groups.slice(0, TOLD);
  const left = counts.open - told.reduce((sum, { count }) => sum + count, 0);
  const parts = told.map(({ title, branches }, index) => {
    // The list was cut within this one: there are branches beyond those counted.
    const cut = nextCursor !== null && index === groups.length - 1;
    if (codes.length === 1) return title;
    return `${title} (${placeWords([...branches], branchName, cut)})`;
  });
  return {
    count: formatCounted(counts.open, 'open signal', 'open signals'),
    words: formatList([...parts, ...(left > 0 ? [`${formatCount(left)} more`] : [])]),
    query: { region, branch: branch ?? (codes.length === 1 ? codes : undefined), state: 'open' },
  };
}

interface Alike {
  readonly title: string;
  count: number;
  readonly branches: Set<string>;
}

/** Signals that say the same of several branches, said once. */
function alike(items: readonly Signal[], branchName: (code: string) => string): Alike[] {
  const groups = new Map<string, Alike>();
  for (const one of items) {
    const title = withinSentence(tellSignal(one, branchName(one.branch)).title);
    const group = groups.get(title) ?? { title, count: 0, branches: new Set() };
    group.count += 1;
    group.branches.add(one.branch);
    groups.set(title, group);
  }
  return [...groups.values()];
}

function placeWords(
  branches: readonly string[],
  branchName: (code: string) => string,
  cut: boolean,
): string {
  if (cut) return `${formatCount(branches.length)} branches or more`;
  if (branches.length <= MOST_NAMED) return formatList(branches.map(branchName));
  return `${formatCount(branches.length)} branches`;
}

function withinSentence(title: string): string {
  return title.charAt(0).toLowerCase() + title.slice(1);
}
