import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Page } from 'playwright-core';
import { copyDatabase } from '#db/copy-database';
import { serve, type Served } from '../bench/serve';
import { finishedCar, pushJob } from './branch-system';
import { PHONE, useChromium } from './chromium';
import { MONDAY_MORNING, servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';

const FILE = 'underseam.sqlite';
const billed = (number: string): object => ({
  invoice: { number, issuedOn: '2026-01-29', totalCents: 91500 },
});

/** A page that is open while others send: a demo of its own, because the server is killed in between. */
describe('a page that is left open', () => {
  let data: string;
  let served: Served;
  let port: string;
  const openWindow = useChromium(() => served.url);

  beforeAll(async () => {
    data = mkdtempSync(path.join(tmpdir(), 'underseam-live-'));
    await copyDatabase(path.join(servedDemo().data, FILE), path.join(data, FILE));
    served = await serve(data, { UNDERSEAM_DEMO: 'on', UNDERSEAM_NOW: MONDAY_MORNING });
    port = new URL(served.url).port;
  });
  afterAll(async () => {
    await served.stop();
    rmSync(data, { recursive: true, force: true });
  });

  /** Cars of the week, as the answer says them. */
  const carsOf = async (page: Page): Promise<number> => {
    const said = await page.locator('us-answer h1').innerText();
    return Number(/\((\d+) cars?\)/.exec(said)?.[1]);
  };
  const untilCars = (page: Page, cars: number): Promise<unknown> =>
    page.locator('us-answer h1', { hasText: `(${cars} cars)` }).waitFor({ timeout: 60_000 });
  /** A stream is open once the server has answered the page's call. */
  const followed = (page: Page): Promise<unknown> =>
    page.waitForResponse((answer) => answer.url().endsWith('/api/live') && answer.ok());

  const push = async (jobRef: string, overrides: object = {}): Promise<void> => {
    expect((await pushJob(served.url, jobRef, finishedCar(overrides))).status).toBe(201);
  };

  async function openWeek(options = {}): Promise<Page> {
    const { page, troubles } = await openWindow({ serviceWorkers: 'block', ...options });
    // Its end, when the server is killed.
    troubles.expect(/ERR_INCOMPLETE_CHUNKED_ENCODING|ERR_CONNECTION_RE|ERR_EMPTY_RESPONSE/);
    const begun = followed(page);
    await signIn(page, 'site_manager');
    await begun;
    return page;
  }

  test('This week, when a job is pushed, counts its car without being opened anew, and says so', async () => {
    const page = await openWeek();
    const cars = await carsOf(page);
    await page.evaluate(() => Object.assign(window, { stillHere: true }));
    // Where the person is: a row somewhere down the page, the table ordered otherwise.
    await page.locator('section.cars').getByRole('button', { name: 'Billed' }).click();
    const row = page.locator('section.cars tbody a').nth(4);
    await row.focus();
    const [job, scroll] = [await row.innerText(), await page.evaluate(() => scrollY)];

    await push('live-1', billed('L1'));
    await untilCars(page, cars + 1);

    expect(await page.evaluate(() => 'stillHere' in window)).toBe(true);
    expect(await page.evaluate(() => document.activeElement?.textContent?.trim())).toBe(job.trim());
    expect(await page.evaluate(() => scrollY)).toBe(scroll);
    const heard = page.locator('.cdk-live-announcer-element');
    await heard.filter({ hasText: /^1 new job from Havnsund, \d/ }).waitFor({ state: 'attached' });
    expect(await heard.getAttribute('aria-live')).toBe('polite');
    await page.locator('us-live-line p', { hasText: '1 new job from Havnsund' }).waitFor();
  });

  test('a bill being written, when a job is pushed, stays as it is until it is done with', async () => {
    const page = await openWeek();
    const cars = await carsOf(page);
    await page
      .getByRole('button', { name: /^Bill it/ })
      .first()
      .click();
    const amount = page.locator('us-bill-form input').first();
    await amount.fill('812');
    await push('live-2', billed('L2'));
    await page.waitForTimeout(4_000);
    expect(await amount.inputValue()).toBe('812');
    expect(await carsOf(page)).toBe(cars);
    await page.keyboard.press('Escape');
    await untilCars(page, cars + 1);
  });

  test('on a phone, the line that says what came in lies within the window', async () => {
    const page = await openWeek({ viewport: PHONE });
    await push('live-3');
    const line = page.locator('us-live-line p');
    await line.waitFor();
    const box = (await line.boundingBox())!;
    expect(box.x).toBeGreaterThanOrEqual(0);
    expect(box.x + box.width).toBeLessThanOrEqual(PHONE.width);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(PHONE.width);
  });

  test('the server killed and started again: the page comes back by itself and shows what it missed', async () => {
    const page = await openWeek();
    const cars = await carsOf(page);
    process.kill(served.pid!, 'SIGKILL');
    served = await serve(data, {
      UNDERSEAM_DEMO: 'on',
      UNDERSEAM_NOW: MONDAY_MORNING,
      PORT: port,
    });
    await push('live-4', billed('L4'));
    await untilCars(page, cars + 1);
    await untilReady(page);
    await push('live-5', billed('L5'));
    await untilCars(page, cars + 2);
  });

  test('a server that is told to stop does so at once, pages open or not', async () => {
    await openWeek();
    const begun = Date.now();
    await served.stop();
    expect(Date.now() - begun).toBeLessThan(5_000);
    served = await serve(data, { UNDERSEAM_NOW: MONDAY_MORNING, PORT: port });
  });
});
