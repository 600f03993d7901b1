import { breaksOfClaim } from './claim-rules';

const today = '2026-02-02';
const paths = (claim: unknown): string[] => breaksOfClaim(claim, today).map(({ path }) => path);

describe('breaksOfClaim', () => {
  it('given dates in order up to today, breaks nothing', () => {
    expect(paths({ madeOn: today, decidedOn: today, paidOn: today, decision: 'accepted' })).toEqual(
      [],
    );
  });

  it.each(['madeOn', 'decidedOn', 'paidOn'])('given %s tomorrow, names it (rule 59)', (field) => {
    expect(paths({ madeOn: '2026-01-01', decision: 'goodwill', [field]: '2026-02-03' })).toEqual([
      `/${field}`,
    ]);
  });

  it('given a decision or payment before the claim was made, names each (rule 59)', () => {
    expect(
      paths({
        madeOn: '2026-01-10',
        decidedOn: '2026-01-09',
        paidOn: '2026-01-08',
        decision: 'accepted',
      }),
    ).toEqual(['/decidedOn', '/paidOn']);
  });

  it('given a payment of an open claim, names the payment (rule 59)', () => {
    expect(paths({ madeOn: '2026-01-10', paidOn: '2026-01-11', decision: 'open' })).toEqual([
      '/paidOn',
    ]);
    expect(paths({ madeOn: '2026-01-10', paidOn: '2026-01-11', decision: 'refused' })).toEqual([]);
  });

  it('given everything wrong, names it all at once (rule 57)', () => {
    expect(
      breaksOfClaim(
        { madeOn: '2027-01-01', decidedOn: '2026-12-31', paidOn: '2026-12-30', decision: 'open' },
        today,
      ),
    ).toHaveLength(6);
  });

  it.each([
    null,
    7,
    'x',
    [],
    {},
    { madeOn: 7, decidedOn: 'yesterday', paidOn: null, decision: 'open' },
  ])('given %j, is silent on what has not the right shape', (body) => {
    expect(breaksOfClaim(body, today).filter(({ path }) => path !== '/paidOn')).toEqual([]);
  });
});
