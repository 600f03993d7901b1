import { TestApp, type Answer } from '../support/app';
import { jobOf, quotedCars, recountQuote, type QuotedCar } from '../support/quoted-cars';
import { BRANCHES, makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

const TODAY = '2026-02-02';

const OLD = ['Tessock', 'hatchback', '2009-05'] as const;
const MIDDLE = ['Brink', 'estate', '2019-03'] as const;
const YOUNG = ['Lodd', 'suv', '2022-01'] as const;
/** As old three years ago as those of 2009 are now. */
const OLD_THEN = ['Tessock', 'hatchback', '2006-05'] as const;
const cars: QuotedCar[] = [
  ...quotedCars(30, 'AAA', OLD),
  // The day three years back is out, the one after it in.
  ...quotedCars(1, 'AAA', OLD_THEN, '2023-02-03'),
  ...quotedCars(1, 'AAA', OLD_THEN, '2023-02-02'),
  ...BRANCHES.flatMap(([branch]) => quotedCars(5, branch, MIDDLE)),
  ...['AAA', 'BBB', 'CCC'].flatMap((branch) => quotedCars(12, branch, YOUNG)),
];

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start({ now: `${TODAY}T06:30:00Z` });
  network = await makeSmallNetwork(app);
  await put('/api/products/UW1', { name: 'Underbody wax', kind: 'underbody_wax' });
  await put('/api/consumables/trim_clip/costs/2015-01-01', { unitCostCents: 43 });
  for (const [branch] of BRANCHES) {
    const jobs = cars
      .filter((car) => car.branch === branch)
      .map((car, index) => ({ jobRef: `q-${index}`, ...jobOf(car) }));
    // One without a minute of labour is in no set.
    jobs.push({
      jobRef: 'no-minutes',
      ...validJob({ actual: { stages: {} }, findings: [] }),
    });
    const path = `/api/branches/${branch}/jobs/batch`;
    const answer = await app.call('post', path, { token: network.office, body: { jobs } });
    expect(answer.body.results.filter(({ status }: never) => status !== 'created')).toEqual([]);
  }
}, 60_000);
afterAll(() => app.stop());

async function put(path: string, body: unknown): Promise<void> {
  const answer = await app.call('put', path, { token: network.office, body });
  expect([path, answer.status < 300]).toEqual([path, true]);
}

const ASKED: Record<string, string> = {
  ...{ make: ' VELDER', model: 'tessock', firstRegistered: '2009-05', bodyType: 'hatchback' },
  ...{ package: 'full', branch: 'AAA' },
};
function quote(over: Record<string, string> = {}, token = network.office): Promise<Answer> {
  const query = new URLSearchParams({ ...ASKED, ...over });
  return app.call('get', `/api/quote?${query.toString()}`, { token });
}

const recent = (car: QuotedCar): boolean => car.completedOn > '2023-02-02';

describe('GET /api/quote, by the nearest set (rule 48)', () => {
  const of =
    (branch: string | null, model: string | null, year: string) =>
    (car: QuotedCar): boolean =>
      (branch === null || car.branch === branch) &&
      (model === null || car.model === model) &&
      car.firstRegistered.startsWith(year);

  it.each([
    ['its own model and age', {}, 'model_age', 'branch', of('AAA', 'Tessock', '200')],
    ['its own body type and age', { model: 'x' }, 'body_age', 'branch', of('AAA', null, '200')],
    [
      'its own age',
      { model: 'x', bodyType: 'van' },
      ...(['age', 'branch', of('AAA', null, '200')] as const),
    ],
    [
      'the network’s model and age',
      { model: 'Brink', bodyType: 'van', firstRegistered: '2017-06' },
      ...(['model_age', 'network', of(null, 'Brink', '2019')] as const),
    ],
    [
      'the network’s body type and age',
      { model: 'x', bodyType: 'estate', firstRegistered: '2019-03' },
      ...(['body_age', 'network', of(null, null, '2019')] as const),
    ],
    [
      'the network’s age',
      { model: 'x', bodyType: 'van', firstRegistered: '2019-03' },
      ...(['age', 'network', of(null, null, '2019')] as const),
    ],
    [
      'its own package, where only two other branches have the age',
      { model: 'Lodd', bodyType: 'suv', firstRegistered: '2022-01' },
      ...(['package', 'branch', of('AAA', null, '20')] as const),
    ],
    [
      'the network’s package, where the branch has too few',
      { branch: 'HHH', model: 'Lodd', bodyType: 'suv', firstRegistered: '2022-01' },
      ...(['package', 'network', of(null, null, '20')] as const),
    ],
  ] as const)('given %s, agrees with a recount of it', async (_, asked, kind, source, belongs) => {
    const { status, body } = await quote({ ...asked, marginShare: '.3' });
    expect(status).toBe(200);
    const set = cars.filter((car) => recent(car) && belongs(car));
    const { rot, openedUp, products, cost, ...rest } = recountQuote(set, 0.3);
    expect(body.basis).toEqual({ kind, source, cars: set.length });
    expect(body).toMatchObject({ on: TODAY, ...rest });
    expect(body.cost).toEqual(cost);
    for (const [told, counted] of [
      [body.rot, rot],
      [body.openedUp, openedUp],
      [body.products[0], (products as object[])[0]],
    ]) {
      for (const [field, value] of Object.entries(counted as object)) {
        if (typeof value === 'number') expect(told[field]).toBeCloseTo(value, 9);
        else expect(told[field]).toBe(value);
      }
    }
  });

  it('given a package without cars, answers with none and no number', async () => {
    const { status, body } = await quote({ package: 'cavity' });
    expect(status).toBe(200);
    expect(body).toMatchObject({
      ageBand: '15-19',
      basis: { kind: 'none', source: null, cars: 0 },
      rot: { cars: 0, withRot: 0, share: null, lower: null, upper: null },
      openedUp: { worked: 0, holed: 0, share: null },
      ...{ products: [], priceCents: null, noPrice: 'no_cars' },
      cost: { feeRate: 0.05, labourCents: null, prices: [], missingCosts: [] },
    });
    const minutes = [body.labour, ...body.labour.stages];
    expect(body.labour.stages).toHaveLength(7);
    for (const each of minutes) expect([each.p50Minutes, each.p80Minutes]).toEqual([null, null]);
  });

  it('given whoever may ask, is the same answer', async () => {
    const asked = { marginShare: '0.3', model: 'Brink', firstRegistered: '2019-03' };
    const office = await quote(asked);
    for (const token of [network.lead, network.manager]) {
      expect((await quote(asked, token)).text).toBe(office.text);
    }
    expect(office.body.basis).toMatchObject({ source: 'network' });
  });

  it('given a branch out of scope, answers as for one that does not exist (rule 22)', async () => {
    for (const marginShare of ['0', '0.2']) {
      const asked = { marginShare };
      const outside = await quote({ ...asked, branch: 'BBB' }, network.manager);
      const none = await quote({ ...asked, branch: 'ZZZ' }, network.manager);
      expect(outside.status).toBe(200);
      expect(outside.text).toBe(none.text);
      expect(outside.body).toMatchObject({
        basis: { kind: 'none', source: null, cars: 0 },
        ...{ priceCents: null, noPrice: 'no_cars', cost: { feeRate: null } },
      });
    }
  });
});

describe('GET /api/quote, its price (rule 49)', () => {
  it('given no target, a network’s, a branch’s and one that leaves nothing, says so', async () => {
    expect((await quote()).body).toMatchObject({ priceCents: null, noPrice: 'no_target' });
    const { body: asked } = await quote({ marginShare: '0.3' });
    await put('/api/network', {
      ...{ name: 'Small', currency: 'EUR', feeRate: 0.05, targetMarginShare: 0.25 },
    });
    const { body: ofNetwork } = await quote();
    expect(ofNetwork.cost).toMatchObject({ marginShare: 0.25, marginFrom: 'network' });
    await put('/api/branches/AAA', { ...BRANCH, targetMarginShare: 0.3 });
    const { body: ofBranch } = await quote();
    expect(ofBranch.cost).toMatchObject({ marginShare: 0.3, marginFrom: 'branch' });
    expect(ofBranch.priceCents).toBe(asked.priceCents);
    expect(ofNetwork.priceCents).toBeLessThan(asked.priceCents);
    await put('/api/branches/AAA', { ...BRANCH, targetMarginShare: 0.95 });
    expect((await quote()).body).toMatchObject({
      ...{ priceCents: null, noPrice: 'target_too_high', cost: { marginShare: 0.95 } },
    });
    await put('/api/branches/AAA', { ...BRANCH, targetMarginShare: 0.3 });
  });

  it('given a recorder, has the price and nothing that it was made from (rule 24)', async () => {
    const { body } = await quote({}, network.recorder);
    const { body: seen } = await quote({}, network.manager);
    expect('cost' in body).toBe(false);
    expect(body.priceCents).toBe(seen.priceCents);
    expect(body.priceCents).toBeGreaterThan(0);
    const refused = await quote({ marginShare: '0.3' }, network.recorder);
    expect(refused.status).toBe(403);
  });

  it('given a product that costs nothing known today, has no price and names it (rule 11)', async () => {
    const [, ...others] = cars.filter((car) => car.branch === 'AAA' && car.model === 'Tessock');
    const body = jobOf({ ...others[0]!, products: [{ product: 'UW1', ml: 10 }] });
    await put('/api/branches/AAA/jobs/unknown-cost', body);
    const answer = (await quote({ marginShare: '0.3' })).body;
    expect(answer).toMatchObject({ priceCents: null, noPrice: 'no_cost' });
    expect(answer.cost).toMatchObject({
      ...{ productCents: null, prices: [], missingCosts: [{ kind: 'product', code: 'UW1' }] },
    });
    expect(answer.cost.labourCents).toBeGreaterThan(0);
    expect(answer.products.map(({ product }: { product: string }) => product)).toEqual([
      ...['CW1', 'UW1'],
    ]);
    await app.call('delete', '/api/branches/AAA/jobs/unknown-cost', { token: network.manager });
  });

  it.each([
    [{ package: 'fully' }, '/query/package'],
    [{ firstRegistered: '2026-03' }, '/query/firstRegistered'],
    [{ marginShare: '0.95' }, '/query/marginShare'],
    [{ marginShare: '1' }, '/query/marginShare'],
    [{ marginShare: '0.1234567' }, '/query/marginShare'],
    [{ make: ' ' }, '/query/make'],
    [{ bodyType: 'boat' }, '/query/bodyType'],
  ])('given %j, answers 422 and names it', async (asked, path) => {
    const { status, body } = await quote(asked);
    expect(status).toBe(422);
    expect(body.problems).toEqual([expect.objectContaining({ path })]);
  });

  it('given a margin just below what the fee leaves, still has a price', async () => {
    const { body } = await quote({ marginShare: '0.949999' });
    expect(body.noPrice).toBeNull();
    expect(body.priceCents).toBeGreaterThan(1e9);
  });
});

const BRANCH = {
  ...{ name: 'Branch AAA', region: 'COAST', timeZone: 'Europe/Berlin', openedOn: '2015-01-01' },
};
