import type { Page } from 'playwright-core';
import sharp from 'sharp';
import type { ClaimRow } from '#shared/contracts/claim-list';
import { ask, finishedCar, pushJob } from './branch-system';
import { PHONE, useChromium } from './chromium';
import { servedDemo, TODAY } from './served-demo';
import { personOf, signIn, untilReady } from './sign-in';

const JOB = 'claimed-1';
const CLAIM = `W-${TODAY}`;

/** A claim from the workshop to head office: recorded on a phone, decided, made dearer than a branch may decide, decided above. */
describe('a claim on a job done before', () => {
  const openWindow = useChromium(() => servedDemo().url);

  beforeAll(async () => {
    const { status } = await pushJob(servedDemo().url, JOB, finishedCar());
    expect(status).toBe(201);
  });

  async function enter(role: 'recorder' | 'site_manager' | 'head_office', path: string) {
    const phone = role === 'recorder' ? { viewport: PHONE, hasTouch: true } : {};
    const { page, troubles } = await openWindow(phone);
    await signIn(page, role);
    await page.goto(path);
    await untilReady(page);
    return { page, troubles };
  }

  /** The claims on the job as somebody reads them through the API. */
  async function claims(role: 'recorder' | 'site_manager'): Promise<ClaimRow[]> {
    const { url } = servedDemo();
    const { email, password } = personOf(role);
    const signedIn = await ask(`${url}/api/auth/sign-in`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify({ email, password }),
    });
    const { accessToken } = signedIn.body as { accessToken: string };
    const { body } = await ask(`${url}/api/claims?branch=HAV&jobRef=${JOB}`, {
      headers: { Authorization: `Bearer ${accessToken}` },
    });
    return (body as { items: ClaimRow[] }).items;
  }

  const heading = (page: Page): Promise<string> =>
    page.getByRole('heading', { level: 1 }).innerText();

  test('on a phone, from the job sheet, a recorder records it with a photo; a broken line and a reload lose nothing', async () => {
    const { page, troubles } = await enter('recorder', `/jobs/HAV/${JOB}`);
    await page.getByRole('link', { name: 'Record a claim' }).click();
    await page.getByRole('radio', { name: 'sill, outer, left' }).focus();
    await page.keyboard.press('Enter');
    await page.getByText('may not be fit for the road').waitFor();
    await page.getByRole('radio', { name: /^too thin a coat/ }).check();
    await page.getByLabel('Labour, minutes').fill('45');
    expect(await page.getByLabel(/^Cost/).count()).toBe(0);
    const photo = {
      create: { width: 40, height: 30, channels: 3, background: '#7a3b2a' },
    } as const;
    await page.getByLabel('Choose photos of the claim').setInputFiles({
      name: 'sill.jpg',
      mimeType: 'image/jpeg',
      buffer: await sharp(photo).jpeg().toBuffer(),
    });
    await page.getByText('kept here').waitFor();

    troubles.expect(/ERR_FAILED|ERR_INTERNET_DISCONNECTED/);
    await page.route(`**/api/branches/HAV/claims/${CLAIM}`, (route) => route.abort());
    await page.getByRole('button', { name: 'Record the claim' }).click();
    await page.getByText(/No answer from the server/).waitFor();
    await page.reload();
    await untilReady(page);
    expect(await page.getByLabel('Labour, minutes').inputValue()).toBe('45');
    await page.getByText('kept here').waitFor();
    expect(await claims('recorder')).toEqual([]);

    await page.unroute(`**/api/branches/HAV/claims/${CLAIM}`);
    await page.getByRole('button', { name: 'Record the claim' }).click();
    await page.waitForURL(`**/claims/HAV/${CLAIM}`);
    await page.getByText(`Claim ${CLAIM} recorded.`).first().waitFor();
    await page.getByRole('img', { name: 'Photo 1 of the claim' }).waitFor();
    expect(await heading(page)).toMatch(/^Open, made on 2 February 2026/);
    const [row, ...others] = await claims('recorder');
    expect(others).toEqual([]);
    expect(row).toMatchObject({
      claimRef: CLAIM,
      zone: 'sill_outer',
      side: 'left',
      cause: 'thin_coverage',
      decision: 'open',
      counted: true,
      labourMinutes: 45,
    });
    expect(row).not.toHaveProperty('costCents');
  });

  test('from the list, the site manager decides it; above the limit the decision waits for head office', async () => {
    const { page } = await enter('site_manager', '/claims');
    await page.getByRole('link', { name: CLAIM, exact: true }).click();
    await page.waitForURL(`**/claims/HAV/${CLAIM}`);
    await page.getByRole('button', { name: 'Decide or correct this claim' }).click();
    await page.getByLabel('Cost before tax').fill('120');
    await page.getByRole('radio', { name: /^accepted/ }).check();
    await page.getByRole('button', { name: 'Save and decide: accepted' }).click();
    await page.getByText('Saved. The claim is decided: accepted.').waitFor();
    expect((await claims('site_manager'))[0]).toMatchObject({
      decision: 'accepted',
      decidedOn: TODAY,
      costCents: 12_000,
    });

    await page.getByRole('button', { name: 'Correct this claim' }).click();
    await page.getByLabel('Cost before tax').fill('700');
    await page.getByText(/head office decides\. What you choose here waits/).waitFor();
    await page.getByRole('button', { name: 'Save the claim' }).click();
    await page.getByText(/accepted waits as a proposal/).waitFor();
    await page.getByRole('heading', { level: 1, name: /^Waits for head office/ }).waitFor();
    expect((await claims('site_manager'))[0]).toMatchObject({
      decision: 'open',
      proposedDecision: 'accepted',
      costCents: 70_000,
    });
    await page.goto('/claims?waiting=true');
    await untilReady(page);
    await page
      .getByRole('row', { name: /waits for head office/ })
      .first()
      .waitFor();
  });

  test('head office decides it; a manager who was slower sees both versions; the history tells who changed what', async () => {
    const { page: manager, troubles } = await enter('site_manager', `/claims/HAV/${CLAIM}`);
    await manager.getByRole('button', { name: 'Decide or correct this claim' }).click();
    await manager.getByLabel('Note').fill('Wheel house liner was left off.');

    const { page } = await enter('head_office', '/claims?waiting=true');
    await page.getByRole('link', { name: CLAIM, exact: true }).click();
    await page.getByRole('button', { name: 'Decide or correct this claim' }).click();
    await page.getByRole('radio', { name: /^goodwill/ }).check();
    await page.getByRole('button', { name: 'Save and decide: goodwill' }).click();
    await page.getByText('Saved. The claim is decided: goodwill.').waitFor();
    expect((await claims('site_manager'))[0]).toMatchObject({
      decision: 'goodwill',
      proposedDecision: null,
      counted: true,
    });

    const history = page.locator('us-claim-history li');
    await history.nth(3).waitFor();
    const told = await history.allInnerTexts();
    expect(told).toHaveLength(4);
    expect(told[0]).toMatch(new RegExp(`^Changed by ${personOf('head_office').name}[^]*goodwill`));
    expect(told[1]).toMatch(/^Changed by[^]*€120\.00[^]*€700\.00/);
    expect(told[2]).toMatch(new RegExp(`^Changed by ${personOf('site_manager').name}[^]*accepted`));
    expect(told[3]).toMatch(new RegExp(`^Recorded by ${personOf('recorder').name}`));

    troubles.expect(/ 412 /);
    await manager.getByRole('button', { name: /^Save/ }).click();
    const both = manager.getByRole('table', { name: 'The claim on record and in your form' });
    await both.waitFor();
    expect(await both.innerText()).toMatch(/Decision\s+goodwill\s+accepted/);
    expect(await both.innerText()).toMatch(/Note\s+nothing\s+Wheel house liner was left off\./);
    await manager.getByRole('button', { name: 'Take what is on record' }).click();
    expect(await manager.getByLabel('Note').inputValue()).toBe('');
  });
});
