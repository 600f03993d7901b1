/** The reference proposed for a claim recorded on a day; the branch may write its own. */
export function proposeReference(today: string): string {
  return `W-${today}`;
}

/** The next one of the proposed kind, or `undefined` after a reference that somebody wrote themselves. */
export function nextReference(claimRef: string): string | undefined {
  const match = /^(W-\d{4}-\d{2}-\d{2})(?:-([1-9]\d{0,3}))?$/.exec(claimRef);
  if (!match) return undefined;
  const [, day = '', number] = match;
  return `${day}-${number === undefined ? 2 : Number(number) + 1}`;
}
