import { warrantySchedule } from '../../testing/warranty-report-answers';
import { lastRunSentence, mailStateWords, scheduleSentence } from './schedule-words';
import { formatDate, formatInstant } from '../../ui/format';

const MAIL = {
  to: 'office@underseam.example',
  state: 'waiting' as const,
  attempts: 0,
  sentAt: null,
  lastError: null,
};

describe('scheduleSentence', () => {
  it('active, says on which day, of which day, to how many and when next', () => {
    expect(scheduleSentence(warrantySchedule({ dayOfMonth: 22, nextOn: '2026-03-22' }))).toBe(
      `Issued on the 22nd of every month, as of the last day of the month before, and mailed to 1 person of head office. Due next on ${formatDate('2026-03-22')}, as of ${formatDate('2026-02-28')}.`,
    );
  });

  it('to nobody, says that nobody is mailed', () => {
    expect(scheduleSentence(warrantySchedule({ people: [] }))).toContain('mailed to nobody');
  });

  it('not active, says that nothing is issued', () => {
    expect(scheduleSentence(warrantySchedule({ active: false, nextOn: null }))).toBe(
      'No report is issued by itself.',
    );
  });
});

describe('lastRunSentence', () => {
  it('after a run, names its report and counts its mails', () => {
    const lastRun = { month: '2026-02', at: '2026-02-01T06:00:00Z', report: 4, mails: 2 };
    expect(lastRunSentence(warrantySchedule({ lastRun }))).toBe(
      `Last run ${formatInstant('2026-02-01T06:00:00Z')}: report 4, 2 mails written.`,
    );
  });

  it('before the first, says so', () => {
    expect(lastRunSentence(warrantySchedule())).toBe('It has not run yet.');
  });
});

describe('mailStateWords', () => {
  it('not tried yet, waits; refused once, waits for another try and says why', () => {
    expect(mailStateWords(MAIL)).toBe('waits to be sent');
    expect(mailStateWords({ ...MAIL, attempts: 1, lastError: 'no route' })).toBe(
      'waits for another try after 1 try: no route',
    );
  });

  it('sent, given up or kept here, says which and why', () => {
    expect(
      mailStateWords({ ...MAIL, state: 'sent', attempts: 1, sentAt: '2026-02-01T06:00:00Z' }),
    ).toBe(`sent ${formatInstant('2026-02-01T06:00:00Z')}`);
    expect(
      mailStateWords({ ...MAIL, state: 'given_up', attempts: 8, lastError: 'box is full' }),
    ).toBe('given up after 8 tries: box is full');
    expect(mailStateWords({ ...MAIL, state: 'kept_here' })).toContain('no mail server is set up');
  });
});
