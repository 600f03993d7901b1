import type { Page } from 'playwright-core';
import { finishedCar, pushJob } from './branch-system';
import { useChromium } from './chromium';
import { servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';

const CAR = { key: 'J-LEFT', make: 'Velder', model: 'Tessock' };
const vehicle = { ...CAR, bodyType: 'hatchback', firstRegistered: '2006-03' };
const LEFT = {
  ref: 'sill',
  zone: 'sill_inner',
  side: 'left',
  seenAs: 'holed',
  structural: true,
  action: 'deferred',
};

/** Rot that is left on a car, from the hand-back to the day somebody mends it. */
describe('rot left on a car', () => {
  const openWindow = useChromium(() => servedDemo().url);

  beforeAll(async () => {
    const sent = await pushJob(servedDemo().url, 'left-1', {
      ...finishedCar({ completedOn: '2026-01-27', vehicle }),
      findings: [
        LEFT,
        { ...LEFT, ref: 'door', zone: 'door_bottom', structural: false, seenAs: 'bubbling' },
        { ...LEFT, ref: 'arch', zone: 'rear_arch', workedAs: 'holed', action: 'patched' },
      ],
      notes: '',
    });
    expect(sent.status).toBe(201);
  });

  async function enter(role: 'site_manager' | 'recorder' | 'regional_lead', path: string) {
    const { page } = await openWindow();
    await signIn(page, role);
    await page.goto(path);
    await untilReady(page);
    return page;
  }

  /** How many dangerous ones the header and the answer say are still on cars. */
  async function dangerous(page: Page): Promise<[header: number, answer: number]> {
    const count = page.locator('header .count', { hasText: 'dangerous' }).first();
    await count.waitFor();
    const answer = await page.locator('us-answer h1').innerText();
    return [Number(/\d+/.exec(await count.innerText())![0]), Number(/\d+/.exec(answer)![0])];
  }

  const rowsOf = (page: Page, words: string) =>
    page.getByRole('table', { name: 'Findings left on cars' }).locator('tbody', { hasText: words });

  test('a hand-back sheet, printed, is one page that says what was left, warns of it and shows no money', async () => {
    const page = await enter('site_manager', '/jobs/HAV/left-1');
    await page.getByRole('link', { name: 'Hand-back sheet' }).click();
    await page.getByRole('heading', { name: /^Hand-back sheet/ }).waitFor();
    const sheet = await page.getByRole('main').innerText();
    expect(sheet).toMatch(/Found and left on the car\s+1\s+sill, inner, left: rusted through/);
    expect(sheet).toMatch(/Not repaired, load-bearing\.[^]*may not be fit for the road/);
    expect(sheet).toContain('it does not certify');
    expect(sheet).not.toMatch(/€|\bmargin\b|quoted|invoice/i);
    for (const format of ['A4', 'Letter']) {
      const paper = (await page.pdf({ format })).toString('latin1');
      expect([format, paper.match(/\/Type\s*\/Page\b/g)?.length]).toEqual([format, 1]);
    }
  });

  test('a site manager, saving the day on which the owner was told, is asked for it first and sees who changed what', async () => {
    const page = await enter('site_manager', '/come-backs');
    const [header, answer] = await dangerous(page);
    expect(header).toBe(answer);
    const row = rowsOf(page, 'job left-1').filter({ hasText: 'sill, inner' });
    expect(await row.innerText()).toMatch(/dangerous[^]*not told/);
    await row.getByRole('button', { name: /^Mark/ }).click();
    await row.getByText('owner contacted', { exact: true }).click();
    await row.getByRole('button', { name: 'Save the mark' }).click();
    await row.getByText('No date says that the owner was told in writing').waitFor();
    await row.getByLabel('Owner told in writing on').fill('2026-01-28');
    await row.getByLabel('Note').fill('Rang twice — “not before spring”');
    // A draft stands what a workshop does to a browser.
    await page.reload();
    await untilReady(page);
    await row.getByRole('button', { name: /^Draft/ }).click();
    expect(await row.getByLabel('Owner told in writing on').inputValue()).toBe('2026-01-28');
    await row.getByRole('button', { name: /^Save/ }).click();
    await row.getByText('Rang twice — “not before spring”').first().waitFor();
    expect(await row.innerText()).toMatch(/28 Jan 2026[^]*owner contacted/);
    await row.getByRole('button', { name: /^Mark/ }).click();
    await row
      .getByText(/Ansa Tollgarv/)
      .last()
      .waitFor();
    expect((await dangerous(page))[0]).toBe(header);
  });

  test('a regional lead, on the same list, reads it and can change nothing', async () => {
    const page = await enter('regional_lead', '/come-backs?branch=HAV');
    await rowsOf(page, 'job left-1').first().waitFor();
    const row = rowsOf(page, 'job left-1').filter({ hasText: 'sill, inner' });
    await row.getByRole('button', { name: /^Marks/ }).click();
    await row.getByText('Ansa Tollgarv').last().waitFor();
    expect(await row.locator('form').count()).toBe(0);
    expect(await page.getByRole('button', { name: /^Mark:/ }).count()).toBe(0);
  });

  test('a recorder, on the job sheet, books the car in, and has no list', async () => {
    const page = await enter('recorder', '/jobs/HAV/left-1');
    const found = page.locator('us-findings-list li', { hasText: 'door bottom' });
    await found.getByRole('button', { name: /^Mark/ }).click();
    expect(await found.locator('label').allInnerTexts()).toEqual(
      expect.not.arrayContaining(['done', 'car is gone']),
    );
    await found.getByText('booked in', { exact: true }).click();
    await found.getByRole('button', { name: 'Save the mark' }).click();
    await found.getByText(/^since then:[^]*booked in/).waitFor();
    expect(await page.getByRole('link', { name: 'Come-backs' }).count()).toBe(0);
  });

  test('a later job of the same car, treating the same place, takes it off the list by itself; voiding that job brings it back', async () => {
    const page = await enter('site_manager', '/come-backs');
    const [, before] = await dangerous(page);
    const mended = { ...LEFT, workedAs: 'holed', action: 'patched' };
    const sent = await pushJob(servedDemo().url, 'left-2', {
      ...finishedCar({ completedOn: '2026-01-31', vehicle }),
      findings: [mended],
    });
    expect(sent.status).toBe(201);
    await page.reload();
    await untilReady(page);
    expect((await dangerous(page))[1]).toBe(before - 1);
    expect(await rowsOf(page, 'job left-1').filter({ hasText: 'sill, inner' }).count()).toBe(0);
    await page.getByRole('option', { name: 'done' }).click();
    await page.waitForURL(/status=done/);
    await untilReady(page);
    const closed = rowsOf(page, 'job left-1');
    await closed.first().waitFor();
    await closed.getByRole('link', { name: 'left-2' }).click();
    await page.waitForURL('**/jobs/HAV/left-2');
    await untilReady(page);
    await page.getByRole('button', { name: 'Void this job' }).click();
    await page.getByRole('dialog').getByRole('button', { name: /Void/ }).click();
    await page.getByRole('button', { name: 'Bring it back' }).waitFor();
    await page.goto('/come-backs');
    await untilReady(page);
    await rowsOf(page, 'job left-1').filter({ hasText: 'sill, inner' }).waitFor();
    expect((await dangerous(page))[1]).toBe(before);
  });
});
