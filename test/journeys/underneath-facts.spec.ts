import type { Page } from 'playwright-core';
import { PLANTED_FACTS } from '#seeds/planted-facts';
import { REGIONS } from '#seeds/regions';
import { useChromium } from './chromium';
import { readTwin } from './read-twin';
import { servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';
import { readTable } from './table';

const AGES = ['0-4', '5-9', '10-14', '15-19', '20+'];

/** What was planted underneath comes out on Rot and Product, as head office reads them. */
describe('the truths planted underneath', () => {
  const openWindow = useChromium(() => servedDemo().url);
  let page: Page;

  beforeAll(async () => {
    page = (await openWindow()).page;
    await signIn(page, 'head_office');
  });

  async function open(path: string): Promise<void> {
    await page.goto(path);
    await untilReady(page);
  }
  const answer = (): Promise<string> => page.locator('us-answer').innerText();

  test('salt, on Rot by region, doubles what is found once age is allowed for, where the air is worst', async () => {
    const { region, adjustedTimesAbove, adjustedTimesBelow, corrosivityCategory } =
      PLANTED_FACTS.saltRegion;
    await open('/rot');
    const rows = await readTwin(page, 'By age and region, % of cars with rot');
    const adjusted = new Map(
      rows
        .filter((row) => row['Age'] === 'all, adjusted')
        .map((row) => [row['Region'], percent(row['Share']!)]),
    );
    const salted = REGIONS.find(({ code }) => code === region)!;
    const others = REGIONS.filter(({ code }) => code !== region).map(({ name }) =>
      adjusted.get(name)!,
    );
    expect(others).toHaveLength(3);
    const mean = others.reduce((sum, share) => sum + share, 0) / others.length;
    expect(adjusted.get(salted.name)! / mean).toBeGreaterThan(adjustedTimesAbove);
    expect(adjusted.get(salted.name)! / mean).toBeLessThan(adjustedTimesBelow);
    // The picture is drawn once its width is known.
    const air = new RegExp(`${salted.name}\\s*air\\s${corrosivityCategory},`);
    await page.locator('us-age-region-chart', { hasText: air }).waitFor();
    expect(await answer()).toContain(`${salted.name} `);
  });

  test('age, on Rot by age of the cars, brings more rot with every five years', async () => {
    const shares: number[] = [];
    for (const age of AGES) {
      await open(`/rot?age=${encodeURIComponent(age)}`);
      shares.push(percent(await answer()));
    }
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    expect(shares.at(-1)!).toBeGreaterThan(shares[0]! + 30);
  });

  test('the worst place, on Rot at every age with much of it, is the outer sill', async () => {
    expect(PLANTED_FACTS.worstZone.zone).toBe('sill_outer');
    for (const age of ['10-14', '15-19']) {
      await open(`/rot?age=${age}`);
      expect(await answer()).toMatch(/Most often in the outer sill, (left|right): \d+/);
    }
  });

  test('the worst model, on Rot at its age, stands first once small numbers are steadied', async () => {
    const { make, model, ageBand } = PLANTED_FACTS.worstModel;
    await open(`/rot?age=${ageBand}`);
    const rows = await readTable(
      page.getByRole('table', { name: `Models, aged ${ageBand.replace('-', '–')}` }),
    );
    expect(rows[0]!['Model']).toBe(`${make} ${model}`);
    const steadied = rows.map((row) => percent(row['Steadied']!));
    expect(steadied).toEqual([...steadied].sort((a, b) => b - a));
    // A zone on the map leads to the cars behind it, and every one of them has rot there.
    await page.getByRole('link', { name: `${make} ${model}` }).click();
    await page.waitForURL('**/jobs?**');
    await untilReady(page);
    const cars = await readTable(page.getByRole('table', { name: 'Jobs' }));
    expect(cars.length).toBeGreaterThan(0);
    for (const car of cars) expect(Object.values(car).join(' ')).toContain(`${make} ${model}`);
  });

  test('cold, on Product by workshop temperature, takes more wax, less for every degree', async () => {
    const { product, slopeMlPerDegreeAbove, slopeMlPerDegreeBelow } = PLANTED_FACTS.coldWax;
    await open(`/product?product=${product}`);
    const words = await page.locator('us-table-twin .finding').first().innerText();
    const [, ml, way] = /(\d+) ml (less|more) for every degree/.exec(words)!;
    expect(way).toBe('less');
    expect(-Number(ml)).toBeLessThan(slopeMlPerDegreeBelow);
    expect(-Number(ml)).toBeGreaterThan(slopeMlPerDegreeAbove);
  });

  test('thin coverage, on Product by branch, is named where it is and nowhere else as low', async () => {
    const { branch, ratioToNormBelow } = PLANTED_FACTS.underApplyingBranch;
    await open(`/product?branch=${branch}`);
    expect(percent(await answer()) / 100).toBeLessThan(ratioToNormBelow);
    await open('/product');
    const rows = await readTwin(page, 'Branches against the norm of their own cars');
    const low = rows.filter((row) => percent(row['Of the norm']!) / 100 < ratioToNormBelow);
    expect(low).toHaveLength(1);
    expect(low[0]!['Against the norm']).toBe('below');
    expect(await answer()).toContain(low[0]!['Branch']!);
  });
});

/** The first per cent in some words. */
function percent(words: string): number {
  const found = /(\d+(?:\.\d+)?)\s%/.exec(words);
  if (!found) throw new Error(`no per cent in: ${words}`);
  return Number(found[1]);
}
