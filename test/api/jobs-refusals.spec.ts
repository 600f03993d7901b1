import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  // 23:30 UTC on the first of February: at the branches, an hour ahead, it is already the second.
  app = await TestApp.start({ now: '2026-02-01T23:30:00Z' });
  network = await makeSmallNetwork(app);
});
afterAll(() => app.stop());

let next = 0;
const put = (body: unknown, token = network.keys['AAA']): Promise<Answer> =>
  app.call('put', `/api/branches/AAA/jobs/refused-${(next += 1)}`, { token, body });
const paths = (answer: Answer): string[] =>
  ((answer.body.problems ?? []) as { path: string }[]).map(({ path }) => path);

/** A valid job with one place set to a value; `undefined` takes the place out. */
function jobWith(pointer: string, value: unknown): Record<string, unknown> {
  const job = structuredClone(validJob({ agreedExtras: [{ on: '2026-01-27' }] }));
  const steps = pointer.slice(1).split('/');
  const last = steps.pop()!;
  // eslint-disable-next-line @typescript-eslint/no-explicit-any -- walks a job of any shape
  const parent = steps.reduce<any>((place, step) => place[step], job);
  if (value === undefined) delete parent[last];
  else parent[last] = value;
  return job;
}

describe('PUT of a job that is refused, at one place', () => {
  it.each(
    [
      [
        '/vehicle',
        '/vehicle/make',
        '/vehicle/model',
        '/vehicle/bodyType',
        '/vehicle/firstRegistered',
      ],
      ['/package', '/completedOn', '/actual', '/actual/stages', '/estimate/priceCents'],
      ['/estimate/stages', '/products/0/product', '/products/0/ml', '/consumables/0/kind'],
      ['/consumables/0/quantity', '/findings/0/zone', '/findings/0/side', '/findings/0/seenAs'],
      ['/findings/0/structural', '/findings/0/action', '/invoice/totalCents', '/agreedExtras/0/on'],
    ].flat(),
  )('given no %s, asks for it', async (pointer) => {
    const answer = await put(jobWith(pointer, undefined));
    expect([answer.status, paths(answer)]).toEqual([422, [pointer]]);
  });

  it.each([
    ['/vehicle/bodyType', 'coupe'],
    ['/vehicle/make', '   '],
    ['/vehicle/firstRegistered', '2009-13'],
    ['/vehicle/firstRegistered', '2009-05-01'],
    ['/vehicle/odometerKm', 1.5],
    ['/package', 'gold'],
    ['/package', 'Full'],
    ['/completedOn', '2026-02-29'],
    ['/completedOn', '28.01.2026'],
    ['/completedOn', '2026-01-28T00:00:00Z'],
    ['/actual/stages/strip', -1],
    ['/actual/stages/strip', 1.5],
    ['/actual/stages/strip', 100_001],
    ['/actual/stages/strip', '90'],
    ['/actual/stages/strip', null],
    ['/actual/stages/strip', true],
    ['/estimate/stages/apply', -1],
    ['/estimate/priceCents', -1],
    ['/estimate/priceCents', 1_000_000_001],
    ['/estimate/priceCents', 0.5],
    ['/products/0/product', 'ZZ9'],
    ['/products/0/ml', -1],
    ['/products/0/ml', 1_000_001],
    ['/products/0/ml', 0.1],
    ['/consumables/0/kind', 'rivet'],
    ['/consumables/0/quantity', -1],
    ['/consumables/0/unitCostCents', 1e9 + 1],
    ['/boughtInCents', -1],
    ['/boughtInCents', null],
    ['/findings/0/zone', 'roof'],
    ['/findings/0/side', 'middle'],
    ['/findings/0/seenAs', 'rusty'],
    ['/findings/0/workedAs', 'gone'],
    ['/findings/0/structural', 'yes'],
    ['/findings/0/structural', 1],
    ['/findings/0/action', 'ignored'],
    ['/findings/0/repairMinutes', -1],
    ['/findings/0/chargedCents', 0.01],
    ['/findings/0/ref', 'x'.repeat(65)],
    ['/checks/linersOff', true],
    ['/checks/linersOff', 'maybe'],
    ['/workshop/temperatureC', '14'],
    ['/invoice/totalCents', -1],
    ['/invoice/issuedOn', '2026-02-30'],
    ['/notes', 7],
    ['/agreedExtras/0/minutes', -5],
  ])('given %s = %j, names that place', async (pointer, value) => {
    const answer = await put(jobWith(pointer, value));
    expect(answer.status).toBe(422);
    expect([...new Set(paths(answer))]).toEqual([pointer]);
  });

  it.each([
    ['/bookedOn', '2026-02-03'],
    ['/startedOn', '2026-02-03'],
    ['/completedOn', '2026-02-03'],
    ['/invoice/issuedOn', '2026-02-03'],
    ['/agreedExtras/0/on', '2026-02-03'],
  ])('given %s tomorrow at the branch, refuses it; given today there, takes it', async (at, on) => {
    expect(paths(await put(jobWith(at, on)))).toContain(at);
    if (at !== '/bookedOn' && at !== '/startedOn') {
      expect((await put(jobWith(at, '2026-02-02'))).status).toBe(201);
    }
  });

  it('given completion in a month before first registration, refuses it; in the same month, not', async () => {
    const answer = await put(jobWith('/vehicle/firstRegistered', '2026-02'));
    expect(paths(answer)).toContain('/completedOn');
    expect((await put(jobWith('/vehicle/firstRegistered', '2026-01'))).status).toBe(201);
  });

  it.each([
    ['/bookedOn', '2026-01-27', '/startedOn'],
    ['/startedOn', '2026-01-29', '/completedOn'],
    ['/completedOn', '2026-01-11', '/bookedOn'],
  ])('given %s = %s, out of order with %s, names both', async (pointer, on, other) => {
    const found = paths(await put(jobWith(pointer, on)));
    expect(found).toEqual(expect.arrayContaining([pointer, other]));
  });

  it('given findings that took longer than the repair stage, names the stage and the findings', async () => {
    const answer = await put(jobWith('/findings/0/repairMinutes', 186));
    expect(paths(answer).sort()).toEqual(['/actual/stages/repair', '/findings']);
    expect((await put(jobWith('/findings/0/repairMinutes', 185))).status).toBe(201);
  });

  it.each([
    ['/findings/0/workedAs', 'surface'],
    ['/findings/0/workedAs', undefined],
  ])('given %s = %j on a patched bubble, refuses it', async (pointer, value) => {
    expect(paths(await put(jobWith(pointer, value)))).toEqual([pointer]);
  });

  it('given the same ref of two findings, names the second (rule 71)', async () => {
    const finding = { ...(validJob()['findings'] as object[])[0], ref: 'a', repairMinutes: 1 };
    const answer = await put(validJob({ findings: [finding, finding] }));
    expect(paths(answer)).toEqual(['/findings/1/ref']);
  });

  it.each([
    '/colour',
    '/vehicle/plate',
    '/estimate/total',
    '/estimate/stages/polish',
    '/actual/note',
    '/products/0/litres',
    '/consumables/0/name',
    '/findings/0/photo',
    '/checks/roadTest',
    '/workshop/lift',
    '/invoice/currency',
    '/agreedExtras/0/by',
    '/toString',
    '/a~1b~0c',
  ])('given the unknown field %s, names it (rule 57)', async (pointer) => {
    const name = pointer.split('/').at(-1)!.replaceAll('~1', '/').replaceAll('~0', '~');
    const place = pointer.slice(0, pointer.lastIndexOf('/'));
    const answer = await put(jobWith(`${place}/${name === 'a/b~c' ? 'x' : name}`, 1));
    const odd = name === 'a/b~c' ? await put({ ...validJob(), 'a/b~c': 1 }) : answer;
    expect([odd.status, paths(odd)]).toEqual([422, [pointer]]);
  });

  it('given a field named __proto__, names it and changes no prototype', async () => {
    const text = JSON.stringify(validJob()).replace('{', '{"__proto__":{"polluted":true},');
    const inner = JSON.stringify(validJob()).replace('"key"', '"__proto__":{"polluted":1},"key"');
    expect(paths(await put(text))).toEqual(['/__proto__']);
    expect(paths(await put(inner))).toEqual(['/vehicle/__proto__']);
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
  });
});

describe('PUT of a job with everything wrong', () => {
  it('given breaks of shape, of references and across fields, names all of them at once (rule 57)', async () => {
    const answer = await put({
      ...validJob(),
      vehicle: { make: 'Velder', bodyType: 'coupe', firstRegistered: '2027-01', plate: 'X 1' },
      package: 'gold',
      startedOn: '2026-01-29',
      completedOn: '2026-01-28',
      estimate: { priceCents: -5, stages: { polish: 3 } },
      products: [
        { product: 'ZZ9', ml: 1 },
        { product: 'CW1', ml: 0.5 },
      ],
      findings: [
        {
          zone: 'roof',
          side: 'left',
          seenAs: 'holed',
          workedAs: 'surface',
          action: 'patched',
          repairMinutes: 999,
        },
      ],
      invoice: { number: '1', issuedOn: '2026-03-01' },
      colour: 'red',
    });
    expect(answer.status).toBe(422);
    expect(new Set(paths(answer))).toEqual(
      new Set([
        '/vehicle/model',
        '/vehicle/bodyType',
        '/vehicle/plate',
        '/package',
        '/bookedOn',
        '/startedOn',
        '/completedOn',
        '/estimate/priceCents',
        '/estimate/stages/polish',
        '/products/0/product',
        '/products/1/ml',
        '/findings',
        '/findings/0/zone',
        '/findings/0/structural',
        '/findings/0/workedAs',
        '/actual/stages/repair',
        '/invoice/totalCents',
        '/invoice/issuedOn',
        '/colour',
      ]),
    );
    expect(answer.body).toMatchObject({ type: expect.any(String), status: 422 });
    for (const { message } of answer.body.problems) expect(message.length).toBeGreaterThan(5);
  });

  it.each([[[]], [null], ['"text"'], [7], [true], [[validJob()]]])(
    'given %j for a body, refuses the whole',
    async (body) => {
      const answer = await put(body === null ? 'null' : body);
      expect([answer.status, paths(answer)]).toEqual([422, ['']]);
    },
  );

  it('given a refusal, has stored nothing', async () => {
    const path = '/api/branches/AAA/jobs/never';
    const body = validJob({ package: 'gold' });
    await app.call('put', path, { token: network.keys['AAA'], body });
    expect((await app.call('get', path, { token: network.manager })).status).toBe(404);
  });
});
