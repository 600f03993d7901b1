import type { Page } from 'playwright-core';
import { PLANTED_FACTS } from '#seeds/planted-facts';
import { useChromium } from './chromium';
import { readRawRecord } from './raw-record';
import { readTwin, twinOf } from './read-twin';
import { servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';
import { readTable } from './table';

/** What was planted in the demo comes out on the screens that are there to show it. */
describe('the truths planted in the demo', () => {
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

  const tableOf = (heading: string) => readTwin(page, heading);

  /** Points a week and p of the trend under the weekly picture; undefined when it says there is none. */
  async function trend(): Promise<{ way: string; points: number; pBelow: number } | undefined> {
    const note = await twinOf(page, 'Margin week by week').locator('p').first().innerText();
    const said = /(Falling|Rising) ([\d.]+) points a week \(p (?:=|<) ([\d.]+)\)/.exec(note);
    if (!said) expect(note).toContain('No trend');
    return said ? { way: said[1]!, points: Number(said[2]), pBelow: Number(said[3]) } : undefined;
  }

  test('the drifting branch, on This week, falls week by week and stands below what is usual', async () => {
    const { branch, slopePerWeekBelow, trendPBelow } = PLANTED_FACTS.driftingBranch;
    await open(`/this-week?branch=${branch}`);
    const seen = (await trend())!;
    expect(seen.way).toBe('Falling');
    expect(seen.points).toBeGreaterThanOrEqual(-slopePerWeekBelow * 100);
    expect(seen.pBelow).toBeLessThan(trendPBelow);
    const weeks = await tableOf('Margin week by week, %');
    const stands = weeks.slice(0, 8).map((row) => row['Stands']);
    expect(stands.some((words) => /below limits|in a row below centre/.test(words ?? ''))).toBe(
      true,
    );
    await open('/this-week?branch=ULV');
    const elsewhere = await trend();
    const fall = elsewhere?.way === 'Falling' ? elsewhere.points : 0;
    expect(fall).toBeLessThan(-slopePerWeekBelow * 100);
  });

  test('the slow stage, on Overruns of its branch, runs furthest over of all that are planned', async () => {
    const { branch, stage, ratioAbove, ratioElsewhereBelow } = PLANTED_FACTS.slowStageBranch;
    await open(`/overruns?branch=${branch}`);
    const there = overBy(await tableOf('Worked against estimated, by stage'), 'Stage');
    await open('/overruns');
    const everywhere = overBy(await tableOf('Worked against estimated, by stage'), 'Stage');
    // Repair is hardly ever estimated, so its ratio says nothing here.
    const planned = [...there].filter(([name]) => name !== 'repair');
    expect(planned.sort((a, b) => b[1] - a[1])[0]![0]).toBe(stage);
    expect(there.get(stage)).toBeGreaterThan(ratioAbove);
    expect(everywhere.get(stage)).toBeLessThan(ratioElsewhereBelow);
  });

  test('rot, on Overruns by whether it was found, drives cars over their estimate beyond doubt', async () => {
    await open('/overruns?by=rotFound');
    const rows = await tableOf('By whether rot was found');
    expect(rows.map((row) => row['Rot'])).toEqual(['rot found', 'no rot found']);
    const [found, without] = rows.map(intervalOf) as [Interval, Interval];
    expect(found.lower).toBeGreaterThan(without.upper + 20);
    expect(await page.locator('us-answer .second').innerText()).toMatch(
      /^Repair made \d+.% of the/,
    );
  });

  test('old cars, on Overruns by age, have the shortest estimates, the older the shorter', async () => {
    await open('/overruns?by=ageBand');
    const rows = await tableOf('By age of the car');
    expect(rows.map((row) => row['Age'])).toEqual([
      ...['0–4 years', '5–9 years', '10–14 years', '15–19 years', '20 years and over'],
    ]);
    const over = rows.map((row) => ratioOf(row['Over']!));
    expect(over).toEqual([...over].sort((a, b) => a - b));
    expect(intervalOf(rows[4]!).lower).toBeGreaterThan(intervalOf(rows[0]!).upper + 20);
    const allowances = rows.map((row) => ratioOf(row['Allowance, 8 of 10 within']!));
    expect(allowances).toEqual([...allowances].sort((a, b) => a - b));
  });

  test('late bills, on This week of the network, are listed from the longest wait, and led to in Jobs', async () => {
    await open('/this-week');
    const { jobs } = readRawRecord(servedDemo().data);
    const waiting = jobs.filter(({ job }) => !job.invoice && job.completedOn < '2026-02-02');
    const listed = await page
      .locator('us-unbilled-cars tr:not(.more) td:nth-child(3)')
      .allInnerTexts();
    const days = listed.map((words) => Number(words.replace(/\D/g, '')));
    expect(days).toEqual([...days].sort((a, b) => b - a));
    expect(days.every((wait) => wait > 21)).toBe(true);
    await page.getByRole('link', { name: `All ${waiting.length} in Jobs` }).click();
    await page.waitForURL('**/jobs?**');
    await untilReady(page);
    const rows = await readTable(page.getByRole('table', { name: 'Jobs' }));
    expect(rows.slice(0, days.length).map((row) => row['Billed'])).toEqual(
      days.map((wait) => `not billed, ${wait.toLocaleString('en-GB')} days`),
    );
  });
});

/** `+95 %` as 1.95, `15.1 times` as 15.1. */
function ratioOf(words: string): number {
  if (words.endsWith('times')) return Number(words.split(/\s/)[0]);
  return 1 + Number(words.replace('−', '-').replace(/[^\d.-]/g, '')) / 100;
}

function overBy(rows: Record<string, string>[], column: string): Map<string, number> {
  return new Map(rows.map((row) => [row[column]!, ratioOf(row['Over']!)]));
}

interface Interval {
  lower: number;
  upper: number;
}

/** Both ends of a 95 % interval as shown, in per cent over the estimate. */
function intervalOf(row: Record<string, string>): Interval {
  const [lower, upper] = row['95 %']!.split(/–| to /).map((end) =>
    Number(end.replace('−', '-').replace(/[^\d.-]/g, '')),
  );
  return { lower: lower!, upper: upper! };
}
