import { parse } from 'csv-parse/sync';
import { TestApp, type Answer } from '../support/app';
import { callAs } from '../support/call-as';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

jest.setTimeout(60_000);

interface Event {
  id: number;
  at: string;
  actor: string;
  address: string;
  action: string;
  subject: string;
  branch: string | null;
  changes: { path: string; before: unknown; after: unknown }[];
  detail: Record<string, unknown>;
}

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
});
afterAll(() => app.stop());

const { call } = callAs(
  () => app,
  () => network.office,
);
const list = async (query = ''): Promise<Event[]> => {
  const answer = await call('get', `/api/audit${query}`);
  expect([query, answer.status]).toEqual([query, 200]);
  return answer.body.items as Event[];
};
const readRecords = (text: string): Record<string, string>[] => parse(text, { columns: true });
const last = async (action: string): Promise<Event> =>
  (await list(`?action=${action}&limit=1`))[0]!;

describe('The list of the trail', () => {
  it('given deeds, tells them newest first: who, when, from where, what', async () => {
    await call('put', '/api/packages/cavity', { name: 'Cavities', warrantyMonths: 30 });
    const [newest, ...older] = await list();
    expect(newest).toMatchObject({
      actor: 'office@network.example',
      action: 'package.set',
      subject: '/packages/cavity',
      branch: null,
      changes: [
        { path: '/name', before: 'Cavity', after: 'Cavities' },
        { path: '/warrantyMonths', before: 24, after: 30 },
      ],
      detail: {},
    });
    expect(newest?.address).toMatch(/127\.0\.0\.1|::1/);
    expect(older.map(({ id }) => id)).toEqual(older.map((_, n) => newest!.id - 1 - n));
  });

  it('given pages and deeds between them, tells every event once', async () => {
    const whole = await list('?limit=200');
    const seen: number[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const page: Answer = await call('get', `/api/audit?limit=7${cursor && `&cursor=${cursor}`}`);
      seen.push(...(page.body.items as Event[]).map(({ id }) => id));
      cursor = page.body.nextCursor as string | null;
      await call('put', '/api/regions/HILLS', { name: 'Hills' });
    }
    expect(seen).toEqual(whole.map(({ id }) => id));
    expect((await call('get', '/api/audit?cursor=zzz')).status).toBe(422);
  });

  it('given filters, finds by the beginning of a word whatever its case, and a branch exactly', async () => {
    await call('put', '/api/branches/AAA/jobs/Ref-1', validJob(), network.manager);
    await call('delete', '/api/branches/AAA/jobs/Ref-1', undefined, network.manager);
    const voided = await list('?subject=/BRANCHES/aaa/JOBS/ref&actor=MANAGER&action=Job.');
    expect(voided.map(({ action, branch }) => [action, branch])).toEqual([['job.void', 'AAA']]);
    expect(await list('?subject=branches/AAA/jobs')).toEqual([]);
    expect(await list('?actor=anager')).toEqual([]);
    expect((await list('?branch=AAA')).every(({ branch }) => branch === 'AAA')).toBe(true);
    expect(await list('?branch=AA')).toEqual([]);
    expect(await list('?action=%25')).toEqual([]);
  });

  it('given days, takes both in; given the wrong way round, answers 422', async () => {
    const [newest] = await list('?limit=1');
    const day = newest!.at.slice(0, 10);
    const first = (await list('?limit=200')).at(-1)!;
    if (first.at.startsWith(day)) {
      expect((await list(`?from=${day}&to=${day}&limit=200`)).at(-1)?.id).toBe(first.id);
    }
    expect(await list('?to=2026-01-01')).toEqual([]);
    expect(await list('?from=2999-01-01')).toEqual([]);
    expect((await call('get', '/api/audit?from=2026-02-02&to=2026-02-01')).status).toBe(422);
  });

  it('given who and what occurs, names each once', async () => {
    const { actors, actions } = (await call('get', '/api/audit/names')).body as Record<
      'actors' | 'actions',
      string[]
    >;
    expect(actors).toEqual(expect.arrayContaining(['manager@network.example']));
    expect(actions).toEqual([...new Set(actions)].sort());
    expect(actions).toEqual(expect.arrayContaining(['cost.set', 'job.void', 'sign-in.start']));
  });
});

describe('What the trail tells', () => {
  it('given a dated cost, tells what held on its day before', async () => {
    await call('put', '/api/branches/CCC/rates/2026-01-05', { hourlyCostCents: 4000 });
    expect((await last('cost.set')).changes).toEqual([
      { path: '/hourlyCostCents', before: 3600, after: 4000 },
    ]);
    await call('put', '/api/network/fees/2026-01-05', { feeRate: 0.061 });
    expect((await last('cost.set')).changes).toEqual([
      { path: '/feeRate', before: 0.05, after: 0.061 },
    ]);
    await call('put', '/api/packages/full/norms/hatchback', {
      norms: [{ product: 'CW1', ml: 4100 }],
    });
    expect((await last('norm.set')).changes).toEqual([
      { path: '/norms/CW1', before: 4000, after: 4100 },
    ]);
  });

  it('given a job corrected, tells field by field what changed', async () => {
    await call('put', '/api/branches/AAA/jobs/told', validJob(), network.manager);
    await call(
      'put',
      '/api/branches/AAA/jobs/told',
      validJob({ boughtInCents: 5 }),
      network.manager,
    );
    const { subject, branch, changes } = await last('job.correct');
    expect({ subject, branch, changes }).toEqual({
      subject: '/branches/AAA/jobs/told',
      branch: 'AAA',
      changes: [{ path: '/boughtInCents', before: null, after: 5 }],
    });
  });

  it('given a booking set, sent again, changed and removed, tells each change once', async () => {
    const at = '/api/branches/AAA/bookings/b-1';
    const booking = { expectedOn: '2026-02-10', package: 'full', bodyType: 'suv' };
    for (const body of [booking, booking, { ...booking, expectedOn: '2026-02-11' }]) {
      await call('put', at, body, network.keys['AAA']);
    }
    await call('delete', at, undefined, network.manager);
    expect((await call('delete', at, undefined, network.manager)).status).toBe(404);
    const told = await list('?action=booking.&branch=AAA');
    expect(
      told.map(({ action, actor, changes }) => [action, actor.split(' ')[0], changes.length]),
    ).toEqual([
      ['booking.remove', 'manager@network.example', 3],
      ['booking.set', 'key', 1],
      ['booking.set', 'key', 3],
    ]);
    expect(told[1]?.changes).toEqual([
      { path: '/expectedOn', before: '2026-02-10', after: '2026-02-11' },
    ]);
  });

  it('given everything else that people do, has it in', async () => {
    const { id } = (
      await call('post', '/api/people', {
        email: 'new@network.example',
        name: 'N',
        role: 'head_office',
      })
    ).body as { id: number };
    expect((await last('person.add')).changes).toContainEqual({
      path: '/role',
      before: null,
      after: 'head_office',
    });
    await call('put', `/api/people/${id}`, { name: 'N', role: 'head_office', active: false });
    expect((await last('person.change')).changes).toEqual([
      { path: '/active', before: true, after: false },
    ]);
    await call(
      'put',
      '/api/branches/AAA/weeks/2026-W05/note',
      { text: 'wet week' },
      network.manager,
    );
    expect((await last('week.note')).changes).toEqual([
      { path: '', before: null, after: 'wet week' },
    ]);
    await call('put', '/api/network', {
      name: 'Small',
      currency: 'EUR',
      feeRate: 0.05,
      claimLimitCents: 9,
    });
    expect((await last('network.set')).changes).toEqual([
      { path: '/claimLimitCents', before: null, after: 9 },
    ]);
  });
});

describe('The trail as CSV', () => {
  it('given an export, holds every event with its hash, itself first', async () => {
    const answer = await call('get', '/api/exports/audit.csv?subject=/EXPORTS');
    expect(answer.headers.get('content-type')).toContain('text/csv');
    expect(answer.headers.get('content-disposition')).toContain('underseam-audit.csv');
    const [row] = readRecords(answer.text);
    expect(row).toMatchObject({
      actor: 'office@network.example',
      action: 'export.audit',
      subject: '/exports/audit.csv',
      branch: '',
    });
    expect(JSON.parse(row!['detail']!)).toMatchObject({ query: { subject: '/EXPORTS' } });
    expect(row!['hash']).toMatch(/^[0-9a-f]{64}$/);
  });

  it('given the whole of it, is linked from row to row', async () => {
    const rows = readRecords((await call('get', '/api/exports/audit.csv')).text);
    expect(Object.keys(rows[0]!)).toEqual(
      'id,at,actor,address,action,subject,branch,detail,hash,previousHash'.split(','),
    );
    expect(rows.length).toBeGreaterThan(40);
    for (const [n, row] of rows.slice(0, -1).entries()) {
      expect(row['previousHash']).toBe(rows[n + 1]!['hash']);
    }
    expect(rows.at(-1)!['previousHash']).toBe('0'.repeat(64));
  });
});
