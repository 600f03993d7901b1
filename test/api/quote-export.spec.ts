import { parse } from 'csv-parse/sync';
import { TestApp } from '../support/app';
import { jobOf, quotedCars } from '../support/quoted-cars';
import { makeSmallNetwork, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
  const jobs = quotedCars(31, 'AAA', ['Tessock', 'hatchback', '2009-05']).map((car, index) => {
    return { jobRef: `q-${index}`, ...jobOf(car) };
  });
  for (const [path, body] of [
    ['products/UW1', { name: 'Underbody wax', kind: 'underbody_wax' }],
    ['products/UW1/costs/2015-01-01', { costPerLitreCents: 900 }],
    ['consumables/trim_clip/costs/2015-01-01', { unitCostCents: 43 }],
  ] as const) {
    const put = await app.call('put', `/api/${path}`, { token: network.office, body });
    expect([path, put.status]).toEqual([path, 201]);
  }
  const path = '/api/branches/AAA/jobs/batch';
  const sent = await app.call('post', path, { token: network.office, body: { jobs } });
  expect(sent.body.counts).toMatchObject({ created: 31 });
}, 60_000);
afterAll(() => app.stop());

const QUERY =
  'make=Velder&model=Tessock&firstRegistered=2009-05&bodyType=hatchback&package=full&branch=AAA&marginShare=0.3';
const exported = (token: string, query = QUERY) =>
  app.call('get', `/api/exports/quote.csv?${query}`, { token });

describe('GET /api/exports/quote.csv', () => {
  it('given a quote, writes what its pictures show, each row with the cars behind it', async () => {
    const { body } = await app.call('get', `/api/quote?${QUERY}`, { token: network.manager });
    const { text } = await exported(network.manager);
    const rows = parse<Record<string, string>>(text, { columns: true });
    expect(new Set(rows.map(({ kind, source, cars }) => `${kind} ${source} ${cars}`))).toEqual(
      new Set(['model_age branch 31']),
    );
    const of = (part: string) => rows.filter((row) => row['part'] === part);
    expect(
      of('labour').map(({ key, p50Minutes, p80Minutes }) => [key, p50Minutes, p80Minutes]),
    ).toEqual(
      [...body.labour.stages, { stage: 'all', ...body.labour }].map(
        ({ stage, p50Minutes, p80Minutes }: Record<string, unknown>) => [
          stage,
          String(p50Minutes),
          String(p80Minutes),
        ],
      ),
    );
    expect(of('chance')[0]).toMatchObject({ key: 'rot', share: String(body.rot.share) });
    expect(of('product').map(({ key, ml }) => [key, ml])).toEqual(
      body.products.map(({ product, ml }: Record<string, unknown>) => [product, String(ml)]),
    );
    expect(body.priceCents).toBeGreaterThan(0);
    expect(of('price').map(({ marginShare, priceCents }) => [marginShare, priceCents])).toEqual(
      [{ marginShare: 0.3, priceCents: body.priceCents }, ...body.cost.prices].map(
        (price: Record<string, unknown>) => [
          String(price['marginShare']),
          String(price['priceCents']),
        ],
      ),
    );
  });

  it('given a recorder 403, an unknown package and a margin that leaves nothing 422', async () => {
    expect((await exported(network.recorder)).status).toBe(403);
    const bad = await exported(
      network.manager,
      QUERY.replace('package=full', 'package=none').replace('0.3', '0.96'),
    );
    expect([bad.status, bad.body.problems[0].path]).toEqual([422, '/query/package']);
    const greedy = await exported(network.manager, QUERY.replace('0.3', '0.96'));
    expect([greedy.status, greedy.body.problems[0].path]).toEqual([422, '/query/marginShare']);
  });
});
