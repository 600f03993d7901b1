import { addDays, isoWeek, mondayOf } from '#shared/domain/calendar';
import type { BranchNature } from './branches';
import type { DemoWeekNote } from './demo-network';
import { managerOf } from './demo-people';
import { chance, pick, type Random } from './random-draws';

/** What managers wrote about a week. Invented. */
const TEXTS = [
  'Lift two out of order from Tuesday; two cars carried over.',
  'Three estates with rot in both sills. Extras agreed on all of them.',
  'New starter on strip and clean, slower but careful.',
  'Two campers in one week, both over by half a day.',
  'Compressor failed on Thursday; spraying moved to Friday.',
  'Quiet week, used it to tidy up old bills.',
  'Late wax delivery; the last car waited a day for product.',
  'One van took eleven hours of welding that nobody had asked about beforehand.',
] as const;

/** Notes on about one week in six of the last year, where the demo has a manager to write them; the present week has none yet. */
export function drawWeekNotes(random: Random, branch: BranchNature, today: string): DemoWeekNote[] {
  if (managerOf(branch.code) === undefined) return [];
  const notes: DemoWeekNote[] = [];
  const openedWeeksBack = branch.openedWeeksBack ?? 52;
  for (let back = Math.min(51, openedWeeksBack - 4); back >= 1; back -= 1) {
    if (!chance(random, 1 / 6)) continue;
    const monday = addDays(mondayOf(today), -7 * back);
    notes.push({
      branchCode: branch.code,
      week: isoWeek(monday),
      text: pick(random, TEXTS),
      // Written on the Sunday that ends the week.
      changedAt: `${addDays(monday, 6)}T18:40:00.000Z`,
    });
  }
  return notes;
}
