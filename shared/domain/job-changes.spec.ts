import { jobChanges } from './job-changes';
import type { RecordedJob } from './recorded-job';

const JOB: RecordedJob = {
  vehicle: { make: 'Vela', model: 'Ono', bodyType: 'van', firstRegistered: '2010-01' },
  package: 'full',
  completedOn: '2026-01-28',
  estimate: { priceCents: 50_000, stages: { strip: 60 } },
  actual: { stages: { strip: 70 } },
  products: [{ product: 'CW1', ml: 3900 }],
  consumables: [{ kind: 'trim_clip', quantity: 4, unitCostCents: 40 }],
  findings: [
    {
      ref: 'a/1',
      zone: 'floor',
      side: 'left',
      seenAs: 'bubbling',
      structural: true,
      action: 'declined',
    },
    {
      ref: 'b',
      zone: 'floor',
      side: 'right',
      seenAs: 'surface',
      structural: false,
      action: 'treated',
    },
  ],
};
const changed = (overrides: Partial<RecordedJob>) => jobChanges(JOB, { ...JOB, ...overrides });

describe('jobChanges', () => {
  it('given the same job with its defaults written out, tells no change', () => {
    const same = {
      ...JOB,
      notes: '',
      boughtInCents: 0,
      agreedExtras: [],
      actual: { stages: { strip: 70, clean: 0 } },
      findings: JOB.findings!.map((finding) => ({ ...finding, chargedCents: 0, note: '' })),
    };
    expect(jobChanges(JOB, same)).toEqual([]);
    expect(jobChanges(same, JOB)).toEqual([]);
  });

  it('given a value changed, added and taken away, tells each with null for nothing', () => {
    const { estimate: _gone, ...rest } = JOB;
    const after = {
      ...rest,
      actual: { stages: { strip: 70, clean: 5 } },
      completedOn: '2026-01-29',
    };
    expect(jobChanges(JOB, after)).toEqual([
      { path: '/completedOn', before: '2026-01-28', after: '2026-01-29' },
      { path: '/estimate/priceCents', before: 50_000, after: null },
      { path: '/estimate/stages/strip', before: 60, after: null },
      { path: '/actual/stages/clean', before: null, after: 5 },
    ]);
  });

  it('given findings in another order, matches them by their reference', () => {
    const [first, second] = JOB.findings!;
    expect(changed({ findings: [second!, { ...first!, action: 'deferred' }] })).toEqual([
      { path: '/findings/a~11/action', before: 'declined', after: 'deferred' },
    ]);
  });

  it('given a second line of one product and one kind, matches several of one in their order', () => {
    expect(
      changed({
        products: [
          { product: 'UW1', ml: 100 },
          { product: 'CW1', ml: 3900 },
          { product: 'CW1', ml: 50 },
        ],
        consumables: [
          { kind: 'trim_clip', quantity: 4, unitCostCents: 0 },
          { kind: 'trim_clip', quantity: 1 },
        ],
      }).map(({ path, before, after }) => [path, before, after]),
    ).toEqual([
      ['/products/UW1/product', null, 'UW1'],
      ['/products/UW1/ml', null, 100],
      ['/products/CW1:2/product', null, 'CW1'],
      ['/products/CW1:2/ml', null, 50],
      // A unit cost of 0 says "for nothing", and none that the network's cost counts.
      ['/consumables/trim_clip/unitCostCents', 40, 0],
      ['/consumables/trim_clip:2/kind', null, 'trim_clip'],
      ['/consumables/trim_clip:2/quantity', null, 1],
    ]);
  });

  it('given agreed extras, matches them by place', () => {
    const one = { on: '2026-01-27', minutes: 30, priceCents: 2000 };
    const before = { ...JOB, agreedExtras: [one] };
    const after = { ...JOB, agreedExtras: [{ ...one, minutes: 40 }, one] };
    expect(jobChanges(before, after).map(({ path }) => path)).toEqual([
      '/agreedExtras/0/minutes',
      '/agreedExtras/1/on',
      '/agreedExtras/1/minutes',
      '/agreedExtras/1/priceCents',
    ]);
  });

  it('given a reader who sees no money, tells none but the price quoted (rule 24)', () => {
    const after: RecordedJob = {
      ...JOB,
      estimate: { priceCents: 60_000, stages: { strip: 60 } },
      boughtInCents: 100,
      invoice: { number: '7', totalCents: 90_000 },
      agreedExtras: [{ on: '2026-01-27', minutes: 30, priceCents: 2000 }],
      consumables: [{ kind: 'trim_clip', quantity: 4, unitCostCents: 50 }],
      findings: JOB.findings!.map((finding) => ({ ...finding, chargedCents: 700 })),
    };
    const paths = jobChanges(JOB, after, 'unseen').map(({ path }) => path);
    expect(paths.filter((path) => path.endsWith('Cents'))).toEqual(['/estimate/priceCents']);
    expect(paths).toContain('/invoice/number');
    expect(jobChanges(JOB, after).filter(({ path }) => path.endsWith('Cents'))).toHaveLength(7);
  });

  it('given no earlier content, tells everything as new', () => {
    const changes = jobChanges(undefined, JOB);
    expect(changes.every(({ before }) => before === null)).toBe(true);
    expect(changes.map(({ path }) => path)).toContain('/findings/b/zone');
  });
});
