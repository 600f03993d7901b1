import fc from 'fast-check';
import { bridgeOf } from './bridge';
import { CostBook, FROM_THE_START, type CostChange } from './cost-book';
import { costCents, deriveFigures, expectedMarginCents, marginCents } from './job-figures';
import type { RecordedJob } from './recorded-job';

const fee: CostChange = { kind: 'fee', from: FROM_THE_START, value: 50_000 };
const hourly: CostChange = { kind: 'hourlyCost', code: 'AAA', from: '2020-01-01', value: 3600 };
const wax: CostChange = { kind: 'product', code: 'CW1', from: '2020-01-01', value: 1200 };
const clips: CostChange = { kind: 'consumable', code: 'trim_clip', from: '2020-01-01', value: 40 };
const norm: CostChange = {
  kind: 'norm',
  package: 'full',
  bodyType: 'hatchback',
  lines: [{ product: 'CW1', ml: 4000 }],
};
const all = [fee, hourly, wax, clips, norm];

/** The example of the API's description: a full treatment of a hatchback with a sill patched. */
const example: RecordedJob = {
  vehicle: { make: 'Velder', model: 'Tessock', bodyType: 'hatchback', firstRegistered: '2009-05' },
  package: 'full',
  completedOn: '2026-01-28',
  estimate: {
    priceCents: 78_000,
    stages: { strip: 90, clean: 75, dry: 20, mask: 40, apply: 120, refit: 60 },
  },
  actual: {
    stages: { strip: 110, clean: 150, dry: 30, repair: 185, mask: 35, apply: 130, refit: 95 },
  },
  products: [{ product: 'CW1', ml: 4200 }],
  consumables: [{ kind: 'trim_clip', quantity: 6, unitCostCents: 45 }],
  findings: [
    {
      ref: 'sill_inner/left/1',
      zone: 'sill_inner',
      side: 'left',
      seenAs: 'bubbling',
      workedAs: 'holed',
      structural: true,
      action: 'patched',
      repairMinutes: 120,
      chargedCents: 9000,
    },
  ],
  invoice: { number: '0417', issuedOn: '2026-01-29', totalCents: 87_000 },
};
const figures = (job: Partial<RecordedJob> = {}, costs: CostChange[] = all) =>
  deriveFigures({ ...example, ...job }, 'AAA', CostBook.of(costs));

describe('deriveFigures of the example', () => {
  const { money, expected, ...rest } = figures();

  it('given costs worked out by hand, has every line to the cent', () => {
    expect(money).toEqual({
      revenueCents: 87_000,
      labourCents: 33_000,
      repairLabourCents: 11_100,
      productCents: 5_040,
      consumablesCents: 270,
      boughtInCents: 0,
      feeCents: 4_350,
    });
    expect(money && costCents(money)).toBe(49_410);
    expect(money && marginCents(money)).toBe(33_240);
    expect(expected && expectedMarginCents(expected)).toBe(45_000);
  });

  it('given its dates and minutes, has week, month, age band and sums', () => {
    expect(rest).toMatchObject({
      week: '2026-W05',
      month: '2026-01',
      ageBand: '15-19',
      hasRot: true,
      billed: true,
      hasEstimate: true,
      estimatedMinutes: 405,
      actualMinutes: 735,
      chargedRepairMinutes: 120,
      missing: [],
    });
  });
});

describe('deriveFigures on rounding', () => {
  it('given stages of half a cent each, rounds every stage up before adding (rule 1)', () => {
    const stages = { strip: 1, clean: 1, dry: 1, mask: 1, apply: 1, refit: 1, repair: 1 };
    const { money } = figures({ actual: { stages } }, [{ ...hourly, value: 30 }, fee, wax, norm]);
    expect(money).toMatchObject({ labourCents: 6, repairLabourCents: 1 });
  });

  it('given several lines of one product, rounds each and adds them (rule 37)', () => {
    const lines = [1, 1, 1].map(() => ({ product: 'CW1', ml: 500 }));
    const { money, products } = figures({ products: lines }, [{ ...wax, value: 1 }, fee, hourly]);
    expect(money?.productCents).toBe(3);
    expect(products.get('CW1')).toEqual({ ml: 1500, costCents: 3 });
  });
});

describe('deriveFigures on what is missing', () => {
  it('given no hourly cost on that day, has no money and names it (rule 11)', () => {
    const late = { ...hourly, from: '2026-01-29' };
    const { money, expected, missing } = figures({}, [fee, wax, clips, norm, late]);
    expect([money, expected]).toEqual([undefined, undefined]);
    expect(missing).toEqual([{ kind: 'hourlyCost', code: 'AAA', on: '2026-01-28' }]);
  });

  it('given no cost of a product used, has no money but names it once', () => {
    const lines = [1, 2].map((ml) => ({ product: 'UW1', ml }));
    const { money, missing, products } = figures({ products: lines });
    expect(money).toBeUndefined();
    expect(missing).toEqual([{ kind: 'product', code: 'UW1', on: '2026-01-28' }]);
    expect(products.get('UW1')).toEqual({ ml: 3, costCents: null });
  });

  it('given no cost of a norm product only, loses the expected margin only (rule 11)', () => {
    const other = { ...norm, lines: [{ product: 'UW1', ml: 1 }] };
    const { money, expected, missing } = figures({}, [fee, hourly, wax, clips, other]);
    expect(money).toBeDefined();
    expect(expected).toBeUndefined();
    expect(missing).toEqual([{ kind: 'product', code: 'UW1', on: '2026-01-28' }]);
  });

  it('given a consumable without price, takes the dated one, and without either has no money (rule 74)', () => {
    const consumables = [{ kind: 'trim_clip', quantity: 3 } as const];
    expect(figures({ consumables }).money?.consumablesCents).toBe(120);
    expect(figures({ consumables }, [fee, hourly, wax, norm])).toMatchObject({
      money: undefined,
      missing: [{ kind: 'consumable', code: 'trim_clip' }],
    });
  });

  it('given no fee rate, has no money', () => {
    expect(figures({}, [hourly, wax, clips, norm])).toMatchObject({
      money: undefined,
      missing: [{ kind: 'fee', code: 'network' }],
    });
  });
});

describe('deriveFigures on estimate and invoice', () => {
  it('given no invoice, is unbilled with its cost so far and no fee', () => {
    const { billed, money } = figures({ invoice: undefined });
    expect(billed).toBe(false);
    expect(money).toMatchObject({ revenueCents: 0, feeCents: 0, labourCents: 33_000 });
  });

  it('given an estimate of 0 minutes, has no estimate but keeps its price (rule 12)', () => {
    const made = figures({ estimate: { priceCents: 100, stages: {} } });
    expect(made).toMatchObject({
      hasEstimate: false,
      expected: { priceCents: 100 },
    });
  });

  it('given no estimate or no norm, expects nothing (rule 2)', () => {
    expect(figures({ estimate: undefined }).expected).toBeUndefined();
    expect(figures({}, [fee, hourly, wax, clips]).expected).toBeUndefined();
  });

  it('given findings not charged, leaves their minutes out of what was charged (rule 50)', () => {
    const findings = (example.findings ?? []).map((one) => ({ ...one, chargedCents: 0 }));
    expect(figures({ findings }).chargedRepairMinutes).toBe(0);
  });

  it('given a registration month of the completion month, is of the youngest band (rule 31)', () => {
    const vehicle = { ...example.vehicle, firstRegistered: '2026-01' };
    expect(figures({ vehicle }).ageBand).toBe('0-4');
  });
});

describe('deriveFigures of any job', () => {
  const minutes = fc.record({ strip: fc.nat(500), repair: fc.nat(500), refit: fc.nat(500) });

  it('given random minutes, prices and costs, bridges to the cent and stays in whole cents', () => {
    const job = fc.record({
      price: fc.nat(10 ** 9),
      total: fc.nat(10 ** 9),
      planned: minutes,
      worked: minutes,
      ml: fc.nat(10 ** 6),
      rates: fc.tuple(fc.nat(10 ** 9), fc.nat(10 ** 9), fc.nat(10 ** 6)),
    });
    fc.assert(
      fc.property(job, ({ price, total, planned, worked, ml, rates: [cost, litre, share] }) => {
        const { money, expected } = figures(
          {
            estimate: { priceCents: price, stages: planned },
            actual: { stages: worked },
            products: [{ product: 'CW1', ml }],
            invoice: { totalCents: total },
          },
          [{ ...hourly, value: cost }, { ...wax, value: litre }, { ...fee, value: share }, norm],
        );
        if (!money || !expected) throw new Error('every cost is known here');
        const {
          expectedMarginCents: start,
          marginCents: end,
          ...steps
        } = bridgeOf(money, expected);
        expect(Object.values(steps).reduce((sum, step) => sum + step, start)).toBe(end);
        for (const value of [...Object.values(money), ...Object.values(expected)]) {
          expect(Number.isSafeInteger(value)).toBe(true);
        }
      }),
    );
  });
});
