import { recomputeAll } from '#db/recompute';
import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  const path = '/api/branches/AAA/jobs/a';
  await app.call('put', path, { token: network.manager, body: validJob() });
});
afterAll(() => app.stop());

const put = (path: string, body: unknown, token = network.office): Promise<Answer> =>
  app.call('put', path, { token, body });
const get = async (path: string, token = network.office): Promise<Answer['body']> =>
  (await app.call('get', path, { token })).body;
const paths = (answer: Answer): string[] =>
  (answer.body.problems as { path: string }[]).map(({ path }) => path).sort();

const BRANCH = { name: 'New', region: 'HILLS', timeZone: 'Europe/Lisbon', openedOn: '2024-01-01' };
const CLIMATE = { temperatureC: 9.5, humidityPct: 81, so2Deposition: 3, chlorideDeposition: 60 };

describe('Set-up calls (rule 66)', () => {
  it.each<[string, unknown]>([
    ['/api/regions/ISLES', { name: 'Isles' }],
    ['/api/branches/NEW1', BRANCH],
    ['/api/branches/AAA/rates/2026-03-01', { hourlyCostCents: 4000 }],
    ['/api/products/ZZ1', { name: 'Primer', kind: 'zinc_primer' }],
    ['/api/products/CW1/costs/2026-03-01', { costPerLitreCents: 1500 }],
    ['/api/consumables/other/costs/2026-03-01', { unitCostCents: 12 }],
    ['/api/packages/top_up', { name: 'Top-up', warrantyMonths: 12 }],
    ['/api/packages/top_up/norms/suv', { norms: [{ product: 'CW1', ml: 500 }] }],
    ['/api/network/fees/2026-03-01', { feeRate: 0.06 }],
  ])('given PUT %s, answers 201 first and 200 after', async (path, body) => {
    const first = await put(path, body);
    expect([first.status, first.text.length > 2]).toEqual([201, true]);
    const second = await put(path, body);
    expect(second.status).toBe(200);
  });

  it('given the first PUT of /api/network on an empty one, answers 201', async () => {
    const empty = await TestApp.start();
    try {
      const token = await empty.signIn('first@network.example', 'head_office');
      const body = { name: 'First', currency: 'EUR', feeRate: 0 };
      // At once, so that both find it empty when they arrive.
      const both = [1, 2].map(() => empty.call('put', '/api/network', { token, body }));
      expect((await Promise.all(both)).map(({ status }) => status)).toEqual([201, 200]);
    } finally {
      await empty.stop();
    }
  });

  it('given PUT /api/network again, answers 200 with what counts from then on', async () => {
    const body = { name: 'Small', currency: 'EUR', feeRate: 0.05, targetMarginShare: 0.35 };
    const answer = await put('/api/network', body);
    expect([answer.status, answer.body]).toEqual([200, { ...body, claimLimitCents: null }]);
  });

  it.each(['/api/regions/COAST', '/api/branches/AAA'])(
    'given DELETE %s, there is no such call',
    async (path) => {
      expect((await app.call('delete', path, { token: network.office })).status).toBe(404);
    },
  );

  it.each(['manager', 'lead', 'recorder'] as const)(
    'given a %s, refuses all of it',
    async (role) => {
      const token = network[role];
      for (const path of [
        '/api/regions/COAST',
        '/api/branches/AAA',
        '/api/branches/ZZZ/rates/2026-01-01',
      ]) {
        expect((await put(path, {}, token)).status).toBe(403);
      }
    },
  );
});

describe('Set-up that is refused', () => {
  it.each<[string, Record<string, unknown>, string[]]>([
    ['/api/regions/coast', { name: 'x' }, ['/code']],
    ['/api/regions/C', { name: 'x' }, ['/code']],
    ['/api/regions/COAST', { name: ' ' }, ['/name']],
    [
      '/api/regions/COAST',
      { name: 'x', climate: { temperatureC: 9 } },
      ['/climate/chlorideDeposition', '/climate/humidityPct', '/climate/so2Deposition'],
    ],
    [
      '/api/regions/COAST',
      { name: 'x', climate: { ...CLIMATE, humidityPct: 101 } },
      ['/climate/humidityPct'],
    ],
    ['/api/branches/AAA', { ...BRANCH, timeZone: 'Mars/Olympus' }, ['/timeZone']],
    ['/api/branches/AAA', { ...BRANCH, region: 'NOWHERE' }, ['/region']],
    ['/api/branches/AAA', { ...BRANCH, closedOn: '2023-12-31' }, ['/closedOn']],
    ['/api/branches/AAA', { ...BRANCH, targetMarginShare: 1 }, ['/targetMarginShare']],
    [
      '/api/branches/AAA',
      { region: 'NOWHERE', timeZone: 7, closedOn: '2020-01-01', openedOn: '2021-01-01', x: 1 },
      ['/closedOn', '/name', '/region', '/timeZone', '/x'],
    ],
    ['/api/branches/AAA/rates/2026-02-30', { hourlyCostCents: 1 }, ['/from']],
    ['/api/branches/AAA/rates/2026-02-01', { hourlyCostCents: 1.5 }, ['/hourlyCostCents']],
    ['/api/branches/AAA/rates/2026-02-01', { hourlyCostCents: -1 }, ['/hourlyCostCents']],
    ['/api/products/CW1', { name: 'x', kind: 'paint' }, ['/kind']],
    ['/api/products/CW1/costs/2026-02-01', {}, ['/costPerLitreCents']],
    ['/api/consumables/rivet/costs/2026-02-01', { unitCostCents: 1 }, ['/kind']],
    ['/api/packages/Full', { name: 'x', warrantyMonths: 1 }, ['/code']],
    ['/api/packages/full', { name: 'x', warrantyMonths: -1 }, ['/warrantyMonths']],
    ['/api/packages/full/norms/coupe', { norms: [] }, ['/bodyType']],
    [
      '/api/packages/full/norms/suv',
      { norms: [{ product: 'ZZZ', ml: -1 }] },
      ['/norms/0/ml', '/norms/0/product'],
    ],
    [
      '/api/packages/full/norms/suv',
      {
        norms: [
          { product: 'CW1', ml: 1 },
          { product: 'CW1', ml: 1 },
        ],
      },
      ['/norms/1/product'],
    ],
    [
      '/api/network',
      { name: 'x', currency: 'euro', feeRate: 0.0000001 },
      ['/currency', '/feeRate'],
    ],
    ['/api/network', { name: 'x', currency: 'EUR', feeRate: 1.01 }, ['/feeRate']],
    ['/api/network', { name: 'x', currency: 'EUR' }, ['/feeRate']],
    ['/api/network/fees/2026-02-01', { feeRate: '0.05' }, ['/feeRate']],
  ])('given PUT %s %j, names %j and changes nothing', async (path, body, expected) => {
    const before = await get('/api/catalogue');
    const costs = await get('/api/costs');
    const answer = await put(path, body);
    expect([answer.status, paths(answer)]).toEqual([422, expected]);
    expect(await get('/api/catalogue')).toEqual(before);
    expect(await get('/api/costs')).toEqual(costs);
  });
});

describe('Costs through the API (rules 10, 11, 74)', () => {
  const margin = async (): Promise<Record<string, number>> =>
    (await get('/api/branches/AAA/jobs/a')).money as Record<string, number>;

  it('given a change that touches a job, says how many and answers only after the switch', async () => {
    const answer = await put('/api/branches/AAA/rates/2026-01-28', { hourlyCostCents: 6000 });
    expect(answer.body).toEqual({ from: '2026-01-28', restatedJobs: 1 });
    expect((await margin())['labourCents']).toBe(73_500);
    const week = await get('/api/analytics/margin?from=2026-01-26&to=2026-02-01&branch=AAA');
    expect(week.weeks[0].labourCents).toBe(73_500);
    expect(recomputeAll(app.kit.store)).toEqual([]);
  });

  it('given each kind of cost, restates and stays equal to a count from the beginning', async () => {
    const costs: [string, unknown, number][] = [
      ['/api/products/CW1/costs/2026-01-01', { costPerLitreCents: 1000 }, 1],
      ['/api/network/fees/2026-01-01', { feeRate: 0.1 }, 1],
      ['/api/packages/full/norms/hatchback', { norms: [{ product: 'CW1', ml: 3000 }] }, 1],
      ['/api/packages/full/norms/hatchback', { norms: [] }, 1],
      ['/api/consumables/trim_clip/costs/2026-01-01', { unitCostCents: 7 }, 0],
    ];
    for (const [path, body, restatedJobs] of costs) {
      expect((await put(path, body)).body.restatedJobs).toBe(restatedJobs);
      expect(recomputeAll(app.kit.store)).toEqual([]);
    }
    expect(await margin()).toMatchObject({ feeCents: 8700, productCents: 4200, bridge: null });
  });

  it('given a fee with six decimals, counts the fee of a job exactly', async () => {
    await put('/api/network/fees/2026-01-15', { feeRate: 0.123456 });
    // 87,000 × 0.123456 = 10,740.672
    expect((await margin())['feeCents']).toBe(10_741);
  });

  it('given jobs sent while costs change, loses none and mixes none', async () => {
    const changes = [4100, 4200, 4300].map((hourlyCostCents) =>
      put('/api/branches/AAA/rates/2026-01-28', { hourlyCostCents }),
    );
    const jobs = Array.from({ length: 30 }, (_, n) =>
      put(`/api/branches/AAA/jobs/while-${n}`, validJob(), network.keys['AAA']),
    );
    const answers = await Promise.all([...changes, ...jobs]);
    expect(answers.filter(({ status }) => status >= 300)).toEqual([]);
    expect(recomputeAll(app.kit.store)).toEqual([]);
    expect(await get('/api/jobs?q=while')).toMatchObject({ jobs: 30 });
  });
});

describe('GET of the catalogue and of costs (rule 79)', () => {
  it('given each role, shows the regions and branches of its scope and the whole catalogue', async () => {
    const seen = async (token: string): Promise<unknown> => {
      const { regions, branches, packages } = await get('/api/catalogue', token);
      const codes = (rows: { code: string }[]): string[] => rows.map(({ code }) => code);
      return [codes(regions), codes(branches), codes(packages)];
    };
    const packages = ['cavity', 'full', 'top_up'];
    expect(await seen(network.recorder)).toEqual([['COAST'], ['AAA'], packages]);
    expect(await seen(network.manager)).toEqual([['COAST'], ['AAA'], packages]);
    expect(await seen(network.lead)).toEqual([['COAST'], ['AAA', 'BBB'], packages]);
  });

  it('given a recorder, leaves out the limit above which head office decides a claim; others read it', async () => {
    const read = async (token: string): Promise<object> =>
      ((await get('/api/catalogue', token)) as { network: object }).network;
    expect(await read(network.recorder)).not.toHaveProperty('claimLimitCents');
    expect(await read(network.manager)).toHaveProperty('claimLimitCents');
  });

  it('given a region without a branch, shows it to head office, who may put the first there, and to nobody else', async () => {
    await put('/api/regions/EMPTY', { name: 'Empty' });
    const seen = async (token: string): Promise<string[]> => {
      const { regions } = await get('/api/catalogue', token);
      return (regions as { code: string }[]).map(({ code }) => code);
    };
    expect(await seen(network.office)).toContain('EMPTY');
    expect(await seen(network.lead)).toEqual(['COAST']);
  });

  it('given a recorder, shows no costs; given a manager, only the hourly cost of the own branch', async () => {
    expect((await app.call('get', '/api/costs', { token: network.recorder })).status).toBe(403);
    const { rates } = await get('/api/costs', network.manager);
    expect(new Set(rates.map(({ branch }: { branch: string }) => branch))).toEqual(
      new Set(['AAA']),
    );
  });
});

describe('The audit trail of set-up', () => {
  it('given a change, keeps who made it, from where and what was there before', async () => {
    await put('/api/packages/cavity', { name: 'Cavities', warrantyMonths: 30 });
    const last = app.kit.store.unscoped
      .prepare('select actor, action, subject, address, detail from audit_events order by id desc')
      .get() as Record<string, string>;
    expect(last).toMatchObject({
      actor: 'office@network.example',
      action: 'package.set',
      subject: '/packages/cavity',
    });
    expect(last['address']).toMatch(/127\.0\.0\.1|::1/);
    expect(JSON.parse(last['detail']!)).toEqual({
      before: { code: 'cavity', name: 'Cavity', warrantyMonths: 24 },
      after: { code: 'cavity', name: 'Cavities', warrantyMonths: 30 },
    });
  });
});
