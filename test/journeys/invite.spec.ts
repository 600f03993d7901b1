import type { Locator, Page } from 'playwright-core';
import { ask } from './branch-system';
import { useChromium } from './chromium';
import { servedDemo } from './served-demo';
import { personOf, signIn, typeSignIn, untilReady } from './sign-in';

const INVITED = { email: 'newcomer@underseam.example', name: 'Sunna Draskveil' };

/** A mailed link, read in Mailbox, gives a person their first password, and another when it was forgotten. */
describe('invitation and forgotten password', () => {
  const openWindow = useChromium(() => servedDemo().url);

  /** Head office opens Mailbox from the menu and the invited person's newest mail of a subject in it. */
  async function openMail(subject: string): Promise<{ page: Page; mail: Locator }> {
    const { page } = await openWindow();
    await signIn(page, 'head_office');
    await page.getByRole('button', { name: personOf('head_office').name }).click();
    await page.getByRole('menuitem', { name: 'Mailbox' }).click();
    await page
      .getByRole('link', { name: subject })
      .filter({ hasText: INVITED.email })
      .first()
      .click();
    return { page, mail: page.locator('article').filter({ hasText: subject }) };
  }

  async function setPassword(page: Page, password: string): Promise<void> {
    await page.getByLabel('New password').fill(password);
    await page.getByRole('button', { name: 'Set the password' }).click();
  }

  test('a person invited without a password, by the mail in Mailbox, sets one and stands on their first page', async () => {
    expect((await invite()).status).toBe(201);
    const { page, mail } = await openMail('Your sign-in for Underseam');
    expect(await mail.innerText()).toContain('Hello Sunna Draskveil,');
    await mail.getByRole('link').click();
    await page.waitForURL('**/welcome?**');
    await page.getByRole('heading', { name: 'Welcome to Underseam' }).waitFor();
    const link = page.url();
    await setPassword(page, 'too-short');
    await page.getByText('At least 12 characters.').waitFor();
    await setPassword(page, 'first-seam-then-bead');
    await page.getByText('The password is set. This browser is still signed in as').waitFor();

    const { page: own, troubles } = await openWindow();
    await own.goto('/sign-in');
    await typeSignIn(own, { ...INVITED, password: 'first-seam-then-bead' });
    await own.waitForURL('**/this-week');
    await untilReady(own);
    await own.getByRole('button', { name: /^Sunna Draskveil\s*, site manager$/ }).waitFor();

    troubles.expect(/ 422 /);
    await own.goto(link);
    await setPassword(own, 'a-second-time-by-the-same');
    await own.getByText('This link has been used or is too old. Ask for a new one.').waitFor();
  });

  test('a password forgotten, asked for on Sign in, is set anew by mail and the old one is over', async () => {
    const { page, troubles } = await openWindow();
    await page.goto('/sign-in');
    await page.getByRole('link', { name: 'Forgotten the password?' }).click();
    await page.getByLabel('E-mail').fill(INVITED.email);
    await page.getByRole('button', { name: 'Send me a link' }).click();
    await page.getByText('a mail with a link is on its way').waitFor();

    const { mail } = await openMail('A new password for Underseam');
    await page.goto((await mail.getByRole('link').getAttribute('href'))!);
    await page.getByRole('heading', { name: 'A new password' }).waitFor();
    await setPassword(page, 'wax-flows-when-it-is-warm');
    await page.getByText('The password is set. Sign in with it.').waitFor();
    troubles.expect(/ 401 /);
    await typeSignIn(page, { ...INVITED, password: 'first-seam-then-bead' });
    await page.getByText('E-mail and password do not belong together. Try again.').waitFor();
    await typeSignIn(page, { ...INVITED, password: 'wax-flows-when-it-is-warm' });
    await page.waitForURL('**/this-week');
  });
});

async function invite() {
  const { url } = servedDemo();
  const json = { 'Content-Type': 'application/json' };
  const { email, password } = personOf('head_office');
  const { body } = await ask(`${url}/api/auth/sign-in`, {
    method: 'POST',
    headers: json,
    body: JSON.stringify({ email, password }),
  });
  const { accessToken } = body as { accessToken: string };
  return ask(`${url}/api/people`, {
    method: 'POST',
    headers: { ...json, Authorization: `Bearer ${accessToken}` },
    body: JSON.stringify({ ...INVITED, role: 'site_manager', branches: ['KOR'] }),
  });
}
