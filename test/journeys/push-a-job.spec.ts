import type { Page } from 'playwright-core';
import { ask, type Answered } from './branch-system';
import { useChromium } from './chromium';
import { readRawRecord } from './raw-record';
import { readWeek } from './read-week';
import { readmePush } from './readme-push';
import { recountCar } from './recount';
import { recountWeek } from './recount-week';
import { percent, sayWeek, whole } from './say-week';
import { LAST_WEEK, servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';
import { readTable } from './table';

/** The README's push, sent as it stands there, comes out in the site manager's week. */
describe('a job pushed as the README shows', () => {
  const openWindow = useChromium(() => servedDemo().url);
  const push = readmePush();
  const body = push.bodyOn(LAST_WEEK.to);
  let manager: Page;
  let carsBefore: number;

  beforeAll(async () => {
    carsBefore = recounted().billed;
    const visit = await openWindow();
    manager = visit.page;
    await signIn(manager, 'site_manager');
  });

  function recounted() {
    const { jobs, costs } = readRawRecord(servedDemo().data);
    const own = jobs.filter(({ branch }) => branch === 'HAV');
    return recountWeek(
      own.map((job) => recountCar(job, costs)),
      LAST_WEEK.from,
    );
  }

  function send(text: string): Promise<Answered> {
    const { method, path, headers } = push;
    return ask(servedDemo().url + path, { method, headers, body: text });
  }

  test('the first push, with the demo push key, is created', async () => {
    expect(await send(body)).toEqual({
      status: 201,
      body: { jobRef: 'readme-1', revision: 1, status: 'created' },
    });
  });

  test('This week of the site manager, opened after the push, counts the car and lists it', async () => {
    await manager.goto('/this-week');
    await untilReady(manager);
    const week = recounted();
    expect(week.billed).toBe(carsBefore + 1);
    expect(await readWeek(manager)).toEqual(sayWeek(week, 'this branch’s'));
    const rows = await readTable(manager.locator('section.cars table'));
    expect(rows.filter((row) => row['Job'] === 'readme-1')).toEqual([
      expect.objectContaining({ Car: 'Velder Tessock 2009', Billed: '870' }),
    ]);
  });

  test('the Job sheet, opened from its row, shows what was sent and what it kept', async () => {
    await manager.getByRole('link', { name: 'readme-1', exact: true }).click();
    await manager.waitForURL('**/jobs/HAV/readme-1');
    await untilReady(manager);
    const { jobs, costs } = readRawRecord(servedDemo().data);
    const car = recountCar(
      jobs.find(({ jobRef }) => jobRef === 'readme-1')!,
      costs,
    );
    const said = await manager.locator('us-answer h1 > :is(span, strong)').allTextContents();
    expect(said.join('')).toBe(
      `Job readme-1 kept ${percent(Number(car.kept) / Number(car.revenue), 0)} of what it billed (€${whole(car.kept)} of €870).`,
    );
    const stages = await readTable(manager.getByRole('table', { name: 'Labour by stage' }));
    expect(stages.map((row) => row['Worked'])).toEqual([
      ...['1 h 50 min', '2 h 30 min', '30 min', '3 h 5 min', '35 min', '2 h 10 min', '1 h 35 min'],
    ]);
    expect(await manager.getByRole('main').innerText()).toContain('sill, inner');
  });

  test('the same push again changes nothing and says so', async () => {
    expect(await send(body)).toEqual({
      status: 200,
      body: { jobRef: 'readme-1', revision: 1, status: 'unchanged' },
    });
  });

  test('a correction, sent under the same reference, is a second revision on the sheet', async () => {
    const corrected = {
      ...(JSON.parse(body) as object),
      invoice: { number: '0417', totalCents: 91050 },
    };
    expect(await send(JSON.stringify(corrected))).toEqual({
      status: 200,
      body: { jobRef: 'readme-1', revision: 2, status: 'replaced' },
    });
    await manager.reload();
    await untilReady(manager);
    const revisions = await readTable(manager.getByRole('table', { name: 'Revisions' }));
    expect(revisions.map(({ Revision, What, From }) => [Revision, What, From])).toEqual(
      expect.arrayContaining([
        ['1', 'sent', "the branch's system, by push key"],
        ['2', 'corrected', "the branch's system, by push key"],
      ]),
    );
    expect(revisions).toHaveLength(2);
    expect(await manager.getByRole('main').innerText()).toContain('€910.50');
  });
});
