import { proposeBill } from './bill-proposal';

const estimate = { priceCents: 78_000, stages: {} };
const plain = (text: string): string => text.replaceAll('\u202f', ' ');

describe('proposeBill', () => {
  it('quoted price and agreed extras: their sum, said how, and what it does not cover', () => {
    const extras = [
      { on: '2026-01-10', minutes: 60, priceCents: 9_000 },
      { on: '2026-01-11', minutes: 0, priceCents: 1_050 },
    ];
    const { totalCents, words } = proposeBill({ estimate, agreedExtras: extras }, 155, 'EUR');
    expect(totalCents).toBe(88_050);
    expect(plain(words)).toBe(
      'Quoted €780.00 and agreed extras €100.50. 2 h 35 min were worked beyond what was charged.',
    );
  });

  it('no extras: the quoted price', () => {
    expect(proposeBill({ estimate }, null, 'EUR')).toEqual({
      totalCents: 78_000,
      words: 'Quoted €780.00.',
    });
  });

  it('no quoted price: none is proposed', () => {
    const proposal = proposeBill(
      { agreedExtras: [{ on: '2026-01-10', minutes: 60, priceCents: 9_000 }] },
      0,
      'EUR',
    );
    expect(proposal.totalCents).toBeNull();
    expect(proposal.words).toBe('No price was quoted. Agreed extras: €90.00.');
  });
});
