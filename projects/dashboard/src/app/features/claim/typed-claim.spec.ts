import { claimContent } from '#shared/contracts/claims';
import { claimBody, emptyClaim, type ReadClaim, typedOf } from './typed-claim';

const TYPED = {
  ...emptyClaim('2026-02-02'),
  zone: 'sill_outer',
  side: 'left',
  cause: 'thin_coverage',
};

describe('claimBody', () => {
  it('of an empty form, names what is missing', () => {
    const told = claimBody(emptyClaim('2026-02-02'), '0417', 'site_manager');
    expect('problems' in told && Object.keys(told.problems)).toEqual(['zone', 'cause']);
  });

  it('of a recorder, holds no money and is what the contract takes', () => {
    const told = claimBody({ ...TYPED, labourMinutes: '45' }, '0417', 'recorder');
    if (!('body' in told)) throw new Error('refused');
    expect(told.body).not.toHaveProperty('costCents');
    expect(claimContent.safeParse(told.body).success).toBe(true);
  });

  it('of a manager who decides, carries decision, days and cost', () => {
    const decided = { decision: 'accepted', decidedOn: '2026-02-02', paidOn: '2026-02-02' };
    const told = claimBody({ ...TYPED, ...decided, cost: '120,50' }, '0417', 'site_manager');
    expect('body' in told && told.body).toMatchObject({ ...decided, costCents: 12_050 });
  });

  it('of a claim taken back to open, leaves out the days of its decision', () => {
    const told = claimBody(
      { ...TYPED, decidedOn: '2026-02-02', paidOn: '2026-02-02' },
      '0417',
      'site_manager',
    );
    expect('body' in told && Object.keys(told.body)).not.toEqual(
      expect.arrayContaining(['decidedOn']),
    );
  });

  it.each([
    ['cost', '1,120'],
    ['labourMinutes', '1.5'],
    ['productMl', 'half a litre'],
  ])('of a form with %s as %s, names that field alone', (field, text) => {
    const told = claimBody({ ...TYPED, [field]: text }, '0417', 'head_office');
    expect('problems' in told && Object.keys(told.problems)).toEqual([field]);
  });
});

describe('typedOf', () => {
  const READ: ReadClaim = {
    branch: 'HAV',
    claimRef: 'W-1',
    revision: 2,
    jobRef: '0417',
    madeOn: '2026-01-12',
    zone: 'floor',
    cause: 'damage',
    decision: 'open',
    proposedDecision: 'goodwill',
    decidedOn: '2026-01-14',
    labourMinutes: 0,
    productMl: 500,
    costCents: 82_000,
  };

  it('of a claim that waits, stands at what is proposed', () => {
    expect(typedOf(READ)).toMatchObject({ decision: 'goodwill', cost: '820.00', productMl: '500' });
  });

  it('sent as it is, says the same again', () => {
    const told = claimBody(typedOf(READ), READ.jobRef, 'head_office');
    expect('body' in told && told.body).toEqual({
      jobRef: '0417',
      madeOn: '2026-01-12',
      zone: 'floor',
      cause: 'damage',
      decision: 'goodwill',
      decidedOn: '2026-01-14',
      labourMinutes: 0,
      productMl: 500,
      costCents: 82_000,
    });
  });
});
