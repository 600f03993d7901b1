import { laterArrival } from '../../testing/warranty-report-answers';
import { laterRow } from './later-words';
import { formatInstant, formatShortDate } from '../../ui/format';

const NAMES = { currency: 'EUR', branch: 'Tangmoor' };

describe('laterRow', () => {
  it('of a claim, says job, day, cost, when it came and from whom, and leads to it', () => {
    const row = laterRow(laterArrival(), NAMES);
    expect(row).toMatchObject({
      name: 'Claim c-9',
      link: ['/claims', 'TAN', 'c-9'],
      about: `Tangmoor, on job 0417: new, made ${formatShortDate('2026-01-20')}, costs €310.00`,
    });
    expect(row.received).toBe(`Received ${formatInstant('2026-02-03T10:00:00Z')} from Ilse Torven`);
  });

  it('of a job brought back, leads to the job and says nothing of money', () => {
    const arrival = laterArrival({ kind: 'job', ref: '0417', what: 'restored', costCents: null });
    expect(laterRow(arrival, NAMES)).toMatchObject({
      name: 'Job 0417',
      link: ['/jobs', 'TAN', '0417'],
      about: `Tangmoor: brought back, finished ${formatShortDate('2026-01-20')}`,
    });
  });
});
