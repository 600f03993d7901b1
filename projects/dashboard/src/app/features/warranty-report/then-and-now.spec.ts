import { issuedReport } from '../../testing/warranty-report-answers';
import { thenAndNow } from './then-and-now';

const NOW = { covered: 2301, claims: 118, outstandingCents: 490_025, standardErrorCents: null };

describe('thenAndNow', () => {
  it('of what changed, gives both and the difference with its sign', () => {
    const { rows } = thenAndNow({ issued: issuedReport(), now: NOW }, '€');
    expect(rows).toEqual([
      ['Cars with a warranty', '2,300', '2,301', '+1'],
      ['Claims counted', '118', '118', '0'],
      ['Still to come, €', '5,000', '4,900', '−100'],
      ['Give or take, €', '1,386', '–', '–'],
    ]);
  });
});
