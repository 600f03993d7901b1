import { limitWords } from './limit-words';

const LIMIT = { role: 'site_manager', limitCents: 60_000, currency: 'EUR' } as const;

describe('limitWords', () => {
  it('given a cost at the limit, says who decides what', () => {
    expect(limitWords({ cost: '600', decision: 'accepted' }, LIMIT)).toEqual({
      tone: 'quiet',
      words: 'Up to €600.00 the branch decides, above it head office.',
    });
  });

  it('given a decision above it, says that it waits as a proposal', () => {
    const said = limitWords({ cost: '600.01', decision: 'accepted' }, LIMIT);
    expect(said).toMatchObject({ tone: 'waits' });
    expect(said?.words).toContain('waits as your proposal');
  });

  it.each([
    ['head office', { ...LIMIT, role: 'head_office' as const }],
    ['a network without a limit', { ...LIMIT, limitCents: null }],
    ['a limit not known here', { ...LIMIT, limitCents: undefined }],
  ])('given %s, says nothing', (_, limit) => {
    expect(limitWords({ cost: '900', decision: 'accepted' }, limit)).toBeUndefined();
  });
});
