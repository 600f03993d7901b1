import { join } from 'node:path';
import { chromium } from 'playwright-core';
import { DEMO_PEOPLE } from '#seeds/demo-people';
import { median, ratioLine, type Line } from './report';
import { serve } from './serve';

const ROUNDS = 7;
const QUIET = [
  '--no-sandbox',
  '--disable-quic',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** First view of This week on the demo network with nothing cached, against the bare answer it shows. */
export async function benchPage(folder: string, executablePath: string): Promise<Line[]> {
  const served = await serve(join(folder, 'demo'), { UNDERSEAM_DEMO: 'on' });
  const manager = DEMO_PEOPLE.find(({ role }) => role === 'site_manager');
  if (!manager) throw new Error('the demo has no site manager');
  const browser = await chromium.launch({ executablePath, args: QUIET });
  const views: number[] = [];
  const answers: number[] = [];
  try {
    for (let round = 0; round < ROUNDS; round += 1) {
      const context = await browser.newContext();
      const signedIn = await context.request.post(`${served.url}/api/auth/sign-in`, {
        data: { email: manager.email, password: manager.password },
      });
      const { accessToken } = (await signedIn.json()) as { accessToken: string };
      let begun = performance.now();
      await context.request.get(`${served.url}/api/analytics/margin`, {
        headers: { authorization: `Bearer ${accessToken}` },
      });
      answers.push(performance.now() - begun);
      const page = await context.newPage();
      begun = performance.now();
      await page.goto(`${served.url}/this-week`);
      // Looked for at every frame: a locator looks again only after half a second.
      await page.waitForFunction(
        () => document.querySelector('us-weekly-margin-chart svg circle') !== null,
        undefined,
        { polling: 'raf' },
      );
      views.push(performance.now() - begun);
      await context.close();
    }
  } finally {
    await browser.close();
    await served.stop();
  }
  return [
    ratioLine(
      'first view of This week until its chart stands, ms',
      median(views),
      'the margin answer alone, ms',
      median(answers),
      'view under 1000 ms',
    ),
  ];
}
