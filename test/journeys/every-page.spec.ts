import { mkdirSync } from 'node:fs';
import path from 'node:path';
import type { Page } from 'playwright-core';
import { root } from '../support/project-files';
import { auditPage, untilStill } from './audit-page';
import { LAPTOP, PHONE, useChromium, WIDE, type Visit } from './chromium';
import { everyPage, everyState, type Stop } from './pages';
import { readRawRecord } from './raw-record';
import { servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';

const PICTURES = path.join(root, 'test/output/pages');

/** Where pages are looked at: both themes on a phone and a laptop, light on a large screen. */
const LOOKS = [
  { name: '1440-light', size: LAPTOP, colorScheme: 'light' },
  { name: '1440-dark', size: LAPTOP, colorScheme: 'dark' },
  { name: '360-dark', size: PHONE, colorScheme: 'dark' },
  { name: '360-light', size: PHONE, colorScheme: 'light' },
  { name: '1920-light', size: WIDE, colorScheme: 'light' },
] as const;

/** Every page and what opens on it, in every look: held to WCAG 2.2 AA, to its width, to legible text; pictures are kept. */
describe('every page', () => {
  const openWindow = useChromium(() => servedDemo().url);
  const visits = new Map<Stop['as'], Visit>();
  const known = { rotten: '', unbilled: '' };

  beforeAll(() => {
    mkdirSync(PICTURES, { recursive: true });
    const own = readRawRecord(servedDemo().data).jobs.filter(({ branch }) => branch === 'HAV');
    const holed = own.filter(({ job }) => JSON.stringify(job).includes('"holed"') && job.invoice);
    known.rotten = holed.at(-1)!.jobRef;
    known.unbilled = own.filter(({ job }) => !job.invoice).at(-1)!.jobRef;
  });

  async function visit(as: Stop['as']): Promise<Visit> {
    const made = visits.get(as) ?? (await openWindow());
    if (!visits.has(as) && as !== 'nobody') await signIn(made.page, as);
    visits.set(as, made);
    return made;
  }

  async function open(stop: Stop): Promise<Page> {
    const { page, troubles } = await visit(stop.as);
    if (stop.refused) troubles.expect(stop.refused);
    await page.setViewportSize(LAPTOP);
    await page.emulateMedia({ colorScheme: 'light' });
    await page.goto(stop.path);
    await untilReady(page);
    await stop.prepare?.(page);
    return page;
  }

  async function lookedAt(stop: Stop, looks: readonly (typeof LOOKS)[number][]): Promise<string[]> {
    const page = await open(stop);
    const wrong: string[] = [];
    for (const { name, size, colorScheme } of looks) {
      await page.setViewportSize(size);
      await page.emulateMedia({ colorScheme });
      await untilStill(page);
      const found = await auditPage(page);
      wrong.push(...found.map((one) => `${name}: ${one}`));
      await page.screenshot({
        path: path.join(PICTURES, `${stop.name}-${name}.png`),
        fullPage: true,
      });
    }
    return wrong;
  }

  const pages = everyPage({ rotten: '{rotten}', unbilled: '{unbilled}' });
  const states = everyState({ rotten: '{rotten}', unbilled: '{unbilled}' });

  function named(stop: Stop): Stop {
    return {
      ...stop,
      path: stop.path.replace('{rotten}', known.rotten).replace('{unbilled}', known.unbilled),
    };
  }

  test.each(pages.map((stop) => [stop.name, stop] as const))(
    '%s, light and dark, on phone, laptop and large screen, has nothing wrong',
    async (_name, stop) => {
      expect(await lookedAt(named(stop), LOOKS)).toEqual([]);
    },
  );

  test.each(states.map((stop) => [stop.name, stop] as const))(
    '%s, light on a laptop and dark on a phone, has nothing wrong',
    async (_name, stop) => {
      expect(await lookedAt(named(stop), [LOOKS[0], LOOKS[2]])).toEqual([]);
    },
  );
});
