/** Calendar half-years, written `2024-H1`; as text they stand in the order of time. */

/** The half-year of a date. */
export function halfYearOf(date: string): string {
  return `${date.slice(0, 4)}-H${Number(date.slice(5, 7)) <= 6 ? 1 : 2}`;
}

/** The half-year so many later; earlier when negative. */
export function halfYearLater(halfYear: string, steps: number): string {
  return textOf(numberOf(halfYear) + steps);
}

/** How many half-years lie between two: 0 for the same, 1 for the next. */
export function halfYearsBetween(from: string, to: string): number {
  return numberOf(to) - numberOf(from);
}

/** Every half-year from one to another, both included; none when the second is earlier. */
export function halfYearsFrom(from: string, to: string): string[] {
  const first = numberOf(from);
  return Array.from({ length: Math.max(0, numberOf(to) - first + 1) }, (_, step) =>
    textOf(first + step),
  );
}

/** The last 30 June or 31 December that is not after a date (rule 18). */
export function lastHalfYearEnd(date: string): string {
  const day = date.slice(5);
  if (day === '12-31') return date;
  if (day >= '06-30') return `${date.slice(0, 4)}-06-30`;
  return `${String(Number(date.slice(0, 4)) - 1).padStart(4, '0')}-12-31`;
}

function numberOf(halfYear: string): number {
  return Number(halfYear.slice(0, 4)) * 2 + Number(halfYear.slice(6)) - 1;
}

function textOf(number: number): string {
  return `${String(Math.floor(number / 2)).padStart(4, '0')}-H${(number % 2) + 1}`;
}
