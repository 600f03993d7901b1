import type { Page } from 'playwright-core';
import type { Served } from '../bench/serve';
import { auditPage, untilStill } from './audit-page';
import { useChromium } from './chromium';
import { FIRST, serveEmpty } from './served-empty';
import { typeSignIn, untilReady } from './sign-in';

/** A network on its first day: no branch, no car, one person of head office. Every page opens and says what to do next. */
describe('an empty network', () => {
  let served: Served;
  const openWindow = useChromium(() => served.url);
  let page: Page;

  beforeAll(async () => {
    served = await serveEmpty();
    page = (await openWindow()).page;
    await page.goto('/sign-in');
    await typeSignIn(page, FIRST);
    await page.waitForURL('**/first-run');
    await untilReady(page);
  });

  afterAll(() => served?.stop());

  test.each([
    ['/this-week', 'No car was finished in week 5, 2026.', 'Go through the first steps'],
    ['/overruns', 'No car with an estimate was finished in this time.', 'Choose a longer time'],
    ['/jobs', '0 cars finished', 'Go through the first steps'],
    ['/rot', 'No car was finished in this time.', 'Go through the first steps'],
    ['/product', 'No car was finished in this time.', 'Go through the first steps'],
    ['/warranty', 'No car was finished in this time.', 'Go through the first steps'],
    ['/come-backs', 'No finding is left on a car here.', 'Go through the first steps'],
    ['/quote', 'Which car comes next?', 'Go through the first steps'],
    ['/import', 'Import', 'Go through the first steps'],
    ['/first-run', 'First steps', 'From an empty network to the first car'],
    ['/set-up/branches', 'Branches', 'Add a region first'],
    ['/mailbox', 'Mailbox', 'No mail yet. Inviting a person'],
  ])('%s, with nothing to show, says so and what to do', async (address, says, todo) => {
    await page.goto(address);
    await untilReady(page);
    expect(await page.getByRole('heading', { level: 1 }).innerText()).toContain(says);
    await page.getByRole('main').getByText(todo).first().waitFor();
    await untilStill(page);
    expect(await auditPage(page)).toEqual([]);
  });
});
