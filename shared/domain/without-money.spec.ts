import { withoutMoney } from './without-money';

const JOB = {
  estimate: { priceCents: 41_000 },
  boughtInCents: 1200,
  findings: [{ ref: 'a', note: 'thin', chargedCents: 300 }],
  consumables: [{ kind: 'sanding_disc', count: 2, unitCostCents: 90 }],
  agreedExtras: [{ on: '2026-01-28', minutes: 30, priceCents: 4500 }],
  invoice: { number: '7', totalCents: 47_000 },
};

describe('withoutMoney', () => {
  it('given every amount there is, leaves the price quoted alone (rule 24)', () => {
    expect(withoutMoney(JOB)).toEqual({
      estimate: { priceCents: 41_000 },
      findings: [{ ref: 'a', note: 'thin' }],
      consumables: [{ kind: 'sanding_disc', count: 2 }],
      agreedExtras: [{ on: '2026-01-28', minutes: 30 }],
      invoice: { number: '7' },
    });
  });

  it('given a bill that is a total alone, still tells that there is one', () => {
    expect(withoutMoney({ invoice: { totalCents: 47_000 } })).toEqual({ invoice: {} });
  });

  it('given no bill, or a job just begun, adds nothing', () => {
    expect(withoutMoney({ invoice: null })).toEqual({});
    expect(withoutMoney({})).toEqual({});
  });
});
