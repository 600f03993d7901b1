import type { Page } from 'playwright-core';
import type { SaidWeek } from './say-week';

/** Reads the answer and the bridge off the page *This week*, as they stand there. */
export async function readWeek(page: Page): Promise<SaidWeek> {
  const parts = page.locator('us-answer h1 > :is(span, strong, a)');
  return {
    sentence: (await parts.allTextContents()).join(''),
    second: (await page.locator('us-answer .second').innerText()).trim(),
    bridge: (await page.locator('us-bridge-chart svg text').allTextContents()).map((text) =>
      text.trim(),
    ),
  };
}
