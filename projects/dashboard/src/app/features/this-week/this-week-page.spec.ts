import { type HttpTestingController } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { listSignals } from '#shared/contracts/signals';
import type { OutOf } from '#shared/contracts/endpoint';
import type { Role } from '#shared/domain/vocabulary';
import {
  jobRow,
  jobsAnswer,
  marginAnswer,
  marginWeek,
  unbilledRow,
  weeksFromTo,
} from '../../testing/week-answers';
import { openPage } from '../../testing/open-page';
import { dangerSignal, signalList, signalOf } from '../../testing/signal-answers';
import { ThisWeekPage } from './this-week-page';

async function open(role: Role, url = '/this-week?branch=HAV') {
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

async function answerAll(
  page: Awaited<ReturnType<typeof open>>,
  signals: OutOf<typeof listSignals> = signalList([]),
): Promise<void> {
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
    } else call.flush(url.pathname === '/api/signals' ? signals : { items: [] });
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

  it('with open signals in scope: a line below the answer says them and leads to the branch’s', async () => {
    const page = await open('site_manager');
    const [question] = asked(page.http).filter(({ path }) => path === '/api/signals');
    expect(question?.query).toEqual({ branch: 'HAV', state: 'open', limit: '200' });
    TestBed.resetTestingModule();
    const again = await open('site_manager', '/this-week');
    await answerAll(again, signalList([dangerSignal(1), signalOf(2)]));
    await answerAll(again);
    const line = again.host.querySelector('us-answer + .signals');
    expect(line?.textContent?.trim().replace(/\s+/g, ' ')).toBe(
      '2 open signals: dangerous rot left on cars is past its day and cars wait for their bill.',
    );
    expect(line?.querySelector('a')?.getAttribute('href')).toBe('/signals?branch=HAV&state=open');
  });

  it('with no open signal, or none that could be read: no line, and the page as ever', async () => {
    for (const trouble of [false, true]) {
      const page = await open('regional_lead');
      if (trouble) {
        page.http
          .expectOne(({ url }) => url === '/api/signals' || url.startsWith('/api/signals?'))
          .flush(null, { status: 500, statusText: 'Failed' });
      }
      await answerAll(page);
      await answerAll(page);
      expect(page.host.querySelector('h1')?.textContent).toContain('Week 5 kept');
      expect(page.host.querySelector('.signals')).toBeNull();
      TestBed.resetTestingModule();
    }
  });

  it('with signals that do not come: the answer does not wait for them', async () => {
    const page = await open('head_office');
    const held = page.http.expectOne(({ url }) => url.startsWith('/api/signals'));
    await answerAll(page);
    await answerAll(page);
    expect(page.host.querySelector('h1')?.textContent).toContain('Week 5 kept');
    held.flush(signalList([signalOf(2)]));
    await page.settle();
    expect(page.host.querySelector('.signals')?.textContent).toContain('1 open signal');
  });

  it('a recorder: is not asked signals for', async () => {
    const { http } = await open('recorder');
    expect(asked(http).map(({ path }) => path)).not.toContain('/api/signals');
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
