import { issuedReport } from '../../testing/warranty-report-answers';
import { figureOf, issuedSentence, unchangedSentence } from './issued-words';
import { standingWords } from './paper/standing-words';
import { plainWords } from './report-answer';
import { formatDate, formatInstantDay } from '../../ui/format';

describe('issuedSentence', () => {
  it('of a report, names it as issued and says what it said', () => {
    expect(plainWords(issuedSentence(issuedReport(), 'EUR'))).toBe(
      `Report 3 as issued on ${formatInstantDay('2026-02-02T06:30:00Z')}: warranties sold by ${formatDate('2026-02-01')} will still cost about €5,000, give or take 1,400 (2,300 cars).`,
    );
  });
});

describe('unchangedSentence', () => {
  it('with later arrivals, counts them and says that they are not in it', () => {
    expect(unchangedSentence(2)).toBe(
      'Nothing in it has changed since. 2 things have arrived later for its period, listed below and not in it.',
    );
  });

  it('without any, says so', () => {
    expect(unchangedSentence(0)).toContain('Nothing has arrived later');
  });
});

describe('figureOf', () => {
  it('without an error, gives the figure alone', () => {
    expect(figureOf(issuedReport({ standardErrorCents: null }), 'EUR')).toBe('€5,000');
  });
});

describe('standingWords', () => {
  it('of an issued report, says when in UTC and by whom', () => {
    expect(standingWords(issuedReport({ by: 'schedule' }))).toBe(
      'Report 3, issued 2 February 2026, 06:30 UTC by the schedule',
    );
  });

  it('of none, says that it is a draft', () => {
    expect(standingWords(undefined)).toContain('Draft');
  });
});
