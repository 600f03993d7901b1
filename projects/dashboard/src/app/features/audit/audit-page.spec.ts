import { signal } from '@angular/core';
import type { AuditEvent } from '#shared/contracts/audit';
import { openPage } from '../../testing/open-page';
import { AuditPage } from './audit-page';

const name = (code: string): string => code;
const EVENT: AuditEvent = {
  id: 9,
  at: '2026-02-02T06:31:05Z',
  actor: 'manager@underseam.example',
  address: '127.0.0.1',
  action: 'job.correct',
  subject: '/branches/HAV/jobs/0417',
  branch: 'HAV',
  changes: [{ path: '/actual/stages/repair', before: 60, after: 95 }],
  detail: { revision: 2 },
};

async function open(inputs: Record<string, string> = {}) {
  const page = await openPage(AuditPage, {
    url: '/audit',
    role: 'head_office',
    inputs,
    catalogue: {
      branches: signal([{ code: 'HAV', name: 'Havnsund' }]),
      currency: signal('EUR'),
      branchName: (code: string) => (code === 'HAV' ? 'Havnsund' : code),
      regionName: name,
      productName: name,
      packageName: name,
    },
  });
  const asked = () => page.http.expectOne(({ url }) => url.startsWith('/api/audit?'));
  const press = async (words: string) => {
    [...page.host.querySelectorAll('button')]
      .find((button) => button.textContent.trim() === words)!
      .click();
    await page.settle();
  };
  return { ...page, asked, press };
}

describe('AuditPage', () => {
  it('of an event, says who did what to what and from where; opened, what changed', async () => {
    const { host, asked, settle, press } = await open();
    asked().flush({ items: [EVENT], nextCursor: null });
    await settle();
    const row = host.querySelector('us-event-row')!;
    expect(row.textContent.replace(/\s+/g, ' ')).toContain(
      'manager@underseam.example corrected a job: job 0417, Havnsund',
    );
    await press('Open');
    const cells = [...row.querySelectorAll('tbody :is(th, td)')].map((cell) => cell.textContent);
    expect(cells).toEqual(['repair: worked', '1\u202fh', '1\u202fh 35\u202fmin']);
    expect(row.querySelector('dl')?.textContent).toContain('revision');
  });

  it('given filters in the URL, asks for those alone and says them', async () => {
    const { host, asked } = await open({
      actor: 'manager@underseam.example',
      action: 'job.void',
      branch: 'HAV',
      from: '2026-01-01',
      to: 'yesterday',
    });
    expect(asked().request.urlWithParams).toBe(
      '/api/audit?from=2026-01-01&actor=manager%40underseam.example&action=job.void&branch=HAV&limit=50',
    );
    const line = host.querySelector('us-filter-line')!.textContent;
    for (const words of ['since', 'manager@underseam.example', 'voided a job', 'Havnsund']) {
      expect(line).toContain(words);
    }
  });

  it('asked for earlier ones, adds them below by the cursor', async () => {
    const { host, http, asked, settle, press } = await open();
    asked().flush({ items: [EVENT], nextCursor: 'next' });
    await settle();
    await press('Show earlier ones');
    http
      .expectOne(({ url }) => url.endsWith('cursor=next'))
      .flush({ items: [{ ...EVENT, id: 8 }], nextCursor: null });
    await settle();
    expect(host.querySelectorAll('us-event-row')).toHaveLength(2);
    expect(host.textContent).toContain('No earlier ones.');
  });

  it('asked to check the chain, says that it fits', async () => {
    const { host, http, asked, settle, press } = await open();
    asked().flush({ items: [], nextCursor: null });
    await settle();
    await press('Check the chain');
    http.expectOne('/api/audit/check').flush({
      events: 9,
      since: '2026-01-01T08:00:00Z',
      brokenAt: null,
      lastHash: 'ab'.repeat(32),
      checkedAt: '2026-02-02T06:31:00Z',
    });
    await settle();
    expect(host.querySelector('h1')?.textContent).toContain('the chain fits');
  });
});
