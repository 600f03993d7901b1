import { mkdirSync } from 'node:fs';
import path from 'node:path';
import type { Page } from 'playwright-core';
import { root } from '../support/project-files';
import { auditPage, untilStill, type AuditPart } from './audit-page';
import { LAPTOP, PHONE, useChromium, WIDE, type Visit } from './chromium';
import { everyState } from './page-states';
import { everyPage, type Stop } from './pages';
import { readRawRecord } from './raw-record';
import { servedDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';

const PICTURES = path.join(root, 'test/output/pages');

/**
 * Where pages are looked at: both themes on a phone and a laptop, light on a large screen. Everything is looked for once on each
 * size of layout; the other theme differs in its colours, and a larger window in its measures.
 */
const LOOKS: readonly Look[] = [
  { name: '1440-light', size: LAPTOP, colorScheme: 'light', audit: 'whole' },
  { name: '1440-dark', size: LAPTOP, colorScheme: 'dark', audit: 'colours' },
  { name: '360-dark', size: PHONE, colorScheme: 'dark', audit: 'whole' },
  { name: '360-light', size: PHONE, colorScheme: 'light', audit: 'colours' },
  { name: '1920-light', size: WIDE, colorScheme: 'light', audit: 'measures' },
];

interface Look {
  name: string;
  size: { width: number; height: number };
  colorScheme: 'light' | 'dark';
  audit: AuditPart;
}

/** Pictures of every look are kept when asked for: they take a third of the time. */
const KEEP_PICTURES = process.env['UNDERSEAM_PICTURES'] === 'on';

/** A share of the pages: those that some people open, on their own or with something opened on them. */
export interface Share {
  of: 'pages' | 'states';
  as: readonly Stop['as'][];
}

/** The pages of a share in every look: held to WCAG 2.2 AA, to their width, to legible text. */
export function lookAtPages(share: Share): void {
  const openWindow = useChromium(() => servedDemo().url);
  const visits = new Map<Stop['as'], Visit>();
  const known = { rotten: '', unbilled: '', corrected: '' };

  beforeAll(() => {
    mkdirSync(PICTURES, { recursive: true });
    const own = readRawRecord(servedDemo().data).jobs.filter(({ branch }) => branch === 'HAV');
    const holed = own.filter(({ job }) => JSON.stringify(job).includes('"holed"') && job.invoice);
    known.rotten = holed.at(-1)!.jobRef;
    known.unbilled = own.filter(({ job }) => !job.invoice).at(-1)!.jobRef;
    known.corrected = own.filter(({ revision }) => revision > 1).at(-1)!.jobRef;
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

  async function lookedAt(stop: Stop, looks: readonly Look[]): Promise<string[]> {
    const page = await open(stop);
    const wrong: string[] = [];
    for (const { name, size, colorScheme, audit } of looks) {
      await page.setViewportSize(size);
      await page.emulateMedia({ colorScheme });
      await untilStill(page);
      const found = await auditPage(page, audit);
      wrong.push(...found.map((one) => `${name}: ${one}`));
      if (KEEP_PICTURES) {
        await page.screenshot({
          path: path.join(PICTURES, `${stop.name}-${name}.png`),
          fullPage: true,
        });
      }
    }
    return wrong;
  }

  function named(stop: Stop): Stop {
    return {
      ...stop,
      path: stop.path.replace(
        /\{(rotten|unbilled|corrected)\}/,
        (_, name: keyof typeof known) => known[name],
      ),
    };
  }

  const marks = { rotten: '{rotten}', unbilled: '{unbilled}', corrected: '{corrected}' };
  const stops = (share.of === 'pages' ? everyPage(marks) : everyState(marks)).filter(({ as }) =>
    share.as.includes(as),
  );
  const looks = share.of === 'pages' ? LOOKS : [LOOKS[0]!, LOOKS[2]!];

  test.each(stops.map((stop) => [stop.name, stop] as const))(
    `%s, ${looks.map(({ name }) => name).join(', ')}, has nothing wrong`,
    async (_name, stop) => {
      expect(await lookedAt(named(stop), looks)).toEqual([]);
    },
  );
}
