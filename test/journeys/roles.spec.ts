import type { Page } from 'playwright-core';
import type { Role } from '#shared/domain/vocabulary';
import { useChromium } from './chromium';
import { readRawRecord } from './raw-record';
import { servedDemo } from './served-demo';
import { personOf, signIn, typeSignIn, untilReady } from './sign-in';

const READERS_PAGES = [
  ...['This week', 'Overruns', 'Rot', 'Product', 'Warranty', 'Branches', 'Signals', 'Jobs'],
  ...['Come-backs', 'Quote'],
];
/** Those of them who send jobs have the form beside the list. */
const SENDERS_PAGES = READERS_PAGES.flatMap((page) =>
  page === 'Jobs' ? [page, 'Send a job'] : [page],
);

/** Branches are compared first by those who answer for several. */
const LEADS_PAGES = ['Branches', ...READERS_PAGES.filter((page) => page !== 'Branches')];

/** What was sold comes first where it is answered for. */
const OFFICE_PAGES = ['Warranty', ...SENDERS_PAGES.filter((page) => page !== 'Warranty')];

/** Who signs in, where that leads, what they are offered and what they never see. */
describe('the four roles', () => {
  const openWindow = useChromium(() => servedDemo().url);

  async function enter(role: Role): Promise<Page> {
    const { page } = await openWindow();
    await signIn(page, role);
    return page;
  }

  test.each([
    ['recorder', '/send', ['Send a job', 'Jobs', 'Quote'], ['Account', 'How it is counted']],
    ['site_manager', '/this-week', SENDERS_PAGES, ['Account', 'How it is counted', 'Import']],
    ['regional_lead', '/branches', LEADS_PAGES, ['Account', 'How it is counted']],
    [
      'head_office',
      '/warranty',
      OFFICE_PAGES,
      ['Account', 'How it is counted', 'Import', 'Set-up', 'Audit trail', 'Mailbox'],
    ],
  ] as [Role, string, string[], string[]][])(
    'a %s, signed in by typing, stands on %s and is offered their pages',
    async (role, home, pages, menu) => {
      const page = await enter(role);
      expect(new URL(page.url()).pathname).toBe(home);
      expect(
        await page
          .getByRole('navigation', { name: 'Pages', exact: true })
          .getByRole('link')
          .allInnerTexts(),
      ).toEqual(pages);
      await page.getByRole('button', { name: personOf(role).name }).click();
      await page.getByRole('menuitem', { name: 'Sign out' }).waitFor();
      expect(await page.getByRole('menu').locator('a').allInnerTexts()).toEqual(menu);
    },
  );

  test('a recorder, on Jobs and a Job sheet, sees no money but the quoted price', async () => {
    const page = await enter('recorder');
    await page.goto('/jobs');
    await untilReady(page);
    expect(await page.locator('body').innerText()).not.toMatch(/€|margin|kept|revenue/i);
    const { jobs } = readRawRecord(servedDemo().data);
    const { jobRef } = jobs.findLast(
      ({ branch, job }) =>
        branch === 'HAV' && job.invoice && job.estimate && (job.boughtInCents ?? 0) > 0,
    )!;
    await page.goto(`/jobs/HAV/${jobRef}`);
    await untilReady(page);
    const sheet = await page.locator('body').innerText();
    expect(sheet.match(/€[\d,.]+/g)).toHaveLength(1);
    expect(sheet).toMatch(/Quoted\s+€[\d,]+\.\d\d\n/);
    expect(sheet).not.toMatch(/margin|kept|revenue|network fee/i);
  });

  test('a recorder, at the address of a page with money, is led to their own first page', async () => {
    const page = await enter('recorder');
    for (const path of [
      ...['/this-week', '/overruns', '/rot', '/product', '/warranty', '/come-backs', '/mailbox'],
    ]) {
      await page.goto(path);
      await page.waitForURL('**/send');
    }
  });

  test('a regional lead, choosing among branches, is offered those of two regions and no other', async () => {
    const page = await enter('regional_lead');
    await page.getByRole('button', { name: 'Branches: River Plain and Inner Sounds' }).click();
    const panel = page.getByRole('dialog', { name: 'Branches' });
    await panel.getByRole('button', { name: 'Show' }).waitFor();
    const offered = await panel.locator('.member').allInnerTexts();
    expect(offered).toHaveLength(12);
    expect(offered).toEqual(expect.arrayContaining(['Havnsund', 'Teglmaur']));
    expect(await panel.locator('.group').allInnerTexts()).toEqual(['River Plain', 'Inner Sounds']);
  });

  test('a regional lead, at the address of a branch outside, sees no car of it', async () => {
    const page = await enter('regional_lead');
    await page.goto('/jobs?branch=BRI');
    await untilReady(page);
    expect(await page.locator('us-answer h1').innerText()).toContain('0 cars');
    expect(await page.getByRole('main').innerText()).not.toContain('Brimvarde');
  });

  test('a site manager, at the address of another branch’s job, reads the same as for none', async () => {
    const { page, troubles } = await openWindow();
    await signIn(page, 'site_manager');
    const { jobs } = readRawRecord(servedDemo().data);
    const other = jobs.findLast(({ branch }) => branch === 'HOL')!;
    troubles.expect(/ 404 /);
    const read: string[] = [];
    for (const jobRef of [other.jobRef, 'no-such-job']) {
      await page.goto(`/jobs/HOL/${encodeURIComponent(jobRef)}`);
      await page.getByRole('alert').waitFor();
      read.push(await page.getByRole('main').innerText());
    }
    expect(read[0]).toContain('Not found, or not among the branches you see.');
    expect(read[1]).toBe(read[0]);
  });

  test('a wrong password, typed with a right e-mail, is answered with a sentence and lets no one in', async () => {
    const { page, troubles } = await openWindow();
    troubles.expect(/ 401 /);
    await page.goto('/sign-in');
    await typeSignIn(page, { ...personOf('site_manager'), password: 'monday-half-past-eight' });
    const alert = page.getByRole('alert').filter({ hasText: /./ });
    expect(await alert.innerText()).toBe('E-mail and password do not belong together. Try again.');
    expect(await page.getByLabel('E-mail').inputValue()).toBe('manager@underseam.example');
    expect(new URL(page.url()).pathname).toBe('/sign-in');
  });

  test('an address asked for before signing in opens after it', async () => {
    const { page } = await openWindow();
    await page.goto('/overruns?by=package');
    await page.waitForURL('**/sign-in?**');
    await typeSignIn(page, personOf('site_manager'));
    await page.waitForURL('**/overruns?by=package');
  });

  test('a signed-in person, reloading, stays signed in, and signing out ends it in both tabs', async () => {
    const { page, context } = await openWindow();
    await signIn(page, 'site_manager');
    await page.reload();
    await untilReady(page);
    expect(new URL(page.url()).pathname).toBe('/this-week');

    const second = await context.newPage();
    await second.goto('/overruns');
    await untilReady(second);
    await page.goto('/jobs');
    await untilReady(page);

    await page.getByRole('button', { name: personOf('site_manager').name }).click();
    await page.getByRole('menuitem', { name: 'Sign out' }).click();
    await page.waitForURL('**/sign-in');
    await second.getByRole('link', { name: 'Jobs', exact: true }).click();
    await second.waitForURL('**/sign-in?**');
  });
});
