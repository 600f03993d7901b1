import { sql } from '#db/database';
import { TestApp } from '../support/app';
import { makeSmallNetwork, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeEach(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
});
afterEach(() => app.stop());

const write = (week: string, text: string, token = network.manager, branch = 'AAA') =>
  app.call('put', `/api/branches/${branch}/weeks/${week}/note`, { token, body: { text } });
const list = (query: string, token = network.manager) =>
  app.call('get', `/api/week-notes${query}`, { token });
const texts = async (query: string, token = network.manager) =>
  (await list(query, token)).body.items.map((note: { text: string }) => note.text);

describe('notes on weeks', () => {
  it('given a note, is listed with who wrote it and when', async () => {
    const answer = await write('2026-W05', '  two cars waited for parts\n');
    expect(answer.status).toBe(200);
    expect(answer.body.note).toEqual({
      branch: 'AAA',
      week: '2026-W05',
      text: 'two cars waited for parts',
      by: 'manager@network.example',
      changedAt: expect.stringMatching(/^\d{4}-\d\d-\d\dT.*Z$/),
    });
    const { body } = await list('?from=2026-01-26&to=2026-02-01');
    expect(body.items).toEqual([answer.body.note]);
  });

  it('given a second text, keeps that one; given an empty one, has none; the trail has all', async () => {
    await write('2026-W05', 'first');
    await write('2026-W05', 'second', network.office);
    expect((await list('?from=2026-01-26&to=2026-02-01')).body.items).toMatchObject([
      { text: 'second', by: 'office@network.example' },
    ]);
    expect((await write('2026-W05', ' ')).body).toEqual({ note: null });
    expect(await texts('?from=2026-01-26&to=2026-02-01')).toEqual([]);
    const told = app.kit.store.unscoped.all<{ detail: string; subject: string }>(
      sql('audit_events').where({ action: 'week.note' }).orderBy('id'),
    );
    expect(told.map(({ detail }) => JSON.parse(detail) as unknown)).toEqual([
      { before: null, after: 'first' },
      { before: 'first', after: 'second' },
      { before: 'second', after: '' },
    ]);
    expect(told[0]?.subject).toBe('/branches/AAA/weeks/2026-W05/note');
  });

  it('given a period, lists the weeks that touch it, newest first', async () => {
    await write('2026-W01', 'new year');
    await write('2025-W52', 'old year');
    await write('2026-W03', 'later');
    // 2026-W01 runs from 29 December 2025 to 4 January 2026.
    expect(await texts('?from=2025-12-28&to=2026-01-11')).toEqual(['new year', 'old year']);
    expect(await texts('?from=2026-01-04&to=2026-01-12')).toEqual(['later', 'new year']);
    expect((await list('?from=2026-01-04&to=2026-01-01')).status).toBe(422);
    expect((await list('')).status).toBe(422);
  });

  it('given a scope, lists and writes within it only', async () => {
    await write('2026-W05', 'ours');
    await write('2026-W05', 'theirs', network.office, 'BBB');
    const week = '?from=2026-01-26&to=2026-02-01';
    expect(await texts(week)).toEqual(['ours']);
    expect(await texts(week, network.lead)).toEqual(['ours', 'theirs']);
    expect(await texts(`${week}&branch=BBB`, network.lead)).toEqual(['theirs']);
    expect(await texts(`${week}&branch=BBB`)).toEqual([]);
    expect((await write('2026-W05', 'mine', network.manager, 'BBB')).status).toBe(404);
    expect((await write('2026-W05', 'mine', network.lead)).status).toBe(403);
    expect((await write('2026-W05', 'mine', network.recorder)).status).toBe(403);
    expect((await list(week, network.recorder)).status).toBe(403);
  });

  it('given a week that is none, or no text, is refused', async () => {
    expect((await write('2025-W53', 'no such week')).status).toBe(422);
    expect((await write('2026-5', 'no week')).status).toBe(422);
    const body = { note: 'wrong field' };
    const path = '/api/branches/AAA/weeks/2026-W05/note';
    expect((await app.call('put', path, { token: network.manager, body })).status).toBe(422);
  });
});
