import type { Page } from 'playwright-core';
import type { Stop } from './pages';

const press = (name: string) => (page: Page) => page.getByRole('button', { name }).first().click();

/** The warranty-risk report asked for, issued and not there, and its schedule refused. */
export const REPORT_STATES: readonly Stop[] = [
  {
    name: 'warranty-report-asked',
    path: '/warranty/reports?asOf=2025-12-31',
    as: 'head_office',
    prepare: press('Issue this report'),
  },
  {
    name: 'warranty-report-issued',
    path: '/warranty/reports?asOf=2025-12-31',
    as: 'head_office',
    prepare: async (page) => {
      await press('Issue this report')(page);
      await press('Issue the report')(page);
      await page.getByRole('heading', { level: 1, name: /as issued on/ }).waitFor();
    },
  },
  {
    name: 'warranty-report-none',
    path: '/warranty/reports/999999',
    as: 'head_office',
    refused: / 404 /,
  },
  {
    name: 'warranty-schedule-refused',
    path: '/warranty/reports/schedule',
    as: 'head_office',
    prepare: async (page) => {
      await page.getByLabel('Day of the month').fill('31');
      await press('Save the schedule')(page);
      await page.locator('us-schedule-form us-trouble').first().waitFor();
    },
  },
];
