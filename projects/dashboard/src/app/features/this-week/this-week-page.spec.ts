import { type HttpTestingController } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import {
  jobRow,
  jobsAnswer,
  marginAnswer,
  marginWeek,
  unbilledRow,
  weeksFromTo,
} from '../../testing/week-answers';
import { openPage } from '../../testing/open-page';
import { ThisWeekPage } from './this-week-page';

async function open(role: 'site_manager' | 'regional_lead', url = '/this-week?branch=HAV') {
  return openPage(ThisWeekPage, {
    url,
    role,
    catalogue: {
      currency: signal('EUR'),
      branchName: (code: string) => code,
      packageName: (code: string) => code,
      productName: (code: string) => code,
    },
  });
}

/** The asked addresses with their parameters, in any order. */
function asked(http: HttpTestingController): { path: string; query: Record<string, string> }[] {
  return http
    .match(() => true)
    .map(({ request }) => new URL(request.urlWithParams, 'http://app'))
    .map((url) => ({ path: url.pathname, query: Object.fromEntries(url.searchParams) }));
}

async function answerAll(page: Awaited<ReturnType<typeof open>>): Promise<void> {
  for (const call of page.http.match(() => true)) {
    const url = new URL(call.request.urlWithParams, 'http://app');
    const month = url.searchParams.get('from') === '2025-07-28';
    if (url.pathname === '/api/analytics/margin') {
      call.flush(
        marginAnswer(month ? weeksFromTo('2025-W31', '2026-W05') : [marginWeek('2026-W05')]),
      );
    } else if (url.pathname === '/api/jobs') {
      const unbilled = url.searchParams.get('unbilled') === 'true';
      call.flush(jobsAnswer(unbilled ? [unbilledRow('0398', 19)] : [jobRow('0417')]));
    } else call.flush({ items: [] });
  }
  await page.settle();
}

describe('ThisWeekPage', () => {
  // jsdom knows no media queries: a wide window.
  beforeAll(() => {
    Object.defineProperty(window, 'matchMedia', {
      configurable: true,
      value: () => ({ matches: false, addEventListener() {}, removeEventListener() {} }),
    });
  });

  it('opened on a Monday: asks for the week that is over, as the last of 27, in the scope of the URL', async () => {
    const { http } = await open('site_manager');
    const calls = asked(http);
    const margins = calls.filter(({ path }) => path === '/api/analytics/margin');
    expect(margins.map(({ query }) => query)).toEqual([
      { branch: 'HAV', from: '2025-07-28', to: '2026-02-01' },
      { branch: 'HAV', from: '2026-01-26', to: '2026-02-01' },
    ]);
    const jobs = calls.filter(({ path }) => path === '/api/jobs').map(({ query }) => query);
    expect(jobs).toContainEqual(
      expect.objectContaining({ unbilled: 'false', from: '2026-01-26', to: '2026-02-01' }),
    );
    expect(jobs).toContainEqual(
      expect.objectContaining({ unbilled: 'true', sort: 'waiting', to: '2026-02-01' }),
    );
  });

  it('a week in the URL: that week is asked for', async () => {
    const { http } = await open('site_manager', '/this-week?week=2025-W52');
    const [, week] = asked(http).filter(({ path }) => path === '/api/analytics/margin');
    expect(week?.query).toEqual({ from: '2025-12-22', to: '2025-12-28' });
  });

  it('answered: the sentence, the rows with their total, and the unbilled car that a manager may bill', async () => {
    const page = await open('site_manager');
    await answerAll(page);
    await answerAll(page);
    const { host } = page;
    expect(host.querySelector('h1')?.textContent).toContain('Week 5 kept');
    expect(host.textContent).toContain('One more car is finished and not yet billed.');
    const rows = [...host.querySelectorAll('.cars tr')].map((row) => row.textContent);
    expect(rows[1]).toContain('0417');
    expect(rows.at(-1)).toContain('8,925');
    expect(host.querySelector('us-unbilled-cars')?.textContent).toContain('Bill it');
  });

  it('a regional lead: reads all of it and can neither bill nor write a note', async () => {
    const page = await open('regional_lead');
    await answerAll(page);
    await answerAll(page);
    expect(page.host.querySelector('us-unbilled-cars')?.textContent).toContain('0398');
    expect(page.host.textContent).not.toContain('Bill it');
    expect(page.host.textContent).not.toContain('Leave a note');
  });

  it('a call fails: says so and offers to try again', async () => {
    const page = await open('site_manager');
    for (const call of page.http.match(() => true)) {
      call.flush(null, { status: 500, statusText: 'Failed' });
    }
    await page.settle();
    expect(page.host.querySelector('[role=alert]')?.textContent).toContain('Try again');
    expect(page.host.querySelector('us-answer')).toBeNull();
  });
});
