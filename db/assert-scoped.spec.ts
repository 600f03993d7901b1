import { assertScoped, UnscopedRead } from './assert-scoped';

describe('assertScoped', () => {
  it.each([
    'select * from jobs',
    'SELECT * FROM jobs',
    'select * from `jobs` as `j`',
    'select * from "jobs"',
    'select * from [jobs]',
    'select * from main.jobs',
    'select * from main.`jobs`',
    'select * from people, jobs',
    'select * from people cross join jobs',
    'select * from (jobs)',
    'select * from\n\tjobs',
    'select * from/**/jobs',
    'select * from people where exists (select 1 from jobs)',
    'with x as (select * from job_facts) select * from x',
    'select * from people join `job_products` on true',
    'select * from job_revisions',
    'select * from branches, job_revisions',
    'select * from main.claim_revisions',
    'update jobs set revision = 1',
    'delete from claims',
  ])('given %j, refuses it', (text) => {
    expect(() => assertScoped(text)).toThrow(UnscopedRead);
  });

  it.each([
    'select * from branches',
    'select jobs.id from people as jobs',
    'select count(*) as jobs from people',
    'select * from people order by jobs',
    'select * from job_facts_archive',
  ])('given %j, lets it pass', (text) => {
    expect(() => assertScoped(text)).not.toThrow();
  });
});
