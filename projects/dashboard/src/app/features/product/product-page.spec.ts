import { signal } from '@angular/core';
import { noProducts, productNeedAnswer, productsAnswer } from '../../testing/product-answers';
import { openPage } from '../../testing/open-page';
import { ProductPage } from './product-page';

// The whole page is compiled and drawn: slow on a busy machine.
jest.setTimeout(30_000);

async function open(product?: string) {
  return openPage(ProductPage, {
    url: '/product?branch=HAV',
    catalogue: {
      currency: signal('EUR'),
      value: signal({ products: [{ code: 'CW1', name: 'Cavity wax', kind: 'cavity_wax' }] }),
      branchName: (code: string) => code,
      packageWord: (code: string) => code,
      productName: (code: string) => (code === 'CW1' ? 'Cavity wax' : code),
    },
    inputs: { product },
  });
}

async function answer(
  page: Awaited<ReturnType<typeof open>>,
  products = productsAnswer(),
  need = productNeedAnswer(),
): Promise<void> {
  for (const call of page.http.match(() => true)) {
    call.flush(call.request.url.includes('product-need') ? need : products);
  }
  await page.settle();
}

describe('ProductPage', () => {
  it('opened: asks for use and need in the scope of the URL', async () => {
    const { http } = await open();
    const asked = http.match(() => true).map(({ request }) => request.urlWithParams);
    expect(asked).toHaveLength(2);
    for (const url of asked) {
      expect(url).toContain('branch=HAV');
      expect(url).toContain('to=2026-02-02');
    }
  });

  it('answered: sentence, chosen product, its rows, temperature in words, caution and what to order', async () => {
    const page = await open();
    await answer(page);
    // The chips choose their option a turn later.
    await page.settle();
    const { host } = page;
    expect(host.querySelector('h1')?.textContent).toContain('of the norm went in');
    expect(host.querySelector('mat-chip-option.mat-mdc-chip-selected')?.textContent).toContain(
      'Cavity wax',
    );
    expect(host.textContent).toContain('41 ml less for every degree warmer');
    expect(host.querySelector('us-caution')?.textContent).toContain('Solvent mist');
    expect(host.querySelector('.rows')?.textContent).toContain('full hatchback');
    expect(host.querySelector('us-coming-need')?.textContent).toContain('23 cars in the diary');
    expect(host.querySelector('.branches')).toBeNull();
  });

  it('a product without a norm: says so and lists it in millilitres', async () => {
    const page = await open('RC1');
    await answer(page);
    expect(page.host.textContent).toContain('No package has a norm of it');
    expect(page.host.textContent).toContain('RC1 without a norm, ml a car');
    expect(page.host.querySelector('us-use-box-chart')).toBeNull();
  });

  it('no job: why, what to do, and nothing drawn', async () => {
    const page = await open();
    await answer(page, noProducts(), productNeedAnswer({ jobs: 0, needs: [] }));
    expect(page.host.querySelector('h1')?.textContent).toContain('No car was finished');
    expect(page.host.querySelector('.pictures')).toBeNull();
    expect(page.host.querySelector('us-coming-need')?.textContent).toContain('Nothing is expected');
  });

  it('the list printed: alone, with room for what is ordered; then the page is back', async () => {
    const print = jest.fn();
    Object.defineProperty(window, 'print', { configurable: true, value: print });
    const page = await open();
    await answer(page);
    const button = [...page.host.querySelectorAll('button')].find(
      (one) => one.textContent?.trim() === 'Print the list',
    );
    button?.click();
    await page.settle();
    const list = page.host.querySelector('us-order-list');
    expect(print).toHaveBeenCalledTimes(1);
    expect(list?.textContent).toContain('Ordered');
    expect(list?.textContent).toContain('HAV');
    expect(list?.textContent).toContain('2026. 23 cars in the diary');
    expect(page.host.querySelector('us-scope-line')?.classList).toContain('us-unprinted');
    window.dispatchEvent(new Event('afterprint'));
    await page.settle();
    expect(page.host.querySelector('us-order-list')).toBeNull();
  });

  it('the use fails, the need does not: each says its own', async () => {
    const page = await open();
    for (const call of page.http.match(() => true)) {
      if (call.request.url.includes('product-need')) call.flush(productNeedAnswer());
      else call.flush(null, { status: 500, statusText: 'Failed' });
    }
    await page.settle();
    expect(page.host.querySelector('[role=alert]')?.textContent).toContain('Try again');
    expect(page.host.querySelector('us-coming-need')?.textContent).toContain('in the diary');
  });
});
