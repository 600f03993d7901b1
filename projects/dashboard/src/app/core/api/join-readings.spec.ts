import { signal, type WritableSignal } from '@angular/core';
import { joinReadings } from './join-readings';
import type { Problem } from './problem';
import type { Reading } from './reading';

function part<T>(first?: T) {
  const value = signal<T | undefined>(first);
  const busy = signal(first === undefined);
  const problem = signal<Problem | undefined>(undefined);
  const reload = jest.fn();
  const refresh = jest.fn();
  const quiet = signal(false);
  const reading: Reading<T> = {
    value,
    etag: signal(undefined),
    loading: () => busy() && value() === undefined,
    refreshing: () => busy() && !quiet() && value() !== undefined,
    problem,
    reload,
    refresh,
    asking: busy,
    outdated: signal(false),
  } as unknown as Reading<T>;
  const outdated = reading.outdated as WritableSignal<boolean>;
  return { reading, value, busy, problem, reload, refresh, quiet, outdated };
}

describe('joinReadings', () => {
  it('one of two has answered: still loading, no value', () => {
    const a = part('week 5');
    const b = part<string>();
    const joined = joinReadings({ a: a.reading, b: b.reading });
    expect(joined.value()).toBeUndefined();
    expect(joined.loading()).toBe(true);
  });

  it('both have answered: both values together', () => {
    const joined = joinReadings({ a: part('week 5').reading, b: part(11).reading });
    expect(joined.value()).toEqual({ a: 'week 5', b: 11 });
    expect(joined.loading()).toBe(false);
  });

  it('a new question of which one part is answered: the former answers stay together until all are', () => {
    const a = part('week 5');
    const b = part('11 cars');
    const joined = joinReadings({ a: a.reading, b: b.reading });
    joined.value();
    a.busy.set(true);
    b.busy.set(true);
    joined.value();
    a.value.set('week 6');
    a.busy.set(false);
    expect(joined.value()).toEqual({ a: 'week 5', b: '11 cars' });
    expect(joined.refreshing()).toBe(true);
    b.value.set('3 cars');
    b.busy.set(false);
    expect(joined.value()).toEqual({ a: 'week 6', b: '3 cars' });
    expect(joined.refreshing()).toBe(false);
  });

  it('one fails: its trouble is the whole’s, and no half is shown', () => {
    const a = part('week 5');
    const b = part('11 cars');
    const joined = joinReadings({ a: a.reading, b: b.reading });
    b.value.set(undefined);
    const trouble = { status: 500, sentence: 'Not now.', fields: [] };
    b.problem.set(trouble);
    expect(joined.value()).toBeUndefined();
    expect(joined.problem()).toEqual(trouble);
  });

  it('reload: asks every part again', () => {
    const a = part(1);
    const b = part(2);
    joinReadings({ a: a.reading, b: b.reading }).reload();
    expect(a.reload).toHaveBeenCalledTimes(1);
    expect(b.reload).toHaveBeenCalledTimes(1);
  });

  it('refreshed, of which one part is answered: the former answers stay together, unnoticed', () => {
    const a = part('week 5');
    const b = part('11 cars');
    const joined = joinReadings({ a: a.reading, b: b.reading });
    joined.value();
    joined.refresh();
    expect([a.refresh, b.refresh].map(({ mock }) => mock.calls.length)).toEqual([1, 1]);
    for (const one of [a, b]) {
      one.quiet.set(true);
      one.busy.set(true);
    }
    a.value.set('week 5 anew');
    a.busy.set(false);
    expect(joined.value()).toEqual({ a: 'week 5', b: '11 cars' });
    expect([joined.refreshing(), joined.asking()]).toEqual([false, true]);
    b.value.set('12 cars');
    b.busy.set(false);
    expect(joined.value()).toEqual({ a: 'week 5 anew', b: '12 cars' });
  });

  it('refreshed, and one part in vain: none of the newer answers is shown', () => {
    const a = part('week 5');
    const b = part('11 cars');
    const joined = joinReadings({ a: a.reading, b: b.reading });
    joined.value();
    a.value.set('week 5 anew');
    b.outdated.set(true);
    expect(joined.value()).toEqual({ a: 'week 5', b: '11 cars' });
    expect(joined.outdated()).toBe(true);
  });
});
