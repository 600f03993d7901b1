import { OVERRUN_GROUPINGS } from '#shared/contracts/overrun';
import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
  for (const branch of ['AAA', 'BBB']) {
    for (let index = 0; index < 6; index += 1) {
      const body = validJob({
        package: index % 2 === 0 ? 'full' : 'cavity',
        ...(index === 5 && { estimate: undefined }),
        ...(index === 4 && { findings: [] }),
        actual: { stages: { strip: 300 + 20 * index, repair: 185 } },
      });
      const path = `/api/branches/${branch}/jobs/o-${index}`;
      const answer = await app.call('put', path, { token: network.keys[branch], body });
      expect(answer.status).toBe(201);
    }
  }
});
afterAll(() => app.stop());

const overrun = (query: string, token = network.lead) =>
  app.call('get', `/api/analytics/overrun${query}`, { token });

describe('GET /api/analytics/overrun', () => {
  it('given no grouping, answers by stage for the 52 weeks up to today', async () => {
    const { status, body } = await overrun('');
    expect(status).toBe(200);
    expect(body).toMatchObject({
      period: { from: '2025-02-10', to: '2026-02-02' },
      scope: { regions: ['COAST'], branches: ['AAA', 'BBB'] },
      jobs: 12,
      by: 'stage',
      withoutEstimate: 2,
    });
    expect(body.groups).toHaveLength(7);
    // Ten cars estimated at 405 minutes; 485, 505, 525, 545 and 565 worked at either branch.
    expect(body.overall).toMatchObject({ cars: 10, estimatedMinutes: 4050, actualMinutes: 5250 });
    expect(body.overall.ratio).toBeCloseTo(5250 / 4050, 12);
    expect(body.overall.median).toBeCloseTo(525 / 405, 12);
    expect(body.overall.allowance).toBeCloseTo(body.overall.p80 - 1, 12);
  });

  it.each(OVERRUN_GROUPINGS)('given by=%s, has every estimated car in one group', async (by) => {
    const { status, body } = await overrun(`?by=${by}`);
    expect(status).toBe(200);
    const cars = body.groups.map((group: { cars: number }) => group.cars);
    if (by === 'stage') expect(cars).toEqual(Array(7).fill(10));
    else expect(cars.reduce((all: number, n: number) => all + n, 0)).toBe(body.overall.cars);
    const over = (figures: { actualMinutes: number; estimatedMinutes: number }) =>
      figures.actualMinutes - figures.estimatedMinutes;
    const added = body.groups.map(over).reduce((all: number, n: number) => all + n, 0);
    expect(added).toBe(over(body.overall));
  });

  it('given a group of fewer than five cars, keeps its counts and nothing else (rule 13)', async () => {
    const { body } = await overrun('?by=rotFound');
    expect(body.groups.map(({ key, cars }: never) => [key, cars])).toEqual([
      ['found', 8],
      ['not_found', 2],
    ]);
    expect(body.groups[1]).toMatchObject({ estimatedMinutes: 810, ratio: null, p80: null });
  });

  it('given filters and scope, counts what fits; an unknown grouping is refused', async () => {
    expect((await overrun('?package=cavity')).body).toMatchObject({ jobs: 6, withoutEstimate: 2 });
    expect((await overrun('?branch=BBB&by=branch')).body.groups).toHaveLength(1);
    expect((await overrun('', network.manager)).body).toMatchObject({ jobs: 6 });
    expect((await overrun('?region=HILLS')).body).toMatchObject({ jobs: 0, withoutEstimate: 0 });
    const refused = await overrun('?by=colour');
    expect(refused.status).toBe(422);
    expect(refused.body.problems).toEqual([expect.objectContaining({ path: '/query/by' })]);
  });
});
