import type { NetworkReference } from '#db/network-reference';
import { whereJobs } from '#db/queries/job-filters';
import { readNetwork } from '#db/queries/network';
import { listDangersDue, readArrivals } from '#db/queries/signals-arrivals';
import {
  listBilledCars,
  listCheckedCars,
  listMovingCars,
  listUnbilledBefore,
  readTimedCars,
} from '#db/queries/signals-cars';
import { readClaims, readClaimsOnCars, readCoverByBranch } from '#db/queries/warranty';
import type { ScopedBranch } from '#db/scope';
import type { ScopedDb } from '#db/scoped-db';
import { addDays, localDate, mondayOf, mondayOfWeek } from '#shared/domain/calendar';
import { defaultPeriod } from '#shared/domain/period';
import type { FactsByKind } from '#shared/domain/signal-facts';
import { BRANCH_MEASURES } from '#shared/domain/vocabulary';
import { answerBranches } from '../features/branches/answer-branches';
import { answerMargin } from '../features/margin/answer-margin';
import { claimWeeks } from '../features/signals/claim-weeks';
import { detectComeBacksDue } from '../features/signals/detect-come-backs-due';
import {
  detectDriftClaims,
  EARLIER_CLAIM_WEEKS,
  JUDGED_CLAIM_WEEKS,
} from '../features/signals/detect-drift-claims';
import {
  detectDriftOverrun,
  JUDGED_WEEKS,
  USUAL_WEEKS,
} from '../features/signals/detect-drift-overrun';
import { detectLeftFunnel } from '../features/signals/detect-left-funnel';
import {
  detectOddValues,
  LONG_STAGE,
  MUCH_PRODUCT,
  ODD_DAYS,
} from '../features/signals/detect-odd-values';
import { detectSilence, HABIT_DAYS } from '../features/signals/detect-silence';
import { BILL_DAYS, detectUnbilled } from '../features/signals/detect-unbilled';
import { detectRunOfEight, detectWeekOutside } from '../features/signals/detect-weeks';
import { MOST_LISTED, type FoundSignal } from '../features/signals/found-signal';

/** A look at the whole network: its business day, and the moment that says each branch's own. */
export interface LookQuestion {
  today: string;
  now: string;
}

/** Everything that a look needs of the network besides its rows. */
interface Look extends LookQuestion {
  db: ScopedDb;
  reference: NetworkReference;
  /** A branch's own date: what is due or over there is judged by it. */
  dateOf: (branch: ScopedBranch) => string;
}

/** Looks at every branch; finds what each detection finds, from one state of the database. */
export function signalLook(
  db: ScopedDb,
  question: LookQuestion,
  reference: NetworkReference,
): FoundSignal[] {
  const now = new Date(question.now);
  const dateOf = ({ timeZone }: ScopedBranch): string => localDate(now, timeZone);
  const look: Look = { ...question, db, reference, dateOf };
  return db.snapshot(() =>
    [dangers, silences, oddValues, unbilled, weeks, funnels, overruns, claims].flatMap((part) =>
      part(look),
    ),
  );
}

function dangers({ db, today, dateOf }: Look): FoundSignal[] {
  const due = listDangersDue(db, today);
  return db.scope.branches.flatMap((branch) =>
    detectComeBacksDue({
      branchId: branch.id,
      today: dateOf(branch),
      findings: due.filter((row) => row.branch === branch.code),
    }),
  );
}

function silences({ db, today, dateOf }: Look): FoundSignal[] {
  const arrivals = readArrivals(db, addDays(today, -HABIT_DAYS));
  return arrivals.flatMap(({ branchId, closedOn, hours }) => {
    const branch = branchOf(db, branchId);
    const days = hours.map((hour) => localDate(new Date(`${hour}:00:00Z`), branch.timeZone));
    const own = dateOf(branch);
    return detectSilence({
      branchId,
      today: own,
      closed: closedOn !== null && closedOn <= own,
      days: [...new Set(days)],
    });
  });
}

function oddValues({ db, today }: Look): FoundSignal[] {
  const rows = listCheckedCars(db, addDays(today, 1 - ODD_DAYS), today);
  return db.scope.branches.flatMap(({ id }) => {
    const own = rows.filter(({ branchId }) => branchId === id);
    const odd = own.filter(
      ({ longestStage, mostMl, zeroPrice, zeroBill }) =>
        longestStage >= LONG_STAGE || mostMl >= MUCH_PRODUCT || zeroPrice === 1 || zeroBill === 1,
    );
    return detectOddValues({
      branchId: id,
      odd: odd
        .map((row) => ({ ...row, zeroPrice: row.zeroPrice === 1, zeroBill: row.zeroBill === 1 }))
        .reverse(),
      timed: own
        .filter(({ timed }) => timed === 1)
        .map((row) => ({ ...row, copied: row.copied === 1 })),
    });
  });
}

function unbilled({ db, today, dateOf }: Look): FoundSignal[] {
  const { currency } = readNetwork(db);
  const rows = listUnbilledBefore(db, addDays(today, -BILL_DAYS));
  return db.scope.branches.flatMap((branch) =>
    detectUnbilled({
      branchId: branch.id,
      today: dateOf(branch),
      currency,
      cars: rows.filter(({ branchId }) => branchId === branch.id),
    }),
  );
}

function weeks({ db, dateOf }: Look): FoundSignal[] {
  return db.scope.branches.flatMap((branch) => {
    const today = dateOf(branch);
    const own = db.narrowed({ branch: [branch.code] });
    const answer = answerMargin(own, { period: defaultPeriod(today), filters: {}, today });
    const judged = { branchId: branch.id, today, weeks: answer.weeks, limits: answer.limits };
    const found = [...detectWeekOutside(judged), ...detectRunOfEight(judged)];
    return found.map((signal) => {
      const { week, lastWeek } = signal.facts as Partial<
        FactsByKind['week_outside'] & FactsByKind['run_of_eight']
      >;
      const to = addDays(mondayOfWeek(week ?? lastWeek ?? ''), 6);
      const refs = listBilledCars(own, branch.id, { from: signal.since, to }, MOST_LISTED);
      return { ...signal, listed: refs.map((ref) => ({ ref, why: '' })) };
    });
  });
}

function funnels({ db, reference, today }: Look): FoundSignal[] {
  const period = defaultPeriod(today);
  return BRANCH_MEASURES.flatMap((measure) => {
    const claimed = measure === 'claims' ? readClaims(db, today).map(({ jobId }) => jobId) : [];
    const answer = answerBranches(db, { measure, period, filters: {}, today }, reference);
    const idOf = (code: string): number => db.scope.branch(code)?.id ?? 0;
    const behind = answer.branches.filter(({ cars }) => cars > 0).map(({ branch }) => idOf(branch));
    return answer.branches.flatMap(({ branch, ...place }) => {
      const branchId = idOf(branch);
      const found = detectLeftFunnel({ ...place, branchId, measure, ...period }, behind, today);
      return found.map((signal) => {
        const { side } = signal.facts as unknown as FactsByKind['left_funnel'];
        const asked = { ...period, side, claimed };
        const refs = listMovingCars(db, branchId, measure, asked, MOST_LISTED);
        return { ...signal, listed: refs.map((ref) => ({ ref, why: '' })) };
      });
    });
  });
}

function overruns({ db, today }: Look): FoundSignal[] {
  const monday = mondayOf(today);
  const from = addDays(monday, -7 * (USUAL_WEEKS + JUDGED_WEEKS));
  return readTimedCars(db, from, addDays(monday, -1)).flatMap((cars) =>
    detectDriftOverrun(cars, monday),
  );
}

function claims({ db, today }: Look): FoundSignal[] {
  // Where it is tomorrow already, a branch may have finished cars that are under no cover yet.
  const filters = { to: today };
  const cars = readCoverByBranch(db, whereJobs(db.table('job_facts'), filters));
  const branches = claimWeeks(cars, readClaimsOnCars(db, filters, today), {
    end: mondayOf(today),
    weeks: EARLIER_CLAIM_WEEKS + JUDGED_CLAIM_WEEKS,
    today,
  });
  const behind = branches.map(({ branchId }) => branchId);
  return branches.flatMap((branch) => detectDriftClaims(branch, behind));
}

function branchOf(db: ScopedDb, id: number): ScopedBranch {
  const branch = db.scope.branches.find((one) => one.id === id);
  if (!branch) throw new Error(`no branch ${id} in the scope of the look`);
  return branch;
}
