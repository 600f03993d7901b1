import { addMonths, dayNumber } from './calendar';

/** What a year is counted as where days of cover become car-years (rule 16). */
export const DAYS_A_YEAR = 365.25;

/** A car's warranty as seen on a day (rules 16, 17 and 20). */
export interface Cover {
  /** The last day under cover. */
  end: string;
  /** Days under cover that are over, and those still to come. */
  daysRun: number;
  daysLeft: number;
  /** Days run in each year in service, the first year first; never empty. */
  daysByYear: readonly number[];
  /** The month since completion in which the car was last seen under cover. */
  lastMonth: number;
}

/** The last day of a warranty; a car without one was covered on no day. */
export function warrantyEnd(completedOn: string, warrantyMonths: number): string {
  return addMonths(completedOn, warrantyMonths);
}

/** The month since completion that a day lies in: the smallest m ≥ 1 with the day not after completion + m months (rule 17). */
export function monthInService(completedOn: string, day: string): number {
  const months =
    (Number(day.slice(0, 4)) - Number(completedOn.slice(0, 4))) * 12 +
    Number(day.slice(5, 7)) -
    Number(completedOn.slice(5, 7));
  return Math.max(1, day <= addMonths(completedOn, months) ? months : months + 1);
}

/** The year in service that a month since completion lies in. */
export function yearInService(month: number): number {
  return Math.ceil(month / 12);
}

/** The cover of a car completed not after a day, as seen on it; `undefined` without a warranty. */
export function coverOf(
  completedOn: string,
  warrantyMonths: number,
  asOf: string,
): Cover | undefined {
  if (warrantyMonths === 0) return undefined;
  const end = warrantyEnd(completedOn, warrantyMonths);
  const until = end < asOf ? end : asOf;
  const lastMonth = monthInService(completedOn, until);
  const begun = dayNumber(completedOn);
  const [over, last] = [dayNumber(until), dayNumber(end)];
  const daysByYear: number[] = [];
  let from = begun;
  for (let year = 1; year <= yearInService(lastMonth); year += 1) {
    const to = Math.min(over, dayNumber(addMonths(completedOn, 12 * year)));
    daysByYear.push(to - from);
    from = to;
  }
  return { end, daysRun: over - begun, daysLeft: last - over, daysByYear, lastMonth };
}

interface CoversOfDay {
  completedOn: string;
  covers: Map<number, Cover | undefined>;
}

/** The covers of many cars on one day: those completed on the same day with the same warranty share one. */
export class CoverBook {
  private readonly known = new Map<string, CoversOfDay>();
  /** Cars come day by day: the day of the one before is most often that of the next. */
  private day: CoversOfDay = { completedOn: '', covers: new Map() };

  constructor(private readonly asOf: string) {}

  coverOf(completedOn: string, warrantyMonths: number): Cover | undefined {
    if (this.day.completedOn !== completedOn) this.day = this.dayOf(completedOn);
    const { covers } = this.day;
    let cover = covers.get(warrantyMonths);
    if (!cover) {
      cover = coverOf(completedOn, warrantyMonths, this.asOf);
      covers.set(warrantyMonths, cover);
    }
    return cover;
  }

  private dayOf(completedOn: string): CoversOfDay {
    let day = this.known.get(completedOn);
    if (!day) this.known.set(completedOn, (day = { completedOn, covers: new Map() }));
    return day;
  }
}
