import { signal } from '@angular/core';
import { EmptyNext } from './empty-next';
import { openPage } from '../../testing/open-page';

const KNOWN = { branches: [{ code: 'HAV' }], packages: [{ code: 'full' }] };

async function open(jobs: number, known: object = KNOWN) {
  const { http, settle, host } = await openPage(EmptyNext, {
    url: '/jobs?branch=HAV&q=nothing&last=4',
    role: 'site_manager',
    catalogue: { value: signal(known) },
  });
  const request = http.expectOne(({ url }) => url.startsWith('/api/jobs'));
  request.flush({ items: [], nextCursor: null, jobs });
  await settle();
  return { host, asked: new URL(request.request.urlWithParams, 'http://app') };
}

describe('EmptyNext', () => {
  it('no car in the chosen branch, says what to do there, and asks for its cars of all dates', async () => {
    const { host, asked } = await open(0);
    expect([...asked.searchParams]).toEqual([
      ['branch', 'HAV'],
      ['limit', '1'],
    ]);
    const links = [...host.querySelectorAll('a')].map((link) => link.getAttribute('href'));
    expect(links).toEqual(['/send?branch=HAV', '/import?branch=HAV']);
  });

  it('cars there are, keeps silent', async () => {
    const { host } = await open(7);
    expect(host.textContent.trim()).toBe('');
  });

  it('no branch at all, sends a site manager to head office', async () => {
    const { host } = await open(0, { branches: [], packages: [] });
    expect(host.textContent).toContain('Ask head office');
    expect(host.querySelector('a')).toBeNull();
  });
});
