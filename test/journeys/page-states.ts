import type { Page } from 'playwright-core';
import { officeFile, officeRow, sendFile } from './import-file';
import { CLAIM, QUOTED, type KnownJobs, type Stop } from './pages';
import { REPORT_STATES } from './report-states';
import { sendStates } from './send-states';

/** The pages there are, with something opened or gone wrong. */
export function everyState({ rotten, corrected }: KnownJobs): Stop[] {
  const press = (name: string | RegExp) => (page: Page) =>
    page.getByRole('button', { name }).first().click();
  return [
    { name: 'sign-in-empty', path: '/sign-in', as: 'nobody', prepare: press('Sign in') },
    { name: 'welcome-incomplete', path: '/welcome', as: 'nobody' },
    {
      name: 'this-week-writing',
      path: '/this-week',
      as: 'site_manager',
      prepare: async (page) => {
        await press(/^Bill it: job/)(page);
        await page.getByLabel('Bill before tax').fill('1,120');
        await press('Bill the car')(page);
        await press(/Leave a note|Change the note/)(page);
      },
    },
    { name: 'this-week-tables', path: '/this-week', as: 'site_manager', prepare: showTables },
    {
      name: 'this-week-to-come',
      path: '/this-week?week=2026-W20',
      as: 'site_manager',
    },
    {
      name: 'overruns-tables',
      path: '/overruns?by=month',
      as: 'site_manager',
      prepare: showTables,
    },
    {
      name: 'overruns-none',
      path: '/overruns?from=2015-01-01&to=2015-02-01',
      as: 'site_manager',
    },
    { name: 'rot-tables', path: '/rot', as: 'head_office', prepare: showTables },
    { name: 'rot-none', path: '/rot?from=2015-01-01&to=2015-02-01', as: 'site_manager' },
    { name: 'product-tables', path: '/product', as: 'head_office', prepare: showTables },
    { name: 'product-no-norm', path: '/product?product=RC1', as: 'site_manager' },
    { name: 'product-none', path: '/product?from=2015-01-01&to=2015-02-01', as: 'site_manager' },
    { name: 'branches-tables', path: '/branches', as: 'regional_lead', prepare: showTables },
    { name: 'branches-none', path: '/branches?from=2015-01-01&to=2015-02-01', as: 'regional_lead' },
    { name: 'warranty-tables', path: '/warranty', as: 'head_office', prepare: showTables },
    {
      name: 'warranty-sums',
      path: '/warranty?groupBy=ageBand',
      as: 'head_office',
      prepare: async (page) => {
        const buttons = page.getByRole('button', { name: /^How this came about/ });
        await buttons.last().waitFor();
        for (const button of await buttons.all()) await button.click();
      },
    },
    {
      name: 'warranty-cohorts',
      path: '/warranty?groupBy=cohort&asOf=2024-12-31',
      as: 'site_manager',
      prepare: press(/^Curves shown/),
    },
    {
      name: 'warranty-none',
      path: '/warranty?from=2015-01-01&to=2015-02-01',
      as: 'head_office',
    },
    { name: 'scope-as-of', path: '/warranty', as: 'head_office', prepare: press(/^As of/) },
    ...REPORT_STATES,
    { name: 'jobs-none', path: '/jobs?q=nothing-like-it', as: 'site_manager' },
    { name: 'jobs-orders', path: '/jobs', as: 'site_manager', prepare: press('newest first') },
    { name: 'claims-none', path: '/claims?q=nothing-like-it', as: 'site_manager' },
    { name: 'claims-causes', path: '/claims', as: 'site_manager', prepare: press(/^Cause/) },
    {
      name: 'claim-refused',
      path: `/jobs/HAV/${rotten}/claim`,
      as: 'recorder',
      prepare: press('Record the claim'),
    },
    {
      name: 'claim-correcting',
      path: `/claims/${CLAIM}`,
      as: 'site_manager',
      prepare: async (page) => {
        await press('Correct this claim')(page);
        await page.getByLabel('Cost before tax').fill('1,120');
        await press(/^Save/)(page);
        await page.getByText('Write the amount as 120 or 120.50.').waitFor();
      },
    },
    {
      name: 'claim-gone',
      path: '/claims/HAV/no-such-claim',
      as: 'site_manager',
      refused: / 404 /,
    },
    {
      name: 'come-backs-marking',
      path: '/come-backs',
      as: 'site_manager',
      prepare: async (page) => {
        await press(/^Mark:/)(page);
        await press('Save the mark')(page);
      },
    },
    { name: 'come-backs-tables', path: '/come-backs', as: 'site_manager', prepare: showTables },
    {
      name: 'come-backs-none',
      path: '/come-backs?from=2015-01-01&to=2015-02-01',
      as: 'site_manager',
    },
    { name: 'signals-none', path: '/signals?branch=NOWHERE', as: 'site_manager' },
    {
      name: 'signals-open',
      path: '/signals',
      as: 'regional_lead',
      prepare: async (page) => {
        await press(/cars? behind it$/)(page);
        await press('Note that it was seen')(page);
        await page.locator('us-acknowledge-form button[type=submit]').click();
      },
    },
    { name: 'actions-none', path: '/actions?state=dropped', as: 'site_manager' },
    {
      name: 'action-refused',
      path: '/actions/new',
      as: 'head_office',
      prepare: press('Agree it'),
    },
    {
      name: 'action-gone',
      path: '/actions/HAV/999999',
      as: 'site_manager',
      refused: / 404 /,
    },
    {
      name: 'targets-changing',
      path: '/targets',
      as: 'head_office',
      prepare: async (page) => {
        await press(/^(Set|Change): Overrun target of the network/)(page);
        await page.getByRole('textbox').fill('a tenth');
        await press('Save')(page);
      },
    },
    { name: 'quote-tables', path: `/quote?${QUOTED}`, as: 'head_office', prepare: showTables },
    {
      name: 'quote-incomplete',
      path: '/quote',
      as: 'recorder',
      prepare: press('Quote it'),
    },
    { name: 'scope-branches', path: '/jobs', as: 'head_office', prepare: press(/^Branches/) },
    { name: 'scope-week', path: '/this-week', as: 'site_manager', prepare: press(/^Week/) },
    { name: 'scope-dates', path: '/overruns', as: 'site_manager', prepare: press(/^Dates/) },
    { name: 'scope-packages', path: '/overruns', as: 'site_manager', prepare: press(/^Packages/) },
    { name: 'person-menu', path: '/account', as: 'head_office', prepare: press(/head office$/) },
    {
      name: 'void-dialog',
      path: `/jobs/HAV/${rotten}`,
      as: 'site_manager',
      prepare: press('Void this job'),
    },
    {
      name: 'job-sheet-none',
      path: '/jobs/HAV/no-such-job',
      as: 'site_manager',
      refused: / 404 /,
    },
    {
      name: 'set-up-effect',
      path: '/set-up/branches/HAV',
      as: 'head_office',
      prepare: async (page) => {
        await page.getByLabel('Cost of an hour of work').fill('95');
        await page.getByRole('heading', { name: 'Before you save' }).waitFor();
      },
    },
    {
      name: 'set-up-key-shown',
      path: '/set-up/branches/HAV',
      as: 'head_office',
      prepare: async (page) => {
        await page.getByLabel('What the key is for').fill('the office programme');
        await press('Make a key')(page);
        await page.getByText('The key, shown only now.').waitFor();
      },
    },
    {
      name: 'set-up-refused',
      path: '/set-up/people',
      as: 'head_office',
      prepare: press('Add the person'),
    },
    {
      name: 'set-up-removal-refused',
      path: '/set-up/products/CW1',
      as: 'head_office',
      refused: / 409 /,
      prepare: async (page) => {
        await press(/^Take .* out$/)(page);
        await page.locator('us-removal us-trouble').waitFor();
      },
    },
    {
      name: 'set-up-none',
      path: '/set-up/branches/NOWHERE',
      as: 'head_office',
      refused: / 404 /,
    },
    ...['network', 'region', 'branch', 'products', 'package', 'people', 'job'].map(
      (step): Stop => ({
        name: `first-run-${step}`,
        path: `/first-run?step=${step}`,
        as: 'head_office',
      }),
    ),
    {
      name: 'audit-open',
      path: '/audit?action=week.note',
      as: 'head_office',
      prepare: async (page) => {
        await press(/^Open event/)(page);
        await press('Check the chain')(page);
        await page.getByText('The last event that fits').waitFor();
      },
    },
    { name: 'audit-none', path: '/audit?actor=nobody-of-that-name', as: 'head_office' },
    { name: 'audit-who', path: '/audit', as: 'head_office', prepare: press(/^Who/) },
    { name: 'audit-thing', path: '/audit', as: 'head_office', prepare: press(/^To what/) },
    {
      name: 'job-sheet-changes',
      path: `/jobs/HAV/${corrected}?changes=1-2`,
      as: 'site_manager',
      prepare: (page) => page.getByRole('table', { name: /^What changed from/ }).waitFor(),
    },
    {
      name: 'import-refused',
      path: '/import',
      as: 'head_office',
      prepare: press('See what it would change'),
    },
    {
      name: 'import-preview',
      path: '/import',
      as: 'site_manager',
      prepare: (page) =>
        sendFile(page, officeFile([officeRow('look-1'), officeRow('look-2', { 1: '', 6: '' })])),
    },
    {
      name: 'import-columns',
      path: '/import',
      as: 'site_manager',
      prepare: (page) =>
        sendFile(page, officeFile(['look-3;Orsa;Brinkeby'], 'Job no;Builder;Model')),
    },
    {
      name: 'import-done',
      path: '/import',
      as: 'site_manager',
      prepare: async (page) => {
        await sendFile(page, officeFile([officeRow(`look-${Date.now()}`)]));
        await press(/^Write 1 car/)(page);
        await page.getByRole('heading', { level: 1, name: /1 car written/ }).waitFor();
      },
    },
    ...sendStates(rotten),
    {
      name: 'account-refused',
      path: '/account',
      as: 'site_manager',
      prepare: press('Change the password'),
    },
  ];
}

/** Turns every picture of a page into its table. */
async function showTables(page: Page): Promise<void> {
  const buttons = page.getByRole('button', { name: /^Show as table/ });
  await buttons.last().waitFor();
  const names = await buttons.evaluateAll((all) =>
    all.map((one) => one.getAttribute('aria-label')),
  );
  for (const name of names) await page.getByRole('button', { name: name!, exact: true }).click();
}
