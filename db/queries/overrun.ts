import type { OverrunGrouping } from '#shared/contracts/overrun';
import { STAGES, type Stage } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { whereJobs, type JobFilters } from './job-filters';

/** Minutes of cars, estimated and actual at the same place in each list. */
export interface MinuteLists {
  estimated: Float64Array;
  actual: Float64Array;
}

/** What the estimated jobs of a question took, one place a car in every list. */
export interface EstimatedJobs {
  /** Matching jobs with and without an estimate. */
  jobs: number;
  minutes: MinuteLists;
}

/** What a car belongs to by each grouping, as the facts hold it. */
const KEYS: Record<Exclude<OverrunGrouping, 'stage'>, string> = {
  branch: 'branch_id',
  region: 'branch_id',
  ageBand: 'age_band',
  package: 'package_id',
  bodyType: 'body_type',
  month: 'month',
  rotFound: 'has_rot',
};

/** The minutes of every estimated car with what it belongs to: a branch's id (for regions too), a package's id, a word or a number. */
export function readByKey(
  db: ScopedDb,
  filters: JobFilters,
  by: Exclude<OverrunGrouping, 'stage'>,
): EstimatedJobs & { keys: (string | number)[] } {
  const { jobs, lists } = readLists(db, filters, ['est_minutes', 'act_minutes', KEYS[by]]);
  const [estimated = [], actual = [], keys = []] = lists;
  return { jobs, minutes: minutesOf(estimated, actual), keys };
}

/** The minutes of every estimated car in total and by stage. */
export function readByStage(
  db: ScopedDb,
  filters: JobFilters,
): EstimatedJobs & { stages: { stage: Stage; minutes: MinuteLists }[] } {
  const columns = STAGES.flatMap((stage) => [`est_${stage}`, `act_${stage}`]);
  const { jobs, lists } = readLists(db, filters, ['est_minutes', 'act_minutes', ...columns]);
  const pair = (index: number): MinuteLists =>
    minutesOf(lists[2 * index] ?? [], lists[2 * index + 1] ?? []);
  return {
    jobs,
    minutes: pair(0),
    stages: STAGES.map((stage, index) => ({ stage, minutes: pair(index + 1) })),
  };
}

/** The code of every package by its id. */
export function packageCodes(db: ScopedDb): Map<number, string> {
  const rows = db.all<{ id: number; code: string }>(sql('packages').select('id', 'code'));
  return new Map(rows.map(({ id, code }) => [id, code]));
}

/** One list a column over the estimated jobs. A list crosses as one JSON text, which costs a tenth of a row of values a car. */
function readLists(
  db: ScopedDb,
  filters: JobFilters,
  columns: readonly string[],
): { jobs: number; lists: (string | number)[][] } {
  const lists = columns.map(
    (column, index) =>
      `json_group_array(${column}) filter (where has_estimate = 1) as list${index}`,
  );
  const row = db.first<Record<string, string> & { jobs: number }>(
    whereJobs(db.table('job_facts'), filters).select(
      sql.raw(['count(*) as jobs', ...lists].join(', ')),
    ),
  );
  return {
    jobs: row?.jobs ?? 0,
    lists: columns.map(
      (_column, index) => JSON.parse(row?.[`list${index}`] ?? '[]') as (string | number)[],
    ),
  };
}

function minutesOf(
  estimated: readonly (string | number)[],
  actual: readonly (string | number)[],
): MinuteLists {
  return {
    estimated: Float64Array.from(estimated as number[]),
    actual: Float64Array.from(actual as number[]),
  };
}
