import type { Page } from 'playwright-core';
import { DEMO_PEOPLE, type DemoPerson } from '#seeds/demo-people';
import type { Role } from '#shared/domain/vocabulary';

const FIRST_PAGES: Readonly<Record<Role, string>> = {
  recorder: '/send',
  site_manager: '/this-week',
  regional_lead: '/branches',
  head_office: '/warranty',
};

/** The demo's person of a role. */
export function personOf(role: Role): DemoPerson {
  const person = DEMO_PEOPLE.find((one) => one.role === role);
  if (!person) throw new Error(`the demo has no ${role}`);
  return person;
}

/** Fills in the page *Sign in* as a person does and presses its button; stays where that leads. */
export async function typeSignIn(
  page: Page,
  { email, password }: Pick<DemoPerson, 'email' | 'password'>,
): Promise<void> {
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
}

/** Opens the product's own address, as people do, signs a role's person in by typing and waits for their first page. */
export async function signIn(page: Page, role: Role): Promise<void> {
  await page.goto('/');
  await typeSignIn(page, personOf(role));
  await page.waitForURL(`**${FIRST_PAGES[role]}`);
  await untilReady(page);
}

/** Waits until the page shows its answer and nothing on it is being fetched anew. */
export async function untilReady(page: Page): Promise<void> {
  await page.locator('main us-answer h1, main h1').first().waitFor();
  await page.waitForFunction(
    () => !document.querySelector('main [aria-busy="true"], main [role="status"] .us-unseen'),
  );
}
