import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
});
afterAll(() => app.stop());

let next = 0;
const at = (ref: string): string => `/api/branches/AAA/jobs/${ref}`;
const put = (path: string, body: unknown, token = network.manager): Promise<Answer> =>
  app.call('put', path, { token, body });
const setUp = async (path: string, body: unknown): Promise<void> => {
  const { status, text } = await put(path, body, network.office);
  if (status >= 300) throw new Error(`${path}: ${text}`);
};
const get = async (ref: string): Promise<Answer['body']> =>
  (await app.call('get', at(ref), { token: network.manager })).body;
async function stored(overrides: Record<string, unknown> = {}): Promise<string> {
  const ref = `sheet-${(next += 1)}`;
  const answer = await put(at(ref), validJob(overrides));
  if (answer.status !== 201) throw new Error(answer.text);
  return ref;
}

describe('GET of a job', () => {
  it('given the example, shows its margin and bridge as worked out by hand', async () => {
    // 36.00 an hour is 60 cents a minute; wax 12.00 a litre; norm 4 l; fee 5 %.
    const { money, missingCosts } = await get(await stored());
    expect(money).toEqual({
      revenueCents: 87_000,
      labourCents: 44_100,
      productCents: 5_040,
      consumablesCents: 270,
      boughtInCents: 0,
      feeCents: 4_350,
      costCents: 49_410,
      marginCents: 33_240,
      marginShare: 33_240 / 87_000,
      bridge: {
        expectedMarginCents: 45_000,
        priceCents: 9_000,
        plannedLabourCents: -8_700,
        rotLabourCents: -11_100,
        productCents: -240,
        consumablesCents: -270,
        feeCents: -450,
        marginCents: 33_240,
      },
    });
    expect(missingCosts).toEqual([]);
  });

  it('given what was sent, gives it back with defaults, references and where it came from', async () => {
    const ref = await stored();
    const sheet = await get(ref);
    const { findings, ...rest } = validJob() as { findings: object[] };
    expect(sheet).toMatchObject({
      ...rest,
      branch: 'AAA',
      jobRef: ref,
      revision: 1,
      source: 'person',
      warrantyMonths: 36,
      agreedExtras: [],
      findings: [{ ...findings[0], ref: 'sill_inner/left/1' }],
    });
    expect(sheet.receivedAt).toMatch(/^20\d\d-\d\d-\d\dT.*Z$/);
  });

  it('given revisions by a person and by a key, tells who sent each and when (rule 85)', async () => {
    const ref = await stored();
    await put(at(ref), validJob({ notes: 'pushed' }), network.keys['AAA']);
    const sheet = await get(ref);
    expect(sheet).toMatchObject({
      source: 'key',
      revisions: [
        { revision: 1, source: 'person', by: 'manager@network.example', change: 'created' },
        { revision: 2, source: 'key', by: 'push key "test system"', change: 'replaced' },
      ],
    });
    expect(sheet.receivedAt).toBe(sheet.revisions[1].receivedAt);
  });

  it('given no invoice, shows the cost so far and no margin', async () => {
    const { money } = await get(await stored({ invoice: null }));
    expect(money).toMatchObject({
      revenueCents: null,
      costCents: 49_410,
      feeCents: 0,
      marginCents: null,
      marginShare: null,
      bridge: null,
    });
  });

  it('given an invoice of 0, has a margin but no share of it', async () => {
    const { money } = await get(await stored({ invoice: { totalCents: 0 } }));
    expect(money).toMatchObject({ revenueCents: 0, marginCents: -49_410, marginShare: null });
  });

  it('given no norm for its kind of car, has a margin but no bridge', async () => {
    const vehicle = { ...(validJob()['vehicle'] as object), bodyType: 'classic' };
    const { money } = await get(await stored({ vehicle }));
    expect(money).toMatchObject({ marginCents: 33_240, bridge: null });
  });

  it('given a day before the first rate, has no money and names what is missing (rule 11)', async () => {
    const days = { bookedOn: '2014-12-30', startedOn: '2014-12-30', completedOn: '2014-12-31' };
    const sheet = await get(await stored(days));
    expect(sheet.money).toBeNull();
    expect(sheet.missingCosts).toEqual([
      { kind: 'hourlyCost', code: 'AAA', on: '2014-12-31' },
      { kind: 'product', code: 'CW1', on: '2014-12-31' },
    ]);
  });

  it('given a consumable without price, takes the dated one (rule 74)', async () => {
    const ref = await stored({ consumables: [{ kind: 'patch_steel', quantity: 3 }] });
    expect((await get(ref)).missingCosts).toEqual([
      { kind: 'consumable', code: 'patch_steel', on: '2026-01-28' },
    ]);
    await setUp('/api/consumables/patch_steel/costs/2026-01-28', { unitCostCents: 1500 });
    expect((await get(ref)).money).toMatchObject({ consumablesCents: 4500 });
  });

  it('given agreed extras, shows them beside the bill and leaves the estimate alone (rule 76)', async () => {
    const agreedExtras = [{ on: '2026-01-27', minutes: 90, priceCents: 5400, note: 'sill' }];
    const sheet = await get(await stored({ agreedExtras }));
    expect(sheet.agreedExtras).toEqual(agreedExtras);
    expect(sheet.money.bridge.expectedMarginCents).toBe(45_000);
  });
});

describe('warrantyMonths of a job (rule 10)', () => {
  it('given a package changed later, keeps what was sold; given the package corrected, takes the new one', async () => {
    const ref = await stored();
    await setUp('/api/packages/full', { name: 'Full', warrantyMonths: 60 });
    await put(at(ref), validJob({ notes: 'x' }));
    expect((await get(ref)).warrantyMonths).toBe(36);
    expect((await get(await stored())).warrantyMonths).toBe(60);
    await app.call('delete', at(ref), { token: network.manager });
    await put(at(ref), validJob({ notes: 'back' }));
    expect((await get(ref)).warrantyMonths).toBe(36);
    await put(at(ref), validJob({ package: 'cavity' }));
    expect((await get(ref)).warrantyMonths).toBe(24);
    await put(at(ref), validJob());
    expect((await get(ref)).warrantyMonths).toBe(60);
    await setUp('/api/packages/full', { name: 'Full', warrantyMonths: 36 });
  });
});

describe('PUT of the bill', () => {
  const bill = { number: '77', issuedOn: '2026-02-01', totalCents: 90_000 };

  it('given an unbilled car, makes a revision that differs in the invoice only', async () => {
    const ref = await stored({ invoice: null });
    const before = await get(ref);
    const answer = await put(`${at(ref)}/invoice`, bill);
    expect([answer.status, answer.body]).toEqual([
      200,
      { jobRef: ref, revision: 2, status: 'replaced' },
    ]);
    const { revisions: _r, ...after } = await get(ref);
    expect(after).toMatchObject({ invoice: bill, money: { revenueCents: 90_000 } });
    const content = ({ money, revisions, revision, receivedAt, invoice, ...rest }: typeof before) =>
      rest;
    expect(content(after)).toEqual(content(before));
  });

  it('given the same bill again, is unchanged; given another, corrects it', async () => {
    const ref = await stored();
    await put(`${at(ref)}/invoice`, bill);
    expect((await put(`${at(ref)}/invoice`, bill)).body).toMatchObject({ status: 'unchanged' });
    const other = await put(`${at(ref)}/invoice`, { ...bill, totalCents: 1 });
    expect(other.body).toMatchObject({ status: 'replaced', revision: 3 });
  });

  it.each([
    [{ issuedOn: '2026-02-03' }, '/issuedOn'],
    [{ issuedOn: '2009-04-30' }, '/issuedOn'],
    [{ issuedOn: undefined }, '/issuedOn'],
    [{ totalCents: undefined }, '/totalCents'],
    [{ totalCents: -1 }, '/totalCents'],
    [{ tax: 1 }, '/tax'],
  ])('given %j in it, is refused there and leaves the job', async (change, pointer) => {
    const ref = await stored({ invoice: null });
    const answer = await put(`${at(ref)}/invoice`, { ...bill, ...change });
    expect([answer.status, answer.body.problems.map((one: { path: string }) => one.path)]).toEqual([
      422,
      [pointer],
    ]);
    expect(await get(ref)).not.toHaveProperty('invoice');
  });

  it('given several things wrong, names them all', async () => {
    const ref = await stored();
    const answer = await put(`${at(ref)}/invoice`, { issuedOn: '2027-01-01', tax: 1 });
    const found = answer.body.problems.map(({ path }: { path: string }) => path).sort();
    expect(found).toEqual(['/issuedOn', '/tax', '/totalCents']);
  });
});
