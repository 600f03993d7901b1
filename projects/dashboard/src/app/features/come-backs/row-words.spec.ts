import { comeBackRow } from '../../testing/come-back-answers';
import { rowWords } from './row-words';
import { statusOf } from './status-filter';

const TODAY = '2026-02-02';

describe('rowWords', () => {
  it('a dangerous finding whose owner does not know: marked untold', () => {
    expect(rowWords(comeBackRow('1'), TODAY)).toMatchObject({
      untold: true,
      told: 'not told',
      wait: '13 weeks',
      place: 'sill, inner, left',
    });
  });

  it('one without danger, or dealt with: not marked', () => {
    expect(rowWords(comeBackRow('1', { structural: false }), TODAY).untold).toBe(false);
    expect(rowWords(comeBackRow('1', { status: 'gone' }), TODAY).untold).toBe(false);
  });

  it('a day that has passed: late until it is done', () => {
    const row = { dueOn: '2026-02-01' };
    expect(rowWords(comeBackRow('1', row), TODAY).late).toBe(true);
    expect(rowWords(comeBackRow('1', { ...row, status: 'done' }), TODAY).late).toBe(false);
    expect(rowWords(comeBackRow('1', { dueOn: TODAY }), TODAY).late).toBe(false);
  });

  it('closed by a later job: leads to it', () => {
    const row = comeBackRow('1', { status: 'done', closedByJobRef: '0533' });
    expect(rowWords(row, TODAY).closedBy?.link).toEqual(['/jobs', 'HAV', '0533']);
  });
});

describe('statusOf', () => {
  it('given words of a URL, takes the first it knows', () => {
    expect(statusOf('booked')).toBe('booked');
    expect(statusOf(['nonsense', 'gone'])).toBe('gone');
    expect(statusOf('nonsense')).toBeUndefined();
    expect(statusOf(undefined)).toBeUndefined();
  });
});
