import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import { Catalogue } from '../catalogue/catalogue';
import { datesOf, ScopeState } from './scope-state';

function set(today: string | undefined) {
  TestBed.configureTestingModule({
    providers: [
      provideRouter([{ path: '**', children: [] }]),
      { provide: Catalogue, useValue: { today: signal(today) } },
    ],
  });
  return { router: TestBed.inject(Router), scope: TestBed.inject(ScopeState) };
}

describe('datesOf', () => {
  it('of the last 26 weeks begins on the Monday 25 weeks before this one', () => {
    // 2026-02-04 is a Wednesday; its Monday is 2026-02-02, 25 weeks before is 2025-08-11.
    expect(datesOf({ kind: 'last', weeks: 26 }, '2026-02-04')).toEqual({
      from: '2025-08-11',
      to: '2026-02-04',
    });
  });
});

describe('ScopeState', () => {
  it('before today is known has no query, so that nothing is asked for twice', () => {
    expect(set(undefined).scope.query()).toBeUndefined();
  });

  it('on an empty URL takes the last 26 weeks and the last week that is over', () => {
    const { scope } = set('2026-02-04');
    expect(scope.query()).toEqual({ from: '2025-08-11', to: '2026-02-04' });
    expect(scope.week()).toBe('2026-W05');
  });

  it('on a Monday the week that ended yesterday is the last that is over', () => {
    expect(set('2026-02-02').scope.week()).toBe('2026-W05');
  });

  it('of a URL asks for what it says', async () => {
    const { router, scope } = set('2026-02-04');
    await router.navigateByUrl(
      '/overruns?branch=HAV&branch=TAN&package=full&from=2026-01-01&to=2026-01-31',
    );
    expect(scope.query()).toEqual({
      branch: ['HAV', 'TAN'],
      package: ['full'],
      from: '2026-01-01',
      to: '2026-01-31',
    });
  });

  it('of a page of all cars, asks for dates only where the URL says some, and for the day as of which', async () => {
    const { router, scope } = set(undefined);
    expect(scope.completedQuery()).toEqual({});
    await router.navigateByUrl(
      '/warranty?branch=HAV&asOf=2025-12-31&from=2024-01-01&to=2024-06-30',
    );
    expect(scope.completedQuery()).toEqual({
      branch: ['HAV'],
      from: '2024-01-01',
      to: '2024-06-30',
      asOf: '2025-12-31',
    });
  });

  it('of a page of all cars with weeks chosen, waits for today', async () => {
    const { router, scope } = set(undefined);
    await router.navigateByUrl('/warranty?last=13');
    expect(scope.completedQuery()).toBeUndefined();
  });

  it('changed writes the URL, keeps what else stands in it, and drops the page of a list', async () => {
    const { router, scope } = set('2026-02-04');
    await router.navigateByUrl('/jobs?q=velder&cursor=abc&region=NO');
    await scope.change({ regions: [], branches: ['HAV'] });
    expect(router.url).toBe('/jobs?q=velder&branch=HAV');
    expect(scope.filters()).toEqual({ branch: ['HAV'] });
  });
});
