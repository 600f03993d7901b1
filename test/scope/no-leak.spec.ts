import { NetworkReference } from '#db/network-reference';
import { Scope } from '#db/scope';
import type { Role } from '#shared/domain/vocabulary';
import { TestApp, type Answer } from '../support/app';
import { disturbOutside, oldCarsOf, oldClaim } from '../support/disturb-outside';
import { readOnThisThread } from '../support/read-on-this-thread';
import { BRANCHES, makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';
import { askedOf, contracts, findingsWithOneLeft, placeSamples } from '../support/walk-contracts';
import { mayRefer, withoutReference } from './reference-fields';
import { unguardedQuoteSet, unguardedUsualSet, type Guarded } from './unguarded-sets';

let app: TestApp;
let network: SmallNetwork;
let round = 0;

beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  await placeSamples(app, network);
  const sent = await app.call('post', '/api/branches/AAA/jobs/batch', {
    token: network.manager,
    body: { jobs: [...ownCars(), ...oldCarsOf(0)] },
  });
  expect(sent.status).toBe(200);
  const claim = await app.call('put', '/api/branches/AAA/claims/old', {
    token: network.office,
    body: oldClaim('old-0-1', 500),
  });
  expect(claim.status).toBe(201);
  const note = { text: 'of the own branch' };
  await app.call('put', '/api/branches/AAA/weeks/2026-W05/note', {
    token: network.manager,
    body: note,
  });
}, 30_000);
afterAll(() => app.stop());

/** Cars of the branch that everybody here reads: enough for shares, of two age bands, one of them with the sample's model and age thirty times. */
function ownCars(): object[] {
  const vehicle = validJob()['vehicle'] as object;
  return Array.from({ length: 40 }, (_, n) => ({
    jobRef: `own-${n}`,
    ...validJob({
      ...(n >= 32 && { vehicle: { ...vehicle, firstRegistered: '2019-03' } }),
      findings: n % 3 === 0 ? findingsWithOneLeft() : [],
    }),
  }));
}

const MEASURES = ['rot', 'claims', 'product', 'margin'].map((measure) => `measure=${measure}`);

/** What is asked beside the plain call: filters in scope, out of it and of nothing; orders and groupings. */
const QUERIES: Record<string, string[]> = {
  '/api/jobs': ['q=walked', 'sort=overrun', 'sort=waiting&unbilled=true', 'make=velder', 'limit=1'],
  '/api/exports/jobs.csv': ['sort=completed'],
  '/api/analytics/overrun': ['by=branch', 'by=region', 'by=rotFound', 'by=month', 'by=ageBand'],
  '/api/exports/overrun.csv': ['by=branch', 'by=region'],
  '/api/analytics/rot': ['package=full', 'from=2026-01-26', 'package=cavity', 'bodyType=suv'],
  '/api/analytics/branches': MEASURES,
  '/api/analytics/branches/weeks': MEASURES,
  '/api/analytics/branches/side-by-side': MEASURES,
  '/api/claims': ['counted=true', 'sort=completed&limit=1', 'q=walked', 'asOf=2026-01-30'],
  '/api/actions': ['limit=1', 'state=done'],
  '/api/signals': ['limit=1', 'state=over&state=open', 'kind=silence'],
  '/api/come-back': ['limit=1', 'status=contacted'],
  '/api/analytics/warranty': [
    ...['asOf=2025-12-31', 'groupBy=branch', 'groupBy=region', 'groupBy=cohort&to=2024-01-01'],
    'groupBy=branch&group=AAA&group=CCC',
  ],
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
const FILTERED = /^\/api\/(jobs|actions|claims|analytics|come-back|exports|week-notes|signals)/;
/** Cars that a quote may be asked for: many at the own branch, few there, none there; and a branch out of scope. */
const QUOTES = [
  'firstRegistered=2009-05&branch=AAA',
  'firstRegistered=2019-03&branch=AAA',
  'firstRegistered=2004-01&branch=AAA',
  'firstRegistered=2009-05&branch=CCC',
  'firstRegistered=2009-05&branch=ZZZ',
].map((asked) => `make=Velder&model=Tessock&bodyType=hatchback&package=full&${asked}`);

/** The same cars asked for at the branch that the path names. */
const USUALS = QUOTES.map((asked) => {
  const query = new URLSearchParams(asked);
  const branch = query.get('branch') ?? '';
  query.delete('branch');
  return `/api/branches/${branch}/usual?${query.toString()}`;
});

/** Every address that a role may read, with its filters; named things also of branches out of scope. */
function addressesFor(role: Role): string[] {
  return contracts.flatMap(([, endpoint]) => {
    const { access, method, path } = endpoint;
    if (method !== 'get' || access === 'public' || !access.roles.includes(role)) return [];
    if (/quote/.test(path)) return QUOTES.map((asked) => `${path}?${asked}`);
    if (path.endsWith('/usual')) return USUALS;
    if (!FILTERED.test(path)) {
      const branches = path.includes(':branch') ? ['AAA', 'CCC', 'NEW2', 'ZZZ'] : ['AAA'];
      return branches.map((branch) => askedOf(endpoint, { branch }));
    }
    return [...FILTERS, ...(QUERIES[path] ?? [])].map((query) => askedOf(endpoint, {}, query));
  });
}

const READERS = {
  recorder: { token: () => network.recorder, inside: ['AAA'], regions: ['COAST'] },
  site_manager: { token: () => network.manager, inside: ['AAA'], regions: ['COAST'] },
  regional_lead: { token: () => network.lead, inside: ['AAA', 'BBB'], regions: ['COAST'] },
} as const;
type Reader = keyof typeof READERS;

/** The calls that refer to the network. */
const REFERRING = [
  '/api/analytics/rot',
  '/api/analytics/warranty',
  '/api/analytics/branches',
  '/api/analytics/branches/side-by-side',
  '/api/branches/AAA/actions/1',
  '/api/quote',
  '/api/branches/AAA/usual',
  '/api/exports/branches.csv',
  '/api/exports/quote.csv',
  '/api/exports/warranty-branches.csv',
  '/api/exports/warranty-cohorts.csv',
];

/** As many branches with cars as may stand outside before a figure of the network is told. */
const FOUR: readonly string[] = ['CCC', 'DDD', 'EEE', 'FFF'];

/** What of an answer is compared: all of it, or all but what is named as a figure of the network. */
interface Told {
  whole: string;
  beyondReference: string;
}

function toldBy(path: string, { status, headers, text }: Answer): Told {
  const told = ['content-type', 'etag', 'content-length'].map((name) => headers.get(name));
  const whole = JSON.stringify([status, ...told, text]);
  if (!mayRefer(path)) return { whole, beyondReference: whole };
  const rest = [status, headers.get('content-type'), withoutReference(path, text)];
  return { whole, beyondReference: JSON.stringify(rest) };
}

const pathOf = (address: string): string => address.split('?')[0]!;

/** Asks everything, changes everything outside the reader's scope, asks again; the addresses whose answers differ by a byte. */
async function changedAnswers(
  role: Reader,
  busy: 'all' | readonly string[] = 'all',
): Promise<{ whole: string[]; beyondReference: string[] }> {
  const { token, inside, regions } = READERS[role];
  const ask = async (): Promise<Map<string, Told>> => {
    const answers = new Map<string, Told>();
    for (const address of addressesFor(role)) {
      const answer = await app.call('get', address, { token: token() });
      if (answer.status >= 500) throw new Error(`${address}: ${answer.text}`);
      answers.set(address, toldBy(pathOf(address), answer));
    }
    return answers;
  };
  const before = await ask();
  round += 1;
  await disturbOutside(app, network, {
    outside: BRANCHES.flatMap(([branch, region]) =>
      (inside as readonly string[]).includes(branch) ? [] : { branch, region },
    ),
    regions: ['COAST', 'HILLS'].filter(
      (region) => !(regions as readonly string[]).includes(region),
    ),
    busy,
    round,
  });
  const after = await ask();
  const differing = (view: keyof Told): string[] =>
    [...before.keys()].filter(
      (address) => before.get(address)?.[view] !== after.get(address)?.[view],
    );
  return { whole: differing('whole'), beyondReference: differing('beyondReference') };
}

const pathsOf = (addresses: readonly string[]): string[] => [...new Set(addresses.map(pathOf))];

/** Reads on this thread, where a guard can be taken out, and puts things back. */
async function withReadsHere<T>(read: () => Promise<T>): Promise<T> {
  const reads = app.kit.reads;
  app.kit.reads = readOnThisThread(app.kit.store) as never;
  try {
    return await read();
  } finally {
    app.kit.reads = reads;
  }
}

const EVERY_READER = Object.keys(READERS) as Reader[];

describe.each(EVERY_READER)(
  'Everything a %s may read, with cars at four branches outside',
  (role) => {
    it('given rows outside the scope changed and added, is the same byte for byte (rule 81)', async () => {
      expect(addressesFor(role).length).toBeGreaterThan(role === 'recorder' ? 20 : 90);
      expect((await changedAnswers(role, FOUR)).whole).toEqual([]);
    }, 60_000);

    it('given the rows of the scope, has something in it that could have changed', async () => {
      const { body } = await app.call('get', '/api/jobs', { token: READERS[role].token() });
      expect(body.jobs).toBeGreaterThan(0);
    });
  },
);

describe('Everything a site manager may read, with the guard of network figures taken out', () => {
  it('given rows at four branches outside changed, differs wherever the network is referred to', async () => {
    const changed = await withReadsHere(async () => {
      const guarded = NetworkReference.prototype as unknown as Guarded;
      const guards = [
        jest.spyOn(guarded, 'enoughBehind').mockReturnValue(true),
        jest.spyOn(guarded, 'nearestQuoteSet').mockImplementation(unguardedQuoteSet),
        jest.spyOn(guarded, 'nearestUsualSet').mockImplementation(unguardedUsualSet),
      ];
      try {
        return await changedAnswers('site_manager', FOUR);
      } finally {
        for (const guard of guards) guard.mockRestore();
      }
    });
    expect(pathsOf(changed.whole)).toEqual(REFERRING);
  }, 60_000);
});

describe('With cars at all branches', () => {
  // Reached here, so that what was told of the scope alone and now is of the network does not count as a change.
  beforeAll(() => changedAnswers('site_manager'), 60_000);

  it.each(EVERY_READER)(
    'given rows outside changed, everything a %s may read is the same but for what is named as a figure of the network (rule 81)',
    async (role) => {
      const changed = await changedAnswers(role);
      expect(changed.beyondReference).toEqual([]);
      // And those figures do follow: what is left out of the comparison is not left out of the answers.
      const readable = pathsOf(addressesFor(role));
      expect(pathsOf(changed.whole)).toEqual(REFERRING.filter((path) => readable.includes(path)));
    },
    60_000,
  );
});

describe('Everything a site manager may read', () => {
  it('given the filter taken out and rows outside changed, differs wherever rows are narrowed by it', async () => {
    const ids = Object.getOwnPropertyDescriptor(Scope.prototype, 'idsJson')!;
    const leaking = await withReadsHere(async () => {
      // Reading on this thread alone changes nothing.
      expect((await changedAnswers('site_manager')).beyondReference).toEqual([]);
      const everything = JSON.stringify(Array.from({ length: 100 }, (_, id) => id));
      Object.defineProperty(Scope.prototype, 'idsJson', { get: () => everything });
      try {
        return (await changedAnswers('site_manager')).beyondReference;
      } finally {
        Object.defineProperty(Scope.prototype, 'idsJson', ids);
      }
    });
    // Rows that name regions or branches of the scope: cars of branches beyond it belong to none of them.
    const lockedTwice = [
      ...['/api/exports/rot.csv', '/api/exports/product-branches.csv'],
      ...['/api/exports/warranty-branches.csv', '/api/exports/branches.csv'],
    ];
    const narrowed = contracts.filter(
      ([name, { access, path }]) =>
        name.startsWith('GET') &&
        access !== 'public' &&
        access.roles.includes('site_manager') &&
        FILTERED.test(path) &&
        !lockedTwice.includes(path),
    );
    expect(narrowed.length).toBeGreaterThan(12);
    expect(pathsOf(leaking).sort()).toEqual(
      [
        '/api/branches/AAA/actions/1',
        '/api/branches/AAA/usual',
        '/api/costs',
        '/api/quote',
        ...narrowed.map(([, { path }]) => path),
      ].sort(),
    );
  }, 120_000);
});
