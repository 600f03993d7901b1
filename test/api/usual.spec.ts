import { TestApp, type Answer } from '../support/app';
import { jobOf, quotedCars, type QuotedCar } from '../support/quoted-cars';
import { recountUsual } from '../support/recount-usual';
import { BRANCHES, makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

const TODAY = '2026-02-02';
const OLD = ['Tessock', 'hatchback', '2009-05'] as const;
const MIDDLE = ['Brink', 'estate', '2019-03'] as const;
const YOUNG = ['Lodd', 'suv', '2022-01'] as const;

const cars: QuotedCar[] = [
  ...quotedCars(34, 'AAA', OLD),
  ...BRANCHES.flatMap(([branch]) => quotedCars(5, branch, MIDDLE)),
  ...['AAA', 'BBB', 'CCC'].flatMap((branch) => quotedCars(12, branch, YOUNG)),
];
/** No repair on most cars, two lines of one product on some, a product on four. */
const AAA_OLD = cars.filter(({ branch, model }) => branch === 'AAA' && model === 'Tessock');
AAA_OLD.forEach((car, index) => {
  if (index % 3 > 0) car.minutes['repair'] = 0;
  if (index % 4 === 0) car.products = [...car.products, { product: 'CW1', ml: 100 + index }];
  if (index < 4) car.products = [...car.products, { product: 'UW1', ml: 900 }];
  if (index % 5 === 0) car.consumables.push({ kind: 'trim_clip', quantity: 2 });
});
/** One other branch alone uses a product, on many cars. */
for (const car of cars.filter(({ branch, model }) => branch === 'CCC' && model === 'Brink')) {
  car.products = [...car.products, { product: 'UW1', ml: 700 }];
  car.consumables.push({ kind: 'other', quantity: 3 });
}

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start({ now: `${TODAY}T06:30:00Z` });
  network = await makeSmallNetwork(app);
  const token = network.office;
  await app.call('put', '/api/products/UW1', {
    token,
    body: { name: 'Underbody wax', kind: 'underbody_wax' },
  });
  for (const [branch] of BRANCHES) {
    const jobs = cars
      .filter((car) => car.branch === branch)
      .map((car, index) => ({ jobRef: `u-${index}`, ...jobOf(car) }));
    const path = `/api/branches/${branch}/jobs/batch`;
    const answer = await app.call('post', path, { token, body: { jobs } });
    expect(answer.body.results.filter(({ status }: never) => status !== 'created')).toEqual([]);
  }
}, 60_000);
afterAll(() => app.stop());

const ASKED: Record<string, string> = {
  ...{ make: ' VELDER', model: 'tessock', firstRegistered: '2009-05', bodyType: 'hatchback' },
  package: 'full',
};
function usual(
  over: Record<string, string> = {},
  token = network.recorder,
  branch = 'AAA',
): Promise<Answer> {
  const query = new URLSearchParams({ ...ASKED, ...over });
  return app.call('get', `/api/branches/${branch}/usual?${query.toString()}`, { token });
}

describe('GET …/usual', () => {
  it('given enough such cars at the branch, tells what they took, counted afresh', async () => {
    const { status, body } = await usual();
    expect(status).toBe(200);
    expect(body.basis).toEqual({ kind: 'model_age', source: 'branch', cars: AAA_OLD.length });
    const { basis: _basis, lastTime: _last, ...figures } = body;
    expect(figures).toEqual(recountUsual(AAA_OLD));
    // Only four cars list it: it is named, and nothing is said of it (rule 13).
    expect(body.products[1]).toEqual({ product: 'UW1', low: null, usual: null, high: null });
  });

  it('given too few at the branch, tells what the network’s took, and of nothing that too few others have', async () => {
    const { body } = await usual({
      model: 'Brink',
      bodyType: 'estate',
      firstRegistered: '2019-03',
    });
    const set = cars.filter(({ model }) => model === 'Brink');
    expect(body.basis).toEqual({ kind: 'model_age', source: 'network', cars: set.length });
    const recounted = recountUsual(set) as Record<string, { product?: string; kind?: string }[]>;
    expect(body.stages).toEqual(recounted['stages']);
    expect(body.total).toEqual(recounted['total']);
    // What one branch alone uses would be that branch's figure (rule 21).
    expect(recounted['products']?.map(({ product }) => product)).toEqual(['CW1', 'UW1']);
    expect(body.products).toEqual(
      recounted['products']?.filter(({ product }) => product === 'CW1'),
    );
    expect(body.consumables).toEqual(
      recounted['consumables']?.filter(({ kind }) => kind !== 'other'),
    );
  });

  it('given the same car, answers whoever may ask alike, and from the set a quote is made from', async () => {
    const questions: Record<string, string>[] = [
      {},
      { model: 'Brink', firstRegistered: '2019-03' },
      { model: 'x' },
    ];
    for (const asked of questions) {
      const answers = [network.recorder, network.manager, network.office].map(async (token) =>
        JSON.stringify((await usual(asked, token)).body),
      );
      expect(new Set(await Promise.all(answers)).size).toBe(1);
      const query = new URLSearchParams({ ...ASKED, ...asked, branch: 'AAA' });
      const quote = await app.call('get', `/api/quote?${query.toString()}`, {
        token: network.recorder,
      });
      expect((await usual(asked)).body.basis).toEqual(quote.body.basis);
    }
  });

  it('given no cars with the package at all, answers with nothing known', async () => {
    const { status, body } = await usual({ package: 'cavity' });
    expect(status).toBe(200);
    expect(body).toMatchObject({
      basis: { kind: 'none', source: null, cars: 0 },
      total: { low: null, usual: null, high: null },
      ...{ products: [], consumables: [], lastTime: null },
    });
    expect(body.stages).toHaveLength(7);
  });

  it('given jobs of the branch, tells the newest, one on this body type first, without money but the price quoted', async () => {
    const put = (ref: string, over: object): Promise<Answer> =>
      app.call('put', `/api/branches/AAA/jobs/${ref}`, {
        token: network.manager,
        body: validJob({ findings: [], actual: { stages: {} }, ...over }),
      });
    const van = { ...(validJob()['vehicle'] as object), bodyType: 'van' };
    await put('last-van', { vehicle: van, completedOn: '2026-02-01', invoice: null });
    await put('last-hatchback', {
      completedOn: '2026-01-30',
      products: [{ product: 'CW1', ml: 4444 }],
      invoice: null,
    });
    const { body, text } = await usual();
    expect(body.lastTime).toEqual({
      completedOn: '2026-01-30',
      products: [{ product: 'CW1', ml: 4444 }],
      estimate: {
        priceCents: 78000,
        stages: { strip: 90, clean: 75, dry: 20, repair: 0, mask: 40, apply: 120, refit: 60 },
      },
      temperatureC: 14,
      humidityPct: 61,
    });
    expect(text.match(/Cents/g)).toHaveLength(1);
    expect((await usual({ bodyType: 'suv' })).body.lastTime.completedOn).toBe('2026-01-20');
    expect((await usual({ bodyType: 'pickup' })).body.lastTime.completedOn).toBe('2026-02-01');
  });

  it('given what it cannot answer, names it', async () => {
    const answer = await usual({
      package: 'nothing',
      firstRegistered: '2026-09',
      bodyType: 'ship',
    });
    expect(answer.status).toBe(422);
    const paths = answer.body.problems.map(({ path }: { path: string }) => path);
    expect(paths.sort()).toEqual(['/query/bodyType', '/query/package']);
    const late = await usual({ firstRegistered: '2026-09' });
    expect(late.body.problems[0].path).toBe('/query/firstRegistered');
  });

  it('given a lead, a key or another branch, has no answer', async () => {
    expect((await usual({}, network.lead)).status).toBe(403);
    expect((await usual({}, network.keys['AAA'])).status).toBe(403);
    expect((await usual({}, network.recorder, 'BBB')).status).toBe(404);
  });
});
