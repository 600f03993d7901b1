import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
});
afterAll(() => app.stop());

type Sheet = Record<string, unknown>;
let next = 0;
const at = (ref: string): string => `/api/branches/AAA/jobs/${ref}`;
const put = (ref: string, body: unknown, token: string): Promise<Answer> =>
  app.call('put', at(ref), { token, body });
const get = async (ref: string, token: string): Promise<Sheet> =>
  (await app.call('get', at(ref), { token })).body as Sheet;

const FINDING = {
  zone: 'floor',
  side: 'left',
  seenAs: 'surface',
  structural: false,
  action: 'deferred',
};
/** A job with every kind of money in it. */
const rich = (): Record<string, unknown> =>
  validJob({
    boughtInCents: 1234,
    agreedExtras: [
      { on: '2026-01-26', minutes: 10, priceCents: 777 },
      { on: '2026-01-27', minutes: 20, priceCents: 888 },
    ],
    consumables: [
      { kind: 'trim_clip', quantity: 6, unitCostCents: 45 },
      { kind: 'other', quantity: 1, unitCostCents: 999 },
      { kind: 'trim_clip', quantity: 2, unitCostCents: 60 },
    ],
    findings: [
      { ...FINDING, ref: 'f-1', chargedCents: 111 },
      { ...FINDING, chargedCents: 222 },
      { ...FINDING, side: 'right', chargedCents: 333 },
    ],
  });
/** A job by the manager, and its reference. */
async function stored(): Promise<string> {
  const ref = `money-${(next += 1)}`;
  expect((await put(ref, rich(), network.manager)).status).toBe(201);
  return ref;
}
/** A sheet as a form would send it back: without what only the sheet has. */
function sentBack(sheet: Sheet): Record<string, unknown> {
  const { branch: _b, jobRef: _j, revision: _r, receivedAt: _at, source: _s, ...rest } = sheet;
  const { warrantyMonths: _w, revisions: _v, comeBacks: _l, ...told } = rest;
  const { money: _m, missingCosts: _c, ...content } = told;
  return content;
}
const places = (value: unknown, pattern: RegExp, path = ''): string[] =>
  typeof value === 'object' && value !== null
    ? Object.entries(value).flatMap(([key, inner]) => [
        ...(pattern.test(key) ? [`${path}/${key}`] : []),
        ...places(inner, pattern, `${path}/${key}`),
      ])
    : [];

describe('GET of a job by a recorder (rule 24)', () => {
  it('given money of every kind, shows the price quoted and no other', async () => {
    const ref = await stored();
    const sheet = await get(ref, network.recorder);
    expect(places(sheet, /cents|margin|money|bridge|cost/i)).toEqual(['/estimate/priceCents']);
    expect(sheet['invoice']).toEqual({ number: '0417', issuedOn: '2026-01-29' });
    expect(JSON.stringify(sheet)).not.toMatch(/1234|777|888|999|111|222|333|87000/);
  });

  it('given a manager of the branch, the lead and head office, shows them all of it', async () => {
    const ref = await stored();
    for (const token of [network.manager, network.lead, network.office]) {
      expect(await get(ref, token)).toMatchObject({
        boughtInCents: 1234,
        invoice: { totalCents: 87_000 },
        money: { marginCents: expect.any(Number) },
      });
    }
  });
});

describe('PUT of a job by a recorder (rule 24)', () => {
  it('given their own sheet sent back, leaves the job unchanged', async () => {
    const ref = await stored();
    const answer = await put(ref, sentBack(await get(ref, network.recorder)), network.recorder);
    expect(answer.body).toEqual({ jobRef: ref, revision: 1, status: 'unchanged' });
  });

  it('given a correction of their own sheet, keeps every stored amount', async () => {
    const ref = await stored();
    const before = await get(ref, network.manager);
    const body = { ...sentBack(await get(ref, network.recorder)), notes: 'seen again' };
    expect((await put(ref, body, network.recorder)).body.status).toBe('replaced');
    const after = await get(ref, network.manager);
    expect(sentBack(after)).toEqual({ ...sentBack(before), notes: 'seen again' });
    expect(after['money']).toEqual(before['money']);
  });

  it('given findings in another order or without one, keeps each amount with its ref', async () => {
    const ref = await stored();
    const mine = sentBack(await get(ref, network.recorder));
    const [first, , third] = mine['findings'] as object[];
    const added = { ...FINDING, zone: 'tailgate' };
    await put(ref, { ...mine, findings: [third, added, first] }, network.recorder);
    const { findings } = (await get(ref, network.manager)) as {
      findings: { ref: string; chargedCents: number }[];
    };
    expect(findings.map(({ ref: name, chargedCents }) => [name, chargedCents])).toEqual([
      ['floor/right/1', 333],
      ['tailgate/left/1', 0],
      ['f-1', 111],
    ]);
  });

  it('given consumables of one kind with two prices, keeps both', async () => {
    const ref = await stored();
    const mine = sentBack(await get(ref, network.recorder));
    const [clips, other, more] = mine['consumables'] as object[];
    const body = { ...mine, consumables: [other, { ...clips, quantity: 9 }, more] };
    await put(ref, body, network.recorder);
    expect((await get(ref, network.manager))['consumables']).toEqual([
      { kind: 'other', quantity: 1, unitCostCents: 999 },
      { kind: 'trim_clip', quantity: 9, unitCostCents: 45 },
      { kind: 'trim_clip', quantity: 2, unitCostCents: 60 },
    ]);
  });

  it('given one line more of a kind, gives it the price of the kind', async () => {
    const ref = await stored();
    const mine = sentBack(await get(ref, network.recorder));
    const lines = [...(mine['consumables'] as object[]), { kind: 'other', quantity: 3 }];
    await put(ref, { ...mine, consumables: lines }, network.recorder);
    const { consumables } = (await get(ref, network.manager)) as { consumables: object[] };
    expect(consumables[3]).toEqual({ kind: 'other', quantity: 3, unitCostCents: 999 });
  });

  it('given a new number on the bill, keeps its total; given no bill, keeps it whole', async () => {
    const ref = await stored();
    const mine = sentBack(await get(ref, network.recorder));
    await put(ref, { ...mine, invoice: { number: '9', issuedOn: '2026-01-30' } }, network.recorder);
    const { invoice: _invoice, ...rest } = mine;
    await put(ref, { ...rest, notes: 'x' }, network.recorder);
    expect((await get(ref, network.manager))['invoice']).toEqual({
      number: '9',
      issuedOn: '2026-01-30',
      totalCents: 87_000,
    });
  });

  it('given a new job, takes it without any amount but the price quoted', async () => {
    const ref = `money-${(next += 1)}`;
    const {
      boughtInCents: _b,
      invoice: _i,
      ...job
    } = validJob({
      consumables: [{ kind: 'trim_clip', quantity: 2 }],
      findings: [FINDING],
    });
    expect((await put(ref, job, network.recorder)).status).toBe(201);
    const sheet = await get(ref, network.manager);
    expect(sheet).toMatchObject({ boughtInCents: 0, findings: [{ chargedCents: 0 }] });
    expect(sheet['missingCosts']).toEqual([
      { kind: 'consumable', code: 'trim_clip', on: '2026-01-28' },
    ]);
  });

  it('given a bill without a total on a job that has none, asks for the total', async () => {
    const ref = `money-${(next += 1)}`;
    const answer = await put(ref, validJob({ invoice: { number: '1' } }), network.recorder);
    expect([answer.status, answer.body.problems[0].path]).toEqual([422, '/invoice/totalCents']);
  });

  it('given a batch, keeps amounts the same way', async () => {
    const ref = await stored();
    const body = { jobs: [{ jobRef: ref, ...sentBack(await get(ref, network.recorder)) }] };
    const path = '/api/branches/AAA/jobs/batch';
    const answer = await app.call('post', path, { token: network.recorder, body });
    expect(answer.body.counts).toMatchObject({ unchanged: 1 });
  });

  it('given a manager who leaves amounts out, takes them as 0: only recorders do not see them', async () => {
    const ref = await stored();
    const { boughtInCents: _b, ...job } = rich();
    expect((await put(ref, job, network.manager)).body.status).toBe('replaced');
    expect((await get(ref, network.manager))['boughtInCents']).toBe(0);
  });
});

describe('What a recorder may do with jobs (rule 23)', () => {
  it('given DELETE or the bill, is refused whatever the job', async () => {
    const ref = await stored();
    const bill = { issuedOn: '2026-01-30', totalCents: 1 };
    for (const place of [at(ref), at('nobody'), '/api/branches/BBB/jobs/x']) {
      const token = network.recorder;
      expect((await app.call('delete', place, { token })).status).toBe(403);
      expect((await app.call('put', `${place}/invoice`, { token, body: bill })).status).toBe(403);
    }
  });

  it('given a lead, may read but never send', async () => {
    const ref = await stored();
    expect((await put(ref, validJob(), network.lead)).status).toBe(403);
    expect((await app.call('delete', at(ref), { token: network.lead })).status).toBe(403);
  });

  it('given a push key, may send but never read or void', async () => {
    const ref = await stored();
    const token = network.keys['AAA'];
    expect((await app.call('get', at(ref), { token })).status).toBe(403);
    expect((await app.call('delete', at(ref), { token })).status).toBe(403);
    expect((await put(ref, rich(), token!)).body.status).toBe('unchanged');
  });
});
