import type { Knex } from 'knex';
import type { BodyType } from '#shared/domain/vocabulary';

/** Which jobs of a scope a figure is about. Packages by id, because facts carry ids. */
export interface JobFilters {
  from?: string | undefined;
  to?: string | undefined;
  packageIds?: readonly number[] | undefined;
  bodyTypes?: readonly BodyType[] | undefined;
}

/** Narrows a query over the facts to the jobs asked for; codes go in as one bound list, so that the text does not vary. */
export function whereJobs(query: Knex.QueryBuilder, filters: JobFilters): Knex.QueryBuilder {
  if (filters.from !== undefined) query.where('job_facts.completed_on', '>=', filters.from);
  if (filters.to !== undefined) query.where('job_facts.completed_on', '<=', filters.to);
  if (filters.packageIds) {
    query.whereRaw('job_facts.package_id in (select value from json_each(?))', [
      JSON.stringify(filters.packageIds),
    ]);
  }
  if (filters.bodyTypes) {
    query.whereRaw('job_facts.body_type in (select value from json_each(?))', [
      JSON.stringify(filters.bodyTypes),
    ]);
  }
  return query;
}
