import type { Page } from 'playwright-core';
import type { Stop } from './pages';

/** The form that sends a job, at each of its steps and with what can go wrong in it. */
export function sendStates(corrected: string): Stop[] {
  const at = (name: string, step: RegExp, prepare?: (page: Page) => Promise<unknown>): Stop => ({
    name: `send-${name}`,
    path: '/send',
    as: 'site_manager',
    prepare: async (page) => {
      await begin(page);
      await goTo(page, step);
      await prepare?.(page);
    },
  });
  return [
    { name: 'send-car', path: '/send', as: 'recorder', prepare: begin },
    at('package', /^package/),
    at('stages', /^stages/, async (page) => {
      await page.getByRole('button', { name: 'strip, add 30 minutes' }).click();
      await page.getByRole('button', { name: 'Start the timer of clean' }).click();
      await page.getByRole('button', { name: 'The owner agreed to more' }).click();
    }),
    at('findings', /^findings/, setFinding),
    at('findings-list', /^findings/, async (page) => {
      await page.getByRole('button', { name: 'As a list' }).click();
    }),
    at('product', /^product/),
    at('bill', /^bill/, (page) => page.getByRole('button', { name: 'Bill it now' }).click()),
    at('review', /^look it over/, async (page) => {
      await page.getByRole('heading', { name: 'Before it can be sent' }).waitFor();
    }),
    {
      name: 'send-correction',
      path: `/jobs/HAV/${corrected}/correct`,
      as: 'site_manager',
      prepare: (page) => page.getByRole('button', { name: 'Send job' }).waitFor(),
    },
    {
      name: 'send-gone',
      path: '/send/no-such-draft',
      as: 'recorder',
      prepare: (page) => page.getByRole('heading', { name: /not on this device/ }).waitFor(),
    },
  ];
}

/** Begins a job and names its car. */
export async function begin(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Begin a job' }).click();
  await page.getByLabel('Make').fill('Velder');
  await page.getByLabel('Model').fill('Tessock');
  await page.getByLabel('Body type').selectOption('hatchback');
  await page.getByLabel('First registered').fill('2009-05');
}

/** Goes to a step by the list of steps. */
export async function goTo(page: Page, step: RegExp): Promise<void> {
  await page.getByRole('heading', { level: 1 }).getByRole('button').click();
  await page.getByRole('menuitem', { name: step }).click();
  await page.getByRole('menuitem', { name: step }).waitFor({ state: 'detached' });
}

/** Sets a load-bearing bubble of the left inner sill that was patched, by keyboard on the map. */
export async function setFinding(page: Page): Promise<void> {
  await page.getByRole('radio', { name: 'sill, inner, left' }).focus();
  await page.keyboard.press('Enter');
  const choose = (row: string, name: string): Promise<void> =>
    page.getByRole('group', { name: row }).getByRole('button', { name, exact: true }).click();
  await choose('Seen as', 'bubbling');
  await choose('Worked as', 'holed');
  await choose('Done', 'patched');
  await choose('Load-bearing there', 'load-bearing');
}
