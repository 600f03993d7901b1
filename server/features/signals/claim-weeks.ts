import type { CoveredClaim, CoverLists } from '#db/queries/warranty';
import { addDays, dayNumber } from '#shared/domain/calendar';
import { claimsByStretch, countedClaims } from '#shared/domain/claims-by-week';
import { CoverBook } from '#shared/domain/warranty-cover';
import type { ClaimWeeks } from './detect-drift-claims';
import { ratedCover, type BranchCover } from './rated-cover';
import { monthOf, seasonOf } from './season-of-claims';

/**
 * Each branch's counted claims by the week they were made, and those expected of its days under warranty: the network's
 * rates by package, age band and year in service (rule 20) over all its history, times how much the network has of them in
 * that calendar month, for most claims come in a second winter. Weeks end before `end`, a Monday.
 */
export function claimWeeks(
  cars: readonly (CoverLists & { branchId: number })[],
  claims: readonly (CoveredClaim & { ref: string })[],
  { end, weeks, today }: { end: string; weeks: number; today: string },
): ClaimWeeks[] {
  const monday = addDays(end, -7 * weeks);
  const book = new CoverBook(today);
  const counted = countedClaims(claims, book, today);
  const cover = ratedCover(cars, counted, book);
  const season = seasonOf(cover, counted);
  const stretches = Array.from({ length: weeks }, (_, week) => {
    const from = addDays(monday, 7 * week);
    return { from, to: addDays(from, 6) };
  });
  const made = claimsByStretch(counted, stretches);
  return cover.map((own) => ({
    branchId: own.branchId,
    monday,
    claims:
      made.get(own.branchId)?.map((week) => week.map(({ ref, madeOn }) => ({ ref, madeOn }))) ??
      stretches.map(() => []),
    expected: expectedByWeek(own, monday, weeks, season),
  }));
}

function expectedByWeek(
  { cars }: BranchCover,
  monday: string,
  weeks: number,
  season: readonly number[],
): number[] {
  const [first, days] = [dayNumber(monday), 7 * weeks];
  const clamp = (day: number): number => Math.min(Math.max(day, 0), days);
  const steps = new Float64Array(days + 1);
  for (const { stretches } of cars) {
    for (const { from, to, cell } of stretches) {
      steps[clamp(from - first)]! += cell.rate;
      steps[clamp(to - first)]! -= cell.rate;
    }
  }
  const expected = Array.from({ length: weeks }, () => 0);
  let rate = 0;
  for (let day = 0; day < days; day += 1) {
    rate += steps[day]!;
    expected[Math.floor(day / 7)]! += rate * season[monthOf(addDays(monday, day))]!;
  }
  return expected;
}
