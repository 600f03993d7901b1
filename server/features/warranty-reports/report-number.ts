/** The number of a report as its path names it, or `undefined` where that is no number of one. */
export function reportNumber(id: string): number | undefined {
  return /^[1-9]\d{0,14}$/.test(id) ? Number(id) : undefined;
}
