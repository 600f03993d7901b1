import type { BrowserContextOptions, Page } from 'playwright-core';
import type { JobContent, JobSheet } from '#shared/contracts/jobs';
import { ask } from './branch-system';
import { PHONE, useChromium } from './chromium';
import { begin, goTo } from './send-states';
import { servedDemo, TODAY } from './served-demo';
import { personOf, signIn } from './sign-in';

/** A job sent from a phone whose line comes and goes, in the built product with its service worker. */
describe('sending a job on a bad line', () => {
  const openWindow = useChromium(() => servedDemo().url);

  /** A recorder's phone; with the browser's workers left out where calls are tampered with on their way. */
  async function openPhone(serviceWorkers: BrowserContextOptions['serviceWorkers'] = 'allow') {
    const visit = await openWindow({ viewport: PHONE, hasTouch: true, serviceWorkers });
    await signIn(visit.page, 'recorder');
    await visit.page.goto('/send');
    return visit;
  }

  test('a job begun, the line gone and the page opened anew: it is there, waits, and is sent once when the line is back', async () => {
    const { page, context, troubles } = await openPhone();
    await page.waitForFunction(() => navigator.serviceWorker.controller !== null);
    await writeJob(page, 'off-1');
    troubles.expect(/ERR_INTERNET_DISCONNECTED|ERR_FAILED/);

    await context.setOffline(true);
    await page.reload();
    await goTo(page, /^car/);
    expect(await page.getByLabel('Reference').inputValue()).toBe('off-1');
    expect(await page.getByLabel('Make').inputValue()).toBe('Velder');

    await sendIt(page);
    await page.getByText('waiting to be sent', { exact: true }).waitFor();
    await page.getByText(/1 waiting to be sent, no line/).waitFor();
    expect((await jobOf('off-1')).status).toBe(404);
    await page.goto('/jobs');
    await page.getByRole('link', { name: /1 waiting to be sent, no line/ }).waitFor();

    await context.setOffline(false);
    // It goes out from whichever page is open; leaving that one meanwhile would cut it off and send it anew.
    await page
      .getByRole('link', { name: /1 waiting to be sent|sending/ })
      .waitFor({ state: 'hidden' });
    await page.goto('/send');
    await page.getByText('sent', { exact: true }).waitFor();
    const { body } = await jobOf('off-1');
    expect(body).toMatchObject({ revision: 1, source: 'form' });
    expect(body.revisions).toHaveLength(1);
  });

  test('without a line, at the product’s first address, opens the shell and Send a job', async () => {
    const { page, context, troubles } = await openPhone();
    await page.waitForFunction(() => navigator.serviceWorker.controller !== null);
    troubles.expect(/ERR_INTERNET_DISCONNECTED|ERR_FAILED/);
    await context.setOffline(true);
    await page.goto('/');
    await page.waitForURL('**/send');
    await page.getByRole('heading', { name: 'Send a job' }).waitFor();
    await page.getByRole('button', { name: personOf('recorder').name }).waitFor();
    expect(await page.getByRole('button', { name: 'Begin a job' }).isEnabled()).toBe(true);
  });

  test('the answer lost on its way back, is sent once and not taken for somebody else’s', async () => {
    const { page, troubles } = await openPhone('block');
    troubles.expect(/ERR_FAILED| 412 /);
    let lost = 0;
    await page.route('**/api/branches/HAV/jobs/lost-1?**', async (route) => {
      if (route.request().method() !== 'PUT' || lost > 0) return route.continue();
      lost += 1;
      await route.fetch();
      return route.abort();
    });
    await writeJob(page, 'lost-1');
    await sendIt(page);
    await page.getByText('sent', { exact: true }).waitFor();
    expect(lost).toBe(1);
    const { body } = await jobOf('lost-1');
    expect(body).toMatchObject({ revision: 1, source: 'form' });
    expect(body.revisions).toHaveLength(1);
  });

  test('a reference that is taken, is refused with who has it; under another it goes', async () => {
    const { page, troubles } = await openPhone('block');
    troubles.expect(/ 412 /);
    const taken = await call('/api/branches/HAV/jobs/taken-1', {
      method: 'PUT',
      body: JSON.stringify(OTHER),
    });
    expect(taken.status).toBe(201);
    await writeJob(page, 'taken-1');
    await sendIt(page);
    await page.getByText(/^refused: There already is one/).waitFor();
    expect(await page.getByText(/^refused:/).innerText()).toContain(personOf('site_manager').name);

    await page.getByRole('link', { name: /^Mend it: .*taken-1/ }).click();
    await goTo(page, /^car/);
    await page.getByLabel('Reference').fill('taken-2');
    await sendIt(page);
    await page.getByText('sent', { exact: true }).waitFor();
    expect((await jobOf('taken-2')).body.revision).toBe(1);
    expect((await jobOf('taken-1')).body).toMatchObject({ revision: 1, package: 'cavity' });
  });
});

const OTHER: JobContent = {
  vehicle: { make: 'Velder', model: 'Ondra', bodyType: 'estate', firstRegistered: '2014-03' },
  package: 'cavity',
  completedOn: TODAY,
  actual: { stages: { apply: 90 } },
};

/** Writes down all that a job cannot do without. */
async function writeJob(page: Page, jobRef: string): Promise<void> {
  await begin(page);
  await page.getByLabel('Reference').fill(jobRef);
  await goTo(page, /^package/);
  await page.getByLabel('Package').selectOption('full');
  await page.getByLabel('Finished on').fill(TODAY);
  await goTo(page, /^stages/);
  await page.getByRole('button', { name: 'strip, add 30 minutes' }).click();
  await page.getByText(/Kept on this/).waitFor();
}

async function sendIt(page: Page): Promise<void> {
  await goTo(page, /^look it over/);
  await page.getByRole('button', { name: 'Send job' }).click();
  await page.waitForURL('**/send');
}

/** A job as the site manager reads it through the API. */
async function jobOf(jobRef: string): Promise<{ status: number; body: JobSheet }> {
  const { status, body } = await call(`/api/branches/HAV/jobs/${jobRef}`, {});
  return { status, body: body as JobSheet };
}

async function call(path: string, init: { method?: string; body?: string }) {
  const { url } = servedDemo();
  const { email, password } = personOf('site_manager');
  const json = { 'Content-Type': 'application/json' };
  const signedIn = await ask(`${url}/api/auth/sign-in`, {
    method: 'POST',
    headers: json,
    body: JSON.stringify({ email, password }),
  });
  const { accessToken } = signedIn.body as { accessToken: string };
  return ask(url + path, { ...init, headers: { ...json, Authorization: `Bearer ${accessToken}` } });
}
