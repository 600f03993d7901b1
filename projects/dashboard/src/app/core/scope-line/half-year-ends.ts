/** The last so many ends of a half-year, 30 June or 31 December, on or before a day; the newest first. */
export function halfYearEnds(today: string, count: number): string[] {
  const year = Number(today.slice(0, 4));
  const years = Array.from({ length: Math.ceil(count / 2) + 1 }, (_, back) => year - back);
  return years
    .flatMap((each) => [`${each}-12-31`, `${each}-06-30`])
    .filter((end) => end <= today)
    .slice(0, count);
}
