import { signal } from '@angular/core';
import { openPage } from '../../testing/open-page';
import {
  issuedReport,
  warrantyReport,
  warrantySchedule,
} from '../../testing/warranty-report-answers';
import { ReportsPage } from './reports-page';

// The whole report is compiled and drawn: slow on a busy machine.
jest.setTimeout(30_000);

async function open(url: string) {
  return openPage(ReportsPage, { url, catalogue: { currency: signal('EUR') } });
}

async function answer(
  { http, settle }: Awaited<ReturnType<typeof open>>,
  issued = [issuedReport()],
): Promise<string[]> {
  const calls = http.match(() => true);
  for (const { request, flush } of calls.map((call) => ({
    request: call.request,
    flush: call.flush.bind(call),
  }))) {
    if (request.url.includes('schedule')) flush(warrantySchedule());
    else if (request.url.includes('reports')) flush({ items: issued, nextCursor: null });
    else flush(warrantyReport());
  }
  await settle();
  return calls.map(({ request }) => request.urlWithParams);
}

describe('ReportsPage', () => {
  it('opened for a day, asks for the report of that day, the issued ones and the schedule', async () => {
    const page = await open('/warranty/reports?asOf=2026-02-01');
    expect(await answer(page)).toEqual(
      expect.arrayContaining([
        expect.stringMatching(/^\/api\/warranty-report\?asOf=2026-02-01$/),
        expect.stringMatching(/^\/api\/warranty-reports\?/),
        '/api/warranty-schedule',
      ]),
    );
  });

  it('answered, says what the report says, lists what was issued, and shows the draft', async () => {
    const page = await open('/warranty/reports');
    await answer(page);
    const { host } = page;
    expect(host.querySelector('h1')?.textContent).toContain('will still cost about €5,000');
    expect(host.querySelector('us-data-table')?.textContent).toContain('by Runa Estvik');
    expect(host.querySelector('us-data-table a')?.getAttribute('href')).toBe('/warranty/reports/3');
    expect(host.querySelector('.pair')?.textContent).toContain('Due next on');
    expect(host.querySelector('article')?.textContent).toContain('Draft: not issued');
  });

  it('nothing issued yet, says what issuing is', async () => {
    const page = await open('/warranty/reports');
    await answer(page, []);
    expect(page.host.querySelector('.issued')?.textContent).toContain('kept unchanged');
  });

  it('the report refused, says why and still lists what was issued', async () => {
    const page = await open('/warranty/reports?asOf=2030-01-01');
    for (const call of page.http.match(({ url }) => url.startsWith('/api/warranty-report?'))) {
      call.flush(
        { detail: 'A day to come cannot be told of.' },
        { status: 422, statusText: 'Unprocessable' },
      );
    }
    await answer(page);
    expect(page.host.querySelector('[role=alert]')?.textContent).toContain('A day to come');
    expect(page.host.querySelector('us-data-table')).not.toBeNull();
    expect(page.host.querySelector('article')).toBeNull();
  });
});
