import fc from 'fast-check';
import { normaliseJob, referenced, writtenOut, type SentJob } from './normalise-job';
import type { RecordedJob } from './recorded-job';

type Sent = SentJob & { invoice?: RecordedJob['invoice'] };
const bare: Sent = {
  vehicle: { make: 'Vela', model: 'Ono', bodyType: 'van', firstRegistered: '2010-01' },
  package: 'full',
  completedOn: '2026-01-28',
  actual: { stages: {} },
};
const text = (job: Sent): string => JSON.stringify(normaliseJob(job));
const crack = {
  zone: 'floor',
  side: 'left',
  seenAs: 'surface',
  structural: false,
  action: 'deferred',
} as const;

describe('normaliseJob', () => {
  it('given defaults written out, keeps the same as given none (rule 25)', () => {
    const zero = { strip: 0, clean: 0, dry: 0, repair: 0, mask: 0, apply: 0, refit: 0 };
    expect(
      text({
        ...bare,
        vehicle: { ...bare.vehicle, key: '' },
        actual: { stages: zero },
        agreedExtras: [],
        products: [],
        consumables: [],
        boughtInCents: 0,
        findings: [],
        checks: {},
        workshop: {},
        notes: '',
      }),
    ).toBe(text(bare));
  });

  it('given defaults inside findings, extras and estimate, keeps the same as given none', () => {
    const lists = (finding: object, extra: object, stages: object): Sent => ({
      ...bare,
      estimate: { priceCents: 0, stages },
      findings: [{ ...crack, ...finding }],
      agreedExtras: [{ on: '2026-01-27', ...extra }],
    });
    expect(
      text(
        lists(
          { ref: 'floor/left/1', repairMinutes: 0, chargedCents: 0, note: '' },
          { minutes: 0, priceCents: 0, note: '' },
          { apply: 0 },
        ),
      ),
    ).toBe(text(lists({}, {}, {})));
  });

  it('given values where 0 says something, keeps them apart from absent', () => {
    for (const job of [
      { ...bare, vehicle: { ...bare.vehicle, odometerKm: 0 } },
      { ...bare, workshop: { temperatureC: 0 } },
      { ...bare, consumables: [{ kind: 'other', quantity: 1, unitCostCents: 0 } as const] },
      { ...bare, products: [{ product: 'CW1', ml: 0 }] },
      { ...bare, estimate: { priceCents: 0, stages: {} } },
      { ...bare, invoice: { totalCents: 0 } },
    ]) {
      expect(text(job)).not.toBe(text(bare));
    }
    expect(text({ ...bare, consumables: [{ kind: 'other', quantity: 1 }] })).not.toBe(
      text({ ...bare, consumables: [{ kind: 'other', quantity: 1, unitCostCents: 0 }] }),
    );
  });

  it('given keys in any order, keeps the same', () => {
    const reversed = (value: unknown): unknown => {
      if (Array.isArray(value)) return value.map(reversed);
      if (typeof value !== 'object' || value === null) return value;
      return Object.fromEntries(
        Object.entries(value)
          .reverse()
          .map(([key, inner]) => [key, reversed(inner)]),
      );
    };
    const job: Sent = {
      ...bare,
      estimate: { priceCents: 5, stages: { strip: 1, refit: 2 } },
      findings: [{ ...crack, note: 'x' }],
      checks: { linersOff: 'yes', drainsClear: 'na' },
      workshop: { temperatureC: 1, humidityPct: 2 },
      invoice: { number: '1', totalCents: 3 },
    };
    expect(text(reversed(job) as Sent)).toBe(text(job));
  });

  it('given composed and decomposed text, keeps the same', () => {
    const job = (e: string): Sent => ({
      ...bare,
      vehicle: { ...bare.vehicle, key: e, make: e, model: e },
      findings: [{ ...crack, ref: e, note: e }],
      agreedExtras: [{ on: '2026-01-27', note: e }],
      invoice: { number: e, totalCents: 1 },
      notes: e,
    });
    expect(text(job('e\u0301'))).toBe(text(job('\u00e9')));
  });

  it('given lists in another order, keeps another job: the order sent means something', () => {
    const products = [
      { product: 'CW1', ml: 1 },
      { product: 'UW1', ml: 2 },
    ];
    expect(text({ ...bare, products: [...products].reverse() })).not.toBe(
      text({ ...bare, products }),
    );
  });

  it('given a normal form, gives it again', () => {
    const once = normaliseJob({ ...bare, findings: [crack, crack], notes: 'e\u0301' });
    expect(JSON.stringify(normaliseJob(once))).toBe(JSON.stringify(once));
    expect(text(writtenOut(once))).toBe(JSON.stringify(once));
  });

  it('given a negative zero, keeps a zero', () => {
    const job = (zero: number): Sent => ({
      ...bare,
      boughtInCents: zero,
      workshop: { temperatureC: zero },
    });
    expect(text(job(-0))).toBe(text(job(0)));
  });
});

describe('referenced', () => {
  it('given findings without ref, counts them by zone and side in the order sent (rule 71)', () => {
    const refs = referenced([crack, { ...crack, side: 'right' }, crack]).map(({ ref }) => ref);
    expect(refs).toEqual(['floor/left/1', 'floor/right/1', 'floor/left/2']);
  });

  it('given a ref that the count would give, passes over it', () => {
    const refs = referenced([crack, { ...crack, ref: 'floor/left/1' }]).map(({ ref }) => ref);
    expect(refs).toEqual(['floor/left/2', 'floor/left/1']);
  });

  it('given any mix, gives every finding a ref of its own', () => {
    const ref = fc.option(fc.constantFrom('floor/left/1', 'floor/left/2', 'a'), { nil: undefined });
    fc.assert(
      fc.property(
        fc.uniqueArray(ref, { comparator: (one, other) => !!one && one === other }),
        (given) => {
          const refs = referenced(given.map((one) => ({ ...crack, ref: one }))).map((f) => f.ref);
          expect(new Set(refs).size).toBe(given.length);
        },
      ),
    );
  });
});
