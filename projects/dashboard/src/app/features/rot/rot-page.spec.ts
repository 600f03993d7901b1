import { TestBed } from '@angular/core/testing';
import { Router } from '@angular/router';
import type { RotAnswer } from '#shared/contracts/rot';
import { emptyRotAnswer, rotAnswer, rotModel } from '../../testing/rot-answers';
import { openPage } from '../../testing/open-page';
import { UndersideMap } from '../../underside-map/underside-map';
import { RotPage } from './rot-page';

async function open(url = '/rot?region=OC') {
  const catalogue = { regionName: (code: string) => `Region ${code}` };
  return openPage(RotPage, { url, catalogue });
}

async function answered(answer: RotAnswer, age?: string) {
  const page = await open();
  if (age) page.fixture.componentRef.setInput('age', age);
  page.http.expectOne(({ url }) => url.startsWith('/api/analytics/rot')).flush(answer);
  await page.settle();
  return page;
}

const words = (host: HTMLElement, of: string) =>
  host.querySelector(of)?.textContent?.replaceAll('\u202f', ' ') ?? '';

describe('RotPage', () => {
  // jsdom knows no media queries: a wide window.
  beforeAll(() => {
    Object.defineProperty(window, 'matchMedia', {
      configurable: true,
      value: () => ({ matches: false, addEventListener() {}, removeEventListener() {} }),
    });
  });

  it('opened: asks for the scope of the URL', async () => {
    const { http } = await open();
    const { request } = http.expectOne(({ url }) => url.startsWith('/api/analytics/rot'));
    const url = new URL(request.urlWithParams, 'http://app');
    expect(url.searchParams.get('region')).toBe('OC');
    expect(url.searchParams.get('to')).toBe('2026-02-02');
  });

  it('answered without an age in the URL: speaks of the age with most rot, its button checked, its models in rows', async () => {
    const { host } = await answered(rotAnswer());
    expect(words(host, 'h1')).toContain('42 % of cars aged 10–14 had rot');
    const radios = [...host.querySelectorAll<HTMLInputElement>('input[type=radio]')];
    expect(radios.filter(({ checked }) => checked).map(({ value }) => value)).toEqual(['10-14']);
    const rows = [...host.querySelectorAll('us-models-table tbody tr')];
    expect(rows.map((row) => row.querySelector('a')?.textContent?.trim())).toEqual([
      'Velder Tessock',
      'Velder Mote',
      'Velder Aske',
    ]);
    const link = new URL(rows[0]!.querySelector('a')!.href);
    expect(Object.fromEntries(link.searchParams)).toEqual({
      region: 'OC',
      from: '2025-08-04',
      to: '2026-02-01',
      hasRot: 'true',
      ageBand: '10-14',
      make: 'Velder',
      model: 'Tessock',
    });
    expect(words(host, '.opened')).toContain('Of 312 bubbles worked, 178 opened');
  });

  it('another age pressed: goes into the URL, the rest of it kept', async () => {
    const { host, settle } = await answered(rotAnswer());
    host.querySelector<HTMLInputElement>('input[value="15-19"]')!.click();
    await settle();
    expect(TestBed.inject(Router).url).toBe('/rot?region=OC&age=15-19');
  });

  it('a place of the map pressed: leads to the cars with rot there', async () => {
    const { fixture, settle } = await answered(rotAnswer());
    const map = fixture.debugElement.query((one) => one.componentInstance instanceof UndersideMap);
    const { areas, chosen } = map.componentInstance as UndersideMap;
    chosen.emit(areas()[0]!);
    await settle();
    expect(TestBed.inject(Router).parseUrl(TestBed.inject(Router).url).queryParams).toMatchObject({
      ...{ region: 'OC', zone: 'sill_outer', side: 'left', ageBand: '10-14', hasRot: 'true' },
    });
  });

  it('more models than a dozen: the first dozen, then all', async () => {
    const models = Array.from({ length: 15 }, (_, index) => rotModel(`M${index}`, 20, index));
    const { host, settle } = await answered(rotAnswer({ models }));
    const rows = () => host.querySelectorAll('us-models-table tbody tr').length;
    expect(rows()).toBe(12);
    const all = [...host.querySelectorAll<HTMLButtonElement>('us-models-table button')].find(
      (button) => button.textContent?.includes('Show all 15'),
    );
    all!.click();
    await settle();
    expect(rows()).toBe(15);
  });

  it('too few cars of the age: says so, and the other ages stay to choose', async () => {
    const { host } = await answered(rotAnswer(), '20+');
    expect(words(host, 'h1')).toContain('Too few cars aged 20 and over yet');
    expect(host.querySelectorAll('input[type=radio]')).toHaveLength(5);
  });

  it('no car at all: why and what to do, no picture', async () => {
    const { host } = await answered(emptyRotAnswer());
    expect(words(host, 'h1')).toContain('No car was finished in this time.');
    expect(words(host, 'us-answer')).toContain('Choose a longer time');
    expect(host.querySelector('us-age-control, us-age-region-chart')).toBeNull();
  });

  it('the call fails: says so and offers to try again', async () => {
    const page = await open();
    page.http
      .expectOne(({ url }) => url.startsWith('/api/analytics/rot'))
      .flush(null, { status: 500, statusText: 'Failed' });
    await page.settle();
    expect(words(page.host, '[role=alert]')).toContain('Try again');
    expect(page.host.querySelector('us-answer')).toBeNull();
  });
});
