import { dateOfDay, mondayOf, dayNumber } from '#shared/domain/calendar';
import type { BranchNature } from './branches';
import { CAR_MODELS } from './car-models';
import { PACKAGE_MIX } from './catalogue';
import type { DemoBooking } from './demo-network';
import { pickWeighted, wholeBetween, type Random } from './random-draws';
import { carsInWeek, isWorkingDay, type WorkWeek } from './working-calendar';

/** How full the diary is this week and the five after it. */
const FULLNESS = [0.95, 0.85, 0.65, 0.45, 0.3, 0.15];
const MODELS = CAR_MODELS.map((model) => [model, model.popularity] as const);

/** Cars expected at a branch from today on, fewer the further ahead. */
export function drawBookings(
  random: Random,
  branch: BranchNature,
  workWeek: WorkWeek,
  today: string,
): DemoBooking[] {
  const todayDay = dayNumber(today);
  const thisMonday = dayNumber(mondayOf(today));
  const expected: number[] = [];
  FULLNESS.forEach((full, week) => {
    const monday = thisMonday + week * 7;
    const cars = Math.round(carsInWeek(random, branch.carsPerWeek, monday) * full);
    for (let car = 0; car < cars; car += 1) {
      const day = monday + wholeBetween(random, 0, 4);
      if (day >= todayDay && isWorkingDay(day, workWeek)) expected.push(day);
    }
  });
  expected.sort((a, b) => a - b);
  return expected.map((day, index) => ({
    branchCode: branch.code,
    ref: `B-${String(index + 1).padStart(3, '0')}`,
    content: {
      expectedOn: dateOfDay(day),
      package: pickWeighted(random, PACKAGE_MIX),
      bodyType: pickWeighted(random, MODELS).bodyType,
    },
  }));
}
