import { formatInstantDay } from '../../ui/format';
import { auditAnswer } from './audit-answer';

const CHECK = {
  events: 12_431,
  since: '2024-03-03T08:00:00Z',
  brokenAt: null,
  lastHash: 'ab'.repeat(32),
  checkedAt: '2026-02-02T06:30:00Z',
};
const read = (check?: typeof CHECK | (Omit<typeof CHECK, 'brokenAt'> & { brokenAt: number })) =>
  auditAnswer(check)
    .sentence.map((part) => (typeof part === 'string' ? part : 'figure' in part ? part.figure : ''))
    .join('');

describe('auditAnswer', () => {
  it('before a check, says that none was made', () => {
    expect(auditAnswer(undefined).second).toEqual([expect.stringContaining('not checked yet')]);
  });

  it('of a chain that fits, says how many events since when', () => {
    expect(read(CHECK)).toBe(
      `12,431 events since ${formatInstantDay(CHECK.since)}; the chain fits: nothing was changed or removed.`,
    );
  });

  it('of a chain that does not, says from which event on and what to keep', () => {
    const broken = { ...CHECK, events: 41, brokenAt: 42 };
    expect(read(broken)).toBe(
      'The chain does not fit from event 42 on: something there was changed or removed.',
    );
    expect(auditAnswer(broken).second).toEqual([
      expect.stringContaining('41 events before it fit.'),
    ]);
  });
});
