import { signal } from '@angular/core';
import { Router } from '@angular/router';
import { TestBed } from '@angular/core/testing';
import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { warrantyAnswer as contract } from '#shared/contracts/warranty';
import { openPage } from '../../testing/open-page';
import { branchWarrantyAnswer, noWarranty, warrantyAnswer } from '../../testing/warranty-answers';
import { WarrantyPage } from './warranty-page';

// The whole page is compiled and drawn: slow on a busy machine.
jest.setTimeout(60_000);

async function open(url = '/warranty', inputs: Readonly<Record<string, unknown>> = {}) {
  const same = (code: string): string => code;
  return openPage(WarrantyPage, {
    url,
    inputs,
    role: 'head_office',
    catalogue: {
      currency: signal('EUR'),
      branchName: same,
      regionName: same,
      packageWord: same,
    },
  });
}

async function answered(answer: WarrantyAnswer, url?: string) {
  const page = await open(url);
  for (const call of page.http.match(({ url: asked }) => asked.includes('/analytics/warranty'))) {
    call.flush(answer);
  }
  await page.settle();
  return page;
}

const text = (element: Element | null): string =>
  element?.textContent?.replace(/\s+/g, ' ').trim() ?? '';

describe('WarrantyPage', () => {
  it('the answers of these specs: are what the contract describes', () => {
    for (const answer of [warrantyAnswer(), branchWarrantyAnswer(), noWarranty()]) {
      expect(contract.safeParse(answer).error).toBeUndefined();
    }
  });

  it('opened: asks for all cars, as of the day and by the groups of the URL', async () => {
    const url = '/warranty?branch=HAV&asOf=2025-12-31&groupBy=ageBand&group=5-9&group=10-14';
    const { http } = await open(url, { groupBy: 'ageBand', group: ['5-9', '10-14'] });
    const [call] = http.match(() => true);
    const asked = new URL(call!.request.urlWithParams, 'http://app').searchParams;
    expect([...asked]).toEqual([
      ['branch', 'HAV'],
      ['asOf', '2025-12-31'],
      ['groupBy', 'ageBand'],
      ['group', '5-9'],
      ['group', '10-14'],
    ]);
  });

  it('answered: sentence, curves, half-years with the one that is unlike, branches, checks, zones and what is left out', async () => {
    const { host } = await answered(warrantyAnswer());
    expect(text(host.querySelector('h1'))).toContain('€77,000, give or take 14,000 (4,320 cars).');
    expect(text(host.querySelector('.second'))).toContain('TAN has 66 claims where 40');
    expect(text(host.querySelector('.curves'))).toContain('136 claims in 8,737 car-years of cover');
    const cohorts = host.querySelector('.cohorts')!;
    expect(text(cohorts)).toContain('2025 H1 above');
    expect(cohorts.querySelectorAll('us-paid-cell')).toHaveLength(4);
    expect(text(cohorts)).toContain('CSV of these 4 rows');
    expect(text(host.querySelector('.process'))).toContain('The last row is no check');
    expect(text(host.querySelector('.placed'))).toContain('bulkhead drain');
    expect(text(host.querySelector('.left'))).toContain('12 claims refused');
    expect(text(host.querySelector('.left'))).toContain('1 claim waits');
  });

  it('how it came about: shut at first; pressed, the triangle with its factors', async () => {
    const page = await answered(warrantyAnswer());
    expect(text(page.host)).not.toContain('sigma squared (in cents)');
    const button = [...page.host.querySelectorAll('.cohorts button')].find((one) =>
      text(one).startsWith('How this came about'),
    ) as HTMLButtonElement;
    button.click();
    await page.settle();
    expect(button.getAttribute('aria-expanded')).toBe('true');
    expect(text(page.host.querySelector('.cohorts'))).toContain('8.518700');
    expect(text(page.host.querySelector('.cohorts'))).toContain('CSV of the triangle');
  });

  it('other groups chosen: go into the URL, former ones leave it', async () => {
    const { fixture, settle } = await answered(warrantyAnswer(), '/warranty?group=full&branch=HAV');
    const page = fixture.componentInstance as unknown as { showBy(by: string): void };
    page.showBy('region');
    await settle();
    expect(TestBed.inject(Router).url).toBe('/warranty?branch=HAV&groupBy=region');
  });

  it('one branch and too few others: no picture of it against itself', async () => {
    const { host } = await answered(branchWarrantyAnswer({ reference: 'scope' }));
    expect(host.querySelector('.branches us-dot-interval-chart')).toBeNull();
    expect(text(host.querySelector('.branches'))).toContain('five other branches');
  });

  it('no car: why, and nothing drawn', async () => {
    const { host } = await answered(noWarranty());
    expect(text(host.querySelector('h1'))).toContain('No car was finished');
    expect(host.querySelector('.sheets')).toBeNull();
  });
});
