/** Two revisions to compare, the earlier first. */
export interface RevisionPair {
  readonly from: number;
  readonly to: number;
}

/** Reads `2-4` from the URL; `undefined` where it names no two revisions that there are. */
export function revisionPair(words: string | undefined, newest: number): RevisionPair | undefined {
  const match = /^(\d{1,9})-(\d{1,9})$/.exec(words ?? '');
  if (!match) return undefined;
  const one = Number(match[1]);
  const other = Number(match[2]);
  const from = Math.min(one, other);
  const to = Math.max(one, other);
  return from >= 1 && from < to && to <= newest ? { from, to } : undefined;
}

/** As the URL has it. */
export function pairToUrl({ from, to }: RevisionPair): string {
  return `${from}-${to}`;
}
