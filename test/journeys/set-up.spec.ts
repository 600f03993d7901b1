import type { Locator, Page } from 'playwright-core';
import { useChromium } from './chromium';
import { LAST_WEEK, servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';

const WEEK = `/this-week?branch=HAV&week=${LAST_WEEK.week}`;

/** Head office changes what figures rest on: told before, done after, seen on the pages. Each change is taken back. */
describe('set-up', () => {
  const openWindow = useChromium(() => servedDemo().url);
  let page: Page;

  beforeAll(async () => {
    page = (await openWindow()).page;
    await signIn(page, 'head_office');
  });

  async function answerOfWeek(): Promise<string> {
    await page.goto(WEEK);
    await untilReady(page);
    return page.getByRole('heading', { level: 1 }).innerText();
  }

  async function setHourlyCost(amount: string): Promise<{ told: string; done: string }> {
    await page.goto('/set-up/branches/HAV');
    await untilReady(page);
    const form = page.getByRole('form', { name: 'Hourly cost from a day on' });
    await form.getByLabel('From the day').fill(LAST_WEEK.from);
    await form.getByLabel('Cost of an hour of work').fill(amount);
    return saved(form, 'Save the hourly cost');
  }

  /** Waits for what a change would move, saves it, and waits for what it did. */
  async function saved(form: Locator, act: string): Promise<{ told: string; done: string }> {
    await form.getByRole('heading', { name: 'Before you save' }).waitFor();
    const told = await form.locator('us-effect').innerText();
    await form.getByRole('button', { name: act }).click();
    const done = form.getByRole('status').filter({ hasText: 'Saved.' });
    await done.waitFor();
    return { told, done: await done.innerText() };
  }

  test('an hourly cost, dearer from a day on, is told in cars and money, and the week keeps less', async () => {
    const before = await answerOfWeek();
    const dearer = await setHourlyCost('95');
    const [, cars] = /(\d+) cars of 1 branch from 26 Jan 2026 are computed anew/.exec(dearer.told)!;
    expect(dearer.told).toMatch(/What they kept goes from €[\d,]+ to −?€[\d,]+/);
    expect(dearer.told).toContain('margin');
    expect(dearer.done).toContain(`${cars} cars computed anew`);
    const after = await answerOfWeek();
    expect(kept(after)).toBeLessThan(kept(before));
    await page.goto('/set-up/branches/HAV');
    await untilReady(page);
    const rates = await page.getByRole('table', { name: /Hourly cost/ }).innerText();
    const [former] = [...rates.matchAll(/€([\d.]+)/g)].map(([, cost]) => cost!).slice(1);
    await setHourlyCost(former!);
    expect(await answerOfWeek()).toBe(before);
  });

  test('a norm, taken from the median of the network’s own cars, says that it restates all history', async () => {
    await page.goto('/set-up/packages/full?body=hatchback');
    await untilReady(page);
    const form = page.getByRole('form', { name: /^Norm of/ });
    await page.getByText('a new norm restates all history').waitFor();
    const take = form.getByRole('button', { name: /^Take \d+ for/ }).first();
    await take.waitFor();
    const label = (await take.getAttribute('aria-label'))!;
    const [, median, product] = /^Take (\d+) for (.*)$/.exec(label)!;
    const field = form.getByRole('textbox', { name: product! });
    const former = await field.inputValue();
    await take.click();
    expect(await field.inputValue()).toBe(median);
    const { told, done } = await saved(form, 'Save the norm');
    expect(told).toMatch(/cars of \d+ branches/);
    expect(done).toMatch(/cars computed anew/);
    await page.reload();
    await untilReady(page);
    await field.waitFor();
    expect(await field.inputValue()).toBe(median);
    await field.fill(former);
    await saved(form, 'Save the norm');
  });

  test('a product that jobs list, cannot be taken out, and the page says what refers to it', async () => {
    const { page: own, troubles } = await openWindow();
    troubles.expect(/ 409 /);
    await signIn(own, 'head_office');
    await own.goto('/set-up/products/CW1');
    await untilReady(own);
    await own.getByRole('button', { name: /^Take .* out$/ }).click();
    await own.locator('us-removal us-trouble').waitFor();
    expect(await own.locator('us-removal us-trouble').innerText()).toMatch(/job|norm|cost/);
  });
});

/** The share kept, in per cent, as the answer says it. */
function kept(answer: string): number {
  return Number(/(−?\d+)\s*%/.exec(answer)![1]!.replace('−', '-'));
}
