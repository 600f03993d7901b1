import type { Locator, Page } from 'playwright-core';
import { finishedCar, pushJob } from './branch-system';
import { useChromium } from './chromium';
import { readRawRecord } from './raw-record';
import { readWeek } from './read-week';
import { recountCar } from './recount';
import { recountWeek } from './recount-week';
import { sayWeek } from './say-week';
import { LAST_WEEK, servedDemo, TODAY } from './served-demo';
import { signIn, untilReady } from './sign-in';
import { readTable } from './table';

/** The site manager writes the bill of a finished car in its row, and says what explains the week. */
describe('billing from the row, and the note on a week', () => {
  const openWindow = useChromium(() => servedDemo().url);
  let page: Page;

  beforeAll(async () => {
    await pushJob(servedDemo().url, 'to-bill', finishedCar());
    await pushJob(servedDemo().url, 'to-correct', finishedCar());
    const visit = await openWindow();
    page = visit.page;
    visit.troubles.expect(/ 412 /);
    await signIn(page, 'site_manager');
  });

  const unbilled = (): Promise<string[]> =>
    page.locator('us-unbilled-cars td:first-child a').allInnerTexts();

  async function openBill(jobRef: string): Promise<Locator> {
    await page.getByRole('button', { name: `Bill it: job ${jobRef}` }).click();
    const form = page.locator('us-bill-form');
    await form.getByLabel('Bill before tax').waitFor();
    return form;
  }

  test('a bill, opened in the row of a car, proposes the quote with what was agreed beyond it', async () => {
    expect(await unbilled()).toContain('to-bill');
    const form = await openBill('to-bill');
    expect(await form.innerText()).toContain('Quoted €780.00 and agreed extras €135.00.');
    expect(await form.getByLabel('Bill before tax').inputValue()).toBe('915.00');
    expect(await form.getByLabel('Date of the bill').inputValue()).toBe(TODAY);
    await page.waitForFunction(() => document.activeElement?.matches('us-bill-form input'));
  });

  test('the car, once billed, leaves the list and enters the week', async () => {
    const form = page.locator('us-bill-form');
    await form.getByLabel('Bill number').fill('0533');
    await form.getByRole('button', { name: 'Bill the car' }).click();
    await page
      .locator('section.cars')
      .getByRole('link', { name: 'to-bill', exact: true })
      .waitFor();
    await untilReady(page);
    expect(await unbilled()).not.toContain('to-bill');
    const rows = await readTable(page.locator('section.cars table'));
    expect(rows.find((row) => row['Job'] === 'to-bill')).toMatchObject({ Billed: '915' });
    const { jobs, costs } = readRawRecord(servedDemo().data);
    const own = jobs.filter(({ branch }) => branch === 'HAV').map((job) => recountCar(job, costs));
    expect(await readWeek(page)).toEqual(
      sayWeek(recountWeek(own, LAST_WEEK.from), 'this branch’s'),
    );
  });

  test('an amount that can be read two ways is asked for again', async () => {
    const form = await openBill('to-correct');
    await form.getByLabel('Bill before tax').fill('1,120');
    await form.getByRole('button', { name: 'Bill the car' }).click();
    await form.getByText('Write the amount as 870 or 870.50.').waitFor();
    expect(await form.getByLabel('Bill before tax').inputValue()).toBe('1,120');
  });

  test('a correction that came in between is told, and nothing typed is lost', async () => {
    const form = page.locator('us-bill-form');
    await form.getByLabel('Bill before tax').fill('930.50');
    await form.getByLabel('Bill number').fill('0534');
    const corrected = await pushJob(
      servedDemo().url,
      'to-correct',
      finishedCar({ notes: 'Sill seen again from inside.' }),
    );
    expect(corrected.body).toMatchObject({ status: 'replaced', revision: 2 });
    await form.getByRole('button', { name: 'Bill the car' }).click();
    const alert = form.getByRole('alert').filter({ hasText: /./ });
    expect(await alert.innerText()).toMatch(/changed .*Nothing was written; load it again/s);
    expect(await form.getByLabel('Bill before tax').inputValue()).toBe('930.50');
    expect(await form.getByLabel('Bill number').inputValue()).toBe('0534');

    await form.getByRole('button', { name: 'Load the job again, keep what is typed' }).click();
    await form.getByRole('alert').filter({ hasText: /./ }).waitFor({ state: 'detached' });
    expect(await form.getByLabel('Bill before tax').inputValue()).toBe('930.50');
    await form.getByRole('button', { name: 'Bill the car' }).click();
    await page
      .locator('section.cars')
      .getByRole('link', { name: 'to-correct', exact: true })
      .waitFor();
    const kept = readRawRecord(servedDemo().data).jobs.find((one) => one.jobRef === 'to-correct');
    expect(kept?.job).toMatchObject({
      notes: 'Sill seen again from inside.',
      invoice: { totalCents: 93050, number: '0534', issuedOn: TODAY },
    });
  });

  test('a note being written survives a reload, and once kept is read by others', async () => {
    const note = 'Two cars with both sills holed; the lift stood still on Thursday.';
    const section = page.locator('us-week-note');
    const button = section.getByRole('button', { name: /Leave a note|Change the note/ });
    await button.click();
    await section.getByLabel('What explains the week').fill(note);
    await page.reload();
    await untilReady(page);
    expect(await section.getByLabel('What explains the week').inputValue()).toBe(note);
    await section.getByRole('button', { name: 'Keep the note' }).click();
    await section.locator('blockquote').waitFor();
    await page.reload();
    await untilReady(page);
    expect(await section.locator('blockquote').innerText()).toBe(note);
    expect(await section.innerText()).toContain('Ansa Tollgarv');

    const { page: lead } = await openWindow();
    await signIn(lead, 'regional_lead');
    await lead.goto('/this-week?branch=HAV');
    await untilReady(lead);
    expect(await lead.locator('us-week-note blockquote').innerText()).toBe(note);
    expect(await lead.locator('us-week-note').getByRole('button').count()).toBe(0);
  });
});
