import { signal } from '@angular/core';
import type { Role } from '#shared/domain/vocabulary';
import { comeBackList, comeBackRow } from '../../testing/come-back-answers';
import { openPage } from '../../testing/open-page';
import { ComeBacksPage } from './come-backs-page';

async function open(role: Role, url = '/come-backs?branch=HAV', status?: string) {
  const { http, settle, host } = await openPage(ComeBacksPage, {
    url,
    role,
    catalogue: { branches: signal([{ code: 'HAV' }]), branchName: (code: string) => code },
    inputs: status ? { status } : {},
  });
  const answer = async (body: object): Promise<URL> => {
    const request = http.expectOne(({ url: asked }) => asked.startsWith('/api/come-back'));
    request.flush(body);
    await settle();
    return new URL(request.request.urlWithParams, 'http://app');
  };
  const press = async (words: RegExp): Promise<void> => {
    const buttons = [...host.querySelectorAll('button')];
    buttons.find((button) => words.test(button.textContent))!.click();
    await settle();
  };
  return { http, host, settle, answer, press };
}
const rowsOf = (host: HTMLElement): number =>
  host.querySelectorAll('us-come-back-rows tbody').length;
const many = (from: number, count: number) =>
  Array.from({ length: count }, (_, index) => comeBackRow(`J${from + index}`));

describe('ComeBacksPage', () => {
  it('opened: asks for the scope of the URL, without dates, and shows the answer over the rows', async () => {
    const { host, answer } = await open('site_manager');
    const url = await answer(comeBackList([comeBackRow('0417')]));
    expect([...url.searchParams]).toEqual([
      ['branch', 'HAV'],
      ['limit', '200'],
    ]);
    expect(host.querySelector('h1')?.textContent).toContain('dangerous finding is still on a car');
    expect(rowsOf(host)).toBe(1);
  });

  it('narrowed in the URL: asks for that status alone', async () => {
    const { answer } = await open('head_office', '/come-backs?status=booked', 'booked');
    const url = await answer(comeBackList([]));
    expect(url.searchParams.getAll('status')).toEqual(['booked']);
  });

  it('nothing left: says so, with neither picture nor rows', async () => {
    const { host, answer } = await open('site_manager');
    await answer(comeBackList([]));
    expect(host.querySelector('h1')?.textContent).toContain('No finding is left on a car here.');
    expect(host.querySelector('us-wait-dots-chart')).toBeNull();
    expect(rowsOf(host)).toBe(0);
  });

  it('more than fit: shows 50, then what was fetched, then fetches on, each finding once', async () => {
    const { host, answer, press } = await open('site_manager');
    await answer(comeBackList(many(0, 60), { nextCursor: 'next', findings: 70 }));
    expect(rowsOf(host)).toBe(50);
    await press(/^\s*Show more, 20 further findings/);
    const url = await answer(comeBackList(many(59, 11), { findings: 70 }));
    expect(url.searchParams.get('cursor')).toBe('next');
    expect(rowsOf(host)).toBe(70);
    expect(host.textContent).not.toContain('Show more');
  });

  it('a regional lead: sees the marks and no form', async () => {
    const { http, host, answer, press, settle } = await open('regional_lead');
    const row = comeBackRow('0417', { status: 'contacted' });
    await answer(comeBackList([row]));
    await press(/^\s*Marks/);
    const change = { status: 'contacted', dueOn: null, note: 'rang', ownerToldOn: '2025-11-04' };
    http.expectOne('/api/branches/HAV/come-back/0417/sill_inner%2Fleft%2F1').flush({
      ...row,
      changes: [{ ...change, changedBy: 'Ilse', changedAt: '2025-11-04T08:00:00Z' }],
    });
    await settle();
    expect(host.querySelector('us-come-back-form')).toBeNull();
    expect(host.querySelector('us-come-back-history')?.textContent).toContain('rang');
  });

  it('the list cannot be read: says so and offers to try again', async () => {
    const { http, host, settle } = await open('site_manager');
    http
      .expectOne(({ url }) => url.startsWith('/api/come-back'))
      .flush({}, { status: 500, statusText: 'Server error' });
    await settle();
    expect(host.querySelector('[role=alert]')?.textContent).toContain('Try again');
  });
});
