import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
  for (const branch of ['AAA', 'BBB']) {
    // One car in each of the five weeks before this one.
    const days = ['2025-12-31', '2026-01-07', '2026-01-14', '2026-01-21', '2026-01-28'];
    const jobs = days.map((completedOn, index) => ({
      jobRef: `n-${index}`,
      ...validJob({
        ...{ completedOn, bookedOn: undefined, startedOn: undefined, invoice: null },
        products: [{ product: 'CW1', ml: 4000 }],
      }),
    }));
    const token = network.keys[branch];
    const path = `/api/branches/${branch}`;
    const answer = await app.call('post', `${path}/jobs/batch`, { token, body: { jobs } });
    expect(answer.status).toBe(200);
    for (const ref of ['b-1', 'b-2']) {
      const body = { expectedOn: '2026-02-10', package: 'full', bodyType: 'hatchback' };
      expect((await app.call('put', `${path}/bookings/${ref}`, { token, body })).status).toBe(201);
    }
  }
}, 60_000);
afterAll(() => app.stop());

const need = (query = '', token = network.lead) =>
  app.call('get', `/api/analytics/product-need${query}`, { token });

describe('GET /api/analytics/product-need', () => {
  it('given diaries and usual cars, tells what eight weeks are expected to take', async () => {
    const { status, body } = await need();
    expect(status).toBe(200);
    expect(body).toMatchObject({
      scope: { branches: ['AAA', 'BBB'] },
      coming: { from: '2026-02-09', to: '2026-04-05' },
      ...{ jobs: 10, carsWithoutUse: 0, missingCosts: [] },
    });
    expect(body.weeks[0]).toEqual({ week: '2026-W07', booked: 4, usual: 0 });
    expect(body.weeks.slice(1).map((week: { usual: number }) => week.usual)).toEqual(
      Array(7).fill(2),
    );
    // Four booked and fourteen usual cars, all of 4 litres at 12.00, one a week without fail.
    expect(body.needs).toEqual([
      { product: 'CW1', ml: 72_000, lowerMl: 72_000, upperMl: 72_000, costCents: 86_400 },
    ]);
  });

  it('given a scope, filters and a role without the call, answers of what is in both or 403', async () => {
    expect((await need('', network.manager)).body.needs[0].ml).toBe(36_000);
    expect((await need('?branch=BBB')).body.needs[0].ml).toBe(36_000);
    expect((await need('?branch=CCC')).body).toMatchObject({ jobs: 0, needs: [] });
    expect((await need('?bodyType=suv')).body).toMatchObject({ jobs: 0, needs: [] });
    expect((await need('', network.recorder)).status).toBe(403);
  });

  it('given the export, has the rows of the screen (rule 62)', async () => {
    const { text } = await app.call('get', '/api/exports/product-need.csv', {
      token: network.lead,
    });
    expect(text).toBe('product,ml,lowerMl,upperMl,costCents\r\nCW1,72000,72000,72000,86400\r\n');
  });
});
