import { addDays, dateOfDay, dayNumber, mondayOf } from '#shared/domain/calendar';
import { waysOf } from './branch-quirks';
import type { BranchNature } from './branches';
import { drawCar, monthNumber, type Car } from './cars';
import { PACKAGE_MIX } from './catalogue';
import { drawComeBackMarks } from './come-back-marks';
import { drawBookings } from './coming-bookings';
import { firstDay } from './dated-costs';
import type { BranchHistory, DemoJob, PackageCode } from './demo-network';
import { drawClaims } from './draw-claims';
import { drawJob } from './draw-job';
import { arrive } from './job-arrival';
import { chance, pickWeighted, randomFor, wholeBetween, type Random } from './random-draws';
import { regionOf } from './regions';
import { drawWeekNotes } from './week-notes';
import {
  carsInWeek,
  completionDay,
  workingDayBefore,
  workingDaysEarlier,
  type WorkWeek,
} from './working-calendar';

/** The day on which a branch opened: before the five years, or so many weeks before today. */
export function openedOn(branch: BranchNature, today: string): string {
  if (branch.openedWeeksBack === undefined) return addDays(mondayOf(firstDay(today)), -420);
  return addDays(mondayOf(today), -7 * branch.openedWeeksBack);
}

/** Everything that happened at a branch in the five years up to yesterday, and what is booked from today on. */
export function historyOf(branch: BranchNature, seed: number, today: string): BranchHistory {
  const stream = (name: string) => randomFor(seed, `${branch.code} ${name}`);
  const workWeek: WorkWeek = branch.saturdays ? 'to-saturday' : 'to-friday';
  const jobs = drawJobs(stream('jobs'), branch, workWeek, today);
  return {
    branchCode: branch.code,
    jobs,
    claims: drawClaims(stream('claims'), branch, jobs, today),
    bookings: drawBookings(stream('bookings'), branch, workWeek, today),
    weekNotes: drawWeekNotes(stream('notes'), branch, today),
    comeBackMarks: drawComeBackMarks(stream('come-backs'), jobs, today),
  };
}

function drawJobs(
  random: Random,
  branch: BranchNature,
  workWeek: WorkWeek,
  today: string,
): DemoJob[] {
  const todayDay = dayNumber(today);
  const opened = openedOn(branch, today);
  const from = dayNumber(opened > firstDay(today) ? opened : firstDay(today));
  const yard = new Yard(random, branch, today);
  const numbers = new Map<string, number>();
  const jobs: DemoJob[] = [];
  for (let monday = dayNumber(mondayOf(dateOfDay(from))); monday < todayDay; monday += 7) {
    for (const completedDay of weekOf(random, branch, monday, workWeek)) {
      // The week is drawn whole, so that the days before today do not depend on which day today is.
      if (completedDay < from || completedDay >= todayDay) continue;
      const startedDay = workingDaysEarlier(completedDay, wholeBetween(random, 0, 2), workWeek);
      const bookedDay = workingDayBefore(startedDay - wholeBetween(random, 2, 30), workWeek);
      const packageCode = pickWeighted(random, PACKAGE_MIX);
      const car = yard.carFor(packageCode, bookedDay, startedDay);
      const ways = waysOf(branch, todayDay - completedDay);
      const drawn = drawJob(random, {
        branch,
        ways,
        car,
        packageCode,
        bookedDay,
        startedDay,
        completedDay,
        today,
      });
      yard.leave(car, drawn.content, completedDay);
      const year = drawn.content.completedOn.slice(2, 4);
      const number = (numbers.get(year) ?? 0) + 1;
      numbers.set(year, number);
      const name = `${year}-${String(number).padStart(4, '0')}`;
      jobs.push(
        arrive(random, drawn, {
          branchCode: branch.code,
          jobRef: name,
          invoiceNumber: `R${name}`,
          completedDay,
          todayDay,
          workWeek,
          billDelay: branch.billDelay,
        }),
      );
    }
  }
  return jobs.sort((a, b) =>
    a.receivedAt < b.receivedAt ? -1 : a.receivedAt > b.receivedAt ? 1 : 0,
  );
}

function weekOf(
  random: Random,
  branch: BranchNature,
  monday: number,
  workWeek: WorkWeek,
): number[] {
  const cars = carsInWeek(random, branch.carsPerWeek, monday);
  const days = Array.from({ length: cars }, () => completionDay(random, monday, workWeek));
  return days.sort((a, b) => a - b);
}

/** The cars that a branch knows: new ones come in, some come back for a top-up or for rot that was put off. */
class Yard {
  private readonly known: Car[] = [];
  private readonly waiting: Car[] = [];
  private lastKey = 10_000;
  private readonly thisMonth: number;

  constructor(
    private readonly random: Random,
    private readonly branch: BranchNature,
    today: string,
  ) {
    this.thisMonth = monthNumber(today);
  }

  carFor(packageCode: PackageCode, bookedDay: number, startedDay: number): Car {
    const back = packageCode === 'top_up' ? this.returning(bookedDay) : undefined;
    if (back) {
      const years = (startedDay - back.lastCompleted) / 365;
      back.odometerKm += Math.round((back.kmPerYear * years) / 100) * 100;
      return back;
    }
    this.lastKey += wholeBetween(this.random, 1, 4);
    return drawCar(
      this.random,
      `K-${this.lastKey}`,
      monthNumber(dateOfDay(bookedDay)),
      this.thisMonth,
      regionOf(this.branch.region).younger,
    );
  }

  /** Remembers a car that goes out, and what was left on it. */
  leave(car: Car, content: DemoJob['content'], completedDay: number): void {
    const known = car.lastCompleted > 0;
    car.lastCompleted = completedDay;
    car.open = (content.findings ?? [])
      .filter((finding) => finding.action === 'deferred' && finding.seenAs !== 'surface')
      .map(({ zone, side }) => ({ zone, side }));
    if (car.open.length > 0 && chance(this.random, 0.6)) this.waiting.push(car);
    else {
      car.open = [];
      if (!known) this.known.push(car);
    }
  }

  private returning(bookedDay: number): Car | undefined {
    const first = this.waiting[0];
    if (first && first.lastCompleted < bookedDay - 30) return this.waiting.shift();
    for (let tries = 0; tries < 5 && this.known.length > 0; tries += 1) {
      const index = wholeBetween(this.random, 0, this.known.length - 1);
      const car = this.known[index] as Car;
      const days = bookedDay - car.lastCompleted;
      if (days < 300 || days > 1300) continue;
      this.known.splice(index, 1);
      return car;
    }
    return undefined;
  }
}
