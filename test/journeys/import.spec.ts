import { readFileSync } from 'node:fs';
import { parse } from 'csv-parse/sync';
import type { Page } from 'playwright-core';
import { useChromium } from './chromium';
import { HEADINGS, officeFile, officeRow, sendFile } from './import-file';
import { servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';
import { readTable } from './table';

const GOOD = ['office-1', 'office-2', 'office-3'];
/** The heading of the bill's amount is one that only this office uses. */
const FILE = officeFile(
  [
    ...GOOD.map((ref) => officeRow(ref)),
    officeRow('office-4', { 6: '31.02.2025' }),
    officeRow('office-5', { 1: '', 5: 'gold' }),
  ],
  HEADINGS.replace('Invoice total', 'Amount asked'),
);

/** A file of the office, through the page *Import*, by the site manager of a branch. */
describe('a file imported', () => {
  const openWindow = useChromium(() => servedDemo().url);
  let page: Page;

  beforeAll(async () => {
    page = (await openWindow()).page;
    await signIn(page, 'site_manager');
  });

  const answer = (): Promise<string> => page.getByRole('heading', { level: 1 }).innerText();
  const press = (name: string | RegExp): Promise<void> =>
    page.getByRole('button', { name }).click();

  async function send(): Promise<void> {
    await page.goto('/import');
    await untilReady(page);
    await sendFile(page, FILE);
  }

  test('sent, is read as it was written, and counted without anything being written', async () => {
    await send();
    expect(await answer()).toContain('5 rows: 0 new, 0 changed, 0 unchanged, 5 refused.');
    expect(await page.getByRole('button', { name: /^Write/ }).count()).toBe(0);
    for (const [label, value] of [
      ['Between cells', ';'],
      ['Letters', 'windows-1252'],
      ['Decimals', ','],
      ['Dates', 'dmy'],
    ] as const) {
      expect(await page.getByLabel(label).inputValue()).toBe(value);
    }
    const rows = await readTable(page.getByRole('table', { name: /^The first 5 of 5/ }));
    expect(rows.map((row) => [row['Job no'], row['Would be'], row['Note']])).toEqual([
      ...[...GOOD, 'office-4', 'office-5'].map((ref) => [ref, 'refused', 'Schwellerblech geprüft']),
    ]);
    await page.goto('/jobs?q=office-1');
    await untilReady(page);
    expect(await answer()).toContain('0 cars');
    await page.goBack();
    await untilReady(page);
  });

  test('a column that no name matched, chosen and checked again, counts and is remembered', async () => {
    await page.getByLabel('Amount asked').selectOption('invoice.total');
    await press('Check it again like this');
    await page.getByText('as chosen for this branch before').first().waitFor();
    expect(await page.getByLabel('Amount asked').inputValue()).toBe('invoice.total');
    expect(await answer()).toContain('5 rows: 3 new, 0 changed, 0 unchanged, 2 refused.');
    const main = page.getByRole('main');
    expect(await main.innerText()).toContain('Nothing is written yet.');
    await page.getByLabel('Note', { exact: true }).selectOption('');
    expect(await page.getByRole('button', { name: /^Write/ }).isDisabled()).toBe(true);
    await page.getByLabel('Note', { exact: true }).selectOption('notes');
  });

  test('its refused rows, fetched, are the rows as sent with their reasons', async () => {
    const button = page.getByRole('button', { name: 'Refused rows as CSV, 2' });
    const [download] = await Promise.all([page.waitForEvent('download'), button.click()]);
    const text = readFileSync(await download.path(), 'utf8');
    const rows = parse<Record<string, string>>(text, { columns: true, delimiter: ';', bom: true });
    expect(rows.map((row) => [row['Job no'], row['Completed on'], row['Note']])).toEqual([
      ['office-4', '31.02.2025', 'Schwellerblech geprüft'],
      ['office-5', '14.03.2025', 'Schwellerblech geprüft'],
    ]);
    const why = Object.keys(rows[0]!).at(-1)!;
    expect(rows[0]![why]).toContain('Completed on');
    expect(rows[1]![why]).toMatch(/Make.*Package|Package.*Make/);
  });

  test('confirmed, writes the good rows, which are then in Jobs with their amounts', async () => {
    await press('Write 3 cars');
    await page.getByRole('heading', { level: 1, name: /3 cars written: 3 new/ }).waitFor();
    await page.getByRole('link', { name: 'See the cars in Jobs' }).click();
    await page.waitForURL('**/jobs?branch=HAV');
    await page.goto('/jobs?branch=HAV&q=office-');
    await untilReady(page);
    const rows = await readTable(page.getByRole('table', { name: 'Jobs', exact: true }));
    expect(rows.map((row) => row['Job']).sort()).toEqual(GOOD);
    await page.getByRole('link', { name: 'office-1' }).click();
    await page.waitForURL('**/jobs/HAV/office-1');
    await untilReady(page);
    const sheet = await page.getByRole('main').innerText();
    expect(sheet).toContain('412.50');
    expect(sheet).toContain('Schwellerblech geprüft');
  });

  test('sent a second time, would change nothing', async () => {
    await send();
    expect(await answer()).toContain('5 rows: 0 new, 0 changed, 3 unchanged, 2 refused.');
    expect(await page.getByRole('main').innerText()).toContain('There is nothing to write.');
    expect(await page.getByRole('button', { name: /^Write/ }).count()).toBe(0);
  });

  test('reloaded and found again among the earlier ones, opens where it stands', async () => {
    await page.reload();
    await untilReady(page);
    expect(await answer()).toContain('3 unchanged');
    await page.goto('/import');
    const table = page.getByRole('table', { name: /^Files of/ });
    const [latest, first] = await readTable(table);
    expect([latest!['Stands'], first!['Stands'], first!['Written']]).toEqual([
      'checked, not written',
      'written',
      '3',
    ]);
    await table.getByRole('link').nth(1).click();
    await page.getByRole('heading', { level: 1, name: /3 cars written/ }).waitFor();
  });
});
