import { createHash } from 'node:crypto';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import Database from 'better-sqlite3';
import type { Page } from 'playwright-core';
import { DEMO_PUSH_KEY } from '#seeds/demo-people';
import { serve, type Served } from '../bench/serve';
import { ask, finishedCar, pushJob } from './branch-system';
import { useChromium } from './chromium';
import { MONDAY_MORNING, servedDemo } from './served-demo';
import { personOf, signIn, untilReady } from './sign-in';
import { readTable } from './table';

const JOB = 'reported-1';
const CLAIM = 'reported-claim';

/** Head office issues the warranty-risk report; what arrives later leaves it as it was and is told beside it. */
describe('the warranty-risk report', () => {
  let at: string | undefined;
  const openWindow = useChromium(() => at ?? servedDemo().url);
  let office: Page;
  let address: string;
  let hash: string;

  beforeAll(async () => {
    await pushJob(servedDemo().url, JOB, finishedCar());
    office = (await openWindow()).page;
    await signIn(office, 'head_office');
  });

  const open = async (page: Page, to: string): Promise<void> => {
    await page.goto(to);
    await untilReady(page);
  };
  const pdfOf = async (page: Page): Promise<{ hash: string; path: string }> => {
    const button = page.getByRole('button', { name: 'PDF as issued' });
    const [download] = await Promise.all([page.waitForEvent('download'), button.click()]);
    const file = await download.path();
    return { hash: createHash('sha256').update(readFileSync(file)).digest('hex'), path: file };
  };

  test('as of a past day is read first, and issued once that is confirmed', async () => {
    await open(office, '/warranty/reports?asOf=2026-01-31');
    await office.getByRole('button', { name: 'Issue this report' }).click();
    const dialog = office.getByRole('dialog');
    expect(await dialog.innerText()).toContain('as of 31 January 2026');
    await dialog.getByRole('button', { name: 'Issue the report' }).click();
    await office.waitForURL(/\/warranty\/reports\/\d+$/);
    await untilReady(office);
    address = new URL(office.url()).pathname;
    const main = await office.locator('main').innerText();
    expect(main).toMatch(/Report \d+ as issued on/);
    expect(main).toContain('Nothing has arrived later for its period.');
  });

  test('its PDF is the one whose SHA-256 is written there, and a copy of it is known', async () => {
    const pdf = await pdfOf(office);
    hash = pdf.hash;
    expect(await office.locator('main').innerText()).toContain(hash);
    await office.getByLabel('Compare a copy with them').setInputFiles(pdf.path);
    await office.getByText(/is the PDF of report \d+, byte for byte/).waitFor();
  });

  test('a claim that comes later for its period is listed beside it and changes nothing in it', async () => {
    const claim = {
      jobRef: JOB,
      madeOn: '2026-01-30',
      zone: 'sill_outer',
      side: 'left',
      cause: 'missed_area',
      decision: 'open',
      costCents: 31_000,
    };
    const sent = await ask(`${servedDemo().url}/api/branches/HAV/claims/${CLAIM}`, {
      method: 'PUT',
      headers: {
        Authorization: `Bearer ${DEMO_PUSH_KEY.key}`,
        'Content-Type': 'application/json',
      },
      body: JSON.stringify(claim),
    });
    expect(sent.status).toBe(201);
    const before = await office.locator('us-report-paper').innerText();
    await open(office, address);
    await office.getByRole('link', { name: `Claim ${CLAIM}` }).waitFor();
    expect(await office.locator('us-report-paper').innerText()).toBe(before);
    expect((await pdfOf(office)).hash).toBe(hash);
    const now = await readTable(office.getByRole('table', { name: 'As issued and now' }));
    expect(now[1]).toMatchObject({ 'The same day': 'Claims counted', Difference: '+1' });
  });

  describe('set to be issued by itself', () => {
    let folder: string;
    let later: Served;

    afterAll(async () => {
      await later.stop();
      rmSync(folder, { recursive: true, force: true });
    });

    test('on a day that not every month has, is told at the field and keeps what was typed', async () => {
      await open(office, '/warranty/reports/schedule');
      await office.getByLabel('Day of the month').fill('31');
      await office.getByRole('button', { name: 'Save the schedule' }).click();
      await office.getByText('A day from 1 to 28').waitFor();
      expect(await office.getByLabel('Day of the month').inputValue()).toBe('31');
    });

    test('on the first, to one of head office, says when it is due', async () => {
      await office.getByLabel('Issue and mail the report by itself').check();
      await office.getByLabel('Day of the month').fill('1');
      await office.getByLabel(personOf('head_office').name).check();
      await office.getByRole('button', { name: 'Save the schedule' }).click();
      await office.getByText(/^Saved\. Issued on the 1st of every month/).waitFor();
      expect(await office.locator('main').innerText()).toContain('as of 31 January 2026');
    });

    test('once the server looks again, is there and mailed: the mail stands in the mailbox', async () => {
      folder = mkdtempSync(path.join(tmpdir(), 'underseam-report-'));
      const source = new Database(path.join(servedDemo().data, 'underseam.sqlite'), {
        readonly: true,
      });
      await source.backup(path.join(folder, 'underseam.sqlite'));
      source.close();
      later = await serve(folder, { UNDERSEAM_DEMO: 'on', UNDERSEAM_NOW: MONDAY_MORNING });
      at = later.url;
      const { page } = await openWindow();
      await signIn(page, 'head_office');
      for (let turn = 0; turn < 30; turn += 1) {
        await open(page, '/warranty/reports/schedule');
        if (/Last run/.test(await page.locator('main').innerText())) break;
        await page.waitForTimeout(1_000);
      }
      expect(await page.locator('main').innerText()).toContain(
        'kept in the mailbox here, because no mail server is set up',
      );
      await open(page, '/mailbox');
      await page.getByRole('link', { name: /warranty report of the month/ }).click();
      const mail = await page.locator('article').innerText();
      expect(mail).toContain('/warranty/reports/');
      expect(mail).not.toContain('€');
    });
  });
});
