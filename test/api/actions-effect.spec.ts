import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

const TODAY = '2026-02-02';
let app: TestApp;
let network: SmallNetwork;
beforeEach(async () => {
  app = await TestApp.start({ now: `${TODAY}T06:30:00Z` });
  network = await makeSmallNetwork(app);
});
afterEach(() => app.stop());

const agree = (measure: string) =>
  app.call('post', '/api/branches/AAA/actions', {
    token: network.lead,
    body: { what: 'Two people at refit', who: 'Late shift', until: '2026-03-31', measure },
  });
const read = (id: number) =>
  app.call('get', `/api/branches/AAA/actions/${id}`, { token: network.manager });
/** Puts today on another day. */
const setToday = (day: string) => {
  (app.kit as { clock: unknown }).clock = { now: () => new Date(`${day}T06:30:00Z`) };
};

describe('an action with its effect', () => {
  const cars = (count: number, completedOn: string, strip: number) =>
    Array.from({ length: count }, (_, n) => ({
      jobRef: `${completedOn}-${n}`,
      ...validJob({
        ...{ bookedOn: undefined, startedOn: undefined, completedOn, invoice: null },
        estimate: { priceCents: 50_000, stages: { strip: 100 } },
        // All of a day around their mean, findings taken off so that no repair is asked for.
        ...{ actual: { stages: { strip: strip + (n % 2 === 0 ? 10 : -10) } }, findings: [] },
      }),
    }));
  const send = async (jobs: object[]) => {
    const sent = await app.call('post', '/api/branches/AAA/jobs/batch', {
      token: network.manager,
      body: { jobs },
    });
    expect(sent.body.counts.rejected).toBe(0);
  };

  it('given cars before and after, tells both sides with their weeks, and the change', async () => {
    await send([...cars(6, '2026-02-01', 150), ...cars(3, '2025-08-04', 150)]);
    // A day too early for the 26 weeks before.
    await send(cars(4, '2025-08-03', 900));
    const { id } = (await agree('overrun')).body;
    setToday('2026-02-20');
    await send(cars(6, '2026-02-20', 120));
    const { effect } = (await read(id)).body;
    expect(effect).toMatchObject({ measure: 'overrun', reference: 'scope' });
    // Three cars of 1.6, 1.4 and 1.6 among the nine.
    expect(effect.before).toMatchObject({ from: '2025-08-04', to: '2026-02-01', cars: 9 });
    expect(effect.before.value).toBeCloseTo((900 + 460) / 900, 12);
    expect(effect.after).toMatchObject({ from: TODAY, to: '2026-02-20', cars: 6 });
    expect(effect.after.value).toBeCloseTo(1.2, 12);
    expect(effect.change).toBeCloseTo(1.2 - 1360 / 900, 12);
    expect(effect.upper).toBeLessThan(0);
    setToday('2027-01-01');
    expect((await read(id)).body.effect.after.to).toBe('2026-08-02');
  });

  it('given too few cars on a side, tells no change (rule 13)', async () => {
    await send(cars(6, '2026-02-01', 150));
    const { id } = (await agree('overrun')).body;
    const { effect } = (await read(id)).body;
    expect(effect.before.cars).toBe(6);
    expect(effect.after).toEqual({
      ...{ from: TODAY, to: TODAY, cars: 0 },
      ...{ value: null, lower: null, upper: null, expected: null },
    });
    expect([effect.change, effect.lower, effect.upper]).toEqual([null, null, null]);
  });

  it('given claims, counts those made and the cover run within the days of a side', async () => {
    await send(cars(6, '2026-01-03', 100));
    const made = await app.call('put', '/api/branches/AAA/claims/one', {
      token: network.manager,
      body: {
        ...{ jobRef: '2026-01-03-0', madeOn: '2026-01-30', zone: 'floor', cause: 'damage' },
        decision: 'open',
      },
    });
    expect(made.status).toBe(201);
    const { id } = (await agree('claims')).body;
    setToday('2026-02-11');
    const { effect } = (await read(id)).body;
    // 4 January to 1 February are 29 days, 2 to 11 February 10.
    expect(effect.before.value).toBeCloseTo(1000 / ((6 * 29) / 365.25), 6);
    expect(effect.after).toMatchObject({ cars: 6, value: 0, lower: 0 });
    // One set of rates over both sides: a claim in six times 39 days.
    expect(effect.before.expected).toBeCloseTo(1000 / ((6 * 39) / 365.25), 6);
    expect(effect.after.expected).toBeCloseTo(effect.before.expected, 9);
  });
});
