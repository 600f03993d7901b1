import type { Locator, Page } from 'playwright-core';
import type { Served } from '../bench/serve';
import { ask } from './branch-system';
import { useChromium } from './chromium';
import { LAST_WEEK, TODAY } from './served-demo';
import { FIRST, serveEmpty } from './served-empty';
import { typeSignIn, untilReady } from './sign-in';

/** Head office of an empty network goes from its first sign-in to the first car in one sitting. */
describe('first steps', () => {
  let served: Served;
  const openWindow = useChromium(() => served.url);
  let page: Page;

  beforeAll(async () => {
    served = await serveEmpty();
    page = (await openWindow()).page;
    await page.goto('/sign-in');
    await typeSignIn(page, FIRST);
  });
  afterAll(() => served?.stop());

  const form = (label: string | RegExp): Locator => page.getByRole('form', { name: label });
  async function fill(of: string | RegExp, typed: Readonly<Record<string, string>>): Promise<void> {
    for (const [label, text] of Object.entries(typed)) await form(of).getByLabel(label).fill(text);
  }
  async function choose(
    of: string,
    chosen: Readonly<Record<string, string | { label: string }>>,
  ): Promise<void> {
    for (const [label, value] of Object.entries(chosen)) {
      await form(of).getByLabel(label).selectOption(value);
    }
  }
  const press = (name: string | RegExp): Promise<void> =>
    page.getByRole('button', { name }).click();
  const next = (name: string): Promise<void> =>
    page.getByRole('link', { name: `Next: ${name}` }).click();
  const done = (words: string): Promise<void> =>
    page.getByRole('status').filter({ hasText: words }).waitFor();
  /** Costs tell what they move before they are saved; here there is no car yet. */
  const told = (): Promise<void> => page.getByText('No finished car is touched.').waitFor();

  test('an empty network, at the first sign-in, opens on the first of seven steps', async () => {
    await page.waitForURL('**/first-run');
    await page.getByRole('heading', { name: 'The network' }).waitFor();
    await done('0 of 7 done');
  });

  test('the network, named with its currency and fee, is done', async () => {
    await fill('The network', {
      'Name of the network': 'Sound and River',
      'Network fee': '8',
    });
    await choose('The network', { Currency: 'SEK' });
    await told();
    await press('Save the network');
    await done('1 of 7 done');
    await next('A region');
  });

  test('a region without its climate, is enough', async () => {
    await fill('A new region', { Code: 'SO', 'Name of the region': 'Sound' });
    await press('Add the region');
    await done('2 of 7 done');
    await next('The first branch');
  });

  test('a branch, with what an hour costs from its opening on, is done', async () => {
    await fill('A new branch', {
      Code: 'HAV',
      'Name of the branch': 'Havnsund',
      'Opened on': '2026-01-05',
    });
    await choose('A new branch', { 'Time zone': 'Europe/Berlin' });
    await press('Add the branch');
    await page.getByText('Now what an hour of work costs it.').waitFor();
    const rate = 'Hourly cost from a day on';
    expect(await form(rate).getByLabel('From the day').inputValue()).toBe('2026-01-05');
    await fill(rate, { 'Cost of an hour of work': '48' });
    await told();
    await press('Save the hourly cost');
    await done('3 of 7 done');
  });

  test('a reload, shows what is done as done', async () => {
    await page.reload();
    await done('3 of 7 done');
    await next('Products');
    await page.getByRole('heading', { name: 'Products' }).waitFor();
  });

  test('a product with its cost and a package, are done', async () => {
    await fill('A new product', { Code: 'CW1', 'Name of the product': 'Cavity wax' });
    await choose('A new product', { Kind: { label: 'cavity wax' } });
    await press('Add the product');
    await fill('Cost from a day on', { 'Cost of a litre': '12.50' });
    await told();
    await press('Save the cost');
    await done('4 of 7 done');
    await next('A package');
    await fill('A new package', {
      Code: 'full',
      'Name of the package': 'Full treatment',
      'Warranty, months': '72',
    });
    await press('Add the package');
    await done('5 of 7 done');
    await next('People');
  });

  test('people, can wait', async () => {
    await page.getByRole('link', { name: 'It can wait. Next: The first job' }).click();
    const send = page.getByRole('link', { name: 'Send a job of Havnsund' });
    expect(await send.getAttribute('href')).toBe('/send?branch=HAV');
  });

  test('the command shown, with a key just made, sends the first car, and This week shows what it kept', async () => {
    await fill('A new push key', { 'What the key is for': 'a first try' });
    await press('Make a key');
    const key = (await page.locator('us-new-key .key').innerText()).trim();
    await page.getByText('A first car by command').click();
    const command = await page.locator('pre').innerText();
    const address = /"(http[^"]*)"/.exec(command)![1]!;
    const body = /-d '([\s\S]*)'/.exec(command)![1]!.replace(TODAY, LAST_WEEK.to);
    const sent = await ask(address, {
      method: 'PUT',
      headers: { Authorization: `Bearer ${key}`, 'Content-Type': 'application/json' },
      body,
    });
    expect(sent).toMatchObject({ status: 201, body: { status: 'created' } });

    await page.goto('/first-run');
    await done('6 of 7 done');
    await page.getByText('The first car is in.').waitFor();
    await page.getByRole('link', { name: 'Underseam, first page' }).click();
    await page.waitForURL('**/warranty');
    await page.getByRole('heading', { name: /No claim was made on 1 car/ }).waitFor();
    await page.goto('/this-week');
    await untilReady(page);
    // 780 − labour 385 min × 48 / 60 = 308 − product 4 L × 12.50 = 50 − fee 8 % = 62.40: 359.60 kept, 46 %.
    const answer = await page.getByRole('heading', { level: 1 }).innerText();
    expect(answer.replace(/\s/g, ' ')).toContain('46 %');
    expect(answer).toContain('1 car');
  });
});
