import { signal } from '@angular/core';
import { openPage } from '../../testing/open-page';
import { issuedReport, laterArrival, warrantyReport } from '../../testing/warranty-report-answers';
import { IssuedReportPage } from './issued-report-page';

jest.setTimeout(30_000);

async function open(later = [laterArrival()], laterCount = later.length) {
  const page = await openPage(IssuedReportPage, {
    url: '/warranty/reports/3',
    catalogue: { currency: signal('EUR') },
    inputs: { id: '3' },
  });
  page.http.expectOne('/api/warranty-reports/3').flush({
    issued: issuedReport(),
    report: warrantyReport(),
    later,
    laterCount,
    now: { covered: 2300, claims: 119, outstandingCents: 531_025, standardErrorCents: 70_700 },
  });
  await page.settle();
  return page;
}

describe('IssuedReportPage', () => {
  it('opened, says that it is as issued and unchanged, and shows it with its number', async () => {
    const { host } = await open();
    expect(host.querySelector('h1')?.textContent).toContain('Report 3 as issued on');
    expect(host.textContent).toContain('Nothing in it has changed since');
    expect(host.querySelector('article')?.textContent).toContain('Report 3, issued');
  });

  it('with a later claim, lists it with its way and shows then and now', async () => {
    const { host } = await open();
    expect(host.querySelector('li a')?.getAttribute('href')).toBe('/claims/TAN/c-9');
    expect(host.querySelector('.beside us-paper-table')?.textContent).toContain('+310');
  });

  it('with many, shows the first and the others when asked; of more than listed says how many', async () => {
    const later = Array.from({ length: 10 }, (_, at) => laterArrival({ ref: `c-${at}` }));
    const { host, settle } = await open(later, 300);
    const listed = () => host.querySelectorAll('.beside li').length;
    expect(listed()).toBe(8);
    const button = [...host.querySelectorAll('button')].find((one) =>
      one.textContent?.includes('Show the other 2'),
    );
    button?.click();
    await settle();
    expect(listed()).toBe(10);
    expect(host.textContent).toContain('Of 300 arrivals the last 10 are listed');
  });

  it('with its files, writes their SHA-256 beside them', async () => {
    const { host } = await open([]);
    expect(host.textContent).toContain('a'.repeat(64));
    expect(host.textContent).toContain('b'.repeat(64));
    expect(host.textContent).toContain('Nothing so far');
  });
});
