import type { Locator, Page } from 'playwright-core';
import { readTable } from './table';

/** A picture and its table, by their heading. */
export function twinOf(page: Page, heading: string): Locator {
  return page
    .locator('us-table-twin')
    .filter({ has: page.getByRole('heading', { name: heading }) });
}

/** Shows a picture as its table, reads that, and shows the picture again. */
export async function readTwin(page: Page, heading: string): Promise<Record<string, string>[]> {
  await page.getByRole('button', { name: `Show as table: ${heading}` }).click();
  const rows = await readTable(twinOf(page, heading).getByRole('table'));
  await page.getByRole('button', { name: `Show as picture: ${heading}` }).click();
  return rows;
}
