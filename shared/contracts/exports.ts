import { branchesQuery } from './branches';
import { comeBackQuery } from './come-back';
import { defineEndpoint } from './endpoint';
import { HEAD_OFFICE, noParams, READERS, scopeQuery } from './fields';
import { claimsQuery } from './claim-list';
import { jobsQuery } from './job-list';
import { overrunQuery } from './overrun';
import { quoteQuery } from './quote';
import { warrantyQuery } from './warranty';

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

export const exportRot = defineEndpoint({
  ...csv,
  path: '/api/exports/rot.csv',
  summary: 'The cells of the rot answer, one row an age band and region.',
  query: scopeQuery,
});

export const exportRotModels = defineEndpoint({
  ...csv,
  path: '/api/exports/rot-models.csv',
  summary: 'The models of the rot answer, one row a model and age band.',
  query: scopeQuery,
});

export const exportRotZones = defineEndpoint({
  ...csv,
  path: '/api/exports/rot-zones.csv',
  summary: 'The zones of the rot answer by side, one row a zone, side and age band.',
  query: scopeQuery,
});

export const exportProducts = defineEndpoint({
  ...csv,
  path: '/api/exports/products.csv',
  summary: 'The rows of the product answer, one a product, package and body type.',
  query: scopeQuery,
});

export const exportProductBranches = defineEndpoint({
  ...csv,
  path: '/api/exports/product-branches.csv',
  summary: 'The branches of the product answer against the norm, one row a branch.',
  query: scopeQuery,
});

export const exportProductTemperature = defineEndpoint({
  ...csv,
  path: '/api/exports/product-temperature.csv',
  summary: 'Product use by workshop temperature, one row a product and class of 5 °C.',
  query: scopeQuery,
});

export const exportBranches = defineEndpoint({
  ...csv,
  path: '/api/exports/branches.csv',
  summary: 'The branches of the funnel answer, one row a branch.',
  scope: 'network-reference',
  query: branchesQuery,
});

export const exportQuote = defineEndpoint({
  ...csv,
  path: '/api/exports/quote.csv',
  summary: 'A quote as rows: labour by stage, chances, product, price by margin.',
  scope: 'network-reference',
  query: quoteQuery,
});

export const exportProductNeed = defineEndpoint({
  ...csv,
  path: '/api/exports/product-need.csv',
  summary: 'What the coming eight weeks need, one row a product.',
  query: scopeQuery,
});

export const exportComeBack = defineEndpoint({
  ...csv,
  path: '/api/exports/come-back.csv',
  summary: 'The come-back list, one row a finding.',
  query: comeBackQuery.omit({ limit: true, cursor: true }),
});

/** Every claim of the jobs chosen, counted or not; from/to choose jobs by completion, as the warranty answer does (rule 62). */
export const exportClaims = defineEndpoint({
  ...csv,
  path: '/api/exports/claims.csv',
  summary: 'Claims as listed, one row a claim; from/to default to the first job … asOf.',
  query: claimsQuery.omit({ limit: true, cursor: true }),
});

export const exportWarrantyRisk = defineEndpoint({
  ...csv,
  path: '/api/exports/warranty-risk.csv',
  summary: 'The warranty-risk rows, one a branch and completion half-year (rule 51).',
  access: HEAD_OFFICE,
  scope: 'network-reference',
  query: warrantyQuery.omit({ groupBy: true, group: true }),
});

export const exportWarrantyClaimFree = defineEndpoint({
  ...csv,
  path: '/api/exports/warranty-claim-free.csv',
  summary: 'Claim-free shares by group and month, `group` empty for all cars together.',
  query: warrantyQuery,
});

export const exportWarrantyCohorts = defineEndpoint({
  ...csv,
  path: '/api/exports/warranty-cohorts.csv',
  summary: 'Paid and still to come, one row a completion half-year.',
  scope: 'network-reference',
  query: warrantyQuery,
});

export const exportWarrantyTriangle = defineEndpoint({
  ...csv,
  path: '/api/exports/warranty-triangle.csv',
  summary: 'Paid up to each development half-year, one row a cohort and development half-year.',
  query: warrantyQuery,
});

export const exportWarrantyBranches = defineEndpoint({
  ...csv,
  path: '/api/exports/warranty-branches.csv',
  summary: 'Claims observed against expected, one row a branch.',
  scope: 'network-reference',
  query: warrantyQuery,
});

export const exportWarrantyProcess = defineEndpoint({
  ...csv,
  path: '/api/exports/warranty-process.csv',
  summary: 'Risk of a claim with a process check missed against done, one row a check.',
  query: warrantyQuery,
});
