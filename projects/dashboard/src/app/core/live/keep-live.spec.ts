import { Injector, runInInjectionContext, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { LiveEvent } from '#shared/contracts/live';
import { Catalogue } from '../catalogue/catalogue';
import { ScopeState } from '../scope-line/scope-state';
import { keepLive } from './keep-live';
import { LiveFeed, type LiveNote } from './live-feed';
import { LiveNews } from './live-news';
import { PersonBusy } from './person-busy';

const jobs = (branch: string): LiveEvent => ({ kind: 'jobs', branch, count: 1, added: 1 });
const claims = (branch: string): LiveEvent => ({ ...jobs(branch), kind: 'claims' });

function set() {
  const scope = { branches: signal<string[]>([]), regions: signal<string[]>([]) };
  const branches = signal([
    { code: 'HAV', region: 'NO' },
    { code: 'ULV', region: 'SO' },
  ]);
  let hear: (note: LiveNote) => void = () => undefined;
  const said: LiveEvent[][] = [];
  const person = { busy: false, now: () => person.busy };
  TestBed.configureTestingModule({
    providers: [
      { provide: ScopeState, useValue: scope },
      { provide: Catalogue, useValue: { branches } },
      {
        provide: LiveFeed,
        useValue: { listen: (to: typeof hear) => ((hear = to), () => (hear = () => undefined)) },
      },
      { provide: LiveNews, useValue: { tell: (events: LiveEvent[]) => said.push(events) } },
      { provide: PersonBusy, useValue: person },
    ],
  });
  const asking = signal(false);
  const outdated = signal(false);
  let refreshed = 0;
  const reading = {
    asking,
    outdated,
    refresh: () => {
      refreshed += 1;
      asking.set(true);
    },
  };
  runInInjectionContext(TestBed.inject(Injector), () => keepLive(reading, 'jobs'));
  const pass = (milliseconds: number): void => {
    jest.advanceTimersByTime(milliseconds);
    TestBed.tick();
  };
  const answer = (how: 'whole' | 'in vain' = 'whole'): void => {
    outdated.set(how === 'in vain');
    asking.set(false);
    TestBed.tick();
  };
  TestBed.tick();
  return {
    ...{ answer, asking, pass, person, said, scope },
    hear: (note: LiveNote) => hear(note),
    refreshed: () => refreshed,
  };
}

beforeEach(() => jest.useFakeTimers());
afterEach(() => {
  TestBed.resetTestingModule();
  jest.useRealTimers();
});

describe('keepLive', () => {
  it('given changes close together, asks once, and says them once they are shown', () => {
    const { answer, hear, pass, refreshed, said } = set();
    const [first, second] = [jobs('HAV'), jobs('ULV')];
    hear(first);
    hear(second);
    pass(700);
    expect(refreshed()).toBe(1);
    expect(said).toEqual([]);
    answer();
    expect(said).toEqual([[first, second]]);
  });

  it('given the person’s own change, asks as for any other', () => {
    const { hear, pass, refreshed } = set();
    hear({ ...jobs('HAV'), own: true });
    pass(700);
    expect(refreshed()).toBe(1);
  });

  it('given further changes, asks at most once in ten seconds', () => {
    const { answer, hear, pass, refreshed } = set();
    hear(jobs('HAV'));
    pass(700);
    answer();
    for (let second = 0; second < 9; second += 1) {
      hear(jobs('HAV'));
      pass(1_000);
    }
    expect(refreshed()).toBe(1);
    pass(1_000);
    expect(refreshed()).toBe(2);
  });

  it('given changes of another kind or outside the page’s scope, asks nothing', () => {
    const { hear, pass, refreshed, scope } = set();
    hear(claims('HAV'));
    scope.branches.set(['ULV']);
    hear(jobs('HAV'));
    scope.branches.set([]);
    scope.regions.set(['SO']);
    hear(jobs('HAV'));
    pass(30_000);
    expect(refreshed()).toBe(0);
    hear(jobs('ULV'));
    pass(700);
    expect(refreshed()).toBe(1);
  });

  it('given a person in the middle of something, waits until they are done', () => {
    const { hear, pass, person, refreshed } = set();
    person.busy = true;
    hear(jobs('HAV'));
    pass(60_000);
    expect(refreshed()).toBe(0);
    person.busy = false;
    pass(1_000);
    expect(refreshed()).toBe(1);
  });

  it('given that changes may have been missed, asks and says nothing', () => {
    const { answer, hear, pass, refreshed, said } = set();
    hear('anew');
    pass(700);
    expect(refreshed()).toBe(1);
    answer();
    expect(said.flat()).toEqual([]);
  });

  it('given no answer, tries again later and says nothing before', () => {
    const { answer, hear, pass, refreshed, said } = set();
    const first = jobs('HAV');
    hear(first);
    pass(700);
    answer('in vain');
    expect(said).toEqual([]);
    pass(10_000);
    expect(refreshed()).toBe(2);
    answer();
    expect(said).toEqual([[first]]);
  });

  it('given an answer under way that somebody asked for, waits for it', () => {
    const { asking, answer, hear, pass, refreshed, said } = set();
    asking.set(true);
    hear(jobs('HAV'));
    pass(5_000);
    expect(refreshed()).toBe(0);
    answer();
    expect(said).toEqual([]);
    pass(1_000);
    expect(refreshed()).toBe(1);
  });

  it('given a page that was left, asks nothing', () => {
    const { hear, refreshed } = set();
    hear(jobs('HAV'));
    TestBed.resetTestingModule();
    jest.advanceTimersByTime(60_000);
    expect(refreshed()).toBe(0);
  });
});
