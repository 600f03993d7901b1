import { defineEndpoint } from './endpoint';
import { noParams, READERS, scopeQuery } from './fields';
import { jobsQuery } from './job-list';
import { overrunQuery } from './overrun';

const csv = {
  method: 'get',
  topic: 'Exports',
  access: READERS,
  scope: 'branches',
  params: noParams,
  body: null,
  out: 'csv',
  statuses: [200],
} as const;

export const exportJobs = defineEndpoint({
  ...csv,
  path: '/api/exports/jobs.csv',
  summary: 'Jobs as listed, one row a job.',
  query: jobsQuery.omit({ limit: true, cursor: true }),
});

export const exportMargin = defineEndpoint({
  ...csv,
  path: '/api/exports/margin.csv',
  summary: 'The weeks of the margin answer, one row a week.',
  query: scopeQuery,
});

export const exportOverrun = defineEndpoint({
  ...csv,
  path: '/api/exports/overrun.csv',
  summary: 'The groups of the overrun answer, one row a group.',
  query: overrunQuery,
});
