import type { NetworkReference } from '#db/network-reference';
import { findLastTime } from '#db/queries/last-time';
import type { UsualRange } from '#db/queries/usual';
import type { ScopedDb } from '#db/scoped-db';
import type { UsualCar } from '#shared/contracts/usual';
import { ageBand, ageInYears } from '#shared/domain/calendar';
import type { RecordedJob } from '#shared/domain/recorded-job';
import { AGE_BANDS, STAGES } from '#shared/domain/vocabulary';
import { nearestUsualSet } from './nearest-set';
import { quotedCar, type AskedCar } from './quoted-car';

/** What such a car usually takes, from the set that a quote would be made from, and what was used last time. One snapshot of the database. */
export function answerUsual(db: ScopedDb, asked: AskedCar, reference: NetworkReference): UsualCar {
  return db.snapshot(() => {
    const [branch] = db.scope.branches;
    const band = AGE_BANDS.indexOf(ageBand(ageInYears(asked.firstRegistered, asked.today)));
    const set = branch && nearestUsualSet(db, branch.id, reference, quotedCar(asked, band));
    const last = branch && findLastTime(db, { ...asked, upTo: asked.today });
    const stages = new Map(set?.figures.stages.map(({ stage, range }) => [stage, range]));
    return {
      basis: set
        ? { kind: set.kind, source: set.source, cars: set.figures.cars }
        : { kind: 'none', source: null, cars: 0 },
      stages: STAGES.map((stage) => ({ stage, ...told(stages.get(stage)) })),
      total: told(set?.figures.total),
      // The network's are listed only where they may be told: that one of few others used it is theirs.
      products: (set?.figures.products ?? [])
        .filter(({ range }) => range ?? set?.source === 'branch')
        .map(({ product, range }) => ({ product, ...told(range) })),
      consumables: (set?.figures.consumables ?? [])
        .filter(({ range }) => range ?? set?.source === 'branch')
        .map(({ kind, range }) => ({ kind, ...told(range) })),
      lastTime: last ? tellLast(last) : null,
    };
  });
}

function told(range: UsualRange | undefined): {
  low: number | null;
  usual: number | null;
  high: number | null;
} {
  return range ?? { low: null, usual: null, high: null };
}

function tellLast(job: RecordedJob): NonNullable<UsualCar['lastTime']> {
  const { estimate, products, workshop } = job;
  return {
    completedOn: job.completedOn,
    products: products ?? [],
    estimate: estimate
      ? {
          priceCents: estimate.priceCents,
          stages: Object.fromEntries(
            STAGES.map((stage) => [stage, estimate.stages[stage] ?? 0]),
          ) as Record<(typeof STAGES)[number], number>,
        }
      : null,
    temperatureC: workshop?.temperatureC ?? null,
    humidityPct: workshop?.humidityPct ?? null,
  };
}
