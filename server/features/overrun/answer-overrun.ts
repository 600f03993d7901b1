import type { JobFilters } from '#db/queries/job-filters';
import { countEstimated, eachRatio, eachStages } from '#db/queries/overrun';
import type { ScopedDb } from '#db/scoped-db';
import type { OverrunAnswer, OverrunGroup, OverrunGrouping } from '#shared/contracts/overrun';
import type { Period } from '#shared/domain/period';
import { AGE_BANDS, STAGES } from '#shared/domain/vocabulary';
import { MinutePairs } from './minute-pairs';

export interface OverrunQuestion {
  period: Period;
  filters: JobFilters;
  by: OverrunGrouping;
}

/** Labour worked against labour estimated, overall and by one grouping; one snapshot of the database. */
export function answerOverrun(
  db: ScopedDb,
  { period, filters, by }: OverrunQuestion,
): OverrunAnswer {
  return db.snapshot(() => {
    const asked = { ...filters, ...period };
    const counts = countEstimated(db, asked);
    const { overall, groups } = by === 'stage' ? byStage(db, asked) : byKey(db, asked, by);
    return {
      period,
      scope: db.scope.echo(),
      jobs: counts.jobs,
      by,
      overall: overall.figures(),
      groups,
      withoutEstimate: counts.withoutEstimate,
    };
  });
}

interface Grouped {
  overall: MinutePairs;
  groups: OverrunGroup[];
}

/** All seven stages, always, over all estimated cars (rule 28). */
function byStage(db: ScopedDb, filters: JobFilters): Grouped {
  const overall = new MinutePairs();
  const stages = STAGES.map((key) => ({ key, pairs: new MinutePairs() }));
  eachStages(db, filters, (row) => {
    overall.add(row[0] ?? 0, row[1] ?? 0);
    stages.forEach(({ pairs }, index) => {
      pairs.add(row[2 + 2 * index] ?? 0, row[3 + 2 * index] ?? 0);
    });
  });
  return { overall, groups: stages.map(({ key, pairs }) => ({ key, ...pairs.figures() })) };
}

function byKey(db: ScopedDb, filters: JobFilters, by: Exclude<OverrunGrouping, 'stage'>): Grouped {
  const overall = new MinutePairs();
  const pairs = new Map<string | number, MinutePairs>();
  eachRatio(db, filters, by, ([key, estimated, actual]) => {
    overall.add(estimated, actual);
    let group = pairs.get(key);
    if (!group) pairs.set(key, (group = new MinutePairs()));
    group.add(estimated, actual);
  });
  const groups = [...pairs]
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([key, group]) => ({ key: spoken(by, key), ...group.figures() }));
  // Of two answers the one that was looked for comes first (rule 30).
  return { overall, groups: by === 'rotFound' ? groups.reverse() : groups };
}

function spoken(by: OverrunGrouping, key: string | number): string {
  if (by === 'ageBand') return AGE_BANDS[Number(key)] ?? String(key);
  if (by === 'rotFound') return Number(key) === 1 ? 'found' : 'not_found';
  return String(key);
}
