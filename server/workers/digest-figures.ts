import {
  countBehindMargin,
  readBranchCars,
  readDigestSignals,
  readIssued,
  readLateActions,
  readRegionNames,
  readWaiting,
} from '#db/queries/digests';
import type { ScopedDb } from '#db/scoped-db';
import { addDays, mondayOfWeek } from '#shared/domain/calendar';
import type { Period } from '#shared/domain/period';
import type { Stage } from '#shared/domain/vocabulary';
import type { Changes } from '../features/digests/changes';
import type { MonthFigures } from '../features/digests/month-digest';
import type { WeekFigures, WeekLabour } from '../features/digests/week-digest';
import { answerMargin } from '../features/margin/answer-margin';
import { answerOverrun } from '../features/overrun/answer-overrun';

/** Weeks that a digest pictures. */
const WEEKS = 8;

/** A week that is over, as seen on a day. */
export interface WeekAsked {
  week: string;
  today: string;
}

/** Days whose changes are asked for, both included, and those whose cars are counted, as seen on a day. */
export interface ChangesAsked {
  days: Period;
  carsOf: Period;
  today: string;
}

/** A branch's week as its manager is told it, from one state of the database; the scope is that branch. */
export function weekFigures(db: ScopedDb, { week, today }: WeekAsked): WeekFigures {
  return db.snapshot(() => {
    const monday = mondayOfWeek(week);
    const to = addDays(monday, 6);
    const period = { from: addDays(monday, -7 * (WEEKS - 1)), to };
    const { weeks, limits, targetMarginShare } = answerMargin(db, { period, filters: {}, today });
    const [branch] = db.scope.branches;
    return {
      week,
      today,
      branch: branch?.code ?? '',
      branchName: branch?.name ?? '',
      weeks,
      limits,
      targetMarginShare,
      costed: countBehindMargin(db, { from: monday, to }),
      labour: labourOf(db, { from: monday, to }),
      waiting: readWaiting(db, today),
    };
  });
}

function labourOf(db: ScopedDb, period: Period): WeekLabour {
  const { overall, groups } = answerOverrun(db, { period, filters: {}, by: 'stage' });
  return {
    cars: overall.cars,
    estimatedMinutes: overall.estimatedMinutes,
    actualMinutes: overall.actualMinutes,
    stages: groups.map(({ key, estimatedMinutes, actualMinutes }) => ({
      stage: key as Stage,
      overMinutes: actualMinutes - estimatedMinutes,
    })),
  };
}

/** What changed in the branches of a scope. */
export function changesOf(db: ScopedDb, { days, carsOf, today }: ChangesAsked): Changes {
  return db.snapshot(() => ({
    today,
    days,
    carsOf,
    regions: readRegionNames(db),
    signals: readDigestSignals(db, days.from),
    late: readLateActions(db, today),
    branches: readBranchCars(db, carsOf),
  }));
}

/** What changed in a month in the whole network, with its cars and what was issued. */
export function monthFigures(db: ScopedDb, asked: ChangesAsked): MonthFigures {
  return db.snapshot(() => ({
    month: asked.days.from.slice(0, 7),
    changes: changesOf(db, asked),
    issued: readIssued(db, asked.days),
  }));
}
