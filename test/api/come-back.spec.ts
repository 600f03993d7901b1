import { sql } from '#db/database';
import { TestApp, type Answer } from '../support/app';
import { FLOOR, LeftCars, leftAt, leftPath, mendedAt } from '../support/left-cars';
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

const problemsOf = ({ status, body }: Answer): unknown[] => [
  status,
  (body.problems as { path: string }[]).map(({ path }) => path),
];

describe('GET of a finding left on a car', () => {
  it('given one that nobody marked, tells it open, with its car and without a date (rule 61)', async () => {
    const ref = await cars.leave({ findings: [leftAt({ workedAs: 'holed' })] });
    const { status, body } = await cars.get(ref);
    expect([status, body]).toEqual([
      200,
      {
        branch: 'AAA',
        jobRef: ref,
        ref: FLOOR,
        vehicle: {
          key: expect.stringMatching(/^C-/),
          make: 'Velder',
          model: 'Tessock',
          bodyType: 'hatchback',
          firstRegistered: '2009-05',
        },
        zone: 'floor',
        side: 'left',
        seenAs: 'bubbling',
        workedAs: 'holed',
        structural: true,
        action: 'deferred',
        completedOn: '2026-01-28',
        status: 'open',
        dueOn: null,
        note: '',
        ownerToldOn: null,
        changedBy: null,
        changedAt: null,
        closedByJobRef: null,
        changes: [],
      },
    ]);
  });

  it.each(['Größe/7 %2F?#', 'a b', '車/底 "x"', 'e\u0301'])(
    'given %j for references, finds it under its encoded address, in any composition',
    async (odd) => {
      const ref = await cars.leave({ findings: [leftAt({ ref: odd })] }, { ref: odd });
      const { status, body } = await cars.get(ref, odd);
      expect([status, body.jobRef, body.ref]).toEqual([
        200,
        odd.normalize('NFC'),
        odd.normalize('NFC'),
      ]);
      expect((await cars.mark(ref, { status: 'contacted' }, network.manager, odd)).status).toBe(
        200,
      );
      expect((await cars.get(odd.normalize('NFD'), odd.normalize('NFD'))).body.status).toBe(
        'contacted',
      );
    },
  );

  it('given what is not left on a car, answers 404 before it reads the body', async () => {
    const ref = await cars.leave({
      findings: [mendedAt(), leftAt({ side: 'right' })],
    });
    const other = await cars.leave({}, { branch: 'BBB' });
    for (const path of [
      leftPath(ref),
      leftPath(ref, 'floor/left/9'),
      leftPath('none'),
      leftPath(other, FLOOR, 'BBB'),
    ]) {
      expect((await app.call('get', path, { token: network.manager })).status).toBe(404);
      const headers = { 'content-type': 'text/plain' };
      const options = { token: network.manager, body: '{', headers };
      expect((await app.call('put', path, options)).status).toBe(404);
    }
    expect((await cars.get(ref, 'floor/right/1')).status).toBe(200);
    await cars.void(ref);
    expect((await cars.get(ref, 'floor/right/1')).status).toBe(404);
  });
});

describe('PUT of a mark', () => {
  it('given parts, keeps what is left out, takes away what is null, and tells who and when', async () => {
    const ref = await cars.leave();
    const first = await cars.mark(ref, {
      status: 'contacted',
      note: ' left a message e\u0301\n',
      dueOn: '2026-03-01',
      ownerToldOn: '2026-01-29',
    });
    expect(first.status).toBe(200);
    expect(first.body).toMatchObject({
      status: 'contacted',
      note: 'left a message é',
      dueOn: '2026-03-01',
      ownerToldOn: '2026-01-29',
      changedBy: 'manager@network.example',
      changedAt: expect.stringMatching(/^\d{4}-\d\d-\d\dT.*Z$/),
    });
    const kept = await cars.mark(ref, { status: 'booked' }, network.office);
    expect(kept.body).toMatchObject({
      status: 'booked',
      dueOn: '2026-03-01',
      note: 'left a message é',
    });
    const bare = await cars.mark(ref, {
      status: 'booked',
      dueOn: null,
      note: null,
      ownerToldOn: null,
    });
    expect(bare.body).toMatchObject({ dueOn: null, note: '', ownerToldOn: null });
    const { body } = await cars.get(ref);
    expect(body.changes).toMatchObject([
      { status: 'contacted', changedBy: 'manager@network.example' },
      { status: 'booked', dueOn: '2026-03-01', changedBy: 'office@network.example' },
      { status: 'booked', dueOn: null, note: '', ownerToldOn: null },
    ]);
  });

  it('given the same mark again, writes nothing; each change is in the trail with what was before', async () => {
    const ref = await cars.leave();
    await cars.mark(ref, { status: 'open' });
    const set = { status: 'contacted', note: 'called', dueOn: '2026-03-01' };
    for (let times = 0; times < 3; times += 1) await cars.mark(ref, set);
    await cars.mark(ref, { status: 'contacted' });
    await cars.mark(ref, { status: 'gone' });
    expect((await cars.get(ref)).body.changes).toHaveLength(2);
    const subject = `/branches/AAA/come-back/${ref}/${FLOOR}`;
    const trail = app.kit.store.unscoped.all<{ action: string; actor: string; detail: string }>(
      sql('audit_events').where({ subject }).orderBy('id'),
    );
    expect(trail.map(({ action, actor }) => [action, actor])).toEqual(
      Array(2).fill(['come-back.mark', 'manager@network.example']),
    );
    const one = { ...set, ownerToldOn: null };
    expect(trail.map(({ detail }) => JSON.parse(detail) as unknown)).toEqual([
      { before: null, after: one },
      { before: one, after: { ...one, status: 'gone' } },
    ]);
  });

  it('given days that cannot be, names them with whatever else is wrong and writes nothing', async () => {
    const ref = await cars.leave();
    const bad = { ownerToldOn: '2026-02-03', dueOn: '2026-01-27', note: 7 };
    const answer = await cars.mark(ref, { status: 'called', ...bad });
    expect(problemsOf(answer)[0]).toBe(422);
    expect((problemsOf(answer)[1] as string[]).sort()).toEqual([
      ...['/dueOn', '/note', '/ownerToldOn', '/status'],
    ]);
    const early = await cars.mark(ref, { status: 'open', ownerToldOn: '2026-01-27' });
    expect(problemsOf(early)).toEqual([422, ['/ownerToldOn']]);
    expect(problemsOf(await cars.mark(ref, {}))).toEqual([422, ['/status']]);
    expect((await cars.get(ref)).body.changes).toEqual([]);
    const today = { status: 'open', ownerToldOn: '2026-02-02', dueOn: '2026-01-28' };
    expect((await cars.mark(ref, today)).status).toBe(200);
  });

  it('given a recorder, takes contacted and booked of what is not closed (rule 78)', async () => {
    const ref = await cars.leave();
    const as = async (status: string) =>
      (await cars.mark(ref, { status }, network.recorder)).status;
    expect([await as('contacted'), await as('booked')]).toEqual([200, 200]);
    expect([await as('open'), await as('done'), await as('gone')]).toEqual([403, 403, 403]);
    for (const closed of ['done', 'gone']) {
      await cars.mark(ref, { status: closed });
      expect([await as('contacted'), await as('booked')]).toEqual([403, 403]);
      expect((await cars.get(ref)).body.status).toBe(closed);
    }
    await cars.mark(ref, { status: 'open' });
    expect(await as('contacted')).toBe(200);
    expect((await cars.get(ref, FLOOR, network.recorder)).status).toBe(200);
  });

  it('given who may not, refuses: a lead reads, a key does neither, strangers find nothing', async () => {
    const ref = await cars.leave();
    const answered = async (token: string | undefined, path = leftPath(ref)) => [
      (await app.call('get', path, { token })).status,
      (await app.call('put', path, { token, body: { status: 'contacted' } })).status,
    ];
    expect(await answered(undefined)).toEqual([401, 401]);
    expect(await answered(network.keys['AAA'])).toEqual([403, 403]);
    expect(await answered(network.lead)).toEqual([200, 403]);
    expect(await answered(network.office)).toEqual([200, 200]);
    const outside = leftPath(await cars.leave({}, { branch: 'CCC' }), FLOOR, 'CCC');
    expect(await answered(network.lead, outside)).toEqual([404, 403]);
    expect(await answered(network.recorder, outside)).toEqual([404, 404]);
  });
});
