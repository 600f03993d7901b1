import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { run, RunOnly } from 'axe-core';
import type { Page } from 'playwright-core';

/** The success criteria held to: WCAG 2.2, levels A and AA, by axe-core's names for them. */
const WCAG_22_AA = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

const RULES = {
  whole: { type: 'tag', values: WCAG_22_AA },
  colours: { type: 'rule', values: ['color-contrast', 'link-in-text-block'] },
} satisfies Record<string, RunOnly>;

/** The engine, in the form that a page takes half as long to read; every page opened reads it anew. */
const ENGINE = readFileSync(createRequire(__filename).resolve('axe-core/axe.min.js'), 'utf8');

/** Smallest text that a page may show, in CSS pixels as drawn (the design's own rule). */
const SMALLEST = 14;

/** What of a page is looked at: everything, its measures and the contrast of its colours, or its measures alone. */
export type AuditPart = 'whole' | 'colours' | 'measures';

/** Everything that is wrong with a page as it stands, in words; an empty list when nothing is. */
export async function auditPage(page: Page, part: AuditPart = 'whole'): Promise<string[]> {
  return [
    ...(part === 'measures' ? [] : await accessibility(page, part)),
    ...(await sideways(page)),
    ...(await smallText(page)),
    ...(await picturesWithoutTwin(page)),
  ];
}

/**
 * Waits until nothing moves any more. Colours are inherited from element to element, and even a transition cut down to nothing for
 * those who want no motion takes a frame at each of them.
 */
export async function untilStill(page: Page): Promise<void> {
  await page.evaluate(async () => {
    // One that has ended is still listed while it holds its last state, as in a part that is folded away.
    const moves = (): boolean =>
      document.getAnimations().some(({ playState }) => playState === 'running');
    for (let still = 0; still < 3; still = moves() ? 0 : still + 1) {
      await new Promise((drawn) => requestAnimationFrame(drawn));
    }
  });
}

/** Violations that axe-core finds, each with the elements concerned. No rule is switched off in the whole. */
async function accessibility(page: Page, part: 'whole' | 'colours'): Promise<string[]> {
  if (!(await page.evaluate('typeof window.axe === "object"'))) await page.evaluate(ENGINE);
  return page.evaluate(async (runOnly) => {
    const { violations } = await (window as unknown as { axe: { run: typeof run } }).axe.run(
      document,
      { runOnly, resultTypes: ['violations'] },
    );
    return violations.flatMap(({ id, help, nodes }) =>
      nodes.map(
        ({ target, failureSummary }) =>
          `${id}: ${help}: ${target.join(' ')} ${failureSummary ?? ''}`,
      ),
    );
  }, RULES[part]);
}

/** A page that scrolls sideways, and the elements that reach beyond the window. */
function sideways(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const { scrollWidth, clientWidth } = document.documentElement;
    if (scrollWidth <= clientWidth) return [];
    const beyond = [...document.querySelectorAll('body *')]
      .filter((element) => element.getBoundingClientRect().right > clientWidth + 1)
      .map((element) => `${element.tagName.toLowerCase()}.${element.getAttribute('class') ?? ''}`);
    return [`scrolls sideways: ${scrollWidth} in ${clientWidth}: ${beyond.slice(0, 6).join(', ')}`];
  });
}

/** Text drawn smaller than allowed, a drawing's own scale included. What only screen readers get is not drawn. */
function smallText(page: Page): Promise<string[]> {
  return page.evaluate((smallest) => {
    const found = new Set<string>();
    const walker = document.createTreeWalker(document.body, NodeFilter.SHOW_TEXT);
    for (let node = walker.nextNode(); node; node = walker.nextNode()) {
      const element = node.parentElement;
      if (!element || !node.textContent?.trim() || element.closest('.us-unseen, noscript, script'))
        continue;
      if (!element.checkVisibility({ visibilityProperty: true })) continue;
      const scale = element instanceof SVGGraphicsElement ? (element.getScreenCTM()?.a ?? 1) : 1;
      const size = parseFloat(getComputedStyle(element).fontSize) * scale;
      if (size < smallest - 0.01)
        found.add(`${size.toFixed(1)} px: "${node.textContent.trim().slice(0, 40)}"`);
    }
    return [...found];
  }, SMALLEST);
}

/** Charts that say nothing to those who do not see them, or have no table beside them. */
function picturesWithoutTwin(page: Page): Promise<string[]> {
  return page.evaluate(() =>
    [...document.querySelectorAll('main svg[role="img"]')].flatMap((picture) => {
      const name = picture.getAttribute('aria-label') ?? '';
      const twin = [...(picture.closest('us-table-twin')?.querySelectorAll('button') ?? [])].find(
        (button) => button.textContent?.trim() === 'Show as table',
      );
      // On the report its tables stand below it, as they do on paper.
      const inReport = picture.closest('us-report-paper')?.querySelector('us-paper-table');
      return [
        ...(name.length < 20 ? [`a picture without a finding: "${name}"`] : []),
        ...(twin || inReport ? [] : [`a picture without a table: "${name}"`]),
      ];
    }),
  );
}
