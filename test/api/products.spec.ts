import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
  for (const branch of ['AAA', 'BBB']) {
    const jobs = Array.from({ length: 6 }, (_, index) => ({
      jobRef: `p-${index}`,
      ...validJob({
        products: index === 0 ? [] : [{ product: 'CW1', ml: 1000 * index }],
        workshop: { temperatureC: 10 + index },
      }),
    }));
    const path = `/api/branches/${branch}/jobs/batch`;
    const answer = await app.call('post', path, { token: network.keys[branch], body: { jobs } });
    expect(answer.status).toBe(200);
  }
}, 60_000);
afterAll(() => app.stop());

const products = (query = '', token = network.lead) =>
  app.call('get', `/api/analytics/products${query}`, { token });

describe('GET /api/analytics/products', () => {
  it('given the default period, answers for the 52 weeks up to today', async () => {
    const { status, body } = await products();
    expect(status).toBe(200);
    expect(body).toMatchObject({
      period: { from: '2025-02-10', to: '2026-02-02' },
      scope: { regions: ['COAST'], branches: ['AAA', 'BBB'] },
      ...{ jobs: 12, withoutCost: 0, missingCosts: [] },
    });
    // 0 … 5 litres at either branch against a norm of 4: 0, 1 and 2 are under, none over 5.2.
    expect(body.use).toEqual([
      expect.objectContaining({
        ...{ product: 'CW1', package: 'full', bodyType: 'hatchback', cars: 12, carsListing: 10 },
        ...{ meanMl: 2500, medianMl: 2500, normMl: 4000, costPerCarCents: 3000 },
        ...{ under: 6, over: 0, underShare: 0.5, overShare: 0 },
      }),
    ]);
    expect(body.overall).toMatchObject({ cars: 12, ratioToNorm: 0.625, costPerCarCents: 3000 });
    expect(body.branches.map(({ branch }: { branch: string }) => branch)).toEqual(['AAA', 'BBB']);
    expect(body.temperature).toEqual([
      expect.objectContaining({ product: 'CW1', cars: 10, slopeMlPerDegree: 1000 }),
    ]);
  });

  it('given a scope, filters or another branch, counts only what is in both', async () => {
    expect((await products('', network.manager)).body).toMatchObject({ jobs: 6 });
    expect((await products('?branch=BBB')).body.branches).toHaveLength(1);
    expect((await products('?branch=CCC')).body).toMatchObject({ jobs: 0, use: [] });
    expect((await products('?bodyType=suv')).body).toMatchObject({ jobs: 0, use: [] });
    expect((await products('?package=none')).body.problems).toEqual([
      expect.objectContaining({ path: '/query/package' }),
    ]);
  });

  it('given a recorder, answers 403', async () => {
    expect((await products('', network.recorder)).status).toBe(403);
  });

  it('given the export, has the rows of the screen (rule 62)', async () => {
    const { text } = await app.call('get', '/api/exports/products.csv', { token: network.lead });
    const [header, row, end] = text.split('\r\n');
    expect(header?.split(',').slice(0, 5)).toEqual([
      ...['product', 'package', 'bodyType', 'cars', 'carsListing'],
    ]);
    expect(row?.split(',').slice(0, 6)).toEqual(['CW1', 'full', 'hatchback', '12', '10', '2500']);
    expect(end).toBe('');
  });

  it('given the exports of its pictures, writes a row a branch and a row a class of temperature', async () => {
    const { body } = await products();
    const rowsOf = async (name: string): Promise<string[]> => {
      const path = `/api/exports/${name}.csv`;
      const { status, text } = await app.call('get', path, { token: network.lead });
      expect([status, text.endsWith('\r\n')]).toEqual([200, true]);
      return text.trimEnd().split('\r\n');
    };
    const branches = body.branches as Record<string, string | number | null>[];
    expect(await rowsOf('product-branches')).toEqual([
      'branch,cars,ratioToNorm,lower,upper',
      ...branches.map((row) => Object.values(row).join(',')),
    ]);
    const [trend] = body.temperature as {
      product: string;
      slopeMlPerDegree: number;
      lower: number | null;
      upper: number | null;
      classes: Record<string, number | null>[];
    }[];
    expect(trend!.classes.length).toBeGreaterThan(1);
    expect(await rowsOf('product-temperature')).toEqual([
      'product,fromC,cars,p25Ml,medianMl,p75Ml,slopeMlPerDegree,lower,upper',
      ...trend!.classes.map((one) =>
        [
          trend!.product,
          ...Object.values(one),
          trend!.slopeMlPerDegree,
          trend!.lower,
          trend!.upper,
        ].join(','),
      ),
    ]);
  });
});
