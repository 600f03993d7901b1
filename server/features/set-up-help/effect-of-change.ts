import { listCostEntries } from '#db/queries/cost-entries';
import { countCars, iterateTouched, type CarSpan, type Reach } from '#db/queries/touched-cars';
import type { ScopedDb } from '#db/scoped-db';
import type { Effect } from '#shared/contracts/set-up-help';
import { CostBook, type CostChange } from '#shared/domain/cost-book';
import { deriveFigures } from '#shared/domain/job-figures';
import type { RecordedJob } from '#shared/domain/recorded-job';
import { figuresOfDay, TouchedSum } from './touched-sum';

/** A change as it is asked about: of costs, or of which cars belong together. */
export interface EffectQuestion {
  change:
    | CostChange
    | { kind: 'cars'; place: { branch: string } | { region: string }; figures: Effect['figures'] };
  /** Today in the network: what holds today moves quotes and needs. */
  today: string;
}

/**
 * What a change of set-up would move, computed as the change itself would compute it: every car it may reach is derived with the
 * costs of now and with those to come, from one state of the database. Writes nothing.
 */
export function effectOfChange(db: ScopedDb, { change, today }: EffectQuestion): Effect {
  return db.snapshot(() => {
    if (change.kind === 'cars') return effectOnCars(countCars(db, change.place), change.figures);
    const costs = CostBook.of(listCostEntries(db, db.table('branch_rates')));
    const next = costs.with(change);
    const sum = new TouchedSum();
    for (const { branch, completedOn, content } of iterateTouched(db, reachOf(change, next))) {
      const job = JSON.parse(content) as RecordedJob;
      sum.add(
        branch,
        completedOn,
        deriveFigures(job, branch, costs),
        deriveFigures(job, branch, next),
      );
    }
    return sum.told(change.kind, figuresOfDay(change, costs, next, today));
  });
}

function effectOnCars(span: CarSpan, figures: Effect['figures']): Effect {
  // A region's corrosivity moves whether or not it has cars yet.
  const moved = figures.filter((figure) => span.jobs > 0 || figure === 'corrosivity');
  return { ...span, marginCents: null, figures: moved };
}

function reachOf(change: CostChange, next: CostBook): Reach {
  if (change.kind === 'norm') return { package: change.package, bodyType: change.bodyType };
  const days = next.reach(change);
  return change.kind === 'hourlyCost' ? { ...days, branch: change.code } : days;
}
