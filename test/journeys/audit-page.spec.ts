import { auditPage } from './audit-page';
import { useChromium } from './chromium';
import { servedDemo } from './served-demo';

/** The watch kept over every page, shown to bark. */
describe('auditPage and the troubles of a page', () => {
  const openWindow = useChromium(() => servedDemo().url);

  test('a page with one fault of each kind is told of all of them', async () => {
    const { page } = await openWindow();
    await page.goto('/sign-in');
    await page.getByLabel('E-mail').waitFor();
    expect(await auditPage(page)).toEqual([]);
    await page.evaluate(() => {
      const main = document.querySelector('main')!;
      const add = (tag: string, attributes: Record<string, string>, words = ''): HTMLElement => {
        const made = document.createElement(tag);
        for (const [name, value] of Object.entries(attributes)) made.setAttribute(name, value);
        made.textContent = words;
        return main.appendChild(made);
      };
      add('input', { type: 'text' });
      add('p', {}, 'too faint to read').style.color = 'rgb(215 215 215)';
      add('p', {}, 'too small to read').style.fontSize = '13px';
      add('p', {}, 'too wide').style.width = '3000px';
      const picture = document.createElementNS('http://www.w3.org/2000/svg', 'svg');
      picture.setAttribute('role', 'img');
      picture.setAttribute('aria-label', 'A picture of something, which found something.');
      main.append(picture);
    });
    const told = await auditPage(page);
    expect(told).toEqual([
      expect.stringMatching(/^color-contrast: /),
      expect.stringMatching(/^label: /),
      expect.stringMatching(/^scrolls sideways: \d+ in 1440: p\./),
      '13.0 px: "too small to read"',
      'a picture without a table: "A picture of something, which found something."',
    ]);
  });

  test('an error in the console, a failed script and a breach of the content security policy are troubles', async () => {
    const { page, troubles } = await openWindow();
    await page.goto('/sign-in');
    await page.getByLabel('E-mail').waitFor();
    expect(troubles.taken()).toEqual([]);
    const last = page.waitForEvent('console', (message) => message.text().includes('half-way'));
    await page.evaluate(() => {
      console.error('something to look at');
      document.head.append(document.createElement('style'));
      document.head.lastElementChild!.textContent = 'p { color: red }';
      setTimeout(() => {
        throw new Error('half-way');
      });
    });
    await last;
    expect(troubles.taken()).toEqual(
      expect.arrayContaining([
        expect.stringContaining('something to look at'),
        expect.stringContaining('Content Security Policy'),
        expect.stringContaining('half-way'),
      ]),
    );
  });
});
