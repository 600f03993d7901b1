import { differences } from './both-versions';

const NAME = (code: string): string => code;

describe('differences', () => {
  it('of two versions, given changed, missing and new fields, names each with both values', () => {
    const mine = {
      jobRef: '1',
      actual: { stages: { strip: 90 } },
      invoice: { totalCents: 87_050 },
      products: [{ product: 'CW1', ml: 3000 }],
    };
    const theirs = {
      jobRef: '1',
      actual: { stages: { strip: 120 } },
      products: [
        { product: 'UW1', ml: 4000 },
        { product: 'CW1', ml: 3000 },
      ],
    };
    expect(
      differences(mine, theirs, NAME).map(({ name, mine, theirs }) => [name, mine, theirs]),
    ).toEqual([
      ['Stage strip', '90', '120'],
      ['The bill before tax', '870.50', 'nothing'],
      ['Product, UW1', 'nothing', '4000'],
    ]);
  });

  it('of two versions, given the same, are none whatever timers run', () => {
    const startedAt = '2026-02-02T10:00:00.000Z';
    expect(
      differences({ timers: { dry: { startedAt } }, notes: 'a' }, { notes: 'a' }, NAME),
    ).toEqual([]);
  });
});
