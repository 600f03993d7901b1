import type { Page } from 'playwright-core';
import { useChromium } from './chromium';
import { servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';

/** The next car, quoted at the counter. */
describe('a quote', () => {
  const openWindow = useChromium(() => servedDemo().url);

  async function quote(role: 'recorder' | 'site_manager', margin?: string): Promise<Page> {
    const { page } = await openWindow();
    await signIn(page, role);
    await page.goto('/quote');
    await page.getByLabel('Make').fill('Velder');
    await page.getByLabel('Model').fill('tessock');
    await page.getByLabel('First registered').fill('2012-05');
    await page.getByLabel('Body type').selectOption({ label: 'hatchback' });
    await page.getByLabel('Package').selectOption({ label: 'Full' });
    if (margin !== undefined) await page.getByLabel('Margin, %').fill(margin);
    await page.getByRole('button', { name: 'Quote it' }).click();
    await page.waitForURL('**/quote?**');
    await untilReady(page);
    await page.getByRole('heading', { name: 'Labour by stage' }).waitFor();
    return page;
  }

  test('for a site manager, names its cars and leads to exactly those', async () => {
    const page = await quote('site_manager');
    const evidence = page.locator('us-answer a').first();
    const named = Number(/\d+/.exec(await evidence.innerText())![0]);
    expect(named).toBeGreaterThanOrEqual(30);
    await evidence.click();
    await page.waitForURL('**/jobs?**');
    await untilReady(page);
    expect(await page.locator('us-answer h1').innerText()).toMatch(new RegExp(`^${named} cars`));
  });

  test('for a wanted margin, asks the price that keeps it, and more for more', async () => {
    const page = await quote('site_manager', '30');
    const price = async (): Promise<number> => {
      const words = /€([\d,]+\.\d\d)/.exec(await page.locator('us-answer').innerText())!;
      return Number(words[1]!.replace(/,/g, ''));
    };
    const first = await price();
    expect(await page.locator('us-answer').innerText()).toMatch(/keep 30\s%/);
    await page.getByLabel('Margin, %').fill('40');
    await page.getByRole('button', { name: 'Quote it' }).click();
    await page.waitForURL('**marginShare=0.4**');
    await untilReady(page);
    expect(await price()).toBeGreaterThan(first);
  });

  test('for a recorder, has a price and says nothing of what it is made of', async () => {
    const page = await quote('recorder');
    expect(await page.getByLabel('Margin, %').count()).toBe(0);
    const words = await page.getByRole('main').innerText();
    expect(words.match(/€[\d,.]+/g)).toHaveLength(1);
    expect(words).toMatch(/Price before tax: €[\d,]+\.\d\d/);
    expect(words).not.toMatch(/margin|keeps?\b|target|network fee|mean cost/i);
  });
});
