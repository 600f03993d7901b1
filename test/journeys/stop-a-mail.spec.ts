import { useChromium } from './chromium';
import { servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';

/** The link at the foot of a digest, read in Mailbox, stops that mail; Account shows it off. */
describe('stopping a mail by its link', () => {
  const openWindow = useChromium(() => servedDemo().url);

  test('head office follows the link of the month’s mail, presses the button and finds it off in Account', async () => {
    const { page } = await openWindow();
    await signIn(page, 'head_office');
    await page.goto('/mailbox');
    await page.getByRole('link', { name: 'The network in January 2026' }).first().click();
    const mail = page.locator('article').filter({ hasText: 'The network in January 2026' });
    await mail.locator('a[href*="/unsubscribe?token="]').click();
    await page.getByRole('heading', { name: 'Stop a mail' }).waitFor();
    await page.getByRole('button', { name: 'Stop this mail' }).click();
    await page.getByText('no longer comes').waitFor();
    await page.reload();
    await page.getByText('is stopped already').waitFor();
    await page.getByRole('link', { name: 'Account' }).click();
    await untilReady(page);
    const box = page.getByRole('checkbox', { name: 'The network in the month that ended' });
    expect(await box.isChecked()).toBe(false);
    // As it was found: other journeys share this network.
    await box.check();
    await page.getByText('Kept:').waitFor();
  });
});
