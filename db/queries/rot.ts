import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import type { RegionRow } from './catalogue';
import { whereJobs, type JobFilters } from './job-filters';

/** What was found under the cars of a question, one place a car in every list. */
export interface RotCars {
  branchIds: number[];
  /** Places in `AGE_BANDS`. */
  bands: number[];
  /** Where a car's rot sits, as `rotPlaces` counts it; 0 without rot. */
  places: number[];
  modelKeys: string[];
  completedOn: string[];
  jobIds: number[];
  /** Findings seen as bubbling and then worked, and those of them worked as holed. */
  bubbles: { worked: number; holed: number };
}

/** Make and model as a job has them. */
export interface Spelling {
  make: string;
  model: string;
}

export type Climate = NonNullable<RegionRow['climate']>;

const LISTS = {
  branchIds: 'branch_id',
  bands: 'age_band',
  places: 'rot_zones',
  modelKeys: 'model_key',
  completedOn: 'completed_on',
  jobIds: 'job_id',
} as const;

/** Reads every car once: grouping in the database would sort them all for each thing they are grouped by. */
export function readRotCars(db: ScopedDb, filters: JobFilters): RotCars {
  const lists = Object.entries(LISTS).map(
    ([name, column]) => `json_group_array(${column}) as ${name}`,
  );
  const row = db.first<Record<keyof typeof LISTS, string> & { worked: number; holed: number }>(
    whereJobs(db.table('job_facts'), filters).select(
      sql.raw(
        [...lists, 'total(bubbles_worked) as worked', 'total(bubbles_holed) as holed'].join(', '),
      ),
    ),
  );
  const list = <Value>(name: keyof typeof LISTS): Value[] =>
    JSON.parse(row?.[name] ?? '[]') as Value[];
  return {
    branchIds: list('branchIds'),
    bands: list('bands'),
    places: list('places'),
    modelKeys: list('modelKeys'),
    completedOn: list('completedOn'),
    jobIds: list('jobIds'),
    bubbles: { worked: row?.worked ?? 0, holed: row?.holed ?? 0 },
  };
}

/** Make and model of a few jobs, by their ids: looked up one by one, whatever the scope holds. */
export function readSpellings(db: ScopedDb, jobIds: readonly number[]): Map<number, Spelling> {
  const wanted = sql.raw('json_each(?) as wanted', [JSON.stringify(jobIds)]);
  const rows = db.all<Spelling & { jobId: number }>(
    sql
      .from(wanted)
      .joinRaw('cross join ?', [db.derived('job_facts')])
      .whereRaw('job_facts.job_id = wanted.value')
      .select({ jobId: 'job_facts.job_id', make: 'job_facts.make', model: 'job_facts.model' }),
  );
  return new Map(rows.map(({ jobId, make, model }) => [jobId, { make, model }]));
}

/** The climate of those of some regions that have one: part of how the network is set up, not of any branch's rows. */
export function readClimates(db: ScopedDb, regions: readonly string[]): Map<string, Climate> {
  const rows = db.all<Climate & { code: string }>(
    sql('regions')
      .whereRaw('code in (select value from json_each(?))', [JSON.stringify(regions)])
      .whereNotNull('temperature_c')
      .select({
        code: 'code',
        temperatureC: 'temperature_c',
        humidityPct: 'humidity_pct',
        so2Deposition: 'so2_deposition',
        chlorideDeposition: 'chloride_deposition',
      }),
  );
  return new Map(rows.map(({ code, ...climate }) => [code, climate]));
}
