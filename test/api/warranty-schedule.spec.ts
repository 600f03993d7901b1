import pino from 'pino';
import { sql } from '#db/database';
import { fixedClock } from '#server/clock';
import { ReportSchedule } from '#server/schedule/report-schedule';
import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

const log = pino({ level: 'silent' });
jest.setTimeout(120_000);
let app: TestApp;
let network: SmallNetwork;
beforeEach(async () => {
  app = await TestApp.start({ now: '2026-02-05T09:00:00Z' });
  network = await makeSmallNetwork(app);
}, 30_000);
afterEach(() => app.stop());

const idOf = (email: string): number =>
  app.kit.store.unscoped.first<{ id: number }>(sql('people').where({ email }).select('id'))!.id;
const put = (body: unknown, token = network.office): Promise<Answer> =>
  app.call('put', '/api/warranty-schedule', { token, body });
const get = async () =>
  (await app.call('get', '/api/warranty-schedule', { token: network.office })).body;
const choose = (dayOfMonth: number, ...people: number[]): Promise<Answer> =>
  put({ active: true, dayOfMonth, people });
/** One look of the schedule at a day. */
const lookAt = (now: string): Promise<void> =>
  new ReportSchedule({ ...app.kit, clock: fixedClock(new Date(now)) }, log).check();
const rows = (table: string): Record<string, unknown>[] =>
  app.kit.store.unscoped.all(sql(table).orderBy(table === 'warranty_runs' ? 'month' : 'id'));
const runMails = (): Record<string, unknown>[] =>
  rows('mails').filter((mail) => mail['report_run'] !== null);

describe('PUT /api/warranty-schedule', () => {
  it('given nothing chosen yet, is not active', async () => {
    expect(await get()).toEqual({
      active: false,
      dayOfMonth: 1,
      people: [],
      nextOn: null,
      lastRun: null,
      mails: [],
      changedAt: null,
      changedBy: null,
    });
  });

  it('given a choice, keeps it, says when it is due, and tells the trail before and after', async () => {
    const office = idOf('office@network.example');
    expect((await choose(10, office)).body).toMatchObject({
      active: true,
      dayOfMonth: 10,
      people: [office],
      nextOn: '2026-02-10',
      changedBy: 'office@network.example',
    });
    await choose(3, office);
    expect(await get()).toMatchObject({ dayOfMonth: 3, nextOn: '2026-02-05' });
    const trail = await app.call('get', '/api/audit?action=warranty-schedule.set', {
      token: network.office,
    });
    const changes = trail.body.items.map((event: { changes: unknown }) => event.changes);
    expect(changes[0]).toEqual([{ path: '/dayOfMonth', before: 10, after: 3 }]);
    expect(changes[1]).toContainEqual({ path: '/people', before: null, after: [office] });
  });

  it('given people who are not of head office, turned off, unknown or named twice, names each place', async () => {
    const office = idOf('office@network.example');
    const off = await app.call('post', '/api/people', {
      token: network.office,
      body: { email: 'off@network.example', name: 'Off', role: 'head_office' },
    });
    await app.call('put', `/api/people/${off.body.id}`, {
      token: network.office,
      body: { name: 'Off', role: 'head_office', active: false },
    });
    const manager = idOf('manager@network.example');
    const answer = await choose(5, office, manager, off.body.id as number, 9999, office);
    expect(answer.status).toBe(422);
    expect(answer.body.problems.map(({ path }: { path: string }) => path)).toEqual([
      '/people/1',
      '/people/2',
      '/people/3',
      '/people/4',
    ]);
    expect((await choose(29, office)).body.problems[0].path).toBe('/dayOfMonth');
    expect(rows('warranty_schedule')).toEqual([]);
  });

  it('given anybody but head office, answers 403', async () => {
    expect((await put({ active: true, dayOfMonth: 5, people: [] }, network.lead)).status).toBe(403);
  });
});

describe('The schedule of the warranty report', () => {
  it('given the day is not reached or it is not active, issues nothing', async () => {
    await choose(6, idOf('office@network.example'));
    await lookAt('2026-02-05T22:00:00Z');
    await put({ active: false, dayOfMonth: 1, people: [] });
    await lookAt('2026-02-20T09:00:00Z');
    expect(rows('warranty_reports')).toEqual([]);
  });

  it('given the day by the clock of a branch, issues as of the last day of the month before and mails a link', async () => {
    await app.call('put', '/api/branches/AAA/jobs/a', {
      token: network.manager,
      body: validJob(),
    });
    await choose(6, idOf('office@network.example'));
    // The branches' day has begun an hour before that of UTC.
    await lookAt('2026-02-05T23:30:00Z');
    const list = await app.call('get', '/api/warranty-reports', { token: network.office });
    expect(list.body.items).toMatchObject([
      { id: 1, asOf: '2026-01-31', by: 'schedule', covered: 1 },
    ]);
    const [mail, ...more] = runMails();
    expect(more).toEqual([]);
    expect(mail).toMatchObject({ recipient: 'office@network.example', report_run: '2026-02' });
    expect(mail!['text_body']).toContain('/warranty/reports/1\n');
    expect(mail!['html_body']).toContain('/warranty/reports/1"');
    expect(String(mail!['text_body']) + String(mail!['subject'])).not.toMatch(/€|EUR|cost/);
    expect(await get()).toMatchObject({
      nextOn: '2026-03-06',
      lastRun: { month: '2026-02', report: 1, mails: 1 },
      mails: [{ to: 'office@network.example', state: 'kept_here', attempts: 0, sentAt: null }],
    });
    const trail = await app.call('get', '/api/audit?action=warranty-report.issue', {
      token: network.office,
    });
    expect(trail.body.items).toMatchObject([{ actor: 'system', subject: '/warranty-reports/1' }]);
  });

  it('given many looks, two at once among them, issues a month once', async () => {
    await choose(1, idOf('office@network.example'));
    await Promise.all([lookAt('2026-02-05T09:00:00Z'), lookAt('2026-02-05T09:00:00Z')]);
    await lookAt('2026-02-28T09:00:00Z');
    expect([rows('warranty_reports').length, runMails().length]).toEqual([1, 1]);
  });

  it('given months without the server, issues the present one alone', async () => {
    await choose(5, idOf('office@network.example'));
    await lookAt('2026-02-05T09:00:00Z');
    await lookAt('2026-06-17T09:00:00Z');
    expect(rows('warranty_runs').map(({ month }) => month)).toEqual(['2026-02', '2026-06']);
    expect(rows('warranty_reports').map((row) => row['as_of'])).toEqual([
      '2026-01-31',
      '2026-05-31',
    ]);
  });

  it('given chosen people who were turned off, left head office or do without, mails the others', async () => {
    const people = ['a', 'b', 'c', 'd'].map((name) => `${name}@network.example`);
    const tokens: string[] = [];
    for (const email of people) tokens.push(await app.signIn(email, 'head_office'));
    await choose(1, ...people.map(idOf));
    const change = (email: string, body: object): Promise<Answer> =>
      app.call('put', `/api/people/${idOf(email)}`, { token: network.office, body });
    await change(people[0]!, { name: 'A', role: 'head_office', active: false });
    await change(people[1]!, {
      name: 'B',
      role: 'regional_lead',
      regions: ['COAST'],
      active: true,
    });
    await app.call('put', '/api/auth/mails', {
      token: tokens[2],
      body: { items: [{ kind: 'warranty_report', wanted: false }] },
    });
    await lookAt('2026-02-05T09:00:00Z');
    expect(runMails().map(({ recipient }) => recipient)).toEqual([people[3]]);
  });

  it('given a run of the month already there, keeps nothing of a second', async () => {
    const { store } = app.kit;
    await choose(1, idOf('office@network.example'));
    await lookAt('2026-02-05T09:00:00Z');
    const again = store.queue.write(() => {
      store.unscoped.run(
        sql('mails').insert({ recipient: 'x', subject: 'x', text_body: 'x', created_at: 'x' }),
      );
      store.unscoped.run(sql('warranty_runs').insert({ month: '2026-02', at: 'x', report_id: 1 }));
    });
    // By its code: the engine's errors come from the realm that loaded it first, and are none of this one's.
    await expect(again).rejects.toMatchObject({ code: 'SQLITE_CONSTRAINT_PRIMARYKEY' });
    expect(rows('mails').filter(({ recipient }) => recipient === 'x')).toEqual([]);
  });
});
