import { Scope } from '#db/scope';
import type { Role } from '#shared/domain/vocabulary';
import { TestApp } from '../support/app';
import { disturbOutside } from '../support/disturb-outside';
import { readOnThisThread } from '../support/read-on-this-thread';
import { BRANCHES, makeSmallNetwork, type SmallNetwork } from '../support/small-network';
import { addressOf, contracts, placeSamples } from '../support/walk-contracts';

let app: TestApp;
let network: SmallNetwork;
let round = 0;

beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  await placeSamples(app, network);
  const note = { text: 'of the own branch' };
  await app.call('put', '/api/branches/AAA/weeks/2026-W05/note', {
    token: network.manager,
    body: note,
  });
}, 30_000);
afterAll(() => app.stop());

const PERIOD = 'from=2025-12-01&to=2026-02-02';
/** What is asked beside the plain call: filters in scope, out of it and of nothing; orders and groupings. */
const QUERIES: Record<string, string[]> = {
  '/api/jobs': ['q=walked', 'sort=overrun', 'sort=waiting&unbilled=true', 'make=velder', 'limit=1'],
  '/api/exports/jobs.csv': ['sort=completed'],
  '/api/analytics/overrun': ['by=branch', 'by=region', 'by=rotFound', 'by=month', 'by=ageBand'],
  '/api/exports/overrun.csv': ['by=branch', 'by=region'],
};
const FILTERS = [
  '',
  'branch=AAA',
  'branch=CCC',
  'branch=AAA&branch=CCC',
  'region=HILLS',
  'region=COAST',
  'branch=ZZZ',
];
const FILTERED = /^\/api\/(jobs|analytics|exports|week-notes)/;

/** Every address that a role may read, with its filters; named things also of branches out of scope. */
function addressesFor(role: Role): string[] {
  return contracts.flatMap(([, endpoint]) => {
    const { access, method, path } = endpoint;
    if (method !== 'get' || access === 'public' || !access.roles.includes(role)) return [];
    if (!FILTERED.test(path)) {
      const branches = path.includes(':branch') ? ['AAA', 'CCC', 'NEW2', 'ZZZ'] : ['AAA'];
      return branches.map((branch) => addressOf(endpoint, { branch }));
    }
    const needed = path === '/api/week-notes' ? PERIOD : '';
    return [...FILTERS, ...(QUERIES[path] ?? [])].map((query) =>
      [path, [needed, query].filter(Boolean).join('&')].filter(Boolean).join('?'),
    );
  });
}

const READERS = {
  recorder: { token: () => network.recorder, inside: ['AAA'], regions: ['COAST'] },
  site_manager: { token: () => network.manager, inside: ['AAA'], regions: ['COAST'] },
  regional_lead: { token: () => network.lead, inside: ['AAA', 'BBB'], regions: ['COAST'] },
} as const;
type Reader = keyof typeof READERS;

/** Asks everything, changes everything outside the reader's scope, asks again; the addresses whose answers differ by a byte. */
async function changedAnswers(role: Reader): Promise<string[]> {
  const { token, inside, regions } = READERS[role];
  const ask = async (): Promise<Map<string, string>> => {
    const answers = new Map<string, string>();
    for (const address of addressesFor(role)) {
      const { status, headers, text } = await app.call('get', address, { token: token() });
      const told = ['content-type', 'etag', 'content-length'].map((name) => headers.get(name));
      answers.set(address, JSON.stringify([status, ...told, text]));
    }
    return answers;
  };
  const before = await ask();
  round += 1;
  await disturbOutside(
    app,
    network,
    BRANCHES.flatMap(([branch, region]) =>
      (inside as readonly string[]).includes(branch) ? [] : { branch, region },
    ),
    ['COAST', 'HILLS'].filter((region) => !(regions as readonly string[]).includes(region)),
    round,
  );
  const after = await ask();
  return [...before.keys()].filter((address) => before.get(address) !== after.get(address));
}

describe.each(Object.keys(READERS) as Reader[])('Everything a %s may read', (role) => {
  it('given rows outside the scope changed and added, is the same byte for byte', async () => {
    const asked = addressesFor(role);
    expect(asked.length).toBeGreaterThan(role === 'recorder' ? 20 : 50);
    expect(await changedAnswers(role)).toEqual([]);
  }, 60_000);

  it('given the rows of the scope, has something in it that could have changed', async () => {
    const { body } = await app.call('get', '/api/jobs', { token: READERS[role].token() });
    expect(body.jobs).toBeGreaterThan(0);
  });
});

describe('Everything a site manager may read, with the filter taken out', () => {
  it('given rows outside the scope changed, differs wherever rows are narrowed by the filter', async () => {
    const reads = app.kit.reads;
    const ids = Object.getOwnPropertyDescriptor(Scope.prototype, 'idsJson')!;
    app.kit.reads = readOnThisThread(app.kit.store) as never;
    try {
      // Reading on this thread alone changes nothing.
      expect(await changedAnswers('site_manager')).toEqual([]);
      const everything = JSON.stringify(Array.from({ length: 100 }, (_, id) => id));
      Object.defineProperty(Scope.prototype, 'idsJson', { get: () => everything });
      const leaking = await changedAnswers('site_manager');
      const paths = new Set(leaking.map((address) => address.split('?')[0]));
      expect([...paths].sort()).toEqual([
        '/api/analytics/margin',
        '/api/analytics/overrun',
        '/api/costs',
        '/api/exports/jobs.csv',
        '/api/exports/margin.csv',
        '/api/exports/overrun.csv',
        '/api/jobs',
        '/api/week-notes',
      ]);
    } finally {
      Object.defineProperty(Scope.prototype, 'idsJson', ids);
      app.kit.reads = reads;
    }
  }, 60_000);
});
