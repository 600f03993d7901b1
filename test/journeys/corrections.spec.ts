import { readFileSync } from 'node:fs';
import { parse } from 'csv-parse/sync';
import type { Locator, Page } from 'playwright-core';
import { finishedCar, pushJob } from './branch-system';
import { useChromium } from './chromium';
import { readRawRecord } from './raw-record';
import { readWeek } from './read-week';
import { recountCar } from './recount';
import { recountWeek } from './recount-week';
import { sayWeek, type SaidWeek } from './say-week';
import { LAST_WEEK, servedDemo } from './served-demo';
import { personOf, signIn, untilReady } from './sign-in';
import { readTable } from './table';

const JOB = 'to-mend';
const SHEET = `/jobs/HAV/${JOB}`;
const FINDING = {
  ref: 'a',
  zone: 'sill_inner',
  side: 'left',
  seenAs: 'surface',
  workedAs: 'bubbling',
  structural: true,
  action: 'treated',
  repairMinutes: 60,
  chargedCents: 9_000,
};
const SENT = finishedCar({
  findings: [FINDING],
  invoice: { number: '0612', issuedOn: '2026-01-27', totalCents: 91_500 },
});
const CORRECTED = finishedCar({
  findings: [{ ...FINDING, workedAs: 'holed', chargedCents: 12_000 }],
  actual: {
    stages: { strip: 110, clean: 150, dry: 30, repair: 95, mask: 35, apply: 130, refit: 95 },
  },
  products: [{ product: 'CW1', ml: 4_210 }],
  invoice: { number: '0612', issuedOn: '2026-01-27', totalCents: 94_500 },
});

/** A job is sent wrong, corrected, voided by mistake and brought back; everybody sees of it what is theirs to see. */
describe('corrections, and what the record says of them', () => {
  const openWindow = useChromium(() => servedDemo().url);
  let manager: Page;

  beforeAll(async () => {
    await pushJob(servedDemo().url, JOB, SENT);
    const corrected = await pushJob(servedDemo().url, JOB, CORRECTED);
    expect(corrected.body).toMatchObject({ status: 'replaced', revision: 2 });
    const visit = await openWindow();
    manager = visit.page;
    visit.troubles.expect(/ 404 /);
    await signIn(manager, 'site_manager');
  });

  const open = async (page: Page, path: string): Promise<void> => {
    await page.goto(path);
    await untilReady(page);
  };
  const weekShown = async (): Promise<SaidWeek> => {
    await open(manager, `/this-week?week=${LAST_WEEK.week}`);
    return readWeek(manager);
  };
  const weekCounted = (): SaidWeek => {
    const { jobs, costs } = readRawRecord(servedDemo().data);
    const own = jobs.filter(({ branch }) => branch === 'HAV').map((job) => recountCar(job, costs));
    return sayWeek(recountWeek(own, LAST_WEEK.from), 'this branch’s');
  };
  const changesOn = async (page: Page): Promise<Record<string, string>[]> => {
    const table = page.getByRole('table', { name: /^What changed from/ });
    await table.waitFor();
    return readTable(table);
  };
  const press = (page: Page | Locator, name: string): Promise<void> =>
    page.getByRole('button', { name, exact: true }).click();

  test('a correction, opened on the sheet, shows field by field what it changed', async () => {
    await open(manager, SHEET);
    await press(manager, 'What changed with revision 2');
    expect(await changesOn(manager)).toEqual([
      { Field: 'repair: worked', Before: '1 h', After: '1 h 35 min' },
      { Field: 'invoice total before tax', Before: '€915.00', After: '€945.00' },
      { Field: expect.stringMatching(/: used$/) as string, Before: '4,200 ml', After: '4,210 ml' },
      { Field: 'sill, inner, left: worked as', Before: 'bubbling', After: 'holed' },
      { Field: 'sill, inner, left: charged for it', Before: '€90.00', After: '€120.00' },
    ]);
    expect(new URL(manager.url()).searchParams.get('changes')).toBe('1-2');
    await manager.reload();
    expect(await changesOn(manager)).toHaveLength(5);
  });

  test('a recorder, at the same address, sees the work and no money', async () => {
    const { page } = await openWindow();
    await signIn(page, 'recorder');
    await open(page, `${SHEET}?changes=1-2`);
    expect((await changesOn(page)).map((row) => row['Field'])).toEqual([
      'repair: worked',
      expect.stringMatching(/: used$/),
      'sill, inner, left: worked as',
    ]);
    expect(await page.locator('us-revision-changes').innerText()).not.toContain('€');
    expect(await page.getByRole('button', { name: 'Void this job' }).count()).toBe(0);
    expect(await page.getByRole('link', { name: 'Correct this job' }).count()).toBeGreaterThan(0);
  });

  test('a job voided leaves the week to the cent, and is back at one press', async () => {
    const before = await weekShown();
    expect(before).toEqual(weekCounted());
    await open(manager, SHEET);
    await press(manager, 'Void this job');
    await press(manager.getByRole('dialog'), 'Void the job');
    await manager.getByRole('heading', { name: `Job ${JOB} is voided.` }).waitFor();
    const without = await weekShown();
    expect(without).toEqual(weekCounted());
    expect(without).not.toEqual(before);

    await open(manager, SHEET).catch(() => undefined);
    await manager.getByRole('link', { name: 'Voided jobs' }).click();
    await manager.getByRole('button', { name: `Bring back job ${JOB}` }).click();
    await manager.locator('.us-done').waitFor();
    expect(await weekShown()).toEqual(before);
  });

  test('a job voided by mistake is brought back where it was voided', async () => {
    const before = await weekShown();
    await open(manager, SHEET);
    await press(manager, 'Void this job');
    await press(manager.getByRole('dialog'), 'Void the job');
    await press(manager, 'Bring it back');
    await manager.getByText(`Job ${JOB} is back`).waitFor();
    await untilReady(manager);
    // Voiding and bringing back are no revisions: the content is what it was.
    expect(await readTable(manager.getByRole('table', { name: 'Revisions' }))).toHaveLength(2);
    expect(await weekShown()).toEqual(before);
  });

  describe('head office, in the audit trail', () => {
    let office: Page;
    const deeds = async (): Promise<string[]> =>
      (await office.locator('us-event-row .deed').allInnerTexts()).map((text) =>
        text.replace(/\s+/g, ' '),
      );

    beforeAll(async () => {
      office = (await openWindow()).page;
      await signIn(office, 'head_office');
      await open(office, SHEET);
      await office.getByRole('link', { name: 'What the audit trail says of it' }).click();
      await office.locator('us-event-row').first().waitFor();
    });

    test('all that was done to the job is there, newest first, with what it changed', async () => {
      const by = personOf('site_manager').email;
      const job = `job ${JOB}, Havnsund`;
      const told = await deeds();
      expect(told.slice(0, 4)).toEqual([
        `${by} brought back a job: ${job}`,
        `${by} voided a job: ${job}`,
        `${by} brought back a job: ${job}`,
        `${by} voided a job: ${job}`,
      ]);
      expect(told).toHaveLength(5);
      expect(told[4]).toMatch(/^key .* corrected a job: /);
      await office
        .getByRole('button', { name: /^Open event/ })
        .last()
        .click();
      const rows = await readTable(office.getByRole('table', { name: /^Before and after/ }));
      expect(rows).toContainEqual({
        Field: 'invoice total before tax',
        Before: '€915.00',
        After: '€945.00',
      });
    });

    test('narrowed to one deed, it shows that alone; the address keeps it', async () => {
      await office.getByRole('button', { name: /^What:/ }).click();
      await office.getByRole('dialog').getByRole('button', { name: 'voided a job' }).click();
      await office.locator('us-event-row').nth(2).waitFor({ state: 'detached' });
      await office.reload();
      await office.locator('us-event-row').first().waitFor();
      expect(await deeds()).toHaveLength(2);
    });

    test('its file holds exactly those events', async () => {
      const button = office.getByRole('button', { name: 'CSV of all that fit' });
      const [download] = await Promise.all([office.waitForEvent('download'), button.click()]);
      const rows: Record<string, string>[] = parse(readFileSync(await download.path(), 'utf8'), {
        columns: true,
      });
      expect(rows.map((row) => [row['action'], row['subject']])).toEqual([
        ['job.void', `/branches/HAV/jobs/${JOB}`],
        ['job.void', `/branches/HAV/jobs/${JOB}`],
      ]);
    });

    test('the chain, checked, fits', async () => {
      await press(office, 'Check the chain');
      await office.getByText('the chain fits: nothing was changed or removed').waitFor();
      expect(await office.locator('main').innerText()).toMatch(/hash [0-9a-f]{64}\./);
    });
  });
});
