import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { sql } from '#db/database';
import { TestApp, type Answer } from '../support/app';
import { jpegOf, sendPhoto } from '../support/send-photo';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
let colleague: string;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  colleague = await app.signIn('second@network.example', 'recorder', { branches: ['AAA'] });
});
afterAll(() => app.stop());

let next = 0;
const fresh = (): string => `going-${(next += 1)}`;
const at = (ref: string): string => `/api/branches/AAA/under-way/${ref}`;
const job = (ref: string): string => `/api/branches/AAA/jobs/${ref}`;
const keep = (
  ref: string,
  body: unknown,
  token = network.recorder,
  headers: Record<string, string> = {},
): Promise<Answer> => app.call('put', at(ref), { token, body, headers });
const read = (ref: string, token = network.recorder): Promise<Answer> =>
  app.call('get', at(ref), { token });
const listed = async (): Promise<{ jobRef: string }[]> =>
  (await app.call('get', '/api/branches/AAA/under-way', { token: network.recorder })).body.items;

const BEGUN = {
  vehicle: { make: 'Velder' },
  package: 'full',
  estimate: { priceCents: 78000 },
  findings: [{ ref: 'f-1', zone: 'floor', side: 'left' }],
  timers: { strip: { startedAt: '2026-02-02T06:00:00.000Z' } },
};
/** Every kind of money a draft can hold. */
const MONEYED = {
  estimate: { priceCents: 78000, stages: { strip: 90 } },
  boughtInCents: 1234,
  findings: [{ ref: 'f-1', chargedCents: 111 }, { ref: 'f-2' }],
  consumables: [
    { kind: 'trim_clip', quantity: 2, unitCostCents: 45 },
    { kind: 'other', quantity: 1 },
  ],
  agreedExtras: [{ on: '2026-01-26', minutes: 10, priceCents: 777 }],
  invoice: { number: '0417', totalCents: 87000 },
};

describe('PUT …/under-way/:jobRef', () => {
  it('given a job just begun, keeps it as far as it goes for a colleague to go on', async () => {
    const ref = fresh();
    const made = await keep(ref, BEGUN);
    expect([made.status, made.headers.get('etag')]).toEqual([201, '"r1"']);
    const found = await read(ref, colleague);
    expect(found.body).toMatchObject({
      branch: 'AAA',
      jobRef: ref,
      revision: 1,
      content: BEGUN,
      startedBy: 'recorder@network.example',
      changedBy: 'recorder@network.example',
      photos: 0,
    });
    const { startedAt } = found.body;
    const headers = { 'if-match': found.headers.get('etag') ?? '' };
    const changed = await keep(ref, { ...BEGUN, notes: 'on the lift' }, colleague, headers);
    expect([changed.status, changed.headers.get('etag')]).toEqual([200, '"r2"']);
    expect(changed.body).toMatchObject({
      startedBy: 'recorder@network.example',
      startedAt,
      changedBy: 'second@network.example',
    });
    expect((await listed())[0]).toMatchObject({ jobRef: ref, revision: 2 });
  });

  it('given nothing at all, keeps that too, and names what is not a field', async () => {
    const ref = fresh();
    expect((await keep(ref, {})).status).toBe(201);
    const refused = await keep(ref, { vehicle: { plate: 'x' }, timers: { strip: {} } });
    expect(refused.body.problems.map(({ path }: { path: string }) => path).sort()).toEqual([
      '/timers/strip/startedAt',
      '/vehicle/plate',
    ]);
  });

  it('given what a colleague has changed meanwhile, names who and when (rule 73)', async () => {
    const ref = fresh();
    const tag = (await keep(ref, BEGUN)).headers.get('etag') ?? '';
    await keep(ref, { ...BEGUN, notes: 'a' }, colleague, { 'if-match': tag });
    const lost = await keep(ref, { ...BEGUN, notes: 'b' }, network.recorder, { 'if-match': tag });
    expect([lost.status, lost.body.detail]).toEqual([
      412,
      expect.stringMatching(/revision 2 by second@network.example at 20\d\d-/),
    ]);
    expect((await read(ref)).body.content.notes).toBe('a');
    const taken = await keep(ref, { notes: 'c' }, colleague, { 'if-none-match': '*' });
    expect(taken.status).toBe(412);
  });

  it('given the same again with the tag of before, as after a lost answer, says how it stands', async () => {
    const ref = fresh();
    const tag = (await keep(ref, BEGUN)).headers.get('etag') ?? '';
    const headers = { 'if-match': tag };
    await keep(ref, { ...BEGUN, notes: 'a' }, network.recorder, headers);
    // In another order of its fields it is the same.
    const again = await keep(ref, { notes: 'a', ...BEGUN }, network.recorder, headers);
    expect([again.status, again.body.revision]).toEqual([200, 2]);
    const first = await keep(fresh(), BEGUN, network.recorder, { 'if-none-match': '*' });
    const repeated = await keep(first.body.jobRef, BEGUN, network.recorder, {
      'if-none-match': '*',
    });
    expect([first.status, repeated.status]).toEqual([201, 200]);
  });

  it('given two at once, keeps one after the other', async () => {
    const ref = fresh();
    const answers = await Promise.all([keep(ref, { notes: 'a' }), keep(ref, { notes: 'b' })]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 201]);
    expect((await read(ref)).body.revision).toBe(2);
  });

  it('given a job that has been sent, says who sent it; once void, it may be begun anew', async () => {
    const ref = fresh();
    await app.call('put', job(ref), { token: network.manager, body: validJob() });
    const refused = await keep(ref, BEGUN);
    expect([refused.status, refused.body.detail]).toEqual([
      409,
      expect.stringMatching(/sent already: revision 1 by manager@network.example at 20/),
    ]);
    await app.call('delete', job(ref), { token: network.manager });
    expect((await keep(ref, BEGUN)).status).toBe(201);
  });
});

describe('A job under way and money (rule 24)', () => {
  it('given a recorder, shows no amount but the price quoted', async () => {
    const ref = fresh();
    const made = await keep(ref, MONEYED, network.manager);
    expect(made.body.content).toEqual(MONEYED);
    const seen = [(await read(ref)).text, JSON.stringify(await listed())];
    for (const text of seen) {
      expect(text).toContain('"priceCents":78000');
      for (const amount of ['1234', '111', '"unitCostCents"', '777', '87000']) {
        expect(text).not.toContain(amount);
      }
    }
  });

  it('given what a recorder sends back, keeps the amounts they could not see', async () => {
    const ref = fresh();
    await keep(ref, MONEYED, network.manager);
    const { content } = (await read(ref)).body;
    const changed = await keep(ref, { ...content, notes: 'on' });
    expect(changed.text).not.toContain('87000');
    expect((await read(ref, network.manager)).body.content).toEqual({ ...MONEYED, notes: 'on' });
    // Sent back as it was seen, it is the same.
    const same = await keep(ref, { ...content, notes: 'on' });
    expect(same.body.revision).toBe(2);
  });

  it('given a bill of which a recorder sees nothing, keeps its total', async () => {
    const ref = fresh();
    await keep(ref, { invoice: { totalCents: 500 } }, network.manager);
    expect((await read(ref)).body.content).toEqual({});
    await keep(ref, { notes: 'x' });
    expect((await read(ref, network.manager)).body.content.invoice).toEqual({ totalCents: 500 });
  });

  it('given a job sent by a recorder, takes along what a manager had written of its money', async () => {
    const ref = fresh();
    await keep(ref, { ...MONEYED, findings: [{ ref: 'f-1', chargedCents: 111 }] }, network.manager);
    const finding = { zone: 'floor', side: 'left', seenAs: 'surface', structural: false };
    const body = validJob({
      boughtInCents: undefined,
      consumables: [{ kind: 'trim_clip', quantity: 2 }],
      findings: [{ ref: 'f-1', ...finding, action: 'deferred' }],
      invoice: { number: '0417', issuedOn: '2026-01-29' },
    });
    const sent = await app.call('put', job(ref), { token: network.recorder, body });
    expect([sent.status, sent.body.problems]).toEqual([201, undefined]);
    const sheet = (await app.call('get', job(ref), { token: network.manager })).body;
    expect(sheet).toMatchObject({
      boughtInCents: 1234,
      consumables: [{ unitCostCents: 45 }],
      findings: [{ chargedCents: 111 }],
      invoice: { number: '0417', totalCents: 87000 },
    });
  });
});

describe('A job under way that is sent', () => {
  it.each<[way: string, call: (ref: string) => [method: string, path: string, body: unknown]]>([
    ['by PUT', (ref: string) => ['put', job(ref), validJob()]],
    [
      'in a batch',
      (ref: string) => ['post', job('batch'), { jobs: [{ jobRef: ref, ...validJob() }] }],
    ],
  ])('given it comes %s, is under way no more and keeps its photos', async (_way, call) => {
    const ref = fresh();
    await keep(ref, BEGUN);
    const token = network.recorder;
    await sendPhoto(app, `${job(ref)}/photos/one`, await jpegOf(), { token });
    expect((await read(ref)).body.photos).toBe(1);
    const [method, path, body] = call(ref);
    expect((await app.call(method, path, { token: network.manager, body })).status).toBeLessThan(
      202,
    );
    expect((await read(ref)).status).toBe(404);
    expect((await listed()).map(({ jobRef }) => jobRef)).not.toContain(ref);
    const photos = await app.call('get', `${job(ref)}/photos`, { token });
    expect(photos.body.items).toHaveLength(1);
  });

  it('given it is refused, stays under way', async () => {
    const ref = fresh();
    await keep(ref, BEGUN);
    const body = validJob({ completedOn: '2030-01-01' });
    expect((await app.call('put', job(ref), { token: network.manager, body })).status).toBe(422);
    expect((await read(ref)).status).toBe(200);
  });

  it('given it was typed into the form, says so of its revision; a key never does (rule 85)', async () => {
    const sourceAfter = async (token: string | undefined, via: string): Promise<string> => {
      const ref = fresh();
      await app.call('put', job(ref) + via, { token, body: validJob() });
      return (await app.call('get', job(ref), { token: network.manager })).body.source;
    };
    expect(await sourceAfter(network.recorder, '?via=form')).toBe('form');
    expect(await sourceAfter(network.recorder, '')).toBe('person');
    expect(await sourceAfter(network.keys['AAA'], '?via=form')).toBe('key');
  });
});

describe('DELETE …/under-way/:jobRef', () => {
  const drop = (ref: string, headers = {}): Promise<Answer> =>
    app.call('delete', at(ref), { token: colleague, headers });

  it('given a job never sent, drops it with its photos and tells the trail', async () => {
    const ref = fresh();
    await keep(ref, BEGUN);
    const photo = `${job(ref)}/photos/one`;
    await sendPhoto(app, photo, await jpegOf(), { token: network.recorder });
    const files = (): number => readdirSync(join(app.folder, 'photos', 'AAA')).length;
    const before = files();
    expect((await drop(ref, { 'if-match': '"r9"' })).status).toBe(412);
    expect((await drop(ref)).status).toBe(204);
    expect(files()).toBe(before - 2);
    expect((await drop(ref)).status).toBe(404);
    expect((await app.call('get', photo, { token: network.recorder })).status).toBe(404);
    const event = app.kit.store.unscoped.first(sql('audit_events').orderBy('id', 'desc').limit(1));
    expect(event).toMatchObject({
      action: 'under-way.drop',
      subject: `/branches/AAA/under-way/${ref}`,
      actor: 'second@network.example',
    });
    const late = await keep(ref, BEGUN, network.recorder, { 'if-match': '"r1"' });
    expect([late.status, late.body.detail]).toEqual([
      412,
      expect.stringContaining('dropped by second@network.example'),
    ]);
    await keep(ref, BEGUN);
    expect((await read(ref)).body.photos).toBe(0);
  });

  it('given a void job of that reference, leaves the photos to it', async () => {
    const ref = fresh();
    await app.call('put', job(ref), { token: network.manager, body: validJob() });
    await sendPhoto(app, `${job(ref)}/photos/one`, await jpegOf(), { token: network.recorder });
    await app.call('delete', job(ref), { token: network.manager });
    await keep(ref, BEGUN);
    expect((await drop(ref)).status).toBe(204);
    await app.call('put', job(ref), { token: network.manager, body: validJob({ notes: 'back' }) });
    const photos = await app.call('get', `${job(ref)}/photos`, { token: network.recorder });
    expect(photos.body.items).toHaveLength(1);
  });
});

describe('Jobs under way and who may see them', () => {
  it('given a key or a lead, answers 403; given another branch, 404', async () => {
    const ref = fresh();
    await keep(ref, BEGUN);
    for (const token of [network.keys['AAA'], network.lead]) {
      expect((await read(ref, token)).status).toBe(403);
      expect((await keep(ref, BEGUN, token)).status).toBe(403);
    }
    const elsewhere = at(ref).replace('AAA', 'BBB');
    expect((await app.call('get', elsewhere, { token: network.recorder })).status).toBe(404);
    expect((await read(ref, network.office)).status).toBe(200);
  });
});
