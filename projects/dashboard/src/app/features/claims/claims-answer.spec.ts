import type { AnswerPart } from '../../ui/answer/answer';
import { answerClaims, type ClaimCounts } from './claims-answer';

const COUNTS: ClaimCounts = {
  places: 'Havnsund',
  claims: 318,
  costCents: 8_400_000,
  currency: 'EUR',
  open: 12,
  waiting: 3,
  narrowed: [],
};

function words(parts: readonly AnswerPart[]): string {
  return parts
    .map((part) => {
      if (typeof part === 'string') return part;
      if ('figure' in part) return part.figure;
      return 'quiet' in part ? part.quiet : part.text;
    })
    .join('');
}
const said = (change: Partial<ClaimCounts> = {}) => {
  const { sentence, second } = answerClaims({ ...COUNTS, ...change });
  return [words(sentence), words(second)];
};

describe('answerClaims', () => {
  it('of a branch, says what is open, what waits and what there is in all', () => {
    expect(said()).toEqual([
      'Havnsund: 12 claims are open; 3 wait for head office.',
      'In all 318 claims are on record, costing €84,000 before tax.',
    ]);
  });

  it('of one open and one waiting, speaks of one', () => {
    expect(said({ open: 1, waiting: 1 })[0]).toBe(
      'Havnsund: 1 claim is open; 1 waits for head office.',
    );
  });

  it('for a recorder, says no money', () => {
    expect(said({ costCents: undefined }).join()).not.toContain('€');
  });

  it('of a scope without open ones, says that all are decided', () => {
    expect(said({ open: 0, waiting: 0 })[0]).toBe('Havnsund: every claim is decided.');
  });

  it('of a scope without claims, says so', () => {
    expect(said({ claims: 0, open: 0, waiting: 0 })).toEqual([
      'Havnsund: no claim is on record.',
      '',
    ]);
  });

  it('with filters, says how many fit and which', () => {
    expect(said({ narrowed: ['still open', 'that count'], claims: 4, costCents: 0 })).toEqual([
      'Havnsund: 4 claims fit.',
      'Only those still open, that count; together €0 before tax.',
    ]);
  });
});
