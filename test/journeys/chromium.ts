import {
  chromium,
  type Browser,
  type BrowserContext,
  type BrowserContextOptions,
  type Page,
} from 'playwright-core';
import { troublesOf, type Troubles } from './page-troubles';

/** How wide windows are in the journeys, in CSS pixels: a phone, a laptop, a large screen. */
export const PHONE = { width: 360, height: 780 };
export const LAPTOP = { width: 1440, height: 1100 };
export const WIDE = { width: 1920, height: 1200 };

/** A page of a person's own: their cookies, their errors. */
export interface Visit {
  context: BrowserContext;
  page: Page;
  troubles: Troubles;
}

/** Starts the Chromium that CHROME names. */
export function launchChromium(): Promise<Browser> {
  return chromium.launch({
    executablePath: process.env['CHROME'],
    args: [
      '--no-sandbox',
      '--disable-quic',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
}

/** Opens a window that shares nothing with others; English, Central European, nothing moves. */
export async function openWindow(
  browser: Browser,
  url: string,
  options: BrowserContextOptions = {},
): Promise<Visit> {
  const context = await browser.newContext({
    baseURL: url,
    locale: 'en-GB',
    timezoneId: 'Europe/Berlin',
    viewport: LAPTOP,
    reducedMotion: 'reduce',
    ...options,
  });
  context.setDefaultTimeout(30_000);
  const page = await context.newPage();
  return { context, page, troubles: troublesOf(page) };
}

/**
 * One browser for all tests of a spec file. Every window opened is held to the end: after each test, an error in its console, a
 * breach of the content security policy or a failed script fails that test, unless the test named it.
 */
export function useChromium(
  url: () => string,
): (options?: BrowserContextOptions) => Promise<Visit> {
  let browser: Browser;
  const visits: Visit[] = [];
  beforeAll(async () => {
    browser = await launchChromium();
  });
  afterEach(() => {
    expect(visits.flatMap(({ troubles }) => troubles.taken())).toEqual([]);
  });
  afterAll(() => browser.close());
  return async (options) => {
    const visit = await openWindow(browser, url(), options);
    visits.push(visit);
    return visit;
  };
}
