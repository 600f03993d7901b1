import { TestApp } from '../support/app';
import { carOf, FLOOR, LeftCars, leftAt, mendedAt } from '../support/left-cars';
import { makeSmallNetwork, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
let cars: LeftCars;
beforeAll(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
  cars = new LeftCars(app, network);
});
afterAll(() => app.stop());

describe('The state of a finding across jobs', () => {
  const mend = (key: string, over: object = {}, on = '2026-02-01', where = {}) =>
    cars.put(
      {
        vehicle: carOf(key),
        completedOn: on,
        invoice: null,
        findings: [mendedAt(over)],
      },
      where,
    );
  const statusOf = async (ref: string) => {
    const { body } = await cars.get(ref);
    return [body.status, body.closedByJobRef];
  };

  it('given a later job that mended the same place of the same car, is done; voided, open again (rule 72)', async () => {
    const ref = await cars.leave({ vehicle: carOf('V-1') });
    await cars.mark(ref, { status: 'booked' });
    const second = await mend('V-1', { workedAs: 'holed', action: 'patched' });
    const first = await mend('V-1', {}, '2026-01-30');
    expect(await statusOf(ref)).toEqual(['done', first]);
    await cars.void(first);
    expect(await statusOf(ref)).toEqual(['done', second]);
    await cars.void(second);
    expect(await statusOf(ref)).toEqual(['booked', null]);
  });

  it('given the same day, counts what was received later', async () => {
    const before = await mend('V-2', {}, '2026-01-28');
    const ref = await cars.leave({ vehicle: carOf('V-2') });
    expect(await statusOf(ref)).toEqual(['open', null]);
    const after = await mend('V-2', {}, '2026-01-28');
    expect(await statusOf(ref)).toEqual(['done', after]);
    expect(after).not.toBe(before);
  });

  it('given another place, car, branch or day, or nothing mended, stays open', async () => {
    const ref = await cars.leave({ vehicle: carOf('V-3') });
    const nameless = await cars.leave({ vehicle: carOf(undefined) });
    await mend('V-3', { side: 'right' });
    await mend('V-3', { zone: 'boot_floor' });
    await mend('V-3', { action: 'declined' });
    await mend('V-3', {}, '2026-01-27');
    await mend('v-3');
    await mend('V-3', {}, '2026-02-01', { branch: 'BBB' });
    await cars.put({ vehicle: carOf(undefined), findings: [mendedAt()] });
    expect(await statusOf(ref)).toEqual(['open', null]);
    expect(await statusOf(nameless)).toEqual(['open', null]);
  });

  it('given a car that is gone, stays gone; marked while closed, keeps the note and still reopens', async () => {
    const gone = await cars.leave({ vehicle: carOf('V-4') });
    await cars.mark(gone, { status: 'gone' });
    const ref = await cars.leave({ vehicle: carOf('V-4') });
    const closing = await mend('V-4');
    expect(await statusOf(gone)).toEqual(['gone', null]);
    expect((await cars.mark(ref, { status: 'contacted' }, network.recorder)).status).toBe(403);
    const noted = await cars.mark(ref, { status: 'done', note: 'owner is pleased' });
    expect(noted.body).toMatchObject({ status: 'done', closedByJobRef: closing });
    await cars.void(closing);
    expect((await cars.get(ref)).body).toMatchObject({ status: 'open', note: 'owner is pleased' });
    expect((await cars.mark(ref, { status: 'done' })).body).toMatchObject({
      status: 'done',
      closedByJobRef: null,
    });
  });

  it('given corrections, a void and the job sent again, keeps its marks by its reference (rule 71)', async () => {
    const car = { vehicle: carOf('V-5') };
    const ref = await cars.leave({ ...car, findings: [leftAt({ ref: 'mine' })] });
    await cars.mark(ref, { status: 'contacted', note: 'called' }, network.manager, 'mine');
    const moved = { ...car, findings: [leftAt(), leftAt({ ref: 'mine', zone: 'boot_floor' })] };
    await cars.put(moved, { ref });
    const kept = { status: 'contacted', note: 'called', zone: 'boot_floor' };
    expect((await cars.get(ref, 'mine')).body).toMatchObject(kept);
    expect((await cars.get(ref)).body).toMatchObject({ status: 'open', note: '' });
    await cars.put({ ...car, findings: [mendedAt({ ref: 'mine' })] }, { ref });
    expect((await cars.get(ref, 'mine')).status).toBe(404);
    await cars.void(ref);
    await cars.put(moved, { ref });
    expect((await cars.get(ref, 'mine')).body).toMatchObject(kept);
    expect((await cars.mark(ref, { status: 'gone' }, network.manager, 'mine')).body.note).toBe(
      'called',
    );
  });

  it('on the sheet of its job, stands for every role, without money', async () => {
    const findings = [
      leftAt(),
      leftAt({ side: 'right', action: 'declined' }),
      mendedAt({ ref: 'x' }),
    ];
    const ref = await cars.leave({ findings });
    await cars.mark(ref, { status: 'booked' });
    const sheet = `/api/branches/AAA/jobs/${ref}`;
    for (const token of [network.manager, network.recorder, network.lead]) {
      const { comeBacks } = (await app.call('get', sheet, { token })).body as {
        comeBacks: { ref: string; status: string }[];
      };
      expect(comeBacks.map((one) => [one.ref, one.status])).toEqual([
        [FLOOR, 'booked'],
        ['floor/right/1', 'open'],
      ]);
      expect(JSON.stringify(comeBacks)).not.toMatch(/cents/i);
    }
    const none = await cars.put({ vehicle: carOf('V-6') });
    const plain = await app.call('get', `/api/branches/AAA/jobs/${none}`, {
      token: network.manager,
    });
    expect(plain.body.comeBacks).toEqual([]);
  });
});
