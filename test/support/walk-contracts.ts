import { endpoints } from '#shared/contracts/index';
import type { Endpoint } from '#shared/contracts/endpoint';
import type { TestApp } from './app';
import { validJob, type SmallNetwork } from './small-network';

/** A call as tests name it. */
export const nameOf = ({ method, path }: Endpoint): string => `${method.toUpperCase()} ${path}`;

/** Every contract, with its name first so that a table of tests shows it. */
export const contracts = endpoints.map((endpoint): [string, Endpoint] => [
  nameOf(endpoint),
  endpoint,
]);

const SAMPLES: Record<string, string> = {
  branch: 'AAA',
  jobRef: 'walked',
  claimRef: 'walked',
  ref: 'walked',
  from: '2026-01-01',
  kind: 'other',
  bodyType: 'suv',
  week: '2026-W05',
};

/** The address of a call with its names filled in; other values than the sample's may be given. */
export function addressOf({ path }: Endpoint, values: Record<string, string> = {}): string {
  return path.replace(/:(\w+)/g, (_, name: string) => {
    const value = values[name] ?? SAMPLES[name] ?? sampleCode(path, name);
    return encodeURIComponent(value);
  });
}

function sampleCode(path: string, name: string): string {
  if (name === 'id') return path.includes('/keys/') ? '0'.repeat(12) : '1';
  if (name !== 'code') throw new Error(`the walk has no sample for :${name} of ${path}`);
  if (path.startsWith('/api/regions')) return 'COAST';
  if (path.startsWith('/api/products')) return 'CW1';
  if (path.startsWith('/api/packages')) return 'full';
  return 'AAA';
}

/** Puts there what the samples name: a job with a claim and a booking. */
export async function placeSamples(app: TestApp, { manager }: SmallNetwork): Promise<void> {
  const claim = {
    jobRef: 'walked',
    madeOn: '2026-01-30',
    zone: 'floor',
    cause: 'damage',
    decision: 'open',
  };
  const booking = { expectedOn: '2026-02-10', package: 'full', bodyType: 'suv' };
  for (const [path, body] of [
    ['jobs/walked', validJob()],
    ['claims/walked', claim],
    ['bookings/walked', booking],
  ] as const) {
    const answer = await app.call('put', `/api/branches/AAA/${path}`, { token: manager, body });
    if (answer.status !== 201) throw new Error(`${path}: ${answer.text}`);
  }
}
