import fc from 'fast-check';
import type { Endpoint } from '#shared/contracts/endpoint';
import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';
import { addressOf, contracts, placeSamples } from '../support/walk-contracts';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  await placeSamples(app, network);
}, 30_000);
afterAll(() => app.stop());

/** Bodies that pass, to be spoilt at one place. */
const VALID: Record<string, unknown> = {
  'PUT /api/branches/:branch/jobs/:jobRef': validJob({
    agreedExtras: [{ on: '2026-01-27', minutes: 5, priceCents: 5, note: 'x' }],
  }),
  'POST /api/branches/:branch/jobs/batch': { jobs: [{ jobRef: 'spoilt', ...validJob() }] },
  'PUT /api/branches/:branch/claims/:claimRef': {
    jobRef: 'walked',
    madeOn: '2026-01-30',
    zone: 'floor',
    cause: 'damage',
    decision: 'accepted',
    decidedOn: '2026-01-31',
    labourMinutes: 5,
    productMl: 5,
    costCents: 5,
    paidOn: '2026-02-01',
    note: 'x',
  },
  'PUT /api/branches/:code': {
    name: 'Branch',
    region: 'COAST',
    timeZone: 'Europe/Berlin',
    openedOn: '2015-01-01',
    closedOn: null,
    targetMarginShare: 0.3,
  },
  'PUT /api/packages/:code/norms/:bodyType': { norms: [{ product: 'CW1', ml: 5 }] },
  'PUT /api/network': { name: 'Small', currency: 'EUR', feeRate: 0.05, claimLimitCents: 100 },
};

const odd = fc.oneof(
  fc.jsonValue({ maxDepth: 2 }),
  fc.constantFrom(
    null,
    -1,
    -0,
    0.5,
    1e21,
    2 ** 53,
    '',
    ' ',
    '\u0000',
    '\ud800',
    '__proto__',
    'constructor',
    '9999-12-31',
    '1000-01-01',
    '0000-00-00',
    '2026-02-30',
    'x'.repeat(5000),
    '🚗',
    [],
    {},
    [[]],
    true,
  ),
);

/** A copy of a value with something odd at a random place. */
function spoilt(value: unknown, picks: number[], instead: unknown): unknown {
  const [pick = 0, ...rest] = picks;
  if (typeof value !== 'object' || value === null || picks.length === 0) return instead;
  const keys = Object.keys(value);
  if (keys.length === 0) return instead;
  const key = keys[pick % keys.length]!;
  const inner = spoilt((value as Record<string, unknown>)[key], rest, instead);
  if (Array.isArray(value)) return value.map((item, at) => (String(at) === key ? inner : item));
  return { ...value, [key]: inner };
}

const send = (endpoint: Endpoint, body: unknown): Promise<Answer> =>
  app.call(endpoint.method, addressOf(endpoint), {
    token: network.office,
    body: JSON.stringify(body),
  });
function expectJudged({ status, body }: Answer): void {
  expect(status).toBeLessThan(500);
  if (status === 422) expect(body.problems.length).toBeGreaterThan(0);
}

const taking = contracts.filter(([, { body, path }]) => body && !path.startsWith('/api/auth/'));

describe.each(taking)('%s', (name, endpoint) => {
  it('given any JSON at all, judges it and never fails', async () => {
    await fc.assert(
      fc.asyncProperty(fc.jsonValue(), async (body) => expectJudged(await send(endpoint, body))),
      { numRuns: 15 },
    );
  });

  if (VALID[name] !== undefined) {
    it('given a good body spoilt at one place, judges it and never fails', async () => {
      await fc.assert(
        fc.asyncProperty(
          fc.array(fc.nat(20), { minLength: 1, maxLength: 4 }),
          odd,
          async (picks, instead) =>
            expectJudged(await send(endpoint, spoilt(VALID[name], picks, instead))),
        ),
        { numRuns: 120 },
      );
      expectJudged(await send(endpoint, VALID[name]));
    }, 30_000);
  }
});

/** Without halves of pairs, which no address can carry. */
const wellFormed = (text: string): string => text.replace(/\p{Cs}/gu, '');

const asking = contracts.filter(
  ([, { method, access, query }]) =>
    method === 'get' && access !== 'public' && Object.keys(query.shape).length > 0,
);

describe.each(asking)('%s', (_, endpoint) => {
  const { path, query } = endpoint;
  // What a query names within what a path names may not be there.
  const judged = path.includes(':') ? [200, 404, 422] : [200, 422];

  it('given any values of its own parameters, judges them and never fails', async () => {
    const value = fc.oneof(
      fc.string({ unit: 'binary' }),
      fc.constantFrom(
        '',
        'true',
        '2026-01-01',
        '9999-12-31',
        '1000-01-01',
        'AAA',
        'full',
        'suv',
        '50',
        '-1',
      ),
    );
    const asked = fc.array(fc.tuple(fc.constantFrom(...Object.keys(query.shape)), value), {
      maxLength: 4,
    });
    await fc.assert(
      fc.asyncProperty(asked, async (pairs) => {
        const text = pairs.map(([key, one]) => `${key}=${encodeURIComponent(wellFormed(one))}`);
        const answer = await app.call('get', `${addressOf(endpoint)}?${text.join('&')}`, {
          token: network.office,
        });
        expect(judged).toContain(answer.status);
        if (answer.status === 422) {
          for (const one of answer.body.problems) expect(one.path).toMatch(/^\/query\//);
        }
      }),
      { numRuns: 60 },
    );
  }, 60_000);
});
