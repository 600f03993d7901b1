import { breaksOfJob, type JobWorld } from './job-rules';

const world: JobWorld = {
  today: '2026-02-02',
  isProduct: (code) => code === 'CW1',
  isPackage: (code) => code === 'full',
};
const finding = { zone: 'floor', side: 'left', seenAs: 'bubbling', structural: false };
const worked = { ...finding, workedAs: 'holed', action: 'patched' };
const paths = (job: unknown, given: Partial<JobWorld> = {}): string[] =>
  breaksOfJob(job, { ...world, ...given }).map(({ path }) => path);

describe('breaksOfJob on dates', () => {
  it('given dates in order up to today, breaks nothing', () => {
    const on = '2026-02-02';
    expect(
      paths({
        vehicle: { firstRegistered: '2026-02' },
        bookedOn: on,
        startedOn: on,
        completedOn: on,
        invoice: { issuedOn: on, totalCents: 0 },
        agreedExtras: [{ on }],
      }),
    ).toEqual([]);
  });

  it('given a date in the future, names each one (judged by the day of the branch, rule 9)', () => {
    const on = '2026-02-03';
    const job = {
      bookedOn: on,
      startedOn: on,
      completedOn: on,
      invoice: { issuedOn: on, totalCents: 0 },
      agreedExtras: [{ on: '2026-01-01' }, { on }],
    };
    expect(paths(job)).toEqual([
      '/bookedOn',
      '/startedOn',
      '/completedOn',
      '/invoice/issuedOn',
      '/agreedExtras/1/on',
    ]);
    expect(paths(job, { today: on })).toEqual([]);
  });

  it('given a date before the month of first registration, names each one (rule 31)', () => {
    const on = '2026-01-31';
    const job = {
      vehicle: { firstRegistered: '2026-02' },
      bookedOn: on,
      startedOn: on,
      completedOn: on,
      invoice: { issuedOn: on, totalCents: 0 },
      agreedExtras: [{ on }],
    };
    expect(paths(job)).toEqual([
      '/bookedOn',
      '/startedOn',
      '/completedOn',
      '/invoice/issuedOn',
      '/agreedExtras/0/on',
    ]);
    expect(paths({ ...job, vehicle: { firstRegistered: '2026-01' } })).toEqual([]);
  });

  it.each([
    ['bookedOn', 'startedOn'],
    ['startedOn', 'completedOn'],
    ['bookedOn', 'completedOn'],
  ])('given %s after %s, names both', (earlier, later) => {
    const job = { [earlier]: '2026-01-02', [later]: '2026-01-01' };
    expect(paths(job).sort()).toEqual([`/${earlier}`, `/${later}`].sort());
    expect(paths({ [earlier]: '2026-01-01', [later]: '2026-01-01' })).toEqual([]);
  });
});

describe('breaksOfJob on references', () => {
  it('given codes nobody knows, names package and product', () => {
    const products = [{ product: 'CW1' }, { product: 'XX9' }, { product: 'constructor' }];
    expect(paths({ package: 'gold', products })).toEqual([
      '/package',
      '/products/1/product',
      '/products/2/product',
    ]);
    expect(paths({ package: 'full', products: [{ product: 'CW1' }] })).toEqual([]);
  });

  it('given a very long code, keeps the message to one readable line', () => {
    const [broken] = breaksOfJob({ package: 'x\n'.repeat(5000) }, world);
    expect(broken?.message.length).toBeLessThan(150);
    expect(broken?.message).not.toContain('\n');
  });
});

describe('breaksOfJob on money', () => {
  it('given an invoice without a total, names it, but not to who sees no money (rule 24)', () => {
    expect(paths({ invoice: { number: '1' } })).toEqual(['/invoice/totalCents']);
    expect(paths({ invoice: { number: '1' } }, { money: 'unseen' })).toEqual([]);
    expect(paths({ invoice: null })).toEqual([]);
  });

  it('given a line of consumables above the largest amount, names it (rule 55)', () => {
    const line = (quantity: number, unitCostCents?: number) => ({ quantity, unitCostCents });
    expect(paths({ consumables: [line(10, 100_000_000), line(10, 100_000_001), line(9)] })).toEqual(
      ['/consumables/1/unitCostCents'],
    );
  });
});

describe('breaksOfJob on findings', () => {
  const repaired = (repair: unknown, findings: object[]): string[] =>
    paths({ actual: { stages: { repair } }, findings });

  it('given repair minutes up to the repair stage, equal allowed, breaks nothing (rule 56)', () => {
    const findings = [
      { ...worked, repairMinutes: 60 },
      { ...worked, repairMinutes: 30 },
    ];
    expect(repaired(90, findings)).toEqual([]);
    expect(repaired(89, findings)).toEqual(['/actual/stages/repair', '/findings']);
    expect(repaired(undefined, findings)).toEqual(['/actual/stages/repair', '/findings']);
  });

  it.each([
    ['surface', 'surface', true],
    ['surface', 'holed', true],
    ['bubbling', 'surface', false],
    ['holed', 'bubbling', false],
    ['holed', 'holed', true],
  ])('given rust seen as %s and worked as %s, allowed: %s', (seenAs, workedAs, allowed) => {
    const job = { findings: [{ ...finding, seenAs, workedAs, action: 'treated' }] };
    expect(paths(job)).toEqual(allowed ? [] : ['/findings/0/workedAs']);
  });

  it.each([
    ['treated', false],
    ['patched', false],
    ['deferred', true],
    ['declined', true],
  ])('given %s with nothing worked, allowed: %s (rule 56)', (action, allowed) => {
    expect(paths({ findings: [{ ...finding, action }] })).toEqual(
      allowed ? [] : ['/findings/0/workedAs'],
    );
    expect(paths({ findings: [{ ...worked, action }] })).toEqual([]);
  });

  it('given the same ref twice, in whatever composition, names the second (rule 71)', () => {
    const refs = ['é', 'a', 'e\u0301'].map((ref) => ({ ...worked, ref }));
    expect(paths({ findings: refs })).toEqual(['/findings/2/ref']);
  });
});

describe('breaksOfJob on what is no job', () => {
  it.each([
    null,
    undefined,
    7,
    'x',
    [],
    {},
    { vehicle: 7, actual: [], findings: {}, products: 'CW1', invoice: [], agreedExtras: 3 },
    { findings: [null, 7, [], { repairMinutes: 'many' }], actual: { stages: null } },
    { completedOn: '2026-02-30', bookedOn: '2026-13-01', products: [null, 7] },
    { actual: { stages: { repair: 'much' } }, findings: [{ repairMinutes: 9 }] },
  ])('given %j, is silent', (body) => {
    expect(paths(body)).toEqual([]);
  });
});
