import { endpoints } from '#shared/contracts/index';
import type { Endpoint } from '#shared/contracts/endpoint';
import { LookWriter, type SignalToKeep } from '#db/signal-writer';
import { beginReport, keepReport } from '#server/features/warranty-reports/issue-report';
import { sql } from '#db/database';
import { readSecret } from '#server/auth/secret';
import { issueUnsubscribeToken } from '#server/auth/unsubscribe-token';
import type { TestApp } from './app';
import { jpegOf, sendPhoto } from './send-photo';
import { placeFile } from './place-file';
import { sampleReport } from './sample-report';
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
  measure: 'overrun',
  photo: 'walked',
};

/** The job under way that the walks ask for. */
export const GOING = 'going';

/** The id that a file of the walks is given: it has none before it is sent. */
const PLACED_FILE = 'walked';

/** The address of a call with its names filled in; other values than the sample's may be given. */
export function addressOf({ path }: Endpoint, values: Record<string, string> = {}): string {
  return path.replace(/:(\w+)/g, (_, name: string) => {
    const value = values[name] ?? sampleOf(path, name);
    return encodeURIComponent(value);
  });
}

function sampleOf(path: string, name: string): string {
  // A job that has been sent is not under way.
  if (name === 'jobRef' && path.includes('/under-way/')) return GOING;
  if (name === 'id' && path.includes('/imports/')) return PLACED_FILE;
  return SAMPLES[name] ?? sampleCode(path, name);
}

function sampleCode(path: string, name: string): string {
  if (name === 'id') return path.includes('/keys/') ? '0'.repeat(12) : '1';
  if (name !== 'code') throw new Error(`the walk has no sample for :${name} of ${path}`);
  if (path.startsWith('/api/regions')) return 'COAST';
  if (path.startsWith('/api/products')) return 'CW1';
  if (path.startsWith('/api/packages')) return 'full';
  return 'AAA';
}

/** What a call cannot be asked without. */
const CAR = 'make=Velder&model=Tessock&firstRegistered=2009-05&bodyType=hatchback&package=full';
const QUOTED = `${CAR}&branch=AAA`;
const NEEDED: Record<string, string> = {
  '/api/week-notes': 'from=2025-12-01&to=2026-02-02',
  '/api/quote': QUOTED,
  '/api/exports/quote.csv': QUOTED,
  '/api/branches/:branch/usual': CAR,
};

/** The address of a call with what it cannot be asked without, and with whatever else is asked. */
export function askedOf(
  endpoint: Endpoint,
  values: Record<string, string> = {},
  query = '',
): string {
  const asked = [NEEDED[endpoint.path], query].filter(Boolean).join('&');
  return [addressOf(endpoint, values), asked].filter(Boolean).join('?');
}

/** A finding that was left on a car, under the reference that the walks ask for. */
const LEFT_FINDING = {
  ref: SAMPLES['ref'],
  zone: 'floor',
  side: 'left',
  seenAs: 'bubbling',
  structural: true,
  action: 'deferred',
};

/** The findings of a valid job and one that was left. */
export function findingsWithOneLeft(): object[] {
  return [...(validJob()['findings'] as object[]), LEFT_FINDING];
}

/** Puts there what the samples name: a job with a claim, a photo of either and a finding left on the car, one under way, a booking, an action and a report. */
export async function placeSamples(app: TestApp, { manager, lead }: SmallNetwork): Promise<void> {
  const claim = {
    jobRef: 'walked',
    madeOn: '2026-01-30',
    zone: 'floor',
    cause: 'damage',
    decision: 'open',
  };
  const booking = { expectedOn: '2026-02-10', package: 'full', bodyType: 'suv' };
  for (const [path, body] of [
    ['jobs/walked', validJob({ findings: findingsWithOneLeft() })],
    ['claims/walked', claim],
    ['bookings/walked', booking],
    [`under-way/${GOING}`, {}],
  ] as const) {
    const answer = await app.call('put', `/api/branches/AAA/${path}`, { token: manager, body });
    if (answer.status !== 201) throw new Error(`${path}: ${answer.text}`);
  }
  for (const shown of ['jobs', 'claims']) {
    const photo = `/api/branches/AAA/${shown}/walked/photos/walked`;
    const sent = await sendPhoto(app, photo, await jpegOf(), { token: manager });
    if (sent.status !== 201) throw new Error(`${photo}: ${sent.text}`);
  }
  const agreed = await app.call('post', '/api/branches/AAA/actions', { token: lead, body: ACTION });
  if (agreed.status !== 201) throw new Error(`action: ${agreed.text}`);
  await placeFile(app, manager, PLACED_FILE);
  const person = app.kit.store.unscoped.first<{ id: number }>(
    sql('people').where({ role: 'site_manager' }).select('id'),
  );
  // Signed by this server's own secret, so it can only be made here.
  NEEDED['/api/mail/unsubscribe'] =
    `token=${issueUnsubscribeToken(readSecret(app.kit.config).mails, { personId: person?.id ?? 0, kind: 'monday_digest' })}`;
  await placeReport(app);
  await placeSignal(app);
}

/** A signal of the branch that the samples name, the first: one that stands and compares with nobody. */
function placeSignal({ kit: { store } }: TestApp): Promise<void> {
  const branchId = store.state.branches.find(({ code }) => code === 'AAA')?.id ?? 0;
  const found: SignalToKeep = {
    branchId,
    kind: 'unbilled',
    ...{ key: 'unbilled', measure: null, since: '2026-01-10' },
    ...{ strength: 1, cars: 1, listed: [{ ref: 'walked', why: 'waits' }], behind: null },
    facts: {
      oldestOn: '2026-01-10',
      oldestDays: 23,
      costCents: 0,
      withoutCost: 0,
      currency: 'EUR',
    },
  } as const;
  const changes = { opened: [found], kept: [], ended: [] };
  const at = '2026-02-01T01:00:00.000Z';
  return store.queue.write(() => new LookWriter(store).keep('2026-02-01', at, changes));
}

/** An action as a lead agrees it. */
export const ACTION = {
  what: 'Refit in twos',
  who: 'All',
  until: '2026-03-31',
  measure: 'overrun',
};

/** An issued warranty report, the first: a made-up one, for making one takes a thread. */
function placeReport({ kit: { store } }: TestApp): Promise<number> {
  const actor = { label: 'system', personId: null, pushKeyId: null, address: 'local' };
  const begun = beginReport(store, '2026-02-01T06:30:00.000Z');
  const made = { report: sampleReport(), csv: 'branch\r\n', pdf: Buffer.from('%PDF-'), begun };
  return store.queue.write(() => keepReport(store, made, actor));
}
