import type { Page } from 'playwright-core';
import { BRANCHES } from '#seeds/branches';
import { useChromium } from './chromium';
import { readRawRecord } from './raw-record';
import { readWeek } from './read-week';
import { recountCar, type CountedCar } from './recount';
import { recountWeek } from './recount-week';
import { sayWeek, type SaidWeek } from './say-week';
import { LAST_WEEK, servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';

/** Monday, 07:30: whoever opens *This week* sees of last week what the raw jobs say, to the cent and to the letter. */
describe('Monday at half past seven', () => {
  const openWindow = useChromium(() => servedDemo().url);
  let cars: CountedCar[];
  let office: Page;

  beforeAll(async () => {
    const { jobs, costs } = readRawRecord(servedDemo().data);
    cars = jobs.map((job) => recountCar(job, costs));
    const visit = await openWindow();
    office = visit.page;
    await signIn(office, 'head_office');
  });

  function recounted(branch: string | undefined, whose: string): SaidWeek {
    const own = branch ? cars.filter((car) => car.branch === branch) : cars;
    return sayWeek(recountWeek(own, LAST_WEEK.from), whose);
  }

  test('This week, opened by the site manager, shows what the raw jobs of their branch say', async () => {
    const { page } = await openWindow();
    await signIn(page, 'site_manager');
    expect(await readWeek(page)).toEqual(recounted('HAV', 'this branch’s'));
  });

  test('the recount, over the demo, covers every branch there is', () => {
    const known = [...new Set(cars.map(({ branch }) => branch))].sort();
    expect(known).toEqual(BRANCHES.map(({ code }) => code).sort());
  });

  test.each(BRANCHES.map(({ code, name }) => [name, code]))(
    'This week of %s, opened by head office, shows what its raw jobs say',
    async (_name, code) => {
      await office.goto(`/this-week?branch=${code}`);
      await untilReady(office);
      expect(await readWeek(office)).toEqual(recounted(code, 'this branch’s'));
    },
  );

  test('This week of the whole network, opened by head office, shows what all raw jobs say', async () => {
    await office.goto('/this-week');
    await untilReady(office);
    expect(await readWeek(office)).toEqual(recounted(undefined, 'the network’s'));
  });
});
