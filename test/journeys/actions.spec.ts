import { useChromium } from './chromium';
import { servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';

const WHAT = 'Count the clips on strip, before refit asks for them';
const ANSWER = 'Clips are ordered; strip counts them from Monday.';

/** From a signal to what is done about it: the lead sees and agrees, the manager answers, the lead ends it. */
describe('an action about a signal', () => {
  const openWindow = useChromium(() => servedDemo().url);

  async function enter(role: 'site_manager' | 'regional_lead', path: string) {
    const { page } = await openWindow();
    await signIn(page, role);
    await page.goto(path);
    await untilReady(page);
    return page;
  }

  test('seen and acknowledged, agreed from it, answered by the manager, and marked as done', async () => {
    const lead = await enter('regional_lead', '/signals?branch=HAV');
    const signal = lead.locator('us-signal-item').first();
    const title = (await signal.getByRole('heading').innerText()).replace(/^danger\s*/, '').trim();

    await signal.getByRole('button', { name: 'Note that it was seen' }).click();
    await signal.getByLabel('What you found and what is done about it').fill('Rang the branch.');
    await signal.locator('us-acknowledge-form button[type=submit]').click();
    await lead.getByText(`Noted as seen: ${title}.`).first().waitFor();
    const seen = lead.locator('us-signal-item', { hasText: 'Rang the branch.' });
    await seen.waitFor();

    await seen.getByRole('link', { name: 'Agree an action' }).click();
    await lead.getByRole('heading', { name: `About the signal: ${title}` }).waitFor();
    expect(await lead.getByLabel('Branch').inputValue()).toBe('HAV');
    await lead.getByLabel('What is done').fill(WHAT);
    await lead.getByLabel('Who does it').fill('the two on refit');
    await lead.getByRole('button', { name: 'Agree it' }).click();
    await lead.waitForURL('**/actions/HAV/*');
    await untilReady(lead);
    expect(await lead.getByRole('main').innerText()).toContain(WHAT);
    const address = new URL(lead.url()).pathname;

    const manager = await enter('site_manager', '/actions');
    await manager.getByRole('table').getByRole('link', { name: WHAT }).click();
    await manager.getByLabel('Your answer').fill(ANSWER);
    await manager.getByRole('button', { name: 'Answer', exact: true }).click();
    await manager.getByText('Your answer is with the action.').first().waitFor();
    expect(new URL(manager.url()).pathname).toBe(address);

    await lead.reload();
    await untilReady(lead);
    await lead.getByText(ANSWER).waitFor();
    await lead.getByRole('button', { name: 'It is done' }).click();
    await lead.getByText('The action is marked as done.').first().waitFor();
    await lead.getByRole('button', { name: 'Take it up again' }).waitFor();
    await lead.goto('/actions?state=done');
    await untilReady(lead);
    expect(await lead.getByRole('table').innerText()).toContain(WHAT);
  });
});
