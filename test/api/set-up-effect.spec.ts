import type { Effect, PlannedChange } from '#shared/contracts/set-up-help';
import { TestApp } from '../support/app';
import { callAs } from '../support/call-as';
import { makeCostedNetwork } from '../support/costed-cars';
import type { SmallNetwork } from '../support/small-network';

jest.setTimeout(60_000);

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeCostedNetwork(app);
});
afterAll(() => app.stop());

const { call, put, get } = callAs(
  () => app,
  () => network.office,
);
const effectOf = async (change: PlannedChange): Promise<Effect> => {
  const answer = await call('post', '/api/set-up/effect', { change });
  expect(answer.status).toBe(200);
  return answer.body as Effect;
};

/** What the pages say of everything: sums of margin and of what was expected, use against norm, a quote, the need. */
async function pages(): Promise<Record<Effect['figures'][number] | 'kept', unknown>> {
  const margin = await get('/api/analytics/margin?from=2025-11-01&to=2026-02-02');
  const products = await get('/api/analytics/products?from=2025-11-01&to=2026-02-02');
  const need = await get('/api/analytics/product-need?from=2025-11-01&to=2026-02-02');
  const rot = await get('/api/analytics/rot?from=2025-11-01&to=2026-02-02');
  const quote = await get(
    '/api/quote?make=Velder&model=Tessock&firstRegistered=2009-05&bodyType=hatchback&package=full&branch=AAA&marginShare=0.3',
  );
  const sum = (field: string): number =>
    (margin.weeks as Record<string, number | null>[]).reduce(
      (all, week) => all + (week[field] ?? 0),
      0,
    );
  return {
    kept: sum('marginCents'),
    margin: [sum('marginCents'), sum('unbilledCostCents'), margin.withoutCost],
    expected_margin: sum('expectedMarginCents'),
    bridge: margin.bridge,
    product_against_norm: [
      products.overall.ratioToNorm,
      products.use.map((row: { normMl: number }) => row.normMl),
    ],
    quote_price: quote.priceCents,
    product_need: need.needs,
    region_comparison: rot.regions.map(({ region, cars }: { region: string; cars: number }) => [
      region,
      cars,
    ]),
    corrosivity: rot.regions.map(({ corrosivity }: { corrosivity: unknown }) => corrosivity),
    new_warranties: (await get('/api/catalogue')).packages,
  };
}

const CLIMATE = { temperatureC: 9, humidityPct: 78, so2Deposition: 4, chlorideDeposition: 30 };
const cavityNorm = {
  package: 'cavity',
  bodyType: 'hatchback',
  norms: [{ product: 'CW1', ml: 3100 }],
} as const;

/** Each change as it is asked about, and as it is then made. */
const CHANGES: [string, PlannedChange, string, unknown][] = [
  [
    'a rate of a branch from a day on',
    { kind: 'rate', branch: 'AAA', from: '2025-11-25', hourlyCostCents: 3777 },
    '/api/branches/AAA/rates/2025-11-25',
    { hourlyCostCents: 3777 },
  ],
  [
    'a rate before another one',
    { kind: 'rate', branch: 'AAA', from: '2025-11-22', hourlyCostCents: 3501 },
    '/api/branches/AAA/rates/2025-11-22',
    { hourlyCostCents: 3501 },
  ],
  [
    'a rate of a day to come',
    { kind: 'rate', branch: 'BBB', from: '2026-03-01', hourlyCostCents: 4100 },
    '/api/branches/BBB/rates/2026-03-01',
    { hourlyCostCents: 4100 },
  ],
  [
    'the same rate again',
    { kind: 'rate', branch: 'CCC', from: '2025-11-01', hourlyCostCents: 3600 },
    '/api/branches/CCC/rates/2025-11-01',
    { hourlyCostCents: 3600 },
  ],
  [
    'the first cost of a product, which makes cars costed',
    { kind: 'productCost', product: 'UW1', from: '2025-01-01', costPerLitreCents: 999 },
    '/api/products/UW1/costs/2025-01-01',
    { costPerLitreCents: 999 },
  ],
  [
    'another cost of a product',
    { kind: 'productCost', product: 'CW1', from: '2025-11-24', costPerLitreCents: 1333 },
    '/api/products/CW1/costs/2025-11-24',
    { costPerLitreCents: 1333 },
  ],
  [
    'the first cost of a piece',
    { kind: 'consumableCost', consumable: 'blanking_plug', from: '2025-01-01', unitCostCents: 77 },
    '/api/consumables/blanking_plug/costs/2025-01-01',
    { unitCostCents: 77 },
  ],
  [
    'a fee from a day on',
    { kind: 'fee', from: '2025-12-01', feeRate: 0.0733 },
    '/api/network/fees/2025-12-01',
    { feeRate: 0.0733 },
  ],
  [
    'the fee from the start',
    { kind: 'fee', from: null, feeRate: 0.061 },
    '/api/network',
    { name: 'Small', currency: 'EUR', feeRate: 0.061 },
  ],
  [
    'a norm',
    {
      kind: 'norm',
      package: 'full',
      bodyType: 'hatchback',
      norms: [
        { product: 'CW1', ml: 4500 },
        { product: 'UW1', ml: 200 },
      ],
    },
    '/api/packages/full/norms/hatchback',
    {
      norms: [
        { product: 'CW1', ml: 4500 },
        { product: 'UW1', ml: 200 },
      ],
    },
  ],
  [
    'a norm where there was none',
    { kind: 'norm', ...cavityNorm, norms: [...cavityNorm.norms] },
    '/api/packages/cavity/norms/hatchback',
    { norms: cavityNorm.norms },
  ],
  [
    'a warranty, for cars to come',
    { kind: 'warranty', package: 'full', warrantyMonths: 48 },
    '/api/packages/full',
    { name: 'Full', warrantyMonths: 48 },
  ],
  [
    'a branch in another region',
    { kind: 'branchRegion', branch: 'AAA', region: 'HILLS' },
    '/api/branches/AAA',
    { name: 'Branch AAA', region: 'HILLS', timeZone: 'Europe/Berlin', openedOn: '2015-01-01' },
  ],
  [
    'a climate',
    { kind: 'climate', region: 'HILLS' },
    '/api/regions/HILLS',
    { name: 'Hills', climate: CLIMATE },
  ],
];

/** Figures that some change has moved: an empty comparison would prove nothing. */
const everMoved = new Set<string>();

describe('The effect told of a change', () => {
  it.each(CHANGES)('given %s, is what making it then does', async (_, change, path, body) => {
    const effect = await effectOf(change);
    const before = await pages();
    const { restatedJobs } = (await put(path, body)).body as { restatedJobs?: number };
    const after = await pages();
    if (restatedJobs !== undefined) expect(restatedJobs).toBe(effect.jobs);
    const { marginCents: kept } = effect;
    // To the cent, on the page of margin.
    expect((kept?.after ?? 0) - (kept?.before ?? 0)).toBe(
      (after.kept as number) - (before.kept as number),
    );
    const moved = Object.keys(before).filter(
      (figure) =>
        figure !== 'kept' &&
        JSON.stringify(before[figure as 'kept']) !== JSON.stringify(after[figure as 'kept']),
    );
    // Nothing moves that was not said; bridge and quote may be said and come out the same to the cent.
    expect(effect.figures).toEqual(expect.arrayContaining(moved));
    for (const figure of moved) everMoved.add(figure);
  });

  it('given all of them, has seen the figures move that cars alone can move', () => {
    expect([...everMoved]).toEqual(
      expect.arrayContaining(['margin', 'expected_margin', 'bridge', 'product_against_norm']),
    );
  });

  it('given all cars of a branch, tells what they keep before and after as the page of margin sums it', async () => {
    const change = {
      kind: 'rate',
      branch: 'BBB',
      from: '2015-01-01',
      hourlyCostCents: 5001,
    } as const;
    const kept = async (): Promise<number> => (await pagesOf('BBB')) as number;
    const before = await kept();
    const effect = await effectOf(change);
    await put('/api/branches/BBB/rates/2015-01-01', { hourlyCostCents: 5001 });
    expect(effect).toMatchObject({
      jobs: 12,
      branches: 1,
      from: '2025-11-21',
      to: expect.stringMatching(/^2025-12-2/) as string,
      marginCents: { before, after: await kept() },
    });
  });

  it('given nothing there by a name, answers 422 at the field; writes nothing in any case', async () => {
    const ask = async (change: unknown): Promise<unknown> => {
      const answer = await call('post', '/api/set-up/effect', { change });
      return [answer.status, (answer.body.problems as { path: string }[]).map(({ path }) => path)];
    };
    expect(
      await ask({ kind: 'rate', branch: 'ZZZ', from: '2026-01-01', hourlyCostCents: 1 }),
    ).toEqual([422, ['/change/branch']]);
    expect(await ask({ kind: 'climate', region: 'NOPE' })).toEqual([422, ['/change/region']]);
    const norms = [
      { product: 'CW1', ml: 1 },
      { product: 'CW1', ml: 1 },
      { product: 'XX9', ml: 1 },
    ];
    expect(await ask({ kind: 'norm', package: 'nope', bodyType: 'van', norms })).toEqual([
      422,
      ['/change/package', '/change/norms/1/product', '/change/norms/2/product'],
    ]);
    const events = app.kit.store.unscoped.prepare('select count(*) as n from audit_events').get();
    await effectOf({ kind: 'fee', from: null, feeRate: 0.2 });
    expect(app.kit.store.unscoped.prepare('select count(*) as n from audit_events').get()).toEqual(
      events,
    );
    expect((await get('/api/network')).feeRate).toBe(0.061);
  });

  it('given a kind of change that there is not, or none, names the kinds there are', async () => {
    for (const change of [{ kind: 'nope' }, {}]) {
      const answer = await call('post', '/api/set-up/effect', { change });
      expect([answer.status, answer.body.problems]).toEqual([
        422,
        [
          {
            path: '/change/kind',
            message:
              'must be one of rate, productCost, consumableCost, fee, norm, warranty, branchRegion, climate',
          },
        ],
      ]);
    }
  });

  async function pagesOf(branch: string): Promise<unknown> {
    const { weeks } = await get(
      `/api/analytics/margin?from=2025-11-01&to=2026-02-02&branch=${branch}`,
    );
    return (weeks as { marginCents: number }[]).reduce((all, week) => all + week.marginCents, 0);
  }
});
