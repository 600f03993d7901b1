import type { Page } from 'playwright-core';
import { untilStill } from './audit-page';
import { useChromium } from './chromium';
import { servedDemo } from './served-demo';
import { personOf, signIn, untilReady } from './sign-in';

/** Everything without a mouse: past the header, into a control, through a panel and back, into the picture. */
describe('the keyboard', () => {
  const openWindow = useChromium(() => servedDemo().url);
  let page: Page;

  beforeAll(async () => {
    page = (await openWindow()).page;
    await signIn(page, 'site_manager');
  });

  const press = (key: string): Promise<void> => page.keyboard.press(key);

  /** What has the focus: its words, and how thick the outline around it is. */
  async function focused(): Promise<{ words: string; outline: number }> {
    await untilStill(page);
    return page.evaluate(() => {
      const element = document.activeElement as HTMLInputElement;
      const named = element.labels?.[0] ?? element;
      // A field's frame stands around it.
      const around = [element, element.closest('.mat-mdc-text-field-wrapper')];
      const outlines = around.map((one) => {
        if (!one) return 0;
        const { outlineStyle, outlineWidth } = getComputedStyle(one);
        return outlineStyle === 'none' ? 0 : parseFloat(outlineWidth);
      });
      const words = element.getAttribute('aria-label') ?? named.textContent ?? '';
      return { words: words.replace(/\s+/g, ' ').trim(), outline: Math.max(...outlines) };
    });
  }

  test.each(['/this-week', '/overruns', '/jobs', '/how-it-is-counted', '/account'])(
    'the first press of Tab on %s shows the skip link, which leads to the first control of the page',
    async (path) => {
      await page.goto(path);
      await untilReady(page);
      await press('Tab');
      expect(await focused()).toEqual({ words: 'Skip to the page', outline: 2 });
      const top = await page.locator('.skip').evaluate((link) => link.getBoundingClientRect().top);
      expect(top).toBeGreaterThanOrEqual(0);
      await press('Enter');
      expect(await page.evaluate(() => document.activeElement?.id)).toBe('page');
      expect(new URL(page.url()).pathname).toBe(path);
      await press('Tab');
      const first = await focused();
      expect(first.words).not.toBe('');
      expect(first.outline).toBeGreaterThanOrEqual(2);
      const inside = await page.evaluate(() => document.activeElement?.closest('main') !== null);
      expect(inside).toBe(true);
    },
  );

  test('the scope line, opened by Enter and left by Escape, keeps the focus in its panel and gives it back', async () => {
    await page.goto('/this-week');
    await untilReady(page);
    await page.getByRole('button', { name: /^Week: / }).focus();
    await press('Enter');
    const panel = page.getByRole('dialog', { name: 'Week' });
    await panel.waitFor();
    for (let presses = 0; presses < 30; presses += 1) {
      await press('Tab');
      const within = await panel.evaluate((box) => box.contains(document.activeElement));
      expect(within).toBe(true);
    }
    await press('Escape');
    await panel.waitFor({ state: 'detached' });
    expect((await focused()).words).toBe('Week: Week 5, 2026');
  });

  test('the weekly picture, read by arrow keys, opens the week it stands on', async () => {
    const weeks = page.getByRole('listbox', { name: /^Weeks/ });
    await weeks.focus();
    await press('ArrowLeft');
    await page.locator('[role="listbox"][aria-activedescendant$="2026-W04"]').waitFor();
    const words = await page.locator('[role="option"][id$="2026-W04"]').getAttribute('aria-label');
    expect(words).toMatch(/^Week 4, 2026\. \d+.% ?.*\. \d+ cars/);
    await press('Enter');
    await page.waitForURL('**/this-week?week=2026-W04');
    await page.getByRole('heading', { level: 1 }).filter({ hasText: 'Week 4' }).waitFor();
    await page.goBack();
    await page.getByRole('heading', { level: 1 }).filter({ hasText: 'Week 5' }).waitFor();
  });

  test('a table, sorted from its head by Enter, says so and changes its order', async () => {
    const table = page.getByRole('table', { name: 'The cars that made the week, worst first' });
    const jobs = (): Promise<string[]> => table.locator('tbody td:first-child').allInnerTexts();
    const before = await jobs();
    const head = table.getByRole('columnheader', { name: 'Billed' });
    await head.getByRole('button').focus();
    await press('Enter');
    await page.waitForFunction(() => document.querySelector('th[aria-sort="descending"]'));
    const billed = await table.locator('tbody td:nth-child(4)').allInnerTexts();
    const amounts = billed.map((text) => Number(text.replace(',', '')));
    expect(amounts).toEqual([...amounts].sort((a, b) => b - a));
    expect([...(await jobs())].sort()).toEqual([...before].sort());
  });

  test('signing in, typed and sent by the keyboard alone, needs no mouse', async () => {
    const { page: own } = await openWindow();
    await own.goto('/sign-in');
    await own.getByLabel('E-mail').waitFor();
    await own.keyboard.press('Tab');
    await own.keyboard.type(personOf('recorder').email);
    await own.keyboard.press('Tab');
    await own.keyboard.type(personOf('recorder').password);
    await own.keyboard.press('Enter');
    await own.waitForURL('**/send');
  });
});
