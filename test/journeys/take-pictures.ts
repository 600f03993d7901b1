/**
 * Takes the README's pictures anew, after a build: `npx tsx --conditions=underseam-source test/journeys/take-pictures.ts`. Seeds a demo of its own on the day of
 * the journeys, so that the same product gives the same pictures.
 */
import { mkdirSync, statSync } from 'node:fs';
import path from 'node:path';
import type { Browser } from 'playwright-core';
import { findChromium } from '../support/find-chromium.mjs';
import { root } from '../support/project-files';
import { untilStill } from './audit-page';
import { LAPTOP, launchChromium, openWindow, PHONE } from './chromium';
import { serveDemo } from './served-demo';
import { signIn, untilReady } from './sign-in';

const FOLDER = path.join(root, 'projects/dashboard/pictures');
/** A picture larger than this slows down whoever reads the README. */
const MOST_BYTES = 350_000;

/** A week that has something to tell. */
const WEEK = '/this-week?week=2025-W45';

const PICTURES = [
  { name: 'this-week', path: WEEK, as: 'site_manager', size: LAPTOP, colorScheme: 'light' },
  { name: 'overruns', path: '/overruns', as: 'site_manager', size: LAPTOP, colorScheme: 'light' },
  { name: 'rot', path: '/rot?age=15-19', as: 'head_office', size: LAPTOP, colorScheme: 'light' },
  { name: 'product', path: '/product', as: 'site_manager', size: LAPTOP, colorScheme: 'dark' },
  {
    name: 'warranty-dark',
    path: '/warranty',
    as: 'head_office',
    size: LAPTOP,
    colorScheme: 'dark',
  },
  {
    name: 'come-backs-phone',
    path: '/come-backs',
    as: 'site_manager',
    size: PHONE,
    colorScheme: 'light',
  },
  {
    name: 'this-week-phone-dark',
    path: WEEK,
    as: 'site_manager',
    size: PHONE,
    colorScheme: 'dark',
  },
] as const;

async function takePictures(): Promise<void> {
  process.env['CHROME'] ??= findChromium();
  mkdirSync(FOLDER, { recursive: true });
  const demo = await serveDemo();
  const browser = await launchChromium();
  try {
    for (const picture of PICTURES) await take(browser, demo.url, picture);
  } finally {
    await browser.close();
    await demo.stop();
  }
}

async function take(
  browser: Browser,
  url: string,
  { name, path: address, as, size, colorScheme }: (typeof PICTURES)[number],
): Promise<void> {
  const { context, page } = await openWindow(browser, url, { viewport: size, colorScheme });
  await signIn(page, as);
  await page.goto(address);
  await untilReady(page);
  await untilStill(page);
  const file = path.join(FOLDER, `${name}.png`);
  await page.screenshot({ path: file });
  const { size: bytes } = statSync(file);
  if (bytes > MOST_BYTES) throw new Error(`${name}.png has ${bytes} bytes`);
  console.log(`${name}.png ${Math.round(bytes / 1000)} kB`);
  await context.close();
}

void takePictures();
