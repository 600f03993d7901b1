import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { HttpTestingController } from '@angular/common/http/testing';
import { openPage } from '../../testing/open-page';
import { BranchPage } from './branch-page';
import { ProductSetUpPage } from './product-page';

const BRANCH = {
  code: 'HAV',
  name: 'Havnsund',
  region: 'SO',
  timeZone: 'Europe/Copenhagen',
  openedOn: '2019-04-01',
  closedOn: null,
  targetMarginShare: null,
};
const PRODUCT = { code: 'CW1', name: 'Cavity wax', kind: 'cavity_wax' };
const CATALOGUE = {
  currency: signal('EUR'),
  branches: signal([BRANCH]),
  regions: signal([{ code: 'SO', name: 'Sound', climate: null }]),
  value: signal({ products: [PRODUCT] }),
  state: {
    value: signal({}),
    problem: signal(undefined),
    loading: signal(false),
    refreshing: signal(false),
    reload: jest.fn(),
  },
};
const COSTS = { fees: [], products: [], consumables: [] };

describe('BranchPage', () => {
  it('a branch without an hourly cost, says what that means and offers its opening as the first day', async () => {
    const { http, host, settle } = await openPage(BranchPage, {
      url: '/set-up/branches/HAV',
      catalogue: CATALOGUE,
      inputs: { code: 'HAV' },
    });
    http.expectOne('/api/costs').flush({ ...COSTS, rates: [] });
    http.expectOne('/api/branches/HAV/keys').flush({ items: [] });
    await settle();
    await settle();
    expect(host.textContent).toContain('No hourly cost yet');
    const [from] = [...host.querySelectorAll<HTMLInputElement>('form[aria-label^=Hourly] input')];
    expect(from?.value).toBe('2019-04-01');
  });

  it('a new key, is shown with the word that it is shown only now', async () => {
    const { http, host, settle } = await openPage(BranchPage, {
      url: '/set-up/branches/HAV',
      catalogue: CATALOGUE,
      inputs: { code: 'HAV' },
    });
    http.expectOne('/api/costs').flush({ ...COSTS, rates: [] });
    http.expectOne('/api/branches/HAV/keys').flush({ items: [] });
    await settle();
    const form = host.querySelector('form[aria-label="A new push key"]')!;
    const label = form.querySelector('input')!;
    label.value = 'the till';
    label.dispatchEvent(new Event('input'));
    form.dispatchEvent(new Event('submit'));
    await settle();
    http
      .expectOne({ method: 'POST', url: '/api/branches/HAV/keys' })
      .flush(
        { id: 'k1', label: 'the till', key: 'usk_k1_secret' },
        { status: 201, statusText: 'Made' },
      );
    await settle();
    http.expectOne({ method: 'GET', url: '/api/branches/HAV/keys' }).flush({ items: [] });
    await settle();
    expect(host.textContent).toContain('shown only now');
    expect(host.textContent).toContain('usk_k1_secret');
  });
});

describe('BranchKeys', () => {
  const KEY = { id: 'k1', label: 'the till', createdAt: '2026-01-02T08:00:00Z', lastUsedAt: null };

  it('revoke, pressed once, asks again; pressed again, revokes', async () => {
    const { http, host, settle } = await openPage(BranchPage, {
      url: '/set-up/branches/HAV',
      catalogue: CATALOGUE,
      inputs: { code: 'HAV' },
    });
    http.expectOne('/api/costs').flush({ ...COSTS, rates: [] });
    http.expectOne('/api/branches/HAV/keys').flush({ items: [{ ...KEY, revokedAt: null }] });
    await settle();
    await settle();
    const press = async (name: string): Promise<void> => {
      host
        .querySelector<HTMLButtonElement>(`button[aria-label="${name} the key for the till"]`)!
        .click();
      await settle();
    };
    await press('Revoke:');
    expect(host.textContent).toContain('can send no more');
    http.expectNone({ method: 'DELETE' });
    await press('Revoke for good:');
    http.expectOne({ method: 'DELETE', url: '/api/branches/HAV/keys/k1' });
  });
});

describe('ProductSetUpPage', () => {
  it('taken out while something refers to it, says what does and stays', async () => {
    const { http, host, settle } = await openPage(ProductSetUpPage, {
      url: '/set-up/products/CW1',
      catalogue: CATALOGUE,
      inputs: { code: 'CW1' },
    });
    http.expectOne('/api/costs').flush({ ...COSTS, rates: [] });
    await settle();
    const take = [...host.querySelectorAll('button')].find((one) =>
      one.textContent.includes('Take Cavity wax out'),
    );
    take!.click();
    await settle();
    TestBed.inject(HttpTestingController)
      .expectOne({ method: 'DELETE', url: '/api/products/CW1' })
      .flush(
        { type: 'about:blank', title: 'Conflict', status: 409, detail: '312 jobs list it' },
        { status: 409, statusText: 'Conflict' },
      );
    await settle();
    expect(host.textContent).toContain('312 jobs list it.');
  });
});
