import { readFileSync } from 'node:fs';
import { parse } from 'csv-parse/sync';
import type { Page } from 'playwright-core';
import { useChromium } from './chromium';
import { servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';
import { readTable } from './table';

type Row = Record<string, string>;

/** The words that fetch a file fetch exactly the rows of the table beside them, in its order. */
describe('CSV of a page', () => {
  const openWindow = useChromium(() => servedDemo().url);
  let page: Page;

  beforeAll(async () => {
    page = (await openWindow()).page;
    await signIn(page, 'site_manager');
  });

  async function open(path: string): Promise<void> {
    await page.goto(path);
    await untilReady(page);
  }

  /** Presses the words and reads the file that comes. */
  async function fetched(words: RegExp): Promise<{ name: string; rows: Row[]; claimed: number }> {
    const button = page.getByRole('button', { name: words });
    const claimed = Number(/these ([\d,]+)/.exec(await button.innerText())![1]!.replace(',', ''));
    const [download] = await Promise.all([page.waitForEvent('download'), button.click()]);
    const text = readFileSync(await download.path(), 'utf8');
    expect(text).toMatch(/^[^\n]+\r\n/);
    return { name: download.suggestedFilename(), rows: parse(text, { columns: true }), claimed };
  }

  const shown = (label: string): Promise<Row[]> =>
    readTable(page.getByRole('table', { name: label, exact: true }));

  test('This week, its cars fetched, gives those cars worst first with the cents behind the rounded amounts', async () => {
    await open('/this-week');
    const table = await shown('The cars that made the week, worst first');
    const { name, rows, claimed } = await fetched(/^CSV of these/);
    expect(name).toMatch(/jobs\.csv$/);
    expect(rows).toHaveLength(claimed);
    expect(
      rows.map((row) => [row['jobRef'], units(row['revenueCents']), units(row['marginCents'])]),
    ).toEqual(table.map((row) => [row['Job'], row['Billed'], row['Kept']]));
  });

  test('Overruns, its stages fetched, gives the seven stages with the minutes of the picture', async () => {
    await open('/overruns');
    const words = await page.locator('us-bridge-chart svg text').allTextContents();
    const { rows, claimed } = await fetched(/^CSV of these 7 stages/);
    expect(rows).toHaveLength(claimed);
    const steps = rows.map((row) => [
      row['key'],
      Number(row['actualMinutes']) - Number(row['estimatedMinutes']),
    ]);
    const drawn = words.map((text) => text.trim()).slice(2, -2);
    expect(steps.map(([key, over]) => `${key} ${signed(Number(over))}`)).toEqual(
      Array.from({ length: 7 }, (_, index) => `${drawn[2 * index]} ${drawn[2 * index + 1]}`),
    );
  });

  test('Overruns, a grouping fetched, gives the groups of the table', async () => {
    await open('/overruns?by=package');
    await page.getByRole('table', { name: 'By package', exact: true }).waitFor();
    const table = await shown('By package');
    const { name, rows, claimed } = await fetched(/^CSV of these \d+ rows/);
    expect(name).toMatch(/overrun\.csv$/);
    expect(rows).toHaveLength(claimed);
    expect(rows.map((row) => [row['cars'], hours(row['actualMinutes'])])).toEqual(
      table.map((row) => [row['Cars'], row['Worked, h']]),
    );
  });

  test('Jobs, a filtered list fetched, gives all its rows, the first of them as listed', async () => {
    await open('/jobs?from=2025-10-01&to=2026-01-31&hasRot=true&sort=overrun');
    const table = await shown('Jobs');
    const { name, rows, claimed } = await fetched(/^CSV of these/);
    expect(name).toMatch(/jobs\.csv$/);
    expect(rows).toHaveLength(claimed);
    expect(rows.length).toBeGreaterThan(0);
    expect(rows.every((row) => row['hasRot'] === 'true' && row['branch'] === 'HAV')).toBe(true);
    expect(rows.slice(0, table.length).map((row) => row['jobRef'])).toEqual(
      table.map((row) => row['Job']),
    );
  });
});

/** Cents of a file as the whole units of a table. */
function units(cents = ''): string {
  const value = Number(cents) / 100;
  return `${value < 0 ? '−' : ''}${Math.round(Math.abs(value)).toLocaleString('en-GB')}`;
}

function hours(minutes = ''): string {
  return Math.round(Number(minutes) / 60).toLocaleString('en-GB');
}

function signed(minutes: number): string {
  const text = Math.abs(minutes).toLocaleString('en-GB');
  return minutes > 0 ? `+${text}` : minutes < 0 ? `−${text}` : '0';
}
