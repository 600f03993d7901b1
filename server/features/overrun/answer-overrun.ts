import type { JobFilters } from '#db/queries/job-filters';
import { packageCodes, readByKey, readByStage, type MinuteLists } from '#db/queries/overrun';
import type { ScopedDb } from '#db/scoped-db';
import type { OverrunAnswer, OverrunGroup, OverrunGrouping } from '#shared/contracts/overrun';
import type { Period } from '#shared/domain/period';
import { AGE_BANDS } from '#shared/domain/vocabulary';
import { groupMinutes } from './group-minutes';
import { overrunFigures } from './overrun-figures';

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
    const { jobs, minutes, groups } = by === 'stage' ? byStage(db, asked) : byKey(db, asked, by);
    const overall = overrunFigures(minutes);
    return {
      period,
      scope: db.scope.echo(),
      jobs,
      by,
      overall,
      groups,
      withoutEstimate: jobs - overall.cars,
    };
  });
}

interface Grouped {
  jobs: number;
  minutes: MinuteLists;
  groups: OverrunGroup[];
}

/** All seven stages, always, over all estimated cars (rule 28). */
function byStage(db: ScopedDb, filters: JobFilters): Grouped {
  const { jobs, minutes, stages } = readByStage(db, filters);
  const groups = stages.map(({ stage, minutes: own }) => ({ key: stage, ...overrunFigures(own) }));
  return { jobs, minutes, groups };
}

function byKey(db: ScopedDb, filters: JobFilters, by: Exclude<OverrunGrouping, 'stage'>): Grouped {
  const { jobs, minutes, keys } = readByKey(db, filters, by);
  const groups = [...groupMinutes(minutes, keys, naming(db, by))]
    .map(([key, own]) => ({ key, ...overrunFigures(own) }))
    .sort((a, b) => place(by, a.key) - place(by, b.key) || (a.key < b.key ? -1 : 1));
  return { jobs, minutes, groups };
}

/** How a grouping's stored keys are told. */
function naming(
  db: ScopedDb,
  by: Exclude<OverrunGrouping, 'stage'>,
): (key: string | number) => string {
  switch (by) {
    case 'branch':
    case 'region': {
      const field = by === 'branch' ? 'code' : 'region';
      const told = new Map(db.scope.branches.map((branch) => [branch.id, branch[field]]));
      return (key) => told.get(Number(key)) ?? '';
    }
    case 'package': {
      const codes = packageCodes(db);
      return (key) => codes.get(Number(key)) ?? '';
    }
    case 'ageBand':
      return (key) => AGE_BANDS[Number(key)] ?? '';
    case 'rotFound':
      return (key) => (key === 1 ? 'found' : 'not_found');
    case 'bodyType':
    case 'month':
      return String;
  }
}

/** Age bands go in the order of their years, everything else by its text (rule 30). */
function place(by: OverrunGrouping, key: string): number {
  return by === 'ageBand' ? (AGE_BANDS as readonly string[]).indexOf(key) : 0;
}
