import type { Page } from 'playwright-core';
import { BRANCHES } from '#seeds/branches';
import { badCohortOn, PLANTED_FACTS } from '#seeds/planted-facts';
import { useChromium } from './chromium';
import { readTwin } from './read-twin';
import { servedDemo, TODAY } from './served-demo';
import { signIn, untilReady } from './sign-in';

/** What was planted among claims comes out on Warranty, as head office reads it. */
describe('the truths planted among claims', () => {
  const openWindow = useChromium(() => servedDemo().url);
  let page: Page;

  beforeAll(async () => {
    page = (await openWindow()).page;
    await signIn(page, 'head_office');
    await page.goto('/warranty');
    await untilReady(page);
  });

  test('branches that skip a check or spray thinly stand above what was expected of them', async () => {
    const rows = await readTwin(page, 'Claims against expected, by branch');
    const ratios = new Map(rows.map((row) => [row['Branch'], row['Ratio']]));
    const { checkSkippingBranch, underApplyingBranch } = PLANTED_FACTS;
    for (const { branch } of [checkSkippingBranch, underApplyingBranch]) {
      const { name } = BRANCHES.find(({ code }) => code === branch)!;
      expect([name, ratios.get(name)]).toEqual([name, expect.stringMatching(/^\d\.\d above$/)]);
      expect(await page.locator('us-answer').innerText()).toContain(name);
    }
  });

  test('voids sprayed from one end only bring claims more often, ages alike', async () => {
    const rows = await readTwin(page, 'Claims within 24 months, missed against done');
    const missed = rows.find((row) => Object.values(row).includes('voids sprayed from one end'));
    expect(missed?.['Times as likely']).toMatch(/^\d\.\d above$/);
  });

  test('the half-year of the bad delivery has more claims than its cars had to expect', async () => {
    const cohort = badCohortOn(TODAY).replace('-', ' ');
    await page.getByText(`${cohort} stands above:`).waitFor();
  });
});
