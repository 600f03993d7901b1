import { signal } from '@angular/core';
import { Router } from '@angular/router';
import { TestBed } from '@angular/core/testing';
import {
  branchesAnswer as contract,
  branchWeeksAnswer as weeksContract,
  sideBySideAnswer as besideContract,
  type BranchesAnswer,
} from '#shared/contracts/branches';
import type { Role } from '#shared/domain/vocabulary';
import {
  branchesAnswer,
  branchStanding,
  branchWeeks,
  branchWeeksAnswer,
  fewCars,
  sideBySideAnswer,
} from '../../testing/branches-answers';
import { openPage } from '../../testing/open-page';
import { BranchesPage } from './branches-page';

// The whole page is compiled and drawn: slow on a busy machine.
jest.setTimeout(120_000);

const TWO = branchesAnswer([
  branchStanding('HAV'),
  branchStanding('SKU', { value: 1.35, flag: 'above_998' }),
  fewCars('TEG'),
]);

async function open(
  url = '/branches',
  inputs: Record<string, unknown> = {},
  role: Role = 'regional_lead',
) {
  const same = (code: string): string => code;
  return openPage(BranchesPage, {
    url,
    inputs,
    role,
    catalogue: {
      value: signal({ branches: [] }),
      branches: signal([
        { code: 'SKU', region: 'SOUND', openedOn: '2020-03-02' },
        { code: 'HAV', region: 'SOUND', openedOn: '2019-12-09' },
      ]),
      branchName: same,
      productName: same,
    },
  });
}

type Page = Awaited<ReturnType<typeof open>>;

async function answered(answer: BranchesAnswer, url?: string, inputs?: Record<string, unknown>) {
  const page = await open(url, inputs);
  for (const call of page.http.match(({ url: at }) => at.includes('/branches?')))
    call.flush(answer);
  await page.settle();
  for (const call of page.http.match(({ url: at }) => at.includes('/weeks?'))) {
    call.flush(branchWeeksAnswer([branchWeeks('HAV'), branchWeeks('SKU')]));
  }
  for (const call of page.http.match(({ url: at }) => at.includes('/side-by-side?'))) {
    call.flush(sideBySideAnswer());
  }
  await page.settle();
  return page;
}

const text = (element: Element | null): string =>
  element?.textContent?.replace(/\s+/g, ' ').trim() ?? '';
const asked = ({ http }: Page): [string, string][] => {
  const [call] = http.match(({ url }) => url.includes('/branches?'));
  return [...new URL(call!.request.urlWithParams, 'http://app').searchParams];
};

describe('BranchesPage', () => {
  it('the answers of these specs: are what the contracts describe', () => {
    expect(contract.safeParse(TWO).error).toBeUndefined();
    expect(besideContract.safeParse(sideBySideAnswer()).error).toBeUndefined();
    const weeks = branchWeeksAnswer([branchWeeks('HAV')]);
    expect(weeksContract.safeParse(weeks).error).toBeUndefined();
  });

  it('opened: asks for overrun in the last weeks', async () => {
    expect(asked(await open())).toEqual([
      ['from', '2025-08-11'],
      ['to', '2026-02-02'],
      ['measure', 'overrun'],
    ]);
  });

  it('claims: ask for all cars since the first branch opened, or for the days chosen', async () => {
    expect(asked(await open('/branches?measure=claims', { measure: 'claims' }))).toEqual([
      ['from', '2019-12-09'],
      ['measure', 'claims'],
    ]);
    TestBed.resetTestingModule();
    const url = '/branches?measure=claims&from=2025-01-01&to=2025-06-30';
    expect(asked(await open(url, { measure: 'claims' }))).toEqual([
      ['from', '2025-01-01'],
      ['to', '2025-06-30'],
      ['measure', 'claims'],
    ]);
  });

  it('answered: sentence, funnel, a small picture each, rows by name with the words of where they stand', async () => {
    const { host } = await answered(TWO);
    expect(text(host.querySelector('h1'))).toContain('1 of 2 branches stands outside the funnel');
    expect(host.querySelector('us-funnel-chart')).not.toBeNull();
    expect(host.querySelectorAll('us-week-strip-chart')).toHaveLength(2);
    const rows = [...host.querySelectorAll('us-data-table tbody tr')].map(text);
    expect(rows).toHaveLength(3);
    expect(rows[0]).toContain('as expected');
    expect(rows[1]).toContain('above, outside the 99.8 % limits');
    expect(rows[2]).toContain('too few cars yet');
    expect(host.querySelector('us-step-table')).toBeNull();
    expect(text(host)).toContain('CSV of these 3 rows');
  });

  it('two in the address: are laid side by side with what makes the difference', async () => {
    const { host } = await answered(TWO, '/branches?with=HAV,SKU', { with: 'HAV,SKU' });
    expect(text(host.querySelector('.finding'))).toContain('SKU lies 12 points above HAV; refit');
    expect(text(host.querySelector('us-step-table'))).toContain('the whole network');
  });

  it('a measure chosen: goes into the address', async () => {
    const { host, settle } = await answered(TWO);
    const chips = [...host.querySelectorAll<HTMLElement>('.measures button')];
    chips.find((chip) => text(chip).includes('Margin'))?.click();
    await settle();
    expect(TestBed.inject(Router).url).toBe('/branches?measure=margin');
  });

  it('no car: says so, with no picture', async () => {
    const { host } = await answered(branchesAnswer([]));
    expect(text(host.querySelector('h1'))).toContain('No car');
    expect(host.querySelector('us-funnel-chart')).toBeNull();
    expect(host.querySelector('.rows')).toBeNull();
  });

  it('refused: says what happened and offers another try', async () => {
    const page = await open();
    const [call] = page.http.match(({ url }) => url.includes('/branches?'));
    call!.flush('', { status: 503, statusText: 'Service Unavailable' });
    await page.settle();
    expect(page.host.querySelector('[role=alert] button')).not.toBeNull();
  });

  it('a site manager: is not led to targets', async () => {
    expect(text((await open('/branches', {}, 'site_manager')).host)).not.toContain('Targets');
    TestBed.resetTestingModule();
    expect(text((await open()).host)).toContain('Targets');
  });
});
