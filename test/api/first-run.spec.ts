import { TestApp } from '../support/app';
import { validJob } from '../support/small-network';

jest.setTimeout(60_000);

let app: TestApp;
beforeAll(async () => {
  app = await TestApp.start();
});
afterAll(() => app.stop());

describe('An empty network with one person of head office', () => {
  it('given every call that a first sitting makes in its order, leads from nothing to the first job', async () => {
    const token = await app.signIn('office@network.example', 'head_office');
    const get = (path: string) => app.call('get', path, { token });
    for (const path of [
      ...['/api/network', '/api/catalogue', '/api/costs', '/api/people', '/api/audit', '/api/jobs'],
      ...[
        '/api/analytics/margin',
        '/api/analytics/overrun',
        '/api/analytics/rot',
        '/api/come-back',
      ],
      ...['/api/analytics/products', '/api/analytics/product-need'],
    ]) {
      expect([path, (await get(path)).status]).toEqual([path, 200]);
    }
    expect((await get('/api/catalogue')).body.today).toBe('2026-02-02');
    expect((await get('/api/network')).body.feeRate).toBeNull();
    expect((await get('/api/analytics/overrun')).body.overall).toMatchObject({
      cars: 0,
      ratio: null,
    });

    const branch = {
      name: 'Harbour',
      region: 'COAST',
      timeZone: 'Europe/Berlin',
      openedOn: '2026-01-01',
    };
    const manager = {
      email: 'm@network.example',
      name: 'M',
      role: 'site_manager',
      branches: ['HAR'],
    };
    const norms = [{ product: 'CW1', ml: 4000 }];
    for (const [method, path, body] of [
      ['put', '/api/network', { name: 'New', currency: 'EUR', feeRate: 0.05 }],
      ['put', '/api/regions/COAST', { name: 'Coast' }],
      ['put', '/api/branches/HAR', branch],
      ['put', '/api/branches/HAR/rates/2026-01-01', { hourlyCostCents: 3600 }],
      ['put', '/api/packages/full', { name: 'Full', warrantyMonths: 36 }],
      ['put', '/api/products/CW1', { name: 'Cavity wax', kind: 'cavity_wax' }],
      ['put', '/api/products/CW1/costs/2026-01-01', { costPerLitreCents: 1200 }],
      ['put', '/api/packages/full/norms/hatchback', { norms }],
      ['post', '/api/people', manager],
      ['put', '/api/branches/HAR/jobs/1', validJob()],
    ] as const) {
      const answer = await app.call(method, path, { token, body });
      expect([path, answer.status]).toEqual([path, 201]);
    }
    const { weeks } = (await get('/api/analytics/margin')).body as {
      weeks: { jobs: number; marginCents: number }[];
    };
    const [week] = weeks.filter(({ jobs }) => jobs > 0);
    const { money } = (await get('/api/branches/HAR/jobs/1')).body;
    expect(week?.marginCents).toBe(money.marginCents);
  });
});
