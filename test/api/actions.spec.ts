import { sql } from '#db/database';
import { TestApp } from '../support/app';
import { makeSmallNetwork, type SmallNetwork } from '../support/small-network';

const TODAY = '2026-02-02';
let app: TestApp;
let network: SmallNetwork;
beforeEach(async () => {
  app = await TestApp.start({ now: `${TODAY}T06:30:00Z` });
  network = await makeSmallNetwork(app);
});
afterEach(() => app.stop());

const REFIT = {
  what: 'Two people at refit, clips laid out beforehand',
  who: 'Both of the late shift',
  until: '2026-03-31',
  measure: 'overrun',
};
const agree = (body: object = {}, branch = 'AAA', token = network.lead) =>
  app.call('post', `/api/branches/${branch}/actions`, { token, body: { ...REFIT, ...body } });
const change = (id: number, body: object, token = network.lead, branch = 'AAA') =>
  app.call('put', `/api/branches/${branch}/actions/${id}`, { token, body });
const answer = (id: number, text: unknown, token = network.manager, branch = 'AAA') =>
  app.call('post', `/api/branches/${branch}/actions/${id}/answers`, { token, body: { text } });
const read = (id: number, token = network.manager, branch = 'AAA') =>
  app.call('get', `/api/branches/${branch}/actions/${id}`, { token });
const list = (query = '', token = network.lead) =>
  app.call('get', `/api/actions${query}`, { token });
const pathsOf = (body: { problems: { path: string }[] }) => body.problems.map(({ path }) => path);
const trail = () =>
  app.kit.store.unscoped.all<{ action: string; subject: string; detail: string }>(
    sql('audit_events').where('action', 'like', 'action.%').orderBy('id'),
  );
/** Puts today on another day. */
const setToday = (day: string) => {
  (app.kit as { clock: unknown }).clock = { now: () => new Date(`${day}T06:30:00Z`) };
};

describe('agreeing an action', () => {
  it('given what, who and until when, is told with who agreed it', async () => {
    const { status, body } = await agree();
    expect(status).toBe(201);
    expect(body).toEqual({
      ...REFIT,
      branch: 'AAA',
      id: body.id,
      state: 'agreed',
      agreedOn: TODAY,
      agreedBy: 'lead@network.example',
      endedOn: null,
      late: false,
      signal: null,
      answers: [],
    });
    expect(trail()).toMatchObject([
      { action: 'action.agree', subject: `/branches/AAA/actions/${body.id}` },
    ]);
  });

  it('given odd but honest Unicode, keeps it composed and without its edges', async () => {
    const { body } = await agree({ what: '  Zoe\u0308 🚐 שלום 測試\n', who: 'Zoe\u0308' });
    expect([body.what, body.who]).toEqual(['Zoë 🚐 שלום 測試', 'Zoë']);
  });

  it.each([
    ['/until', { until: '2026-02-01' }],
    ['/until', { until: '2026-02-30' }],
    ['/what', { what: ' \n ' }],
    ['/what', { what: undefined }],
    ['/who', { who: '' }],
    ['/measure', { measure: 'beauty' }],
    ['/signal', { signal: 77 }],
    ['/state', { state: 'done' }],
  ])('given a wrong %s, is refused there: %p', async (path, body) => {
    const refused = await agree(body);
    expect([refused.status, pathsOf(refused.body)]).toEqual([422, [path]]);
    expect((await list()).body.items).toEqual([]);
  });

  it('given a signal of another branch, is refused as one that does not exist; its own is kept', async () => {
    const { id: other } = app.kit.store.unscoped.run(sql('signals').insert(signalOf('BBB')));
    const { id: own } = app.kit.store.unscoped.run(sql('signals').insert(signalOf('AAA')));
    const refused = await agree({ signal: other });
    expect(refused.body.problems).toEqual([
      { path: '/signal', message: (await agree({ signal: 9999 })).body.problems[0].message },
    ]);
    expect((await agree({ signal: own })).body.signal).toBe(own);
  });

  it('given who asks, leads agree within their regions, head office everywhere, nobody else', async () => {
    for (const token of [network.manager, network.recorder, network.keys['AAA']]) {
      expect((await agree({}, 'AAA', token)).status).toBe(403);
    }
    expect((await agree({}, 'CCC')).status).toBe(404);
    expect((await agree({}, 'CCC', network.office)).status).toBe(201);
  });
});

function signalOf(code: string): object {
  const branch = app.kit.store.state.branches.find((one) => one.code === code);
  return {
    branch_id: branch?.id,
    ...{ kind: 'silence', key: '', since: TODAY, opened_on: TODAY, last_seen_on: TODAY },
    ...{ strength: 1, facts: '{}', cars: 0, job_refs: '[]' },
  };
}

describe('changing an action', () => {
  it('given done, ends today; dropped after it keeps a day; agreed takes it up again', async () => {
    const { id } = (await agree()).body;
    expect((await change(id, { state: 'done' })).body).toMatchObject({
      state: 'done',
      endedOn: TODAY,
    });
    setToday('2026-02-09');
    expect((await change(id, { state: 'done' })).body.endedOn).toBe(TODAY);
    expect((await change(id, { state: 'agreed' })).body).toMatchObject({
      state: 'agreed',
      endedOn: null,
    });
    expect((await change(id, { state: 'dropped' })).body.endedOn).toBe('2026-02-09');
  });

  it('given only some fields, leaves the others; each change is in the trail, the same again is not', async () => {
    const { id } = (await agree()).body;
    expect((await change(id, { who: 'Early shift' })).body).toMatchObject({
      ...REFIT,
      who: 'Early shift',
    });
    await change(id, { who: 'Early shift' });
    await change(id, {});
    const told = trail().filter(({ action }) => action === 'action.change');
    expect(told).toHaveLength(1);
    expect(JSON.parse(told[0]!.detail)).toMatchObject({
      before: { who: REFIT.who },
      after: { who: 'Early shift', what: REFIT.what },
    });
  });

  it('given two at once, the last one stands and both are in the trail', async () => {
    const { id } = (await agree()).body;
    const both = await Promise.all([
      change(id, { what: 'One way' }),
      change(id, { what: 'Another way' }, network.office),
    ]);
    expect(both.map(({ status }) => status)).toEqual([200, 200]);
    const told = trail()
      .filter(({ action }) => action === 'action.change')
      .map(({ detail }) => JSON.parse(detail) as { after: { what: string } });
    expect(told.map(({ after }) => after.what).sort()).toEqual(['Another way', 'One way']);
    expect((await read(id)).body.what).toBe(told.at(-1)?.after.what);
  });

  it('given a day that is over, is refused, unless it is the one that was agreed', async () => {
    const { id } = (await agree({ until: '2026-02-03' })).body;
    setToday('2026-02-09');
    expect((await change(id, { until: '2026-02-08' })).body.problems[0].path).toBe('/until');
    expect((await change(id, { until: '2026-02-03', who: 'Others' })).body).toMatchObject({
      late: true,
      who: 'Others',
    });
  });

  it('given who asks, is as agreeing; an action elsewhere or of another branch is not there', async () => {
    const { id } = (await agree()).body;
    expect((await change(id, { state: 'done' }, network.manager)).status).toBe(403);
    expect((await change(id, { state: 'done' }, network.lead, 'BBB')).status).toBe(404);
    expect((await change(9999, { state: 'done' })).status).toBe(404);
    const there = (await agree({}, 'CCC', network.office)).body.id as number;
    expect((await change(there, { state: 'done' })).status).toBe(404);
    expect((await read(there, network.lead, 'CCC')).status).toBe(404);
  });
});

describe('answering an action', () => {
  it('given answers, keeps each in its order with who said it and when', async () => {
    const { id } = (await agree()).body;
    expect((await answer(id, ' Trays are ordered. ')).status).toBe(201);
    const { body } = await answer(id, 'They are here; 訓練 done.');
    expect(body.answers).toEqual([
      {
        by: 'manager@network.example',
        at: expect.stringMatching(/Z$/),
        text: 'Trays are ordered.',
      },
      expect.objectContaining({ text: 'They are here; 訓練 done.' }),
    ]);
    expect((await read(id, network.lead)).body.answers).toEqual(body.answers);
    expect(trail().map(({ action }) => action)).toEqual([
      ...['action.agree', 'action.answer', 'action.answer'],
    ]);
    expect(() => app.kit.store.unscoped.run(sql('action_answers').delete())).toThrow();
  });

  it('given who asks, is the manager of the branch alone', async () => {
    const { id } = (await agree()).body;
    for (const token of [network.lead, network.office, network.recorder]) {
      expect((await answer(id, 'Yes.', token)).status).toBe(403);
    }
    const elsewhere = (await agree({}, 'BBB')).body.id as number;
    expect((await answer(elsewhere, 'Yes.', network.manager, 'BBB')).status).toBe(404);
    expect((await answer(elsewhere, 'Yes.')).status).toBe(404);
    const empty = await answer(id, '  ');
    expect([empty.status, pathsOf(empty.body)]).toEqual([422, ['/text']]);
  });
});

describe('the list of actions', () => {
  it('given some under way and some ended, tells the earliest due first, then the newest ended', async () => {
    const ids: number[] = [];
    for (const until of ['2026-05-01', '2026-02-05', '2026-04-01', '2026-02-05', '2026-03-01']) {
      ids.push((await agree({ until })).body.id as number);
    }
    await change(ids[2]!, { state: 'done' });
    setToday('2026-02-06');
    await change(ids[4]!, { state: 'dropped' });
    const order = [ids[1], ids[3], ids[0], ids[4], ids[2]];
    const whole = await list();
    expect(whole.body.items.map(({ id }: { id: number }) => id)).toEqual(order);
    expect(whole.body.items.map(({ late }: { late: boolean }) => late)).toEqual([
      ...[true, true, false, false, false],
    ]);
    expect(whole.body.counts).toEqual({ agreed: 3, late: 2, done: 1, dropped: 1 });
    expect(whole.body.nextCursor).toBeNull();

    const paged: number[] = [];
    let cursor: string | null = null;
    do {
      const page = await list(`?limit=2${cursor ? `&cursor=${encodeURIComponent(cursor)}` : ''}`);
      paged.push(...page.body.items.map(({ id }: { id: number }) => id));
      cursor = page.body.nextCursor as string | null;
    } while (cursor);
    expect(paged).toEqual(order);
    expect((await list('?cursor=nonsense')).status).toBe(422);
    const ended = await list('?state=done&state=dropped');
    expect(ended.body.items).toHaveLength(2);
  });

  it('given a scope, tells of it alone', async () => {
    await agree();
    await agree({}, 'BBB');
    await agree({}, 'CCC', network.office);
    const branches = async (query: string, token: string) =>
      (await list(query, token)).body.items.map(({ branch }: { branch: string }) => branch);
    expect(await branches('', network.office)).toHaveLength(3);
    expect(await branches('', network.lead)).toEqual(['AAA', 'BBB']);
    expect(await branches('?branch=BBB', network.lead)).toEqual(['BBB']);
    expect(await branches('?branch=CCC', network.lead)).toEqual([]);
    expect(await branches('?region=COAST', network.manager)).toEqual(['AAA']);
    expect((await list('', network.recorder)).status).toBe(403);
  });
});
