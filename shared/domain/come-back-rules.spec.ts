import { breaksOfMark } from './come-back-rules';

const paths = (body: unknown): string[] =>
  breaksOfMark(body, '2026-01-28', '2026-02-02').map(({ path }) => path);

describe('breaksOfMark', () => {
  it('given days from the completion on, the told one up to today, finds nothing wrong', () => {
    for (const on of ['2026-01-28', '2026-02-02']) {
      expect(paths({ dueOn: on, ownerToldOn: on })).toEqual([]);
    }
    expect(paths({ dueOn: '2031-01-01', ownerToldOn: null })).toEqual([]);
    expect(paths({ dueOn: null, status: 'gone' })).toEqual([]);
  });

  it('given a day before the completion, names its field', () => {
    expect(paths({ dueOn: '2026-01-27' })).toEqual(['/dueOn']);
    expect(paths({ dueOn: '2026-01-27', ownerToldOn: '2025-01-28' })).toEqual([
      '/dueOn',
      '/ownerToldOn',
    ]);
  });

  it('given an owner told tomorrow, names that field', () => {
    expect(paths({ ownerToldOn: '2026-02-03', dueOn: '2026-02-03' })).toEqual(['/ownerToldOn']);
  });

  it('given fields of another shape, leaves them to the contract', () => {
    for (const body of [null, 'x', 7, [], ['2020-01-01'], { dueOn: 7, ownerToldOn: '2020' }]) {
      expect(paths(body)).toEqual([]);
    }
  });
});
