import { dangerSignal, signalList, signalOf } from '../../testing/signal-answers';
import { openSignals } from './open-signals';

const NAMES: Record<string, string> = { HAV: 'Havnsund', TAN: 'Tangvarp', ULV: 'Ulvmark' };
const looked = (codes: string[], branch?: string[]) => ({
  region: undefined,
  branch,
  codes,
  branchName: (code: string) => NAMES[code] ?? code,
});
/** What a list says, whether the reader's locale sets a comma before its last "and" or not. */
const saidOf = (said: { words: string } | undefined) => said?.words.replace(', and ', ' and ');
const silence = (id: number, branch = 'HAV') =>
  signalOf(id, {
    branch,
    kind: 'silence',
    facts: { lastReceivedOn: '2026-01-20', quietDays: 9, usualDays: 3 },
  });
const drift = (id: number, branch = 'HAV') =>
  signalOf(id, {
    branch,
    kind: 'drift_overrun',
    facts: { ratio: 1.2, usualRatio: 1, weeks: 6 },
  });

describe('openSignals', () => {
  it('given none, says nothing', () => {
    expect(openSignals(signalList([]), looked(['HAV']))).toBeUndefined();
  });

  it('given one branch, says its signals without its name and leads to that branch', () => {
    expect(openSignals(signalList([dangerSignal(1), signalOf(2)]), looked(['HAV']))).toEqual({
      count: '2 open signals',
      words: 'dangerous rot left on cars is past its day and cars wait for their bill',
      query: { region: undefined, branch: ['HAV'], state: 'open' },
    });
  });

  it('given more than three that differ, says the first three as listed and counts the others', () => {
    const list = signalList([dangerSignal(1), silence(2), signalOf(3), drift(4), drift(5)]);
    expect(saidOf(openSignals(list, looked(['HAV'])))).toBe(
      'dangerous rot left on cars is past its day, no jobs are arriving, cars wait for their bill and 2 more',
    );
  });

  it('given several branches, says the same thing once, with up to two names', () => {
    const list = signalList([
      ...['HAV', 'TAN', 'ULV'].map((branch, n) => dangerSignal(n, { branch })),
      ...[silence(4, 'HAV'), silence(5, 'TAN'), signalOf(6, { branch: 'ULV' })],
    ]);
    const said = openSignals(list, looked(['HAV', 'TAN', 'ULV'], ['HAV', 'TAN', 'ULV']));
    expect(saidOf(said)).toBe(
      'dangerous rot left on cars is past its day (3 branches), no jobs are arriving (Havnsund and Tangvarp) and cars wait for their bill (Ulvmark)',
    );
    expect(said?.query['branch']).toEqual(['HAV', 'TAN', 'ULV']);
  });

  it('given more than were fetched, does not say a count of branches as if it were whole', () => {
    const list = signalList([dangerSignal(1), dangerSignal(2, { branch: 'TAN' })], {
      nextCursor: 'x',
      counts: { open: 9, acknowledged: 0, over: 0 },
    });
    expect(openSignals(list, looked(['HAV', 'TAN', 'ULV']))).toEqual({
      count: '9 open signals',
      words: 'dangerous rot left on cars is past its day (2 branches or more) and 7 more',
      query: { region: undefined, branch: undefined, state: 'open' },
    });
  });

  it('given one signal, says it as one', () => {
    expect(openSignals(signalList([signalOf(1)]), looked(['HAV']))?.count).toBe('1 open signal');
  });
});
